package fourthwire.limits.distortion;

import fourthwire.limits.Check;
import fourthwire.limits.Finding;
import fourthwire.limits.FindingCode;
import fourthwire.limits.Judgement;
import fourthwire.limits.Words;
import fourthwire.quantity.PublishedTable;
import fourthwire.quantity.Spectrum;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.IntFunction;
import java.util.stream.IntStream;
import java.util.stream.Stream;

/**
 * Voltage distortion limits of one document at one voltage: single orders and THD, percent of the
 * fundamental. (IEEE 519 refers them to the rated voltage; at a voltage within its band the
 * difference is a few percent of the figure.)
 */
public final class VoltageDistortion {
  private static final PublishedTable TABLE_519 = table("ieee519-table-1.csv");
  private static final PublishedTable PLANT = table("iec61000-2-4.csv");
  private static final PublishedTable PUBLIC = table("en50160.csv");

  private final String document;
  private final String basis;
  private final IntFunction<OptionalDouble> orders;
  private final double thd;
  private final int highestThdOrder;
  private final boolean everywhere;

  private VoltageDistortion(
      String document,
      String basis,
      IntFunction<OptionalDouble> orders,
      double thd,
      int highestThdOrder,
      boolean everywhere) {
    this.document = document;
    this.basis = basis;
    this.orders = orders;
    this.thd = thd;
    this.highestThdOrder = highestThdOrder;
    this.everywhere = everywhere;
  }

  /** IEEE 519, clause 5.1, Table 1, by nominal line-to-line voltage; binds at common coupling. */
  public static VoltageDistortion ieee519(Edition519 edition, double nominalLineV) {
    double kv = nominalLineV / 1000;
    PublishedTable.Row row =
        TABLE_519.rows().stream()
            .filter(r -> kv <= r.optional("up_to_kv").orElse(Double.POSITIVE_INFINITY))
            .findFirst()
            .orElseThrow();
    OptionalDouble individual = row.optional("individual");
    return new VoltageDistortion(
        edition.document(),
        edition.basis(TABLE_519),
        h -> individual,
        row.number("thd"),
        Spectrum.HIGHEST_ORDER,
        false);
  }

  /**
   * Compatibility levels of IEC 61000-2-4 for plants; they hold at every point inside.
   *
   * @param environmentClass 1 sensitive equipment, 2 general, 3 heavy converter loads
   */
  public static VoltageDistortion iec61000x2x4(int environmentClass) {
    return perOrder(PLANT, "class_" + environmentClass, ", class " + environmentClass, 50, true);
  }

  /** EN 50160, what a public supply keeps; binds at the supply terminals. */
  public static VoltageDistortion en50160(double nominalLineV) {
    boolean low = nominalLineV <= 1000;
    return perOrder(PUBLIC, low ? "low_voltage" : "medium_voltage", "", 40, false);
  }

  private static VoltageDistortion perOrder(
      PublishedTable table, String column, String suffix, int highestThdOrder, boolean everywhere) {
    return new VoltageDistortion(
        table.document() + suffix,
        table.document() + suffix + table.basis().substring(table.document().length()),
        h -> cell(table, column, Integer.toString(h)),
        cell(table, column, "THD").orElseThrow(),
        highestThdOrder,
        everywhere);
  }

  /** Limit of one order, percent of the fundamental; empty where the document gives none. */
  public OptionalDouble orderLimitPercent(int order) {
    return orders.apply(order);
  }

  /** Limit of THD, percent. */
  public double thdLimitPercent() {
    return thd;
  }

  /** Document, edition, clause and table. */
  public String basis() {
    return basis;
  }

  /**
   * Judges voltages: at most one finding on single orders, naming the worst, and one on THD.
   *
   * @param voltages by name, {@code L1} to neutral or {@code L1-L2}
   */
  public List<Finding> judge(Map<String, Spectrum> voltages, AssessmentPoint place) {
    return Judgement.findings(checks(voltages, place));
  }

  /** The checks behind {@link #judge}: the worst order, and THD. */
  public List<Check> checks(Map<String, Spectrum> voltages, AssessmentPoint place) {
    AssessmentPoint binding =
        everywhere && place != AssessmentPoint.COMMON_COUPLING
            ? AssessmentPoint.COMMON_COUPLING
            : place;
    List<Check> checks = new ArrayList<>();
    binding
        .rule()
        .ifPresent(
            rule -> {
              worstOrder(voltages)
                  .map(worst -> orderCheck(worst, binding, rule))
                  .ifPresent(checks::add);
              checks.add(thdCheck(voltages, binding, rule));
            });
    return checks;
  }

  private Optional<OrderFigure> worstOrder(Map<String, Spectrum> voltages) {
    return voltages.entrySet().stream()
        .filter(voltage -> voltage.getValue().magnitude(1) > 0)
        .flatMap(voltage -> figures(voltage.getKey(), voltage.getValue()))
        .max(Comparator.comparingDouble(OrderFigure::ofLimit));
  }

  private Stream<OrderFigure> figures(String name, Spectrum voltage) {
    double fundamental = voltage.magnitude(1);
    return IntStream.rangeClosed(2, Spectrum.HIGHEST_ORDER)
        .filter(h -> orderLimitPercent(h).isPresent())
        .mapToObj(
            h ->
                new OrderFigure(
                    name,
                    h,
                    100 * voltage.magnitude(h) / fundamental,
                    orderLimitPercent(h).getAsDouble()));
  }

  private Check orderCheck(OrderFigure worst, AssessmentPoint place, Check.Rule rule) {
    return new Check(
        FindingCode.VOLTAGE_ORDER,
        document,
        rule,
        worst.percent(),
        worst.limit(),
        "%",
        basis,
        () ->
            "The %s harmonic of the voltage %s is %s %%; %s allows %s %%.%s"
                .formatted(
                    Words.ordinal(worst.order()),
                    worst.line(),
                    Words.number(worst.percent()),
                    document,
                    Words.number(worst.limit()),
                    place.remark()));
  }

  private Check thdCheck(Map<String, Spectrum> voltages, AssessmentPoint place, Check.Rule rule) {
    double worst = voltages.values().stream().mapToDouble(this::thdPercent).max().orElse(0);
    return new Check(
        FindingCode.VOLTAGE_THD,
        document,
        rule,
        worst,
        thd,
        "%",
        basis,
        () ->
            "Total harmonic distortion of the voltage is %s %%; %s allows %s %%.%s"
                .formatted(Words.number(worst), document, Words.number(thd), place.remark()));
  }

  /** To the highest order the document counts. */
  private double thdPercent(Spectrum voltage) {
    double fundamental = voltage.magnitude(1);
    double sum = 0;
    for (int h = 2; h <= highestThdOrder; h++) {
      sum += voltage.magnitude(h) * voltage.magnitude(h);
    }
    return fundamental > 0 ? 100 * Math.sqrt(sum) / fundamental : 0;
  }

  private static OptionalDouble cell(PublishedTable table, String column, String order) {
    return table.rows().stream()
        .filter(row -> row.text("order").equals(order))
        .map(row -> row.optional(column))
        .findFirst()
        .orElse(OptionalDouble.empty());
  }

  private static PublishedTable table(String name) {
    return PublishedTable.beside(VoltageDistortion.class, name);
  }
}
