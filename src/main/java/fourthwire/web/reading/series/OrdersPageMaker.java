package fourthwire.web.reading.series;

import fourthwire.jobs.series.StoredLog;
import fourthwire.metering.LogResult;
import fourthwire.metering.QuantitySummary;
import fourthwire.metering.SeriesRepository;
import fourthwire.metering.reduce.StepPercentiles;
import fourthwire.metering.reduce.TimeSteps;
import fourthwire.metering.series.WeekClock;
import fourthwire.quantity.Conductor;
import fourthwire.web.figure.StepStrip;
import fourthwire.web.support.Column;
import fourthwire.web.support.Numbers;
import fourthwire.web.support.Words;
import java.time.Instant;
import java.time.LocalDate;
import java.time.Period;
import java.time.format.DateTimeFormatter;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * Makes the page of a log's orders over time: the 95th percentile of each order by day, or by week
 * where the days are many.
 */
final class OrdersPageMaker {
  private static final int MOST_DAYS = 62;
  private static final double FURTHEST_LIMIT = 2.5;
  private static final DateTimeFormatter DAY =
      DateTimeFormatter.ofPattern("d MMM uuuu", Locale.ENGLISH);

  private final LogView view;
  private final StoredLog log;
  private final Words words;

  /** An order's values by step. */
  private record Line(int order, String quantity, double[] p95) {
    double highest() {
      return Arrays.stream(p95).filter(v -> !Double.isNaN(v)).max().orElse(Double.NaN);
    }
  }

  OrdersPageMaker(LogView view) {
    this.view = view;
    this.log = view.log();
    this.words = view.words();
  }

  OrdersPage make(String of, boolean common) {
    Map<String, List<String>> sources = sources();
    String chosen = sources.containsKey(of) ? of : heaviest(sources);
    TimeSteps steps = steps();
    boolean weeks = ((Period) steps.length()).getDays() == 7;
    String step = weeks ? "week" : "day";
    List<Line> lines =
        sources.getOrDefault(chosen, List.of()).stream().map(q -> line(q, steps, weeks)).toList();
    List<Measures.Option> options =
        sources.keySet().stream().map(s -> new Measures.Option(s, sourceName(s))).toList();
    return new OrdersPage(
        view.head(verdict(lines, chosen, step), "orders"),
        options,
        chosen,
        common,
        chosen.isEmpty() ? "" : sourceName(chosen),
        words.of("orders.step." + step, view.rows()),
        new OrdersPage.Heads(
            words.of("orders.typical." + step, unit(chosen)),
            words.of("orders.highest." + step, unit(chosen)),
            words.of("orders.when." + step)),
        StepStrip.axis(steps, log.zone(), words.of("orders.axis")),
        rows(lines, steps, common),
        lines.stream()
            .flatMap(l -> view.limits().ofPercentile(l.quantity()).stream())
            .map(LogLimits.Limit::basis)
            .distinct()
            .toList(),
        without(chosen));
  }

  /** Why no limit is drawn. */
  private String without(String source) {
    if (source.startsWith(Conductor.N.name()) || source.isEmpty()) {
      return source.isEmpty() ? "" : words.of("orders.without.neutral");
    }
    if (source.endsWith("current_percent")) {
      return words.of("orders.without.percent");
    }
    boolean known = view.limits().knowsCurrents();
    return source.endsWith("current_a") && !known ? words.of("orders.without.audit") : "";
  }

  private static String unit(String source) {
    return source.isEmpty() ? "" : new Measure(source, List.of()).unit(0);
  }

  /** Which order is strongest; empty without any. */
  private String verdict(List<Line> lines, String source, String step) {
    return lines.stream()
        .filter(l -> !Double.isNaN(l.highest()))
        .max(Comparator.comparingDouble(Line::highest))
        .map(
            l ->
                words.of(
                    "orders.verdict." + step,
                    Numbers.ordinal(l.order()),
                    view.place(l.quantity()),
                    Numbers.of(l.highest(), unit(source))))
        .orElse("");
  }

  /** The conductor with the largest 95th percentile of a current's order in the whole log. */
  private String heaviest(Map<String, List<String>> sources) {
    return sources.entrySet().stream()
        .filter(s -> s.getKey().endsWith(".current_a"))
        .max(Comparator.comparingDouble(s -> largest(s.getValue())))
        .map(Map.Entry::getKey)
        .or(() -> sources.keySet().stream().findFirst())
        .orElse("");
  }

  private double largest(List<String> quantities) {
    Map<String, QuantitySummary> known =
        log.entry().reading().log().map(LogResult::quantities).orElse(Map.of());
    return quantities.stream()
        .flatMap(q -> Optional.ofNullable(known.get(q)).stream())
        .mapToDouble(QuantitySummary::p95)
        .filter(v -> !Double.isNaN(v))
        .max()
        .orElse(0);
  }

  /** Quantities by what they are orders of: {@code N.current_a}; the fundamental left out. */
  private Map<String, List<String>> sources() {
    Map<String, List<String>> sources = new LinkedHashMap<>();
    for (String quantity : log.quantities()) {
      Measure measure = Measure.of(quantity);
      if (measure.order().orElse(0) > 1 && !measure.word().endsWith("_deg")) {
        String kind = measure.word().replaceAll("_h\\d+", "");
        sources
            .computeIfAbsent(Measure.parsed(quantity).place() + "." + kind, s -> new ArrayList<>())
            .add(quantity);
      }
    }
    sources
        .values()
        .forEach(all -> all.sort(Comparator.comparingInt(q -> Measure.of(q).order().orElse(0))));
    return sources;
  }

  private String sourceName(String source) {
    String[] parts = source.split("\\.", 2);
    return words.of("orders.of." + parts[1].replace('_', '-'), view.names().of(parts[0]));
  }

  private TimeSteps steps() {
    long from = view.span().shown().from().toEpochMilli();
    long to = view.span().shown().to().toEpochMilli();
    TimeSteps days = TimeSteps.days(from, to, log.zone());
    return days.count() <= MOST_DAYS ? days : TimeSteps.weeks(from, to, log.zone());
  }

  private Line line(String quantity, TimeSteps steps, boolean weeks) {
    int order = Measure.of(quantity).order().orElse(0);
    Optional<SeriesRepository.Weeks> stored = weeks ? log.weeks(quantity) : Optional.empty();
    double[] p95 = new double[steps.count()];
    if (stored.isPresent()) {
      for (int k = 0; k < p95.length; k++) {
        p95[k] = ofWeek(stored.get(), date(steps, k));
      }
    } else {
      StepPercentiles days = log.percentiles(quantity, steps);
      for (int k = 0; k < p95.length; k++) {
        p95[k] = days.of(k, 95)[0];
      }
    }
    return new Line(order, quantity, p95);
  }

  private static double ofWeek(SeriesRepository.Weeks weeks, LocalDate monday) {
    long week = (monday.toEpochDay() - WeekClock.monday(weeks.firstWeek())) / 7;
    return week >= 0 && week < weeks.weekP95().length ? weeks.weekP95()[(int) week] : Double.NaN;
  }

  private LocalDate date(TimeSteps steps, int k) {
    return LocalDate.ofInstant(Instant.ofEpochMilli(steps.edge(k)), log.zone());
  }

  private List<OrdersPage.Row> rows(List<Line> lines, TimeSteps steps, boolean common) {
    List<Line> known = lines.stream().filter(l -> !Double.isNaN(l.highest())).toList();
    double end = known.stream().mapToDouble(Line::highest).max().orElse(0);
    List<String> typical = Column.aligned(known.stream().map(l -> median(l.p95())).toList());
    List<String> highest = Column.aligned(known.stream().map(Line::highest).toList());
    List<OrdersPage.Row> rows = new ArrayList<>();
    for (int k = 0; k < known.size(); k++) {
      Line line = known.get(k);
      Optional<LogLimits.Limit> limit = view.limits().ofPercentile(line.quantity());
      double most = common ? end : end(line.highest(), limit);
      rows.add(
          new OrdersPage.Row(
              Numbers.ordinal(line.order()),
              StepStrip.draw(
                  Measure.classes(line.quantity()),
                  steps,
                  s -> line.p95()[s],
                  most > 0 ? most : 1,
                  limit.map(l -> OptionalDouble.of(l.value())).orElse(OptionalDouble.empty()),
                  words.of("orders.alternative", Numbers.ordinal(line.order()))),
              typical.get(k),
              highest.get(k),
              DAY.format(date(steps, peak(line))),
              limit.map(l -> limitText(l.value(), line)).orElse("")));
    }
    return rows;
  }

  /** Per cent as printed, amps as figures. */
  private static String limitText(double limit, Line line) {
    String unit = Measure.of(line.quantity()).unit(0);
    return unit.equals("%") ? Numbers.plain(limit, unit) : Numbers.of(limit, unit);
  }

  /** An order's own scale holds its limit too, where that is not far above. */
  private static double end(double highest, Optional<LogLimits.Limit> limit) {
    return limit
        .map(LogLimits.Limit::value)
        .filter(l -> l > highest && l <= FURTHEST_LIMIT * highest)
        .orElse(highest);
  }

  private static double median(double[] p95) {
    double[] there = Arrays.stream(p95).filter(v -> !Double.isNaN(v)).sorted().toArray();
    int middle = there.length / 2;
    return there.length % 2 == 1 ? there[middle] : (there[middle - 1] + there[middle]) / 2;
  }

  private static int peak(Line line) {
    double highest = line.highest();
    for (int k = 0; k < line.p95().length; k++) {
      if (line.p95()[k] == highest) {
        return k;
      }
    }
    return 0;
  }
}
