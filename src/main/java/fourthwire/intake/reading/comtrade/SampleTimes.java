package fourthwire.intake.reading.comtrade;

import fourthwire.metering.capture.wave.TimeAxis;
import java.util.List;
import java.util.Locale;

/**
 * When the samples stand: by the stated rates; where none is stated, by the data's own times, which
 * are put on an even grid if they are one but for their rounding.
 */
final class SampleTimes {
  /** A waveform is not sampled slower; a lower stated rate beside rising times is a placeholder. */
  private static final double LEAST_HZ = 400;

  private static final double EVEN_WITHIN = 0.02;

  private final Configuration c;
  private final OwnTimes own;
  private final int rows;

  SampleTimes(Configuration configuration, OwnTimes own, int rows) {
    this.c = configuration;
    this.own = own;
    this.rows = rows;
  }

  TimeAxis axis(List<String> notes) {
    List<Configuration.Rate> rates = c.rates();
    if (rates.isEmpty()) {
      return byOwnTimes();
    }
    boolean one = rates.stream().allMatch(r -> r.hertz() == rates.get(0).hertz());
    boolean onlyFirst = rates.get(0).lastSample() >= rows;
    double rate = rates.get(0).hertz();
    if (one && rate < LEAST_HZ && own.rise() && ownRate() > LEAST_HZ) {
      notes.add(
          String.format(
              Locale.ROOT,
              "The stated sample rate of %.6g Hz is none of a waveform; the data's own times were"
                  + " used.",
              rate));
      return byOwnTimes();
    }
    TimeAxis axis = one || onlyFirst ? TimeAxis.even(rate, rows) : stretches();
    compare(axis.at(rows - 1), notes);
    return axis;
  }

  private double ownRate() {
    return (rows - 1) / own.at(rows - 1);
  }

  private TimeAxis stretches() {
    List<Configuration.Rate> rates = c.rates();
    double[] t = new double[rows];
    int rate = 0;
    for (int k = 1; k < rows; k++) {
      double before = 1 / rates.get(rate).hertz();
      while (rate < rates.size() - 1 && k >= rates.get(rate).lastSample()) {
        rate++;
      }
      t[k] = t[k - 1] + step(k, before, 1 / rates.get(rate).hertz());
    }
    return TimeAxis.told(t);
  }

  /** Where the rate changes, the step is of either; the data's own times, if any, tell which. */
  private double step(int k, double before, double after) {
    double told = own.at(k) - own.at(k - 1);
    return Math.abs(told - before) < Math.abs(told - after) ? before : after;
  }

  /** The stated rate rules; where the data's own times tell otherwise it is said. */
  private void compare(double spanS, List<String> notes) {
    double told = own.at(rows - 1);
    if (Math.abs(told - spanS) > 0.005 * spanS) {
      notes.add(
          String.format(
              Locale.ROOT,
              "The data's own times span %.6g s, the stated sample rate %.6g s; the rate was used.",
              told,
              spanS));
    }
  }

  private TimeAxis byOwnTimes() {
    if (!own.rise()) {
      throw new ComtradeException.NoRate(
          "The configuration states no sample rate, and the samples' own times are missing or do"
              + " not rise.");
    }
    double rate = ownRate();
    double allowed = Math.max(1.5 * own.tickS(), EVEN_WITHIN / rate);
    for (int k = 0; k < rows; k++) {
      if (Math.abs(own.at(k) - k / rate) > allowed) {
        return uneven();
      }
    }
    return TimeAxis.even(rate, rows);
  }

  private TimeAxis uneven() {
    double[] t = new double[rows];
    for (int k = 0; k < rows; k++) {
      t[k] = own.at(k);
    }
    return TimeAxis.told(t);
  }
}
