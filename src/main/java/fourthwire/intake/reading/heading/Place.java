package fourthwire.intake.reading.heading;

import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** Finds the conductor, or pair of lines, that a heading names. */
final class Place {
  static final String TOTAL = "total";

  private static final Map<String, String> CONDUCTORS =
      Map.ofEntries(
          Map.entry("l1", "L1"),
          Map.entry("l2", "L2"),
          Map.entry("l3", "L3"),
          Map.entry("a", "L1"),
          Map.entry("b", "L2"),
          Map.entry("c", "L3"),
          Map.entry("r", "L1"),
          Map.entry("s", "L2"),
          Map.entry("t", "L3"),
          Map.entry("1", "L1"),
          Map.entry("2", "L2"),
          Map.entry("3", "L3"),
          Map.entry("4", "N"),
          Map.entry("n", "N"),
          Map.entry("neutral", "N"),
          Map.entry("neut", "N"));
  private static final String ONE = "l[123]|[abcrstn]|[1234]";

  /** A letter symbol and what it stands on: {@code i1}, {@code ul1n}, {@code vab}, {@code pf2}. */
  private static final Pattern SYMBOL =
      Pattern.compile(
          "(?:i|u|v|p|q|s|e|pf|dpf|cosphi|thd|thdi|thdu|thdv|ithd|uthd|vthd|irms|urms|vrms|ph|phase"
              + "|line|current|voltage|h)_?("
              + ONE
              + ")("
              + ONE
              + ")?");

  private static final List<String> TOTALS =
      List.of("total", "tot", "sum", "sys", "system", "3ph", "3phase", "threephase", "all");

  private Place() {}

  /** The place these words name; empty for none. */
  static Optional<String> of(Words words) {
    if (words.has(TOTALS::contains) || words.has(w -> w.matches("[pqs](tot|total|sum|sys|t)"))) {
      return Optional.of(TOTAL);
    }
    List<String> all = words.all();
    for (int k = 0; k < all.size(); k++) {
      Optional<String> standing = standing(all, k);
      if (standing.isPresent()) {
        return standing;
      }
    }
    return all.stream().map(Place::symbol).flatMap(Optional::stream).findFirst();
  }

  /** A conductor that is a word of its own, perhaps with a second behind it. */
  private static Optional<String> standing(List<String> all, int k) {
    String word = all.get(k);
    Matcher pair = Pattern.compile("(l[123])(l[123]|n)").matcher(word);
    if (pair.matches()) {
      return Optional.of(pair(pair.group(1), pair.group(2)));
    }
    if (!isConductor(word) || word.matches("\\d") && !afterLineWord(all, k)) {
      return Optional.empty();
    }
    boolean two = k + 1 < all.size() && isConductor(all.get(k + 1));
    return Optional.of(pair(word, two ? all.get(k + 1) : "n"));
  }

  private static boolean isConductor(String word) {
    return CONDUCTORS.containsKey(word);
  }

  private static boolean afterLineWord(List<String> all, int k) {
    return k > 0
        && List.of("phase", "ph", "line", "l", "current", "voltage", "i", "u", "v")
            .contains(all.get(k - 1));
  }

  /** A conductor within a symbol. */
  static Optional<String> symbol(String word) {
    Matcher m = SYMBOL.matcher(word.toLowerCase(Locale.ROOT));
    return m.matches()
        ? Optional.of(pair(m.group(1), m.group(2) == null ? "n" : m.group(2)))
        : Optional.empty();
  }

  /** A phase identifier of a capture. */
  static Optional<String> phase(String text) {
    String word = text.trim().toLowerCase(Locale.ROOT).replaceAll("[^a-z0-9]", "");
    Matcher m = Pattern.compile("(?:ph|phase)?(" + ONE + "|neutral)(" + ONE + ")?").matcher(word);
    return m.matches()
        ? Optional.of(pair(m.group(1), m.group(2) == null ? "n" : m.group(2)))
        : symbol(word);
  }

  /**
   * Two conductors as one place: to the neutral is the line itself; pairs in the contract's order.
   */
  private static String pair(String first, String second) {
    String a = CONDUCTORS.getOrDefault(first, first);
    String b = CONDUCTORS.getOrDefault(second, second);
    if (b.equals("N") || a.equals(b)) {
      return a;
    }
    return a.equals("N") ? b : a + "-" + b;
  }
}
