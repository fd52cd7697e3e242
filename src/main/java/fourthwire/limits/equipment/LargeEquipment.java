package fourthwire.limits.equipment;

import fourthwire.quantity.PublishedTable;
import fourthwire.quantity.Spectrum;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import java.util.function.ToDoubleFunction;

/**
 * IEC 61000-3-12: equipment over 16 A to 75 A a line, by the short-circuit ratio R_sce where it
 * will stand: Table 2 for other than balanced three-phase equipment, Table 3 for balanced, Table 4
 * where a condition on its 5th and 7th holds (figures from memory).
 *
 * <p>Figures are percent of the reference current, interpolated between rows of R_sce; even orders
 * to 12 are limited to 16/n percent. THC is the rms of orders 2 to 40, PWHC is √Σ n·I_n² of orders
 * 14 to 40. Not covered: condition b (no preferred angle of the 5th, which no single computation
 * shows) and Table 5, whose figures above R_sce 33 could not be recalled.
 */
final class LargeEquipment {
  private static final PublishedTable OTHER = table(2);
  private static final PublishedTable BALANCED = table(3);
  private static final PublishedTable CONDITIONAL = table(4);

  /** Where the scope is printed. */
  static final String SCOPE = BALANCED.document() + ", clause 1 (from memory)";

  private static final int[] ODD = {3, 5, 7, 9, 11, 13};
  private static final int HIGHEST_EVEN = 12;
  private static final int FROM_WEIGHTED = 14;

  private LargeEquipment() {}

  static EquipmentJudgement judge(Equipment equipment, Spectrum current) {
    if (equipment.balancedThreePhase()
        && (fifthAndSeventhSmall(equipment, current) || fifthEarly(current))) {
      return judge(CONDITIONAL, equipment, current, condition(equipment, current));
    }
    return equipment.balancedThreePhase()
        ? judge(
            BALANCED,
            equipment,
            current,
            "it is balanced three-phase equipment over 16 A a line, and neither condition a nor c"
                + " of Table 4 holds (condition b and Table 5 are not judged here)")
        : judge(OTHER, equipment, current, "it is over 16 A a line and not balanced three-phase");
  }

  private static String condition(Equipment equipment, Spectrum current) {
    return "it is balanced three-phase equipment over 16 A a line, and "
        + (fifthAndSeventhSmall(equipment, current)
            ? "its 5th and 7th are each under 5 % (condition a)"
            : "its 5th stands between 90 and 150 degrees (condition c)");
  }

  /** Condition a. */
  private static boolean fifthAndSeventhSmall(Equipment equipment, Spectrum current) {
    return current.magnitude(5) < 0.05 * equipment.ratedA()
        && current.magnitude(7) < 0.05 * equipment.ratedA();
  }

  /** Condition c. */
  private static boolean fifthEarly(Spectrum current) {
    double degrees = current.at(5).degrees();
    return degrees >= 90 && degrees <= 150;
  }

  private static EquipmentJudgement judge(
      PublishedTable table, Equipment equipment, Spectrum current, String reason) {
    double ratio = equipment.shortCircuitRatio().orElse(leastRatio(table));
    double reference = equipment.ratedA();
    ToDoubleFunction<String> percent = column -> at(table, column, ratio);
    List<OrderLimit> orders = new ArrayList<>();
    for (int h = 2; h <= ODD[ODD.length - 1]; h++) {
      OptionalDouble limit = orderPercent(table, h, percent);
      if (limit.isPresent()) {
        double amps = limit.getAsDouble() / 100 * reference;
        orders.add(new OrderLimit(h, current.magnitude(h), amps, false));
      }
    }
    List<TotalLimit> totals =
        List.of(
            TotalLimit.atMost(
                "THC", 100 * totalA(current) / reference, percent.applyAsDouble("THC"), "%"),
            TotalLimit.atMost(
                "PWHC", 100 * weightedA(current) / reference, percent.applyAsDouble("PWHC"), "%"));
    return new EquipmentJudgement(
        table.document().replace(":2011", "") + ", " + tableName(table),
        table.basis(),
        reason + ratioRemark(equipment, table),
        orders,
        totals);
  }

  private static String ratioRemark(Equipment equipment, PublishedTable table) {
    OptionalDouble ratio = equipment.shortCircuitRatio();
    if (ratio.isEmpty()) {
      return "; for any supply with a short-circuit ratio of 33 or more";
    }
    String number = fourthwire.limits.Words.number(ratio.getAsDouble());
    return ratio.getAsDouble() < leastRatio(table)
        ? "; the short-circuit ratio of "
            + number
            + " is under 33, for which no limits are printed"
            + ": those of 33 are shown"
        : "; short-circuit ratio " + number;
  }

  private static OptionalDouble orderPercent(
      PublishedTable table, int order, ToDoubleFunction<String> percent) {
    if (order % 2 == 0) {
      return order <= HIGHEST_EVEN ? OptionalDouble.of(16.0 / order) : OptionalDouble.empty();
    }
    boolean printed = table == OTHER || (order % 3 != 0);
    return printed
        ? OptionalDouble.of(percent.applyAsDouble(Integer.toString(order)))
        : OptionalDouble.empty();
  }

  /** Linear between printed rows, level beyond them. */
  private static double at(PublishedTable table, String column, double ratio) {
    PublishedTable.Row below = table.rows().get(0);
    for (PublishedTable.Row row : table.rows()) {
      double from = below.number("rsce_min");
      double to = row.number("rsce_min");
      if (ratio < to) {
        double share = to > from ? Math.max(0, (ratio - from) / (to - from)) : 0;
        return below.number(column) + share * (row.number(column) - below.number(column));
      }
      below = row;
    }
    return below.number(column);
  }

  private static double leastRatio(PublishedTable table) {
    return table.rows().get(0).number("rsce_min");
  }

  private static double totalA(Spectrum current) {
    double sum = 0;
    for (int h = 2; h <= SmallEquipment.HIGHEST_ORDER; h++) {
      sum += current.magnitude(h) * current.magnitude(h);
    }
    return Math.sqrt(sum);
  }

  private static double weightedA(Spectrum current) {
    double sum = 0;
    for (int h = FROM_WEIGHTED; h <= SmallEquipment.HIGHEST_ORDER; h++) {
      sum += h * current.magnitude(h) * current.magnitude(h);
    }
    return Math.sqrt(sum);
  }

  private static String tableName(PublishedTable table) {
    return table.clause().substring(table.clause().indexOf("Table"));
  }

  private static PublishedTable table(int number) {
    return PublishedTable.beside(LargeEquipment.class, "iec61000-3-12-table-" + number + ".csv");
  }
}
