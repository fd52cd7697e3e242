package fourthwire.metering.series;

import java.time.Instant;
import java.time.ZoneId;
import java.time.zone.ZoneOffsetTransition;
import java.time.zone.ZoneRules;

/** Local hours and weeks of instants, with the zone's next change kept at hand. Not thread-safe. */
public final class WeekClock {
  /** Hours of a week. */
  public static final int HOURS = 168;

  private static final long HOUR = 3_600_000;
  private static final long DAY = 24 * HOUR;

  /** 1 January 1970 was a Thursday. */
  private static final long MONDAY_BEFORE = 3;

  private final ZoneRules rules;
  private long from = Long.MAX_VALUE;
  private long to = Long.MIN_VALUE;
  private long offsetMillis;

  /** In this zone. */
  public WeekClock(ZoneId zone) {
    this.rules = zone.getRules();
  }

  /** Local time as if it were UTC, milliseconds. */
  public long local(long millis) {
    if (millis < from || millis >= to) {
      look(millis);
    }
    return millis + offsetMillis;
  }

  private void look(long millis) {
    Instant at = Instant.ofEpochMilli(millis);
    offsetMillis = 1000L * rules.getOffset(at).getTotalSeconds();
    ZoneOffsetTransition before = rules.previousTransition(at.plusNanos(1));
    ZoneOffsetTransition after = rules.nextTransition(at);
    from = before == null ? Long.MIN_VALUE : before.toEpochSecond() * 1000;
    to = after == null ? Long.MAX_VALUE : after.toEpochSecond() * 1000;
  }

  /** Local day, counted from 1 January 1970. */
  public long day(long millis) {
    return Math.floorDiv(local(millis), DAY);
  }

  /** Week that begins on Monday, counted from the one of 29 December 1969. */
  public long week(long millis) {
    return Math.floorDiv(day(millis) + MONDAY_BEFORE, 7L);
  }

  /** The first day of a week, counted from 1 January 1970. */
  public static long monday(long week) {
    return 7 * week - MONDAY_BEFORE;
  }

  /** Hour of the week: 0 is Monday's first. */
  public int hourOfWeek(long millis) {
    long local = local(millis);
    long day = Math.floorMod(Math.floorDiv(local, DAY) + MONDAY_BEFORE, 7L);
    return (int) (24 * day + Math.floorMod(local, DAY) / HOUR);
  }
}
