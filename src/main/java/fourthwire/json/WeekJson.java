package fourthwire.json;

import fourthwire.audit.HeadlineFigure;
import fourthwire.audit.HourSeries;
import fourthwire.audit.WeekState;
import fourthwire.quantity.Figure;
import java.util.Arrays;
import java.util.EnumMap;
import java.util.LinkedHashMap;
import java.util.Map;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.node.ArrayNode;
import tools.jackson.databind.node.ObjectNode;

/** The week of a node: every figure's 168 values under its own name, to five digits. */
final class WeekJson {
  /** Where the percentiles stand, which the 168 values tell too. */
  static final String PERCENTILES_KEY = "percentiles";

  private static final int DIGITS = 5;
  private static final double[] PERCENTILES = {5, 50, 95, 99};

  private WeekJson() {}

  static ObjectNode write(WeekState w) {
    ObjectNode o = Json.object();
    o.put("basis", w.basis()).put("solved_hours", w.solvedHours());
    ObjectNode over = o.putObject("hours_over_limit");
    w.hoursOverLimit().forEach(over::put);
    w.series().forEach((figure, series) -> o.set(figure.word(), write(series)));
    ObjectNode percentiles = o.putObject(PERCENTILES_KEY);
    w.series().forEach((figure, series) -> percentiles.set(figure.word(), spread(series)));
    write(o, w.energy());
    return o;
  }

  private static ArrayNode write(HourSeries series) {
    ArrayNode values = Json.array();
    for (int hour = 0; hour < HourSeries.HOURS; hour++) {
      put(values, series.at(hour));
    }
    return values;
  }

  private static void put(ArrayNode values, double value) {
    if (Double.isNaN(value)) {
      values.addNull();
    } else {
      values.add(rounded(value));
    }
  }

  static double rounded(double value) {
    return Digits.rounded(value, DIGITS);
  }

  private static ObjectNode spread(HourSeries series) {
    ObjectNode o = Json.object();
    for (double percent : PERCENTILES) {
      o.put("p" + (int) percent, rounded(series.percentile(percent)));
    }
    return o.put("mean", rounded(series.mean())).put("max", rounded(series.percentile(100)));
  }

  private static void write(ObjectNode o, WeekState.Energy e) {
    o.put("energy_kwh", e.activeKwh());
    o.put("losses_kwh", e.lossKwh());
    o.put("feeder_losses_kwh", e.feederLossKwh());
    o.put("feeder_harmonic_losses_kwh", e.feederHarmonicLossKwh());
    o.put("transformer_losses_kwh", e.windingLossKwh());
    o.put("transformer_harmonic_losses_kwh", e.windingHarmonicLossKwh());
    Json.put(o, "energy_cost", e.cost(e.activeKwh()));
    Json.put(o, "losses_cost", e.cost(e.lossKwh()));
    Json.put(o, "energy_price_per_kwh", e.pricePerKwh());
    o.put("currency", e.currency());
  }

  static WeekState read(JsonNode o) {
    Map<String, Integer> over = new LinkedHashMap<>();
    Json.entries(o.path("hours_over_limit"), (code, hours) -> over.put(code, hours.asInt()));
    Map<HeadlineFigure, HourSeries> series = new EnumMap<>(HeadlineFigure.class);
    for (HeadlineFigure figure : HeadlineFigure.values()) {
      if (o.path(figure.word()).isArray()) {
        series.put(figure, series(o.path(figure.word())));
      }
    }
    return new WeekState(
        o.path("solved_hours").asInt(), o.path("basis").asString(), over, series, energy(o));
  }

  private static HourSeries series(JsonNode values) {
    double[] byHour = new double[HourSeries.HOURS];
    Arrays.setAll(
        byHour, h -> values.path(h).isNumber() ? values.path(h).doubleValue() : Double.NaN);
    return HourSeries.of(byHour);
  }

  private static WeekState.Energy energy(JsonNode o) {
    Figure price = Json.figure(o, "energy_price_per_kwh");
    return new WeekState.Energy(
        o.path("energy_kwh").doubleValue(),
        o.path("feeder_losses_kwh").doubleValue(),
        o.path("feeder_harmonic_losses_kwh").doubleValue(),
        o.path("transformer_losses_kwh").doubleValue(),
        o.path("transformer_harmonic_losses_kwh").doubleValue(),
        price,
        o.path("currency").asString());
  }
}
