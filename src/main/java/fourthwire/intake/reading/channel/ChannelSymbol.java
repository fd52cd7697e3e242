package fourthwire.intake.reading.channel;

import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;

/**
 * The parts of a channel's name.
 *
 * @param letter {@code i} or {@code v}; empty text where the name has neither
 * @param first token of the conductor it stands on, lower-case: {@code a}, {@code l1}, {@code n} …
 * @param second token of a second one
 * @param isWhole whether letter and conductor stand in one symbol, as in {@code IL1}
 * @param phase phase field as it stands
 * @param phaseFirst token of the phase field
 * @param phaseSecond token of a second one in it
 * @param isNoWave whether the name is of an rms, an angle, a frequency …
 */
record ChannelSymbol(
    String letter,
    String first,
    String second,
    boolean isWhole,
    String phase,
    String phaseFirst,
    String phaseSecond,
    boolean isNoWave) {
  private static final String TOKEN = "l?[1-4]|[abcrstuvwyneg0]";
  private static final Pattern SYMBOL =
      Pattern.compile("3?([iuve])_?(?:ph|phase)?(" + TOKEN + ")(" + TOKEN + ")?(?:\\d*|p|s|ins?t)");
  private static final Pattern CONDUCTOR =
      Pattern.compile("(?:ph|phase|l(?=[^123]))?(" + TOKEN + ")(" + TOKEN + ")?");
  private static final Pattern RESIDUAL =
      Pattern.compile("(i|u|v)?(?:3[iuv]0|res|resid|residual|gnd|ground|earth|neutral|neut)");
  private static final Pattern CURRENT = Pattern.compile("i|current|curr?|amps?|ct");
  private static final Pattern VOLTAGE = Pattern.compile("[uv]|voltage|volts?|[vp]t");
  private static final Pattern NO_WAVE =
      Pattern.compile("rms|mag|magnitude|ang|angle|freq|frequency|thd|power|dc|batt?|battery");
  private static final Pattern BRACKET = Pattern.compile("[\\[(][^\\])]*[\\])]");

  static ChannelSymbol of(String name, String phase) {
    String bare = BRACKET.matcher(name).replaceAll(" ");
    List<String> words =
        Stream.of(bare.toLowerCase(Locale.ROOT).split("[^\\p{L}\\p{N}]+"))
            .filter(w -> !w.isEmpty())
            .toList();
    boolean noWave = words.stream().anyMatch(w -> NO_WAVE.matcher(w).matches());
    Tokens ofPhase = tokens(phase);
    Optional<Matcher> symbol = first(words, SYMBOL);
    if (symbol.isPresent()) {
      Matcher m = symbol.get();
      return new ChannelSymbol(
          m.group(1).equals("i") ? "i" : "v",
          m.group(2),
          second(m, 3).isEmpty() ? joined(bare, m) : second(m, 3),
          true,
          phase.trim(),
          ofPhase.first(),
          ofPhase.second(),
          noWave);
    }
    Tokens standing = standing(words);
    return new ChannelSymbol(
        letter(words),
        standing.first(),
        standing.second(),
        false,
        phase.trim(),
        ofPhase.first(),
        ofPhase.second(),
        noWave);
  }

  /** A symbol that names a sum of all lines. */
  boolean isResidual() {
    return first.equals("0");
  }

  /** A symbol whose conductor is a bare number or a nought. */
  boolean isNumbered() {
    return isWhole && first.matches("[123]") && second.isEmpty();
  }

  private record Tokens(String first, String second) {
    static final Tokens NONE = new Tokens("", "");
  }

  private static Optional<Matcher> first(List<String> words, Pattern pattern) {
    return words.stream().map(pattern::matcher).filter(Matcher::matches).findFirst();
  }

  private static String letter(List<String> words) {
    if (first(words, CURRENT).isPresent()) {
      return "i";
    }
    return first(words, VOLTAGE).isPresent() ? "v" : residualLetter(words);
  }

  private static String residualLetter(List<String> words) {
    return first(words, RESIDUAL)
        .map(m -> m.group(1))
        .map(l -> l.equals("i") ? "i" : "v")
        .orElse("");
  }

  /** A second token that is a number behind a letter is a feeder's number, as in {@code IA2}. */
  private static String second(Matcher m, int group) {
    String second = m.group(group) == null ? "" : m.group(group);
    boolean feeder = second.matches("\\d") && m.group(group - 1).matches("[a-z]");
    return feeder ? "" : second;
  }

  /** A second conductor behind a hyphen, written as the first is: {@code UL1-L2}, {@code VA-B}. */
  private static String joined(String name, Matcher symbol) {
    Matcher m =
        Pattern.compile(
                Pattern.quote(symbol.group()) + "\\s*[-/]\\s*(" + TOKEN + ")(?![\\p{L}\\p{N}])")
            .matcher(name.toLowerCase(Locale.ROOT));
    boolean digit = symbol.group(2).matches("\\d");
    return m.find() && m.group(1).matches("\\d") == digit ? m.group(1) : "";
  }

  /** Conductors that are words of their own: behind the letter, or letters anywhere. */
  private static Tokens standing(List<String> words) {
    if (first(words, RESIDUAL).isPresent()) {
      return new Tokens("n", "");
    }
    for (int k = 0; k < words.size(); k++) {
      Matcher m = CONDUCTOR.matcher(words.get(k));
      boolean led =
          k > 0 && words.get(k - 1).matches("[iuvl]|ph|phase|line|current|curr?|voltage|volts?");
      boolean named =
          words.get(k).matches("l[123].*|(ph|phase).+|[abcrstyn]|[abc][abcn]|[rst][rstn]");
      if (m.matches() && (led || named) && !isLetter(words, k)) {
        boolean two = k + 1 < words.size() && words.get(k + 1).matches("(" + TOKEN + ")");
        return new Tokens(
            m.group(1), two && second(m, 2).isEmpty() ? words.get(k + 1) : second(m, 2));
      }
    }
    return Tokens.NONE;
  }

  private static boolean isLetter(List<String> words, int k) {
    return k == 0 && words.get(k).matches("[iuv]");
  }

  private static Tokens tokens(String phase) {
    String word = phase.toLowerCase(Locale.ROOT).replaceAll("[^a-z0-9]", "");
    Matcher conductor = CONDUCTOR.matcher(word);
    if (conductor.matches()) {
      return new Tokens(conductor.group(1), second(conductor, 2));
    }
    if (RESIDUAL.matcher(word).matches()) {
      return new Tokens("n", "");
    }
    Matcher symbol = SYMBOL.matcher(word);
    return symbol.matches() ? new Tokens(symbol.group(2), second(symbol, 3)) : Tokens.NONE;
  }
}
