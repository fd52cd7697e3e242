package fourthwire.json;

import fourthwire.audit.HeadlineFigure;
import fourthwire.audit.NodeDoubt;
import fourthwire.audit.NodeDoubt.ClampPoint;
import fourthwire.audit.NodeDoubt.InputShare;
import fourthwire.audit.NodeDoubt.Range;
import java.util.EnumMap;
import java.util.Map;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.node.ObjectNode;

/** How sure a node's figures are: their ranges by name, and where the doubt comes from. */
final class DoubtJson {
  private DoubtJson() {}

  static ObjectNode range(NodeDoubt d) {
    ObjectNode o = Json.object();
    d.range()
        .forEach(
            (figure, r) ->
                o.putObject(figure.word())
                    .put("p5", r.p5())
                    .put("p50", r.p50())
                    .put("p95", r.p95()));
    return o;
  }

  static ObjectNode write(NodeDoubt d) {
    ObjectNode o = Json.object().put("draws", d.draws()).put("seed", d.seed());
    o.put("ranked", d.ranked().word());
    o.set(
        "inputs",
        Json.list(d.inputs(), i -> Json.object().put("input", i.input()).put("share", i.share())));
    o.set(
        "clamp_next",
        Json.list(d.clampNext(), c -> Json.object().put("node", c.node()).put("share", c.share())));
    return o;
  }

  static NodeDoubt read(JsonNode range, JsonNode o) {
    Map<HeadlineFigure, Range> ranges = new EnumMap<>(HeadlineFigure.class);
    Json.entries(
        range,
        (word, r) ->
            ranges.put(
                figure(word),
                new Range(
                    r.path("p5").doubleValue(),
                    r.path("p50").doubleValue(),
                    r.path("p95").doubleValue())));
    return new NodeDoubt(
        o.path("draws").asInt(),
        o.path("seed").asLong(),
        ranges,
        figure(o.path("ranked").asString()),
        Json.list(
            o,
            "inputs",
            i -> new InputShare(i.path("input").asString(), i.path("share").doubleValue())),
        Json.list(
            o,
            "clamp_next",
            c -> new ClampPoint(c.path("node").asString(), c.path("share").doubleValue())));
  }

  private static HeadlineFigure figure(String word) {
    return HeadlineFigure.find(word)
        .orElseThrow(() -> new IllegalArgumentException("no headline figure is called " + word));
  }
}
