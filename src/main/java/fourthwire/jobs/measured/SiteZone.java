package fourthwire.jobs.measured;

import fourthwire.site.Survey;
import java.time.DateTimeException;
import java.time.ZoneId;
import java.time.ZoneOffset;

/** The time zone a site's points in time are told in. */
public final class SiteZone {
  private SiteZone() {}

  /** The survey's; UTC where it names none. */
  public static ZoneId of(Survey survey) {
    try {
      return survey.settings().timezone().map(ZoneId::of).orElse(ZoneOffset.UTC);
    } catch (DateTimeException unknown) {
      return ZoneOffset.UTC;
    }
  }
}
