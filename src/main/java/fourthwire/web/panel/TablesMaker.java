package fourthwire.web.panel;

import fourthwire.audit.DesignState;
import fourthwire.audit.MeasuredState;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Figure;
import fourthwire.quantity.PowerFigures;
import fourthwire.site.Transformer;
import fourthwire.web.support.Names;
import fourthwire.web.support.Words;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.Function;

/** Makes the tables below the pictures: voltage, power, transformer, measured beside computed. */
final class TablesMaker {
  private static final double KILO = 1000;

  private final Words words;
  private final NodeCase node;
  private final DesignState design;
  private final Names names;

  TablesMaker(Words words, NodeCase node, DesignState design) {
    this.words = words;
    this.node = node;
    this.design = design;
    this.names = node.names();
  }

  NodePage.Grid voltage() {
    Grids grid =
        new Grids(
            words,
            words.of("voltage.table"),
            heads(
                "voltage.between",
                "voltage.rms",
                "voltage.fundamental",
                "voltage.thd",
                "voltage.drop"));
    design.voltage().entrySet().stream()
        .sorted(java.util.Map.Entry.comparingByKey())
        .forEach(
            e ->
                grid.row(
                    names.of(e.getKey()),
                    List.of(
                        e.getValue().rmsV(),
                        e.getValue().fundamentalV(),
                        e.getValue().thdPercent(),
                        e.getValue().dropPercent())));
    Figure none = Figure.unknown("");
    if (design.neutral().rmsA().value().isPresent()) {
      grid.row(words.of("voltage.neutral"), List.of(design.neutralVoltageV(), none, none, none));
    }
    return grid.done(Working.VOLTAGE_THD, Working.DROP, Working.NEUTRAL_VOLTAGE);
  }

  NodePage.Grid power() {
    List<Conductor> lines = design.powerByLine().keySet().stream().sorted().toList();
    List<String> heads = new ArrayList<>(List.of(words.of("power.figure")));
    heads.add(words.of("power.whole"));
    lines.forEach(c -> heads.add(names.of(c)));
    Grids grid = new Grids(words, words.of("power.title", names.in(design.powerBasis())), heads);
    row(grid, "power.active", lines, p -> kilo(p.activeW()));
    row(grid, "power.reactive", lines, p -> kilo(p.fundamentalReactiveVar()));
    row(grid, "power.apparent", lines, p -> kilo(p.apparentVa()));
    row(grid, "power.nonfundamental", lines, p -> kilo(p.nonfundamentalVa()));
    row(grid, "power.factor", lines, PowerFigures::powerFactor);
    row(grid, "power.displacement", lines, PowerFigures::displacementFactor);
    whole(grid, "power.losses", design.lossesW().map(w -> w / KILO), lines.size());
    whole(grid, "power.unbalance", design.currentUnbalancePercent(), lines.size());
    whole(grid, "power.zero-sequence", design.zeroSequencePercent(), lines.size());
    whole(grid, "power.voltage-unbalance", design.voltageUnbalancePercent(), lines.size());
    return grid.done(
        Working.ACTIVE,
        Working.REACTIVE,
        Working.APPARENT,
        Working.NONFUNDAMENTAL,
        Working.POWER_FACTOR,
        Working.DISPLACEMENT,
        Working.LOSSES,
        Working.UNBALANCE);
  }

  Optional<NodePage.Grid> transformer() {
    return design
        .transformer()
        .map(
            t ->
                new Grids(
                        words,
                        words.of("transformer.title"),
                        heads("transformer.figure", "transformer.value"))
                    .row(words.of("transformer.loading"), List.of(t.loadingPercent()))
                    .row(words.of("transformer.k-factor"), List.of(t.kFactor()))
                    .row(words.of("transformer.loss-factor"), List.of(design.harmonicLossFactor()))
                    .row(words.of("transformer.derated"), List.of(t.deratedKva()))
                    .row(words.of("transformer.left"), List.of(leftKva(t)))
                    .row(words.of("transformer.losses"), List.of(design.lossesW()))
                    .row(words.of("transformer.factor-k"), List.of(t.factorK()))
                    .done(
                        Working.LOADING,
                        Working.K_FACTOR,
                        Working.LOSS_FACTOR,
                        Working.DERATED,
                        Working.LOSSES,
                        Working.FACTOR_K));
  }

  /** What it can still take of this current's shape; below 0 where it has too much. */
  private Figure leftKva(DesignState.TransformerState t) {
    double ratedKva =
        node.survey().transformers().stream()
            .filter(plate -> plate.name().equals(node.node().node()))
            .mapToDouble(Transformer::ratedKva)
            .findFirst()
            .orElse(Double.NaN);
    double loadKva = ratedKva * t.loadingPercent().value().orElse(Double.NaN) / 100;
    return Double.isNaN(loadKva)
        ? Figure.unknown(t.loadingPercent().reason())
        : t.deratedKva().map(derated -> derated - loadKva);
  }

  /** A transformer's primary side: its lines, and its neutral where it has one. */
  Optional<NodePage.Grid> primary() {
    return design.primary().map(this::primary);
  }

  private NodePage.Grid primary(DesignState.PrimaryState primary) {
    Grids grid =
        new Grids(
            words,
            words.of("primary.title"),
            heads(
                "currents.conductor",
                "currents.rms",
                "currents.fundamental",
                "currents.thd",
                "currents.tdd",
                "currents.ampacity",
                "currents.loading"));
    primary.lines().entrySet().stream()
        .sorted(java.util.Map.Entry.comparingByKey())
        .forEach(
            e ->
                grid.row(
                    names.of(e.getKey()),
                    List.of(
                        e.getValue().rmsA(),
                        e.getValue().fundamentalA(),
                        e.getValue().thdPercent(),
                        e.getValue().tddPercent(),
                        e.getValue().ampacityA(),
                        e.getValue().loadingPercent())));
    DesignState.NeutralCurrent neutral = primary.neutral();
    if (neutral.rmsA().value().isPresent()) {
      Figure none = Figure.unknown("");
      grid.row(
          names.of(Conductor.N),
          List.of(neutral.rmsA(), none, none, none, neutral.ampacityA(), neutral.loadingPercent()));
    }
    return grid.done();
  }

  List<NodePage.Grid> measured() {
    return node.node().measured().stream().map(this::measured).toList();
  }

  private String period(MeasuredState state) {
    return state
        .period()
        .map(MeasuredState.Span::text)
        .orElseGet(() -> words.of("reading.period.unknown"));
  }

  private NodePage.Grid measured(MeasuredState state) {
    String title =
        words.of("measured.title", state.meter(), period(state), names.in(state.basis()));
    Grids grid =
        new Grids(
            words,
            title,
            heads(
                "currents.conductor",
                "measured.computed",
                "measured.measured",
                "measured.difference"));
    for (Conductor c : Conductor.values()) {
      Figure measured = amps(state.lines(), state.neutral(), c);
      Figure computed = amps(design.lines(), design.neutral(), c);
      if (measured.value().isPresent()) {
        grid.row(names.of(c), List.of(computed, measured, difference(computed, measured)));
      }
    }
    return grid.done();
  }

  private static Figure amps(
      java.util.Map<Conductor, DesignState.LineCurrent> lines,
      DesignState.NeutralCurrent neutral,
      Conductor c) {
    if (c == Conductor.N) {
      return neutral.rmsA();
    }
    DesignState.LineCurrent line = lines.get(c);
    return line == null ? Figure.unknown("") : line.rmsA();
  }

  private Figure difference(Figure computed, Figure measured) {
    double base = measured.value().orElse(0);
    return computed.value().isPresent() && base > 0
        ? computed.map(c -> 100 * (c - base) / base)
        : Figure.unknown("");
  }

  private void row(
      Grids grid, String key, List<Conductor> lines, Function<PowerFigures, Figure> of) {
    List<Figure> figures = new ArrayList<>(List.of(of.apply(design.power())));
    lines.forEach(
        c -> figures.add(of.apply(java.util.Objects.requireNonNull(design.powerByLine().get(c)))));
    grid.row(words.of(key), figures);
  }

  private void whole(Grids grid, String key, Figure figure, int lines) {
    List<Figure> figures = new ArrayList<>(List.of(figure));
    for (int i = 0; i < lines; i++) {
      figures.add(Figure.unknown(""));
    }
    grid.row(words.of(key), figures);
  }

  private static Figure kilo(Figure figure) {
    return figure.map(v -> v / KILO);
  }

  private List<String> heads(String... keys) {
    return java.util.Arrays.stream(keys).map(k -> words.of(k)).toList();
  }
}
