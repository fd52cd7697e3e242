package fourthwire.intake.reading;

import fourthwire.intake.reading.heading.Heading;
import fourthwire.intake.reading.heading.Heading.Meaning;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.DoublePredicate;

/**
 * Settles from the values what the headings of a log leave open: units that are not written, and
 * columns of no conductor. What the values do not settle stays open and is asked.
 *
 * <p>Units are a thousand apart, so that volts times amps tell W from kW; the harmonics of a line
 * make its THD in amps or in percent, not in both; a power factor above one is a percentage.
 */
final class OpenUnits {
  private static final double[] PREFIXES = {1, 1e3, 1e6};

  private final Map<String, Heading> headings;
  private final SampledColumns values;
  private final List<String> notes = new ArrayList<>();

  private OpenUnits(Map<String, Heading> headings, SampledColumns values) {
    this.headings = new LinkedHashMap<>(headings);
    this.values = values;
  }

  /** The headings, settled, and sentences on what the values settled. */
  record Settled(Map<String, Heading> headings, List<String> notes) {}

  static Settled settle(Map<String, Heading> headings, SampledColumns values) {
    OpenUnits units = new OpenUnits(headings, values);
    units.placeless();
    units.each(Meaning.LIKELY, ".*\\.rms_v", units::voltage);
    units.each(Meaning.UNIT_OPEN, ".*\\.(active_w|apparent_va)", units::power);
    units.each(Meaning.UNIT_OPEN, ".*\\.reactive_var", units::reactive);
    units.each(Meaning.LIKELY, ".*\\.rms_a", units::current);
    units.harmonics();
    units.each(Meaning.LIKELY, ".*_thd_percent", units::distortion);
    units.each(Meaning.CLEAR, ".*_factor", units::ratio);
    units.each(Meaning.LIKELY, "frequency_hz", h -> units.range(h, 40, 70));
    units.openNumbers();
    return new Settled(units.headings, units.notes);
  }

  /** What one column turns out to be; empty leaves it. */
  private interface Rule {
    Heading of(String column);
  }

  private Heading heading(String column) {
    return headings.getOrDefault(column, Heading.none());
  }

  private void each(Meaning meaning, String quantity, Rule rule) {
    for (Map.Entry<String, Heading> e : headings.entrySet()) {
      Heading h = e.getValue();
      if (h.meaning() == meaning && h.quantity().matches(quantity)) {
        e.setValue(rule.of(e.getKey()));
      }
    }
  }

  /** A mean over lines stands beside the lines; alone it may be any. */
  private void placeless() {
    headings.replaceAll(
        (column, h) -> {
          boolean beside =
              headings.values().stream()
                  .anyMatch(o -> o != h && o.quantity().endsWith("." + h.quantity()));
          return h.meaning() == Meaning.PLACELESS && beside ? Heading.none() : h;
        });
  }

  private Heading voltage(String column) {
    double usual = values.median(column);
    if (usual > 0.05 && usual < 1) {
      return scaled(column, 1e3, "kV, as no V could be that small");
    }
    return usual > 50 || !(usual > 0)
        ? heading(column)
        : ask(column, "the unit of this voltage: V or kV");
  }

  /** By a power whose unit is known: a thousand times too much or too little is a prefix. */
  private Heading current(String column) {
    Heading h = heading(column);
    String line = place(h);
    double share = values.ratio(find(line + ".active_w"), voltAmps(line));
    if (Double.isNaN(share) || share == 0 || within(share, 0.02, 1.1)) {
      return h;
    }
    for (double prefix : new double[] {1e3, 1e-3}) {
      if (within(share / prefix, 0.02, 1.1)) {
        return scaled(
            column, prefix, prefix > 1 ? "kA, as its power shows" : "mA, as its power shows");
      }
    }
    return h;
  }

  private Heading power(String column) {
    Heading h = heading(column);
    double share = values.ratio(Optional.of(values.of(column)), voltAmps(place(h)));
    double least = h.quantity().endsWith("apparent_va") ? 0.7 : 0.03;
    for (double prefix : PREFIXES) {
      if (within(prefix * share, least, 1.15)) {
        return scaled(column, prefix, unit(prefix, h.quantity()) + ", as volts times amps show");
      }
    }
    return likeOthers(column).orElse(h);
  }

  /** Powers that nothing else tells of are written as all the others of the file are. */
  private Optional<Heading> likeOthers(String column) {
    List<Double> others = prefixes();
    return others.size() == 1
        ? Optional.of(
            scaled(
                column,
                others.get(0),
                unit(others.get(0), heading(column).quantity()) + ", as the other powers are"))
        : Optional.empty();
  }

  private List<Double> prefixes() {
    return headings.values().stream()
        .filter(o -> o.meaning() == Meaning.LIKELY || o.meaning() == Meaning.CLEAR)
        .filter(o -> o.quantity().matches(".*\\.(active_w|apparent_va)"))
        .map(Heading::factor)
        .distinct()
        .toList();
  }

  /** Never above volts times amps, and written as the other powers are. */
  private Heading reactive(String column) {
    Heading h = heading(column);
    double share = values.ratio(Optional.of(values.of(column)), voltAmps(place(h)));
    Optional<Heading> alike = likeOthers(column);
    boolean can =
        alike.isPresent() && (Double.isNaN(share) || alike.get().factor() * share <= 1.15);
    return can ? alike.get() : h;
  }

  private static String unit(double prefix, String quantity) {
    String base =
        quantity.endsWith("active_w") && !quantity.endsWith("reactive_var")
            ? "W"
            : quantity.endsWith("apparent_va") ? "VA" : "var";
    return (prefix == 1 ? "" : prefix == 1e3 ? "k" : "M") + base;
  }

  /** Volts times amps of a line, or summed over the lines; empty where they are not known. */
  private Optional<double[]> voltAmps(String place) {
    if (!place.equals("total")) {
      return product(place);
    }
    Optional<double[]> sum = Optional.empty();
    for (String line : List.of("L1", "L2", "L3")) {
      Optional<double[]> one = product(line);
      if (one.isPresent()) {
        sum = Optional.of(sum.map(s -> SampledColumns.sum(s, one.get())).orElse(one.get()));
      }
    }
    return sum;
  }

  private Optional<double[]> product(String line) {
    Optional<double[]> amps = find(line + ".rms_a");
    Optional<double[]> volts =
        find(line + ".rms_v")
            .or(() -> find("L1-L2.rms_v").map(v -> SampledColumns.times(v, 1 / Math.sqrt(3))))
            .or(() -> find("L1.rms_v"));
    return amps.isPresent() && volts.isPresent()
        ? Optional.of(SampledColumns.product(volts.get(), amps.get()))
        : Optional.empty();
  }

  /** Values of a settled quantity in its own unit. */
  private Optional<double[]> find(String quantity) {
    return headings.entrySet().stream()
        .filter(e -> e.getValue().quantity().equals(quantity))
        .filter(e -> e.getValue().meaning() != Meaning.UNIT_OPEN)
        .filter(e -> !e.getValue().statistic().word().matches("min|max"))
        .findFirst()
        .map(e -> SampledColumns.times(values.of(e.getKey()), e.getValue().factor()));
  }

  private void harmonics() {
    for (String place : List.of("L1", "L2", "L3", "N", "L1-L2", "L2-L3", "L3-L1")) {
      for (String kind : List.of("current", "voltage")) {
        Map<Integer, double[]> orders = orders(place, kind);
        if (!orders.isEmpty()) {
          settle(
              place,
              kind,
              new HarmonicUnit(
                  orders, rms(place, kind), find(place + "." + kind + "_thd_percent")));
        }
      }
    }
    shareUnit("current");
    shareUnit("voltage");
  }

  private Optional<double[]> rms(String place, String kind) {
    return find(place + (kind.equals("current") ? ".rms_a" : ".rms_v"));
  }

  private Map<Integer, double[]> orders(String place, String kind) {
    Map<Integer, double[]> orders = new LinkedHashMap<>();
    String start = place + "." + kind + "_h";
    headings.forEach(
        (column, h) -> {
          if (h.meaning() == Meaning.UNIT_OPEN && h.quantity().startsWith(start)) {
            orders.put(order(h), values.of(column));
          }
        });
    return orders;
  }

  private static int order(Heading h) {
    return Integer.parseInt(h.quantity().replaceAll(".*_h(\\d+)_.*", "$1"));
  }

  private void settle(String place, String kind, HarmonicUnit unit) {
    unit.percent().ifPresent(percent -> become(place + "." + kind + "_h", percent, unit.reason()));
  }

  private void become(String start, boolean percent, String reason) {
    List<String> columns = new ArrayList<>();
    headings.replaceAll(
        (column, h) -> {
          boolean open = h.meaning() == Meaning.UNIT_OPEN && h.quantity().startsWith(start);
          if (open) {
            columns.add(column);
          }
          return open ? asHarmonic(h, percent) : h;
        });
    if (!columns.isEmpty()) {
      String base = start.contains("current") ? "A" : "V";
      notes.add(
          "Harmonics from "
              + columns.get(0)
              + " on are in "
              + (percent ? "%" : base)
              + ", "
              + reason);
    }
  }

  private static Heading asHarmonic(Heading h, boolean percent) {
    String quantity = percent ? h.quantity().replaceAll("_[av]$", "_percent") : h.quantity();
    return new Heading(Meaning.LIKELY, quantity, h.statistic(), 1, "");
  }

  /** Harmonics of one kind are written alike on all conductors of a file. */
  private void shareUnit(String kind) {
    List<Boolean> units =
        headings.values().stream()
            .filter(
                h ->
                    h.meaning() == Meaning.LIKELY
                        && h.quantity()
                            .matches(
                                ".*\\." + kind + "_h\\d+_[av%].*|.*\\." + kind + "_h\\d+_percent"))
            .map(h -> h.quantity().endsWith("_percent"))
            .distinct()
            .toList();
    if (units.size() == 1) {
      for (String place : List.of("L1", "L2", "L3", "N", "L1-L2", "L2-L3", "L3-L1")) {
        become(place + "." + kind + "_h", units.get(0), "as the other lines' are.");
      }
    }
  }

  /** A distortion far below one percent may be a ratio. */
  private Heading distortion(String column) {
    Heading h = heading(column);
    double least = h.quantity().contains("current") ? 1.5 : 0.3;
    double usual = values.median(column);
    Optional<double[]> made =
        distortionMade(place(h), h.quantity().contains("current") ? "current" : "voltage");
    double ratio = values.ratio(Optional.of(values.of(column)), made);
    if (usual >= least || usual == 0 || within(ratio, 0.8, 1.25)) {
      return h;
    }
    return within(100 * ratio, 0.8, 1.25)
        ? scaled(column, 100, "a ratio, as its harmonics show")
        : ask(column, "whether this distortion is in percent (factor 1) or a ratio (factor 100)");
  }

  /** The distortion that harmonics of known unit make, percent. */
  private Optional<double[]> distortionMade(String place, String kind) {
    List<double[]> percent = new ArrayList<>();
    headings.forEach(
        (column, h) -> {
          if (h.quantity().matches(place + "\\." + kind + "_h\\d+_percent") && order(h) > 1) {
            percent.add(values.of(column));
          }
        });
    return percent.isEmpty() ? Optional.empty() : Optional.of(SampledColumns.rootSum(percent));
  }

  private Heading ratio(String column) {
    Heading h = heading(column);
    double usual = values.median(column);
    return h.factor() == 1 && usual > 1.05 && usual <= 100.5
        ? scaled(column, 0.01, "percent, as no power factor is above 1")
        : h;
  }

  private Heading range(String column, double from, double to) {
    double usual = values.median(column);
    return within(usual, from, to) || Double.isNaN(usual)
        ? heading(column)
        : ask(column, "the factor that makes hertz of these values");
  }

  /** Frequencies near 50 or 60 and volts of a low-voltage site show that points mark decimals. */
  private void openNumbers() {
    List<String> open = values.openNumbers();
    boolean decimals =
        open.stream()
            .anyMatch(c -> isDecimal(headings.getOrDefault(c, Heading.none()), values.median(c)));
    for (String column : open) {
      if (!decimals && headings.containsKey(column) && heading(column).meaning() != Meaning.NONE) {
        headings.put(
            column,
            ask(
                column,
                "whether its numbers have three decimals or thousands set apart: factor 1 reads"
                    + " 12.345 as about twelve, factor 1000 as about twelve thousand"));
      }
    }
  }

  private static boolean isDecimal(Heading h, double usual) {
    return h.quantity().equals("frequency_hz") && within(usual, 40, 70)
        || h.quantity().endsWith(".rms_v") && within(usual, 80, 1000)
        || h.quantity().endsWith("_factor");
  }

  private static boolean within(double x, double from, double to) {
    DoublePredicate inside = v -> v >= from && v <= to;
    return inside.test(x);
  }

  private static String place(Heading h) {
    return h.quantity().substring(0, Math.max(0, h.quantity().indexOf('.')));
  }

  private Heading scaled(String column, double factor, String why) {
    Heading h = heading(column);
    if (factor != 1 || h.meaning() == Meaning.UNIT_OPEN) {
      notes.add("\"" + column + "\" is in " + why + ".");
    }
    return new Heading(Meaning.LIKELY, h.quantity(), h.statistic(), factor, "");
  }

  private static Heading ask(String column, String question) {
    return Heading.unclear(question);
  }
}
