package fourthwire.load;

import fourthwire.quantity.Phasor;
import fourthwire.quantity.Spectrum;
import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;

/** The circuit-simulator cases of the test resources, {@code load/rectifiers/README.md}. */
final class RectifierReference {
  private static final String FOLDER = "/load/rectifiers/";

  private RectifierReference() {}

  /** One case by column name. */
  static List<Map<String, String>> cases(String kind) {
    return rows("cases.csv").stream().filter(r -> r.get("kind").equals(kind)).toList();
  }

  /** The simulated line current of a case. */
  static Spectrum spectrum(String id) {
    Map<Integer, Phasor> byOrder = new HashMap<>();
    for (Map<String, String> row : rows("spectra.csv")) {
      if (row.get("id").equals(id)) {
        byOrder.put(
            Integer.parseInt(row.get("h")),
            Phasor.polar(number(row, "I_rms_A"), number(row, "phase_deg")));
      }
    }
    return Spectrum.of(h -> byOrder.getOrDefault(h, Phasor.ZERO));
  }

  /** The summary row of a case. */
  static Map<String, String> summary(String id) {
    return rows("summary.csv").stream()
        .filter(r -> r.get("id").equals(id))
        .findFirst()
        .orElseThrow();
  }

  static double number(Map<String, String> row, String column) {
    return Double.parseDouble(row.get(column));
  }

  /** The source's electromotive force, line to neutral on one port or on three lines. */
  static PortSpectra emf(Map<String, String> row, int ports) {
    PortSpectra emf = new PortSpectra(ports);
    double v = number(row, "V_ln_rms");
    for (int p = 0; p < ports; p++) {
      put(emf, p, 1, Phasor.polar(v, -120.0 * p));
      for (int h = 3; h <= 5; h += 2) {
        double size = v * number(row, "v" + h + "_pct") / 100;
        put(emf, p, h, Phasor.polar(size, number(row, "v" + h + "_deg") - 120.0 * p * h));
      }
    }
    return emf;
  }

  private static void put(PortSpectra s, int port, int order, Phasor value) {
    s.re[port][order] = value.re();
    s.im[port][order] = value.im();
  }

  private static List<Map<String, String>> rows(String file) {
    try (InputStream in = RectifierReference.class.getResourceAsStream(FOLDER + file)) {
      String[] lines = new String(in.readAllBytes(), StandardCharsets.UTF_8).split("\n");
      String[] header = lines[0].split(",");
      List<Map<String, String>> rows = new ArrayList<>();
      for (int n = 1; n < lines.length; n++) {
        String[] cells = lines[n].split(",");
        Map<String, String> row = new HashMap<>();
        for (int c = 0; c < Math.min(header.length, cells.length); c++) {
          row.put(header[c], cells[c]);
        }
        rows.add(row);
      }
      return rows;
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }
}
