package fourthwire.json;

import fourthwire.metering.CaptureResult;
import fourthwire.metering.CaptureResult.Unbalance;
import fourthwire.metering.CaptureWindows;
import fourthwire.metering.CaptureWindows.HarmonicGroups;
import fourthwire.metering.VoltageEvents;
import fourthwire.metering.VoltageEvents.Event;
import fourthwire.metering.WaveformPicture;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.node.ArrayNode;
import tools.jackson.databind.node.DoubleNode;
import tools.jackson.databind.node.ObjectNode;

/** What a capture has beside a node's figures: unbalance, windows, events, its waveforms. */
final class WaveformJson {
  private static final String VOLTAGE_UNBALANCE = "voltage_unbalance_percent";
  private static final String CURRENT_UNBALANCE = "current_unbalance_percent";
  private static final String ZERO_SEQUENCE = "zero_sequence_percent";
  private static final String WINDOWS = "windows";
  private static final String EVENTS = "events";
  private static final String WAVEFORMS = "waveforms";
  private static final String CLOSE_UP = "first_cycles";

  private WaveformJson() {}

  static void write(ObjectNode o, CaptureResult c) {
    Json.put(o, VOLTAGE_UNBALANCE, c.unbalance().voltagePercent());
    Json.put(o, CURRENT_UNBALANCE, c.unbalance().currentPercent());
    Json.put(o, ZERO_SEQUENCE, c.unbalance().zeroSequencePercent());
    c.windows().ifPresent(w -> o.set(WINDOWS, write(w)));
    o.set(EVENTS, write(c.events()));
    o.set(WAVEFORMS, write(c.picture()));
    o.set(CLOSE_UP, write(c.closeUp()));
  }

  static Unbalance unbalance(JsonNode o) {
    return new Unbalance(
        Json.figure(o, VOLTAGE_UNBALANCE),
        Json.figure(o, CURRENT_UNBALANCE),
        Json.figure(o, ZERO_SEQUENCE));
  }

  private static ObjectNode write(CaptureWindows w) {
    ObjectNode o = Json.object().put("count", w.count()).put("cycles", w.cycles());
    o.set("groups", Json.map(w.groups(), WaveformJson::write));
    o.set("intervals", Json.list(w.intervals(), WaveformJson::write));
    return o;
  }

  private static ObjectNode write(HarmonicGroups g) {
    ObjectNode o = Json.object();
    o.set("groups", numbers(g.groups()));
    o.set("subgroups", numbers(g.subgroups()));
    o.set("interharmonic_groups", numbers(g.interharmonicGroups()));
    o.set("interharmonic_subgroups", numbers(g.interharmonicSubgroups()));
    return o;
  }

  private static ObjectNode write(CaptureWindows.Interval i) {
    ObjectNode o = Json.object().put("length", i.length());
    o.put("from_s", i.fromS()).put("to_s", i.toS()).put("frequency_hz", i.frequencyHz());
    o.set("rms", Json.map(i.rms(), DoubleNode::valueOf));
    o.set("thd_percent", Json.map(i.thdPercent(), DoubleNode::valueOf));
    Json.put(o, VOLTAGE_UNBALANCE, i.voltageUnbalancePercent());
    return o;
  }

  static Optional<CaptureWindows> windows(JsonNode capture) {
    JsonNode o = capture.path(WINDOWS);
    return o.isObject()
        ? Optional.of(
            new CaptureWindows(
                o.path("count").intValue(),
                o.path("cycles").intValue(),
                Json.map(o, "groups", WaveformJson::groups),
                Json.list(o, "intervals", WaveformJson::interval)))
        : Optional.empty();
  }

  private static HarmonicGroups groups(JsonNode o) {
    return new HarmonicGroups(
        numbers(o, "groups"),
        numbers(o, "subgroups"),
        numbers(o, "interharmonic_groups"),
        numbers(o, "interharmonic_subgroups"));
  }

  private static CaptureWindows.Interval interval(JsonNode o) {
    return new CaptureWindows.Interval(
        o.path("length").asString(""),
        o.path("from_s").doubleValue(),
        o.path("to_s").doubleValue(),
        o.path("frequency_hz").doubleValue(),
        Json.map(o, "rms", JsonNode::doubleValue),
        Json.map(o, "thd_percent", JsonNode::doubleValue),
        Json.number(o, VOLTAGE_UNBALANCE));
  }

  private static ObjectNode write(VoltageEvents e) {
    ObjectNode o = Json.object().put("basis", e.basis());
    o.set("lowest_v", Json.map(e.lowestV(), DoubleNode::valueOf));
    o.set("highest_v", Json.map(e.highestV(), DoubleNode::valueOf));
    o.set("list", Json.list(e.events(), WaveformJson::write));
    return o;
  }

  private static ObjectNode write(Event e) {
    return Json.object()
        .put("kind", e.kind().word())
        .put("from_s", e.fromS())
        .put("duration_s", e.durationS())
        .put("whole", e.whole())
        .put("place", e.place())
        .put("extreme_v", e.extremeV())
        .put("percent", e.percent());
  }

  static VoltageEvents events(JsonNode capture) {
    JsonNode o = capture.path(EVENTS);
    return new VoltageEvents(
        o.path("basis").asString(""),
        Json.map(o, "lowest_v", JsonNode::doubleValue),
        Json.map(o, "highest_v", JsonNode::doubleValue),
        Json.list(o, "list", WaveformJson::event));
  }

  private static Event event(JsonNode o) {
    String word = o.path("kind").asString("");
    return new Event(
        Arrays.stream(VoltageEvents.Kind.values())
            .filter(k -> k.word().equals(word))
            .findFirst()
            .orElseThrow(),
        o.path("from_s").doubleValue(),
        o.path("duration_s").doubleValue(),
        o.path("whole").booleanValue(),
        o.path("place").asString(""),
        o.path("extreme_v").doubleValue(),
        o.path("percent").doubleValue());
  }

  private static ObjectNode write(WaveformPicture p) {
    ObjectNode o = Json.object().put("step_s", p.stepS());
    o.set("channels", Json.map(p.channels(), WaveformJson::write));
    return o;
  }

  private static ObjectNode write(WaveformPicture.Trace t) {
    ObjectNode o = Json.object();
    o.set("min", numbers(t.lowest()));
    o.set("max", numbers(t.highest()));
    return o;
  }

  static WaveformPicture picture(JsonNode capture) {
    return picture(capture, WAVEFORMS);
  }

  /** Without channels of a reading stored before it was made. */
  static WaveformPicture closeUp(JsonNode capture) {
    return picture(capture, CLOSE_UP);
  }

  private static WaveformPicture picture(JsonNode capture, String key) {
    JsonNode o = capture.path(key);
    return new WaveformPicture(
        o.path("step_s").asDouble(0),
        Json.map(
            o, "channels", t -> new WaveformPicture.Trace(numbers(t, "min"), numbers(t, "max"))));
  }

  private static ArrayNode numbers(List<Double> values) {
    return Json.list(values, DoubleNode::valueOf);
  }

  private static List<Double> numbers(JsonNode o, String key) {
    return Json.list(o, key, JsonNode::doubleValue);
  }
}
