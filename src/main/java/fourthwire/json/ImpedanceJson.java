package fourthwire.json;

import fourthwire.audit.BankStep;
import fourthwire.audit.ImpedanceCurve;
import java.util.Arrays;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.node.ArrayNode;
import tools.jackson.databind.node.ObjectNode;

/** The impedance against the order, and the steps of a bank. */
final class ImpedanceJson {
  private ImpedanceJson() {}

  static ObjectNode write(ImpedanceCurve curve) {
    ObjectNode o = Json.object();
    o.put("first_order", ImpedanceCurve.FIRST_ORDER).put("step", ImpedanceCurve.STEP);
    ArrayNode ohm = o.putArray("ohm");
    for (int k = 0; k < ImpedanceCurve.POINTS; k++) {
      ohm.add(WeekJson.rounded(curve.ohm(k)));
    }
    return o;
  }

  static ImpedanceCurve curve(JsonNode o) {
    double[] ohm = new double[ImpedanceCurve.POINTS];
    Arrays.setAll(ohm, k -> o.path("ohm").path(k).doubleValue());
    return ImpedanceCurve.of(ohm);
  }

  static ObjectNode write(BankStep s) {
    return Json.object()
        .put("bank", s.bank())
        .put("step", s.step())
        .put("steps", s.steps())
        .put("kvar", s.kvar())
        .put("order", s.order())
        .put("ohm", s.ohm());
  }

  static BankStep step(JsonNode o) {
    return new BankStep(
        o.path("bank").asString(),
        o.path("step").asInt(),
        o.path("steps").asInt(),
        o.path("kvar").doubleValue(),
        o.path("order").doubleValue(),
        o.path("ohm").doubleValue());
  }
}
