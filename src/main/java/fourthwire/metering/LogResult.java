package fourthwire.metering;

import fourthwire.metering.series.LogSeries;
import fourthwire.metering.series.SeriesStatistics;
import java.time.Duration;
import java.time.Instant;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * What an interval log says.
 *
 * @param interval length of one row
 * @param quantities statistics by quantity name of the public contract, in the order of the file's
 *     columns; a quantity without any value is left out
 * @param keyIntervals the rows that stand for the log beside computed figures
 */
public record LogResult(
    Duration interval,
    Map<String, QuantitySummary> quantities,
    List<KeyInterval> keyIntervals,
    Optional<Detail> detail) {
  /**
   * What a log holds beside its summary, kept in tables of its own: it is there only when the log
   * has just been read.
   *
   * @param series its rows; whoever takes the result closes it
   * @param statistics by week and by hour of the week
   */
  public record Detail(LogSeries series, SeriesStatistics statistics) {}

  /** Key interval in which the neutral, or without one the largest line, carried most. */
  public static final String PEAK_CURRENT = "peak-current";

  /** Key interval of the largest total active power. */
  public static final String PEAK_POWER = "peak-power";

  /**
   * One row of the log.
   *
   * @param code why it was chosen, one of the constants here
   * @param start when it begins
   * @param reason the same in words, with the figure
   * @param values what was logged in it, by quantity name; blanks left out
   */
  public record KeyInterval(
      String code, Instant start, String reason, Map<String, Double> values) {}
}
