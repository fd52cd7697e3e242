package fourthwire.json;

import fourthwire.metering.ReadingKind;
import fourthwire.metering.ReadingMapping;
import fourthwire.metering.ReadingMapping.Column;
import fourthwire.metering.ReadingMapping.Stamp;
import fourthwire.metering.ReadingMapping.Statistic;
import fourthwire.metering.ReadingMapping.Time;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import tools.jackson.core.JacksonException;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.node.ObjectNode;

/** The mapping of a reading's columns, section 4 of the public contract. */
public final class MappingJson {
  private MappingJson() {}

  /** A mapping's text can't be read; the message says where and what is accepted. */
  public static final class RefusedException extends RuntimeException {
    private static final long serialVersionUID = 1L;

    RefusedException(String message) {
      super(message);
    }
  }

  /** The mapping's document; what is not known is left out. */
  public static ObjectNode write(ReadingMapping mapping) {
    ObjectNode o = Json.object();
    mapping.kind().ifPresent(kind -> o.put("kind", kind.word()));
    if (!mapping.time().equals(Time.FROM_FILE)) {
      o.set("time", write(mapping.time()));
    }
    mapping.sampleRateHz().ifPresent(rate -> o.put("sample_rate_hz", rate));
    o.set("columns", Json.map(mapping.columns(), MappingJson::write));
    return o;
  }

  private static ObjectNode write(Time time) {
    ObjectNode o = Json.object();
    if (!time.columns().isEmpty()) {
      o.set("columns", Json.strings(time.columns()));
    }
    time.format().ifPresent(format -> o.put("format", format));
    time.zone().ifPresent(zone -> o.put("zone", zone));
    time.stamp().ifPresent(stamp -> o.put("stamp", stamp.word()));
    time.intervalS().ifPresent(interval -> o.put("interval_s", interval));
    return o;
  }

  private static ObjectNode write(Column column) {
    return Json.object()
        .put("quantity", column.quantity())
        .put("statistic", column.statistic().word())
        .put("factor", column.factor());
  }

  /**
   * The mapping a document holds.
   *
   * @throws RefusedException where it is not one
   */
  public static ReadingMapping read(String document) {
    JsonNode o = parsed(document);
    Optional<ReadingKind> kind = Json.text(o, "kind").map(MappingJson::kind);
    return new ReadingMapping(
        kind, time(o.path("time")), numberOf(o, "sample_rate_hz"), columns(o, kind));
  }

  private static JsonNode parsed(String document) {
    try {
      JsonNode o = Json.parse(document);
      if (o.isObject()) {
        return o;
      }
    } catch (JacksonException e) {
      throw new RefusedException(
          "the mapping is not JSON: it can't be read from line %d, column %d on"
              .formatted(e.getLocation().getLineNr(), e.getLocation().getColumnNr()));
    }
    throw new RefusedException("the mapping must be a JSON object with \"columns\"");
  }

  private static ReadingKind kind(String word) {
    return ReadingKind.find(word)
        .orElseThrow(
            () -> new RefusedException("kind is \"" + word + "\"; it must be log or capture"));
  }

  private static Time time(JsonNode o) {
    if (!o.isMissingNode() && !o.isObject()) {
      throw new RefusedException("time must be an object such as {\"columns\":[\"Time\"]}");
    }
    return new Time(
        Json.strings(o, "columns"),
        Json.text(o, "format"),
        Json.text(o, "zone"),
        Json.text(o, "stamp").map(w -> constant(Stamp.class, "time.stamp", w)),
        numberOf(o, "interval_s"));
  }

  private static OptionalDouble numberOf(JsonNode o, String key) {
    JsonNode value = o.path(key);
    if (value.isMissingNode() || value.isNull()) {
      return OptionalDouble.empty();
    }
    if (!value.isNumber() || !(value.doubleValue() > 0)) {
      throw new RefusedException(key + " is " + value + "; it must be a number above 0");
    }
    return OptionalDouble.of(value.doubleValue());
  }

  private static Map<String, Column> columns(JsonNode o, Optional<ReadingKind> kind) {
    if (!o.path("columns").isObject()) {
      throw new RefusedException(
          "columns must be an object such as {\"I1\":{\"quantity\":\"L1.rms_a\"}}");
    }
    Statistic usual =
        kind.filter(ReadingKind.CAPTURE::equals).isPresent() ? Statistic.INSTANT : Statistic.MEAN;
    Map<String, Column> columns = new LinkedHashMap<>();
    Json.entries(
        o.path("columns"), (header, column) -> columns.put(header, column(header, column, usual)));
    return columns;
  }

  private static Column column(String header, JsonNode o, Statistic usual) {
    String where = "columns." + header;
    String quantity =
        Json.text(o, "quantity")
            .orElseThrow(() -> new RefusedException(where + " must name its quantity"));
    Statistic statistic =
        Json.text(o, "statistic")
            .map(w -> constant(Statistic.class, where + ".statistic", w))
            .orElse(usual);
    JsonNode factor = o.path("factor");
    if (!factor.isMissingNode() && !factor.isNull() && !factor.isNumber()) {
      throw new RefusedException(where + ".factor is " + factor + "; it must be a number");
    }
    return new Column(quantity, statistic, factor.isNumber() ? factor.doubleValue() : 1);
  }

  private static <E extends Enum<E>> E constant(Class<E> type, String where, String word) {
    List<String> words =
        Arrays.stream(type.getEnumConstants()).map(c -> c.name().toLowerCase(Locale.ROOT)).toList();
    int index = words.indexOf(word);
    if (index < 0) {
      throw new RefusedException(
          where + " is \"" + word + "\"; it must be one of " + String.join(", ", words));
    }
    return type.getEnumConstants()[index];
  }
}
