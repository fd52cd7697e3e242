package fourthwire.audit;

import static fourthwire.quantity.Conductor.L1;
import static fourthwire.quantity.Conductor.L2;
import static fourthwire.quantity.Conductor.L3;
import static fourthwire.quantity.Conductor.N;

import fourthwire.quantity.Conductor;
import fourthwire.quantity.Phasor;
import fourthwire.quantity.Spectrum;
import fourthwire.site.CapacitorBank;
import fourthwire.site.Circuit;
import fourthwire.site.Feeder;
import fourthwire.site.Load;
import fourthwire.site.LoadKind;
import fourthwire.site.Panel;
import fourthwire.site.PhaseSystem;
import fourthwire.site.SpectrumTable;
import fourthwire.site.Supply;
import fourthwire.site.Survey;
import fourthwire.site.Transformer;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.ejml.data.Complex_F64;
import org.ejml.data.ZMatrixRMaj;
import org.ejml.dense.row.CommonOps_ZDRM;

/**
 * A second, plain solution of a small survey, written from the public contract alone: one equation
 * for every potential and every branch current, in one dense matrix per order, solved by EJML.
 * Loads are measured spectra, whose angles follow the terminal voltage, and resistances. Every
 * feeder gives its ohms per kilometre.
 */
final class DenseSite {
  private final Survey survey;
  private final Map<String, Integer> unknowns = new HashMap<>();
  private final Map<String, List<Conductor>> conductors = new LinkedHashMap<>();
  private final Map<String, Double> lineV = new HashMap<>();
  private ZMatrixRMaj a = new ZMatrixRMaj(1, 1);
  private ZMatrixRMaj b = new ZMatrixRMaj(1, 1);
  private int row;
  private final Map<String, Phasor[]> potential = new HashMap<>();
  private final Map<String, Phasor[]> current = new HashMap<>();

  private DenseSite(Survey survey) {
    this.survey = survey;
  }

  static DenseSite solve(Survey survey) {
    DenseSite site = new DenseSite(survey);
    site.number();
    Map<String, Double> before = Map.of();
    for (int pass = 0; pass < 60; pass++) {
      Map<String, Double> angles = site.angles(pass);
      if (stoodStill(before, angles)) {
        break;
      }
      before = angles;
      for (int h = 1; h <= Spectrum.HIGHEST_ORDER; h++) {
        site.solveOrder(h, angles);
      }
    }
    return site;
  }

  private static boolean stoodStill(Map<String, Double> before, Map<String, Double> now) {
    return !before.isEmpty()
        && now.entrySet().stream()
            .allMatch(e -> Math.abs(e.getValue() - before.get(e.getKey())) < 1e-7);
  }

  /** Current into a node's conductor, positive towards the load; of N positive from the load. */
  Spectrum current(String node, Conductor c) {
    Phasor[] i = current.get(key(node, c));
    return Spectrum.of(h -> c == N ? i[h].times(-1) : i[h]);
  }

  Spectrum voltage(String node, Conductor c, Conductor over) {
    return Spectrum.of(
        h -> potential.get(key(node, c))[h].minus(potential.get(key(node, over))[h]));
  }

  private static String key(String node, Conductor c) {
    return node + "|" + c;
  }

  private void number() {
    Supply supply = survey.normalSupply();
    node(supply.name(), supply.systemOrDefault().conductors(), supply.lineVoltageV());
    for (Transformer t : survey.transformers()) {
      node(t.name(), t.connection().secondarySystem().conductors(), t.secondaryV());
    }
    for (Panel p : survey.panels()) {
      node(
          p.name(),
          p.system().map(PhaseSystem::conductors).orElse(conductors.get(p.fedFrom())),
          lineV.get(p.fedFrom()));
    }
    for (Circuit c : survey.circuits()) {
      node(c.id(), c.lines().conductors(), lineV.get(c.panel()));
    }
  }

  private void node(String name, List<Conductor> list, double volts) {
    conductors.put(name, list);
    lineV.put(name, volts);
    for (Conductor c : list) {
      unknowns.put("V" + key(name, c), unknowns.size());
      unknowns.put("I" + key(name, c), unknowns.size());
      potential.put(key(name, c), new Phasor[Spectrum.HIGHEST_ORDER + 1]);
      current.put(key(name, c), new Phasor[Spectrum.HIGHEST_ORDER + 1]);
    }
  }

  private void solveOrder(int h, Map<String, Double> angles) {
    int n = unknowns.size();
    a = new ZMatrixRMaj(n, n);
    b = new ZMatrixRMaj(n, 1);
    row = 0;
    source(h);
    survey.transformers().forEach(t -> transformer(t, h));
    survey.panels().forEach(p -> feeder(p.name(), p.fedFrom(), p.feeder(), h));
    circuits(h);
    for (Map.Entry<String, List<Conductor>> node : conductors.entrySet()) {
      for (Conductor c : node.getValue()) {
        if (!(c == N && earthed(node.getKey()))) {
          kirchhoff(node.getKey(), c, h, angles);
        }
      }
    }
    if (row != n) {
      throw new IllegalStateException(row + " equations for " + n + " unknowns");
    }
    ZMatrixRMaj x = new ZMatrixRMaj(n, 1);
    if (!CommonOps_ZDRM.solve(a, b, x)) {
      throw new IllegalStateException("singular at order " + h);
    }
    for (Map.Entry<String, List<Conductor>> node : conductors.entrySet()) {
      for (Conductor c : node.getValue()) {
        String k = key(node.getKey(), c);
        potential.get(k)[h] = value(x, "V" + k);
        current.get(k)[h] = value(x, "I" + k);
      }
    }
  }

  private Phasor value(ZMatrixRMaj x, String unknown) {
    Complex_F64 z = new Complex_F64();
    x.get(unknowns.get(unknown), 0, z);
    return new Phasor(z.real, z.imaginary);
  }

  private void add(String unknown, double re, double im) {
    int column = unknowns.get(unknown);
    Complex_F64 z = new Complex_F64();
    a.get(row, column, z);
    a.set(row, column, z.real + re, z.imaginary + im);
  }

  private void equals(double re, double im) {
    b.set(row++, 0, re, im);
  }

  private boolean earthed(String node) {
    return survey.supplies().stream().anyMatch(s -> s.name().equals(node))
        || survey.transformers().stream().anyMatch(t -> t.name().equals(node));
  }

  /** An earthed neutral: its potential is 0, its current what Kirchhoff's law asks for. */
  private void earth(String node, int h) {
    add("V" + key(node, N), 1, 0);
    equals(0, 0);
    kirchhoff(node, N, h, Map.of());
  }

  private void source(int h) {
    Supply s = survey.normalSupply();
    double z = s.lineVoltageV() * s.lineVoltageV() / (s.faultLevelMva().orElseThrow() * 1e6);
    double r = z / Math.hypot(1, s.xOverRorDefault());
    double x = r * s.xOverRorDefault();
    List<Conductor> list = conductors.get(s.name());
    for (int k = 0; k < list.size(); k++) {
      Conductor c = list.get(k);
      if (c == N) {
        earth(s.name(), h);
        continue;
      }
      add("V" + key(s.name(), c), 1, 0);
      add("I" + key(s.name(), c), r, h * x);
      double percent =
          h == 1
              ? 100
              : survey.background().stream()
                  .filter(d -> d.order() == h)
                  .mapToDouble(d -> d.percent())
                  .sum();
      double degrees =
          survey.background().stream()
              .filter(d -> d.order() == h)
              .mapToDouble(d -> d.degrees().orElse(0))
              .sum();
      Phasor e =
          Phasor.polar(s.lineVoltageV() / Math.sqrt(3) * percent / 100, degrees - 120.0 * h * k);
      equals(e.re(), e.im());
    }
  }

  /** Winding by winding: Dyn11 takes L1 from the primary's L1-L2, Dyn1 from L1-L3, YNyn0 L1-N. */
  private void transformer(Transformer t, int h) {
    double ratio = t.primaryV() / t.secondaryV();
    double base = t.secondaryV() * t.secondaryV() / (1000 * t.ratedKva());
    double rPu = t.loadLossW().orElseThrow() / (1000 * t.ratedKva());
    double xPu = Math.sqrt(Math.pow(t.impedancePercent() / 100, 2) - rPu * rPu);
    double p = t.windingEddyLossPercent().orElseThrow() / 100;
    double r = rPu * base * (1 + p * h * h) / (1 + p);
    double x = xPu * base * h;
    Conductor[] lines = {L1, L2, L3};
    for (int k = 0; k < 3; k++) {
      add("V" + key(t.name(), lines[k]), 1, 0);
      add("I" + key(t.name(), lines[k]), r, x);
      for (Map.Entry<Conductor, Double> w : windings(t, k, ratio).entrySet()) {
        add("V" + key(t.fedFrom(), w.getKey()), -w.getValue(), 0);
      }
      equals(0, 0);
    }
    if (conductors.get(t.name()).contains(N)) {
      earth(t.name(), h);
    }
  }

  private static Map<Conductor, Double> windings(Transformer t, int k, double ratio) {
    Conductor[] lines = {L1, L2, L3};
    double delta = 1 / (Math.sqrt(3) * ratio);
    return switch (t.connection().symbol()) {
      case "Dyn11" -> Map.of(lines[k], delta, lines[(k + 1) % 3], -delta);
      case "Dyn1" -> Map.of(lines[k], delta, lines[(k + 2) % 3], -delta);
      // Star to star and delta to delta in phase; without a connected star point zero sequence
      // is taken out.
      case "Dd0", "Yy0" ->
          Map.of(
              lines[k],
              2 / (3 * ratio),
              lines[(k + 1) % 3],
              -1 / (3 * ratio),
              lines[(k + 2) % 3],
              -1 / (3 * ratio));
      default -> throw new IllegalArgumentException(t.connection().symbol());
    };
  }

  private void feeder(String node, String parent, Feeder f, int h) {
    for (Conductor c : conductors.get(node)) {
      drop("V" + key(parent, c), "V" + key(node, c), List.of("I" + key(node, c)), c, f, h);
    }
  }

  private void drop(String from, String to, List<String> currents, Conductor c, Feeder f, int h) {
    double km = f.lengthM().orElse(0) / 1000;
    double r = (c == N ? f.neutralResistanceOhmPerKm() : f.resistanceOhmPerKm()).orElse(0) * km;
    double x = (c == N ? f.neutralReactanceOhmPerKm() : f.reactanceOhmPerKm()).orElse(0) * km;
    add(to, 1, 0);
    add(from, -1, 0);
    currents.forEach(i -> add(i, r, x * h));
    equals(0, 0);
  }

  /** Circuits that share a neutral have its current and far end in common. */
  private void circuits(int h) {
    Map<String, Circuit> first = new HashMap<>();
    for (Circuit c : survey.circuits()) {
      for (Conductor line : c.lines().lines()) {
        drop(
            "V" + key(c.panel(), line),
            "V" + key(c.id(), line),
            List.of("I" + key(c.id(), line)),
            line,
            c.feeder(),
            h);
      }
      if (!c.lines().hasNeutral()) {
        continue;
      }
      if (c.sharedNeutral().isEmpty()) {
        drop(
            "V" + key(c.panel(), N),
            "V" + key(c.id(), N),
            List.of("I" + key(c.id(), N)),
            N,
            c.feeder(),
            h);
        continue;
      }
      Circuit other = first.putIfAbsent(c.panel() + c.sharedNeutral().get(), c);
      if (other != null) {
        // One point, one current: stated twice as the difference being nothing.
        add("V" + key(c.id(), N), 1, 0);
        add("V" + key(other.id(), N), -1, 0);
        equals(0, 0);
      } else {
        drop(
            "V" + key(c.panel(), N),
            "V" + key(c.id(), N),
            sharers(c).stream().map(s -> "I" + key(s.id(), N)).toList(),
            N,
            c.feeder(),
            h);
      }
    }
  }

  private List<Circuit> sharers(Circuit c) {
    return survey.circuits().stream()
        .filter(o -> o.panel().equals(c.panel()) && o.sharedNeutral().equals(c.sharedNeutral()))
        .toList();
  }

  /** What comes in through the feeder leaves to children, transformers, banks and loads. */
  private void kirchhoff(String node, Conductor c, int h, Map<String, Double> angles) {
    add("I" + key(node, c), 1, 0);
    for (Panel p : survey.panels()) {
      if (p.fedFrom().equals(node) && conductors.get(p.name()).contains(c)) {
        add("I" + key(p.name(), c), -1, 0);
      }
    }
    for (Circuit circuit : survey.circuits()) {
      if (circuit.panel().equals(node) && circuit.lines().conductors().contains(c)) {
        add("I" + key(circuit.id(), c), -1, 0);
      }
    }
    for (Transformer t : survey.transformers()) {
      if (t.fedFrom().equals(node) && c != N) {
        for (int k = 0; k < 3; k++) {
          double turns = windings(t, k, t.primaryV() / t.secondaryV()).getOrDefault(c, 0.0);
          add("I" + key(t.name(), new Conductor[] {L1, L2, L3}[k]), -turns, 0);
        }
      }
    }
    survey.capacitors().stream()
        .filter(bank -> bank.panel().equals(node) && c != N)
        .forEach(bank -> bank(bank, node, c, h));
    Phasor sum = Phasor.ZERO;
    for (Load load : survey.loads()) {
      if (load.circuitId().equals(node)) {
        sum = sum.plus(load(load, node, c, h, angles));
      }
    }
    equals(sum.re(), sum.im());
  }

  private void bank(CapacitorBank bank, String node, Conductor c, int h) {
    double xc = Math.pow(lineV.get(node), 2) / (1000 * bank.kvar());
    double xl = xc * bank.detuningPercent().orElse(0) / 100;
    double y = -1 / (h * xl - xc / h);
    for (Conductor line : List.of(L1, L2, L3)) {
      add("V" + key(node, line), 0, -y * ((line == c ? 1 : 0) - 1.0 / 3));
    }
  }

  /** A load's current into one conductor; of a resistance as an equation instead. */
  private Phasor load(Load load, String node, Conductor c, int h, Map<String, Double> angles) {
    List<Conductor> list = conductors.get(node);
    List<Conductor> lines = list.stream().filter(Conductor::isLine).toList();
    double watts = load.ratedW().orElseThrow() * load.quantity();
    if (load.kind().orElseThrow() == LoadKind.RESISTIVE) {
      Conductor from = lines.get(0);
      Conductor to = lines.size() == 1 ? N : lines.get(1);
      double volts = lineV.get(node) / (to == N ? Math.sqrt(3) : 1);
      double g = watts / (volts * volts);
      double sign = c == from ? -1 : c == to ? 1 : 0;
      add("V" + key(node, from), sign * g, 0);
      add("V" + key(node, to), -sign * g, 0);
      return Phasor.ZERO;
    }
    double[] shape = shape(load.spectrum().orElseThrow(), h);
    double cos = Math.cos(Math.toRadians(shape(load.spectrum().orElseThrow(), 1)[1]));
    double theta = angles.getOrDefault(node, 0.0);
    if (lines.size() == 3) {
      double amps = watts / (Math.sqrt(3) * lineV.get(node) * cos) * shape[0];
      Phasor sum = Phasor.ZERO;
      for (int k = 0; k < 3; k++) {
        Phasor i = Phasor.polar(amps, shape[1] + h * (theta - 120.0 * k));
        sum = lines.get(k) == c || c == N ? sum.plus(c == N ? i.times(-1) : i) : sum;
      }
      return sum;
    }
    Conductor to = lines.size() == 1 ? N : lines.get(1);
    double volts = lineV.get(node) / (to == N ? Math.sqrt(3) : 1);
    Phasor i = Phasor.polar(watts / (volts * cos) * shape[0], shape[1] + h * theta);
    return c == lines.get(0) ? i : c == to ? i.times(-1) : Phasor.ZERO;
  }

  private double[] shape(String name, int h) {
    SpectrumTable table =
        survey.spectra().stream().filter(s -> s.name().equals(name)).findFirst().orElseThrow();
    return table.rows().stream()
        .filter(r -> r.order() == h)
        .findFirst()
        .map(r -> new double[] {r.percent() / 100, r.degrees().orElseThrow()})
        .orElse(new double[2]);
  }

  /** The angles of the terminal fundamentals, of the solution before. */
  private Map<String, Double> angles(int pass) {
    Map<String, Double> angles = new HashMap<>();
    for (Circuit c : survey.circuits()) {
      List<Conductor> lines = c.lines().lines();
      if (pass == 0) {
        // Far from the answer, for all to correct themselves.
        angles.put(c.id(), -120.0 * lines.get(0).ordinal());
      } else if (lines.size() == 3) {
        Phasor sum = Phasor.ZERO;
        for (int k = 0; k < 3; k++) {
          sum = sum.plus(potential.get(key(c.id(), lines.get(k)))[1].turned(120.0 * k));
        }
        angles.put(c.id(), sum.degrees());
      } else {
        Conductor to = lines.size() == 1 ? N : lines.get(1);
        angles.put(c.id(), voltage(c.id(), lines.get(0), to).at(1).degrees());
      }
    }
    return angles;
  }
}
