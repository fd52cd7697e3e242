package fourthwire.metering;

import java.time.Duration;
import java.time.Instant;
import java.util.List;
import java.util.Map;

/**
 * What an interval log says.
 *
 * @param interval length of one row
 * @param quantities statistics by quantity name of the public contract, in the order of the file's
 *     columns; a quantity without any value is left out
 * @param keyIntervals the rows that stand for the log beside computed figures
 */
public record LogResult(
    Duration interval, Map<String, QuantitySummary> quantities, List<KeyInterval> keyIntervals) {
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
