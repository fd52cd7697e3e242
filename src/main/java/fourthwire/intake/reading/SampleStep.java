package fourthwire.intake.reading;

import fourthwire.intake.reading.table.TextTable;
import fourthwire.intake.reading.table.TimeColumns;

/** How far apart rows of an elapsed time are. */
final class SampleStep {
  /** No waveform is sampled so slowly: two samples a cycle of 50 Hz. */
  private static final double SLOWEST_S = 0.01;

  private SampleStep() {}

  /** Whether the first rows are too far apart for samples of a waveform, or are no numbers. */
  static boolean isOfALog(TextTable table, TimeColumns time) {
    double[] at = {Double.NaN, Double.NaN};
    int[] rows = {0};
    table.forEach(
        row -> {
          at[rows[0]++] = row.value(time.columns().get(0)) * time.unitS();
          return rows[0] < 2;
        });
    return !(at[1] - at[0] <= SLOWEST_S);
  }
}
