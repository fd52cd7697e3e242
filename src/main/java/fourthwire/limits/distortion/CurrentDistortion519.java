package fourthwire.limits.distortion;

import fourthwire.limits.Check;
import fourthwire.limits.Finding;
import fourthwire.limits.FindingCode;
import fourthwire.limits.Judgement;
import fourthwire.limits.Words;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Distortion;
import fourthwire.quantity.PublishedTable;
import fourthwire.quantity.Spectrum;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.stream.IntStream;
import java.util.stream.Stream;

/**
 * Current distortion limits of IEEE 519 for one voltage and one ratio of short-circuit current to
 * demand current: Table 2 to 69 kV, Table 3 to 161 kV, Table 4 above. A design figure is held
 * against the limit of the weekly 95th percentile of short-time values, whose factor is 1.
 *
 * <p>Not covered: the multipliers for drives of higher pulse numbers (Table 5), generation, direct
 * current, interharmonics, orders above 50.
 */
public final class CurrentDistortion519 {
  private static final PublishedTable TABLE_2 = table("ieee519-table-2.csv");
  private static final PublishedTable TABLE_3 = table("ieee519-table-3.csv");
  private static final PublishedTable TABLE_4 = table("ieee519-table-4.csv");

  private final Edition519 edition;
  private final PublishedTable table;
  private final PublishedTable.Row row;
  private final double ratio;

  private CurrentDistortion519(Edition519 edition, PublishedTable table, double ratio) {
    this.edition = edition;
    this.table = table;
    this.ratio = ratio;
    this.row = rowOf(table, ratio);
  }

  /**
   * The limits that hold at a node.
   *
   * @param nominalLineV nominal voltage line to line, volts
   * @param shortCircuitA short-circuit current at the node, amps
   * @param demandA demand current I_L, the fundamental at the largest demand, amps, above 0
   */
  public static CurrentDistortion519 of(
      Edition519 edition, double nominalLineV, double shortCircuitA, double demandA) {
    if (!(demandA > 0)) {
      throw new IllegalArgumentException("demand current " + demandA + " A, must be above 0");
    }
    PublishedTable table =
        nominalLineV <= 69_000 ? TABLE_2 : nominalLineV <= 161_000 ? TABLE_3 : TABLE_4;
    return new CurrentDistortion519(edition, table, shortCircuitA / demandA);
  }

  /** Limit of one order, percent of I_L. */
  public double orderLimitPercent(int order) {
    return row.number(band(order)) * edition.partOfBand(order);
  }

  /** Limit of the total demand distortion, percent of I_L. */
  public double tddLimitPercent() {
    return row.number("tdd");
  }

  /** Short-circuit current on demand current. */
  public double shortCircuitRatio() {
    return ratio;
  }

  /** Document, edition, clause and table. */
  public String basis() {
    return edition.basis(table);
  }

  /**
   * Judges line currents: at most one finding on single orders, naming the worst, and one on TDD.
   *
   * @param lines line currents at the node, amps
   * @param demandA demand current I_L, amps
   */
  public List<Finding> judge(
      Map<Conductor, Spectrum> lines, double demandA, AssessmentPoint place) {
    return Judgement.findings(checks(lines, demandA, place));
  }

  /** The checks behind {@link #judge}: the worst order, and TDD; none on a generator. */
  public List<Check> checks(Map<Conductor, Spectrum> lines, double demandA, AssessmentPoint place) {
    List<Check> checks = new ArrayList<>();
    place
        .rule()
        .ifPresent(
            rule -> {
              orders(lines, demandA)
                  .max(Comparator.comparingDouble(OrderFigure::ofLimit))
                  .map(worst -> orderCheck(lines, demandA, place, worst, rule))
                  .ifPresent(checks::add);
              checks.add(tddCheck(lines, demandA, place, rule));
            });
    return checks;
  }

  private Check orderCheck(
      Map<Conductor, Spectrum> lines,
      double demandA,
      AssessmentPoint place,
      OrderFigure worst,
      Check.Rule rule) {
    return new Check(
        FindingCode.CURRENT_ORDER,
        "",
        rule,
        worst.percent(),
        worst.limit(),
        "%",
        basis(),
        () -> orderSentence(lines, demandA, place, worst));
  }

  private String orderSentence(
      Map<Conductor, Spectrum> lines, double demandA, AssessmentPoint place, OrderFigure worst) {
    long over =
        orders(lines, demandA)
            .filter(o -> o.percent() > o.limit())
            .mapToInt(OrderFigure::order)
            .distinct()
            .count();
    return "The %s harmonic of %s is %s %% of the demand current; %s allows %s %% at this short-circuit ratio (%s).%s%s"
        .formatted(
            Words.ordinal(worst.order()),
            worst.line(),
            Words.number(worst.percent()),
            edition.document(),
            Words.number(worst.limit()),
            Words.number(ratio),
            over > 1 ? " " + over + " orders are over their limits." : "",
            place.remark());
  }

  private Stream<OrderFigure> orders(Map<Conductor, Spectrum> lines, double demandA) {
    return lines.entrySet().stream()
        .flatMap(
            line ->
                IntStream.rangeClosed(2, Spectrum.HIGHEST_ORDER)
                    .mapToObj(
                        h ->
                            new OrderFigure(
                                line.getKey().name(),
                                h,
                                100 * line.getValue().magnitude(h) / demandA,
                                orderLimitPercent(h))));
  }

  private Check tddCheck(
      Map<Conductor, Spectrum> lines, double demandA, AssessmentPoint place, Check.Rule rule) {
    double limit = tddLimitPercent();
    double worst =
        lines.values().stream()
            .mapToDouble(line -> Distortion.tddPercent(line, demandA).value().orElse(0))
            .max()
            .orElse(0);
    return new Check(
        FindingCode.CURRENT_TDD,
        "",
        rule,
        worst,
        limit,
        "%",
        basis(),
        () ->
            "Total demand distortion is %s %%; %s allows %s %% at this short-circuit ratio (%s).%s"
                .formatted(
                    Words.number(worst),
                    edition.document(),
                    Words.number(limit),
                    Words.number(ratio),
                    place.remark()));
  }

  private static String band(int order) {
    if (order < 2 || order > Spectrum.HIGHEST_ORDER) {
      throw new IllegalArgumentException("no limit for order " + order);
    }
    if (order < 11) {
      return "from_2";
    }
    return order < 17 ? "from_11" : order < 23 ? "from_17" : order < 35 ? "from_23" : "from_35";
  }

  private static PublishedTable.Row rowOf(PublishedTable table, double ratio) {
    PublishedTable.Row found = table.rows().get(0);
    for (PublishedTable.Row row : table.rows()) {
      boolean strictly = row.text("isc_over_il").equals(">1000");
      double bound = row.number("at_least");
      if (strictly ? ratio > bound : ratio >= bound) {
        found = row;
      }
    }
    return found;
  }

  private static PublishedTable table(String name) {
    return PublishedTable.beside(CurrentDistortion519.class, name);
  }
}
