package fourthwire.web.reading.series;

import fourthwire.jobs.series.StoredLog;
import fourthwire.metering.reduce.HourMeans;
import fourthwire.metering.reduce.ValuesBySize;
import fourthwire.metering.series.WeekClock;
import fourthwire.web.figure.DurationPlot;
import fourthwire.web.figure.HourTable;
import fourthwire.web.figure.SeriesPlot;
import fourthwire.web.panel.NodePage;
import fourthwire.web.support.Numbers;
import fourthwire.web.support.Words;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalInt;
import java.util.stream.DoubleStream;
import java.util.stream.IntStream;
import java.util.stream.Stream;

/** Makes the page of a measure in order of size and by hour of the week. */
final class SpreadPageMaker {
  private static final List<Integer> PERCENTS = List.of(5, 50, 95, 99);
  private static final double FURTHEST_BEFORE = 3;

  private final LogView view;
  private final Words words;
  private final LogLimits limits;

  SpreadPageMaker(LogView view) {
    this.view = view;
    this.words = view.words();
    this.limits = view.limits();
  }

  SpreadPage make(String show) {
    Measures measures = view.measures();
    Measure measure = measures.orFirst(show);
    List<StoredLog.Spread> spreads = view.log().spreads(measure.quantities(), view.span().shown());
    List<ValuesBySize> values = spreads.stream().map(StoredLog.Spread::bySize).toList();
    double largest =
        values.stream()
            .filter(v -> v.count() > 0)
            .mapToDouble(v -> Math.max(Math.abs(v.percentile(0)), Math.abs(v.percentile(100))))
            .max()
            .orElse(0);
    double factor = measure.factor(largest);
    String unit = measure.unit(largest);
    String title = measure.label(words);
    List<DurationPlot.Curve> curves = curves(measure, values);
    List<DurationPlot.Curve> before = before(measure, values);
    return new SpreadPage(
        view.head(verdict(measure, values, factor, unit), "spread"),
        measures.groups(words),
        measure.word(),
        title,
        words.of(before.isEmpty() ? "spread.about" : "spread.about.both", view.rows()),
        curve(
            measure, Stream.concat(before.stream(), curves.stream()).toList(), factor, unit, title),
        view.keys(measure),
        limits.lines(measure, factor, unit, b -> DurationPlot.draws(curves, b, factor)),
        figures(measure, values, factor, unit),
        IntStream.range(0, spreads.size())
            .mapToObj(k -> hours(measure.quantities().get(k), spreads.get(k).hours(), factor, unit))
            .toList());
  }

  /** What was longest outside its limit, as a sentence; empty where no limit is known. */
  private String verdict(Measure measure, List<ValuesBySize> values, double factor, String unit) {
    int worst = -1;
    double most = -1;
    for (int k = 0; k < values.size(); k++) {
      double outside = outside(measure.quantities().get(k), values.get(k));
      if (outside > most) {
        worst = k;
        most = outside;
      }
    }
    if (worst < 0 || most == 0) {
      return worst < 0 ? "" : view.alwaysWithin(measure);
    }
    String quantity = measure.quantities().get(worst);
    List<LogLimits.Limit> of = limits.of(quantity);
    String place = view.place(quantity);
    String share = words.of("spread.share", Numbers.of(most, "%"));
    return of.size() == 1
        ? words.of("series.verdict.for", place, of.get(0).bound(factor, unit).label(), share)
        : words.of("series.verdict.outside.for", place, measure.label(words), share);
  }

  private static List<DurationPlot.Curve> curves(Measure measure, List<ValuesBySize> values) {
    return IntStream.range(0, values.size())
        .mapToObj(
            k ->
                new DurationPlot.Curve(Measure.classes(measure.quantities().get(k)), values.get(k)))
        .toList();
  }

  /** The rows as read where they are others, unless they lie so far off that little else shows. */
  private List<DurationPlot.Curve> before(Measure measure, List<ValuesBySize> values) {
    double most = most(values, 1);
    double least = least(values, 1);
    double furthest = FURTHEST_BEFORE * (most - Math.min(0, least));
    List<DurationPlot.Curve> before = new ArrayList<>();
    for (String quantity : measure.quantities()) {
      view.before(quantity)
          .map(log -> log.spreads(List.of(quantity), view.span().shown()).get(0).bySize())
          .filter(v -> v.count() > 0)
          .filter(v -> v.percentile(100) <= furthest && v.percentile(0) >= least - furthest)
          .ifPresent(v -> before.add(new DurationPlot.Curve("before", v)));
    }
    return before;
  }

  private String curve(
      Measure measure, List<DurationPlot.Curve> curves, double factor, String unit, String title) {
    List<SeriesPlot.Bound> bounds =
        measure.quantities().stream()
            .flatMap(q -> limits.of(q).stream())
            .map(l -> l.bound(factor, unit))
            .distinct()
            .toList();
    return DurationPlot.draw(curves, bounds, factor, unit, words.of("spread.alternative", title));
  }

  private NodePage.Grid figures(
      Measure measure, List<ValuesBySize> values, double factor, String unit) {
    List<String> heads =
        new ArrayList<>(
            List.of(unit.isEmpty() ? words.of("spread.place") : words.of("spread.of", unit)));
    PERCENTS.forEach(p -> heads.add("P" + p));
    heads.add(words.of("spread.highest"));
    heads.add(words.of("spread.outside"));
    Digits written = Digits.of(least(values, factor), most(values, factor));
    FigureGrid grid =
        new FigureGrid(
            words.of("spread.figures", view.rows()),
            heads,
            c -> c <= PERCENTS.size() ? written : new Digits(OptionalInt.empty()));
    for (int k = 0; k < values.size(); k++) {
      ValuesBySize v = values.get(k);
      String quantity = measure.quantities().get(k);
      DoubleStream percentiles = PERCENTS.stream().mapToDouble(p -> factor * v.percentile(p));
      DoubleStream rest = DoubleStream.of(factor * v.percentile(100), outside(quantity, v));
      grid.row(view.place(quantity), DoubleStream.concat(percentiles, rest).toArray());
    }
    return grid.done();
  }

  private static double least(List<ValuesBySize> values, double factor) {
    return values.stream().mapToDouble(v -> factor * v.percentile(0)).min().orElse(0);
  }

  private static double most(List<ValuesBySize> values, double factor) {
    return values.stream().mapToDouble(v -> factor * v.percentile(100)).max().orElse(0);
  }

  /** Percent of the time outside the limits; NaN where there are none. */
  private double outside(String quantity, ValuesBySize values) {
    List<LogLimits.Limit> of = limits.of(quantity);
    double share = of.isEmpty() ? Double.NaN : 0;
    for (LogLimits.Limit limit : of) {
      double above = values.shareAbove(limit.value());
      share += limit.upper() ? above : 1 - above;
    }
    return 100 * share;
  }

  private SpreadPage.Hours hours(String quantity, HourMeans means, double factor, String unit) {
    double low = all(means, factor).min().orElse(0);
    double high = all(means, factor).max().orElse(0);
    double lightest = low >= 0 && low < high / 2 ? 0 : low;
    String caption =
        words.of(
            "spread.hours.caption",
            Digits.of(low, high).text(lightest, unit),
            Digits.of(low, high).text(high, unit));
    return new SpreadPage.Hours(
        view.place(quantity),
        HourTable.draw(
            Measure.classes(quantity),
            h -> factor * means.mean(h),
            lightest,
            high,
            Digits.ofCells(low, high)::text,
            days("week.day.short."),
            words.of("spread.hours.table", view.place(quantity), unit)),
        caption);
  }

  private static DoubleStream all(HourMeans means, double factor) {
    return IntStream.range(0, WeekClock.HOURS)
        .mapToDouble(h -> factor * means.mean(h))
        .filter(v -> !Double.isNaN(v));
  }

  private List<String> days(String key) {
    return IntStream.range(0, 7).mapToObj(d -> words.of(key + d)).toList();
  }
}
