package fourthwire.limits.equipment;

import fourthwire.quantity.Distortion;
import fourthwire.quantity.PublishedTable;
import fourthwire.quantity.Spectrum;
import fourthwire.quantity.Waveform;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.OptionalDouble;

/**
 * Lighting of 5 to 25 W, which meets IEC 61000-3-2 if it keeps to any of three sets of limits
 * (clause 7.4.3, from memory): those of class D for each watt; a larger third and fifth with a
 * current that starts early and lasts past the crest; or a THD with limits to the 11th.
 *
 * <p>The timing of the second is read from the waveform of orders 1 to 50: by 60° after the
 * voltage's crossing the current passes 5 % of its peak, the last peak lies by 65°, and it does not
 * fall under 5 % before 90°.
 */
final class SmallLighting {
  private static final PublishedTable TABLE =
      PublishedTable.beside(SmallLighting.class, "iec61000-3-2-small-lighting.csv");
  private static final int SAMPLES = 1440;

  private SmallLighting() {}

  /** The set that is kept; where none is, the one that is nearest to it. */
  static EquipmentJudgement judge(Equipment equipment, Spectrum current) {
    return List.of(first(equipment, current), second(current), third(current)).stream()
        .min(
            Comparator.comparing((EquipmentJudgement j) -> !j.met())
                .thenComparing(j -> j.met() ? 0 : j.ofLimit()))
        .orElseThrow();
  }

  private static EquipmentJudgement first(Equipment equipment, Spectrum current) {
    return judgement(
        "first option: the figures of class D",
        TABLE.basis() + "; " + SmallEquipment.classDBasis(),
        SmallEquipment.classDOrders(equipment, current),
        List.of());
  }

  private static EquipmentJudgement second(Spectrum current) {
    return judgement("second option", TABLE.basis(), orders(2, current), timing(current));
  }

  private static EquipmentJudgement third(Spectrum current) {
    double limit = find(3, "THD").orElseThrow();
    double thd = Distortion.thdPercent(current).value().orElse(0);
    return judgement(
        "third option",
        TABLE.basis(),
        orders(3, current),
        List.of(TotalLimit.atMost("THD", thd, limit, "%")));
  }

  private static EquipmentJudgement judgement(
      String option, String basis, List<OrderLimit> orders, List<TotalLimit> totals) {
    return new EquipmentJudgement(
        SmallEquipment.DOCUMENT + ", class C, 5 to 25 W",
        basis,
        "it is lighting of 5 to 25 W, which may keep to any of three sets of limits; the "
            + option
            + " is the nearest",
        orders,
        totals);
  }

  private static List<OrderLimit> orders(int option, Spectrum current) {
    return SmallEquipment.orders(
        current,
        h -> SmallEquipment.times(find(option, Integer.toString(h)), current.magnitude(1) / 100));
  }

  private static OptionalDouble find(int option, String order) {
    return TABLE.rows().stream()
        .filter(row -> row.number("option") == option && row.text("order").equals(order))
        .mapToDouble(row -> row.number("limit"))
        .findFirst();
  }

  /** The half cycle of positive current, from the voltage's upward crossing on. */
  private static List<TotalLimit> timing(Spectrum current) {
    double[] wave = Waveform.of(current, SAMPLES).toArray();
    double peak = 0;
    int peakAt = 0;
    for (int k = 0; k < SAMPLES / 2; k++) {
      if (wave[k] > peak) {
        peak = wave[k];
        peakAt = k;
      }
    }
    double flows =
        peak
            * SmallEquipment.threshold("small lighting: share of the peak that counts as flowing")
            / 100;
    int start = 0;
    while (start < peakAt && wave[start] <= flows) {
      start++;
    }
    int end = peakAt;
    while (end < SAMPLES / 2 && wave[end] > flows) {
      end++;
    }
    List<TotalLimit> limits = new ArrayList<>();
    limits.add(by("current flows by", degrees(start)));
    limits.add(by("last peak by", degrees(peakAt)));
    limits.add(
        new TotalLimit(
            "no end before",
            degrees(end),
            SmallEquipment.threshold("small lighting: no end before"),
            "°",
            true));
    return limits;
  }

  private static TotalLimit by(String name, double degrees) {
    return TotalLimit.atMost(
        name, degrees, SmallEquipment.threshold("small lighting: " + name), "°");
  }

  private static double degrees(int sample) {
    return 360.0 * sample / SAMPLES;
  }
}
