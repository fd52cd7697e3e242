package fourthwire.web.support;

import fourthwire.limits.Finding;
import java.util.Locale;

/** Writes the parts of a finding that are not sentences. */
public final class FindingText {
  private FindingText() {}

  /** A few words for what it is about, for a heading: "neutral over its ampacity". */
  public static String about(Words words, Finding finding) {
    String key = "finding." + finding.code();
    String plain = finding.code().replace('-', ' ');
    String severity = finding.severity().name().toLowerCase(Locale.ROOT);
    return words.orElse(key + "." + severity, words.orElse(key, plain));
  }

  /** Figure and limit: "106 A against 101 A"; empty where there is no figure. */
  public static String figure(Words words, Finding finding) {
    if (finding.figure().value().isEmpty()) {
      return "";
    }
    String figure = Numbers.of(finding.figure().value().getAsDouble(), finding.unit());
    return finding.limit().value().isPresent()
        ? words.of(
            "finding.against",
            figure,
            Numbers.plain(finding.limit().value().getAsDouble(), finding.unit()))
        : figure;
  }

  /** The probability in words; empty where none was computed. */
  public static String probability(Words words, Finding finding) {
    return finding.probability().value().stream()
        .mapToObj(
            p ->
                words.of(
                    "finding.probability",
                    Numbers.withDecimals(100 * p, 0) + Numbers.THIN_SPACE + "%"))
        .findFirst()
        .orElse("");
  }

  /** The probability in words, or why there is none. */
  public static String sureness(Words words, Finding finding) {
    String reason = finding.probability().reason();
    return reason.isEmpty()
        ? probability(words, finding)
        : words.of("finding.probability.unknown", reason);
  }
}
