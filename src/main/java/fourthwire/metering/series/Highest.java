package fourthwire.metering.series;

/**
 * The highest of many values, for percentiles from the 95th on: a twentieth of them tells, so that
 * a column need not be held whole.
 */
final class Highest {
  /** One value in so many lies above the 95th percentile. */
  private static final int SHARE = 20;

  private final int kept;
  private final double[] there;
  private int filled;
  private long count;
  private double floor = Double.NEGATIVE_INFINITY;

  /** Of at most so many values. */
  Highest(long most) {
    this.kept = Math.toIntExact(most / SHARE + 3);
    this.there = new double[2 * kept];
  }

  /** Takes values, none of them NaN. */
  void take(double[] x, int from, int to) {
    count += to - from;
    for (int k = from; k < to; k++) {
      if (x[k] > floor || filled < kept) {
        there[filled++] = x[k];
        if (filled == there.length) {
          Selection.ofRank(there, 0, filled, kept);
          System.arraycopy(there, kept, there, 0, kept);
          filled = kept;
          floor = least();
        }
      }
    }
  }

  private double least() {
    double least = there[0];
    for (int k = 1; k < filled; k++) {
      least = Math.min(least, there[k]);
    }
    return least;
  }

  /** Linear as {@link Selection#percentiles}; of the 95th on, rising. NaN without any value. */
  double[] percentiles(double... rising) {
    double[] found = new double[rising.length];
    for (int k = 0; k < rising.length; k++) {
      double position = (count - 1) * rising[k] / 100;
      long below = (long) position;
      found[k] = count == 0 ? Double.NaN : between(below, position - below);
    }
    return found;
  }

  private double between(long below, double share) {
    double a = ofRank(below);
    double b = below + 1 < count ? ofRank(below + 1) : a;
    return a + share * (b - a);
  }

  private double ofRank(long rank) {
    return Selection.ofRank(there, 0, filled, (int) (filled - (count - rank)));
  }
}
