package fourthwire.metering.reduce;

import java.util.Arrays;

/**
 * The values of a quantity in order of size: percentiles, and for what share of the time more. They
 * are dealt into buckets of equal width, and only buckets that are asked about are put in order: a
 * picture asks for a few hundred of half a million values.
 */
public final class ValuesBySize implements RowTaker {
  private static final int[] NONE = {};
  private static final int A_BUCKET = 32;

  private final long from;
  private final long to;
  private final long halfRow;
  private double[] values = new double[4096];
  private int length;
  private double least;
  private double width;
  private int[] start = NONE;
  private boolean[] ordered = {};

  /** None yet; rows whose middle lies from one instant to before the other are taken. */
  public ValuesBySize(long fromMillis, long toMillis, long intervalMillis) {
    this.from = fromMillis;
    this.to = toMillis;
    this.halfRow = intervalMillis / 2;
  }

  @Override
  public void take(long[] startMillis, double[] chunk) {
    if (length + chunk.length > values.length) {
      values = Arrays.copyOf(values, Math.max(2 * values.length, length + chunk.length));
    }
    for (int row = 0; row < chunk.length; row++) {
      long middle = startMillis[row] + halfRow;
      if (middle >= from && middle < to && !Double.isNaN(chunk[row])) {
        values[length++] = chunk[row];
      }
    }
    start = NONE;
  }

  /** How many there are. */
  public int count() {
    return length;
  }

  /** Linear between the ordered values; NaN without any. */
  public double percentile(double percent) {
    if (length == 0) {
      return Double.NaN;
    }
    deal();
    double position = (length - 1) * percent / 100;
    int below = (int) position;
    double a = ofRank(below);
    return a + (position - below) * (ofRank(Math.min(below + 1, length - 1)) - a);
  }

  /** Share of the values above this one, 0 to 1; NaN without any. */
  public double shareAbove(double limit) {
    if (length == 0) {
      return Double.NaN;
    }
    deal();
    if (limit < least) {
      return 1;
    }
    int bucket = bucket(limit);
    order(bucket);
    int low = start[bucket];
    int high = start[bucket + 1];
    while (low < high) {
      int middle = (low + high) >>> 1;
      if (values[middle] > limit) {
        high = middle;
      } else {
        low = middle + 1;
      }
    }
    return (double) (length - low) / length;
  }

  private double ofRank(int rank) {
    int found = Arrays.binarySearch(start, rank);
    int bucket = found >= 0 ? found : -found - 2;
    while (start[bucket + 1] <= rank) {
      bucket++;
    }
    order(bucket);
    return values[rank];
  }

  private void order(int bucket) {
    if (!ordered[bucket]) {
      Arrays.sort(values, start[bucket], start[bucket + 1]);
      ordered[bucket] = true;
    }
  }

  private int bucket(double value) {
    return (int) Math.min(ordered.length - 1, (value - least) / width);
  }

  /** Deals the values into buckets, {@code start} telling where each begins. */
  private void deal() {
    if (start.length > 0) {
      return;
    }
    least = Double.POSITIVE_INFINITY;
    double largest = Double.NEGATIVE_INFINITY;
    for (int k = 0; k < length; k++) {
      least = Math.min(least, values[k]);
      largest = Math.max(largest, values[k]);
    }
    ordered = new boolean[1 + length / A_BUCKET];
    width = largest > least ? (largest - least) / ordered.length : 1;
    start = new int[ordered.length + 1];
    for (int k = 0; k < length; k++) {
      start[bucket(values[k]) + 1]++;
    }
    for (int b = 0; b < ordered.length; b++) {
      start[b + 1] += start[b];
    }
    int[] next = start.clone();
    double[] dealt = new double[length];
    for (int k = 0; k < length; k++) {
      dealt[next[bucket(values[k])]++] = values[k];
    }
    values = dealt;
  }
}
