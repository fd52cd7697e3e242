package fourthwire.intake.reading.heading;

import fourthwire.intake.reading.heading.Vocabulary.Sense;
import java.util.ArrayList;
import java.util.EnumSet;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** A heading of a log taken apart: what its words say, its places, its order, its unit. */
final class LogWords {
  private static final Pattern BRACKET = Pattern.compile("[\\[({]\\s*([^\\[\\](){}]*?)\\s*[\\])}]");
  private static final Pattern BEHIND_SLASH =
      Pattern.compile("(.*[\\p{L}\\p{N})])\\s*/\\s*([\\p{L}%°]+)");
  private static final Pattern BREAK = Pattern.compile("[^\\p{L}\\p{N}%°]+");
  private static final Pattern CAMEL =
      Pattern.compile(
          "(?<=\\p{Ll}{3})(?=\\p{Lu})|(?<=\\p{Lu}{3})(?=\\p{Lu}\\p{Ll}{2})|(?<=\\d)(?=[kM]?(?:W|VA|VAr|var|VAR|A|V)$)");
  private static final Pattern STANDING =
      Pattern.compile(
          "l[123]|l[123]l[123]|l[123]n|l?[123]-?[123n]|[123][123n]|[abcrstnyb]|a[abn]|[bc][abcn]|[rst][rstn]|ry|yb|br|[yb]n");

  private static final Pattern PERCENTILE =
      Pattern.compile("c?p(?:5|\\d\\d)|\\d\\d%|percentile|quantile|median");
  private static final Pattern NUMBERED = Pattern.compile("(?i)(?:l|ph|phase)?[123]");
  private static final Map<String, String> COLOURS =
      Map.of("red", "r", "yellow", "y", "white", "y", "blue", "b");
  private static final Pattern DIGITS = Pattern.compile("0{0,2}\\d{1,2}");

  private final Set<Sense> senses = EnumSet.noneOf(Sense.class);
  private final List<String> places = new ArrayList<>();
  private final List<Integer> numbers = new ArrayList<>();
  private final List<String> unknown = new ArrayList<>();
  private Optional<Unit> unit = Optional.empty();
  private double multiple = 1;
  private boolean openUnit;
  private boolean numberBeforeUnit;
  private boolean numberForUnit;
  private boolean rms;
  private String shareOf = "";
  private String circuit = "";
  private int order;

  private final boolean lettered;

  private LogWords(boolean lettered) {
    this.lettered = lettered;
  }

  /**
   * Takes a heading apart.
   *
   * @param lettered whether the file writes volts of lines as VA, VB, VC: elsewhere VA is the unit
   */
  static LogWords of(String heading, boolean lettered) {
    LogWords words = new LogWords(lettered);
    words.circuit = Circuit.of(heading);
    String text = words.withoutUnit(PlainText.of(Circuit.without(heading)));
    List<String> all = new ArrayList<>();
    for (String part : BREAK.split(text)) {
      for (String word : CAMEL.split(part)) {
        if (!word.isEmpty()) {
          all.add(word);
        }
      }
    }
    words.takeTrailingUnit(all);
    for (int k = 0; k < all.size(); k++) {
      words.take(all, k);
    }
    boolean placed = !words.places.isEmpty();
    words.settleNumbers();
    words.openUnit |= words.numberForUnit && placed && words.order == 0;
    words.settleAmpere();
    words.openUnit |= words.numberBeforeUnit && words.order == 0;
    return words;
  }

  /** The unit in brackets, or behind the last slash, taken off. */
  private String withoutUnit(String heading) {
    Matcher bracket = BRACKET.matcher(heading);
    StringBuilder rest = new StringBuilder();
    while (bracket.find()) {
      boolean taken = unit.isEmpty() && takeUnit(bracket.group(1));
      if (!taken) {
        compare(bracket.group(1));
        numberForUnit |= bracket.group().matches("\\[\\d+]");
        openUnit |=
            unit.isEmpty() && bracket.group().startsWith("[") && isUnknown(bracket.group(1));
      }
      bracket.appendReplacement(
          rest, taken ? " " : Matcher.quoteReplacement(" " + bracket.group(1) + " "));
    }
    bracket.appendTail(rest);
    openUnit = openUnit || UnitText.hasMultiple(rest.toString());
    Matcher slash = BEHIND_SLASH.matcher(rest);
    return unit.isEmpty() && slash.matches() && takeUnit(slash.group(2))
        ? slash.group(1)
        : rest.toString();
  }

  private boolean takeUnit(String text) {
    Optional<UnitText> found = UnitText.of(text);
    found.ifPresent(
        u -> {
          unit = Optional.of(u.unit());
          multiple = u.multiple();
          shareOf = u.shareOf();
          openUnit = openUnit || u.isOpen();
        });
    return found.isPresent();
  }

  /** Whether nothing in square brackets, where units stand, is understood. */
  private static boolean isUnknown(String text) {
    return BREAK.splitAsStream(text).noneMatch(w -> w.matches("\\d*") || isUnderstood(w))
        && !text.isBlank();
  }

  /** Of two units in brackets the second may only say the first again. */
  private void compare(String text) {
    Optional<UnitText> other = UnitText.of(text);
    boolean same =
        other.isEmpty()
            || unit.filter(u -> u == other.get().unit()).isPresent()
                && multiple == other.get().multiple();
    openUnit = openUnit || !same || UnitText.isOpen(text);
  }

  /** A last word that is a unit; the letter A only where a place stands before it. */
  private void takeTrailingUnit(List<String> all) {
    if (unit.isPresent() || all.size() < 2) {
      return;
    }
    String last = all.get(all.size() - 1);
    boolean line = all.subList(0, all.size() - 1).stream().anyMatch(LogWords::namesPlace);
    boolean letter = last.length() == 1 && last.toLowerCase(Locale.ROOT).matches("[avw]");
    if (UnitText.of(last).isPresent() && (!letter || line || !last.equalsIgnoreCase("a"))) {
      takeUnit(last);
      all.remove(all.size() - 1);
      numberBeforeUnit = all.get(all.size() - 1).matches("[5-9]|\\d\\d+");
      if (Vocabulary.isConnector(all.get(all.size() - 1).toLowerCase(Locale.ROOT))) {
        all.remove(all.size() - 1);
      }
    }
  }

  private static boolean namesPlace(String word) {
    String w = word.toLowerCase(Locale.ROOT);
    return STANDING.matcher(w).matches()
        || COLOURS.containsKey(w)
        || w.matches("[1234]")
        || Vocabulary.sense(w).filter(s -> s == Sense.NEUTRAL || s == Sense.TOTAL).isPresent()
        || Symbol.of(w).filter(s -> !s.place().isEmpty()).isPresent();
  }

  private void take(List<String> all, int k) {
    String word = all.get(k).toLowerCase(Locale.ROOT);
    rms |= word.matches("t?rms");
    boolean standing = all.size() > 1 || standsAlone(word);
    if (DIGITS.matcher(word).matches()) {
      takeNumber(Integer.parseInt(word), k > 0 ? all.get(k - 1) : "");
    } else if (isConnecting(all, k)) {
      return;
    } else if (standing && !isApparent(all, k) && STANDING.matcher(word).matches()) {
      places.add(word);
    } else if (unit.isEmpty() && isSummed(word, all)) {
      unit = Unit.find(word);
    } else if (unit.isEmpty() && word.length() > 1 && isUnitWord(all.get(k))) {
      unit = Unit.find(all.get(k));
    } else if (PERCENTILE.matcher(word).matches()) {
      senses.add(Sense.OTHER);
    } else if (Vocabulary.sense(word).isPresent()) {
      senses.add(Vocabulary.sense(word).get());
      takeUnbalanceOf(word);
    } else if (COLOURS.containsKey(word)) {
      places.add(COLOURS.get(word));
    } else {
      Symbol.of(word).ifPresentOrElse(this::take, () -> unknown.add(word));
    }
  }

  /** A line with nothing but its unit; two letters are a pair in volts, else ST is a symbol. */
  private boolean standsAlone(String word) {
    return unit.isPresent()
        && (word.matches("l?[123]|[a-z]")
            || unit.filter(u -> u.kind() == Unit.Kind.VOLTAGE).isPresent());
  }

  private void takeUnbalanceOf(String word) {
    if (word.equals("vunb") || word.equals("iunb")) {
      senses.add(word.startsWith("v") ? Sense.VOLTAGE : Sense.CURRENT);
    }
  }

  private void takeNumber(int number, String before) {
    if (before.length() > 1 && unknown.contains(before.toLowerCase(Locale.ROOT))) {
      circuit = before.toLowerCase(Locale.ROOT) + " " + number;
      return;
    }
    Optional<Sense> sense = Vocabulary.sense(before);
    if (sense.filter(s -> s == Sense.HARMONIC || s == Sense.INDIVIDUAL_DISTORTION).isPresent()) {
      order = number;
    } else {
      numbers.add(number);
    }
  }

  /** The letter S begins a heading, or stands beside a numbered line, as the apparent power. */
  private static boolean isApparent(List<String> all, int k) {
    boolean numbered = all.stream().anyMatch(w -> NUMBERED.matcher(w).matches());
    return all.get(k).equalsIgnoreCase("s") && (k == 0 || numbered);
  }

  /** The word "in" before a unit; elsewhere it is the neutral's current. */
  private static boolean isConnecting(List<String> all, int k) {
    return k + 1 < all.size()
        && Vocabulary.isConnector(all.get(k).toLowerCase(Locale.ROOT))
        && Unit.find(all.get(k + 1)).isPresent();
  }

  /** {@code VA_sum}, {@code W_total}, {@code W L1}; and VA where it is no voltage of line A. */
  private boolean isSummed(String word, List<String> all) {
    boolean total =
        all.stream().flatMap(w -> Vocabulary.sense(w).stream()).anyMatch(s -> s == Sense.TOTAL);
    return word.equals("va") && (total || !lettered)
        || word.equals("w") && all.stream().anyMatch(LogWords::namesPlace);
  }

  /** A unit that is no symbol of something on a line: VA may be the voltage of line A. */
  private static boolean isUnitWord(String word) {
    return Unit.find(word).isPresent()
        && Vocabulary.sense(word.toLowerCase(Locale.ROOT)).isEmpty()
        && !word.equalsIgnoreCase("va");
  }

  private void take(Symbol symbol) {
    senses.addAll(symbol.senses());
    if (!symbol.place().isEmpty()) {
      if (symbol.place().matches("tot|total|sum|sys|t|3ph|3p")) {
        places.add(symbol.place().equals("t") ? "t" : "total");
      } else {
        places.add(symbol.place());
      }
    }
    order = symbol.order() > 0 ? symbol.order() : order;
    if (symbol.order() == 0 && symbol.senses().contains(Sense.HARMONIC)) {
      senses.add(Sense.OTHER);
    }
    unit = unit.or(symbol::unit);
  }

  /** Bare numbers: an order where a harmonic is named, else lines. */
  private void settleNumbers() {
    List<Integer> left = new ArrayList<>(numbers);
    boolean harmonic =
        senses.contains(Sense.HARMONIC) || senses.contains(Sense.INDIVIDUAL_DISTORTION);
    if (harmonic && order == 0 && !left.isEmpty()) {
      order = left.remove(left.size() - 1);
    }
    if (isShareOfFundamental() && left.size() == 1 && left.get(0) > 1) {
      order = left.remove(0);
      senses.add(Sense.HARMONIC);
    }
    if (places.size() == 1
        && places.get(0).matches("l?[1-3]")
        && left.size() == 1
        && left.get(0) < 4
        && says(Sense.VOLTAGE)) {
      places.add(String.valueOf(left.get(0)));
    }
    if (places.isEmpty() && !left.isEmpty() && left.stream().allMatch(n -> n >= 1 && n <= 4)) {
      StringBuilder place = new StringBuilder();
      left.stream().limit(2).forEach(place::append);
      places.add(place.toString());
    }
  }

  /** A percentage of the current or voltage of a line that is not named a harmonic. */
  private boolean isShareOfFundamental() {
    boolean share = unit.filter(u -> u.kind() == Unit.Kind.SHARE).isPresent();
    return share
        && places.size() == 1
        && senses.size() == 1
        && (says(Sense.CURRENT) || says(Sense.VOLTAGE));
  }

  /** The letter A beside a numbered line is the unit: {@code A_L1}. */
  private void settleAmpere() {
    boolean numbered = places.stream().anyMatch(p -> p.matches("l?[1-3]n?"));
    if (numbered && places.remove("a") && unit.isEmpty()) {
      unit = Optional.of(Unit.AMPERE);
    }
  }

  boolean says(Sense sense) {
    return senses.contains(sense);
  }

  Optional<Unit> unit() {
    return unit;
  }

  /** From the column's values to the base unit. */
  double factor() {
    return multiple * unit.map(Unit::factor).orElse(1.0);
  }

  /** Whether something stands beside the unit that is not understood. */
  boolean hasOpenUnit() {
    return openUnit;
  }

  /** Whether the word rms stands in it by itself, outside its unit. */
  boolean saysRms() {
    return rms;
  }

  /** Whether a word in brackets beside a unit is understood. */
  static boolean isUnderstood(String word) {
    String w = word.toLowerCase(Locale.ROOT);
    return w.isEmpty()
        || Vocabulary.sense(w).isPresent()
        || Vocabulary.isConnector(w)
        || STANDING.matcher(w).matches()
        || w.matches("l|true|sec|secondary")
        || Symbol.of(w).isPresent();
  }

  /** What a percentage is of, as {@link UnitText} says it. */
  String shareOf() {
    return shareOf;
  }

  /** Order of a harmonic; 0 for none. */
  int order() {
    return order;
  }

  /** Conductors as written, in order. */
  List<String> places() {
    return places;
  }

  /** The panel, feeder or machine whose number it has; empty text for none. */
  String circuit() {
    return circuit;
  }

  /** Whether it says that values are those behind an instrument transformer. */
  boolean saysSecondary() {
    return unknown.contains("sec") || unknown.contains("secondary");
  }

  /** Whether nothing in it is understood. */
  boolean saysNothing() {
    return senses.isEmpty() && unit.isEmpty();
  }
}
