package fourthwire.metering;

import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * The name of what a column or channel holds; the public contract, section 4.
 *
 * @param place {@code L1}, {@code N}, {@code L1-L2}, {@code total}; empty for the frequency and
 *     unbalance
 * @param measure {@code rms_a}, {@code current_h3_percent} …; of a capture {@code v} or {@code i}
 */
public record MeasuredQuantity(String place, String measure) {
  private static final String LINE = "L[123]";
  private static final String PAIR = "L1-L2|L2-L3|L3-L1";
  private static final String ORDER = "h(?:[1-9]|[1-4]\\d|50)";
  private static final Pattern LOGGED =
      Pattern.compile(
          "(?:L[123]|N)\\.(?:rms_a|current_thd_percent|current_"
              + ORDER
              + "_(?:a|percent|deg))|(?:"
              + LINE
              + "|N|"
              + PAIR
              + ")\\.(?:rms_v|voltage_thd_percent|voltage_"
              + ORDER
              + "_(?:v|percent|deg))|(?:"
              + LINE
              + "|total)\\.(?:active_w|reactive_var|apparent_va|power_factor|displacement_factor"
              + "|energy_wh)|frequency_hz|(?:voltage|current)_unbalance_percent");
  private static final Pattern CAPTURED =
      Pattern.compile("(?:L[123]|N)\\.i|(?:" + LINE + "|N|" + PAIR + ")\\.v");

  /** The quantity of this name, if it is one of a log. */
  public static Optional<MeasuredQuantity> ofLog(String name) {
    return find(LOGGED, name);
  }

  /** The quantity of this name, if it is one of a capture. */
  public static Optional<MeasuredQuantity> ofCapture(String name) {
    return find(CAPTURED, name);
  }

  private static Optional<MeasuredQuantity> find(Pattern names, String name) {
    Matcher m = names.matcher(name);
    if (!m.matches()) {
      return Optional.empty();
    }
    int dot = name.indexOf('.');
    return Optional.of(
        dot < 0
            ? new MeasuredQuantity("", name)
            : new MeasuredQuantity(name.substring(0, dot), name.substring(dot + 1)));
  }

  /** The name as the contract writes it. */
  public String name() {
    return place.isEmpty() ? measure : place + "." + measure;
  }
}
