package fourthwire.intake.reading.channel;

import java.util.Locale;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * The unit of a channel.
 *
 * @param kind what it is
 * @param letter {@code i} or {@code v} of an electric one
 * @param factor to amps or volts
 */
record ChannelUnit(Kind kind, String letter, double factor) {
  private static final Pattern ELECTRIC =
      Pattern.compile(
          "(k|m|M|µ|u|K)?\\s*(?:(v|volts?)|(a|amps?\\.?|amperes?))(?:\\s*(?:peak|pk|inst.*|\\(.*\\)))?",
          Pattern.CASE_INSENSITIVE);
  private static final Pattern BRACKET = Pattern.compile("[\\[(]\\s*([^\\])]*?)\\s*[\\])]");
  private static final Pattern LAST = Pattern.compile("[\\s_](kV|mV|V|kA|mA|A)\\s*$");

  /** A unit with a multiple, or a prefix that is no usual one. */
  private static final Pattern MULTIPLE =
      Pattern.compile(
          "(?i)(?:.*[x×*/^]\\s*|.*\\d[.,]?)\\d+\\s*\\p{L}*"
              + "|.*(?:multipl|divide|scale|tenth|hundred).*|(?:deci|centi|hecto|de[ck]a)\\p{L}+|(?:da|[dchn])[AV]");

  /** What a unit is. */
  private enum Kind {
    ELECTRIC,
    /** Per unit, percent, or a prefix that could be milli or mega. */
    UNCLEAR,
    /** Of something else. */
    OTHER,
    NONE
  }

  /** By the unit field, else by a bracket in the name, else by the name's last word. */
  static ChannelUnit of(String unit, String name) {
    if (!unit.isBlank()) {
      return of(unit.trim());
    }
    Matcher bracket = BRACKET.matcher(name);
    while (bracket.find()) {
      ChannelUnit found = of(bracket.group(1));
      if (found.kind != Kind.OTHER) {
        return found;
      }
    }
    Matcher last = LAST.matcher(name);
    // "I A" is the current of line A, "I L1 A" one in amps.
    boolean more = last.find() && name.substring(0, last.start()).trim().matches(".*[\\w]{2,}.*");
    return more ? of(last.group(1)) : new ChannelUnit(Kind.NONE, "", 1);
  }

  private static ChannelUnit of(String text) {
    if (text.matches("(?i)-*|none|n/?a|null|units?")) {
      return new ChannelUnit(Kind.NONE, "", 1);
    }
    Matcher m = ELECTRIC.matcher(text);
    if (m.matches()) {
      String prefix = m.group(1) == null ? "" : m.group(1);
      String letter = m.group(2) == null ? "i" : "v";
      return prefix.equals("M")
          ? new ChannelUnit(Kind.UNCLEAR, letter, 1)
          : new ChannelUnit(Kind.ELECTRIC, letter, factor(prefix));
    }
    boolean share = text.toLowerCase(Locale.ROOT).matches("p\\.?\\s*u\\.?|%|pct|percent");
    boolean unclear = share || MULTIPLE.matcher(text).matches();
    return new ChannelUnit(unclear ? Kind.UNCLEAR : Kind.OTHER, "", 1);
  }

  private static double factor(String prefix) {
    return switch (prefix.toLowerCase(Locale.ROOT)) {
      case "k" -> 1e3;
      case "m" -> 1e-3;
      case "µ", "u" -> 1e-6;
      default -> 1;
    };
  }

  boolean isElectric() {
    return kind == Kind.ELECTRIC;
  }

  boolean isUnclear() {
    return kind == Kind.UNCLEAR;
  }

  boolean isOther() {
    return kind == Kind.OTHER;
  }
}
