package fourthwire.metering.correction;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.function.Function;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** Distortions that a log's own harmonics make, orders 2 to 50 on the fundamental. */
final class Distortions {
  private static final Pattern HARMONIC =
      Pattern.compile("(.+)\\.(current|voltage)_h(\\d+)_(a|v|percent)");

  private final List<String> names;

  Distortions(List<String> names) {
    this.names = names;
  }

  /**
   * The distortion by name, percent; NaN where the harmonics do not tell it.
   *
   * @param thd such as {@code L1.current_thd_percent}
   * @param column values of a logged quantity
   */
  double[] of(String thd, Function<String, double[]> column) {
    String start = thd.substring(0, thd.length() - "_thd_percent".length());
    List<String> percent = orders(start, "percent");
    String unit = start.endsWith("current") ? "a" : "v";
    if (!percent.isEmpty()) {
      return rootSum(percent, column);
    }
    double[] sum = rootSum(orders(start, unit), column);
    double[] base = base(start, unit, sum, column);
    double[] made = new double[sum.length];
    Arrays.setAll(made, k -> 100 * sum[k] / base[k]);
    return made;
  }

  /** The fundamental, or what is left of the rms. */
  private double[] base(
      String start, String unit, double[] sum, Function<String, double[]> column) {
    String first = start + "_h1_" + unit;
    if (names.contains(first)) {
      return column.apply(first);
    }
    double[] rms = column.apply(start.substring(0, start.lastIndexOf('.')) + ".rms_" + unit);
    double[] base = new double[sum.length];
    Arrays.setAll(base, k -> Math.sqrt(Math.max(0, rms[k] * rms[k] - sum[k] * sum[k])));
    return base;
  }

  private List<String> orders(String start, String unit) {
    List<String> found = new ArrayList<>();
    for (String name : names) {
      Matcher m = HARMONIC.matcher(name);
      if (m.matches()
          && start.equals(m.group(1) + "." + m.group(2))
          && unit.equals(m.group(4))
          && !m.group(3).equals("1")) {
        found.add(name);
      }
    }
    return found;
  }

  /** A blank order counts as nothing; a row without any is blank. */
  private static double[] rootSum(List<String> orders, Function<String, double[]> column) {
    double[] sum = new double[0];
    int[] there = new int[0];
    for (String order : orders) {
      double[] x = column.apply(order);
      sum = sum.length == 0 ? new double[x.length] : sum;
      there = there.length == 0 ? new int[x.length] : there;
      for (int k = 0; k < x.length; k++) {
        there[k] += Double.isNaN(x[k]) ? 0 : 1;
        sum[k] += Double.isNaN(x[k]) ? 0 : x[k] * x[k];
      }
    }
    for (int k = 0; k < sum.length; k++) {
      sum[k] = there[k] == 0 ? Double.NaN : Math.sqrt(sum[k]);
    }
    return sum;
  }
}
