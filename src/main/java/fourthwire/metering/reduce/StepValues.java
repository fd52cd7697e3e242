package fourthwire.metering.reduce;

import java.util.Arrays;

/**
 * The least, mean and largest value of a quantity in each of a span's steps. A row belongs to the
 * step that its middle lies in, so that a clock that trembles about the minute moves none.
 */
public final class StepValues implements RowTaker {
  private final TimeSteps steps;
  private final long halfRow;
  private final int[] count;
  private final double[] sum;
  private final double[] min;
  private final double[] max;

  /** None yet. */
  public StepValues(TimeSteps steps, long intervalMillis) {
    this.steps = steps;
    this.halfRow = intervalMillis / 2;
    this.count = new int[steps.count()];
    this.sum = new double[steps.count()];
    this.min = new double[steps.count()];
    this.max = new double[steps.count()];
    Arrays.fill(min, Double.POSITIVE_INFINITY);
    Arrays.fill(max, Double.NEGATIVE_INFINITY);
  }

  @Override
  public void take(long[] startMillis, double[] values) {
    int k = 0;
    for (int row = 0; row < values.length; row++) {
      double v = values[row];
      int at = Double.isNaN(v) ? -1 : steps.indexOf(startMillis[row] + halfRow, k);
      if (at >= 0) {
        k = at;
        count[k]++;
        sum[k] += v;
        min[k] = Math.min(min[k], v);
        max[k] = Math.max(max[k], v);
      }
    }
  }

  /** The steps. */
  public TimeSteps steps() {
    return steps;
  }

  /** Values in a step. */
  public int count(int step) {
    return count[step];
  }

  /** The least value of a step; NaN without any. */
  public double min(int step) {
    return count[step] == 0 ? Double.NaN : min[step];
  }

  /** The mean of a step's values; NaN without any. */
  public double mean(int step) {
    return count[step] == 0 ? Double.NaN : sum[step] / count[step];
  }

  /** The largest value of a step; NaN without any. */
  public double max(int step) {
    return count[step] == 0 ? Double.NaN : max[step];
  }

  /** The least value of all; NaN without any. */
  public double min() {
    double least = Arrays.stream(min).min().orElse(Double.NaN);
    return Double.isInfinite(least) ? Double.NaN : least;
  }

  /** The largest value of all; NaN without any. */
  public double max() {
    double largest = Arrays.stream(max).max().orElse(Double.NaN);
    return Double.isInfinite(largest) ? Double.NaN : largest;
  }
}
