package fourthwire.intake.reading.pqdif;

import java.time.Duration;
import java.time.Instant;
import java.util.Arrays;
import java.util.Optional;

/**
 * The values of a series as stored: one by one, scaled or not, or as runs of equal steps.
 *
 * @param raw as they stand
 * @param storage bits of the storage method: 1 values, 2 scaled, 4 steps
 */
record SeriesValues(Element.Values raw, int storage, double scale, double offset) {
  private static final int SCALED = 2;
  private static final int STEPS = 4;
  private static final int MOST = 20_000_000;

  static Optional<SeriesValues> of(Element.Collection instance, Element.Collection definition) {
    return instance
        .values(Tags.VALUES)
        .filter(v -> v.type() == Physical.MOMENT || v.isNumeric())
        .map(
            v ->
                new SeriesValues(
                    v,
                    (int) definition.number(Tags.STORAGE).orElse(1),
                    instance.number(Tags.SCALE).orElse(1),
                    instance.number(Tags.OFFSET).orElse(0)));
  }

  double[] numbers() {
    double[] x = new double[raw.count()];
    for (int k = 0; k < x.length; k++) {
      x[k] = raw.number(k);
    }
    double[] all = (storage & STEPS) != 0 ? run(x) : x;
    for (int k = 0; k < all.length && (storage & SCALED) != 0; k++) {
      all[k] = all[k] * scale + offset;
    }
    return all;
  }

  /** Times after the start: given as moments, or as seconds. */
  double[] seconds(Instant start) {
    if (raw.type() != Physical.MOMENT) {
      return numbers();
    }
    double[] seconds = new double[raw.count()];
    for (int k = 0; k < seconds.length; k++) {
      seconds[k] = Duration.between(start, raw.moment(k)).toNanos() * 1e-9;
    }
    return seconds;
  }

  /**
   * Runs: how many there are, then of each the number of values and the step from one to the next.
   */
  private static double[] run(double[] x) {
    int runs = x.length == 0 ? 0 : (int) Math.min(x[0], (x.length - 1) / 2.0);
    double[] all = new double[0];
    double at = 0;
    for (int r = 0; r < runs; r++) {
      double count = x[1 + 2 * r];
      if (!(count >= 0 && all.length + count <= MOST)) {
        throw new PqdifException("A run of " + count + " values is too long.");
      }
      int from = all.length;
      all = Arrays.copyOf(all, from + (int) count);
      for (int k = from; k < all.length; k++) {
        all[k] = at;
        at += x[2 + 2 * r];
      }
    }
    return all;
  }
}
