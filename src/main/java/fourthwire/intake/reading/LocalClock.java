package fourthwire.intake.reading;

import java.time.Duration;
import java.time.Instant;
import java.time.LocalDateTime;
import java.time.ZoneId;
import java.time.ZoneOffset;
import java.time.zone.ZoneOffsetTransition;
import java.time.zone.ZoneRules;
import java.util.List;

/**
 * Turns a meter's local times, row after row, into instants. The hour that comes twice in autumn is
 * taken as summer time until the local time runs back, then as winter time.
 */
final class LocalClock {
  private final ZoneRules rules;
  private LocalDateTime before = LocalDateTime.MIN;
  private boolean second;
  private long skipped;

  LocalClock(ZoneId zone) {
    this.rules = zone.getRules();
  }

  Instant at(LocalDateTime local) {
    List<ZoneOffset> offsets = rules.getValidOffsets(local);
    Instant at;
    if (offsets.size() == 1) {
      second = false;
      at = local.toInstant(offsets.get(0));
    } else if (offsets.isEmpty()) {
      skipped++;
      ZoneOffsetTransition gap = rules.getTransition(local);
      at = local.toInstant(gap.getOffsetBefore());
    } else {
      second = second || ranBack(local);
      at = local.toInstant(offsets.get(second ? 1 : 0));
    }
    before = local;
    return at;
  }

  /** Back by no more than the hour that is repeated. */
  private boolean ranBack(LocalDateTime local) {
    return local.isBefore(before)
        && Duration.between(local, before).compareTo(Duration.ofHours(1)) <= 0;
  }

  /** Rows at a local time that the change to summer time skips. */
  long skipped() {
    return skipped;
  }
}
