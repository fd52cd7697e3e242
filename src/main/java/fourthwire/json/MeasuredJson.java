package fourthwire.json;

import fourthwire.audit.MeasuredState;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
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
    o.put("period", m.period()).put("basis", m.basis());
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
        o.path("period").asString(),
        o.path("basis").asString(),
        ConductorJson.lines(o.path("current")),
        ConductorJson.neutral(o.path("current")),
        ConductorJson.voltage(o.path("voltage")),
        PowerJson.read(o.path("power")),
        DesignJson.currentSpectrum(o));
  }
}
