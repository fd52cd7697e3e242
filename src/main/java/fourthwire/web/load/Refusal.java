package fourthwire.web.load;

import fourthwire.load.model.NoSteadyStateException;
import fourthwire.load.model.NoSteadyStateException.Why;
import fourthwire.web.support.Numbers;
import fourthwire.web.support.Words;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.regex.Pattern;

/** Says why there is no answer, and what would give one. */
final class Refusal {
  private static final Pattern LONG = Pattern.compile("(?<![\\d.,])\\d{5,}(?!\\d)");
  private static final Pattern BEFORE_UNIT = Pattern.compile("(?<=\\d) (?=(W|V|mH|ohm)\\b)");

  private final Words words;
  private final LoadQuestion question;

  Refusal(Words words, LoadQuestion question) {
    this.words = words;
    this.question = question;
  }

  /** The engine's reason, then the remedies of this question. */
  String said(NoSteadyStateException none) {
    List<String> remedies = remedies(none.why());
    String reason = sentence(set(String.valueOf(none.getMessage())));
    return remedies.isEmpty()
        ? words.of("loads.none", reason)
        : words.of("loads.none.remedy", reason, joined(remedies));
  }

  private List<String> remedies(Why why) {
    List<String> remedies = new ArrayList<>();
    if (question.sourceOhm() > 0) {
      remedies.add(words.of("loads.remedy.source"));
    }
    if (why != Why.TOO_MUCH && ModelField.of(question.kind()).contains(ModelField.CAPACITANCE)) {
      remedies.add(words.of("loads.remedy.capacitor"));
    }
    if (question.units() > 1) {
      remedies.add(words.of("loads.remedy.units"));
    }
    if (question.request().lowerPower()) {
      remedies.add(words.of("loads.remedy.level"));
    }
    return remedies;
  }

  private String joined(List<String> parts) {
    int last = parts.size() - 1;
    return last == 0
        ? parts.get(0)
        : words.of("loads.remedy.or", String.join(", ", parts.subList(0, last)), parts.get(last));
  }

  /** The engine's words as a page sets them: units, and digits in groups. */
  static String set(String text) {
    String spaced = BEFORE_UNIT.matcher(text).replaceAll("" + Numbers.THIN_SPACE);
    return LONG.matcher(spaced.replaceAll("\\bohm\\b", "Ω"))
        .replaceAll(digits -> Numbers.of(Double.parseDouble(digits.group())));
  }

  /** With a capital and a full stop. */
  static String sentence(String text) {
    String first = text.substring(0, 1).toUpperCase(Locale.ROOT) + text.substring(1);
    return first.endsWith(".") ? first : first + ".";
  }
}
