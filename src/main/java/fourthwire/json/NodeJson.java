package fourthwire.json;

import fourthwire.audit.DesignState;
import fourthwire.audit.NodeResult;
import fourthwire.limits.Finding;
import fourthwire.limits.Severity;
import fourthwire.site.SiteTree;
import java.util.Locale;
import java.util.Optional;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.node.ObjectNode;

/** The result for a node, section 6 of the public contract. */
public final class NodeJson {
  private static final String DESIGN = "design";
  private static final String DESIGN_REASON = "design_reason";
  private static final String LATER = "not computed by this version";

  private NodeJson() {}

  /** The document of a result. */
  public static ObjectNode write(NodeResult r) {
    ObjectNode o = Json.object().put("node", r.node()).put("kind", r.kind().word());
    Json.put(o, "fed_from", r.fedFrom());
    o.put("supply", r.supply());
    r.design()
        .ifPresentOrElse(
            d -> o.set(DESIGN, DesignJson.write(d)),
            () -> Json.putAbsent(o, DESIGN, r.designReason()));
    Json.putAbsent(o, "range", LATER);
    Json.putAbsent(o, "week", LATER);
    MeasuredJson.write(o, r.measured());
    o.set("findings", Json.list(r.findings(), NodeJson::write));
    o.set("assumptions", Json.strings(r.assumptions()));
    return o;
  }

  private static ObjectNode write(Finding f) {
    ObjectNode o = Json.object().put("code", f.code()).put("severity", f.severity().word());
    Json.put(o, "figure", f.figure());
    Json.put(o, "limit", f.limit());
    o.put("unit", f.unit());
    Json.put(o, "probability", f.probability());
    return o.put("basis", f.basis()).put("sentence", f.sentence());
  }

  /** The result a document holds. */
  public static NodeResult read(String document) {
    JsonNode o = Json.parse(document);
    return new NodeResult(
        o.path("node").asString(),
        SiteTree.Kind.valueOf(word(o, "kind")),
        Json.text(o, "fed_from"),
        o.path("supply").asString(),
        design(o),
        o.path(DESIGN_REASON).asString(""),
        MeasuredJson.read(o),
        Json.list(o, "findings", NodeJson::finding),
        Json.strings(o, "assumptions"));
  }

  private static Optional<DesignState> design(JsonNode o) {
    return Optional.of(o.path(DESIGN)).filter(JsonNode::isObject).map(DesignJson::read);
  }

  private static Finding finding(JsonNode o) {
    return new Finding(
        o.path("code").asString(),
        Severity.valueOf(word(o, "severity")),
        Json.figure(o, "figure"),
        Json.figure(o, "limit"),
        o.path("unit").asString(),
        Json.figure(o, "probability"),
        o.path("basis").asString(),
        o.path("sentence").asString());
  }

  /** The name of the enum constant whose public word stands under the key. */
  static String word(JsonNode from, String key) {
    return from.path(key).asString().toUpperCase(Locale.ROOT);
  }
}
