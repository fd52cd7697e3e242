package fourthwire.metering.series;

import java.util.Arrays;

/** Finds order statistics without sorting (Hoare, 1961). Values must hold no NaN. */
public final class Selection {
  private static final int SMALL = 24;

  /** How many values tell about where the largest begin. */
  private static final int SAMPLE = 256;

  private Selection() {}

  /**
   * Percentiles, linear between the ordered values: the value at position (n - 1)·p/100 counted
   * from 0 (Hyndman and Fan, 1996, definition 7). Reorders the values.
   *
   * @param from first of the values
   * @param to the position after the last; above {@code from}
   * @param rising percentages, rising
   */
  static double[] percentiles(double[] x, int from, int to, double... rising) {
    int lowest = (int) ((to - from - 1) * rising[0] / 100);
    double[] top = top(x, from, to, lowest);
    return top.length > 0
        ? percentiles(top, to - from - top.length, 0, top.length, rising)
        : percentiles(x, 0, from, to, rising);
  }

  /**
   * The largest values, in no order, from the one of a rank on and some more: far fewer to go
   * through than all where the rank is high. Empty where they would be many.
   */
  private static double[] top(double[] x, int from, int to, int rank) {
    int n = to - from;
    int step = Math.max(1, n / SAMPLE);
    int most = 3 * (n - rank) + 2 * SMALL;
    if (n < 4 * SMALL || most > n / 2) {
      return new double[0];
    }
    double[] sample = new double[(n - 1) / step + 1];
    for (int k = 0; k < sample.length; k++) {
      sample[k] = x[from + k * step];
    }
    // Twice as many of the sample as are looked for, and two more for chance.
    int above = (int) Math.min(sample.length, 2L * (n - rank) / step + 3);
    double bound = ofRank(sample, 0, sample.length, sample.length - above);
    double[] top = new double[most + 1];
    int count = 0;
    for (int k = from; k < to && count < most; k++) {
      top[count] = x[k];
      count += x[k] >= bound ? 1 : 0;
    }
    return count < most && count >= n - rank ? Arrays.copyOf(top, count) : new double[0];
  }

  /**
   * Of values of which so many are the largest of more.
   *
   * @param before how many are smaller and not among them
   */
  private static double[] percentiles(double[] x, int before, int from, int to, double... rising) {
    double[] found = new double[rising.length];
    int low = from;
    for (int k = 0; k < rising.length; k++) {
      double position = (before + to - from - 1) * rising[k] / 100;
      int below = from + (int) position - before;
      select(x, low, to - 1, below);
      double a = x[below];
      double b = below + 1 < to ? least(x, below + 1, to) : a;
      found[k] = a + (position - (int) position) * (b - a);
      low = below;
    }
    return found;
  }

  /**
   * The value of a rank, 0 for the smallest. Reorders the values.
   *
   * @param from first of the values
   * @param to the position after the last; above {@code from + rank}
   */
  public static double ofRank(double[] x, int from, int to, int rank) {
    select(x, from, to - 1, from + rank);
    return x[from + rank];
  }

  private static double least(double[] x, int from, int to) {
    double least = x[from];
    for (int k = from + 1; k < to; k++) {
      least = Math.min(least, x[k]);
    }
    return least;
  }

  /** Moves the value of rank {@code k} to its place, smaller ones before it, larger ones behind. */
  private static void select(double[] x, int first, int last, int k) {
    int low = first;
    int high = last;
    while (high - low > SMALL) {
      double pivot = pivot(x, low, high, k);
      int i = low;
      int j = high;
      while (i <= j) {
        while (x[i] < pivot) {
          i++;
        }
        while (x[j] > pivot) {
          j--;
        }
        if (i <= j) {
          double t = x[i];
          x[i++] = x[j];
          x[j--] = t;
        }
      }
      if (k <= j) {
        high = j;
      } else if (k >= i) {
        low = i;
      } else {
        return;
      }
    }
    insertion(x, low, high);
  }

  /** A sample's value of about the rank that is looked for (Floyd and Rivest, 1975). */
  private static double pivot(double[] x, int low, int high, int k) {
    int step = Math.max(1, (high - low) / 10);
    double[] sample = new double[(high - low) / step + 1];
    for (int s = 0; s < sample.length; s++) {
      sample[s] = x[low + s * step];
    }
    insertion(sample, 0, sample.length - 1);
    return sample[(int) ((long) (k - low) * (sample.length - 1) / Math.max(1, high - low))];
  }

  private static void insertion(double[] x, int low, int high) {
    for (int i = low + 1; i <= high; i++) {
      double v = x[i];
      int j = i - 1;
      while (j >= low && x[j] > v) {
        x[j + 1] = x[j];
        j--;
      }
      x[j + 1] = v;
    }
  }
}
