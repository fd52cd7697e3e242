package fourthwire.web.panel;

import fourthwire.audit.DesignState;
import fourthwire.audit.HeadlineFigure;
import fourthwire.audit.MeasuredState;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Figure;
import fourthwire.web.figure.Rail;
import fourthwire.web.support.Column;
import fourthwire.web.support.Names;
import fourthwire.web.support.Numbers;
import fourthwire.web.support.Reasons;
import fourthwire.web.support.Words;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.stream.Collectors;
import java.util.stream.Stream;

/** Makes the large figure of the four conductors, and the table of the same figures. */
final class RailsMaker {
  private final Words words;
  private final NodeCase node;
  private final DesignState design;
  private final Names names;

  RailsMaker(Words words, NodeCase node, DesignState design) {
    this.words = words;
    this.node = node;
    this.design = design;
    this.names = node.names();
  }

  NodePage.Rails make() {
    List<Conductor> drawn = conductors();
    Reasons reasons = new Reasons();
    List<Column.Cell> amps = Column.of(drawn.stream().map(this::rms).toList(), "A", reasons);
    List<Rail> rails = drawn.stream().map(this::rail).toList();
    Rail.Scale scale = scale(rails);
    List<NodePage.RailRow> rows = new ArrayList<>();
    for (int i = 0; i < drawn.size(); i++) {
      Conductor c = drawn.get(i);
      String svg = rails.get(i).draw(scale, alternative(c));
      rows.add(
          new NodePage.RailRow(
              names.of(c), c == Conductor.N, svg, amps.get(i), shape(c), share(c)));
    }
    return new NodePage.Rails(rows, caption(rails, scale), heat(), reasons.list(), figures(drawn));
  }

  private List<Conductor> conductors() {
    Stream<Conductor> neutral =
        design.neutral().rmsA().value().isPresent() ? Stream.of(Conductor.N) : Stream.of();
    return Stream.concat(node.lines(design).stream(), neutral).toList();
  }

  private Rail rail(Conductor c) {
    OptionalDouble own = ampacity(c).value();
    double base = own.orElse(commonBase());
    double share = base > 0 ? rms(c).value().orElse(0) / base : 0;
    List<Rail.Part> parts = c == Conductor.N ? NeutralHeat.parts(words, design) : List.of();
    List<Double> measured =
        node.node().measured().stream()
            .map(m -> measured(m, c))
            .flatMapToDouble(f -> f.value().stream())
            .map(a -> base > 0 ? a / base : 0)
            .boxed()
            .toList();
    return new Rail(c, share, own.isEmpty() && anyAmpacity(), parts, measured, sure(c, base));
  }

  private Optional<Rail.Sure> sure(Conductor c, double base) {
    HeadlineFigure figure =
        c == Conductor.N ? HeadlineFigure.NEUTRAL_RMS : HeadlineFigure.LINES.get(c.ordinal());
    return node.node()
        .doubt()
        .filter(d -> base > 0)
        .flatMap(d -> Optional.ofNullable(d.range().get(figure)))
        .map(r -> new Rail.Sure(r.p5() / base, r.p95() / base));
  }

  /** What bars without an ampacity of their own stand against: the largest known, else the rms. */
  private double commonBase() {
    Stream<Figure> known =
        anyAmpacity()
            ? conductors().stream().map(this::ampacity)
            : conductors().stream().map(this::rms);
    return known.flatMapToDouble(f -> f.value().stream()).max().orElse(0);
  }

  private boolean anyAmpacity() {
    return conductors().stream().anyMatch(c -> ampacity(c).value().isPresent());
  }

  private Rail.Scale scale(List<Rail> rails) {
    List<Double> shares =
        rails.stream()
            .flatMap(
                r ->
                    Stream.of(
                            Stream.of(r.share()),
                            r.measured().stream(),
                            r.sure().stream().map(Rail.Sure::high))
                        .flatMap(s -> s))
            .toList();
    return Rail.Scale.holding(shares, anyAmpacity());
  }

  private String alternative(Conductor c) {
    String amps = rms(c).value().stream().mapToObj(a -> Numbers.of(a, "A")).findFirst().orElse("");
    return loading(c).value().isPresent()
        ? words.of(
            "rails.alternative",
            names.of(c),
            amps,
            Numbers.of(loading(c).value().getAsDouble(), "%"))
        : words.of("rails.alternative.bare", names.of(c), amps);
  }

  private String caption(List<Rail> rails, Rail.Scale scale) {
    List<String> parts = new ArrayList<>();
    parts.add(words.of(scale.marked() ? "rails.caption.share" : "rails.caption.amps"));
    if (rails.stream().anyMatch(Rail::hollow)) {
      parts.add(words.of("rails.caption.hollow"));
    }
    if (rails.stream().anyMatch(r -> r.sure().isPresent())) {
      parts.add(words.of("rails.caption.sure"));
    }
    return String.join(" ", parts);
  }

  private String heat() {
    List<Rail.Part> parts = NeutralHeat.parts(words, design);
    if (parts.isEmpty()) {
      return "";
    }
    String list =
        parts.stream()
            .map(p -> p.label() + " " + percent(100 * p.share()))
            .collect(Collectors.joining(", "));
    return words.of("rails.heat", list);
  }

  private static String percent(double share) {
    String text = Numbers.withDecimals(share, 0);
    return (text.equals("0") ? "<" + Numbers.THIN_SPACE + "1" : text) + Numbers.THIN_SPACE + "%";
  }

  private String shape(Conductor c) {
    if (c == Conductor.N) {
      return design.neutral().percentOfMeanLine().value().stream()
          .mapToObj(p -> words.of("rails.mean", Numbers.of(p / 100)))
          .findFirst()
          .orElse("");
    }
    return line(c).thdPercent().value().stream()
        .mapToObj(t -> words.of("rails.thd", Numbers.of(t, "%")))
        .findFirst()
        .orElse("");
  }

  private String share(Conductor c) {
    Optional<String> share =
        loading(c).value().stream()
            .mapToObj(
                l ->
                    words.of(
                        "rails.share",
                        Numbers.of(l, "%"),
                        Numbers.plain(ampacity(c).value().orElse(0), "A")))
            .findFirst();
    return share.orElse(words.of("rails.share.unknown"));
  }

  private NodePage.Grid figures(List<Conductor> drawn) {
    Grids grid =
        new Grids(
            words,
            words.of("currents.title"),
            List.of(
                words.of("currents.conductor"),
                words.of("currents.rms"),
                words.of("currents.fundamental"),
                words.of("currents.thd"),
                words.of("currents.tdd"),
                words.of("currents.ampacity"),
                words.of("currents.loading")));
    for (Conductor c : drawn) {
      grid.row(names.of(c), figures(c));
    }
    return grid.done(
        Working.RMS,
        Working.FUNDAMENTAL,
        Working.THD,
        Working.TDD,
        Working.LOADING,
        Working.NEUTRAL,
        Working.MEAN_LINE,
        Working.HEAT);
  }

  private List<Figure> figures(Conductor c) {
    if (c == Conductor.N) {
      DesignState.NeutralCurrent n = design.neutral();
      Figure fundamental =
          Optional.ofNullable(design.currentSpectrum().get(Conductor.N))
              .map(s -> Figure.of(s.magnitude(1)))
              .orElse(Figure.unknown(""));
      Figure none = Figure.unknown("");
      return List.of(n.rmsA(), fundamental, none, none, n.ampacityA(), n.loadingPercent());
    }
    DesignState.LineCurrent l = line(c);
    return List.of(
        l.rmsA(),
        l.fundamentalA(),
        l.thdPercent(),
        l.tddPercent(),
        l.ampacityA(),
        l.loadingPercent());
  }

  private DesignState.LineCurrent line(Conductor c) {
    return java.util.Objects.requireNonNull(design.lines().get(c));
  }

  private Figure rms(Conductor c) {
    return c == Conductor.N ? design.neutral().rmsA() : line(c).rmsA();
  }

  private Figure ampacity(Conductor c) {
    return c == Conductor.N ? design.neutral().ampacityA() : line(c).ampacityA();
  }

  private Figure loading(Conductor c) {
    return c == Conductor.N ? design.neutral().loadingPercent() : line(c).loadingPercent();
  }

  private static Figure measured(MeasuredState state, Conductor c) {
    if (c == Conductor.N) {
      return state.neutral().rmsA();
    }
    DesignState.LineCurrent line = state.lines().get(c);
    return line == null ? Figure.unknown("") : line.rmsA();
  }
}
