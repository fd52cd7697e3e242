package fourthwire.limits.equipment;

import fourthwire.limits.Words;
import fourthwire.quantity.PublishedTable;
import fourthwire.quantity.Spectrum;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.IntFunction;
import java.util.stream.IntStream;
import java.util.stream.Stream;

/**
 * IEC 61000-3-2: equipment to 16 A a line, by class.
 *
 * <p>Orders 2 to 40. A current under 0.6 % of the input current or under 5 mA, whichever is larger,
 * is not counted (clause 6.3.3, from memory). The 2018 edition leads: its fixed third for lighting,
 * and limits for lighting from 5 W.
 */
final class SmallEquipment {
  static final String DOCUMENT = "IEC 61000-3-2";
  static final int HIGHEST_ORDER = 40;

  private static final OrderTable CLASS_A = new OrderTable("iec61000-3-2-class-a.csv");
  private static final OrderTable CLASS_C = new OrderTable("iec61000-3-2-class-c.csv");
  private static final OrderTable CLASS_D = new OrderTable("iec61000-3-2-class-d.csv");
  private static final PublishedTable THRESHOLDS =
      PublishedTable.beside(SmallEquipment.class, "iec61000-3-2-thresholds.csv");
  private static final double CLASS_B_TIMES = 1.5;

  private SmallEquipment() {}

  static double largestA() {
    return threshold("largest line current");
  }

  static EquipmentJudgement judge(Equipment equipment, Spectrum current) {
    Optional<String> free = free(equipment);
    if (free.isPresent()) {
      return EquipmentJudgement.none(DOCUMENT + ": no limits", THRESHOLDS.basis(), free.get());
    }
    if (equipment.balancedThreePhase()) {
      return classA(current, "it is balanced three-phase equipment");
    }
    return switch (equipment.use()) {
      case LIGHTING ->
          equipment.ratedW() <= threshold("largest power of small lighting")
              ? SmallLighting.judge(equipment, current)
              : classC(current);
      case COMPUTER, COOLING ->
          equipment.ratedW() <= threshold("largest power of class D")
              ? classD(equipment, current)
              : classA(current, "over 600 W it is no longer class D");
      case PORTABLE_TOOL -> classB(current);
      default -> classA(current, "it is of no other class");
    };
  }

  /** Why no limits hold, where that is so. */
  private static Optional<String> free(Equipment e) {
    double leastW =
        threshold(
            e.use() == EquipmentUse.LIGHTING
                ? "least power of lighting"
                : "least power other than lighting");
    boolean lighting = e.use() == EquipmentUse.LIGHTING;
    if (e.lineToNeutralV() < threshold("least voltage line to neutral")) {
      return Optional.of("it sets none below 220 V line to neutral");
    }
    if (lighting ? e.ratedW() < leastW : e.ratedW() <= leastW) {
      return Optional.of(
          lighting ? "it sets none for lighting under 5 W" : "it sets none up to 75 W");
    }
    return freeAbove(e, EquipmentUse.PROFESSIONAL, "limited professional equipment")
        .or(() -> freeUpTo(e, EquipmentUse.DIMMER, "free dimmers"))
        .or(() -> freeUpTo(e, EquipmentUse.HEATING_CONTROL, "free heating controls"));
  }

  private static Optional<String> freeAbove(Equipment e, EquipmentUse use, String what) {
    double watts = threshold("largest power of " + what);
    return Optional.of("it sets none for professional equipment over " + text(watts) + " W")
        .filter(x -> e.use() == use && e.ratedW() > watts);
  }

  private static Optional<String> freeUpTo(Equipment e, EquipmentUse use, String what) {
    double watts = threshold("largest power of " + what);
    String things =
        use == EquipmentUse.DIMMER
            ? "dimmers of incandescent lamps"
            : "symmetrical heating controls";
    return Optional.of("it sets none for " + things + " up to " + text(watts) + " W")
        .filter(x -> e.use() == use && e.ratedW() <= watts);
  }

  private static EquipmentJudgement classA(Spectrum current, String reason) {
    return judgement("class A", CLASS_A.table().basis(), reason, orders(current, CLASS_A::at));
  }

  private static EquipmentJudgement classB(Spectrum current) {
    return judgement(
        "class B",
        CLASS_A.table().document() + ", clause 7.3: 1.5 times Table 1",
        "it is a portable tool or a welder that is not for professionals",
        orders(current, h -> times(CLASS_A.at(h), CLASS_B_TIMES)));
  }

  private static EquipmentJudgement classC(Spectrum current) {
    return judgement(
        "class C",
        CLASS_C.table().basis(),
        "it is lighting over 25 W",
        orders(current, h -> times(CLASS_C.at(h), current.magnitude(1) / 100)));
  }

  private static EquipmentJudgement classD(Equipment equipment, Spectrum current) {
    String reason =
        equipment.use() == EquipmentUse.COOLING
            ? "it is a fridge or freezer with a variable-speed drive, to 600 W"
            : "it is a computer, monitor or television to 600 W";
    return judgement("class D", CLASS_D.table().basis(), reason, classDOrders(equipment, current));
  }

  /** Milliamps for each watt, and never more than class A. */
  static List<OrderLimit> classDOrders(Equipment equipment, Spectrum current) {
    return orders(
        current,
        h -> {
          OptionalDouble amps = times(CLASS_D.at(h), equipment.ratedW() / 1000);
          return amps.isPresent()
              ? OptionalDouble.of(Math.min(amps.getAsDouble(), CLASS_A.at(h).orElseThrow()))
              : amps;
        });
  }

  static String classDBasis() {
    return CLASS_D.table().basis();
  }

  private static EquipmentJudgement judgement(
      String group, String basis, String reason, List<OrderLimit> orders) {
    return new EquipmentJudgement(DOCUMENT + ", " + group, basis, reason, orders, List.of());
  }

  static List<OrderLimit> orders(Spectrum current, IntFunction<OptionalDouble> limitA) {
    double counts =
        Math.max(
            threshold("disregarded current"),
            threshold("disregarded part of the input current") / 100 * current.rms());
    return IntStream.rangeClosed(2, HIGHEST_ORDER)
        .boxed()
        .flatMap(
            h ->
                limitA.apply(h).stream()
                    .mapToObj(
                        limit ->
                            new OrderLimit(
                                h, current.magnitude(h), limit, current.magnitude(h) < counts)))
        .toList();
  }

  static double threshold(String item) {
    return THRESHOLDS.rows().stream()
        .filter(row -> row.text("item").equals(item))
        .findFirst()
        .orElseThrow()
        .number("value");
  }

  static OptionalDouble times(OptionalDouble value, double factor) {
    return Stream.of(value)
        .filter(OptionalDouble::isPresent)
        .mapToDouble(v -> v.getAsDouble() * factor)
        .findFirst();
  }

  private static String text(double watts) {
    return Words.number(watts);
  }
}
