package fourthwire.intake.reading.wave;

import java.util.Arrays;
import java.util.Locale;
import java.util.Optional;

/**
 * Times of samples as an even grid: through all of them where they are written so coarsely that the
 * ends alone would not tell the rate.
 *
 * @param stepS from sample to sample; 0 where the times do not rise
 * @param offGrid the first sample, counted from 1, that stands off the grid; 0 for none
 * @param note what is to be told; empty text for nothing
 */
record EvenTimes(double stepS, int offGrid, String note) {
  /**
   * Fits the grid.
   *
   * @param secondsOrMore times of the samples; what is behind the count is not looked at
   */
  static EvenTimes of(double[] secondsOrMore, int count) {
    double[] times = Arrays.copyOf(secondsOrMore, count);
    double span = count < 2 ? 0 : (times[count - 1] - times[0]) / (count - 1);
    if (!(span > 0)) {
      return new EvenTimes(0, 0, "");
    }
    Optional<Double> rounding = rounding(times);
    double step = rounding.isPresent() ? slope(times) : span;
    double middle = rounding.isPresent() ? mean(times) - step * (count - 1) / 2 : times[0];
    double tolerance = 2 * step + rounding.orElse(0.0);
    for (int k = 0; k < count; k++) {
      if (!(Math.abs(times[k] - middle - k * step) < tolerance)) {
        return new EvenTimes(step, k + 1, "");
      }
    }
    return new EvenTimes(step, 0, rounding.map(q -> note(q, step)).orElse(""));
  }

  private static String note(double rounding, double step) {
    return String.format(
        Locale.ROOT,
        "Times are written in steps of %.3g s, coarser than the samples: these were set evenly over"
            + " the whole record, %.1f a second.",
        rounding,
        1 / step);
  }

  /**
   * The least step between times that differ, where neighbours that don't show they are rounded.
   */
  private static Optional<Double> rounding(double[] times) {
    double least = Double.POSITIVE_INFINITY;
    boolean repeated = false;
    for (int k = 1; k < times.length; k++) {
      double moved = times[k] - times[k - 1];
      repeated = repeated || moved == 0;
      least = moved > 0 ? Math.min(least, moved) : least;
    }
    return repeated ? Optional.of(least) : Optional.empty();
  }

  private static double mean(double[] x) {
    return Arrays.stream(x).average().orElse(0);
  }

  /** Least squares over the samples' numbers. */
  private static double slope(double[] times) {
    double middle = (times.length - 1) / 2.0;
    double mean = mean(times);
    double upper = 0;
    double lower = 0;
    for (int k = 0; k < times.length; k++) {
      upper += (k - middle) * (times[k] - mean);
      lower += (k - middle) * (k - middle);
    }
    return upper / lower;
  }
}
