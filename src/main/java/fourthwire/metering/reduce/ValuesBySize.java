package fourthwire.metering.reduce;

import java.util.Arrays;

/** The values of a quantity in order of size: percentiles, and for what share of the time more. */
public final class ValuesBySize implements RowTaker {
  private final long from;
  private final long to;
  private final long halfRow;
  private double[] values = new double[4096];
  private int length;
  private boolean sorted;

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
    sorted = false;
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
    sort();
    double position = (length - 1) * percent / 100;
    int below = (int) position;
    double a = values[below];
    return a + (position - below) * (values[Math.min(below + 1, length - 1)] - a);
  }

  /** Share of the values above this one, 0 to 1; NaN without any. */
  public double shareAbove(double limit) {
    if (length == 0) {
      return Double.NaN;
    }
    sort();
    int low = 0;
    int high = length;
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

  private void sort() {
    if (!sorted) {
      Arrays.sort(values, 0, length);
      sorted = true;
    }
  }
}
