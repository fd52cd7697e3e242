package fourthwire.load;

import de.siegmar.fastcsv.reader.CsvReader;
import de.siegmar.fastcsv.reader.NamedCsvRecord;
import fourthwire.load.model.PortSpectra;
import fourthwire.load.model.SharedSource;
import fourthwire.load.rectifier.node.NodeRectifiers;
import fourthwire.load.rectifier.path.BridgeLoad;
import fourthwire.load.rectifier.path.Diode;
import fourthwire.quantity.Phasor;
import fourthwire.quantity.Spectrum;
import java.io.IOException;
import java.io.InputStreamReader;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.stream.IntStream;

/**
 * The circuit-simulator cases of several rows of rectifiers on one node: the test resources, {@code
 * load/rectifiers/README.md}.
 *
 * @param rows one record of the case for each row of rectifiers
 */
public record JointReference(List<NamedCsvRecord> rows) {
  private static final String FOLDER = "/load/rectifiers/";

  /** Every case. */
  public static List<JointReference> all() {
    Map<String, List<NamedCsvRecord>> byId = new LinkedHashMap<>();
    for (NamedCsvRecord row : read("joint-cases.csv")) {
      byId.computeIfAbsent(row.getField("id"), id -> new ArrayList<>()).add(row);
    }
    return byId.values().stream().map(JointReference::new).toList();
  }

  /** A column of one row. */
  public double number(int row, String column) {
    return Double.parseDouble(rows.get(row).getField(column));
  }

  /** The source's further orders: order, percent, degrees. */
  public List<double[]> background() {
    return List.of(rows.get(0).getField("emf").split(" ")).stream()
        .filter(term -> !term.isEmpty())
        .map(term -> List.of(term.split(":")).stream().mapToDouble(Double::parseDouble).toArray())
        .toList();
  }

  /** All units of each row as one. */
  List<BridgeLoad> loads() {
    return IntStream.range(0, rows.size()).mapToObj(this::load).toList();
  }

  private BridgeLoad load(int row) {
    return new BridgeLoad(
            number(row, "P_dc_W"),
            number(row, "C_uF") * 1e-6,
            number(row, "Rb_ohm"),
            number(row, "Lb_uH") * 1e-6,
            0,
            0,
            new Diode(3e-11, 1.2, 1e-3))
        .parallel(number(row, "n_units"));
  }

  /** The source's electromotive force. */
  PortSpectra emf() {
    PortSpectra emf = new PortSpectra(1);
    double volts = number(0, "V_rms");
    emf.re[0][1] = volts;
    for (double[] term : background()) {
      Phasor value = Phasor.polar(volts * term[1] / 100, term[2]);
      emf.re[0][(int) term[0]] = value.re();
      emf.im[0][(int) term[0]] = value.im();
    }
    return emf;
  }

  /** What all rows share. */
  SharedSource source() {
    return new SharedSource() {
      @Override
      public double ohm(int load, int other) {
        return number(0, "Rs_ohm");
      }

      @Override
      public double henry(int load, int other) {
        return number(0, "Ls_uH") * 1e-6;
      }
    };
  }

  /** The currents of the rows that this project computes for the case. */
  PortSpectra[] computed() {
    PortSpectra[] emf = new PortSpectra[rows.size()];
    PortSpectra[] current = new PortSpectra[rows.size()];
    Arrays.setAll(emf, k -> emf());
    Arrays.setAll(current, k -> new PortSpectra(1));
    new NodeRectifiers(loads(), number(0, "f_Hz")).solve(emf, source(), current);
    return current;
  }

  /** The simulated current of a row, counted from 0. */
  public Spectrum simulated(int row) {
    Map<Integer, Phasor> byOrder = new HashMap<>();
    for (NamedCsvRecord r : read("joint-spectra.csv")) {
      if (r.getField("id").equals(rows.get(0).getField("id"))
          && Integer.parseInt(r.getField("row")) == row + 1) {
        byOrder.put(
            Integer.parseInt(r.getField("h")),
            Phasor.polar(
                Double.parseDouble(r.getField("I_rms_A")),
                Double.parseDouble(r.getField("phase_deg"))));
      }
    }
    return Spectrum.of(h -> byOrder.getOrDefault(h, Phasor.ZERO));
  }

  private static List<NamedCsvRecord> read(String file) {
    try (var in =
            new InputStreamReader(
                JointReference.class.getResourceAsStream(FOLDER + file), StandardCharsets.UTF_8);
        var csv = CsvReader.builder().ofNamedCsvRecord(in)) {
      return csv.stream().toList();
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  @Override
  public String toString() {
    return rows.get(0).getField("id") + " " + rows.get(0).getField("note");
  }
}
