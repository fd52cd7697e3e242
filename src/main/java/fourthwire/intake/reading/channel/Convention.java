package fourthwire.intake.reading.channel;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.Predicate;

/** How a record names its lines. */
enum Convention {
  /** a, b, c. */
  LETTERS(Map.of("a", "L1", "b", "L2", "c", "L3")),
  /** r, s, t. */
  RST(Map.of("r", "L1", "s", "L2", "t", "L3")),
  /** Red, yellow, blue. */
  COLOURS(Map.of("r", "L1", "y", "L2", "b", "L3")),
  /** u, v, w. */
  UVW(Map.of("u", "L1", "v", "L2", "w", "L3"));

  private static final Map<String, String> ALWAYS =
      Map.ofEntries(
          Map.entry("l1", "L1"),
          Map.entry("l2", "L2"),
          Map.entry("l3", "L3"),
          Map.entry("1", "L1"),
          Map.entry("2", "L2"),
          Map.entry("3", "L3"),
          Map.entry("4", "N"),
          Map.entry("0", "N"),
          Map.entry("n", "N"),
          Map.entry("g", "N"),
          Map.entry("e", "N"));

  private final Map<String, String> lines;

  Convention(Map<String, String> lines) {
    this.lines = lines;
  }

  /** By the letters that are in use. */
  static Convention of(List<ChannelSymbol> symbols) {
    if (uses(symbols, "y"::equals)) {
      return COLOURS;
    }
    if (uses(symbols, t -> t.matches("[abc]"))) {
      return LETTERS;
    }
    return uses(symbols, "w"::equals) ? UVW : uses(symbols, t -> t.matches("[st]")) ? RST : LETTERS;
  }

  private static boolean uses(List<ChannelSymbol> symbols, Predicate<String> token) {
    return symbols.stream()
        .anyMatch(
            s ->
                token.test(s.first())
                    || token.test(s.second())
                    || token.test(s.phaseFirst())
                    || token.test(s.phaseSecond()));
  }

  /** The conductor of these tokens, or two lines: to neutral or earth is the line itself. */
  Optional<String> place(String first, String second) {
    Optional<String> a = conductor(first);
    Optional<String> b = conductor(second);
    if (b.isEmpty() || b.get().equals("N") || a.equals(b)) {
      return a;
    }
    return a.map(line -> line.equals("N") ? b.get() : line + "-" + b.get());
  }

  private Optional<String> conductor(String token) {
    // A residual current is the sum of the lines, where r is not one of them.
    boolean residual = token.equals("r") && this == LETTERS;
    return residual
        ? Optional.of("N")
        : Optional.ofNullable(lines.get(token)).or(() -> Optional.ofNullable(ALWAYS.get(token)));
  }
}
