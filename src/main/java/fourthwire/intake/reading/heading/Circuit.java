package fourthwire.intake.reading.heading;

import java.util.Locale;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** The panel or feeder that a heading numbers: its number is no line's. */
final class Circuit {
  private static final Pattern NUMBERED =
      Pattern.compile(
          "(?i)(?<![\\p{L}\\p{N}])(panel|feeder|circuit|ckt|branch|breaker|outlet|tenant)"
              + "[\\s_#.-]*(\\d{1,3})(?![\\p{L}\\p{N}])");

  private Circuit() {}

  /** As written, in one form; empty text for none. */
  static String of(String heading) {
    Matcher m = NUMBERED.matcher(heading);
    return m.find() ? m.group(1).toLowerCase(Locale.ROOT) + " " + Integer.parseInt(m.group(2)) : "";
  }

  /** The heading without it. */
  static String without(String heading) {
    return NUMBERED.matcher(heading).replaceAll(" ");
  }
}
