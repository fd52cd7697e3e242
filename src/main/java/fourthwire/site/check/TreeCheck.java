package fourthwire.site.check;

import fourthwire.site.SupplyRole;
import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Deque;
import java.util.HashMap;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Collectors;

/**
 * Whether {@code fed_from} makes a tree rooted at the normal supply; then, from the supplies down,
 * the wiring of each node. Below an error the wiring stays open, and nothing that hangs on it is
 * reported as well.
 */
final class TreeCheck {
  private static final String FED_FROM = "fed_from";
  private static final String TRANSFORMERS = "transformers";

  private final SurveyDraft draft;
  private final NodeIndex nodes;
  private final CircuitIndex circuits;
  private final Remarks remarks;
  private final WiringCheck wiringCheck;

  /** Each transformer's and panel's parent, in the order of the rows. */
  private final Map<String, String> parents = new LinkedHashMap<>();

  TreeCheck(SurveyDraft draft, NodeIndex nodes, CircuitIndex circuits, Remarks remarks) {
    this.draft = draft;
    this.nodes = nodes;
    this.circuits = circuits;
    this.remarks = remarks;
    this.wiringCheck = new WiringCheck(remarks);
  }

  /** Reports what is wrong and returns the wiring of every node that hangs on a supply. */
  Map<String, Wiring> check() {
    draft.transformers().rows().forEach(r -> hang(r, r.content().name(), r.content().fedFrom()));
    draft.panels().rows().forEach(r -> hang(r, r.content().name(), r.content().fedFrom()));
    reportLoops();
    return wirings();
  }

  private void hang(DraftRow<?> row, String name, String fedFrom) {
    boolean nameSound = row.sound(row.table().equals("panels") ? "panel" : "transformer");
    if (!row.sound(FED_FROM) || nodes.isDoubtful(fedFrom)) {
      return;
    }
    Optional<NodeIndex.Node> parent = nodes.find(fedFrom);
    if (parent.isEmpty()) {
      reportMissing(row, fedFrom);
    } else if (isStandby(fedFrom) && hasNormal()) {
      remarks.error(
          row,
          FED_FROM,
          "\"%s\" is a standby supply. The tree hangs on the normal supply; the node that a standby"
                  .formatted(fedFrom)
              + " takes over is named in its connects_at.");
    } else if (nameSound && !nodes.isDoubtful(name)) {
      parents.put(name, fedFrom);
    }
  }

  private boolean isStandby(String name) {
    return nodes
        .supply(name)
        .filter(s -> s.sound("role") && s.content().roleOrDefault() == SupplyRole.STANDBY)
        .isPresent();
  }

  private boolean hasNormal() {
    return draft.supplies().rows().stream()
        .anyMatch(s -> s.sound("role") && s.content().roleOrDefault() == SupplyRole.NORMAL);
  }

  private void reportMissing(DraftRow<?> row, String fedFrom) {
    if (nodes.mayHide()) {
      return;
    }
    boolean noTransformers = draft.transformers().state() == DraftTable.State.ABSENT;
    String hint = Closest.hint(fedFrom, nodes.names());
    boolean slip = fedFrom.length() > 2 && !hint.isEmpty();
    if (noTransformers && !slip && circuits.matching(fedFrom).isEmpty() && !hangsOnASupply()) {
      nodes.missingBecause(fedFrom, Remarks.MISSING_TABLE + TRANSFORMERS);
      remarks.missingTable(TRANSFORMERS, row, FED_FROM, "");
      return;
    }
    String why =
        !circuits.matching(fedFrom).isEmpty()
            ? "\"%s\" is a circuit; transformers and panels are fed from a supply, a transformer or"
                + " a panel."
            : noTransformers
                ? "No supply or panel is called \"%s\", and there is no table of transformers."
                : "No supply, transformer or panel is called \"%s\".";
    remarks.error(nodes.missing(fedFrom), row, FED_FROM, why.formatted(fedFrom) + hint);
  }

  /** A site that needs no transformer has its main panel on the supply. */
  private boolean hangsOnASupply() {
    return draft.panels().rows().stream()
        .anyMatch(r -> r.sound(FED_FROM) && nodes.supply(r.content().fedFrom()).isPresent());
  }

  private void reportLoops() {
    Set<String> settled = new HashSet<>();
    for (String start : parents.keySet()) {
      Set<String> way = new HashSet<>();
      Optional<String> node = Optional.of(start);
      while (node.isPresent() && !settled.contains(node.get()) && way.add(node.get())) {
        node = Optional.ofNullable(parents.get(node.get()));
      }
      node.filter(way::contains).ifPresent(this::reportLoop);
      settled.addAll(way);
    }
  }

  private void reportLoop(String member) {
    Set<String> loop = new LinkedHashSet<>();
    Optional<String> node = Optional.of(member);
    while (node.isPresent() && loop.add(node.get())) {
      node = Optional.ofNullable(parents.get(node.get()));
    }
    String named =
        loop.stream()
            .map(n -> "\"%s\"%s".formatted(n, nodes.find(n).map(TreeCheck::inBrackets).orElse("")))
            .collect(Collectors.joining(", fed from "));
    // The order of the rows decides where it is reported: a tree is usually written from the top.
    parents.keySet().stream()
        .filter(loop::contains)
        .findFirst()
        .flatMap(nodes::find)
        .ifPresent(
            first ->
                remarks.error(
                    first.row(),
                    FED_FROM,
                    ("The nodes feed each other in a loop: %s, fed from \"%s\". Enter a ring at its"
                            + " open point.")
                        .formatted(named, member)));
  }

  private static String inBrackets(NodeIndex.Node node) {
    return " (" + node.row().place() + ")";
  }

  private Map<String, Wiring> wirings() {
    Map<String, List<String>> children = new HashMap<>();
    parents.forEach(
        (child, parent) -> children.computeIfAbsent(parent, p -> new ArrayList<>()).add(child));
    Map<String, Wiring> wirings = new HashMap<>();
    Deque<String> open = new ArrayDeque<>();
    draft.supplies().rows().stream()
        .filter(s -> s.sound("supply") && !nodes.isDoubtful(s.content().name()))
        .forEach(
            s -> {
              wirings.put(s.content().name(), wiringCheck.ofSupply(s));
              open.add(s.content().name());
            });
    while (!open.isEmpty()) {
      String parent = open.remove();
      for (String child : children.getOrDefault(parent, List.of())) {
        wirings.put(child, wiring(child, wirings.getOrDefault(parent, Wiring.OPEN), parent));
        open.add(child);
      }
    }
    wiringCheck.reportMissingNeutrals();
    return wirings;
  }

  private Wiring wiring(String node, Wiring parent, String parentName) {
    return nodes
        .panel(node)
        .map(row -> wiringCheck.ofPanel(row, parent, parentName))
        .or(
            () ->
                nodes
                    .transformer(node)
                    .map(row -> wiringCheck.ofTransformer(row, parent, parentName)))
        .orElse(Wiring.OPEN);
  }
}
