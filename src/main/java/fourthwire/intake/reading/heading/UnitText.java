package fourthwire.intake.reading.heading;

import java.util.Arrays;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * What stands where a unit stands: {@code kW}, {@code A rms}, {@code 0.1 A}, {@code x10 A}, {@code
 * A/10}, {@code dA}, {@code % of rms}.
 *
 * @param multiple of the unit
 * @param shareOf what a percentage is of: {@code rms}, or empty text for the fundamental
 * @param isOpen whether something in it is not understood, as which way {@code A x100} goes
 */
record UnitText(Unit unit, double multiple, String shareOf, boolean isOpen) {
  static final String OF_RMS = "rms";

  private static final Pattern RMS =
      Pattern.compile("(?i)[\\s_]*\\b(rms|trms|eff)\\b|(?<=[AV])rms");
  private static final Pattern SHARE =
      Pattern.compile(
          "(?i)(?:%|(?:percent|pct)(?!\\p{L}))\\s*(?:of\\b|von\\b|de\\b|du\\b|d')?\\s*(?:the\\b)?(.*)");
  private static final Pattern FUNDAMENTAL =
      Pattern.compile("f|fund.*|fond.*|grund.*|h0?1|1st.*|first.*|h?2\\W+h?\\d\\d|avg|mean|thd|");
  private static final Pattern TOTAL = Pattern.compile("r|(?:true|total)?\\W*t?rms.*|eff.*");

  private static final String NUMBER = "(10\\^-?\\d|1e[+-]?\\d|\\d+(?:[.,]\\d+)?)";
  private static final String NAME = "([\\p{L}°]+)";
  private static final Pattern IN_FRONT =
      Pattern.compile(
          "([x×*·])?\\s*" + NUMBER + "\\s*[x×*·]?\\s*" + NAME, Pattern.CASE_INSENSITIVE);
  private static final Pattern PART = Pattern.compile(NAME + "\\s*[/÷]\\s*(10+)");
  private static final Pattern TOLD =
      Pattern.compile(
          NAME + "\\W*(multiply|divide)\\s+(?:by|with)\\s+" + NUMBER, Pattern.CASE_INSENSITIVE);
  private static final Pattern TENTH = Pattern.compile("0[.,]0*1|10\\^-?\\d|1e[+-]?\\d");

  private static final Map<String, Double> PREFIXES =
      Map.of("d", 0.1, "c", 0.01, "da", 10.0, "u", 1e-6, "μ", 1e-6, "G", 1e9);
  private static final Map<String, Double> SPELT =
      Map.of("deci", 0.1, "centi", 0.01, "deca", 10.0, "deka", 10.0, "hecto", 100.0, "micro", 1e-6);
  private static final Pattern PREFIXED = Pattern.compile("(da|[dcuμG])([AVW]|VA|var|VAr|Wh)");
  private static final Pattern PREFIX_SPELT =
      Pattern.compile("(?i)(deci|centi|dec[ak]a|deka|hecto|micro)(amp\\p{L}*|volts?|watts?|vars?)");

  /** A unit and something beside it, or what looks like a unit that is none known. */
  private static final Pattern ELECTRIC =
      Pattern.compile("(?:[kMm]?(?:A|V|W|VA|var|VAr|Wh)|[kM]W|amps?|volts?|watts?|%)");

  private static final Pattern UNKNOWN_UNIT =
      Pattern.compile(
          "(?:[kMmdcuμnhGTp]|da)[AVW]|[%‰].*|(?i:.*\\b(?:counts?|raw|adc|digits?|lsb)\\b.*)");

  /** Words and signs of a multiple, wherever they stand. */
  private static final Pattern MULTIPLE =
      Pattern.compile(
          "(?i)(?<![\\p{L}\\p{N}])(?:[x×*·]\\s?\\d+|tenths?|hundredths?|thousandths?|tens|hundreds?"
              + "|thousands?|multipl\\p{L}*|scaled?|scaling|divided?|divisor|times"
              + "|(?:deci|centi|deka|deca|hecto)\\p{L}+)(?![\\p{L}\\p{N}])"
              + "|[×*]\\s?\\d|[/÷]\\s?10+(?!\\d)|10\\^|(?<![\\p{N}.,:])0[.,]0*1(?!\\d)");

  /** The unit that this text is; empty where it is none. */
  static Optional<UnitText> of(String text) {
    Matcher share = SHARE.matcher(text.trim());
    if (share.matches()) {
      return Optional.of(
          share(share.group(1).toLowerCase(Locale.ROOT).replaceAll("^\\W+", "").trim()));
    }
    String bare = RMS.matcher(text).replaceAll("").trim();
    return named(bare, 1, false)
        .or(() -> multipleInFront(IN_FRONT.matcher(bare)))
        .or(() -> part(PART.matcher(bare)))
        .or(() -> told(TOLD.matcher(bare)));
  }

  private static UnitText share(String of) {
    boolean ofTotal = TOTAL.matcher(of).matches();
    boolean open = !ofTotal && !FUNDAMENTAL.matcher(of).matches();
    return new UnitText(Unit.PERCENT, 1, ofTotal ? OF_RMS : "", open);
  }

  private static Optional<UnitText> named(String name, double multiple, boolean open) {
    Optional<UnitText> plain = Unit.find(name).map(unit -> new UnitText(unit, multiple, "", open));
    return plain.isPresent() ? plain : prefixed(name, multiple, open);
  }

  private static Optional<UnitText> prefixed(String name, double multiple, boolean open) {
    Matcher letter = PREFIXED.matcher(name);
    Matcher spelt = PREFIX_SPELT.matcher(name);
    double prefix =
        letter.matches()
            ? PREFIXES.getOrDefault(letter.group(1), 1.0)
            : spelt.matches()
                ? SPELT.getOrDefault(spelt.group(1).toLowerCase(Locale.ROOT), 1.0)
                : 1;
    return prefix == 1
        ? Optional.empty()
        : Unit.find(letter.matches() ? letter.group(2) : spelt.group(2))
            .map(unit -> new UnitText(unit, prefix * multiple, "", open));
  }

  /** A number without a sign may be the range of a clamp, unless it is a tenth or the like. */
  private static Optional<UnitText> multipleInFront(Matcher m) {
    return m.matches()
        ? named(
            m.group(3),
            number(m.group(2)),
            m.group(1) == null && !TENTH.matcher(m.group(2)).matches())
        : Optional.empty();
  }

  private static Optional<UnitText> part(Matcher m) {
    return m.matches() ? named(m.group(1), 1 / number(m.group(2)), false) : Optional.empty();
  }

  private static Optional<UnitText> told(Matcher m) {
    if (!m.matches()) {
      return Optional.empty();
    }
    double number = number(m.group(3));
    return named(
        m.group(1), m.group(2).equalsIgnoreCase("divide") ? 1 / number : number, number == 0);
  }

  private static double number(String text) {
    return Double.parseDouble(
        text.startsWith("10^") ? "1e" + text.substring(3) : text.replace(',', '.'));
  }

  /** Whether a text in brackets begins with a unit, or looks like one, and says more. */
  static boolean isOpen(String bracket) {
    String[] words = bracket.split("[^\\p{L}\\p{N}%°]+");
    if (UNKNOWN_UNIT.matcher(bracket).matches()) {
      return true;
    }
    return words.length > 1
        && ELECTRIC.matcher(words[0]).matches()
        && Arrays.stream(words).skip(1).anyMatch(w -> !LogWords.isUnderstood(w));
  }

  /** Whether a multiple stands in a heading beside its unit. */
  static boolean hasMultiple(String heading) {
    return MULTIPLE.matcher(heading).find();
  }
}
