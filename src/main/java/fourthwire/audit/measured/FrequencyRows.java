package fourthwire.audit.measured;

import fourthwire.limits.distortion.MeasuredBand;
import fourthwire.limits.distortion.MeasuredBands;
import fourthwire.metering.series.Series;
import java.util.Locale;
import java.util.Optional;

/**
 * What rows longer than the 10 s that EN 50160, clause 4.2.1 counts can say of a supply's
 * frequency: a row's mean outside a band tells that a 10 s mean in it was outside too, one inside
 * tells nothing; a row whose lowest and highest values lie inside holds no 10 s mean outside.
 */
public final class FrequencyRows {
  private static final String FREQUENCY = "frequency_hz";

  private final MeasuredBand band;
  private double low = Double.POSITIVE_INFINITY;
  private double high = Double.NEGATIVE_INFINITY;
  private long rows;
  private long outside;
  private long proven;

  private FrequencyRows(double nominalHz) {
    this.band = MeasuredBands.frequency(nominalHz).get(0);
  }

  /** A sentence; empty where no frequency is logged. */
  public static Optional<String> sentence(Series log, long rowSeconds, double nominalHz) {
    int mean = log.indexOf(FREQUENCY);
    if (mean < 0) {
      return Optional.empty();
    }
    FrequencyRows found = new FrequencyRows(nominalHz);
    int min = log.indexOf(FREQUENCY + ".min");
    int max = log.indexOf(FREQUENCY + ".max");
    for (int chunk = 0; chunk < log.chunks(); chunk++) {
      double[] means = log.values(chunk, mean);
      boolean extremes = min >= 0 && max >= 0;
      found.take(
          means,
          extremes ? log.values(chunk, min) : means,
          extremes ? log.values(chunk, max) : means,
          extremes);
    }
    return found.rows == 0 ? Optional.empty() : Optional.of(found.sentence(rowSeconds));
  }

  private void take(double[] means, double[] lowest, double[] highest, boolean extremes) {
    for (int k = 0; k < means.length; k++) {
      if (!Double.isNaN(means[k])) {
        rows++;
        low = Math.min(low, means[k]);
        high = Math.max(high, means[k]);
        outside += means[k] < band.low() || means[k] > band.high() ? 1 : 0;
        proven += extremes && lowest[k] >= band.low() && highest[k] <= band.high() ? 1 : 0;
      }
    }
  }

  private String sentence(long rowSeconds) {
    String what =
        String.format(
            Locale.ROOT,
            "Frequency gets no verdict: EN 50160, clause 4.2.1, counts means over 10 s, of which"
                + " 99.5 %% of a year’s lie within 1 %% of nominal (IEC 61000-2-4, class 2, allows"
                + " the same 1 %%), and these rows are of %d s. Their means lay from %.2f to %.2f"
                + " Hz; ",
            rowSeconds,
            low,
            high);
    return what + told();
  }

  private String told() {
    String within = String.format(Locale.ROOT, "%.1f to %.1f Hz", band.low(), band.high());
    if (outside > 0) {
      return String.format(
          Locale.ROOT,
          "%d of %d lay outside %s, and in each of those rows at least one 10 s mean did too.",
          outside,
          rows,
          within);
    }
    return proven == rows
        ? "their lowest and highest values all lay within "
            + within
            + ", so every 10 s mean in them did."
        : "none lay outside "
            + within
            + ", which does not show that every 10 s mean in them lay inside.";
  }
}
