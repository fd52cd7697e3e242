package fourthwire.metering.reduce;

import java.util.Arrays;

/** Percentiles of a quantity's values in each of a span's steps, linear between ordered values. */
public final class StepPercentiles implements RowTaker {
  private final TimeSteps steps;
  private final long halfRow;
  private final double[][] values;
  private final int[] count;

  /** None yet; a row belongs to the step that its middle lies in. */
  public StepPercentiles(TimeSteps steps, long intervalMillis) {
    this.steps = steps;
    this.halfRow = intervalMillis / 2;
    this.values = new double[steps.count()][0];
    this.count = new int[steps.count()];
  }

  @Override
  public void take(long[] startMillis, double[] chunk) {
    int k = 0;
    for (int row = 0; row < chunk.length; row++) {
      int at = Double.isNaN(chunk[row]) ? -1 : steps.indexOf(startMillis[row] + halfRow, k);
      if (at >= 0) {
        k = at;
        if (count[k] == values[k].length) {
          values[k] = Arrays.copyOf(values[k], Math.max(256, 2 * count[k]));
        }
        values[k][count[k]++] = chunk[row];
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

  /** Percentiles of a step, {@code percents} rising; NaN without any value. */
  public double[] of(int step, double... percents) {
    double[] found = new double[percents.length];
    Arrays.fill(found, Double.NaN);
    int n = count[step];
    double[] x = values[step];
    Arrays.sort(x, 0, n);
    for (int p = 0; p < percents.length && n > 0; p++) {
      double position = (n - 1) * percents[p] / 100;
      int below = (int) position;
      found[p] = x[below] + (position - below) * (x[Math.min(below + 1, n - 1)] - x[below]);
    }
    return found;
  }
}
