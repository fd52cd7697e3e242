package fourthwire.metering.series;

import java.time.ZoneId;
import java.util.List;
import java.util.Optional;
import java.util.function.IntFunction;
import java.util.stream.IntStream;

/**
 * Statistics of every quantity of a series: over all rows, by week and by hour of the week.
 *
 * @param firstWeek the week of the first row, as {@link WeekClock#week} counts
 * @param quantities in the order of the series
 */
public record SeriesStatistics(long firstWeek, int weeks, List<QuantityStatistics> quantities) {
  /** Shares of work, each with a workplace of its own. */
  private static final int SHARES = 16;

  /** Of all rows; the quantities are shared among the processors. */
  public static SeriesStatistics of(Series series, ZoneId zone) {
    return of(series, zone, q -> Optional.empty());
  }

  /**
   * Likewise, where those of some columns are known.
   *
   * @param known of a column by its position; its rows must be the same and at the same times
   */
  public static SeriesStatistics of(
      Series series, ZoneId zone, IntFunction<Optional<QuantityStatistics>> known) {
    RowWeeks rows = RowWeeks.of(series, zone);
    int quantities = series.quantities().size();
    int share = Math.max(1, quantities / SHARES);
    List<QuantityStatistics> all =
        IntStream.range(0, (quantities + share - 1) / share)
            .parallel()
            .boxed()
            .flatMap(
                k -> {
                  ColumnStatistics column = new ColumnStatistics(series, rows);
                  return IntStream.range(share * k, Math.min(quantities, share * (k + 1)))
                      .mapToObj(q -> known.apply(q).orElseGet(() -> column.of(q)));
                })
            .toList();
    return new SeriesStatistics(rows.firstWeek(), rows.weeks(), all);
  }
}
