package fourthwire.json;

import fourthwire.audit.DesignState.LineCurrent;
import fourthwire.audit.DesignState.LineVoltage;
import fourthwire.audit.DesignState.NeutralCurrent;
import fourthwire.quantity.Conductor;
import java.util.EnumMap;
import java.util.LinkedHashMap;
import java.util.Map;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.node.ObjectNode;

/** Currents and voltages by conductor: the lines, and N beside them. */
final class ConductorJson {
  /** Key of the neutral. */
  static final String NEUTRAL = "N";

  private static final String AMPACITY_BASIS = "ampacity_basis";

  private ConductorJson() {}

  static ObjectNode write(Map<Conductor, LineCurrent> lines, NeutralCurrent neutral) {
    ObjectNode o = Json.map(inOrder(lines), ConductorJson::write);
    o.set(NEUTRAL, write(neutral));
    return o;
  }

  /** L1, L2, L3. */
  private static <V> EnumMap<Conductor, V> inOrder(Map<Conductor, V> map) {
    EnumMap<Conductor, V> sorted = new EnumMap<>(Conductor.class);
    sorted.putAll(map);
    return sorted;
  }

  private static ObjectNode write(LineCurrent c) {
    ObjectNode o = Json.object();
    Json.put(o, "rms_a", c.rmsA());
    Json.put(o, "fundamental_a", c.fundamentalA());
    Json.put(o, "thd_percent", c.thdPercent());
    Json.put(o, "tdd_percent", c.tddPercent());
    Json.put(o, "loading_percent", c.loadingPercent());
    Json.put(o, "ampacity_a", c.ampacityA());
    return o.put(AMPACITY_BASIS, c.ampacityBasis());
  }

  private static ObjectNode write(NeutralCurrent n) {
    ObjectNode o = Json.object();
    Json.put(o, "rms_a", n.rmsA());
    Json.put(o, "percent_of_mean_line", n.percentOfMeanLine());
    Json.put(o, "loading_percent", n.loadingPercent());
    Json.put(o, "ampacity_a", n.ampacityA());
    return o.put(AMPACITY_BASIS, n.ampacityBasis());
  }

  static Map<Conductor, LineCurrent> lines(JsonNode current) {
    Map<Conductor, LineCurrent> lines = new EnumMap<>(Conductor.class);
    Json.entries(
        current,
        (name, o) -> {
          if (!name.equals(NEUTRAL)) {
            lines.put(Conductor.valueOf(name), line(o));
          }
        });
    return lines;
  }

  private static LineCurrent line(JsonNode o) {
    return new LineCurrent(
        Json.figure(o, "rms_a"),
        Json.figure(o, "fundamental_a"),
        Json.figure(o, "thd_percent"),
        Json.figure(o, "tdd_percent"),
        Json.figure(o, "loading_percent"),
        Json.figure(o, "ampacity_a"),
        o.path(AMPACITY_BASIS).asString(""));
  }

  static NeutralCurrent neutral(JsonNode current) {
    JsonNode o = current.path(NEUTRAL);
    return new NeutralCurrent(
        Json.figure(o, "rms_a"),
        Json.figure(o, "percent_of_mean_line"),
        Json.figure(o, "loading_percent"),
        Json.figure(o, "ampacity_a"),
        o.path(AMPACITY_BASIS).asString(""));
  }

  static ObjectNode write(Map<String, LineVoltage> voltage) {
    return Json.map(voltage, ConductorJson::write);
  }

  private static ObjectNode write(LineVoltage v) {
    ObjectNode o = Json.object();
    Json.put(o, "rms_v", v.rmsV());
    Json.put(o, "fundamental_v", v.fundamentalV());
    Json.put(o, "thd_percent", v.thdPercent());
    Json.put(o, "drop_percent", v.dropPercent());
    return o;
  }

  static Map<String, LineVoltage> voltage(JsonNode voltage) {
    Map<String, LineVoltage> map = new LinkedHashMap<>();
    Json.entries(
        voltage,
        (name, o) -> {
          if (!name.equals(NEUTRAL)) {
            map.put(
                name,
                new LineVoltage(
                    Json.figure(o, "rms_v"),
                    Json.figure(o, "fundamental_v"),
                    Json.figure(o, "thd_percent"),
                    Json.figure(o, "drop_percent")));
          }
        });
    return map;
  }
}
