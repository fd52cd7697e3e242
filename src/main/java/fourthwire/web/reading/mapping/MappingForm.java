package fourthwire.web.reading.mapping;

import fourthwire.metering.ReadingKind;
import fourthwire.metering.ReadingMapping;
import fourthwire.metering.ReadingMapping.Column;
import fourthwire.metering.ReadingMapping.Stamp;
import fourthwire.metering.ReadingMapping.Statistic;
import fourthwire.metering.ReadingMapping.Time;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/** The mapping that the form's fields say; a column's stand under its number. */
final class MappingForm {
  private final Map<String, String> fields;

  MappingForm(Map<String, String> fields) {
    this.fields = fields;
  }

  /**
   * The same with one choice made for every column of a kind: what it is, its statistic, its
   * factor, its orders moved by one. What is left empty stays as each has it.
   *
   * @param kind as the page names it, beside each of its columns
   */
  MappingForm forAll(String kind) {
    Map<String, String> all = new LinkedHashMap<>(fields);
    for (int k = 0; fields.containsKey("h" + k); k++) {
      if (raw("k" + k).equals(kind)) {
        set(all, "m" + k, text("km-" + kind));
        set(all, "s" + k, text("ks-" + kind));
        set(all, "f" + k, text("kf-" + kind));
        Measure heading = Measure.ofHeading(raw("h" + k));
        set(all, "p" + k, text("p" + k).isEmpty() ? heading.place() : "");
        set(all, "o" + k, order(text("o" + k), heading.order(), text("ko-" + kind)));
      }
    }
    return new MappingForm(all);
  }

  private static void set(Map<String, String> all, String field, String value) {
    if (!value.isEmpty()) {
      all.put(field, value);
    }
  }

  /** The order as given, else as the heading has it, moved where that was asked. */
  private static String order(String given, String heading, String moved) {
    String order = given.isEmpty() ? heading : given;
    return order.matches("\\d{1,3}") && moved.matches("-?1")
        ? String.valueOf(Integer.parseInt(order) + Integer.parseInt(moved))
        : order;
  }

  ReadingMapping mapping() {
    Map<String, Column> columns = new LinkedHashMap<>();
    for (int k = 0; fields.containsKey("h" + k); k++) {
      String heading = raw("h" + k);
      if (!text("m" + k).isEmpty()) {
        columns.put(heading, column(k));
      }
    }
    Time time = time();
    time.columns().forEach(columns::remove);
    return new ReadingMapping(Optional.of(ReadingKind.LOG), time, OptionalDouble.empty(), columns);
  }

  private Column column(int k) {
    return new Column(
        Measure.quantity(text("p" + k), text("m" + k), text("o" + k)),
        statistic(text("s" + k)),
        number("f" + k).orElse(text("f" + k).isEmpty() ? 1 : Double.NaN));
  }

  private static Statistic statistic(String word) {
    for (Statistic s : Statistic.values()) {
      if (s.word().equals(word)) {
        return s;
      }
    }
    return Statistic.MEAN;
  }

  private Time time() {
    List<String> columns = new ArrayList<>();
    for (String field : List.of("date", "clock")) {
      if (!raw(field).isEmpty() && !columns.contains(raw(field))) {
        columns.add(raw(field));
      }
    }
    OptionalDouble interval = number("interval");
    return new Time(
        columns,
        Optional.of(text("format")).filter(f -> !f.isEmpty()),
        Optional.of(text("zone")).filter(z -> !z.isEmpty()),
        Optional.of(text("stamp").equals("end") ? Stamp.END : Stamp.START),
        interval.isPresent() && interval.getAsDouble() > 0 ? interval : OptionalDouble.empty());
  }

  /** Headings are matched to the letter. */
  private String raw(String field) {
    return fields.getOrDefault(field, "");
  }

  private String text(String field) {
    return raw(field).strip();
  }

  private OptionalDouble number(String field) {
    try {
      return OptionalDouble.of(
          Double.parseDouble(text(field).replace(',', '.').toLowerCase(Locale.ROOT)));
    } catch (NumberFormatException none) {
      return OptionalDouble.empty();
    }
  }
}
