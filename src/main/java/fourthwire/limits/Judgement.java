package fourthwire.limits;

import fourthwire.quantity.Figure;
import java.util.Optional;

/** The one rule by which a figure is over, near or under a limit, and how a finding is made. */
public final class Judgement {
  /** From here on a figure is near its limit (the public contract, section 6). */
  public static final double NEAR = 0.8;

  private static final Figure NO_SPREAD = Figure.unknown("no spread was computed");

  private Judgement() {}

  /** Act over the limit, watch over 80 % of it, else nothing. */
  public static Optional<Severity> of(double figure, double limit) {
    if (figure > limit) {
      return Optional.of(Severity.ACT);
    }
    return figure > NEAR * limit ? Optional.of(Severity.WATCH) : Optional.empty();
  }

  public static Finding finding(
      FindingCode code,
      Severity severity,
      double figure,
      double limit,
      String unit,
      String basis,
      String sentence) {
    return new Finding(
        code.word(),
        severity,
        Figure.of(figure),
        Figure.of(limit),
        unit,
        NO_SPREAD,
        basis,
        sentence);
  }

  public static Finding note(
      FindingCode code, double figure, String unit, String basis, String sentence) {
    return new Finding(
        code.word(),
        Severity.NOTE,
        Figure.of(figure),
        Figure.unknown("information, held against no limit"),
        unit,
        NO_SPREAD,
        basis,
        sentence);
  }
}
