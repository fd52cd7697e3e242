package fourthwire.json;

import fourthwire.quantity.Phasor;
import fourthwire.quantity.Spectrum;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.function.Function;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.node.ArrayNode;
import tools.jackson.databind.node.ObjectNode;

/**
 * Spectra as rows by order, {@code {"order":3,"L1":{"a":…,"deg":…},…}}; for storage also as columns
 * from order 1 up, {@code {"L1.a":[…],"L1.deg":[…],…}}.
 */
final class SpectrumJson {
  /** Key of amps. */
  static final String AMPS = "a";

  /** Key of volts. */
  static final String VOLTS = "v";

  private static final String DEGREES = "deg";
  private static final String ORDER = "order";

  private SpectrumJson() {}

  static <K> ArrayNode write(Map<K, Spectrum> spectra, String magnitude) {
    ArrayNode rows = Json.array();
    for (int order = 1; order <= Spectrum.HIGHEST_ORDER && !spectra.isEmpty(); order++) {
      ObjectNode row = rows.addObject().put(ORDER, order);
      for (Map.Entry<K, Spectrum> e : spectra.entrySet()) {
        Phasor p = e.getValue().at(order);
        row.putObject(e.getKey().toString())
            .put(magnitude, p.magnitude())
            .put(DEGREES, p.degrees());
      }
    }
    return rows;
  }

  /** The same as columns. */
  static ObjectNode columns(ArrayNode rows) {
    ObjectNode columns = Json.object();
    for (JsonNode row : rows) {
      Json.entries(row, (name, cell) -> addTo(columns, name, cell));
    }
    return columns;
  }

  private static void addTo(ObjectNode columns, String name, JsonNode cell) {
    if (cell.isObject()) {
      Json.entries(cell, (part, value) -> columns.withArrayProperty(name + "." + part).add(value));
    }
  }

  static <K> Map<K, Spectrum> read(JsonNode table, String magnitude, Function<String, K> key) {
    Map<String, Phasor[]> columns =
        table.isObject() ? ofColumns(table, magnitude) : ofRows(table, magnitude);
    Map<K, Spectrum> spectra = new LinkedHashMap<>();
    columns.forEach((name, p) -> spectra.put(key.apply(name), Spectrum.of(h -> p[h])));
    return spectra;
  }

  private static Map<String, Phasor[]> ofRows(JsonNode rows, String magnitude) {
    Map<String, Phasor[]> columns = new LinkedHashMap<>();
    for (JsonNode row : rows) {
      int order = row.path(ORDER).intValue();
      Json.entries(
          row,
          (name, cell) -> {
            if (cell.isObject()) {
              columns.computeIfAbsent(name, n -> zeros())[order] =
                  phasor(cell.path(magnitude), cell.path(DEGREES));
            }
          });
    }
    return columns;
  }

  private static Map<String, Phasor[]> ofColumns(JsonNode table, String magnitude) {
    Map<String, Phasor[]> columns = new LinkedHashMap<>();
    String ending = "." + magnitude;
    Json.entries(
        table,
        (title, magnitudes) -> {
          if (title.endsWith(ending)) {
            String name = title.substring(0, title.length() - ending.length());
            JsonNode degrees = table.path(name + "." + DEGREES);
            Phasor[] column = zeros();
            Arrays.setAll(
                column,
                h -> h == 0 ? column[0] : phasor(magnitudes.path(h - 1), degrees.path(h - 1)));
            columns.put(name, column);
          }
        });
    return columns;
  }

  private static Phasor phasor(JsonNode magnitude, JsonNode degrees) {
    return Phasor.polar(magnitude.doubleValue(), degrees.doubleValue());
  }

  private static Phasor[] zeros() {
    Phasor[] zeros = new Phasor[Spectrum.HIGHEST_ORDER + 1];
    Arrays.fill(zeros, Phasor.ZERO);
    return zeros;
  }
}
