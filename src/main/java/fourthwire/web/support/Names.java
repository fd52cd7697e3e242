package fourthwire.web.support;

import fourthwire.quantity.Conductor;
import fourthwire.site.Practice;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * The conductors' names as a site's people know them: L1, L2, L3 (IEC 60445), or A, B, C where the
 * practice is North American.
 */
public final class Names {
  private static final Pattern IN_TEXT =
      Pattern.compile("(?<![\\w-])L[123](-L[123]){0,2}(?![\\w])");

  private final Practice practice;

  /** The names of this practice. */
  public Names(Practice practice) {
    this.practice = practice;
  }

  /** A conductor's name. */
  public String of(Conductor conductor) {
    return of(conductor.name());
  }

  /** The name of a conductor or pair, such as {@code L1-L2}. */
  public String of(String conductors) {
    if (practice != Practice.NORTH_AMERICA) {
      return conductors;
    }
    return conductors.replace("L1", "A").replace("L2", "B").replace("L3", "C");
  }

  /** A sentence with the conductors in it renamed; words that only contain them stay. */
  public String in(String sentence) {
    return practice == Practice.NORTH_AMERICA
        ? IN_TEXT.matcher(sentence).replaceAll(match -> Matcher.quoteReplacement(of(match.group())))
        : sentence;
  }
}
