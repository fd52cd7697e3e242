package fourthwire.metering.reduce;

import java.time.Instant;
import java.time.LocalDate;
import java.time.ZoneId;
import java.util.ArrayList;
import java.util.List;

/**
 * Which local days a log covers, and how much of each: rows of different times on the rows a day
 * has at the log's interval, which the change of clocks makes more or fewer.
 */
public final class DayCoverage {
  private final TimeSteps days;
  private final long intervalMillis;
  private final int[] rows;
  private final ZoneId zone;
  private int at;
  private long before = Long.MIN_VALUE;

  /**
   * A day.
   *
   * @param rows rows of different times
   * @param share of the rows it could have, 0 to 1
   */
  public record Day(LocalDate date, int rows, double share) {}

  private DayCoverage(TimeSteps days, long intervalMillis, ZoneId zone) {
    this.days = days;
    this.intervalMillis = intervalMillis;
    this.rows = new int[days.count()];
    this.zone = zone;
  }

  /**
   * Of a log from its first instant to the one after its last.
   *
   * @return every day from the first to the last
   */
  public static List<Day> of(
      LogSpan log, long fromMillis, long toMillis, long intervalMillis, ZoneId zone) {
    DayCoverage found =
        new DayCoverage(TimeSteps.days(fromMillis, toMillis, zone), intervalMillis, zone);
    log.times(found::take);
    return found.found();
  }

  private void take(long[] times) {
    for (long t : times) {
      int day = t == before ? -1 : days.indexOf(t + intervalMillis / 2, at);
      before = t;
      if (day >= 0) {
        at = day;
        rows[day]++;
      }
    }
  }

  private List<Day> found() {
    List<Day> found = new ArrayList<>();
    for (int k = 0; k < rows.length; k++) {
      double whole = Math.max(1, (double) (days.edge(k + 1) - days.edge(k)) / intervalMillis);
      LocalDate date = LocalDate.ofInstant(Instant.ofEpochMilli(days.edge(k)), zone);
      found.add(new Day(date, rows[k], Math.min(1, rows[k] / whole)));
    }
    return found;
  }
}
