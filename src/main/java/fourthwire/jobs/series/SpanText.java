package fourthwire.jobs.series;

import java.time.DateTimeException;
import java.time.Instant;
import java.time.LocalDate;
import java.time.LocalDateTime;
import java.time.OffsetDateTime;
import java.time.ZoneId;
import java.util.Optional;

/** Points in time as people and scripts write them, ISO 8601. */
public final class SpanText {
  private SpanText() {}

  /**
   * With an offset from UTC, as local time of the zone, or as a date, which stands for its first
   * instant; empty where it is none of these.
   */
  public static Optional<Instant> instant(String text, ZoneId zone) {
    String t = text.strip().replace(' ', 'T');
    try {
      if (t.indexOf('T') < 0) {
        return Optional.of(LocalDate.parse(t).atStartOfDay(zone).toInstant());
      }
      // a plus sign of the offset that an address was given without escaping it
      String escaped = t.replaceFirst("T(\\d\\d:\\d\\d:?[\\d.]*)T", "T$1+");
      return Optional.of(
          escaped.matches(".*T.*([Zz]|[+-]\\d\\d(:?\\d\\d)?)$")
              ? OffsetDateTime.parse(escaped).toInstant()
              : LocalDateTime.parse(escaped).atZone(zone).toInstant());
    } catch (DateTimeException unreadable) {
      return Optional.empty();
    }
  }
}
