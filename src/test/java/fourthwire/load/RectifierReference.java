package fourthwire.load;

import de.siegmar.fastcsv.reader.CsvReader;
import de.siegmar.fastcsv.reader.NamedCsvRecord;
import fourthwire.load.model.LoadModel;
import fourthwire.load.model.PortSpectra;
import fourthwire.load.rectifier.CapacitorInput;
import fourthwire.load.rectifier.SixPulse;
import fourthwire.load.rectifier.TwelvePulse;
import fourthwire.load.rectifier.path.BridgeLoad;
import fourthwire.load.rectifier.path.Diode;
import fourthwire.quantity.Phasor;
import fourthwire.quantity.Spectrum;
import java.io.IOException;
import java.io.InputStreamReader;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.HashMap;
import java.util.List;
import java.util.Map;

/** The circuit-simulator cases of the test resources, {@code load/rectifiers/README.md}. */
public record RectifierReference(NamedCsvRecord row) {
  private static final String FOLDER = "/load/rectifiers/";

  /** Every case. */
  public static List<RectifierReference> all() {
    return rows("cases.csv").stream().map(RectifierReference::new).toList();
  }

  /** Whether it is a bridge on three lines. */
  public boolean threePhase() {
    return row.getField("kind").startsWith("3ph");
  }

  /** All units together. */
  BridgeLoad load() {
    return new BridgeLoad(
            number("P_dc_W"),
            number("C_uF") * 1e-6,
            number("Rb_ohm"),
            number("Lb_uH") * 1e-6,
            number("R_dc_ohm"),
            number("L_dc_uH") * 1e-6,
            new Diode(3e-11, 1.2, 1e-3))
        .parallel(number("n_units"));
  }

  /** The line currents this project computes for the case. */
  PortSpectra computed() {
    LoadModel model = model();
    PortSpectra current = new PortSpectra(model.ports());
    model.newSolver().solve(emf(), number("Rs_ohm"), number("Ls_uH") * 1e-6, current);
    return current;
  }

  private LoadModel model() {
    double hertz = number("f_Hz");
    return switch (row.getField("kind")) {
      case "3ph_sixpulse" -> new SixPulse(load(), hertz);
      case "3ph_twelvepulse" -> new TwelvePulse(load(), hertz);
      default -> new CapacitorInput(load(), hertz);
    };
  }

  /** The source's electromotive force, line to neutral. */
  PortSpectra emf() {
    PortSpectra emf = new PortSpectra(threePhase() ? 3 : 1);
    for (int p = 0; p < emf.ports(); p++) {
      add(emf, p, 1, 100, 0);
      for (String term : row.getField("emf").split(" ")) {
        if (!term.isEmpty() && !(term.startsWith("a") && p > 0)) {
          String[] part = term.replace("a", "").split(":");
          add(
              emf,
              p,
              Integer.parseInt(part[0]),
              Double.parseDouble(part[1]),
              Double.parseDouble(part[2]));
        }
      }
    }
    return emf;
  }

  private void add(PortSpectra emf, int port, int order, double percent, double degrees) {
    Phasor value = Phasor.polar(number("V_ln_rms") * percent / 100, degrees - 120.0 * port * order);
    emf.re[port][order] += value.re();
    emf.im[port][order] += value.im();
  }

  /** The simulated current of line a or b. */
  public Spectrum simulated(String line) {
    Map<Integer, Phasor> byOrder = new HashMap<>();
    for (NamedCsvRecord r : rows("spectra.csv")) {
      if (r.getField("id").equals(row.getField("id")) && r.getField("line").equals(line)) {
        byOrder.put(
            Integer.parseInt(r.getField("h")),
            Phasor.polar(
                Double.parseDouble(r.getField("I_rms_A")),
                Double.parseDouble(r.getField("phase_deg"))));
      }
    }
    return Spectrum.of(h -> byOrder.getOrDefault(h, Phasor.ZERO));
  }

  /** A column of the case. */
  public double number(String column) {
    return Double.parseDouble(row.getField(column));
  }

  private static List<NamedCsvRecord> rows(String file) {
    try (var in =
            new InputStreamReader(
                RectifierReference.class.getResourceAsStream(FOLDER + file),
                StandardCharsets.UTF_8);
        var csv = CsvReader.builder().ofNamedCsvRecord(in)) {
      return csv.stream().toList();
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  @Override
  public String toString() {
    return row.getField("id") + " " + row.getField("note");
  }
}
