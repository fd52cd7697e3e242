package fourthwire.metering.series;

import java.time.ZoneId;

/**
 * Week and hour of the week of every row, found once for all columns.
 *
 * @param week of each row, counted from the first; empty where the rows are too many to be held
 * @param hour of the week of each row
 */
record RowWeeks(long firstWeek, int weeks, short[] week, short[] hour) {
  static RowWeeks of(LogSeries series, ZoneId zone) {
    WeekClock clock = new WeekClock(zone);
    long first = Long.MAX_VALUE;
    long last = Long.MIN_VALUE;
    for (int k = 0; k < series.chunks(); k++) {
      for (long millis : series.startMillis(k)) {
        long week = clock.week(millis);
        first = Math.min(first, week);
        last = Math.max(last, week);
      }
    }
    int held = series.rows() <= SeriesStatistics.MOST_IN_ARRAY ? (int) series.rows() : 0;
    RowWeeks rows =
        new RowWeeks(
            first,
            (int) Math.min(Short.MAX_VALUE, last - first + 1),
            new short[held],
            new short[held]);
    rows.fill(series, clock);
    return rows;
  }

  private void fill(LogSeries series, WeekClock clock) {
    int row = 0;
    for (int k = 0; week.length > 0 && k < series.chunks(); k++) {
      for (long millis : series.startMillis(k)) {
        week[row] = (short) Math.min(weeks - 1L, clock.week(millis) - firstWeek);
        hour[row++] = (short) clock.hourOfWeek(millis);
      }
    }
  }
}
