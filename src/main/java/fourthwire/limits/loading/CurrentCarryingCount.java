package fourthwire.limits.loading;

import fourthwire.limits.Words;
import fourthwire.quantity.PublishedTable;

/**
 * The North American rule: more than three current-carrying conductors in a raceway carry less each
 * (NFPA 70, 310.15(C)(1)); the neutral of a four-wire wye counts where the major portion of the
 * load is nonlinear, the neutral beside two lines of a wye always (310.15(E)).
 *
 * <p>Our reading of "major portion": nonlinear kinds draw over half of the feeder's design
 * volt-amperes. Parallel sets are taken to run in raceways of their own.
 */
public final class CurrentCarryingCount {
  private static final PublishedTable TABLE =
      PublishedTable.beside(CurrentCarryingCount.class, "nec-310-15-c-1.csv");
  private static final double MAJOR_PORTION = 0.5;
  private static final String BASIS = TABLE.basis() + " and (E)";

  private CurrentCarryingCount() {}

  /** What stays of the table ampacity with this many current-carrying conductors, percent. */
  public static double percent(int conductors) {
    return TABLE.rows().stream()
        .filter(
            r ->
                conductors >= r.number("from_count")
                    && conductors <= r.optional("to_count").orElse(Double.POSITIVE_INFINITY))
        .findFirst()
        .orElseThrow(() -> new IllegalArgumentException("no factor for " + conductors))
        .number("percent");
  }

  static AmpacityFactors factors(NeutralCase c) {
    boolean counts = counts(c);
    int count = c.lines().size() + (counts ? 1 : 0);
    double factor = percent(count) / 100;
    return new AmpacityFactors(
        factor,
        factor,
        () ->
            "%s (%d current-carrying conductor%s: factor %s)"
                .formatted(reason(c, counts), count, count == 1 ? "" : "s", Words.number(factor)),
        BASIS);
  }

  private static boolean counts(NeutralCase c) {
    if (c.neutral().isEmpty() || !c.wye()) {
      return false;
    }
    return c.lines().size() == 2 || (c.lines().size() == 3 && c.nonlinearShare() > MAJOR_PORTION);
  }

  private static String reason(NeutralCase c, boolean counts) {
    if (c.neutral().isEmpty()) {
      return "there is no neutral";
    }
    if (!c.wye() || c.lines().size() == 1) {
      return "the neutral is not counted";
    }
    if (c.lines().size() == 2) {
      return "the neutral beside two lines of a wye counts";
    }
    return "nonlinear loads are %s %% of the feeder's design VA and the neutral %s"
        .formatted(Words.number(100 * c.nonlinearShare()), counts ? "counts" : "is not counted");
  }
}
