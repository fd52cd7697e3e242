package fourthwire.web.panel;

import fourthwire.audit.DesignState;
import fourthwire.audit.HeadlineFigure;
import fourthwire.audit.HourSeries;
import fourthwire.audit.WeekState;
import fourthwire.limits.FindingCode;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Figure;
import fourthwire.site.SiteTree;
import fourthwire.web.figure.HourPicture;
import fourthwire.web.support.Words;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;

/** Makes the week of a node: its hours as pictures, its energy, and the hours over limits. */
final class WeekMaker {
  private static final double NEAR_NOTHING = 1e-6;

  private final Words words;
  private final NodeCase node;
  private final WeekState week;

  WeekMaker(Words words, NodeCase node, WeekState week) {
    this.words = words;
    this.node = node;
    this.week = week;
  }

  StatesView.Week make() {
    return new StatesView.Week(week.basis(), pictures(), over(), energy(), spread());
  }

  private List<StatesView.HourFigure> pictures() {
    List<StatesView.HourFigure> pictures = new ArrayList<>();
    if (node.node().kind() == SiteTree.Kind.TRANSFORMER) {
      series(HeadlineFigure.TRANSFORMER_LOADING)
          .ifPresent(s -> pictures.add(picture(HeadlineFigure.TRANSFORMER_LOADING, s, 100)));
    } else {
      series(HeadlineFigure.NEUTRAL_RMS)
          .filter(s -> s.percentile(100) > NEAR_NOTHING)
          .ifPresent(
              s ->
                  pictures.add(
                      picture(
                          HeadlineFigure.NEUTRAL_RMS, s, ampacity(HeadlineFigure.NEUTRAL_RMS))));
    }
    HeadlineFigure second =
        node.node().kind() == SiteTree.Kind.SUPPLY ? HeadlineFigure.ACTIVE : largestLine();
    series(second).ifPresent(s -> pictures.add(picture(second, s, ampacity(second))));
    return pictures;
  }

  private Optional<HourSeries> series(HeadlineFigure figure) {
    return Optional.ofNullable(week.series().get(figure));
  }

  private HeadlineFigure largestLine() {
    return HeadlineFigure.LINES.stream()
        .filter(f -> series(f).isPresent())
        .max(Comparator.comparingDouble(f -> series(f).orElseThrow().percentile(100)))
        .orElse(HeadlineFigure.L1_RMS);
  }

  /** What the conductor carries before any harmonic factor; NaN where not known. */
  private double ampacity(HeadlineFigure figure) {
    Figure known = node.design().map(d -> ampacity(d, figure)).orElse(Figure.unknown(""));
    return known.value().orElse(Double.NaN);
  }

  private static Figure ampacity(DesignState design, HeadlineFigure figure) {
    if (figure == HeadlineFigure.NEUTRAL_RMS) {
      return design.neutral().ampacityA();
    }
    int line = HeadlineFigure.LINES.indexOf(figure);
    return line < 0
        ? Figure.unknown("")
        : Optional.ofNullable(design.lines().get(Conductor.values()[line]))
            .map(DesignState.LineCurrent::ampacityA)
            .orElse(Figure.unknown(""));
  }

  private StatesView.HourFigure picture(HeadlineFigure figure, HourSeries series, double limit) {
    double most = series.percentile(100);
    double end = Double.isNaN(limit) ? most : Math.max(most, limit);
    int worst =
        IntStream.range(0, HourSeries.HOURS)
            .filter(h -> series.at(h) == most)
            .findFirst()
            .orElse(0);
    String largest = StatesView.amount(figure, most);
    String when =
        words.of(
            "week.at",
            words.of("week.day." + worst / HourSeries.HOURS_A_DAY),
            worst % HourSeries.HOURS_A_DAY);
    String caption = words.of("week.caption", largest, when, StatesView.amount(figure, end));
    boolean crossed = most > limit;
    return new StatesView.HourFigure(
        name(figure),
        HourPicture.draw(
            colour(figure), series::at, end, limit, days(), name(figure) + ": " + caption),
        crossed
            ? caption + " " + words.of("week.crossed", StatesView.amount(figure, limit))
            : caption);
  }

  private List<String> days() {
    return IntStream.range(0, 7).mapToObj(d -> words.of("week.day.short." + d)).toList();
  }

  private static String colour(HeadlineFigure figure) {
    int line = HeadlineFigure.LINES.indexOf(figure);
    return line >= 0 ? "l" + (line + 1) : figure == HeadlineFigure.NEUTRAL_RMS ? "n" : "l1";
  }

  private String name(HeadlineFigure figure) {
    return node.names().in(words.of("headline-figure." + figure.word()));
  }

  private List<String> over() {
    return Arrays.stream(FindingCode.values())
        .filter(c -> week.hoursOverLimit().getOrDefault(c.word(), 0) > 0)
        .map(
            c ->
                words.of("week.over", c.meaning(), week.hoursOverLimit().getOrDefault(c.word(), 0)))
        .toList();
  }

  private NodePage.Grid energy() {
    WeekState.Energy e = week.energy();
    boolean priced = e.pricePerKwh().value().isPresent();
    List<String> heads =
        new ArrayList<>(
            List.of(words.of("week.what"), words.of("week.kwh"), words.of("week.part")));
    if (priced) {
      heads.add(words.of("week.cost", e.currency()));
    }
    Grids grid = new Grids(words, words.of("week.energy"), heads);
    row(grid, "week.through", e.activeKwh(), e, priced);
    row(grid, "week.feeder", e.feederLossKwh(), e, priced);
    row(grid, "week.feeder.harmonic", e.feederHarmonicLossKwh(), e, priced);
    if (node.node().kind() == SiteTree.Kind.TRANSFORMER) {
      row(grid, "week.winding", e.windingLossKwh(), e, priced);
      row(grid, "week.winding.harmonic", e.windingHarmonicLossKwh(), e, priced);
    }
    return grid.done();
  }

  private void row(Grids grid, String key, double kwh, WeekState.Energy e, boolean priced) {
    List<Figure> figures = new ArrayList<>();
    figures.add(Figure.of(kwh));
    figures.add(e.activeKwh() > 0 ? Figure.of(100 * kwh / e.activeKwh()) : Figure.unknown(""));
    if (priced) {
      figures.add(e.cost(kwh));
    }
    grid.row(words.of(key), figures);
  }

  private NodePage.Grid spread() {
    Grids grid =
        new Grids(
            words,
            words.of("week.spread"),
            List.of(
                words.of("week.figure"),
                words.of("week.p", 5),
                words.of("week.p", 50),
                words.of("week.p", 95),
                words.of("week.p", 99),
                words.of("week.max")));
    week.series()
        .forEach(
            (figure, s) -> {
              List<Figure> row = new ArrayList<>();
              for (double percent : new double[] {5, 50, 95, 99, 100}) {
                row.add(Figure.of(StatesView.scaled(figure, s.percentile(percent))));
              }
              String unit = figure.unit().isEmpty() ? "" : ", " + StatesView.unit(figure);
              grid.row(name(figure) + unit, row);
            });
    return grid.done();
  }
}
