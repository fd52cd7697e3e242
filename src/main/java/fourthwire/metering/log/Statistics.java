package fourthwire.metering.log;

import fourthwire.metering.QuantitySummary;
import java.util.Arrays;
import java.util.Optional;

/** Statistics of a column over the values that are there. */
final class Statistics {
  private Statistics() {}

  /** Summary of a column; empty where it has no value. */
  static Optional<QuantitySummary> summary(double[] column) {
    double[] sorted = sorted(column);
    if (sorted.length == 0) {
      return Optional.empty();
    }
    double sum = 0;
    for (double x : sorted) {
      sum += x;
    }
    return Optional.of(
        new QuantitySummary(
            sorted.length,
            sorted[0],
            sum / sorted.length,
            sorted[sorted.length - 1],
            percentile(sorted, 95),
            percentile(sorted, 99)));
  }

  /** The values that are there, rising. */
  static double[] sorted(double[] column) {
    double[] there = Arrays.stream(column).filter(x -> !Double.isNaN(x)).toArray();
    Arrays.sort(there);
    return there;
  }

  /**
   * Percentile, linear between the ordered values: the value at position (n - 1)·p/100 counted from
   * 0 (Hyndman and Fan, 1996, definition 7).
   *
   * @param sorted rising, at least one
   */
  static double percentile(double[] sorted, double percent) {
    double position = (sorted.length - 1) * percent / 100;
    int below = (int) position;
    int above = Math.min(below + 1, sorted.length - 1);
    return sorted[below] + (position - below) * (sorted[above] - sorted[below]);
  }

  /** Median; NaN without any value. */
  static double median(double[] column) {
    double[] sorted = sorted(column);
    return sorted.length == 0 ? Double.NaN : percentile(sorted, 50);
  }
}
