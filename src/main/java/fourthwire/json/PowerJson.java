package fourthwire.json;

import fourthwire.quantity.PowerFigures;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.node.ObjectNode;

/** Power figures. */
final class PowerJson {
  private PowerJson() {}

  static ObjectNode write(PowerFigures power) {
    ObjectNode o = Json.object();
    Json.put(o, "active_w", power.activeW());
    Json.put(o, "fundamental_reactive_var", power.fundamentalReactiveVar());
    Json.put(o, "apparent_va", power.apparentVa());
    Json.put(o, "nonfundamental_va", power.nonfundamentalVa());
    Json.put(o, "power_factor", power.powerFactor());
    Json.put(o, "displacement_factor", power.displacementFactor());
    return o;
  }

  static PowerFigures read(JsonNode o) {
    return new PowerFigures(
        Json.figure(o, "active_w"),
        Json.figure(o, "fundamental_reactive_var"),
        Json.figure(o, "apparent_va"),
        Json.figure(o, "nonfundamental_va"),
        Json.figure(o, "power_factor"),
        Json.figure(o, "displacement_factor"));
  }
}
