package fourthwire.json;

import java.time.Instant;
import java.time.OffsetDateTime;
import java.time.ZoneId;
import java.time.format.DateTimeFormatter;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.node.ObjectNode;

/** Points in time: ISO 8601, always with seconds and the offset from UTC. */
final class Moments {
  private static final String FROM = "from";
  private static final String TO = "to";

  private Moments() {}

  static String write(OffsetDateTime moment) {
    return DateTimeFormatter.ISO_OFFSET_DATE_TIME.format(moment);
  }

  static String write(Instant moment, ZoneId zone) {
    return write(moment.atZone(zone).toOffsetDateTime());
  }

  static ObjectNode write(OffsetDateTime from, OffsetDateTime to) {
    return Json.object().put(FROM, write(from)).put(TO, write(to));
  }

  static OffsetDateTime from(JsonNode period) {
    return OffsetDateTime.parse(period.path(FROM).asString());
  }

  static OffsetDateTime to(JsonNode period) {
    return OffsetDateTime.parse(period.path(TO).asString());
  }
}
