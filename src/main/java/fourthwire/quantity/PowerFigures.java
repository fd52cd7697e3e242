package fourthwire.quantity;

import java.util.List;

/**
 * The power figures of a node or of one of its lines (IEEE 1459-2010, clause 3).
 *
 * @param activeW active power P of all orders, watts
 * @param fundamentalReactiveVar fundamental reactive power: Q1 of one line, Q1+ of three, vars;
 *     positive where the current lags
 * @param apparentVa apparent power S, effective S_e on three phases, volt-amperes
 * @param nonfundamentalVa non-fundamental apparent power √(S² - S1²), volt-amperes
 * @param powerFactor true power factor P/S
 * @param displacementFactor fundamental power factor P1/S1, positive sequence on three phases;
 *     never called power factor
 */
public record PowerFigures(
    Figure activeW,
    Figure fundamentalReactiveVar,
    Figure apparentVa,
    Figure nonfundamentalVa,
    Figure powerFactor,
    Figure displacementFactor) {

  /** No figure can be computed, and one short sentence why. */
  public static PowerFigures unknown(String reason) {
    Figure figure = Figure.unknown(reason);
    return new PowerFigures(figure, figure, figure, figure, figure, figure);
  }

  /**
   * Several lines taken together by arithmetic sums, as for split-phase: P, Q1, S and S1 add up; SN
   * follows as √(S² - S1²), the factors as P/S and P1/S1. (The effective apparent power is defined
   * for three phases only; IEEE 1459-2010, clause 3.2, names the arithmetic sum beside it.)
   *
   * @param legs power of each line from its own voltage to neutral and its own current
   */
  public static PowerFigures arithmeticSum(List<LinePower> legs) {
    double p = legs.stream().mapToDouble(LinePower::activeW).sum();
    double p1 = legs.stream().mapToDouble(LinePower::fundamentalActiveW).sum();
    double q1 = legs.stream().mapToDouble(LinePower::fundamentalReactiveVar).sum();
    double s = legs.stream().mapToDouble(LinePower::apparentVa).sum();
    double s1 = legs.stream().mapToDouble(LinePower::fundamentalApparentVa).sum();
    return of(p, p1, q1, s, s1);
  }

  static PowerFigures of(double p, double p1, double q1, double s, double s1) {
    return new PowerFigures(
        Figure.of(p),
        Figure.of(q1),
        Figure.of(s),
        Figure.of(remainder(s, s1)),
        factor(p, s),
        factor(p1, s1));
  }

  /** √(whole² - part²); rounding may leave the whole a hair below the part. */
  static double remainder(double whole, double part) {
    return Math.sqrt(Math.max(0, (whole - part) * (whole + part)));
  }

  static Figure factor(double activeW, double apparentVa) {
    return apparentVa > 0
        ? Figure.of(activeW / apparentVa)
        : Figure.unknown("no apparent power: no current flows or no voltage stands");
  }
}
