package fourthwire.audit;

import fourthwire.quantity.Conductor;
import fourthwire.quantity.Figure;
import fourthwire.quantity.PowerFigures;
import fourthwire.quantity.Spectrum;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * The figures of a node with every load at its demand, schedules ignored.
 *
 * <p>A transformer's figures are its secondary's; its primary's stand under {@code primary}.
 *
 * @param lines by line conductor, in order
 * @param neutral the neutral's
 * @param voltage by line ({@code L1}), or by pair ({@code L1-L2}) where there is no neutral
 * @param neutralVoltageV of the neutral to earth, rms
 * @param currentSpectrum amps by conductor, N where there is one
 * @param voltageSpectrum volts, keys as {@code voltage}
 * @param power of the node; on a split-phase node arithmetic sums
 * @param powerBasis how the power figures were formed, one sentence
 * @param powerByLine by line, from its own voltage to neutral and current; empty without neutral
 * @param demandA the demand current I_L that TDD stands on, amps
 * @param demandBasis where it comes from, one sentence
 * @param shortCircuitA the short-circuit current solved at this node, amps
 * @param transformer of a transformer
 * @param primary of a transformer: its primary's lines, neutral and spectrum
 * @param harmonicLossFactor ΣI_h²h²/ΣI_h² of the most loaded line
 * @param lossesW of its feeder, and of a transformer its winding losses, watts
 * @param currentUnbalancePercent |I2|/|I1|
 * @param zeroSequencePercent |I0|/|I1|
 * @param voltageUnbalancePercent |V2|/|V1|
 * @param neutralAdders circuits and panels fed from here by what they add to this node's neutral
 */
public record DesignState(
    Map<Conductor, LineCurrent> lines,
    NeutralCurrent neutral,
    Map<String, LineVoltage> voltage,
    Figure neutralVoltageV,
    Map<Conductor, Spectrum> currentSpectrum,
    Map<String, Spectrum> voltageSpectrum,
    PowerFigures power,
    String powerBasis,
    Map<Conductor, PowerFigures> powerByLine,
    Figure demandA,
    String demandBasis,
    Figure shortCircuitA,
    Optional<TransformerState> transformer,
    Optional<PrimaryState> primary,
    Figure harmonicLossFactor,
    Figure lossesW,
    Figure currentUnbalancePercent,
    Figure zeroSequencePercent,
    Figure voltageUnbalancePercent,
    List<Resonance> resonances,
    List<NeutralAdder> neutralAdders) {

  /**
   * A line's current.
   *
   * @param rmsA orders 1 to 50, amps
   * @param thdPercent on the fundamental
   * @param tddPercent on the demand current
   * @param loadingPercent of {@code ampacityA}
   * @param ampacityA the smaller of what its conductor and bus carry, before any harmonic factor
   * @param ampacityBasis which that is, one sentence
   */
  public record LineCurrent(
      Figure rmsA,
      Figure fundamentalA,
      Figure thdPercent,
      Figure tddPercent,
      Figure loadingPercent,
      Figure ampacityA,
      String ampacityBasis) {}

  /**
   * The neutral's current: the sum of the line currents; all unknown where there is no neutral.
   *
   * @param percentOfMeanLine against the mean of the lines' rms
   * @param loadingPercent of {@code ampacityA}
   */
  public record NeutralCurrent(
      Figure rmsA,
      Figure percentOfMeanLine,
      Figure loadingPercent,
      Figure ampacityA,
      String ampacityBasis) {}

  /**
   * A voltage.
   *
   * @param dropPercent of nominal: nominal minus the fundamental
   */
  public record LineVoltage(
      Figure rmsV, Figure fundamentalV, Figure thdPercent, Figure dropPercent) {}

  /**
   * A transformer's loading.
   *
   * @param loadingPercent of rated current, worst line
   * @param kFactor Σ(I_h/I_rated)²h², worst line
   * @param deratedKva what it can carry of this current's shape, IEEE C57.110
   * @param factorK its derating divisor after EN 50464-3 / HD 538.3
   */
  public record TransformerState(
      Figure loadingPercent, Figure kFactor, Figure deratedKva, Figure factorK) {}

  /** A transformer's primary side. */
  public record PrimaryState(
      Map<Conductor, LineCurrent> lines,
      NeutralCurrent neutral,
      Map<Conductor, Spectrum> currentSpectrum) {}

  /**
   * A resonance seen from this node.
   *
   * @param order where the impedance peaks (parallel) or dips (series)
   * @param ohm how high, or how low
   * @param bank the capacitor bank or filter that makes it
   * @param series whether it is a series resonance, which draws the order in
   */
  public record Resonance(double order, double ohm, String bank, boolean series) {}

  /**
   * What one child adds to this node's neutral current: the part of its neutral current in step
   * with the node's, order by order, so that all parts sum to the neutral's rms.
   *
   * @param node the child
   * @param amps its part, amps; negative where it relieves the neutral
   */
  public record NeutralAdder(String node, double amps) {}
}
