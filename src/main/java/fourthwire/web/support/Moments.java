package fourthwire.web.support;

import fourthwire.site.Survey;
import java.time.DateTimeException;
import java.time.Instant;
import java.time.LocalDate;
import java.time.ZoneId;
import java.time.ZoneOffset;
import java.time.format.DateTimeFormatter;
import java.util.Locale;

/** Writes points in time in a site's own time zone; in UTC, said so, where it has none. */
public final class Moments {
  private static final DateTimeFormatter MINUTE =
      DateTimeFormatter.ofPattern("d MMMM uuuu, HH:mm", Locale.ENGLISH);

  private static final DateTimeFormatter SECOND =
      DateTimeFormatter.ofPattern("d MMMM uuuu, HH:mm:ss", Locale.ENGLISH);

  private static final DateTimeFormatter DAY =
      DateTimeFormatter.ofPattern("d MMMM uuuu", Locale.ENGLISH);

  private final ZoneId zone;

  private Moments(ZoneId zone) {
    this.zone = zone;
  }

  /** In the time zone of this survey. */
  public static Moments of(Survey survey) {
    return survey
        .settings()
        .timezone()
        .map(Moments::named)
        .orElseGet(() -> new Moments(ZoneOffset.UTC));
  }

  private static Moments named(String zone) {
    try {
      return new Moments(ZoneId.of(zone));
    } catch (DateTimeException unknown) {
      return new Moments(ZoneOffset.UTC);
    }
  }

  /** To the minute: 27 January 2026, 09:30. */
  public String minute(Instant moment) {
    return MINUTE.format(moment.atZone(zone)) + (zone.equals(ZoneOffset.UTC) ? " UTC" : "");
  }

  /** To the second: 27 January 2026, 09:30:05. */
  public String second(Instant moment) {
    return SECOND.format(moment.atZone(zone)) + (zone.equals(ZoneOffset.UTC) ? " UTC" : "");
  }

  /** A local day: 27 January 2026. */
  public static String day(LocalDate date) {
    return DAY.format(date);
  }
}
