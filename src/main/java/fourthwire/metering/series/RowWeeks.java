package fourthwire.metering.series;

import java.time.ZoneId;
import java.util.Arrays;

/**
 * In which week and hour of the week the rows are, found once for all columns: stretches of rows of
 * the same hour, those of a week together, in the file's order.
 *
 * @param firstRow of each stretch
 * @param rows of each stretch
 * @param hour of the week of each stretch
 * @param weekEnd the stretch after each week's last
 */
record RowWeeks(long firstWeek, int[] firstRow, int[] rows, short[] hour, int[] weekEnd) {
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
    for (int k = 0; k < series.chunks(); k++) {
      for (long millis : series.startMillis(k)) {
        found.take(clock.week(millis), clock.hourOfWeek(millis));
      }
    }
    return found.byWeek();
  }

  /** How many weeks there are. */
  int weeks() {
    return weekEnd.length;
  }

  /** Stretches gathered row by row. */
  private static final class Stretches {
    private final long firstWeek;
    private final int weeks;
    private int[] end = new int[1024];
    private short[] week = new short[1024];
    private short[] hour = new short[1024];
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
        week[count] = in;
        hour[count++] = (short) hourOfWeek;
      }
      end[count - 1] = ++rows;
    }

    /** Puts stretches of a week together, for a clock may run back into the week before. */
    RowWeeks byWeek() {
      int[] weekEnd = new int[weeks];
      for (int s = 0; s < count; s++) {
        weekEnd[week[s]]++;
      }
      int[] next = new int[weeks];
      for (int w = 1; w < weeks; w++) {
        weekEnd[w] += weekEnd[w - 1];
        next[w] = weekEnd[w - 1];
      }
      int[] firstRow = new int[count];
      int[] rowsOf = new int[count];
      short[] hourOf = new short[count];
      for (int s = 0; s < count; s++) {
        int at = next[week[s]]++;
        firstRow[at] = s == 0 ? 0 : end[s - 1];
        rowsOf[at] = end[s] - firstRow[at];
        hourOf[at] = hour[s];
      }
      return new RowWeeks(firstWeek, firstRow, rowsOf, hourOf, weekEnd);
    }
  }
}
