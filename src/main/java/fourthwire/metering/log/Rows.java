package fourthwire.metering.log;

import java.util.Arrays;
import java.util.function.IntToDoubleFunction;

/** Medians and shares of the rows of a day. */
final class Rows {
  private Rows() {}

  /** The values that are there, rising. */
  static double[] sorted(double[] x) {
    double[] there = new double[x.length];
    int n = 0;
    for (double v : x) {
      if (!Double.isNaN(v)) {
        there[n++] = v;
      }
    }
    double[] sorted = Arrays.copyOf(there, n);
    Arrays.sort(sorted);
    return sorted;
  }

  /** Median; NaN without any value. */
  static double median(double[] x) {
    double[] sorted = sorted(x);
    return sorted.length == 0 ? Double.NaN : sorted[sorted.length / 2];
  }

  /** Median of a figure over rows; NaN where it is nowhere. */
  static double median(int rows, IntToDoubleFunction figure) {
    double[] x = new double[rows];
    Arrays.setAll(x, figure);
    return median(x);
  }

  /** How many rows a figure is there. */
  static int count(int rows, IntToDoubleFunction figure) {
    int there = 0;
    for (int k = 0; k < rows; k++) {
      there += Double.isNaN(figure.applyAsDouble(k)) ? 0 : 1;
    }
    return there;
  }
}
