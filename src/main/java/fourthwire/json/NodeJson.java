package fourthwire.json;

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
  private static final String RANGE = "range";
  private static final String DOUBT = "doubt";
  private static final String WEEK = "week";
  private static final String IMPEDANCE = "impedance";
  private static final String NO_CURVE = "shown for supplies, transformers and panels";

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
    writeDoubt(o, r);
    r.week()
        .ifPresentOrElse(
            w -> o.set(WEEK, WeekJson.write(w)), () -> Json.putAbsent(o, WEEK, r.weekReason()));
    MeasuredJson.write(o, r.measured());
    o.set("findings", Json.list(r.findings(), NodeJson::write));
    o.set("assumptions", Json.strings(r.assumptions()));
    r.impedance()
        .ifPresentOrElse(
            c -> o.set(IMPEDANCE, ImpedanceJson.write(c)),
            () -> Json.putAbsent(o, IMPEDANCE, NO_CURVE));
    o.set("bank_steps", Json.list(r.bankSteps(), ImpedanceJson::write));
    return o;
  }

  private static void writeDoubt(ObjectNode o, NodeResult r) {
    r.doubt()
        .ifPresentOrElse(
            d -> o.set(RANGE, DoubtJson.range(d)), () -> Json.putAbsent(o, RANGE, r.doubtReason()));
    r.doubt()
        .ifPresentOrElse(
            d -> o.set(DOUBT, DoubtJson.write(d)), () -> Json.putAbsent(o, DOUBT, r.doubtReason()));
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
        object(o, DESIGN).map(DesignJson::read),
        o.path(DESIGN_REASON).asString(""),
        object(o, IMPEDANCE).map(ImpedanceJson::curve),
        Json.list(o, "bank_steps", ImpedanceJson::step),
        object(o, DOUBT).map(d -> DoubtJson.read(o.path(RANGE), d)),
        Json.text(o, RANGE + "_reason").orElse(""),
        object(o, WEEK).map(WeekJson::read),
        Json.text(o, WEEK + "_reason").orElse(""),
        MeasuredJson.read(o),
        Json.list(o, "findings", NodeJson::finding),
        Json.strings(o, "assumptions"));
  }

  private static Optional<JsonNode> object(JsonNode o, String key) {
    return Optional.of(o.path(key)).filter(JsonNode::isObject);
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
