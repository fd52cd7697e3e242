package fourthwire.intake.reading.log;

import fourthwire.intake.reading.table.DateOrder;
import fourthwire.intake.reading.table.RowTime;
import fourthwire.intake.reading.table.TextTable;
import fourthwire.intake.reading.table.TimeColumns;
import java.time.Instant;
import java.time.LocalDateTime;
import java.time.ZoneId;
import java.time.ZoneOffset;
import java.time.zone.ZoneOffsetTransition;
import java.time.zone.ZoneRules;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;

/**
 * Whether a meter's clock keeps standard time all year although its zone changes to summer time:
 * its rows then run evenly through the hour that spring skips and once through the hour that autumn
 * repeats. Rows may run either way.
 */
final class StandardTime {
  private static final long HOUR_MILLIS = 3_600_000;

  /** A longer log is not looked through for this before it is read. */
  private static final long MOST_ROWS = 600_000;

  private final ZoneRules rules;
  private final Map<ZoneOffsetTransition, Change> changes = new LinkedHashMap<>();
  private long quietFrom = Long.MAX_VALUE;
  private long quietTo = Long.MIN_VALUE;

  /** Whether its clock was seen to change: no other row is looked at then. */
  private boolean followed;

  private StandardTime(ZoneId zone) {
    this.rules = zone.getRules();
  }

  /** The offset that its clock keeps; empty where it changes, or nothing tells. */
  static Optional<ZoneOffset> kept(
      TextTable table, TimeColumns time, DateOrder order, ZoneId zone) {
    StandardTime look = new StandardTime(zone);
    return look.rules.isFixedOffset() || !look.take(table, time, order)
        ? Optional.empty()
        : look.kept();
  }

  /** False where offsets are written: they settle it. */
  private boolean take(TextTable table, TimeColumns time, DateOrder order) {
    RowTime at = new RowTime(time, order);
    long[] rows = {0};
    table.forEach(
        time.cells(),
        row -> {
          if (at.read(row)) {
            rows[0] = at.offsetSeconds() == RowTime.NO_OFFSET ? rows[0] + 1 : -1;
            take(at.localMillis());
          }
          return rows[0] >= 0 && rows[0] < MOST_ROWS && !followed;
        });
    return rows[0] > 0;
  }

  private void take(long local) {
    if (local >= quietFrom && local < quietTo) {
      return;
    }
    Instant about = Instant.ofEpochMilli(local);
    ZoneOffsetTransition next = rules.nextTransition(about.minusSeconds(86_400));
    ZoneOffsetTransition last = rules.previousTransition(about.minusSeconds(86_400));
    if (next != null) {
      Change change = changes.computeIfAbsent(next, Change::new);
      change.take(local);
      followed = change.isFollowed();
      quietTo = change.from - HOUR_MILLIS;
      quietFrom = last == null ? Long.MIN_VALUE : 1000 * last.toEpochSecond() + 86_400_000;
    }
  }

  private Optional<ZoneOffset> kept() {
    return followed || changes.values().stream().anyMatch(Change::isFollowed)
        ? Optional.empty()
        : changes.values().stream()
            .filter(Change::isPassedOver)
            .findFirst()
            .map(c -> rules.getStandardOffset(c.at.getInstant()));
  }

  /** What rows there are about one change of the zone's clocks. */
  private static final class Change {
    private final ZoneOffsetTransition at;
    private final long from;
    private final long to;
    private long lastBefore = Long.MIN_VALUE;
    private long firstWithin = Long.MAX_VALUE;
    private long lastWithin = Long.MIN_VALUE;
    private long firstAfter = Long.MAX_VALUE;
    private long previous = Long.MIN_VALUE;
    private int on;
    private int back;
    private int again;

    Change(ZoneOffsetTransition at) {
      this.at = at;
      long before = millis(at.getDateTimeBefore());
      long after = millis(at.getDateTimeAfter());
      this.from = Math.min(before, after);
      this.to = Math.max(before, after);
    }

    private static long millis(LocalDateTime local) {
      return local.toInstant(ZoneOffset.UTC).toEpochMilli();
    }

    void take(long local) {
      if (local < from) {
        lastBefore = Math.max(lastBefore, local);
      } else if (local >= to) {
        firstAfter = Math.min(firstAfter, local);
      } else {
        firstWithin = Math.min(firstWithin, local);
        lastWithin = Math.max(lastWithin, local);
        on += local > previous && previous >= from && previous < to ? 1 : 0;
        back += local < previous && previous >= from && previous < to ? 1 : 0;
        again += local == previous ? 1 : 0;
      }
      previous = local;
    }

    private boolean isRowWithin() {
      return lastWithin >= from;
    }

    private static boolean isNear(long earlier, long later) {
      return earlier != Long.MIN_VALUE && later != Long.MAX_VALUE && later - earlier <= HOUR_MILLIS;
    }

    /** The rows run through the hour as if there were no change. */
    boolean isPassedOver() {
      boolean through = isRowWithin() && isNear(lastWithin, firstAfter);
      return through && (at.isGap() || isNear(lastBefore, firstWithin) && isOneWay());
    }

    private boolean isOneWay() {
      return again == 0 && (on == 0 || back == 0);
    }

    /** The rows leave out the hour that spring skips, or stand in that of autumn twice. */
    boolean isFollowed() {
      return at.isGap()
          ? !isRowWithin() && isNear(lastBefore, from) && isNear(to, firstAfter)
          : isRowWithin() && !isOneWay();
    }
  }
}
