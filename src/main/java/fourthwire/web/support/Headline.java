package fourthwire.web.support;

import fourthwire.limits.Finding;
import fourthwire.limits.Severity;
import java.util.Arrays;
import java.util.Collection;
import java.util.Comparator;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * A site's verdict in one sentence: what the worst findings are about, and at how many nodes. "Two
 * neutrals are over their ampacity and one transformer is loaded beyond what this current allows."
 */
public final class Headline {
  /**
   * What is named first where several checks found something: what can burn, then what disturbs.
   */
  private static final List<String> WEIGHT =
      List.of(
          "neutral-ampacity",
          "line-ampacity",
          "transformer-loading",
          "transformer-k-rating",
          "capacitor-current",
          "capacitor-voltage",
          "capacitor-power",
          "resonance",
          "voltage-thd",
          "voltage-order",
          "motor-voltage",
          "voltage-unbalance",
          "current-tdd",
          "current-order");

  private static final int MOST_CLAUSES = 2;

  private final Words words;

  /** In these words. */
  public Headline(Words words) {
    this.words = words;
  }

  /** The sentence over these findings, one collection a node. */
  public String of(Collection<List<Finding>> nodes) {
    Optional<Severity> worst =
        nodes.stream()
            .flatMap(List::stream)
            .map(Finding::severity)
            .filter(s -> s != Severity.NOTE)
            .min(Comparator.naturalOrder());
    return worst.map(s -> sentence(s, nodes)).orElse(words.of("headline.none"));
  }

  private String sentence(Severity severity, Collection<List<Finding>> nodes) {
    Map<String, Integer> counts = counts(severity, nodes);
    List<String> codes =
        counts.keySet().stream().sorted(Comparator.comparingInt(Headline::weight)).toList();
    List<String> clauses =
        codes.stream()
            .limit(MOST_CLAUSES)
            .map(c -> clause(c, severity, counts.getOrDefault(c, 0)))
            .toList();
    String sentence = capital(String.join(" " + words.of("headline.and") + " ", clauses));
    return codes.size() > MOST_CLAUSES
        ? words.of("headline.more", sentence, words.count(codes.size() - MOST_CLAUSES))
        : sentence;
  }

  private static Map<String, Integer> counts(Severity severity, Collection<List<Finding>> nodes) {
    Map<String, Integer> counts = new LinkedHashMap<>();
    for (List<Finding> findings : nodes) {
      HashSet<String> here = new HashSet<>();
      findings.stream()
          .filter(f -> f.severity() == severity && here.add(f.code()))
          .forEach(f -> counts.merge(f.code(), 1, Integer::sum));
    }
    return counts;
  }

  private String clause(String code, Severity severity, int count) {
    String key = "headline." + code + "." + severity.word() + (count == 1 ? ".one" : ".many");
    String other = "headline.other." + severity.word() + (count == 1 ? ".one" : ".many");
    return words.orElse(key, words.of(other, words.count(count)), words.count(count));
  }

  private static int weight(String code) {
    int at = WEIGHT.indexOf(code);
    return at < 0 ? WEIGHT.size() : at;
  }

  private static String capital(String text) {
    return text.substring(0, 1).toUpperCase(java.util.Locale.ROOT) + text.substring(1);
  }

  /** The codes that have a place of their own in the order, for tests. */
  static List<String> weighed() {
    return List.copyOf(WEIGHT);
  }

  /** Severities that make a headline, for tests. */
  static List<Severity> severities() {
    return Arrays.stream(Severity.values()).filter(s -> s != Severity.NOTE).toList();
  }
}
