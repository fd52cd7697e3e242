package fourthwire.web.load;

import fourthwire.load.model.NoSteadyStateException.Why;
import fourthwire.load.trial.Sweep;
import fourthwire.load.trial.TrialResult;
import fourthwire.quantity.Distortion;
import fourthwire.quantity.Figure;
import fourthwire.site.LoadKind;
import fourthwire.web.figure.CurvePlot;
import fourthwire.web.figure.CurvePlot.Style;
import fourthwire.web.figure.Shapes;
import fourthwire.web.panel.Grids;
import fourthwire.web.support.Numbers;
import fourthwire.web.support.Words;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.DoubleUnaryOperator;
import java.util.function.Function;
import java.util.stream.DoubleStream;
import java.util.stream.IntStream;
import java.util.stream.Stream;

/** Draws how a question's figures move with load level, firing angle and number of units. */
final class ChartMaker {
  private static final double LAST_UNITS = 100;
  private static final List<Double> UNITS = List.of(1.0, 2.0, 5.0, 10.0, 20.0, 50.0, LAST_UNITS);
  private static final String UNKNOWN = "–";

  private final Words words;
  private final LoadQuestion question;

  /** The curves in percent. */
  private final List<Line> lines;

  /** The one from 0 to 1, whatever the direction of power. */
  private final Line factor;

  /** One curve: what it is of, the heading of its figures, and the figure. */
  private record Line(
      Style style, String name, String heading, Function<TrialResult, Figure> figure) {}

  ChartMaker(Words words, LoadQuestion question) {
    this.words = words;
    this.question = question;
    int first = question.threeLines() ? 5 : 3;
    int second = question.threeLines() ? 7 : 5;
    this.lines =
        List.of(
            percent(Style.SOLID, "THD", r -> Distortion.thdPercent(r.first())),
            order(Style.DASHED, first),
            order(Style.DOTTED, second));
    String name = words.of("power.factor");
    this.factor = new Line(Style.SOLID, name, name, r -> r.powerFactor().map(Math::abs));
  }

  private static Line order(Style style, int order) {
    return percent(
        style, Numbers.ordinal(order), r -> Distortion.percentOfFundamental(r.first(), order));
  }

  private static Line percent(Style style, String name, Function<TrialResult, Figure> figure) {
    return new Line(style, name, name + ", %", figure);
  }

  List<LoadPage.Chart> make() {
    List<LoadPage.Chart> charts = new ArrayList<>();
    if (question.kind() == LoadKind.PHASE_DIMMER) {
      charts.add(firing());
    } else if (question.request().lowerPower()) {
      charts.add(level());
    }
    if (question.sourceOhm() > 0) {
      charts.add(units());
    }
    return charts;
  }

  private LoadPage.Chart level() {
    double lowest = Math.min(0.1, question.request().demand());
    List<Double> levels =
        DoubleStream.concat(
                DoubleStream.of(lowest), IntStream.rangeClosed(1, 10).mapToDouble(k -> k / 10.0))
            .distinct()
            .boxed()
            .toList();
    return chart(
        "level",
        Sweep.overLevel(question.request(), question.source(), levels),
        level -> (level - lowest) / (1 - lowest),
        level -> Numbers.plain(100 * level, "%"),
        question.request().demand());
  }

  private LoadPage.Chart firing() {
    List<Double> degrees = IntStream.rangeClosed(0, 11).mapToObj(k -> 15.0 * k).toList();
    double here =
        question
            .request()
            .columns()
            .firingDegrees()
            .orElse(LoadDefaults.of(ModelField.FIRING, LoadKind.PHASE_DIMMER, 1, 1).orElseThrow());
    return chart(
        "firing",
        Sweep.overFiring(question.request(), question.source(), degrees),
        angle -> angle / 165,
        angle -> Numbers.plain(angle, "") + "°",
        here);
  }

  private LoadPage.Chart units() {
    double most = Math.max(LAST_UNITS, question.units());
    List<Double> units =
        Stream.concat(UNITS.stream().filter(n -> 1.5 * n < most), Stream.of(most)).toList();
    return chart(
        "units",
        Sweep.overUnits(question.request(), question.source(), units),
        n -> Math.log(n) / Math.log(most),
        n -> Numbers.plain(n, ""),
        question.units());
  }

  private LoadPage.Chart chart(
      String id,
      List<Sweep.Point> points,
      DoubleUnaryOperator place,
      Function<Double, String> label,
      double here) {
    List<CurvePlot.Place> places =
        points.stream()
            .map(p -> new CurvePlot.Place(place.applyAsDouble(p.at()), label.apply(p.at())))
            .toList();
    List<CurvePlot.Curve> curves =
        lines.stream().map(l -> new CurvePlot.Curve(l.style(), values(points, l))).toList();
    List<CurvePlot.Place> shown = thinned(places);
    double x = place.applyAsDouble(here);
    OptionalDouble mark = x >= 0 && x <= 1 ? OptionalDouble.of(x) : OptionalDouble.empty();
    String title = words.of("loads.chart." + id);
    return new LoadPage.Chart(
        id,
        title,
        CurvePlot.draw(shown, curves, mark, words.of("loads.chart.alternative", title)),
        CurvePlot.drawFactor(
            shown,
            new CurvePlot.Curve(factor.style(), values(points, factor)),
            mark,
            words.of("loads.chart.alternative.factor", title)),
        lines.stream().map(l -> new LoadPage.Key(Shapes.sample(l.style()), l.name())).toList(),
        sentence(id, points, label),
        table(title, points, label));
  }

  /** The first, the last and every third from there, where there are many. */
  private static List<CurvePlot.Place> thinned(List<CurvePlot.Place> places) {
    int last = places.size() - 1;
    return IntStream.rangeClosed(0, last)
        .mapToObj(
            i ->
                last < 9 || i == 0 || i > 1 && (last - i) % 3 == 0
                    ? places.get(i)
                    : new CurvePlot.Place(places.get(i).at(), ""))
        .toList();
  }

  private static List<OptionalDouble> values(List<Sweep.Point> points, Line line) {
    return points.stream()
        .map(p -> p.result().map(line.figure()).map(Figure::value).orElse(OptionalDouble.empty()))
        .toList();
  }

  /** First and last solved state in words, and where there is none for which reason. */
  private String sentence(String id, List<Sweep.Point> points, Function<Double, String> label) {
    List<Sweep.Point> solved = points.stream().filter(p -> p.result().isPresent()).toList();
    if (solved.isEmpty()) {
      return words.of("loads.chart.none");
    }
    Sweep.Point first = solved.get(0);
    Sweep.Point last = solved.get(solved.size() - 1);
    String said =
        words.of(
            "loads.chart." + id + ".sentence",
            label.apply(first.at()),
            thd(first),
            factor(first),
            label.apply(last.at()),
            thd(last),
            factor(last));
    StringBuilder all = new StringBuilder(said);
    for (Why why : Why.values()) {
      List<String> at =
          points.stream()
              .filter(p -> p.why().equals(Optional.of(why)))
              .map(p -> label.apply(p.at()))
              .toList();
      if (!at.isEmpty()) {
        all.append(' ').append(words.of("loads.chart.unsolved." + word(why), listed(at)));
      }
    }
    return all.toString();
  }

  private String listed(List<String> parts) {
    int last = parts.size() - 1;
    return last == 0
        ? parts.get(0)
        : words.of("loads.chart.and", String.join(", ", parts.subList(0, last)), parts.get(last));
  }

  private static String word(Why why) {
    return why.name().toLowerCase(Locale.ROOT).replace('_', '-');
  }

  private static String thd(Sweep.Point point) {
    return percent(Distortion.thdPercent(point.result().orElseThrow().first()));
  }

  private static String factor(Sweep.Point point) {
    OptionalDouble factor = point.result().orElseThrow().powerFactor().value();
    return factor.isPresent() ? Numbers.of(factor.getAsDouble()) : UNKNOWN;
  }

  private static String percent(Figure figure) {
    OptionalDouble value = figure.value();
    return value.isPresent() ? Numbers.of(value.getAsDouble(), "%") : UNKNOWN;
  }

  private String reason(Sweep.Point point) {
    return words.of("loads.chart.reason." + word(point.why().orElse(Why.OTHER)));
  }

  private fourthwire.web.panel.NodePage.Grid table(
      String title, List<Sweep.Point> points, Function<Double, String> label) {
    List<String> heads = new ArrayList<>(List.of(title));
    List<Line> columns = Stream.concat(lines.stream(), Stream.of(factor)).toList();
    columns.forEach(l -> heads.add(l.heading()));
    Grids grid = new Grids(words, title, heads);
    for (Sweep.Point p : points) {
      grid.row(
          label.apply(p.at()),
          columns.stream()
              .map(l -> p.result().map(l.figure()).orElse(Figure.unknown(reason(p))))
              .toList());
    }
    return grid.done();
  }
}
