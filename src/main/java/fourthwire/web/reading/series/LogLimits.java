package fourthwire.web.reading.series;

import fourthwire.jobs.measured.LogAssessments.CurrentLimits;
import fourthwire.limits.distortion.Edition519;
import fourthwire.limits.distortion.VoltageDistortion;
import fourthwire.metering.MeasuredQuantity;
import fourthwire.quantity.Conductor;
import fourthwire.site.Circuit;
import fourthwire.site.Panel;
import fourthwire.site.Practice;
import fourthwire.site.SiteTree;
import fourthwire.site.Survey;
import fourthwire.site.conductor.Ampacity;
import fourthwire.web.figure.SeriesPlot.Bound;
import fourthwire.web.support.Numbers;
import fourthwire.web.support.Words;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.Predicate;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * What a logged quantity is held against at its node: the smallest known rating of a current's
 * path, the band of a public supply's voltage and frequency (EN 50160, clauses 4.2.1 and 4.2.2),
 * and the limits of voltage distortion of the site's practice.
 */
final class LogLimits {
  private static final double VOLTAGE_BAND = 0.1;
  private static final double FREQUENCY_BAND = 0.01;
  private static final double UNBALANCE_PERCENT = 2;

  private static final Pattern CURRENT_ORDER = Pattern.compile("current_h(\\d+)_a");

  private final Survey survey;
  private final Optional<SiteTree.Node> node;
  private final Optional<CurrentLimits> currents;
  private final Words words;

  /**
   * A limit.
   *
   * @param basis what it is, in words
   */
  record Limit(double value, boolean upper, String basis) {
    /** As a picture draws it, named by its value. */
    Bound bound(double factor, String unit) {
      return new Bound(value, upper, Numbers.plain(factor * value, unit));
    }
  }

  /** At a node; {@code currents} where an audit knows its demand and short-circuit currents. */
  LogLimits(Survey survey, String node, Optional<CurrentLimits> currents, Words words) {
    this.survey = survey;
    this.currents = currents;
    this.node = SiteTree.of(survey).find(node);
    this.words = words;
  }

  /** The limits of a quantity; none where none is known. */
  List<Limit> of(String quantity) {
    MeasuredQuantity q = Measure.parsed(quantity);
    return switch (q.measure()) {
      case "rms_a" -> node.map(n -> current(n, q.place())).orElse(List.of());
      case "rms_v" -> node.map(n -> voltage(n, q.place())).orElse(List.of());
      case "frequency_hz" -> frequency();
      case "voltage_unbalance_percent" ->
          List.of(upper(UNBALANCE_PERCENT, words.of("series.limit.unbalance")));
      case "voltage_thd_percent" -> distortion(q, OptionalDouble.of(0));
      default -> distortion(q, OptionalDouble.empty());
    };
  }

  /** Whether limits of currents by order are known here. */
  boolean knowsCurrents() {
    return currents.isPresent();
  }

  /** What the 95th percentile of an order is held against; empty where nothing applies. */
  Optional<Limit> ofPercentile(String quantity) {
    MeasuredQuantity q = Measure.parsed(quantity);
    Matcher order = CURRENT_ORDER.matcher(q.measure());
    if (!order.matches()) {
      return of(quantity).stream().findFirst();
    }
    return currents
        .filter(c -> !q.place().equals(Conductor.N.name()))
        .map(
            c ->
                upper(
                    c.orderLimitA(Integer.parseInt(order.group(1))),
                    words.of(
                        "orders.limit.current", c.table().basis(), Numbers.of(c.demandA(), "A"))));
  }

  private List<Limit> current(SiteTree.Node at, String place) {
    boolean neutral = place.equals(Conductor.N.name());
    List<Limit> known = new ArrayList<>();
    if (at.kind() == SiteTree.Kind.TRANSFORMER) {
      survey.transformers().stream()
          .filter(t -> t.name().equals(at.name()) && !neutral)
          .map(t -> 1000 * t.ratedKva() / (Math.sqrt(3) * t.secondaryV()))
          .filter(a -> at.lines().size() == 3)
          .forEach(a -> known.add(upper(a, words.of("series.limit.transformer"))));
      return known;
    }
    bus(at.name(), neutral).ifPresent(a -> known.add(upper(a, words.of("series.limit.bus"))));
    if (!sharesNeutral(at) || !neutral) {
      (neutral ? Ampacity.ofNeutral(at.feeder()) : Ampacity.ofLine(at.feeder()))
          .amps()
          .value()
          .ifPresent(a -> known.add(upper(a, words.of("series.limit.feeder"))));
    }
    return known.stream().min(Comparator.comparingDouble(Limit::value)).stream().toList();
  }

  private OptionalDouble bus(String name, boolean neutral) {
    Optional<Panel> panel = survey.panels().stream().filter(p -> p.name().equals(name)).findFirst();
    if (panel.isPresent()) {
      return neutral ? panel.get().neutralBusRatingA() : panel.get().busRatingA();
    }
    return neutral
        ? OptionalDouble.empty()
        : survey.circuits().stream()
            .filter(c -> c.id().equals(name))
            .map(Circuit::breakerA)
            .findFirst()
            .orElse(OptionalDouble.empty());
  }

  private boolean sharesNeutral(SiteTree.Node at) {
    return survey.circuits().stream()
        .anyMatch(c -> c.id().equals(at.name()) && c.sharedNeutral().isPresent());
  }

  private List<Limit> voltage(SiteTree.Node at, String place) {
    if (place.equals(Conductor.N.name())) {
      return List.of();
    }
    boolean pair = place.contains("-");
    double nominal = pair ? at.nominalV() : at.lineToNeutralV();
    return band(nominal, VOLTAGE_BAND, words.of("series.limit.voltage"));
  }

  private List<Limit> frequency() {
    return band(
        survey.settings().frequencyHz(), FREQUENCY_BAND, words.of("series.limit.frequency"));
  }

  private static List<Limit> band(double nominal, double share, String basis) {
    return List.of(
        new Limit(nominal * (1 - share), false, basis), upper(nominal * (1 + share), basis));
  }

  private List<Limit> distortion(MeasuredQuantity q, OptionalDouble thd) {
    boolean percent = q.measure().startsWith("voltage") && q.measure().endsWith("_percent");
    if (!percent || node.isEmpty() || q.place().equals(Conductor.N.name())) {
      return List.of();
    }
    double nominal = node.get().nominalV();
    VoltageDistortion limits =
        survey.settings().practice() == Practice.NORTH_AMERICA
            ? VoltageDistortion.ieee519(Edition519.IEEE_519_2022, nominal)
            : VoltageDistortion.en50160(nominal);
    OptionalDouble limit =
        thd.isPresent()
            ? OptionalDouble.of(limits.thdLimitPercent())
            : Measure.of(q.name()).order().stream()
                .filter(h -> h > 1)
                .mapToObj(limits::orderLimitPercent)
                .findFirst()
                .orElse(OptionalDouble.empty());
    return limit.stream().mapToObj(l -> upper(l, limits.basis())).toList();
  }

  private static Limit upper(double value, String basis) {
    return new Limit(value, true, basis);
  }

  /**
   * A limit below a picture.
   *
   * @param drawn whether the picture shows it
   */
  record Line(String sentence, boolean drawn) {}

  /** The limits of these quantities in sentences, equal ones once. */
  List<Line> lines(Measure measure, double factor, String unit, Predicate<Bound> drawn) {
    Map<Limit, List<String>> held = new LinkedHashMap<>();
    for (String quantity : measure.quantities()) {
      of(quantity).forEach(l -> held.computeIfAbsent(l, k -> new ArrayList<>()).add(quantity));
    }
    List<Line> lines = new ArrayList<>();
    held.forEach(
        (limit, quantities) -> {
          String value = Numbers.plain(factor * limit.value(), unit);
          String sentence = words.of(key(measure, limit, quantities), value, limit.basis());
          boolean seen = drawn.test(limit.bound(factor, unit));
          lines.add(new Line(seen ? sentence : words.of("series.limit.far", sentence), seen));
        });
    return lines;
  }

  private static String key(Measure measure, Limit limit, List<String> quantities) {
    if (!measure.word().equals("rms_a")) {
      return limit.upper() ? "series.limit.upper" : "series.limit.lower";
    }
    boolean neutral =
        quantities.stream().anyMatch(q -> Measure.parsed(q).place().equals(Conductor.N.name()));
    return !neutral
        ? "series.limit.of-lines"
        : quantities.size() == 1 ? "series.limit.of-neutral" : "series.limit.of-all";
  }
}
