package fourthwire.intake.reading.heading;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.function.Predicate;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * The words of a heading: lower-case, its unit taken off.
 *
 * @param all in order
 * @param unit in brackets, beside it, or its last word
 */
record Words(List<String> all, Optional<Unit> unit) {
  private static final Pattern BRACKET = Pattern.compile("[\\[(]\\s*([^\\[\\]()]*?)\\s*[\\])]");
  private static final Pattern BREAK = Pattern.compile("[^\\p{L}\\p{N}%°]+");

  static Words of(String heading, String unitBeside) {
    Optional<Unit> unit = Unit.find(unitBeside);
    String text = heading;
    Matcher bracket = BRACKET.matcher(heading);
    while (unit.isEmpty() && bracket.find()) {
      unit = Unit.find(bracket.group(1));
      if (unit.isPresent()) {
        text = heading.substring(0, bracket.start()) + " " + heading.substring(bracket.end());
      }
    }
    List<String> words = new ArrayList<>();
    for (String w : BREAK.split(text)) {
      if (!w.isEmpty()) {
        words.add(w);
      }
    }
    // A last word that is a unit, unless it is all there is (VA may be a voltage of line A).
    if (unit.isEmpty() && words.size() > 1) {
      Optional<Unit> last = Unit.find(words.get(words.size() - 1));
      if (last.isPresent()) {
        unit = last;
        words.remove(words.size() - 1);
      }
    }
    return new Words(words.stream().map(w -> w.toLowerCase(Locale.ROOT)).toList(), unit);
  }

  /** Whether one of these words is among them. */
  boolean has(String... any) {
    return has(Arrays.asList(any)::contains);
  }

  boolean has(Predicate<String> such) {
    return all.stream().anyMatch(such);
  }

  /** The first word that the pattern matches in full. */
  Optional<Matcher> first(Pattern pattern) {
    return all.stream().map(pattern::matcher).filter(Matcher::matches).findFirst();
  }

  /** The words run together. */
  String together() {
    return String.join("", all);
  }
}
