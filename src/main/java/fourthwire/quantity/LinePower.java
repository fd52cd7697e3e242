package fourthwire.quantity;

/**
 * Powers of one voltage and one current: a line to neutral, or two lines (IEEE 1459-2010, 3.1.2,
 * single-phase nonsinusoidal).
 *
 * <p>Identities that hold exactly: S² = S1² + SN² and SN² = DI² + DV² + SH².
 *
 * @param activeW active power P of all orders, W
 * @param fundamentalActiveW P1, W
 * @param fundamentalReactiveVar Q1, var; positive where the current lags
 * @param apparentVa S = V·I, VA
 * @param fundamentalApparentVa S1 = V1·I1, VA
 * @param currentDistortionVar DI = V1·IH, var
 * @param voltageDistortionVar DV = VH·I1, var
 * @param harmonicApparentVa SH = VH·IH, VA
 */
public record LinePower(
    double activeW,
    double fundamentalActiveW,
    double fundamentalReactiveVar,
    double apparentVa,
    double fundamentalApparentVa,
    double currentDistortionVar,
    double voltageDistortionVar,
    double harmonicApparentVa) {

  /**
   * From the spectra alone: everything is in orders 1 to 50.
   *
   * @param voltage rms volts
   * @param current rms amps, positive in the direction in which power is counted
   */
  public static LinePower of(Spectrum voltage, Spectrum current) {
    return of(voltage, current, voltage.rms(), current.rms(), activeW(voltage, current));
  }

  /**
   * From spectra and the totals measured beside them, which hold what no spectrum of orders 1 to 50
   * does: direct components, interharmonics, higher orders.
   *
   * @param voltageRms total rms, volts
   * @param currentRms total rms, amps
   * @param activeW mean of v·i over whole cycles, W
   */
  public static LinePower of(
      Spectrum voltage, Spectrum current, double voltageRms, double currentRms, double activeW) {
    double v1 = voltage.magnitude(1);
    double i1 = current.magnitude(1);
    double vh = PowerFigures.remainder(voltageRms, v1);
    double ih = PowerFigures.remainder(currentRms, i1);
    Phasor s1 = voltage.at(1).times(current.at(1).conjugate());
    return new LinePower(
        activeW, s1.re(), s1.im(), voltageRms * currentRms, v1 * i1, v1 * ih, vh * i1, vh * ih);
  }

  /** Nonfundamental apparent power SN = √(S² - S1²), VA. */
  public double nonfundamentalVa() {
    return PowerFigures.remainder(apparentVa, fundamentalApparentVa);
  }

  /** Nonactive power N = √(S² - P²), var. */
  public double nonactiveVar() {
    return PowerFigures.remainder(apparentVa, activeW);
  }

  /** Power of the orders above the fundamental, PH = P - P1, W; often negative. */
  public double harmonicActiveW() {
    return activeW - fundamentalActiveW;
  }

  /** The figures an audit shows. */
  public PowerFigures figures() {
    return PowerFigures.of(
        activeW, fundamentalActiveW, fundamentalReactiveVar, apparentVa, fundamentalApparentVa);
  }

  /** Active power of orders 1 to 50: the sum of Re(V·I*), W. */
  static double activeW(Spectrum voltage, Spectrum current) {
    double sum = 0;
    for (int h = 1; h <= Spectrum.HIGHEST_ORDER; h++) {
      sum += voltage.re(h) * current.re(h) + voltage.im(h) * current.im(h);
    }
    return sum;
  }
}
