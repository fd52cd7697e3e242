package fourthwire.audit.plan;

import fourthwire.network.Excitation;
import fourthwire.network.element.SeriesImpedance;
import fourthwire.network.element.SourceImpedance;
import fourthwire.quantity.Phasor;
import fourthwire.site.Background;
import fourthwire.site.PhaseSystem;
import fourthwire.site.Supply;
import java.util.List;

/**
 * A supply as the network's source: its impedance from the fault level (or the generator's
 * subtransient reactance), and its electromotive forces.
 *
 * <p>Z = V²/S at the rated line voltage, split by X/R; R holds at every order, X goes with it; of
 * zero sequence X is multiplied by X0/X1 and R kept. A generator's regulator holds the
 * positive-sequence fundamental at its terminals; negative sequence and every other order see R +
 * jhX''d. Common modelling practice (for example IEEE 399-1997, chapter 10; from memory).
 */
public final class SupplyPlate {
  private final Supply supply;
  private final List<Background> background;

  public SupplyPlate(Supply supply, List<Background> background) {
    this.supply = supply;
    this.background = background.stream().filter(b -> b.supply().equals(supply.name())).toList();
  }

  public SourceImpedance impedance() {
    SeriesImpedance positive = positiveSequence();
    SourceImpedance source =
        switch (supply.systemOrDefault()) {
          case THREE_PHASE_4_WIRE -> SourceImpedance.fourWire(positive, zeroSequence(positive));
          case THREE_PHASE_3_WIRE -> SourceImpedance.threeWire(positive, zeroSequence(positive));
          case SPLIT_PHASE -> SourceImpedance.splitPhase(positive.times(0.5));
          case SINGLE_PHASE -> SourceImpedance.singlePhase(positive);
        };
    return supply.isGenerator() ? source.regulated() : source;
  }

  private SeriesImpedance positiveSequence() {
    double v = supply.lineVoltageV();
    double xOverR = supply.xOverRorDefault();
    if (supply.isGenerator()) {
      double reactance =
          supply.subtransientReactancePercent().orElseThrow()
              / 100
              * v
              * v
              / (1000 * supply.generatorKva().orElseThrow());
      return SeriesImpedance.of(reactance / xOverR, reactance);
    }
    return SeriesImpedance.ofMagnitude(
        v * v / (1e6 * supply.faultLevelMva().orElseThrow()), xOverR);
  }

  private SeriesImpedance zeroSequence(SeriesImpedance positive) {
    return SeriesImpedance.of(
        positive.resistanceOhm(), positive.reactanceOhm() * supply.zeroSequenceRatio().orElse(1));
  }

  /** Sets the electromotive forces of one whole order; false if there are none. */
  public boolean excite(int order, Excitation excitation) {
    Phasor first = emf(order);
    if (first.equals(Phasor.ZERO)) {
      return false;
    }
    PhaseSystem system = supply.systemOrDefault();
    if (system.isThreePhase()) {
      excitation.threePhaseEmf(order, first);
    } else {
      excitation.emf(0, first);
      if (system == PhaseSystem.SPLIT_PHASE) {
        excitation.emf(1, first.turned(180.0 * order));
      }
    }
    return true;
  }

  /** Of line 1, volts to neutral: nominal at the fundamental, the background above it. */
  private Phasor emf(int order) {
    double nominal =
        switch (supply.systemOrDefault()) {
          case THREE_PHASE_4_WIRE, THREE_PHASE_3_WIRE -> supply.lineVoltageV() / Math.sqrt(3);
          case SPLIT_PHASE -> supply.lineVoltageV() / 2;
          case SINGLE_PHASE -> supply.lineVoltageV();
        };
    if (order == 1) {
      return Phasor.polar(nominal, 0);
    }
    Phasor sum = Phasor.ZERO;
    for (Background b : background) {
      if (b.order() == order) {
        sum = sum.plus(Phasor.polar(nominal * b.percent() / 100, b.degrees().orElse(0)));
      }
    }
    return sum;
  }
}
