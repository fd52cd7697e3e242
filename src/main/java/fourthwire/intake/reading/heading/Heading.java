package fourthwire.intake.reading.heading;

import fourthwire.metering.MeasuredQuantity;
import fourthwire.metering.ReadingMapping.Statistic;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.function.UnaryOperator;
import java.util.regex.Pattern;
import java.util.stream.Collectors;

/**
 * What a heading says.
 *
 * @param meaning how far it could be understood
 * @param quantity the quantity's name where it is settled, else empty text
 * @param factor from the column's unit to the quantity's
 * @param question what it leaves open, for a meaning of {@code UNCLEAR}; for {@code NONE} why it is
 *     left out, or empty text
 */
public record Heading(
    Meaning meaning, String quantity, Statistic statistic, double factor, String question) {
  /** How far a heading is understood. */
  public enum Meaning {
    /** It is a quantity's name. */
    EXACT,
    /** Conductor, quantity and unit are all named. */
    CLEAR,
    /** The unit is the plain one by practice: A, V, percent. */
    LIKELY,
    /** All but the unit is named; the values may settle it. */
    UNIT_OPEN,
    /** It names a measure of no conductor: a mean over lines, or the only one there is. */
    PLACELESS,
    /** It names a quantity but leaves a choice open. */
    UNCLEAR,
    /** It names nothing known. */
    NONE
  }

  private static final Pattern LETTERED = Pattern.compile("(?i)(?<![\\p{L}])vb(?![\\p{L}])");
  private static final Pattern DIRECT =
      Pattern.compile(
          "(?i)(?<![\\p{L}])(?:dc|mppt|string|pv(?=[\\s_-]*\\d))[\\s_-]*\\d*(?![\\p{L}])");
  private static final Pattern PUT_IN = Pattern.compile("(?i)(?<![\\p{L}])input(?![\\p{L}])");
  private static final Pattern LINE_ZERO =
      Pattern.compile("(?i)(?<![\\p{L}])(phase|ph|line|l|i|v|u|ch)[\\s_-]*0(?![\\d.])");
  private static final Heading NONE = new Heading(Meaning.NONE, "", Statistic.MEAN, 1, "");

  /**
   * Of the columns of an interval log, in their order: which letters name the lines shows in all of
   * them together.
   */
  public static Map<String, Heading> ofLog(List<String> headings) {
    Map<String, LogWords> words = new LinkedHashMap<>();
    boolean lettered = headings.stream().anyMatch(h -> LETTERED.matcher(h).find());
    UnaryOperator<String> numbered = MotorLetters.of(headings);
    headings.forEach(h -> words.put(h, LogWords.of(numbered.apply(h), lettered)));
    LogPlace places =
        new LogPlace(
            words.values().stream()
                .flatMap(w -> w.places().stream())
                .collect(Collectors.toUnmodifiableSet()));
    Map<String, Heading> read = new LinkedHashMap<>();
    words.forEach(
        (heading, w) ->
            read.put(heading, exact(heading).orElseGet(() -> new LogHeading(w, places).read())));
    askCircuits(words, read);
    askFromZero(read);
    passOverDirectCurrent(words, read);
    passOverDemand(words, read);
    return read;
  }

  /** Beside volts and amps of direct current the power put in is theirs. */
  private static void passOverDirectCurrent(
      Map<String, LogWords> words, Map<String, Heading> read) {
    if (words.keySet().stream().anyMatch(h -> DIRECT.matcher(h).find())) {
      read.replaceAll(
          (name, h) -> DIRECT.matcher(name).find() || PUT_IN.matcher(name).find() ? NONE : h);
    }
  }

  /** Beside the plain quantity its mean over a longer interval is not read. */
  private static void passOverDemand(Map<String, LogWords> words, Map<String, Heading> read) {
    Set<String> demand =
        words.entrySet().stream()
            .filter(e -> e.getValue().says(Vocabulary.Sense.DEMAND))
            .map(Map.Entry::getKey)
            .collect(Collectors.toUnmodifiableSet());
    Set<String> plain =
        read.entrySet().stream()
            .filter(e -> !demand.contains(e.getKey()))
            .map(e -> e.getValue().named())
            .collect(Collectors.toUnmodifiableSet());
    read.replaceAll((name, h) -> demand.contains(name) && plain.contains(h.named()) ? NONE : h);
  }

  /** Of several panels or feeders in one file only one can be what this meter measures. */
  private static void askCircuits(Map<String, LogWords> words, Map<String, Heading> read) {
    Map<String, String> named =
        words.entrySet().stream()
            .collect(Collectors.toUnmodifiableMap(Map.Entry::getKey, e -> e.getValue().circuit()));
    Set<String> circuits =
        read.entrySet().stream()
            .filter(e -> e.getValue().quantity().contains("."))
            .map(e -> named.getOrDefault(e.getKey(), ""))
            .collect(Collectors.toUnmodifiableSet());
    if (circuits.size() > 1) {
      read.replaceAll(
          (name, h) ->
              named.getOrDefault(name, "").isEmpty() || h.meaning() == Meaning.NONE
                  ? h
                  : unclear("whether this meter measures " + named.get(name)));
    }
  }

  /** Lines may be counted from 0: then 1 is the second. */
  private static void askFromZero(Map<String, Heading> read) {
    boolean zero = read.keySet().stream().anyMatch(h -> LINE_ZERO.matcher(h).find());
    boolean three = read.values().stream().anyMatch(h -> h.quantity().startsWith("L3."));
    if (zero && !three) {
      read.replaceAll(
          (name, h) ->
              h.quantity().matches("L\\d.*") || h.meaning() == Meaning.PLACELESS
                  ? unclear("which conductor this is, as the file counts lines from 0")
                  : h);
    }
  }

  /** A quantity's name, perhaps with the statistic behind it as results write it. */
  private static Optional<Heading> exact(String heading) {
    String text = heading.trim();
    for (Statistic s : Statistic.values()) {
      String ending = "." + s.word();
      String name = text.endsWith(ending) ? text.substring(0, text.length() - ending.length()) : "";
      if (MeasuredQuantity.ofLog(name).isPresent()) {
        return Optional.of(new Heading(Meaning.EXACT, name, s, 1, ""));
      }
    }
    return MeasuredQuantity.ofLog(text)
        .map(q -> new Heading(Meaning.EXACT, text, Statistic.MEAN, 1, ""));
  }

  private String named() {
    return quantity + " " + statistic;
  }

  /** Nothing a log holds. */
  public static Heading none() {
    return NONE;
  }

  /** Known, but nothing a log holds. */
  public static Heading leftOut(String reason) {
    return new Heading(Meaning.NONE, "", Statistic.MEAN, 1, reason);
  }

  static Heading placeless(String measure, String question) {
    return new Heading(Meaning.PLACELESS, measure, Statistic.MEAN, 1, question);
  }

  /** Something that must be asked. */
  public static Heading unclear(String question) {
    return new Heading(Meaning.UNCLEAR, "", Statistic.MEAN, 1, question);
  }
}
