package fourthwire.intake.reading.unit;

import fourthwire.intake.reading.heading.Heading;
import fourthwire.intake.reading.heading.Heading.Meaning;
import fourthwire.metering.ReadingMapping.Statistic;
import java.util.ArrayList;
import java.util.EnumSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.regex.Pattern;

/** The headings of a log while its units are being settled, and its first values. */
final class OpenHeadings {
  private static final Set<Statistic> EXTREMES = EnumSet.of(Statistic.MIN, Statistic.MAX);

  private final Map<String, Heading> headings;
  private final SampledColumns values;
  private final List<String> notes = new ArrayList<>();

  OpenHeadings(Map<String, Heading> headings, SampledColumns values) {
    this.headings = new LinkedHashMap<>(headings);
    this.values = values;
  }

  SampledColumns values() {
    return values;
  }

  /** By column; may be changed. */
  Map<String, Heading> all() {
    return headings;
  }

  List<String> notes() {
    return notes;
  }

  Heading of(String column) {
    return headings.getOrDefault(column, Heading.none());
  }

  /** What one column turns out to be. */
  interface Rule {
    Heading of(String column);
  }

  /** Puts a rule to every column that is as clear as told and of this quantity. */
  void each(Meaning meaning, String quantity, Rule rule) {
    Pattern such = Pattern.compile(quantity);
    for (Map.Entry<String, Heading> e : headings.entrySet()) {
      Heading h = e.getValue();
      if (h.meaning() == meaning && such.matcher(h.quantity()).matches()) {
        e.setValue(rule.of(e.getKey()));
      }
    }
  }

  /** Values of a settled quantity in its own unit. */
  Optional<double[]> find(String quantity) {
    return headings.entrySet().stream()
        .filter(e -> e.getValue().quantity().equals(quantity))
        .filter(e -> e.getValue().meaning() != Meaning.UNIT_OPEN)
        .filter(e -> !EXTREMES.contains(e.getValue().statistic()))
        .findFirst()
        .map(e -> SampledColumns.times(values.of(e.getKey()), e.getValue().factor()));
  }

  /** A column settled by this factor, and said so where that is not plain. */
  Heading scaled(String column, double factor, String why) {
    Heading h = of(column);
    if (factor != 1 || h.meaning() == Meaning.UNIT_OPEN) {
      notes.add("\"" + column + "\" is in " + why + ".");
    }
    return new Heading(Meaning.LIKELY, h.quantity(), h.statistic(), factor, "");
  }

  /** Conductor of a quantity. */
  static String place(Heading h) {
    return h.quantity().substring(0, Math.max(0, h.quantity().indexOf('.')));
  }

  static boolean within(double x, double from, double to) {
    return x >= from && x <= to;
  }
}
