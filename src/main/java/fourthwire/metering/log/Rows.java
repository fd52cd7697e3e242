package fourthwire.metering.log;

import fourthwire.metering.series.Selection;
import java.util.Arrays;
import java.util.function.IntToDoubleFunction;

/** Medians and shares of the rows of a day. */
final class Rows {
  /** Last digits in a current, at least, so that rounding is no ratio. */
  private static final double FEWEST_DIGITS = 10;

  private Rows() {}

  /** Median, the upper of two in the middle; NaN without any value. */
  static double median(double[] x) {
    return medianOf(x.clone());
  }

  /** Median of values that may be reordered. */
  private static double medianOf(double[] x) {
    int n = 0;
    for (double v : x) {
      if (!Double.isNaN(v)) {
        x[n++] = v;
      }
    }
    return n == 0 ? Double.NaN : Selection.ofRank(x, 0, n, n / 2);
  }

  /** Median of a figure over rows; NaN where it is nowhere. */
  static double median(int rows, IntToDoubleFunction figure) {
    double[] x = new double[rows];
    Arrays.setAll(x, figure);
    return medianOf(x);
  }

  /** Median over rows under load: those of next to no current, or of few digits, have no ratio. */
  static double loaded(double[] amps, IntToDoubleFunction ratio) {
    double least = Math.max(0.1 * median(amps), FEWEST_DIGITS * digit(amps));
    return median(
        amps.length,
        k -> {
          double at = amps[k] > least ? ratio.applyAsDouble(k) : Double.NaN;
          return Double.isInfinite(at) ? Double.NaN : at;
        });
  }

  /** The smallest step from row to row: a last digit, where values are written in few. */
  static double leastStep(double[] x) {
    double least = 0;
    for (int k = 1; k < x.length; k++) {
      double step = Math.abs(x[k] - x[k - 1]);
      if (step > 1e-9 * Math.abs(x[k]) && (least == 0 || step < least)) {
        least = step;
      }
    }
    return least;
  }

  /** The last digit that values are written in, at least: they may stand still all day. */
  static double digit(double[] x) {
    double digit = 1;
    while (digit > 1e-6 && !isWhole(x, digit)) {
      digit /= 10;
    }
    return digit > 1e-6 ? Math.max(digit, leastStep(x)) : 0;
  }

  private static boolean isWhole(double[] x, double digit) {
    for (double v : x) {
      if (Math.abs(v / digit - Math.rint(v / digit)) > 1e-6) {
        return false;
      }
    }
    return true;
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
