package fourthwire.site.check;

import fourthwire.site.Circuit;
import java.util.List;
import java.util.Optional;

/** Checks the cells that refer to circuits, or to any node, of the site. */
final class References {
  private static final String CIRCUITS = "circuits";

  private final SurveyDraft draft;
  private final NodeIndex nodes;
  private final CircuitIndex circuits;
  private final Remarks remarks;
  private final boolean circuitsHidden;

  References(SurveyDraft draft, NodeIndex nodes, CircuitIndex circuits, Remarks remarks) {
    this.draft = draft;
    this.nodes = nodes;
    this.circuits = circuits;
    this.remarks = remarks;
    this.circuitsHidden =
        draft.circuits().mayHide("circuit")
            || draft.circuits().mayHide("panel")
            || circuits.hasDuplicates();
  }

  /**
   * The circuit that a load is on, reported where there is none or more than one.
   *
   * @param panel the cell beside it, empty where it is
   */
  Optional<DraftRow<Circuit>> circuit(DraftRow<?> row, String text, String panel) {
    List<DraftRow<Circuit>> found = circuits.matching(text, panel);
    if (draft.circuits().state() == DraftTable.State.ABSENT) {
      remarks.missingTable(CIRCUITS, row, "circuit", "");
      return Optional.empty();
    }
    if (draft.circuits().state() == DraftTable.State.PRESENT && draft.circuits().rows().isEmpty()) {
      remarks.error(
          "no circuits",
          row,
          "circuit",
          "No circuit is called \"%s\": the table circuits has no rows.".formatted(text));
      return Optional.empty();
    }
    if (found.size() == 1) {
      return Optional.of(found.get(0));
    }
    if (found.size() > 1) {
      reportAmbiguous(row, "circuit", text, found);
    } else if (panel.isEmpty()) {
      reportMissing(
          "circuit " + text, row, "circuit", text, "No circuit is called \"%s\".".formatted(text));
    } else if (nodes.panel(panel).isEmpty() && !hasCircuitsOn(panel)) {
      new PanelReference(nodes, remarks).check(row, panel);
    } else {
      String id = panel + ":" + text;
      reportMissing(
          "circuit " + id,
          row,
          "circuit",
          id,
          "Panel \"%s\" has no circuit \"%s\".".formatted(panel, text));
    }
    return Optional.empty();
  }

  /** Checks a cell that names a supply, transformer, panel or circuit. */
  void node(DraftRow<?> row, String column, String text) {
    if (nodes.find(text).isPresent()) {
      return;
    }
    List<DraftRow<Circuit>> found = circuits.matching(text);
    if (found.size() > 1) {
      reportAmbiguous(row, column, text, found);
    } else if (found.isEmpty() && !nodes.mayHide()) {
      reportMissing(
          text.contains(":") ? "circuit " + text : nodes.missing(text),
          row,
          column,
          text,
          "No supply, transformer, panel or circuit is called \"%s\".".formatted(text)
              + Closest.hint(text, nodes.names()));
    }
  }

  private boolean hasCircuitsOn(String panel) {
    return draft.circuits().rows().stream().anyMatch(r -> r.content().panel().equals(panel));
  }

  private void reportAmbiguous(
      DraftRow<?> row, String column, String text, List<DraftRow<Circuit>> found) {
    remarks.error(
        row,
        column,
        "Several circuits are called \"%s\": write %s."
            .formatted(text, circuits.candidates(found)));
  }

  private void reportMissing(
      String cause, DraftRow<?> row, String column, String text, String message) {
    if (circuitsHidden || isOnLostPanel(text)) {
      return;
    }
    boolean ofCircuits =
        cause.startsWith("circuit ")
            || cause.startsWith("node ") && remarks.isMissingTable(CIRCUITS);
    if (draft.circuits().state() == DraftTable.State.ABSENT && ofCircuits) {
      remarks.missingTable(CIRCUITS, row, column, "");
    } else {
      remarks.error(cause, row, column, message);
    }
  }

  /** Whether a circuit of this name hangs on a panel that is itself reported as missing. */
  private boolean isOnLostPanel(String text) {
    String name = text.substring(text.indexOf(':') + 1);
    return circuits.named(name).stream().anyMatch(r -> nodes.panel(r.content().panel()).isEmpty());
  }
}
