package fourthwire.metering.log;

import fourthwire.metering.LogResult;
import fourthwire.metering.LogResult.KeyInterval;
import fourthwire.metering.series.QuantityStatistics;
import fourthwire.metering.series.Series;
import fourthwire.metering.series.SeriesStatistics;
import java.time.Duration;
import java.time.ZoneId;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.IntFunction;

/**
 * What a log says as corrected: the figures it has as read, formed anew from other values.
 *
 * @param rows that are left
 * @param log its figures, without detail
 * @param names of its columns
 * @param statistics of all of them
 */
public record CleanedLog(
    long rows, LogResult log, List<String> names, SeriesStatistics statistics) {
  /** Copies the list. */
  public CleanedLog {
    names = List.copyOf(names);
  }

  /**
   * Of a log of at least one row.
   *
   * @param interval length of a row
   * @param zone in which weeks begin
   * @param known statistics of columns that are as read, rows too; by position
   */
  public static CleanedLog of(
      Series series,
      Duration interval,
      ZoneId zone,
      IntFunction<Optional<QuantityStatistics>> known) {
    SeriesStatistics statistics = SeriesStatistics.of(series, zone, known);
    return new CleanedLog(
        series.rows(),
        new LogResult(
            interval,
            LogAnalysis.summaries(series.quantities(), statistics),
            keyIntervals(series, interval.toMillis(), zone),
            Optional.empty()),
        series.quantities(),
        statistics);
  }

  /** Found among the few columns that choose them, then filled from all. */
  private static List<KeyInterval> keyIntervals(Series series, long intervalMillis, ZoneId zone) {
    KeyRows key = new KeyRows();
    LogDays.forEach(new ChosenColumns(series, KeyRows.COLUMNS), zone, intervalMillis, key::take);
    return key.found().stream().map(found -> filled(found, series)).toList();
  }

  private static KeyInterval filled(KeyInterval key, Series series) {
    for (int chunk = 0; chunk < series.chunks(); chunk++) {
      long[] times = series.startMillis(chunk);
      for (int row = 0; row < times.length; row++) {
        if (times[row] == key.start().toEpochMilli() && holds(series, chunk, row, key.values())) {
          return new KeyInterval(key.code(), key.start(), key.reason(), row(series, chunk, row));
        }
      }
    }
    return key;
  }

  /** Of rows of one time the one that was chosen. */
  private static boolean holds(Series series, int chunk, int row, Map<String, Double> values) {
    return values.entrySet().stream()
        .allMatch(v -> series.values(chunk, series.indexOf(v.getKey()))[row] == v.getValue());
  }

  private static Map<String, Double> row(Series series, int chunk, int row) {
    Map<String, Double> values = new LinkedHashMap<>();
    for (int q = 0; q < series.quantities().size(); q++) {
      double v = series.values(chunk, q)[row];
      if (!Double.isNaN(v)) {
        values.put(series.quantities().get(q), v);
      }
    }
    return values;
  }
}
