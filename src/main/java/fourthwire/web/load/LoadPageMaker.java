package fourthwire.web.load;

import fourthwire.load.model.NoSteadyStateException;
import fourthwire.load.trial.LoadTrial;
import fourthwire.load.trial.TrialResult;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Distortion;
import fourthwire.quantity.Figure;
import fourthwire.quantity.HarmonicLoss;
import fourthwire.quantity.PowerFigures;
import fourthwire.quantity.Spectrum;
import fourthwire.quantity.Waveform;
import fourthwire.web.figure.CyclePlot;
import fourthwire.web.figure.Shapes;
import fourthwire.web.panel.Grids;
import fourthwire.web.panel.NodePage.Grid;
import fourthwire.web.support.Numbers;
import fourthwire.web.support.Words;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.EnumMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.Function;

/** Answers one question: solves it, draws it, says it. Figures are of one unit. */
final class LoadPageMaker {
  private static final int SAMPLES = 720;
  private static final int DRAWN = 240;
  private static final List<Conductor> LINES = List.of(Conductor.L1, Conductor.L2, Conductor.L3);

  private final Words words;
  private final LoadQuestion question;
  private final LimitsMaker limits;

  LoadPageMaker(Words words, LoadQuestion question) {
    this.words = words;
    this.question = question.sized();
    this.limits = new LimitsMaker(words, this.question);
  }

  LoadPage make(String query) {
    try {
      return page(query, LoadTrial.solve(question.request(), question.source()));
    } catch (NoSteadyStateException none) {
      return page(
          query,
          words.of("loads.title.none", named()),
          List.of(new Refusal(words, question).said(none)),
          Optional.empty(),
          Optional.empty());
    }
  }

  private LoadPage page(String query, TrialResult all) {
    TrialResult unit = all.times(1 / question.units());
    List<String> said = new ArrayList<>();
    all.remarks().forEach(remark -> said.add(Refusal.sentence(Refusal.set(remark))));
    Flow first = new Flow(all.first(), all.direct().get(0));
    if (question.units() > 1) {
      said.add(
          words.of(
              question.threeLines() || question.parts() > 1
                  ? "loads.together.three"
                  : "loads.together",
              Numbers.plain(question.units(), ""),
              Numbers.of(first.rms(), "A")));
    }
    conductors(unit).values().stream()
        .max(Comparator.comparingDouble(flow -> Math.abs(flow.direct())))
        .filter(Flow::hasDirect)
        .ifPresent(flow -> said.add(direct(flow)));
    String thd = percent(Distortion.thdPercent(unit.first()));
    String factor = text(unit.powerFactor(), "");
    return page(
        query,
        words.of("loads.title", named(), thd, factor),
        said,
        Optional.of(unit.first()),
        Optional.of(answer(unit)));
  }

  private LoadPage page(
      String query,
      String title,
      List<String> first,
      Optional<Spectrum> unit,
      Optional<LoadPage.Answer> answer) {
    List<String> sentences = new ArrayList<>(first);
    sentences.addAll(limits.sentences(unit));
    return new LoadPage(
        title,
        about(),
        limits.verdict(),
        limits.standing(unit),
        sentences,
        answer,
        model(),
        granted(),
        query);
  }

  private String direct(Flow flow) {
    return words.of("loads.direct.said", Numbers.of(Math.abs(flow.direct()), "A"));
  }

  /** The equipment's words with a capital. */
  private String named() {
    String name =
        question.preset().isPresent()
            ? question.name()
            : words.of("loads.kind." + question.kind().word());
    return name.substring(0, 1).toUpperCase(Locale.ROOT) + name.substring(1);
  }

  private String about() {
    List<String> parts = new ArrayList<>();
    if (question.preset().isPresent()) {
      parts.add(words.of("loads.kind." + question.kind().word()));
    }
    parts.add(
        words.of(
            "loads.about.size",
            Numbers.plain(question.ratedW(), "W"),
            Numbers.plain(question.source().nominalV(), "V"),
            Numbers.plain(question.request().frequencyHz(), "Hz")));
    if (question.parts() > 1) {
      parts.add(words.of("loads.about.parts"));
    }
    if (question.request().demand() < 1) {
      parts.add(
          words.of("loads.about.level", Numbers.plain(100 * question.request().demand(), "%")));
    }
    if (question.units() > 1) {
      parts.add(words.of("loads.about.units", Numbers.plain(question.units(), "")));
    }
    parts.add(
        question.sourceOhm() > 0
            ? words.of("loads.about.source", Numbers.of(question.sourceOhm(), "Ω"))
            : words.of("loads.about.stiff"));
    double distortion = 100 * question.source().background().distortionRms();
    if (distortion > 0) {
      parts.add(words.of("loads.about.background", Numbers.of(distortion, "%")));
    }
    return String.join(" · ", parts);
  }

  private LoadPage.Answer answer(TrialResult unit) {
    Map<Conductor, Flow> currents = conductors(unit);
    SpectrumMaker spectrum =
        new SpectrumMaker(words, unit.first(), limits.judge(unit.first()), question.threeLines());
    List<LoadPage.Key> keys = new ArrayList<>();
    for (Conductor c : currents.keySet()) {
      String name = currents.size() > 1 ? c.name() : words.of("loads.key.current");
      keys.add(new LoadPage.Key(Shapes.sample(c), name));
    }
    keys.add(new LoadPage.Key(Shapes.backdrop(), voltageKey(unit)));
    return new LoadPage.Answer(
        CyclePlot.drawOver(
            unit.voltage().get(0),
            waves(currents),
            "A",
            words.of("loads.cycle.alternative", named())),
        keys,
        spectrum.draw(named()),
        spectrum.about(),
        figures(unit),
        new ChartMaker(words, question).make(),
        limits.table(unit.first()));
  }

  /** What flows in each conductor; three equal parts return through N. */
  private Map<Conductor, Flow> conductors(TrialResult unit) {
    Map<Conductor, Flow> currents = new EnumMap<>(Conductor.class);
    int lines = Math.max(unit.current().size(), question.parts());
    for (int k = 0; k < lines; k++) {
      int line = k;
      currents.put(
          LINES.get(k),
          unit.threeLines()
              ? new Flow(unit.current().get(k), unit.direct().get(k))
              : new Flow(
                  Spectrum.of(h -> unit.first().at(h).turned(-120.0 * h * line)),
                  unit.direct().get(0)));
    }
    if (question.parts() > 1) {
      currents.values().stream()
          .reduce(Flow::plus)
          .ifPresent(neutral -> currents.put(Conductor.N, neutral));
    }
    return currents;
  }

  private static Map<Conductor, Waveform> waves(Map<Conductor, Flow> currents) {
    Map<Conductor, Waveform> waves = new EnumMap<>(Conductor.class);
    currents.forEach((conductor, flow) -> waves.put(conductor, flow.wave(DRAWN)));
    return waves;
  }

  private String voltageKey(TrialResult unit) {
    return words.of(
        unit.threeLines() || question.parts() > 1 ? "loads.key.voltage.three" : "loads.key.voltage",
        Numbers.of(Waveform.of(unit.voltage().get(0), SAMPLES).peak(), "V"));
  }

  private List<Grid> figures(TrialResult unit) {
    List<Grid> grids = new ArrayList<>();
    grids.add(currents(unit));
    grids.add(powers(unit.power()));
    grids.add(voltages(unit));
    return grids;
  }

  private Grid currents(TrialResult unit) {
    Map<Conductor, Flow> currents = conductors(unit);
    List<Flow> flows = List.copyOf(currents.values());
    List<Spectrum> spectra = flows.stream().map(Flow::orders).toList();
    List<String> heads = new ArrayList<>(List.of(words.of("loads.figure")));
    currents
        .keySet()
        .forEach(c -> heads.add(currents.size() > 1 ? c.name() : words.of("loads.value")));
    Grids grid = new Grids(words, words.of("loads.currents"), heads);
    row(grid, "loads.rms", flows, flow -> Figure.of(flow.rms()));
    if (flows.stream().anyMatch(Flow::hasDirect)) {
      row(grid, "loads.direct", flows, flow -> Figure.of(flow.direct()));
    }
    row(grid, "loads.fundamental", spectra, s -> Figure.of(settled(s.magnitude(1), s)));
    row(grid, "loads.peak", flows, flow -> Figure.of(flow.wave(SAMPLES).peak()));
    row(grid, "loads.crest", flows, flow -> flow.wave(SAMPLES).crestFactor());
    row(grid, "loads.thd", spectra, LoadPageMaker::thd);
    row(grid, "loads.loss-factor", spectra, HarmonicLoss::harmonicLossFactor);
    return grid.done();
  }

  /** A neutral's fundamental that is only rounding is none. */
  private static double settled(double amps, Spectrum s) {
    return amps < 1e-9 * s.rms() ? 0 : amps;
  }

  /** Left out where there is no fundamental to take it on. */
  private static Figure thd(Spectrum s) {
    return settled(s.magnitude(1), s) > 0 ? Distortion.thdPercent(s) : Figure.unknown("");
  }

  private Grid powers(PowerFigures power) {
    Grids grid =
        new Grids(
            words,
            words.of("loads.powers"),
            List.of(words.of("loads.figure"), words.of("loads.value")));
    boolean kilo = question.ratedW() >= 10_000;
    double scale = question.parts() * (kilo ? 1e-3 : 1);
    String of = kilo ? ".kilo" : "";
    grid.row(words.of("loads.active" + of), List.of(power.activeW().map(x -> x * scale)));
    grid.row(
        words.of("loads.reactive" + of),
        List.of(power.fundamentalReactiveVar().map(x -> x * scale)));
    grid.row(words.of("loads.apparent" + of), List.of(power.apparentVa().map(x -> x * scale)));
    grid.row(
        words.of("loads.nonfundamental" + of),
        List.of(power.nonfundamentalVa().map(x -> x * scale)));
    grid.row(words.of("power.factor"), List.of(power.powerFactor()));
    grid.row(words.of("power.displacement"), List.of(power.displacementFactor()));
    return grid.done();
  }

  private Grid voltages(TrialResult unit) {
    List<String> heads = new ArrayList<>(List.of(words.of("loads.figure")));
    for (int k = 0; k < unit.voltage().size(); k++) {
      heads.add(unit.threeLines() ? LINES.get(k).name() : words.of("loads.value"));
    }
    double nominal = question.source().nominalV() / (unit.threeLines() ? Math.sqrt(3) : 1);
    Grids grid =
        new Grids(
            words, words.of(unit.threeLines() ? "loads.voltages.three" : "loads.voltages"), heads);
    row(grid, "loads.volts.rms", unit.voltage(), s -> Figure.of(s.rms()));
    row(grid, "loads.thd", unit.voltage(), Distortion::thdPercent);
    row(
        grid,
        "loads.drop",
        unit.voltage(),
        s -> Figure.of(zeroed(100 * (nominal - s.magnitude(1)) / nominal)));
    return grid.done();
  }

  /** Rounding alone is no drop. */
  private static double zeroed(double percent) {
    return Math.abs(percent) < 1e-9 ? 0 : percent;
  }

  private <T> void row(Grids grid, String key, List<T> of, Function<T, Figure> figure) {
    grid.row(words.of(key), of.stream().map(figure).toList());
  }

  private LoadPage.Model model() {
    String kind = question.kind().word();
    return new LoadPage.Model(
        words.of("loads.kind." + kind),
        words.of("loads.model." + kind),
        words.of("loads.model." + kind + ".assumed"),
        words.of("loads.model." + kind + ".source"),
        question
            .preset()
            .map(p -> words.of("loads.preset", p.name(), Refusal.sentence(p.source())))
            .orElse(""));
  }

  private List<LoadPage.Fact> granted() {
    List<LoadPage.Fact> facts = new ArrayList<>();
    for (ModelField field : ModelField.of(question.kind())) {
      OptionalDouble given = field.of(question.request().columns());
      OptionalDouble otherwise =
          LoadDefaults.of(
              field, question.kind(), question.request().nominalPortV(), question.partW());
      if (given.isPresent()) {
        facts.add(fact(field, words.of("loads.granted.given", Typed.bound(given.getAsDouble()))));
      } else if (otherwise.isPresent()) {
        facts.add(
            fact(field, words.of("loads.granted.assumed", Typed.bound(otherwise.getAsDouble()))));
      }
    }
    return facts;
  }

  private LoadPage.Fact fact(ModelField field, String text) {
    return new LoadPage.Fact(words.of("loads.field." + field.column()), text);
  }

  private static String percent(Figure figure) {
    return text(figure, "%");
  }

  private static String text(Figure figure, String unit) {
    OptionalDouble value = figure.value();
    return value.isPresent() ? Numbers.of(value.getAsDouble(), unit) : "–";
  }
}
