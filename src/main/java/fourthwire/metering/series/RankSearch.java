package fourthwire.metering.series;

/**
 * Percentiles of a column of any length, exact, in four passes over its chunks: each pass counts
 * the values by sixteen more bits of their order until one value is left for each rank.
 */
final class RankSearch {
  private static final int STEP = 16;

  private final Series series;
  private final int quantity;

  RankSearch(Series series, int quantity) {
    this.series = series;
    this.quantity = quantity;
  }

  /** Linear between the ordered values; NaN without any. */
  double[] percentiles(double... percent) {
    long count = 0;
    for (int k = 0; k < series.chunks(); k++) {
      for (double v : series.values(k, quantity)) {
        count += Double.isNaN(v) ? 0 : 1;
      }
    }
    double[] found = new double[percent.length];
    for (int p = 0; p < percent.length; p++) {
      found[p] = count == 0 ? Double.NaN : percentile(percent[p], count);
    }
    return found;
  }

  private double percentile(double percent, long count) {
    double position = (count - 1) * percent / 100;
    long below = (long) position;
    double a = ofRank(below);
    double b = below + 1 < count && position > below ? ofRank(below + 1) : a;
    return a + (position - below) * (b - a);
  }

  private double ofRank(long rank) {
    long prefix = 0;
    long left = rank;
    for (int shift = 64 - STEP; shift >= 0; shift -= STEP) {
      long[] counts = counts(prefix, shift);
      int digit = 0;
      while (left >= counts[digit]) {
        left -= counts[digit++];
      }
      prefix = prefix << STEP | digit;
    }
    return value(prefix);
  }

  /** How many values have these first bits and each of the next. */
  private long[] counts(long prefix, int shift) {
    long[] counts = new long[1 << STEP];
    for (int k = 0; k < series.chunks(); k++) {
      for (double v : series.values(k, quantity)) {
        if (!Double.isNaN(v)) {
          long key = key(v);
          if (shift == 64 - STEP || key >>> shift + STEP == prefix) {
            counts[(int) (key >>> shift) & (1 << STEP) - 1]++;
          }
        }
      }
    }
    return counts;
  }

  /** Bits whose unsigned order is the order of the values. */
  private static long key(double v) {
    long bits = Double.doubleToLongBits(v + 0.0);
    return bits < 0 ? ~bits : bits | Long.MIN_VALUE;
  }

  private static double value(long key) {
    return Double.longBitsToDouble(key < 0 ? key & Long.MAX_VALUE : ~key);
  }
}
