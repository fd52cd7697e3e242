package fourthwire.web.reading.series;

import fourthwire.metering.reduce.StepValues;
import fourthwire.metering.reduce.TimeSteps;
import fourthwire.web.figure.SeriesPlot;
import fourthwire.web.panel.NodePage;
import fourthwire.web.support.Words;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.Collectors;
import java.util.stream.DoubleStream;
import java.util.stream.IntStream;
import java.util.stream.Stream;

/** Makes the page of a log over time. */
final class SeriesPageMaker {
  private static final int MOST_STEPS = 720;
  private static final int FEWEST_STEPS = 200;

  /** Steps of all strips together, so that a page stays under 100 kB. */
  private static final int ALL_STEPS = 3600;

  private static final int OVERVIEW_STEPS = 400;
  private static final int TABLE_STEPS = 16;

  private final LogView view;
  private final Words words;

  SeriesPageMaker(LogView view) {
    this.view = view;
    this.words = view.words();
  }

  /** A measure's values in the steps of the picture and in those of the table. */
  private record Values(
      Measure measure, List<StepValues> fine, List<StepValues> coarse, double factor, String unit) {
    TimeSteps steps() {
      return fine.get(0).steps();
    }

    Digits digits() {
      return Digits.of(factor * extremes().min().orElse(0), factor * extremes().max().orElse(0));
    }

    private DoubleStream extremes() {
      return fine.stream()
          .flatMapToDouble(v -> DoubleStream.of(v.min(), v.max()))
          .filter(v -> !Double.isNaN(v));
    }
  }

  SeriesPage make(String show, String also, boolean together) {
    Measures measures = view.measures();
    Measure first = measures.orFirst(show);
    Optional<Measure> second = measures.find(also).filter(m -> !m.equals(first));
    List<Measure> shown = Stream.concat(Stream.of(first), second.stream()).toList();
    int strips = shown.stream().mapToInt(m -> m.quantities().size()).sum();
    int most = Math.max(FEWEST_STEPS, Math.min(MOST_STEPS, ALL_STEPS / strips));
    List<Values> values = shown.stream().map(m -> values(m, most)).toList();
    LogNotes notes = new LogNotes(view);
    return new SeriesPage(
        view.head(verdict(values.get(0)), "series"),
        measures.groups(words),
        first.word(),
        second.map(Measure::word).orElse(""),
        together,
        values.stream().map(v -> picture(v, notes.bars(), together)).toList(),
        view.span().isWhole() ? "" : overview(first),
        notes.rows(),
        notes.elsewhere());
  }

  private Values values(Measure measure, int most) {
    List<List<StepValues>> both =
        view.log()
            .values(
                measure.quantities(),
                List.of(view.span().steps(most), view.span().steps(TABLE_STEPS)));
    List<StepValues> fine = both.stream().map(b -> b.get(0)).toList();
    double largest =
        fine.stream()
            .flatMapToDouble(v -> DoubleStream.of(v.min(), v.max()))
            .filter(v -> !Double.isNaN(v))
            .map(Math::abs)
            .max()
            .orElse(0);
    return new Values(
        measure,
        fine,
        both.stream().map(b -> b.get(1)).toList(),
        measure.factor(largest),
        measure.unit(largest));
  }

  /** What was furthest over its limit, as a sentence; empty where no limit is known. */
  private String verdict(Values values) {
    int worst = -1;
    long most = -1;
    for (int k = 0; k < values.fine().size(); k++) {
      boolean limited = !view.limits().of(quantity(values, k)).isEmpty();
      long passed = passed(bounds(values, k), values.fine().get(k));
      if (limited && passed > most) {
        worst = k;
        most = passed;
      }
    }
    if (worst < 0 || most == 0) {
      return worst < 0 ? "" : view.alwaysWithin(values.measure());
    }
    List<SeriesPlot.Bound> bounds = bounds(values, worst);
    String place = view.place(quantity(values, worst));
    String when = share(most, values.steps());
    return bounds.size() == 1
        ? words.of("series.verdict.over", place, bounds.get(0).label(), when)
        : words.of("series.verdict.outside", place, values.measure().label(words), when);
  }

  private static String quantity(Values values, int k) {
    return values.measure().quantities().get(k);
  }

  private List<SeriesPlot.Bound> bounds(Values values, int k) {
    return view.limits().of(quantity(values, k)).stream()
        .map(l -> l.bound(values.factor(), values.unit()))
        .toList();
  }

  private static long passed(List<SeriesPlot.Bound> bounds, StepValues v) {
    return IntStream.range(0, v.steps().count())
        .filter(k -> bounds.stream().anyMatch(b -> b.isPassed(v, k)))
        .count();
  }

  /** So many of the steps: 5 of 365 days. */
  private String share(long count, TimeSteps steps) {
    return words.of("series.share", count, StepWords.counted(steps.count(), steps, words));
  }

  private SeriesPage.Picture picture(Values values, List<SeriesPlot.Note> notes, boolean together) {
    List<SeriesPlot.Strip> strips =
        IntStream.range(0, values.fine().size()).mapToObj(k -> strip(values, k)).toList();
    Measure measure = values.measure();
    String title = measure.label(words);
    boolean one = together && strips.size() > 1;
    return new SeriesPage.Picture(
        title,
        words.of("series.step", StepWords.of(values.steps().length(), words), view.rows())
            + (strips.stream().anyMatch(s -> s.before().isPresent())
                ? "; " + words.of("series.before")
                : ""),
        SeriesPlot.draw(
            strips,
            notes,
            new SeriesPlot.Manner(view.log().zone(), values.factor(), values.unit(), one),
            words.of("series.alternative", title, strips.size())),
        view.limits()
            .lines(
                measure,
                values.factor(),
                values.unit(),
                b -> SeriesPlot.draws(strips, b, values.factor())),
        one ? view.keys(measure) : List.of(),
        figures(values),
        readout(values));
  }

  private SeriesPage.Readout readout(Values values) {
    TimeSteps steps = values.steps();
    List<String> quantities = values.measure().quantities();
    return new SeriesPage.Readout(
        "/api/v1/readings/%d/series?from=%s&to=%s&points=%d&rows=%s"
            .formatted(
                view.log().entry().id(),
                Instant.ofEpochMilli(steps.from()),
                Instant.ofEpochMilli(steps.to()),
                Math.max(2, steps.count()),
                view.log().isCorrected() ? "corrected" : LogView.AS_READ),
        String.join(" ", quantities),
        quantities.stream().map(view::place).collect(Collectors.joining(" ")),
        values.factor(),
        values.unit());
  }

  private SeriesPlot.Strip strip(Values values, int k) {
    StepValues v = values.fine().get(k);
    List<SeriesPlot.Bound> bounds = bounds(values, k);
    String range = range(v, values);
    long passed = passed(bounds, v);
    int all = v.steps().count();
    return new SeriesPlot.Strip(
        view.place(quantity(values, k)),
        passed == 0 ? range : words.of("series.passed", range, share(passed, v.steps())),
        passed == 0 ? range : words.of("series.passed.brief", range, passed, all),
        Measure.classes(quantity(values, k)),
        v,
        before(values, k),
        bounds);
  }

  /** The rows as read, where they show something else. */
  private Optional<StepValues> before(Values values, int k) {
    StepValues shown = values.fine().get(k);
    return view.before(quantity(values, k))
        .map(log -> log.values(List.of(quantity(values, k)), shown.steps()).get(0))
        .filter(
            read ->
                IntStream.range(0, shown.steps().count())
                    .anyMatch(s -> Double.compare(read.mean(s), shown.mean(s)) != 0));
  }

  private String range(StepValues v, Values values) {
    return Double.isNaN(v.max())
        ? words.of("series.none")
        : words.of(
            "series.range",
            values.digits().text(values.factor() * v.min()),
            values.digits().text(values.factor() * v.max(), values.unit()));
  }

  /** The same in a few steps, for who can't see the picture or wants numbers. */
  private NodePage.Grid figures(Values values) {
    TimeSteps steps = values.coarse().get(0).steps();
    List<String> heads = new ArrayList<>(List.of(words.of("series.when")));
    for (String q : values.measure().quantities()) {
      for (String key : List.of("series.lowest", "series.mean", "series.highest")) {
        heads.add(words.of(key, view.place(q), values.unit()));
      }
    }
    Digits written = values.digits();
    FigureGrid grid =
        new FigureGrid(
            words.of("series.figures.caption", StepWords.of(steps.length(), words)),
            heads,
            column -> written);
    for (int k = 0; k < steps.count(); k++) {
      int step = k;
      grid.row(
          view.moments().minute(Instant.ofEpochMilli(steps.edge(k))),
          values.coarse().stream()
              .flatMapToDouble(v -> DoubleStream.of(v.min(step), v.mean(step), v.max(step)))
              .map(v -> values.factor() * v)
              .toArray());
    }
    return grid.done();
  }

  private String overview(Measure measure) {
    String quantity = measure.quantities().get(measure.quantities().size() - 1);
    TimeSteps whole = view.log().steps(view.log().period(), OVERVIEW_STEPS);
    return SeriesPlot.overview(
        view.log().values(List.of(quantity), whole).get(0),
        Measure.classes(quantity),
        view.span().shown().from().toEpochMilli(),
        view.span().shown().to().toEpochMilli(),
        view.log().zone(),
        words.of("series.overview.alternative", view.place(quantity)));
  }
}
