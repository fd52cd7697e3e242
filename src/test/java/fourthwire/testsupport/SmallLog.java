package fourthwire.testsupport;

import fourthwire.metering.Reading;
import fourthwire.metering.log.LogAnalysis;
import fourthwire.metering.series.LogChunk;
import fourthwire.metering.series.LogSeries;
import fourthwire.metering.series.Parts;
import java.time.Instant;
import java.time.ZoneId;
import java.util.List;
import java.util.stream.IntStream;

/**
 * Two weeks of ten-minute rows about the day on which the clocks go forward: office hours, a
 * neutral that carries more than the lines, and half a day without rows.
 */
public final class SmallLog {
  /** Its first instant: Monday, 24 March 2025, 00:00 local time of the sample site. */
  public static final Instant FROM = Instant.parse("2025-03-24T00:00:00Z");

  private static final int ROWS = 6 * (24 * 14 - 1);
  private static final int GAP_FROM = 6 * (3 * 24 + 8);
  private static final int GAP_TO = GAP_FROM + 6 * 12;
  private static final long INTERVAL_MILLIS = 600_000;
  private static final ZoneId ZONE = ZoneId.of("Europe/London");
  private static final List<String> QUANTITIES =
      List.of(
          "L1.rms_a",
          "L2.rms_a",
          "L3.rms_a",
          "N.rms_a",
          "L1.rms_v",
          "total.active_w",
          "frequency_hz",
          "L1.voltage_thd_percent",
          "L1.voltage_h5_percent",
          "N.current_h3_a",
          "N.current_h9_a");

  private SmallLog() {}

  /** The reading, with its rows. */
  public static Reading reading() {
    int[] rows = IntStream.range(0, ROWS).filter(k -> k < GAP_FROM || k >= GAP_TO).toArray();
    long[] times =
        IntStream.of(rows).mapToLong(k -> FROM.toEpochMilli() + k * INTERVAL_MILLIS).toArray();
    double[][] values = new double[QUANTITIES.size()][rows.length];
    for (int at = 0; at < rows.length; at++) {
      double[] row = row(Instant.ofEpochMilli(times[at]), rows[at]);
      for (int q = 0; q < row.length; q++) {
        values[q][at] = row[q];
      }
    }
    LogSeries series = new LogSeries(QUANTITIES, Parts.held(), 1 << 20);
    series.add(new LogChunk(times, values), Runnable::run);
    return LogAnalysis.of(series, INTERVAL_MILLIS, ZONE, 50, List.of(), List.of());
  }

  private static double[] row(Instant at, int row) {
    int hour = at.atZone(ZONE).getHour();
    boolean working = hour >= 8 && hour < 18 && at.atZone(ZONE).getDayOfWeek().getValue() < 6;
    double load = (working ? 60 : 9) + row % 7 / 2.0;
    return new double[] {
      load,
      0.8 * load,
      1.1 * load,
      1.6 * load,
      231 - 0.05 * load,
      640 * load,
      50 + row % 5 / 100.0,
      2 + 0.02 * load,
      1 + 0.01 * load,
      1.5 * load,
      0.3 * load
    };
  }
}
