package fourthwire.json;

import fourthwire.audit.MeasuredState;
import fourthwire.audit.MeasuredState.Span;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.node.ArrayNode;
import tools.jackson.databind.node.ObjectNode;

/**
 * What readings say of a node. The first is the object {@code measured} itself; what other meters
 * and clamp readings say of the same node stands in its list {@code further}.
 */
final class MeasuredJson {
  private static final String MEASURED = "measured";
  private static final String FURTHER = "further";
  private static final String PERIOD = "period";

  private MeasuredJson() {}

  static void write(ObjectNode into, List<MeasuredState> measured) {
    if (measured.isEmpty()) {
      Json.putAbsent(into, MEASURED, "no reading of this node");
      return;
    }
    ObjectNode first = write(measured.get(0));
    first.set(FURTHER, Json.list(measured.subList(1, measured.size()), MeasuredJson::write));
    into.set(MEASURED, first);
  }

  private static ObjectNode write(MeasuredState m) {
    ObjectNode o = Json.object().put("meter", m.meter());
    Json.put(o, "reading", m.reading());
    writePeriod(o, m.period());
    o.put("basis", m.basis());
    Json.put(o, "demand_a", m.demand().amps());
    o.put("demand_basis", m.demand().basis());
    o.set("current", ConductorJson.write(m.lines(), m.neutral()));
    o.set("voltage", ConductorJson.write(m.voltage()));
    o.set("power", PowerJson.write(m.power()));
    Map<fourthwire.quantity.Conductor, fourthwire.quantity.Spectrum> spectrum =
        new EnumMap<>(fourthwire.quantity.Conductor.class);
    spectrum.putAll(m.currentSpectrum());
    ArrayNode rows = SpectrumJson.write(spectrum, SpectrumJson.AMPS);
    o.set("spectrum", rows);
    return o;
  }

  private static void writePeriod(ObjectNode into, Optional<Span> period) {
    period.ifPresentOrElse(
        span -> into.set(PERIOD, Moments.write(span.from(), span.to())),
        () -> Json.putAbsent(into, PERIOD, "the file or row tells no clock time"));
  }

  private static Optional<Span> period(JsonNode o) {
    return Optional.of(o.path(PERIOD))
        .filter(JsonNode::isObject)
        .map(p -> new Span(Moments.from(p), Moments.to(p)));
  }

  static List<MeasuredState> read(JsonNode node) {
    JsonNode first = node.path(MEASURED);
    if (!first.isObject()) {
      return List.of();
    }
    List<MeasuredState> all = new java.util.ArrayList<>(List.of(state(first)));
    all.addAll(Json.list(first, FURTHER, MeasuredJson::state));
    return List.copyOf(all);
  }

  private static MeasuredState state(JsonNode o) {
    return new MeasuredState(
        o.path("meter").asString(),
        Json.whole(o, "reading"),
        period(o),
        o.path("basis").asString(),
        ConductorJson.lines(o.path("current")),
        ConductorJson.neutral(o.path("current")),
        ConductorJson.voltage(o.path("voltage")),
        PowerJson.read(o.path("power")),
        DesignJson.currentSpectrum(o),
        o.has("demand_a")
            ? new MeasuredState.Demand(
                Json.figure(o, "demand_a"), o.path("demand_basis").asString(""))
            : MeasuredState.Demand.NONE);
  }
}
