package fourthwire.metering.reduce;

import java.time.DayOfWeek;
import java.time.Duration;
import java.time.Instant;
import java.time.LocalDate;
import java.time.LocalDateTime;
import java.time.Period;
import java.time.ZoneId;
import java.time.temporal.TemporalAdjusters;
import java.time.temporal.TemporalAmount;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * A span of time cut into steps of a round length: to an hour in fixed lengths, above it by the
 * local clock and calendar, so that the day on which the clocks change is one step of 23 or 25
 * hours. The span is widened to whole steps.
 */
public final class TimeSteps {
  private static final long SECOND = 1000;
  private static final long LONGEST_FIXED = 3600 * SECOND;
  private static final int[] FIXED_S = {
    1, 2, 5, 10, 15, 20, 30, 60, 120, 180, 300, 600, 900, 1200, 1800, 3600
  };
  private static final int[] CLOCK_H = {2, 3, 4, 6, 12};
  private static final int[] MONTHS = {1, 3, 12, 120, 1200};

  private final TemporalAmount length;
  private final long[] edges;

  private TimeSteps(TemporalAmount length, long[] edges) {
    this.length = length;
    this.edges = edges;
  }

  /**
   * The shortest round steps of which the span has no more than {@code most}, none shorter than a
   * row; fixed lengths hold whole rows.
   *
   * @param fromMillis first instant, milliseconds of the epoch
   * @param toMillis the instant after the last
   * @param intervalMillis length of a row
   * @param most at least 2
   */
  public static TimeSteps of(
      long fromMillis, long toMillis, long intervalMillis, int most, ZoneId zone) {
    if (toMillis <= fromMillis || most < 2) {
      throw new IllegalArgumentException("no steps from " + fromMillis + " to " + toMillis);
    }
    for (TemporalAmount length : lengths(intervalMillis)) {
      if ((toMillis - fromMillis) / millis(length) <= most) {
        TimeSteps steps = of(fromMillis, toMillis, length, zone);
        if (steps.count() <= most) {
          return steps;
        }
      }
    }
    return of(fromMillis, toMillis, Period.ofYears(1000), zone);
  }

  /** Whole local days. */
  public static TimeSteps days(long fromMillis, long toMillis, ZoneId zone) {
    return of(fromMillis, toMillis, Period.ofDays(1), zone);
  }

  /** Whole local weeks, from Monday on. */
  public static TimeSteps weeks(long fromMillis, long toMillis, ZoneId zone) {
    return of(fromMillis, toMillis, Period.ofWeeks(1), zone);
  }

  private static List<TemporalAmount> lengths(long intervalMillis) {
    List<TemporalAmount> all = new ArrayList<>();
    all.add(Duration.ofMillis(intervalMillis));
    for (int s : FIXED_S) {
      long millis = s * SECOND;
      if (millis > intervalMillis && millis % intervalMillis == 0) {
        all.add(Duration.ofMillis(millis));
      }
    }
    for (int h : CLOCK_H) {
      if (h * LONGEST_FIXED > intervalMillis) {
        all.add(Duration.ofHours(h));
      }
    }
    all.add(Period.ofDays(1));
    all.add(Period.ofWeeks(1));
    for (int months : MONTHS) {
      all.add(Period.ofMonths(months));
    }
    return all;
  }

  private static double millis(TemporalAmount length) {
    return length instanceof Duration d
        ? d.toMillis()
        : 24.0 * LONGEST_FIXED * (((Period) length).getDays() + 30.4 * months(length));
  }

  private static long months(TemporalAmount length) {
    return ((Period) length).toTotalMonths();
  }

  private static TimeSteps of(long from, long to, TemporalAmount length, ZoneId zone) {
    boolean fixed = length instanceof Duration d && d.toMillis() <= LONGEST_FIXED;
    long[] edges =
        fixed
            ? fixed(from, to, ((Duration) length).toMillis(), zone)
            : byClock(from, to, length, zone);
    return new TimeSteps(length, edges);
  }

  private static long[] fixed(long from, long to, long step, ZoneId zone) {
    long offset = SECOND * zone.getRules().getOffset(Instant.ofEpochMilli(from)).getTotalSeconds();
    long first = Math.floorDiv(from + offset, step) * step - offset;
    int count = Math.toIntExact((to - first + step - 1) / step);
    long[] edges = new long[count + 1];
    Arrays.setAll(edges, k -> first + k * step);
    return edges;
  }

  private static long[] byClock(long from, long to, TemporalAmount length, ZoneId zone) {
    LocalDateTime at = before(LocalDateTime.ofInstant(Instant.ofEpochMilli(from), zone), length);
    List<Long> edges = new ArrayList<>();
    long last = Long.MIN_VALUE;
    while (last < to) {
      long edge = at.atZone(zone).toInstant().toEpochMilli();
      if (edge > last) {
        edges.add(edge);
        last = edge;
      }
      at = at.plus(length);
    }
    return edges.stream().mapToLong(Long::longValue).toArray();
  }

  /** The last round time not after this one. */
  private static LocalDateTime before(LocalDateTime at, TemporalAmount length) {
    LocalDate day = at.toLocalDate();
    if (length instanceof Duration d) {
      long hours = Math.max(1, d.toHours());
      return hours > 24 ? day.atStartOfDay() : day.atTime((int) (at.getHour() / hours * hours), 0);
    }
    long months = months(length);
    if (months > 0) {
      long month = 12L * day.getYear() + day.getMonthValue() - 1;
      return LocalDate.of(0, 1, 1).plusMonths(month / months * months).atStartOfDay();
    }
    boolean week = ((Period) length).getDays() == 7;
    return (week ? day.with(TemporalAdjusters.previousOrSame(DayOfWeek.MONDAY)) : day)
        .atStartOfDay();
  }

  /** How many steps there are. */
  public int count() {
    return edges.length - 1;
  }

  /** Where step {@code k} begins; of {@link #count()}, where the last one ends. */
  public long edge(int k) {
    return edges[k];
  }

  /** First instant of the first step. */
  public long from() {
    return edges[0];
  }

  /** The instant after the last step. */
  public long to() {
    return edges[edges.length - 1];
  }

  /** Length of a step: a {@link Duration}, or from a day on a {@link Period}. */
  public TemporalAmount length() {
    return length;
  }

  /**
   * The step an instant lies in; -1 outside the span.
   *
   * @param guess a step likely near it
   */
  public int indexOf(long millis, int guess) {
    if (millis < edges[0] || millis >= edges[edges.length - 1]) {
      return -1;
    }
    int k = guess;
    if (millis < edges[k] || millis >= edges[Math.min(k + 2, edges.length - 1)]) {
      int found = Arrays.binarySearch(edges, millis);
      return found >= 0 ? found : -found - 2;
    }
    return millis < edges[k + 1] ? k : k + 1;
  }
}
