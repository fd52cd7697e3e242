package fourthwire.web.reading.series;

import fourthwire.metering.MeasuredQuantity;
import fourthwire.web.support.Numbers;
import fourthwire.web.support.Words;
import java.util.List;
import java.util.Locale;
import java.util.OptionalInt;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * What is measured, at whatever place: one measure's places share a unit and an axis.
 *
 * @param word as in the names of quantities: {@code rms_a}, {@code current_h3_percent}
 * @param quantities the log's quantities of this measure, in the order of their places
 */
record Measure(String word, List<String> quantities) {
  /** The style of what is not of one conductor. */
  static final String WHOLE = "whole";

  private static final Pattern ORDER = Pattern.compile("(current|voltage)_h(\\d+)_(.+)");
  private static final double FROM_KILO = 10_000;
  private static final double KILO = 1000;

  /** The measure of one quantity. */
  static Measure of(String quantity) {
    return new Measure(parsed(quantity).measure(), List.of(quantity));
  }

  /** A quantity by its name. */
  static MeasuredQuantity parsed(String quantity) {
    return MeasuredQuantity.ofLog(quantity).orElseThrow();
  }

  /** Its name in words. */
  String label(Words words) {
    Matcher order = ORDER.matcher(word);
    return order.matches()
        ? words.of(
            "measure.order." + order.group(1) + "." + order.group(3),
            Numbers.ordinal(Integer.parseInt(order.group(2))))
        : words.of("measure." + word.replace('_', '-'));
  }

  /** The group it is chosen from. */
  String group() {
    if (order().isPresent()) {
      return word.startsWith("current") ? "orders-current" : "orders-voltage";
    }
    if (word.equals("frequency_hz") || word.contains("voltage") || word.equals("rms_v")) {
      return "voltage";
    }
    return word.contains("current") || word.equals("rms_a") ? "current" : "power";
  }

  /** Of one harmonic order: which. */
  OptionalInt order() {
    Matcher order = ORDER.matcher(word);
    return order.matches() ? OptionalInt.of(Integer.parseInt(order.group(2))) : OptionalInt.empty();
  }

  /** Its unit, with kilo where its values are large. */
  String unit(double largest) {
    String unit =
        switch (word.substring(word.lastIndexOf('_') + 1)) {
          case "a" -> "A";
          case "v" -> "V";
          case "w" -> "W";
          case "var" -> "var";
          case "va" -> "VA";
          case "wh" -> "Wh";
          case "percent" -> "%";
          case "hz" -> "Hz";
          case "deg" -> "°";
          default -> "";
        };
    return factor(largest) < 1 ? "k" + unit : unit;
  }

  /** What its values are multiplied by to be in {@link #unit}. */
  double factor(double largest) {
    return group().equals("power") && largest >= FROM_KILO ? 1 / KILO : 1;
  }

  /** The style of a place's line: that of its conductor, of a pair's first, or ink. */
  static String classes(String quantity) {
    String place = parsed(quantity).place();
    return place.matches("L[123].*|N")
        ? place.substring(0, Math.min(2, place.length())).toLowerCase(Locale.ROOT)
        : WHOLE;
  }
}
