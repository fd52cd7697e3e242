package fourthwire.metering.assess;

import fourthwire.metering.series.Series;
import java.util.Optional;

/**
 * A line's fundamental current in a log.
 *
 * @param column position of the fundamental, or of the rms
 * @param distortion position of the distortion that the rms is cleared of; -1 for none
 * @param basis how it is known, a few words
 */
record LineFundamental(int column, int distortion, String basis) {
  /** As logged, else from rms and distortion, else the rms itself, which is larger. */
  static Optional<LineFundamental> find(Series log, String line) {
    int first = log.indexOf(line + ".current_h1_a");
    int rms = log.indexOf(line + ".rms_a");
    int distortion = log.indexOf(line + ".current_thd_percent");
    if (first >= 0) {
      return Optional.of(new LineFundamental(first, -1, "from fundamentals as logged"));
    }
    if (rms < 0) {
      return Optional.empty();
    }
    return Optional.of(
        new LineFundamental(
            rms,
            distortion,
            distortion >= 0
                ? "fundamentals from rms and distortion"
                : "from rms: fundamentals were not logged, and are smaller"));
  }

  double[] amps(Series log, int chunk) {
    double[] amps = log.values(chunk, column);
    if (distortion < 0) {
      return amps;
    }
    double[] thd = log.values(chunk, distortion);
    double[] first = new double[amps.length];
    for (int k = 0; k < first.length; k++) {
      first[k] = amps[k] / Math.hypot(1, thd[k] / 100);
    }
    return first;
  }
}
