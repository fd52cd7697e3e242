package fourthwire.json;

import fourthwire.metering.LogResult;
import fourthwire.metering.LogResult.KeyInterval;
import fourthwire.metering.QuantitySummary;
import java.time.Duration;
import java.time.OffsetDateTime;
import java.time.ZoneId;
import java.util.Optional;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.node.ObjectNode;

/** The figures of an interval log. */
final class LogJson {
  private static final double NANOS = 1e9;

  private LogJson() {}

  static void write(ObjectNode o, LogResult log, ZoneId zone) {
    o.put("interval_s", log.interval().toNanos() / NANOS);
    o.set("quantities", Json.map(log.quantities(), LogJson::write));
    o.set("key_intervals", Json.list(log.keyIntervals(), k -> write(k, zone)));
  }

  private static ObjectNode write(QuantitySummary q) {
    return Json.object()
        .put("count", q.count())
        .put("min", q.min())
        .put("mean", q.mean())
        .put("max", q.max())
        .put("p95", q.p95())
        .put("p99", q.p99());
  }

  private static ObjectNode write(KeyInterval k, ZoneId zone) {
    ObjectNode o = Json.object().put("code", k.code()).put("start", Moments.write(k.start(), zone));
    o.put("reason", k.reason());
    ObjectNode values = o.putObject("values");
    k.values().forEach(values::put);
    return o;
  }

  static LogResult read(JsonNode o) {
    return new LogResult(
        Duration.ofNanos(Math.round(o.path("interval_s").doubleValue() * NANOS)),
        Json.map(o, "quantities", LogJson::summary),
        Json.list(o, "key_intervals", LogJson::keyInterval),
        Optional.empty());
  }

  private static QuantitySummary summary(JsonNode o) {
    return new QuantitySummary(
        o.path("count").longValue(),
        o.path("min").doubleValue(),
        o.path("mean").doubleValue(),
        o.path("max").doubleValue(),
        o.path("p95").doubleValue(),
        o.path("p99").doubleValue());
  }

  private static KeyInterval keyInterval(JsonNode o) {
    return new KeyInterval(
        o.path("code").asString(),
        OffsetDateTime.parse(o.path("start").asString()).toInstant(),
        o.path("reason").asString(),
        Json.map(o, "values", JsonNode::doubleValue));
  }
}
