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
    int row = 0;
    int k = 0;
    while (row < values.length) {
      int at = steps.indexOf(startMillis[row] + halfRow, k);
      if (at < 0) {
        row++;
      } else {
        k = at;
        row = takeStep(k, startMillis, values, row);
      }
    }
  }

  /** The rows from one on that lie in one step; returns the first that does not. */
  private int takeStep(int step, long[] startMillis, double[] values, int from) {
    long first = steps.edge(step) - halfRow;
    long end = steps.edge(step + 1) - halfRow;
    double least = min[step];
    double largest = max[step];
    double total = sum[step];
    int there = 0;
    int row = from;
    while (row < values.length && startMillis[row] >= first && startMillis[row] < end) {
      double v = values[row++];
      if (!Double.isNaN(v)) {
        there++;
        total += v;
        least = v < least ? v : least;
        largest = v > largest ? v : largest;
      }
    }
    count[step] += there;
    sum[step] = total;
    min[step] = least;
    max[step] = largest;
    return row;
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
