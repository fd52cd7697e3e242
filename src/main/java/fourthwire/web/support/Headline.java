package fourthwire.web.support;

import fourthwire.audit.NodeResult;
import fourthwire.limits.Finding;
import fourthwire.limits.FindingCode;
import fourthwire.limits.Severity;
import fourthwire.site.Circuit;
import fourthwire.site.SiteTree;
import fourthwire.site.Survey;
import java.util.ArrayList;
import java.util.Collection;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.stream.Collectors;

/**
 * A site's verdict in words, over all of its nodes: what the worst findings are about, and at how
 * many of them. "Two neutrals are over their ampacity and a resonance waits near the 7th."
 *
 * <p>A neutral that several circuits share is one neutral, however many of them report it.
 */
public final class Headline {
  /**
   * What is named first where several checks found something: what can burn, then what disturbs.
   */
  private static final List<FindingCode> WEIGHT =
      List.of(
          FindingCode.NEUTRAL_AMPACITY,
          FindingCode.LINE_AMPACITY,
          FindingCode.TRANSFORMER_LOADING,
          FindingCode.TRANSFORMER_K_RATING,
          FindingCode.CAPACITOR_CURRENT,
          FindingCode.CAPACITOR_VOLTAGE,
          FindingCode.CAPACITOR_POWER,
          FindingCode.RESONANCE,
          FindingCode.SHARED_NEUTRAL_SAME_LINE,
          FindingCode.VOLTAGE_THD,
          FindingCode.VOLTAGE_ORDER,
          FindingCode.MOTOR_VOLTAGE,
          FindingCode.VOLTAGE_UNBALANCE,
          FindingCode.CURRENT_TDD,
          FindingCode.CURRENT_ORDER);

  private static final Map<String, String> TOTALS =
      Map.of(
          FindingCode.CURRENT_ORDER.word(), FindingCode.CURRENT_TDD.word(),
          FindingCode.VOLTAGE_ORDER.word(), FindingCode.VOLTAGE_THD.word());

  private static final int MOST_CLAUSES = 2;
  private static final int MOST_ORDERS = 3;

  private final Words words;

  /** In these words. */
  public Headline(Words words) {
    this.words = words;
  }

  /**
   * The verdict.
   *
   * @param sentence for the heading, without a full stop
   * @param also what else was found, a sentence; empty without
   */
  public record Text(String sentence, String also) {}

  /** What findings of one check and manner came from. */
  private record Group(
      String code,
      String manner,
      Set<String> subjects,
      Set<SiteTree.Kind> kinds,
      List<Finding> findings) {
    Group(String code, String manner) {
      this(code, manner, new LinkedHashSet<>(), new LinkedHashSet<>(), new ArrayList<>());
    }
  }

  /** The verdict over these nodes of this survey. */
  public Text of(Collection<NodeResult> nodes, Survey survey) {
    List<Group> groups = groups(nodes, survey);
    if (groups.isEmpty()) {
      return new Text(words.of("headline.none"), "");
    }
    List<Group> first = leading(groups);
    String sentence =
        first.stream()
            .map(this::clause)
            .collect(Collectors.joining(" " + words.of("headline.and") + " "));
    String rest =
        groups.stream()
            .filter(g -> !first.contains(g) && !isSaidBy(g, groups))
            .map(this::clause)
            .collect(Collectors.joining("; "));
    return new Text(capital(sentence), rest.isEmpty() ? "" : words.of("headline.also", rest));
  }

  /** The two that weigh most; beside one to act on only a resonance is named that is not. */
  private static List<Group> leading(List<Group> groups) {
    boolean act = groups.get(0).manner().equals(Severity.ACT.word());
    return groups.stream()
        .filter(
            g ->
                !act
                    || g.manner().equals(Severity.ACT.word())
                    || g.code().equals(FindingCode.RESONANCE.word()))
        .limit(MOST_CLAUSES)
        .toList();
  }

  /** Whether the same check came out worse elsewhere, or the total says what one order would. */
  private static boolean isSaidBy(Group group, List<Group> groups) {
    List<Group> before = groups.subList(0, groups.indexOf(group));
    String total = TOTALS.getOrDefault(group.code(), group.code());
    return before.stream().anyMatch(g -> g.code().equals(group.code()) || g.code().equals(total));
  }

  private static List<Group> groups(Collection<NodeResult> nodes, Survey survey) {
    Map<String, String> neutrals = sharedNeutrals(survey);
    Map<String, Group> groups = new LinkedHashMap<>();
    for (NodeResult node : nodes) {
      for (Finding finding : node.findings()) {
        if (finding.severity() != Severity.NOTE) {
          String manner = FindingText.manner(finding);
          Group group =
              groups.computeIfAbsent(
                  finding.code() + "." + manner, k -> new Group(finding.code(), manner));
          group.subjects().add(subject(node, finding, neutrals));
          group.kinds().add(node.kind());
          group.findings().add(finding);
        }
      }
    }
    return groups.values().stream()
        .sorted(
            Comparator.comparing((Group g) -> !g.manner().equals(Severity.ACT.word()))
                .thenComparingInt(g -> weight(g.code())))
        .toList();
  }

  private static String subject(NodeResult node, Finding finding, Map<String, String> neutrals) {
    boolean neutral = finding.code().equals(FindingCode.NEUTRAL_AMPACITY.word());
    return neutral ? neutrals.getOrDefault(node.node(), node.node()) : node.node();
  }

  private static Map<String, String> sharedNeutrals(Survey survey) {
    return survey.circuits().stream()
        .filter(c -> c.sharedNeutral().isPresent())
        .collect(
            Collectors.toMap(Circuit::id, c -> c.panel() + "/" + c.sharedNeutral().orElseThrow()));
  }

  private String clause(Group group) {
    if (group.code().equals(FindingCode.RESONANCE.word())) {
      return resonance(group);
    }
    int count = group.subjects().size();
    String number = count == 1 ? ".one" : ".many";
    String circuits = onlyCircuits(group) ? ".circuits" : "";
    String key = "headline." + group.code();
    String tail = group.manner() + number;
    String general = words.of("headline.other." + tail, words.count(count));
    return words.orElse(
        key + circuits + "." + tail,
        words.orElse(key + "." + tail, general, words.count(count)),
        words.count(count));
  }

  private static boolean onlyCircuits(Group group) {
    return group.kinds().equals(Set.of(SiteTree.Kind.CIRCUIT));
  }

  /** One bank's resonance is seen from every node: the orders it waits at are what counts. */
  private String resonance(Group group) {
    List<String> orders =
        group.findings().stream()
            .flatMapToDouble(f -> f.limit().value().stream())
            .mapToInt(order -> (int) Math.rint(order))
            .sorted()
            .distinct()
            .mapToObj(Numbers::ordinal)
            .toList();
    if (orders.size() > MOST_ORDERS || orders.isEmpty()) {
      return words.of("headline.resonance.several");
    }
    return orders.size() == 1
        ? words.of("headline.resonance.one", orders.get(0))
        : words.of(
            "headline.resonance.many",
            String.join(", ", orders.subList(0, orders.size() - 1)),
            orders.get(orders.size() - 1));
  }

  private static int weight(String code) {
    List<String> codes = weighed();
    int at = codes.indexOf(code);
    return at < 0 ? codes.size() : at;
  }

  private static String capital(String text) {
    return text.substring(0, 1).toUpperCase(java.util.Locale.ROOT) + text.substring(1);
  }

  /** The codes that have a place of their own in the order, for tests. */
  static List<String> weighed() {
    return WEIGHT.stream().map(FindingCode::word).toList();
  }

  /** The manners a clause of this code can have, for tests. */
  static List<String> manners(String code) {
    if (code.equals(FindingCode.RESONANCE.word())) {
      return List.of();
    }
    if (code.equals(FindingCode.SHARED_NEUTRAL_SAME_LINE.word())) {
      return List.of(Severity.WATCH.word());
    }
    List<String> usual = List.of(Severity.ACT.word(), Severity.WATCH.word());
    return FindingText.DISTORTION.contains(code)
        ? List.of(usual.get(0), usual.get(1), FindingText.GUIDANCE)
        : usual;
  }
}
