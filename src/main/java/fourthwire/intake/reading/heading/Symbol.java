package fourthwire.intake.reading.heading;

import fourthwire.intake.reading.heading.Vocabulary.Sense;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * A letter symbol and what stands on it in one word: {@code ul1n}, {@code thdi2}, {@code i1h03},
 * {@code kw3}, {@code vrmsab}.
 *
 * @param senses what its letters say
 * @param place as written; empty text for none
 * @param order of a harmonic; 0 for none
 * @param unit that begins it
 */
record Symbol(List<Sense> senses, String place, int order, Optional<Unit> unit) {
  private static final String PLACE =
      "l?[1-3](?:-?l?[1-3n])?|[abc][abcn]?|[rst][rstn]?|[ryb][rybn]?|l[123]l[123]|l[123]n|[4n]|neutral|neut";
  private static final String STATISTIC = "(rms|eff|avg|ave|mean|min|max|inst|trms|pk|peak)?";
  private static final String ALL = "|tot|total|sum|sys|t|3ph|3p";
  private static final Pattern BASIC =
      Pattern.compile("(u|v|e|i)" + STATISTIC + "_?(" + PLACE + ")?" + STATISTIC);
  private static final Pattern POWER =
      Pattern.compile("(p|q|s)" + STATISTIC + "(" + PLACE + ALL + ")?" + STATISTIC);
  private static final Pattern FACTOR =
      Pattern.compile(
          "(tpf|pf|lf|dpf|cosphi|cosφ|cos)" + STATISTIC + "(" + PLACE + ALL + "|)" + STATISTIC);
  private static final Pattern DISTORTION =
      Pattern.compile(
          "thd(f)?(i|u|v|a)?("
              + PLACE
              + ")?"
              + STATISTIC
              + "|(i|u|v)thd("
              + PLACE
              + ")?"
              + STATISTIC
              + "|(i|u|v)("
              + PLACE
              + ")thdf?");
  private static final Pattern WITH_UNIT =
      Pattern.compile("(kvar|kva|kwh|kw|mw|var|va|ka|kv|w|a)(l?[123]n?|n|tot|total|sum|sys)");
  private static final Pattern ORDER_WORD =
      Pattern.compile(
          "(?:h|harm|har|harmonic|order|ord|oh|harmonique)(\\d{1,3})|(\\d{1,2})(?:st|nd|rd|th|h|e|eme)");
  private static final Pattern WITH_ORDER =
      Pattern.compile("(hd|ihd)?(i|u|v)(" + PLACE + ")?h(\\d{1,3})|(hd|ihd|hrm)(i|u|v)?(\\d{1,3})");
  private static final Pattern ORDER_FIRST = Pattern.compile("h(\\d{1,3})(i|u|v)(" + PLACE + ")?");
  private static final Pattern LINE = Pattern.compile("(?:ph|phase|line|fase|ch)(" + PLACE + ")");
  private static final Pattern SPELT =
      Pattern.compile("(current|voltage|amps|volts|strom|spannung|irms|urms|vrms)(" + PLACE + ")");

  /** Reads a word in lower case; empty where it is no symbol. */
  static Optional<Symbol> of(String word) {
    Matcher m = ORDER_WORD.matcher(word);
    if (m.matches()) {
      return order(m.group(1) == null ? m.group(2) : m.group(1), List.of(Sense.HARMONIC), "");
    }
    return withOrder(word)
        .or(() -> plain(BASIC.matcher(word), 1, 3, 2, 4))
        .or(() -> plain(POWER.matcher(word), 1, 3, 2, 4))
        .or(() -> plain(FACTOR.matcher(word), 1, 3, 2, 4))
        .or(() -> distortion(DISTORTION.matcher(word)))
        .or(() -> line(word))
        .or(() -> withUnit(word));
  }

  private static Optional<Symbol> order(String order, List<Sense> senses, String place) {
    return Optional.of(new Symbol(senses, place, Integer.parseInt(order), Optional.empty()));
  }

  private static Optional<Symbol> withOrder(String word) {
    Matcher m = WITH_ORDER.matcher(word);
    if (m.matches()) {
      boolean letterFirst = m.group(2) != null;
      List<Sense> senses = new ArrayList<>(List.of(Sense.HARMONIC));
      senses.addAll(senses(letterFirst ? m.group(2) : m.group(6)));
      if (m.group(1) != null || !letterFirst && !m.group(5).equals("hrm")) {
        senses.add(Sense.INDIVIDUAL_DISTORTION);
      }
      return order(letterFirst ? m.group(4) : m.group(7), senses, text(m.group(3)));
    }
    m = ORDER_FIRST.matcher(word);
    if (m.matches()) {
      List<Sense> senses = new ArrayList<>(List.of(Sense.HARMONIC));
      senses.addAll(senses(m.group(2)));
      return order(m.group(1), senses, text(m.group(3)));
    }
    return Optional.empty();
  }

  private static String text(@org.jspecify.annotations.Nullable String group) {
    return group == null ? "" : group;
  }

  private static List<Sense> senses(@org.jspecify.annotations.Nullable String letters) {
    return letters == null || letters.isEmpty()
        ? List.of()
        : letters.equals("a") || letters.equals("e")
            ? List.of(letters.equals("a") ? Sense.CURRENT : Sense.VOLTAGE)
            : Vocabulary.sense(letters).map(List::of).orElse(List.of());
  }

  private static Optional<Symbol> plain(Matcher m, int letter, int place, int... statistics) {
    if (!m.matches()) {
      return Optional.empty();
    }
    if (m.group(letter).equals("e") && m.group(place) == null) {
      return Optional.empty();
    }
    List<Sense> senses = new ArrayList<>(senses(m.group(letter)));
    for (int group : statistics) {
      senses.addAll(senses(m.group(group)));
    }
    return Optional.of(new Symbol(senses, text(m.group(place)), 0, Optional.empty()));
  }

  private static Optional<Symbol> distortion(Matcher m) {
    if (!m.matches()) {
      return Optional.empty();
    }
    List<Sense> senses = new ArrayList<>(List.of(Sense.DISTORTION));
    for (int group : new int[] {2, 4, 5, 7, 8}) {
      senses.addAll(senses(m.group(group)));
    }
    return Optional.of(
        new Symbol(
            senses, text(m.group(3)) + text(m.group(6)) + text(m.group(9)), 0, Optional.empty()));
  }

  private static Optional<Symbol> line(String word) {
    Matcher m = LINE.matcher(word);
    if (m.matches()) {
      return Optional.of(new Symbol(List.of(Sense.LINE), m.group(1), 0, Optional.empty()));
    }
    m = SPELT.matcher(word);
    return m.matches()
        ? Optional.of(
            new Symbol(senses(m.group(1).replace("rms", "")), m.group(2), 0, Optional.empty()))
        : Optional.empty();
  }

  private static Optional<Symbol> withUnit(String word) {
    Matcher m = WITH_UNIT.matcher(word);
    return m.matches()
        ? Optional.of(
            new Symbol(
                List.of(), m.group(2), 0, Unit.find(m.group(1).equals("mw") ? "MW" : m.group(1))))
        : Optional.empty();
  }
}
