package fourthwire.validation;

import static fourthwire.validation.QuantityChecks.known;

import fourthwire.limits.distortion.CurrentDistortion519;
import fourthwire.limits.distortion.Edition519;
import fourthwire.limits.distortion.VoltageDistortion;
import fourthwire.limits.equipment.Equipment;
import fourthwire.limits.equipment.EquipmentLimits;
import fourthwire.limits.equipment.EquipmentUse;
import fourthwire.limits.loading.AmpacityRule;
import fourthwire.limits.loading.ConductorRating;
import fourthwire.limits.loading.CurrentCarryingCount;
import fourthwire.limits.loading.NeutralCase;
import fourthwire.limits.loading.NeutralLoading;
import fourthwire.limits.loading.TransformerCase;
import fourthwire.limits.loading.TransformerLoading;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Phasor;
import fourthwire.quantity.Spectrum;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.ToDoubleFunction;
import java.util.stream.Stream;

/** The limits and loadings that validation files ask for, by name. */
final class LimitChecks {
  private LimitChecks() {}

  static Map<String, ToDoubleFunction<Inputs>> all() {
    Map<String, ToDoubleFunction<Inputs>> checks = new HashMap<>();
    checks.put("IEEE 519 order limit", in -> limits519(in).orderLimitPercent(in.whole("h")));
    checks.put("IEEE 519 TDD limit", in -> limits519(in).tddLimitPercent());
    checks.put("IEEE 519 voltage THD limit", in -> voltage519(in).thdLimitPercent());
    checks.put(
        "IEEE 519 voltage order limit",
        in -> voltage519(in).orderLimitPercent(in.whole("h")).orElseThrow());
    checks.put(
        "EN 50160 order limit",
        in ->
            VoltageDistortion.en50160(in.number("line_v"))
                .orderLimitPercent(in.whole("h"))
                .orElseThrow());
    checks.put("IEC 61000-3-2 order limit", LimitChecks::smallEquipment);
    checks.put("IEC 61000-3-12 order limit", LimitChecks::largeEquipment);
    checks.put("Annex E required ampacity", in -> annexE(in).requiredAmpacityA());
    checks.put("adjusted ampacity", LimitChecks::adjustedAmpacity);
    checks.put("adjusted neutral ampacity", in -> adjustedNeutral(in));
    checks.put("derated A", in -> known(transformer(in).deratedA()));
    checks.put("derated kVA", in -> known(transformer(in).deratedKva()));
    return checks;
  }

  private static double smallEquipment(Inputs in) {
    EquipmentUse use =
        Stream.of(EquipmentUse.values())
            .filter(u -> u.word().equals(in.text("use")))
            .findFirst()
            .orElseThrow();
    Equipment equipment = new Equipment(use, in.number("w"), 5, false, 230, OptionalDouble.empty());
    Spectrum current = orders(in.has("i1") ? in.number("i1") : 5, 0.1);
    return equipmentLimit(equipment, current, in.whole("h"));
  }

  private static double largeEquipment(Inputs in) {
    double a = in.number("a");
    Equipment equipment =
        new Equipment(
            EquipmentUse.OTHER,
            690 * a,
            a,
            in.text("balanced").equals("yes"),
            230,
            OptionalDouble.of(in.number("rsce")));
    Spectrum current =
        new Inputs("i=1:" + a + " 5:" + (in.has("fifth") ? in.text("fifth") : "15@0"))
            .spectrum("i");
    return equipmentLimit(equipment, current, in.whole("h"));
  }

  private static double equipmentLimit(Equipment equipment, Spectrum current, int order) {
    return EquipmentLimits.judge(equipment, current).order(order).orElseThrow().limitA();
  }

  private static CurrentDistortion519 limits519(Inputs in) {
    double ratio = in.number("isc_il");
    return CurrentDistortion519.of(edition(in), in.number("line_v"), 100 * ratio, 100);
  }

  private static VoltageDistortion voltage519(Inputs in) {
    return VoltageDistortion.ieee519(edition(in), in.number("line_v"));
  }

  private static Edition519 edition(Inputs in) {
    return Edition519.valueOf("IEEE_519_" + in.text("edition"));
  }

  /** A balanced cable: line rms and third content as printed, the neutral as printed. */
  private static NeutralLoading annexE(Inputs in) {
    double lineA = in.number("line_a");
    double third = in.number("third_pct") / 100;
    double fundamental = lineA / Math.sqrt(1 + third * third);
    Spectrum line = orders(fundamental, third * fundamental);
    Spectrum neutral = orders(0, in.number("neutral_a"));
    return NeutralLoading.of(
        fourWire(AmpacityRule.THIRD_HARMONIC_CONTENT, line, neutral, List.of(), 1));
  }

  private static double adjustedAmpacity(Inputs in) {
    return in.number("ampacity_a") * CurrentCarryingCount.percent(in.whole("count")) / 100;
  }

  /** A four-wire wye feeder to mostly nonlinear loads. */
  private static double adjustedNeutral(Inputs in) {
    List<ConductorRating> ratings =
        List.of(new ConductorRating("feeder", in.number("ampacity_a"), true));
    NeutralLoading loading =
        NeutralLoading.of(
            fourWire(
                AmpacityRule.CURRENT_CARRYING_COUNT,
                orders(10, 5),
                orders(0, 15),
                ratings,
                in.number("nonlinear")));
    return known(loading.neutral().orElseThrow().adjustedAmpacityA());
  }

  private static NeutralCase fourWire(
      AmpacityRule rule,
      Spectrum line,
      Spectrum neutral,
      List<ConductorRating> ratings,
      double nonlinearShare) {
    return new NeutralCase(
        rule,
        Map.of(Conductor.L1, line, Conductor.L2, line, Conductor.L3, line),
        Optional.of(neutral),
        ratings,
        ratings,
        nonlinearShare,
        true);
  }

  private static TransformerLoading transformer(Inputs in) {
    return TransformerLoading.of(
        new TransformerCase(
            in.number("rated_kva"),
            in.number("rated_a"),
            List.of(in.spectrum("i")),
            in.number("eddy"),
            OptionalDouble.empty()));
  }

  private static Spectrum orders(double fundamental, double third) {
    return Spectrum.of(h -> new Phasor(h == 1 ? fundamental : h == 3 ? third : 0, 0));
  }
}
