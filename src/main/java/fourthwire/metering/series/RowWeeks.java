package fourthwire.metering.series;

import java.time.ZoneId;
import java.util.Arrays;

/**
 * In which week and hour of the week the rows are, found once for all columns: stretches of rows of
 * the same hour.
 *
 * @param end row after each stretch's last; empty where the rows are too many to be held
 * @param week of each stretch, counted from the first
 * @param hour of the week of each stretch
 * @param rising whether no week comes again once the next has begun
 */
record RowWeeks(long firstWeek, int weeks, int[] end, short[] week, short[] hour, boolean rising) {
  static RowWeeks of(Series series, ZoneId zone) {
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
    Stretches found = new Stretches(first, (int) Math.min(Short.MAX_VALUE, last - first + 1));
    for (int k = 0; series.rows() <= SeriesStatistics.MOST_IN_ARRAY && k < series.chunks(); k++) {
      for (long millis : series.startMillis(k)) {
        found.take(clock.week(millis), clock.hourOfWeek(millis));
      }
    }
    return found.done();
  }

  /** Stretches gathered row by row. */
  private static final class Stretches {
    private final long firstWeek;
    private final int weeks;
    private int[] end = new int[1024];
    private short[] week = new short[1024];
    private short[] hour = new short[1024];
    private boolean rising = true;
    private int count;
    private int rows;

    Stretches(long firstWeek, int weeks) {
      this.firstWeek = firstWeek;
      this.weeks = weeks;
    }

    void take(long calendarWeek, int hourOfWeek) {
      short in = (short) Math.min(weeks - 1L, calendarWeek - firstWeek);
      if (count == 0 || week[count - 1] != in || hour[count - 1] != hourOfWeek) {
        if (count == end.length) {
          end = Arrays.copyOf(end, 2 * count);
          week = Arrays.copyOf(week, 2 * count);
          hour = Arrays.copyOf(hour, 2 * count);
        }
        rising &= count == 0 || in >= week[count - 1];
        week[count] = in;
        hour[count++] = (short) hourOfWeek;
      }
      end[count - 1] = ++rows;
    }

    RowWeeks done() {
      return new RowWeeks(
          firstWeek,
          weeks,
          Arrays.copyOf(end, count),
          Arrays.copyOf(week, count),
          Arrays.copyOf(hour, count),
          rising);
    }
  }
}
