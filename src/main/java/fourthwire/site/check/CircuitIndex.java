package fourthwire.site.check;

import fourthwire.site.Circuit;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Finds circuits by the names tables use: {@code panel:circuit} anywhere, the bare name beside a
 * panel or where it is unique on the site.
 */
final class CircuitIndex {
  private static final int CANDIDATES_NAMED = 10;

  private final Map<String, DraftRow<Circuit>> byId = new HashMap<>();
  private final Map<String, List<DraftRow<Circuit>>> byName = new HashMap<>();
  private boolean duplicates;

  CircuitIndex(DraftTable<Circuit> circuits, Remarks remarks) {
    for (DraftRow<Circuit> row : circuits.rows()) {
      if (row.sound("circuit", "panel")) {
        add(row, remarks);
      }
    }
  }

  private void add(DraftRow<Circuit> row, Remarks remarks) {
    DraftRow<Circuit> first = byId.putIfAbsent(row.content().id(), row);
    if (first == null) {
      byName.computeIfAbsent(row.content().name(), n -> new ArrayList<>()).add(row);
      return;
    }
    duplicates = true;
    remarks.error(
        row,
        "circuit",
        "Panel \"%s\" has a circuit of this name in %s already; a circuit's name is unique in its panel."
            .formatted(row.content().panel(), first.place()));
  }

  /** Whether some panel has two circuits of one name. */
  boolean hasDuplicates() {
    return duplicates;
  }

  /** The circuits of this bare name. */
  List<DraftRow<Circuit>> named(String name) {
    return byName.getOrDefault(name, List.of());
  }

  /** The first row of this identity. */
  Optional<DraftRow<Circuit>> find(String id) {
    return Optional.ofNullable(byId.get(id));
  }

  /** The circuits that a text in a table can mean: none, one, or the candidates. */
  List<DraftRow<Circuit>> matching(String text) {
    DraftRow<Circuit> exact = byId.get(text);
    return exact != null ? List.of(exact) : byName.getOrDefault(text, List.of());
  }

  /** The circuits that a text in a table beside a panel's name can mean. */
  List<DraftRow<Circuit>> matching(String text, String panel) {
    if (panel.isEmpty()) {
      return matching(text);
    }
    String id = text.startsWith(panel + ":") && byId.containsKey(text) ? text : panel + ":" + text;
    return find(id).map(List::of).orElse(List.of());
  }

  /** The identities of circuits of this bare name, for a message. */
  String candidates(List<DraftRow<Circuit>> rows) {
    String named =
        String.join(
            ", ",
            rows.stream()
                .limit(CANDIDATES_NAMED)
                .map(r -> "\"" + r.content().id() + "\"")
                .toList());
    return rows.size() <= CANDIDATES_NAMED
        ? named
        : named + " and %d more".formatted(rows.size() - CANDIDATES_NAMED);
  }
}
