package fourthwire.web;

import fourthwire.audit.DesignState;
import fourthwire.audit.MeasuredState;
import fourthwire.audit.NodeResult;
import fourthwire.limits.Finding;
import fourthwire.limits.Severity;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Distortion;
import fourthwire.quantity.Figure;
import fourthwire.quantity.Phasor;
import fourthwire.quantity.PowerFigures;
import fourthwire.quantity.Spectrum;
import fourthwire.site.Circuit;
import fourthwire.site.Feeder;
import fourthwire.site.Lines;
import fourthwire.site.Load;
import fourthwire.site.LoadKind;
import fourthwire.site.ModelColumns;
import fourthwire.site.Panel;
import fourthwire.site.PhaseSystem;
import fourthwire.site.Practice;
import fourthwire.site.SiteSettings;
import fourthwire.site.SiteTree;
import fourthwire.site.Supply;
import fourthwire.site.SupplyRole;
import fourthwire.site.Survey;
import fourthwire.site.Transformer;
import fourthwire.site.VectorGroup;
import java.time.OffsetDateTime;
import java.util.ArrayList;
import java.util.EnumMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalLong;

/**
 * An invented site with invented results, for tests of the pages only: pages must show what they
 * are given, whatever computed it.
 */
public final class SampleSite {
  /** Percent of the fundamental by order, the shape of a rectifier's pulse at the voltage crest. */
  private static final Map<Integer, Double> PULSE =
      Map.of(3, 79.0, 5, 57.0, 7, 33.0, 9, 15.0, 11, 6.0, 13, 5.0, 15, 5.0);

  private static final OptionalDouble NONE = OptionalDouble.empty();

  private SampleSite() {}

  /** The survey, under this practice. */
  public static Survey survey(Practice practice) {
    return new Survey(
        new SiteSettings(
            "Quayside Annex",
            50,
            practice,
            Optional.of("Europe/London"),
            Optional.empty(),
            NONE,
            NONE,
            NONE,
            NONE,
            Optional.empty()),
        List.of(grid()),
        List.of(),
        List.of(transformer()),
        List.of(
            panel("MSB", "T1", 800),
            panel("LP-1 Reception", "MSB", 125),
            panel("LP-2 East offices", "MSB", 125),
            panel("SR-1 Server room", "MSB", 160),
            threeWire("MP-1 Pumps & air", "MSB")),
        circuits(),
        loads(),
        List.of(),
        List.of(),
        List.of(),
        List.of(),
        List.of(),
        List.of());
  }

  /** The results of every node, parents first. */
  public static List<NodeResult> results() {
    List<NodeResult> all = new ArrayList<>();
    DesignState supply = threeWireState(21);
    all.add(
        node("GRID", SiteTree.Kind.SUPPLY, Optional.empty(), supply, List.of())
            .withDoubt(Optional.of(SampleStates.doubt(supply)), "", List.of()));
    all.add(
        node(
            "T1",
            SiteTree.Kind.TRANSFORMER,
            Optional.of("GRID"),
            withTransformer(fourWire(330, 310, 320, 0.35, 800, 800)),
            List.of()));
    all.add(panel("MSB", "T1", fourWire(330, 310, 320, 0.35, 800, 800), List.of()));
    all.add(panel("LP-1 Reception", "MSB", fourWire(24, 20, 27, 0.2, 101, 101), List.of()));
    all.add(eastOffices());
    all.add(panel("SR-1 Server room", "MSB", fourWire(80, 78, 84, 0.25, 140, 140), watch()));
    all.add(
        new NodeResult(
            "MP-1 Pumps & air",
            SiteTree.Kind.PANEL,
            Optional.of("MSB"),
            "GRID",
            Optional.of(threeWireState(58)),
            "",
            List.of(),
            List.of(),
            List.of()));
    for (Circuit c : circuits()) {
      all.add(circuit(c));
    }
    return all;
  }

  private static NodeResult eastOffices() {
    DesignState design = fourWire(49, 37.5, 54, 1, 101, 101);
    MeasuredState measured =
        new MeasuredState(
            "M2",
            OptionalLong.of(3),
            Optional.of(
                new MeasuredState.Span(
                    OffsetDateTime.parse("2026-01-20T00:00:00+01:00"),
                    OffsetDateTime.parse("2026-01-27T00:00:00+01:00"))),
            "Means of the hour with the highest neutral current.",
            Map.of(Conductor.L1, amps(60), Conductor.L2, amps(48.5), Conductor.L3, amps(69.2)),
            new DesignState.NeutralCurrent(Figure.of(103.4), unknown(), unknown(), unknown(), ""),
            Map.of(),
            power(26000),
            Map.of());
    NodeResult result =
        new NodeResult(
                "LP-2 East offices",
                SiteTree.Kind.PANEL,
                Optional.of("MSB"),
                "GRID",
                Optional.of(design),
                "",
                List.of(measured),
                List.of(
                    new Finding(
                        "neutral-ampacity",
                        Severity.ACT,
                        design.neutral().rmsA(),
                        Figure.of(101),
                        "A",
                        Figure.of(0.94),
                        "IEC 60364-5-52:2009, Annex E",
                        "The neutral carries more than its conductor is rated for; third-order"
                            + " current from computers without PFC makes most of its heat."),
                    new Finding(
                        "current-distortion",
                        Severity.WATCH,
                        Figure.of(26),
                        Figure.of(15),
                        "%",
                        Figure.unknown("no spread was computed"),
                        "IEEE 519-2022, table 2; guidance only away from the point of common"
                            + " coupling",
                        "The current distortion of L3 stands above the guidance for its"
                            + " short-circuit ratio.")),
                List.of("The feeder's reactance is taken as 0.08 Ω/km†."))
            .withImpedance(Optional.of(SampleStates.curve()), SampleStates.steps())
            .withWeek(Optional.of(SampleStates.week()), "");
    return result.withDoubt(Optional.of(SampleStates.doubt(design)), "", result.findings());
  }

  private static List<Finding> watch() {
    return List.of(
        new Finding(
            "voltage-distortion",
            Severity.WATCH,
            Figure.of(4.6),
            Figure.of(5),
            "%",
            Figure.of(0.21),
            "IEEE 519-2022, table 1",
            "The voltage distortion is close to its limit."));
  }

  private static NodeResult circuit(Circuit c) {
    Map<Conductor, Spectrum> currents = new EnumMap<>(Conductor.class);
    Map<Conductor, DesignState.LineCurrent> lines = new EnumMap<>(Conductor.class);
    for (Conductor line : c.lines().lines()) {
      Spectrum s = pulse(line, 12, 1);
      currents.put(line, s);
      lines.put(line, line(s, 20));
    }
    DesignState.NeutralCurrent neutral =
        new DesignState.NeutralCurrent(unknown(), unknown(), unknown(), unknown(), "");
    if (c.lines().hasNeutral()) {
      Spectrum n = currents.values().stream().reduce(Spectrum.ZERO, Spectrum::plus);
      currents.put(Conductor.N, n);
      neutral = neutral(n, lines, 20);
    }
    return node(
        c.id(),
        SiteTree.Kind.CIRCUIT,
        Optional.of(c.panel()),
        state(lines, neutral, currents, voltages(c.lines().lines(), 0.03), List.of()),
        List.of());
  }

  private static NodeResult panel(String name, String from, DesignState d, List<Finding> found) {
    return node(name, SiteTree.Kind.PANEL, Optional.of(from), d, found);
  }

  private static NodeResult node(
      String name,
      SiteTree.Kind kind,
      Optional<String> from,
      DesignState design,
      List<Finding> findings) {
    return new NodeResult(
        name, kind, from, "GRID", Optional.of(design), "", List.of(), findings, List.of());
  }

  private static DesignState fourWire(
      double l1, double l2, double l3, double pulse, double ampacity, double neutralAmpacity) {
    Map<Conductor, Spectrum> currents = new EnumMap<>(Conductor.class);
    currents.put(Conductor.L1, pulse(Conductor.L1, l1, pulse));
    currents.put(Conductor.L2, pulse(Conductor.L2, l2, pulse));
    currents.put(Conductor.L3, pulse(Conductor.L3, l3, pulse));
    Map<Conductor, DesignState.LineCurrent> lines = new EnumMap<>(Conductor.class);
    currents.forEach((c, s) -> lines.put(c, line(s, ampacity)));
    Spectrum n = currents.values().stream().reduce(Spectrum.ZERO, Spectrum::plus);
    currents.put(Conductor.N, n);
    List<DesignState.NeutralAdder> adders =
        List.of(
            new DesignState.NeutralAdder("LP-2 East offices:1", 0.3 * n.rms()),
            new DesignState.NeutralAdder("LP-2 East offices:2", 0.66 * n.rms()),
            new DesignState.NeutralAdder("LP-2 East offices:3", 0.06 * n.rms()),
            new DesignState.NeutralAdder("LP-2 East offices:4", -0.02 * n.rms()));
    return state(
        lines,
        neutral(n, lines, neutralAmpacity),
        currents,
        voltages(List.of(Conductor.L1, Conductor.L2, Conductor.L3), 0.036 * pulse + 0.01),
        pulse == 1 ? adders : List.of());
  }

  private static DesignState threeWireState(double rms) {
    Map<Conductor, Spectrum> currents = new EnumMap<>(Conductor.class);
    Map<Conductor, DesignState.LineCurrent> lines = new EnumMap<>(Conductor.class);
    for (Conductor c : List.of(Conductor.L1, Conductor.L2, Conductor.L3)) {
      currents.put(c, pulse(c, rms, 0));
      lines.put(c, line(pulse(c, rms, 0), 125));
    }
    Figure none = Figure.unknown("this node has no neutral");
    DesignState full =
        state(
            lines,
            new DesignState.NeutralCurrent(none, none, none, none, ""),
            currents,
            Map.of(),
            List.of());
    Map<String, Spectrum> pairs = new LinkedHashMap<>();
    pairs.put("L1-L2", Spectrum.of(h -> h == 1 ? Phasor.polar(398, 30) : Phasor.ZERO));
    return withVoltage(full, pairs);
  }

  private static DesignState withVoltage(DesignState d, Map<String, Spectrum> volts) {
    return new DesignState(
        d.lines(),
        d.neutral(),
        voltage(volts, 400),
        unknown(),
        d.currentSpectrum(),
        volts,
        d.power(),
        d.powerBasis(),
        Map.of(),
        d.demandA(),
        d.demandBasis(),
        d.shortCircuitA(),
        d.transformer(),
        d.primary(),
        d.harmonicLossFactor(),
        d.lossesW(),
        d.currentUnbalancePercent(),
        d.zeroSequencePercent(),
        d.voltageUnbalancePercent(),
        d.resonances(),
        d.neutralAdders());
  }

  private static DesignState withTransformer(DesignState d) {
    return new DesignState(
        d.lines(),
        d.neutral(),
        d.voltage(),
        d.neutralVoltageV(),
        d.currentSpectrum(),
        d.voltageSpectrum(),
        d.power(),
        d.powerBasis(),
        d.powerByLine(),
        d.demandA(),
        d.demandBasis(),
        d.shortCircuitA(),
        Optional.of(
            new DesignState.TransformerState(
                Figure.of(38.2), Figure.of(1.84), Figure.of(571), Figure.of(1.08))),
        d.primary(),
        d.harmonicLossFactor(),
        d.lossesW(),
        d.currentUnbalancePercent(),
        d.zeroSequencePercent(),
        d.voltageUnbalancePercent(),
        d.resonances(),
        d.neutralAdders());
  }

  private static DesignState state(
      Map<Conductor, DesignState.LineCurrent> lines,
      DesignState.NeutralCurrent neutral,
      Map<Conductor, Spectrum> currents,
      Map<String, Spectrum> volts,
      List<DesignState.NeutralAdder> adders) {
    Map<Conductor, PowerFigures> byLine = new EnumMap<>(Conductor.class);
    lines.keySet().forEach(c -> byLine.put(c, power(7600)));
    return new DesignState(
        lines,
        neutral,
        voltage(volts, 230.94),
        Figure.of(3.42),
        currents,
        volts,
        power(24600),
        "Effective over three lines and neutral.",
        byLine,
        Figure.of(54),
        "the largest fundamental of the design state",
        Figure.of(6100),
        Optional.empty(),
        Optional.empty(),
        Figure.of(7.4),
        Figure.of(310),
        Figure.of(9.6),
        Figure.of(8.8),
        Figure.unknown("no voltage of a third line"),
        List.of(),
        adders);
  }

  private static Spectrum pulse(Conductor line, double fundamental, double share) {
    double turn = -120.0 * line.ordinal();
    return Spectrum.of(
        h -> {
          if (h == 1) {
            return Phasor.polar(fundamental, turn);
          }
          double percent = PULSE.getOrDefault(h, 0.0) * share;
          double crest = h % 4 == 3 ? 180 : 0;
          return Phasor.polar(fundamental * percent / 100, crest + h * turn);
        });
  }

  private static Map<String, Spectrum> voltages(List<Conductor> lines, double distortion) {
    Map<String, Spectrum> volts = new LinkedHashMap<>();
    for (Conductor c : lines) {
      Spectrum pulse = pulse(c, 228, 1);
      volts.put(
          c.name(),
          Spectrum.of(h -> h == 1 ? pulse.at(1) : pulse.at(h).times(distortion).turned(180)));
    }
    return volts;
  }

  private static Map<String, DesignState.LineVoltage> voltage(
      Map<String, Spectrum> volts, double nominal) {
    Map<String, DesignState.LineVoltage> out = new LinkedHashMap<>();
    volts.forEach(
        (k, s) ->
            out.put(
                k,
                new DesignState.LineVoltage(
                    Figure.of(s.rms()),
                    Figure.of(s.magnitude(1)),
                    Distortion.thdPercent(s),
                    Figure.of(100 * (nominal - s.magnitude(1)) / nominal))));
    return out;
  }

  private static DesignState.LineCurrent line(Spectrum s, double ampacity) {
    return new DesignState.LineCurrent(
        Figure.of(s.rms()),
        Figure.of(s.magnitude(1)),
        Distortion.thdPercent(s),
        Figure.of(100 * s.distortionRms() / 60),
        Figure.of(100 * s.rms() / ampacity),
        Figure.of(ampacity),
        "by its size");
  }

  private static DesignState.LineCurrent amps(double rms) {
    return new DesignState.LineCurrent(
        Figure.of(rms), unknown(), unknown(), unknown(), unknown(), unknown(), "");
  }

  private static DesignState.NeutralCurrent neutral(
      Spectrum n, Map<Conductor, DesignState.LineCurrent> lines, double ampacity) {
    double mean =
        lines.values().stream().mapToDouble(l -> l.rmsA().value().orElse(0)).average().orElse(1);
    return new DesignState.NeutralCurrent(
        Figure.of(n.rms()),
        Figure.of(100 * n.rms() / mean),
        Figure.of(100 * n.rms() / ampacity),
        Figure.of(ampacity),
        "by its size");
  }

  private static PowerFigures power(double watts) {
    return new PowerFigures(
        Figure.of(watts),
        Figure.of(0.12 * watts),
        Figure.of(1.42 * watts),
        Figure.of(0.9 * watts),
        Figure.of(1 / 1.42),
        Figure.of(0.992));
  }

  private static Figure unknown() {
    return Figure.unknown("not measured");
  }

  private static Supply grid() {
    return new Supply(
        "GRID",
        11000,
        OptionalDouble.of(180),
        NONE,
        Optional.of(SupplyRole.NORMAL),
        Optional.of(PhaseSystem.THREE_PHASE_3_WIRE),
        NONE,
        NONE,
        NONE,
        Optional.empty(),
        NONE);
  }

  private static Transformer transformer() {
    return new Transformer(
        "T1",
        "GRID",
        630,
        11000,
        400,
        VectorGroup.parse("Dyn11"),
        5,
        NONE,
        NONE,
        NONE,
        NONE,
        NONE,
        List.of(),
        NONE,
        Feeder.UNKNOWN);
  }

  private static Panel panel(String name, String from, double bus) {
    return new Panel(
        name,
        from,
        Optional.empty(),
        List.of(),
        OptionalDouble.of(bus),
        NONE,
        NONE,
        Feeder.UNKNOWN);
  }

  private static Panel threeWire(String name, String from) {
    return new Panel(
        name,
        from,
        Optional.of(PhaseSystem.THREE_PHASE_3_WIRE),
        List.of(),
        NONE,
        NONE,
        NONE,
        Feeder.UNKNOWN);
  }

  private static List<Circuit> circuits() {
    String panel = "LP-2 East offices";
    return List.of(
        circuit("1", panel, Lines.L1),
        circuit("2", panel, Lines.L3),
        circuit("3", panel, Lines.L2),
        circuit("4", panel, Lines.L1_L2_L3_N));
  }

  private static Circuit circuit(String name, String panel, Lines lines) {
    return new Circuit(name, panel, lines, OptionalDouble.of(20), Optional.empty(), Feeder.UNKNOWN);
  }

  private static List<Load> loads() {
    return List.of(
        load("desktop computers, no PFC", "1", LoadKind.CAPACITOR_INPUT, 18, 95),
        load("desktop computers, no PFC", "2", LoadKind.CAPACITOR_INPUT, 24, 95),
        load("LED panels, 40 W", "3", LoadKind.PFC_CRITICAL, 30, 40),
        load("water heater", "4", LoadKind.RESISTIVE, 1, 3000));
  }

  private static Load load(
      String name, String circuit, LoadKind kind, double quantity, double watts) {
    return new Load(
        name,
        circuit,
        "LP-2 East offices",
        Optional.of(kind),
        Optional.empty(),
        Optional.empty(),
        quantity,
        OptionalDouble.of(watts),
        NONE,
        NONE,
        NONE,
        Optional.empty(),
        Optional.empty(),
        NONE,
        NONE,
        NONE,
        Optional.of(Load.Confidence.COUNTED),
        ModelColumns.NONE);
  }
}
