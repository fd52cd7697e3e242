package fourthwire.json;

import fourthwire.quantity.Phasor;
import fourthwire.quantity.Spectrum;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.function.Function;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.node.ArrayNode;
import tools.jackson.databind.node.ObjectNode;

/** Spectra as rows by order: {@code {"order":3,"L1":{"a":…,"deg":…},…}}. */
final class SpectrumJson {
  /** Key of amps. */
  static final String AMPS = "a";

  /** Key of volts. */
  static final String VOLTS = "v";

  private static final String ORDER = "order";

  private SpectrumJson() {}

  static <K> ArrayNode write(Map<K, Spectrum> spectra, String magnitude) {
    ArrayNode rows = Json.array();
    for (int order = 1; order <= Spectrum.HIGHEST_ORDER && !spectra.isEmpty(); order++) {
      ObjectNode row = rows.addObject().put(ORDER, order);
      for (Map.Entry<K, Spectrum> e : spectra.entrySet()) {
        Phasor p = e.getValue().at(order);
        row.putObject(e.getKey().toString()).put(magnitude, p.magnitude()).put("deg", p.degrees());
      }
    }
    return rows;
  }

  static <K> Map<K, Spectrum> read(JsonNode rows, String magnitude, Function<String, K> key) {
    Map<String, Phasor[]> columns = new LinkedHashMap<>();
    for (JsonNode row : rows) {
      int order = row.path(ORDER).intValue();
      Json.entries(
          row,
          (name, cell) -> {
            if (cell.isObject()) {
              columns.computeIfAbsent(name, n -> zeros())[order] =
                  Phasor.polar(cell.path(magnitude).doubleValue(), cell.path("deg").doubleValue());
            }
          });
    }
    Map<K, Spectrum> spectra = new LinkedHashMap<>();
    columns.forEach((name, p) -> spectra.put(key.apply(name), Spectrum.of(h -> p[h])));
    return spectra;
  }

  private static Phasor[] zeros() {
    Phasor[] zeros = new Phasor[Spectrum.HIGHEST_ORDER + 1];
    java.util.Arrays.fill(zeros, Phasor.ZERO);
    return zeros;
  }
}
