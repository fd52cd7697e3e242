package fourthwire.intake.reading.heading;

import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Set;
import java.util.function.UnaryOperator;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Collectors;

/**
 * Lines named u, v and w, as the terminals of motors and drives are (IEC 60445): V and U are
 * voltages too, so that the three letters count only where all of them stand behind the same
 * symbol.
 */
final class MotorLetters {
  private static final Pattern LINE =
      Pattern.compile(
          "(?i)(?<!\\p{L})((?:[iuvpqs]|pf|thd-?[iuv]|[iuv]rms|current|voltage|phase|line|strom|spannung)"
              + "[\\s_-]?)(uv|vw|wu|[uvw])(?=n?(?![\\p{L}\\p{N}]))");
  private static final Map<String, String> LINES =
      Map.of("u", "1", "v", "2", "w", "3", "uv", "12", "vw", "23", "wu", "31");
  private static final List<Set<String>> WHOLE =
      List.of(Set.of("u", "v", "w"), Set.of("uv", "vw", "wu"));

  private MotorLetters() {}

  /** Writes lines of a file's headings by number where they are named by these letters. */
  static UnaryOperator<String> of(List<String> headings) {
    Map<String, Set<String>> bySymbol =
        headings.stream()
            .map(LINE::matcher)
            .filter(Matcher::find)
            .collect(
                Collectors.groupingBy(
                    MotorLetters::symbol,
                    Collectors.mapping(m -> lower(m.group(2)), Collectors.toSet())));
    boolean whole =
        bySymbol.values().stream().anyMatch(s -> WHOLE.stream().anyMatch(s::containsAll));
    return whole
        ? heading ->
            LINE.matcher(heading)
                .replaceAll(m -> m.group(1) + LINES.getOrDefault(lower(m.group(2)), ""))
        : heading -> heading;
  }

  private static String symbol(Matcher m) {
    return lower(m.group(1)).replaceAll("[\\s_-]", "");
  }

  private static String lower(String text) {
    return text.toLowerCase(Locale.ROOT);
  }
}
