package fourthwire.metering.series;

/** Finds order statistics without sorting (Hoare, 1961). Values must hold no NaN. */
public final class Selection {
  private static final int SMALL = 24;
  private static final int MANY = 500;

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
    double[] found = new double[rising.length];
    int low = from;
    for (int k = 0; k < rising.length; k++) {
      double position = (to - from - 1) * rising[k] / 100;
      int below = from + (int) position;
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

  /**
   * A sample's value of about the rank that is looked for, rather on the side where more values
   * are: what is left to look through is then the smaller part (Floyd and Rivest, 1975).
   */
  private static double pivot(double[] x, int low, int high, int k) {
    int step = Math.max(1, (high - low) / (high - low > MANY ? 40 : 10));
    double[] sample = new double[(high - low) / step + 1];
    for (int s = 0; s < sample.length; s++) {
      sample[s] = x[low + s * step];
    }
    insertion(sample, 0, sample.length - 1);
    int last = sample.length - 1;
    int at = (int) ((long) (k - low) * last / Math.max(1, high - low));
    int aside = last < 20 ? 1 : 2;
    return sample[2 * at > last ? Math.max(last / 2, at - aside) : Math.min(last / 2, at + aside)];
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
