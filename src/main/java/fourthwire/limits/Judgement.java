package fourthwire.limits;

import fourthwire.quantity.Figure;
import java.util.Collection;
import java.util.List;
import java.util.Optional;

/** What findings are made from: checks that have something to say, and plain notes. */
public final class Judgement {
  /** From here on a figure is near its limit (the public contract, section 6). */
  public static final double NEAR = 0.8;

  private static final Figure NO_SPREAD = Figure.unknown("no spread was computed");

  private Judgement() {}

  /** The findings among checks, in their order, by the figures alone. */
  public static List<Finding> findings(Collection<Check> checks) {
    return checks.stream().map(Check::finding).flatMap(Optional::stream).toList();
  }

  /** Information, held against no limit. */
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
