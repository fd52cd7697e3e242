package fourthwire.quantity;

/** How far a current or voltage is from a sine, in one number each. */
public final class Distortion {
  private Distortion() {}

  /**
   * Total harmonic distortion: rms of orders 2 to 50 on the fundamental, percent (IEEE 519-2022,
   * clause 3). Ideal waveforms have orders above 50, so a square wave gives 47.30, not 48.34.
   */
  public static Figure thdPercent(Spectrum spectrum) {
    double fundamental = spectrum.magnitude(1);
    return fundamental > 0
        ? Figure.of(100 * spectrum.distortionRms() / fundamental)
        : Figure.unknown("no fundamental");
  }

  /**
   * Total demand distortion: rms of orders 2 to 50 on the demand current I_L, percent (IEEE
   * 519-2022, clause 3).
   *
   * @param demandA I_L, the largest demand current (fundamental), amps
   */
  public static Figure tddPercent(Spectrum current, double demandA) {
    return demandA > 0
        ? Figure.of(100 * current.distortionRms() / demandA)
        : Figure.unknown("no demand current");
  }

  /** One order on the fundamental, percent. */
  public static Figure percentOfFundamental(Spectrum spectrum, int order) {
    double fundamental = spectrum.magnitude(1);
    return fundamental > 0
        ? Figure.of(100 * spectrum.magnitude(order) / fundamental)
        : Figure.unknown("no fundamental");
  }

  /**
   * Voltage unbalance by largest deviation from the mean of the line-to-line voltages, percent
   * (NEMA MG 1, 14.36); the true unbalance is {@link SymmetricalComponents#negativePercent}.
   */
  public static Figure deviationUnbalancePercent(double v12, double v23, double v31) {
    double mean = (v12 + v23 + v31) / 3;
    double deviation =
        Math.max(Math.abs(v12 - mean), Math.max(Math.abs(v23 - mean), Math.abs(v31 - mean)));
    return mean > 0 ? Figure.of(100 * deviation / mean) : Figure.unknown("no voltage");
  }

  /**
   * Harmonic voltage factor √(Σ v_n²/n), per unit, over the odd orders from 5 that are no multiples
   * of 3 (NEMA MG 1, 30.1.2.1).
   *
   * @param voltage volts; each order is taken on the fundamental
   */
  public static Figure harmonicVoltageFactor(Spectrum voltage) {
    double fundamental = voltage.magnitude(1);
    if (fundamental == 0) {
      return Figure.unknown("no fundamental");
    }
    double sum = 0;
    for (int n = 5; n <= Spectrum.HIGHEST_ORDER; n += 2) {
      if (n % 3 != 0) {
        double perUnit = voltage.magnitude(n) / fundamental;
        sum += perUnit * perUnit / n;
      }
    }
    return Figure.of(Math.sqrt(sum));
  }
}
