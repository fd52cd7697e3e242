package fourthwire.quantity;

import java.util.List;
import java.util.function.ToDoubleFunction;

/**
 * Effective powers of three lines (IEEE 1459-2010, 3.2.3, three-phase nonsinusoidal and
 * unbalanced), with ρ = ξ = 1: the neutral's resistance equals a line's, and half of the effective
 * voltage's losses stand in star.
 *
 * @param activeW active power P of all lines and orders, W
 * @param effectiveVoltageV Ve, volts line to neutral
 * @param effectiveCurrentA Ie, amps
 * @param apparentVa Se = 3·Ve·Ie, VA
 * @param fundamentalApparentVa Se1 = 3·Ve1·Ie1, VA
 * @param positiveActiveW P1+, W
 * @param positiveReactiveVar Q1+, var; positive where the current lags
 */
public record ThreePhasePower(
    double activeW,
    double effectiveVoltageV,
    double effectiveCurrentA,
    double apparentVa,
    double fundamentalApparentVa,
    double positiveActiveW,
    double positiveReactiveVar) {

  /**
   * Three lines and a neutral: Ve² = (3·ΣVline² + ΣVline-line²)/18, Ie² = (ΣIline² + IN²)/3.
   *
   * @param lineToNeutral voltages of L1, L2, L3 to neutral
   * @param lines currents of L1, L2, L3
   * @param neutral current of the neutral
   */
  public static ThreePhasePower fourWire(
      List<Spectrum> lineToNeutral, List<Spectrum> lines, Spectrum neutral) {
    requireThree(lineToNeutral);
    requireThree(lines);
    List<Spectrum> lineToLine = SymmetricalComponents.differences(lineToNeutral);
    ToDoubleFunction<ToDoubleFunction<Spectrum>> ve =
        rms -> Math.sqrt((3 * squares(lineToNeutral, rms) + squares(lineToLine, rms)) / 18);
    ToDoubleFunction<ToDoubleFunction<Spectrum>> ie =
        rms -> Math.sqrt((squares(lines, rms) + squares(List.of(neutral), rms)) / 3);
    double p = 0;
    for (int k = 0; k < 3; k++) {
      p += LinePower.activeW(lineToNeutral.get(k), lines.get(k));
    }
    Phasor v1 = SymmetricalComponents.of(lineToNeutral).positive().at(1);
    return assemble(p, ve, ie, v1, lines);
  }

  /**
   * Three lines without a neutral: Ve² = ΣVline-line²/9, Ie² = ΣIline²/3, power by two wattmeters.
   *
   * @param lineToLine voltages L1-L2, L2-L3, L3-L1
   * @param lines currents of L1, L2, L3
   */
  public static ThreePhasePower threeWire(List<Spectrum> lineToLine, List<Spectrum> lines) {
    requireThree(lineToLine);
    requireThree(lines);
    ToDoubleFunction<ToDoubleFunction<Spectrum>> ve =
        rms -> Math.sqrt(squares(lineToLine, rms) / 9);
    ToDoubleFunction<ToDoubleFunction<Spectrum>> ie = rms -> Math.sqrt(squares(lines, rms) / 3);
    // P = V13·I1 + V23·I2: line 3 is the return of both.
    double p =
        LinePower.activeW(lineToLine.get(1), lines.get(1))
            - LinePower.activeW(lineToLine.get(2), lines.get(0));
    Phasor v1 = SymmetricalComponents.of(lineToLine).positive().at(1);
    // The positive sequence of line-to-line voltages leads the star voltages by 30° and is √3 long.
    return assemble(p, ve, ie, v1.times(Phasor.polar(1 / Math.sqrt(3), -30)), lines);
  }

  private static ThreePhasePower assemble(
      double activeW,
      ToDoubleFunction<ToDoubleFunction<Spectrum>> ve,
      ToDoubleFunction<ToDoubleFunction<Spectrum>> ie,
      Phasor positiveVoltage,
      List<Spectrum> lines) {
    Phasor positiveCurrent = SymmetricalComponents.of(lines).positive().at(1);
    Phasor s1 = positiveVoltage.times(positiveCurrent.conjugate()).times(3);
    double veAll = ve.applyAsDouble(Spectrum::rms);
    double ieAll = ie.applyAsDouble(Spectrum::rms);
    double ve1 = ve.applyAsDouble(s -> s.magnitude(1));
    double ie1 = ie.applyAsDouble(s -> s.magnitude(1));
    return new ThreePhasePower(
        activeW, veAll, ieAll, 3 * veAll * ieAll, 3 * ve1 * ie1, s1.re(), s1.im());
  }

  /** Positive-sequence fundamental apparent power S1+, VA. */
  public double positiveApparentVa() {
    return Math.hypot(positiveActiveW, positiveReactiveVar);
  }

  /** Nonfundamental effective apparent power SeN = √(Se² - Se1²), VA. */
  public double nonfundamentalVa() {
    return PowerFigures.remainder(apparentVa, fundamentalApparentVa);
  }

  /** Fundamental unbalanced power SU1 = √(Se1² - S1+²), VA. */
  public double unbalancedVa() {
    return PowerFigures.remainder(fundamentalApparentVa, positiveApparentVa());
  }

  /** The figures an audit shows. */
  public PowerFigures figures() {
    return new PowerFigures(
        Figure.of(activeW),
        Figure.of(positiveReactiveVar),
        Figure.of(apparentVa),
        Figure.of(nonfundamentalVa()),
        PowerFigures.factor(activeW, apparentVa),
        PowerFigures.factor(positiveActiveW, positiveApparentVa()));
  }

  private static double squares(List<Spectrum> spectra, ToDoubleFunction<Spectrum> rms) {
    return spectra.stream().mapToDouble(rms).map(x -> x * x).sum();
  }

  private static void requireThree(List<Spectrum> spectra) {
    if (spectra.size() != 3) {
      throw new IllegalArgumentException("three spectra are needed, given " + spectra.size());
    }
  }
}
