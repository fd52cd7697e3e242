package fourthwire.json;

import fourthwire.audit.NodeSummary;
import fourthwire.limits.Severity;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Figure;
import fourthwire.site.SiteTree;
import java.util.EnumMap;
import java.util.Map;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.node.ObjectNode;

/** One row of an audit's list of nodes; figures of a conductor are named {@code N.rms_a}. */
public final class SummaryJson {
  private static final String LINE_RMS = ".rms_a";

  private SummaryJson() {}

  /** The row's document. */
  public static ObjectNode write(NodeSummary s) {
    ObjectNode o = Json.object().put("node", s.node()).put("kind", s.kind().word());
    Json.put(o, "fed_from", s.fedFrom());
    ObjectNode findings = o.putObject("findings");
    for (Severity severity : Severity.values()) {
      findings.put(severity.word(), s.count(severity));
    }
    Json.put(o, "N.rms_a", s.neutralRmsA());
    Json.put(o, "N.loading_percent", s.neutralLoadingPercent());
    s.lineRmsA().forEach((line, rms) -> Json.put(o, line + LINE_RMS, rms));
    Json.put(o, "thd_percent", s.currentThdPercent());
    Json.put(o, "tdd_percent", s.tddPercent());
    Json.put(o, "voltage_thd_percent", s.voltageThdPercent());
    Json.put(o, "transformer_loading_percent", s.transformerLoadingPercent());
    Json.put(o, "harmonic_loss_factor", s.harmonicLossFactor());
    Json.put(o, "active_w", s.activeW());
    Json.put(o, "power_factor", s.powerFactor());
    Json.put(o, "losses_w", s.lossesW());
    return o;
  }

  /** The row a document holds. */
  public static NodeSummary read(String document) {
    JsonNode o = Json.parse(document);
    return new NodeSummary(
        o.path("node").asString(),
        SiteTree.Kind.valueOf(NodeJson.word(o, "kind")),
        Json.text(o, "fed_from"),
        findings(o.path("findings")),
        Json.figure(o, "N.rms_a"),
        Json.figure(o, "N.loading_percent"),
        lines(o),
        Json.figure(o, "thd_percent"),
        Json.figure(o, "tdd_percent"),
        Json.figure(o, "voltage_thd_percent"),
        Json.figure(o, "transformer_loading_percent"),
        Json.figure(o, "harmonic_loss_factor"),
        Json.figure(o, "active_w"),
        Json.figure(o, "power_factor"),
        Json.figure(o, "losses_w"));
  }

  private static Map<Severity, Integer> findings(JsonNode o) {
    Map<Severity, Integer> findings = new EnumMap<>(Severity.class);
    for (Severity severity : Severity.values()) {
      findings.put(severity, o.path(severity.word()).asInt(0));
    }
    return findings;
  }

  private static Map<Conductor, Figure> lines(JsonNode o) {
    Map<Conductor, Figure> lines = new EnumMap<>(Conductor.class);
    for (Conductor line : Conductor.values()) {
      if (line.isLine() && o.has(line + LINE_RMS)) {
        lines.put(line, Json.figure(o, line + LINE_RMS));
      }
    }
    return lines;
  }
}
