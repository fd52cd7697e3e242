package fourthwire.intake.reading.log;

import java.time.Instant;
import java.time.LocalDateTime;
import java.time.ZoneId;
import java.time.ZoneOffset;
import java.time.zone.ZoneOffsetTransition;
import java.time.zone.ZoneRules;
import java.util.List;

/**
 * Turns a meter's local times, row after row, into instants. The hour that comes twice in autumn is
 * taken as summer time until the local time runs back, then as winter time. Local times are
 * milliseconds as if they were UTC.
 */
final class LocalClock {
  private static final long HOUR_MILLIS = 3_600_000;

  private final ZoneRules rules;
  private long before = Long.MIN_VALUE;
  private long step;
  private boolean second;
  private long skipped;
  private long plainFrom = Long.MAX_VALUE;
  private long plainTo = Long.MIN_VALUE;
  private long plainOffset;

  LocalClock(ZoneId zone) {
    this.rules = zone.getRules();
  }

  /** The instant, milliseconds of the epoch. */
  long at(long localMillis) {
    long at;
    if (localMillis >= plainFrom && localMillis < plainTo) {
      second = false;
      at = localMillis - plainOffset;
    } else {
      at = look(localMillis);
    }
    step = localMillis - before;
    before = localMillis;
    return at;
  }

  private long look(long localMillis) {
    LocalDateTime local =
        LocalDateTime.ofEpochSecond(
            Math.floorDiv(localMillis, 1000L),
            (int) Math.floorMod(localMillis, 1000L) * 1_000_000,
            ZoneOffset.UTC);
    List<ZoneOffset> offsets = rules.getValidOffsets(local);
    if (offsets.size() == 1) {
      second = false;
      plain(local.toInstant(offsets.get(0)), offsets.get(0));
      return localMillis - millis(offsets.get(0));
    }
    if (offsets.isEmpty()) {
      skipped++;
      return localMillis - millis(rules.getTransition(local).getOffsetBefore());
    }
    // Back by no more than the hour that is repeated; rows of an hour stand there again.
    boolean ranBack =
        localMillis < before && before - localMillis <= HOUR_MILLIS
            || localMillis == before && step == HOUR_MILLIS;
    second = second || ranBack;
    return localMillis - millis(offsets.get(second ? 1 : 0));
  }

  /** Notes the stretch of local times that have this offset and no other. */
  private void plain(Instant at, ZoneOffset offset) {
    ZoneOffsetTransition last = rules.previousTransition(at.plusNanos(1));
    ZoneOffsetTransition next = rules.nextTransition(at);
    plainOffset = millis(offset);
    plainFrom =
        last == null
            ? Long.MIN_VALUE
            : 1000 * last.toEpochSecond()
                + Math.max(millis(last.getOffsetBefore()), millis(last.getOffsetAfter()));
    plainTo =
        next == null
            ? Long.MAX_VALUE
            : 1000 * next.toEpochSecond()
                + Math.min(millis(next.getOffsetBefore()), millis(next.getOffsetAfter()));
  }

  private static long millis(ZoneOffset offset) {
    return 1000L * offset.getTotalSeconds();
  }

  /** Rows at a local time that the change to summer time skips. */
  long skipped() {
    return skipped;
  }
}
