package fourthwire.metering;

import fourthwire.metering.reduce.LogSpan;
import fourthwire.metering.series.Series;
import java.util.List;
import java.util.Optional;

/** Where the rows of logs are kept, column by column. */
public interface SeriesRepository {
  /**
   * One quantity of a log, in the order of its rows. It hands out its own arrays: they are not to
   * be changed.
   *
   * @param startMillis when each row's interval begins, milliseconds of the epoch
   * @param values in SI units; NaN for none
   */
  record Column(long[] startMillis, double[] values) {}

  /**
   * What a quantity was by week and by hour of the week. It hands out its own arrays: they are not
   * to be changed.
   *
   * @param firstWeek as {@link fourthwire.metering.series.WeekClock#week} counts
   * @param weekCount values that were there, by week
   * @param weekP95 95th percentiles by week; NaN without any value
   * @param hourOfWeekMean means by local hour, Monday 00 h first; NaN without any value
   */
  record Weeks(
      long firstWeek,
      double[] weekCount,
      double[] weekP95,
      double[] weekP99,
      double[] hourOfWeekMean) {}

  /** The quantities of a reading's log, in the order of its columns; none for a capture. */
  List<String> quantities(long readingId);

  /** All values of one quantity. */
  Optional<Column> column(long readingId, String quantity);

  /** What a quantity was by week. */
  Optional<Weeks> weeks(long readingId, String quantity);

  /** The chunks of a reading's log; none for a capture. */
  LogSpan.Source chunks(long readingId);

  /** All rows of a reading's log, read as they are asked for; empty for a capture. */
  Optional<Series> series(long readingId);
}
