package fourthwire.limits.distortion;

import fourthwire.limits.Check;
import fourthwire.limits.FindingCode;
import fourthwire.limits.Words;
import fourthwire.quantity.Distortion;
import fourthwire.quantity.Figure;
import fourthwire.quantity.Spectrum;
import java.util.Collection;
import java.util.Optional;

/** What a voltage does to motors: harmonic voltage factor and unbalance. */
public final class VoltageQuality {
  private static final String HVF_BASIS = "NEMA MG 1, 30.1.2.1 (from memory)";
  private static final double HVF_LIMIT = 0.03;
  private static final String UNBALANCE_BASIS = "EN 50160:2010, clause 4.2.4: 2 % of a week's 95 %";
  private static final double UNBALANCE_LIMIT_PERCENT = 2;

  private VoltageQuality() {}

  /**
   * The harmonic voltage factor at a node that feeds motors; above 0.03 a motor is to be derated.
   * The derating curve beyond is not applied: no printed figures were at hand.
   */
  public static Check motorVoltage(Collection<Spectrum> voltages) {
    double worst =
        voltages.stream()
            .map(Distortion::harmonicVoltageFactor)
            .mapToDouble(f -> f.value().orElse(0))
            .max()
            .orElse(0);
    return new Check(
        FindingCode.MOTOR_VOLTAGE,
        "",
        Check.Rule.BINDING,
        worst,
        HVF_LIMIT,
        "",
        HVF_BASIS,
        () ->
            "The harmonic voltage factor at the motors is %s; above %s a motor is derated."
                .formatted(Words.number(worst), Words.number(HVF_LIMIT)));
  }

  /** Negative on positive sequence, percent; nothing where it is unknown. */
  public static Optional<Check> unbalance(Figure voltageUnbalancePercent) {
    return voltageUnbalancePercent.value().stream().mapToObj(VoltageQuality::unbalance).findFirst();
  }

  private static Check unbalance(double percent) {
    return new Check(
        FindingCode.VOLTAGE_UNBALANCE,
        "",
        Check.Rule.BINDING,
        percent,
        UNBALANCE_LIMIT_PERCENT,
        "%",
        UNBALANCE_BASIS,
        () ->
            "The voltage's negative sequence is %s %% of its positive; %s %% is the usual bound."
                .formatted(Words.number(percent), Words.number(UNBALANCE_LIMIT_PERCENT)));
  }
}
