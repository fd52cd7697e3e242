package fourthwire.web.support;

import fourthwire.limits.Finding;
import fourthwire.limits.FindingCode;
import fourthwire.limits.Severity;
import java.util.List;
import java.util.stream.Stream;

/** Writes the parts of a finding that are not sentences. */
public final class FindingText {
  /** The manner of a distortion that is over a figure meant for another place. */
  static final String GUIDANCE = "guidance";

  /** Checks whose limits bind at the point of common coupling and are guidance elsewhere. */
  static final List<String> DISTORTION =
      Stream.of(
              FindingCode.CURRENT_TDD,
              FindingCode.CURRENT_ORDER,
              FindingCode.VOLTAGE_THD,
              FindingCode.VOLTAGE_ORDER)
          .map(FindingCode::word)
          .toList();

  private FindingText() {}

  /** A few words for what it is about, for a heading: "neutral over its ampacity". */
  public static String about(Words words, Finding finding) {
    String key = "finding." + finding.code();
    String plain = finding.code().replace('-', ' ');
    return words.orElse(key + "." + manner(finding), words.orElse(key, plain));
  }

  /**
   * How the figure stands to its limit, as keys have it: {@code act} over it, {@code watch} near
   * it, {@code guidance} over a figure that does not bind inside the site, {@code note} held
   * against none.
   */
  static String manner(Finding finding) {
    boolean over =
        finding.limit().value().isPresent()
            && finding.figure().value().orElse(0) > finding.limit().value().getAsDouble();
    return finding.severity() == Severity.WATCH && over && DISTORTION.contains(finding.code())
        ? GUIDANCE
        : finding.severity().word();
  }

  /** Figure and limit: "106 A against 101 A"; empty where there is no figure. */
  public static String figure(Words words, Finding finding) {
    if (finding.figure().value().isEmpty()) {
      return "";
    }
    if (finding.code().equals(FindingCode.RESONANCE.word())) {
      return words.of(
          "finding.beside",
          Numbers.of(finding.figure().value().getAsDouble()),
          Numbers.ordinal((int) Math.rint(finding.limit().value().orElse(0))));
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

  /** A sentence of the engine as a page sets it: powers of units raised. */
  public static String set(String sentence) {
    return sentence.replace("mm2", "mm²").replace(" ohm", Numbers.THIN_SPACE + "Ω");
  }
}
