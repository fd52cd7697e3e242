package fourthwire.site.check;

import fourthwire.site.Panel;
import fourthwire.site.Supply;
import fourthwire.site.Transformer;
import java.util.Collection;
import java.util.HashMap;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/** The supplies, transformers and panels by name; a name is unique over the three. */
final class NodeIndex {
  /** What a node is. */
  enum Kind {
    SUPPLY,
    TRANSFORMER,
    PANEL;

    String word() {
      return name().toLowerCase(java.util.Locale.ROOT);
    }
  }

  /** A node's row, and what kind it is. */
  record Node(Kind kind, DraftRow<?> row) {}

  private final Map<String, Node> byName = new LinkedHashMap<>();
  private final Map<String, String> missing = new HashMap<>();
  private final Set<String> doubtful = new HashSet<>();
  private final boolean namesHidden;
  private final Remarks remarks;

  NodeIndex(SurveyDraft draft, Remarks remarks) {
    this.remarks = remarks;
    draft.supplies().rows().forEach(r -> add(Kind.SUPPLY, r, r.content().name()));
    draft.transformers().rows().forEach(r -> add(Kind.TRANSFORMER, r, r.content().name()));
    draft.panels().rows().forEach(r -> add(Kind.PANEL, r, r.content().name()));
    namesHidden =
        draft.supplies().mayHide("supply")
            || draft.transformers().mayHide("transformer")
            || draft.panels().mayHide("panel");
  }

  private void add(Kind kind, DraftRow<?> row, String name) {
    if (!row.sound(kind.word())) {
      return;
    }
    Node first = byName.putIfAbsent(name, new Node(kind, row));
    if (first != null) {
      doubtful.add(name);
      remarks.error(
          row,
          kind.word(),
          "The name stands in "
              + first.row.place()
              + " already. Names of supplies, transformers and panels are unique over the three"
              + " tables.");
    }
  }

  /** The node of this name, the first where there are several. */
  Optional<Node> find(String name) {
    return Optional.ofNullable(byName.get(name));
  }

  /** Whether nothing may be said about what this name stands for: it is given twice. */
  boolean isDoubtful(String name) {
    return doubtful.contains(name);
  }

  /** Whether a name that is not found may have been lost with a row reported already. */
  boolean mayHide() {
    return namesHidden || !doubtful.isEmpty();
  }

  /** The cause of all errors that a node of this name is missing. */
  String missing(String name) {
    return missing.getOrDefault(name, "node " + name);
  }

  /** Has a missing node's errors counted under another cause. */
  void missingBecause(String name, String cause) {
    missing.put(name, cause);
  }

  Collection<String> names() {
    return byName.keySet();
  }

  Optional<DraftRow<Panel>> panel(String name) {
    return row(name, Kind.PANEL);
  }

  Optional<DraftRow<Transformer>> transformer(String name) {
    return row(name, Kind.TRANSFORMER);
  }

  Optional<DraftRow<Supply>> supply(String name) {
    return row(name, Kind.SUPPLY);
  }

  /** The kind says which record the row holds. */
  @SuppressWarnings("unchecked")
  private <T> Optional<DraftRow<T>> row(String name, Kind kind) {
    return find(name).filter(n -> n.kind == kind).map(n -> (DraftRow<T>) n.row);
  }
}
