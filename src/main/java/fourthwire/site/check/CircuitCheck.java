package fourthwire.site.check;

import fourthwire.quantity.Conductor;
import fourthwire.site.Circuit;
import fourthwire.site.Lines;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/**
 * Whether circuits hang on panels that have their conductors.
 *
 * <p>A panel with fewer lines than its parent names its own lines L1, L2 by position. Where a panel
 * has a circuit that fits only the parent's names, and all its circuits fit those, the circuits are
 * read by the parent's names, with a warning.
 */
final class CircuitCheck {
  private final SurveyDraft draft;
  private final NodeIndex nodes;
  private final Map<String, Wiring> wirings;
  private final Remarks remarks;
  private final Map<Integer, Lines> ownLines = new HashMap<>();
  private final Set<Integer> misfits = new HashSet<>();

  CircuitCheck(SurveyDraft draft, NodeIndex nodes, Map<String, Wiring> wirings, Remarks remarks) {
    this.draft = draft;
    this.nodes = nodes;
    this.wirings = wirings;
    this.remarks = remarks;
  }

  void check() {
    Map<String, List<DraftRow<Circuit>>> byPanel = new LinkedHashMap<>();
    for (DraftRow<Circuit> row : draft.circuits().rows()) {
      if (row.sound("panel") && hasPanel(row) && row.sound("lines")) {
        byPanel.computeIfAbsent(row.content().panel(), p -> new ArrayList<>()).add(row);
      }
    }
    byPanel.forEach(
        (panel, rows) -> {
          Wiring wiring = wirings.getOrDefault(panel, Wiring.OPEN);
          if (wiring.isKnown() && !nodes.isDoubtful(panel)) {
            checkLines(panel, wiring, rows);
          }
        });
  }

  /** By row, the lines of circuits that were named as the panel's parent names them. */
  Map<Integer, Lines> ownLines() {
    return ownLines;
  }

  /** Whether a circuit's lines are known and found good. */
  boolean hasGoodLines(DraftRow<Circuit> row) {
    return row.sound("lines") && !misfits.contains(row.row());
  }

  private boolean hasPanel(DraftRow<Circuit> row) {
    return new PanelReference(nodes, remarks).check(row, row.content().panel());
  }

  private void checkLines(String panel, Wiring wiring, List<DraftRow<Circuit>> rows) {
    boolean allOwn = rows.stream().allMatch(r -> fits(r, wiring));
    if (allOwn) {
      return;
    }
    Map<Integer, Lines> renamed = byParentsNames(wiring, rows);
    if (renamed.size() == rows.size()) {
      ownLines.putAll(renamed);
      warnOfParentsNames(panel, wiring, rows);
      return;
    }
    rows.stream().filter(r -> !fits(r, wiring)).forEach(r -> report(r, panel, wiring));
  }

  private static boolean fits(DraftRow<Circuit> row, Wiring wiring) {
    return wiring.conductors().containsAll(row.content().lines().conductors());
  }

  private static Map<Integer, Lines> byParentsNames(Wiring wiring, List<DraftRow<Circuit>> rows) {
    Map<Integer, Lines> renamed = new HashMap<>();
    for (DraftRow<Circuit> row : rows) {
      byParentsNames(wiring, row.content().lines()).ifPresent(l -> renamed.put(row.row(), l));
    }
    return renamed;
  }

  private static Optional<Lines> byParentsNames(Wiring wiring, Lines lines) {
    if (lines.hasNeutral() && !wiring.hasNeutral()
        || !wiring.parentLines().containsAll(lines.lines())) {
      return Optional.empty();
    }
    List<Conductor> own =
        lines.lines().stream()
            .map(l -> wiring.lines().get(wiring.parentLines().indexOf(l)))
            .toList();
    return Arrays.stream(Lines.values())
        .filter(l -> l.hasNeutral() == lines.hasNeutral() && sameLines(l.lines(), own))
        .findFirst();
  }

  private static boolean sameLines(List<Conductor> a, List<Conductor> b) {
    return a.size() == b.size() && a.containsAll(b);
  }

  private void warnOfParentsNames(String panel, Wiring wiring, List<DraftRow<Circuit>> rows) {
    remarks.warning(
        rows.get(0),
        ("the circuits of panel \"%s\" name the lines %s of its parent; they are read as the panel's"
                + " own lines %s.")
            .formatted(panel, Wiring.words(wiring.parentLines()), Wiring.words(wiring.lines())));
  }

  private void report(DraftRow<Circuit> row, String panel, Wiring wiring) {
    misfits.add(row.row());
    Lines lines = row.content().lines();
    boolean linesThere = wiring.lines().containsAll(lines.lines());
    String message = "Panel \"%s\" has the conductors %s.".formatted(panel, wiring.words());
    if (linesThere) {
      remarks.error(
          WiringCheck.neutralCause(wiring),
          row,
          "lines",
          "No neutral upstream: %s needs a neutral. %s".formatted(lines.word(), message));
    } else {
      remarks.error(
          WiringCheck.linesCause(panel),
          row,
          "lines",
          "The circuit asks for other lines. " + message);
    }
  }
}
