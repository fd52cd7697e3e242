package fourthwire.web.reading.mapping;

import java.util.List;
import java.util.Locale;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * A quantity's name taken apart into what a person chooses: the conductor, what is measured, and of
 * a harmonic its order.
 *
 * @param place {@code L1} …, empty where none is named
 * @param measure as in {@code rms_a}; of a harmonic {@code current_h_a}; empty for nothing
 * @param order of a harmonic; empty text otherwise
 */
record Measure(String place, String measure, String order) {
  /** Conductors and pairs, as the contract names them. */
  static final List<String> PLACES =
      List.of("L1", "L2", "L3", "N", "L1-L2", "L2-L3", "L3-L1", "total");

  /** What can be chosen, the most usual first. */
  static final List<String> MEASURES =
      List.of(
          "rms_a",
          "rms_v",
          "active_w",
          "reactive_var",
          "apparent_va",
          "power_factor",
          "displacement_factor",
          "current_thd_percent",
          "voltage_thd_percent",
          "current_h_a",
          "current_h_percent",
          "current_h_deg",
          "voltage_h_v",
          "voltage_h_percent",
          "voltage_h_deg",
          "energy_wh",
          "frequency_hz",
          "voltage_unbalance_percent",
          "current_unbalance_percent");

  private static final Pattern HARMONIC = Pattern.compile("(current|voltage)_h(\\d+)_(\\w+)");
  private static final Pattern HEADED_PLACE =
      Pattern.compile("(?i)(?<![a-z0-9])(L[123]|N)(?![a-z0-9])");
  private static final Pattern HEADED_ORDER =
      Pattern.compile(
          "(?i)(?<![a-z0-9])h(?:arm(?:onic)?)?[ _.-]*(\\d{1,2})(?!\\d)|(\\d{1,2})(?:st|nd|rd|th)");
  private static final List<String> PLACELESS =
      List.of("frequency_hz", "voltage_unbalance_percent", "current_unbalance_percent");

  /** Of a quantity's name, or of a measure without its conductor. */
  static Measure of(String quantity) {
    int dot = quantity.indexOf('.');
    String place = dot < 0 ? "" : quantity.substring(0, dot);
    String measure = quantity.substring(dot + 1);
    Matcher m = HARMONIC.matcher(measure);
    return m.matches()
        ? new Measure(place, m.group(1) + "_h_" + m.group(3), m.group(2))
        : new Measure(place, measure, "");
  }

  /**
   * What a heading that leaves its measure open says of place and order, to begin with when a
   * person chooses the measure; each column shows it before it is read.
   */
  static Measure ofHeading(String heading) {
    Matcher place = HEADED_PLACE.matcher(heading);
    Matcher order = HEADED_ORDER.matcher(heading);
    String number = !order.find() ? "" : order.group(1) != null ? order.group(1) : order.group(2);
    return new Measure(
        place.find() ? place.group(1).toUpperCase(Locale.ROOT) : "",
        "",
        number.replaceFirst("^0+", ""));
  }

  /** The name of what was chosen; a text that is no quantity where the choice is none. */
  static String quantity(String place, String measure, String order) {
    String of = measure.replace("_h_", "_h" + order + "_");
    return PLACELESS.contains(measure) || place.isEmpty() ? of : place + "." + of;
  }
}
