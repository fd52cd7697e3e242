package fourthwire.metering.log;

import static fourthwire.metering.QualityFinding.DISTORTION_MISREAD;
import static fourthwire.metering.QualityFinding.WRONG_RATIO;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.function.IntToDoubleFunction;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * Harmonics of a current or voltage against what else is logged of it: an rms that they do not
 * make, a distortion that is not theirs. Thresholds are common practice, no source.
 */
final class HarmonicRelation {
  private static final Pattern HARMONIC =
      Pattern.compile("(.+)\\.(current|voltage)_h(\\d+)_(a|v|percent)");

  /** Last digits that harmonics make together, at least, so that rounding is no distortion. */
  private static final double FEWEST_DIGITS = 10;

  /** How far a true distortion never stays from its harmonics. */
  private static final double SMOOTHED = 0.03;

  private final FlaggedDays flagged;
  private final List<String> names;
  private final Map<String, Map<Integer, Integer>> harmonics = new LinkedHashMap<>();

  HarmonicRelation(List<String> names, FlaggedDays flagged) {
    this.names = names;
    this.flagged = flagged;
    for (int q = 0; q < names.size(); q++) {
      Matcher m = HARMONIC.matcher(names.get(q));
      if (m.matches()) {
        harmonics
            .computeIfAbsent(
                m.group(1) + "." + m.group(2) + " " + m.group(4), key -> new LinkedHashMap<>())
            .put(Integer.parseInt(m.group(3)), q);
      }
    }
  }

  void look(LogDay day) {
    harmonics.forEach((key, orders) -> look(day, key, orders));
  }

  private void look(LogDay day, String key, Map<Integer, Integer> orders) {
    String place = key.substring(0, key.lastIndexOf('.'));
    boolean current = key.contains(".current");
    boolean percent = key.endsWith("percent");
    Optional<double[]> rms = day.find(place + (current ? ".rms_a" : ".rms_v"));
    double[] first = orders.containsKey(1) ? day.of(orders.get(1)) : new double[0];
    List<double[]> above = new ArrayList<>();
    orders.forEach(
        (order, q) -> {
          if (order > 1) {
            above.add(day.of(q));
          }
        });
    if (above.size() < 3) {
      return;
    }
    double[] sum = rootSum(above, day.rows());
    if (!percent && first.length > 0 && rms.isPresent()) {
      againstRms(day, place, current, first, sum, rms.get());
    }
    double digit = above.stream().mapToDouble(Rows::leastStep).max().orElse(0);
    double[] told = new double[sum.length];
    Arrays.setAll(told, k -> sum[k] > FEWEST_DIGITS * digit ? sum[k] : Double.NaN);
    distortion(day, place + (current ? ".current" : ".voltage"), percent, first, told, rms);
  }

  private static double[] rootSum(List<double[]> all, int rows) {
    double[] sum = new double[rows];
    for (double[] x : all) {
      for (int k = 0; k < rows; k++) {
        sum[k] += Double.isNaN(x[k]) ? 0 : x[k] * x[k];
      }
    }
    Arrays.setAll(sum, k -> Math.sqrt(sum[k]));
    return sum;
  }

  private void againstRms(
      LogDay day, String place, boolean current, double[] first, double[] sum, double[] rms) {
    double ratio = Rows.loaded(rms, k -> rms[k] / Math.hypot(first[k], sum[k]));
    if (ratio < 0.93 || ratio > 1.15) {
      flagged.add(
          day,
          new FlaggedDays.Fault(
              WRONG_RATIO,
              place + (current ? " rms" : " rms_v"),
              "Either this rms or its harmonics are wrong by that factor.",
              String.format(
                  Locale.ROOT,
                  "The rms %s of %s is %.3g times what its harmonics make (median of the day): a"
                      + " wrong ratio, a line under another's name, or an average-responding"
                      + " instrument.",
                  current ? "current" : "voltage",
                  place,
                  ratio),
              rows ->
                  List.of(
                      Offers.scale(List.of(place + (current ? ".rms_a" : ".rms_v")), ratio, rows),
                      Offers.scale(ordersOf(place, current), 1 / ratio, rows))));
    }
  }

  private List<String> ordersOf(String place, boolean current) {
    String start = place + (current ? ".current_h" : ".voltage_h");
    return names.stream()
        .filter(n -> n.startsWith(start) && n.endsWith(current ? "_a" : "_v"))
        .toList();
  }

  /** The distortion logged against the one that the harmonics make. */
  private void distortion(
      LogDay day,
      String measured,
      boolean percent,
      double[] first,
      double[] sum,
      Optional<double[]> rms) {
    Optional<double[]> logged = day.find(measured + "_thd_percent");
    if (logged.isEmpty() || !percent && first.length == 0 && rms.isEmpty()) {
      return;
    }
    double[] made = new double[day.rows()];
    Arrays.setAll(
        made,
        k -> {
          double base =
              percent
                  ? 100
                  : first.length > 0
                      ? first[k]
                      : Math.sqrt(Math.max(0, rms.get()[k] * rms.get()[k] - sum[k] * sum[k]));
          return 100 * sum[k] / base;
        });
    // Instruments write 0 where the current is too small to tell.
    double[] told = Arrays.stream(logged.get()).map(x -> x == 0 ? Double.NaN : x).toArray();
    double ratio = Rows.median(day.rows(), k -> told[k] / made[k]);
    boolean misread = ratio < 0.8 || ratio > 1.5;
    if (misread || isSmoothed(told, made)) {
      String name = measured + "_thd_percent";
      flagged.add(
          day,
          new FlaggedDays.Fault(
              DISTORTION_MISREAD,
              measured,
              "Its means and percentiles can't be held against limits; the harmonics can.",
              misread
                  ? String.format(
                      Locale.ROOT,
                      "%s is %.3g times the distortion that the harmonics make (median of the day):"
                          + " it is averaged otherwise, or taken on another base than the"
                          + " fundamental.",
                      name,
                      ratio)
                  : name
                      + " does not follow the distortion that the harmonics make from row to row:"
                      + " it is a mean over a longer time.",
              rows -> List.of(Offers.formDistortion(name, rows))));
    }
  }

  /** Whether a distortion moves far less over the day than what its harmonics make. */
  private static boolean isSmoothed(double[] told, double[] made) {
    double apart = spread(told.length, k -> told[k] / made[k]);
    double digits = 2 * Rows.leastStep(told) / Rows.median(told);
    return apart > Math.max(SMOOTHED, digits)
        && spread(told.length, k -> told[k]) < 0.5 * spread(made.length, k -> made[k]);
  }

  /** Usual distance from the median, as a share of it. */
  private static double spread(int rows, IntToDoubleFunction figure) {
    double usual = Rows.median(rows, figure);
    return Rows.median(rows, k -> Math.abs(figure.applyAsDouble(k) / usual - 1));
  }
}
