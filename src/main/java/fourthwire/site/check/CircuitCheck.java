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
 * <p>A panel with fewer lines than its parent names its own lines L1, L2 by position, and a circuit
 * that names those is on them, whatever its neighbours say. A circuit that names a line the panel
 * has not, but its parent feeds it from, is read as on that line, with a warning. Where both occur
 * and the first would be another conductor in the parent's names, it is open what the author meant:
 * one error for the panel.
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
    Map<DraftRow<Circuit>, Lines> renamed = new LinkedHashMap<>();
    for (DraftRow<Circuit> row : rows) {
      if (!fits(row, wiring)) {
        byParentsNames(wiring, row.content().lines())
            .ifPresentOrElse(own -> renamed.put(row, own), () -> report(row, panel, wiring));
      }
    }
    List<DraftRow<Circuit>> otherwise =
        rows.stream().filter(r -> fits(r, wiring) && isAnotherByParent(r, wiring)).toList();
    if (!renamed.isEmpty() && !otherwise.isEmpty()) {
      reportTwoNamings(panel, wiring, renamed.keySet().iterator().next(), otherwise.get(0));
      return;
    }
    renamed.forEach(
        (row, own) -> {
          ownLines.put(row.row(), own);
          warnOfParentsNames(row, panel, own);
        });
  }

  private static boolean fits(DraftRow<Circuit> row, Wiring wiring) {
    return wiring.conductors().containsAll(row.content().lines().conductors());
  }

  /** Whether the lines it names as the panel's own are others than the parent's of these names. */
  private static boolean isAnotherByParent(DraftRow<Circuit> row, Wiring wiring) {
    return row.content().lines().lines().stream()
        .anyMatch(l -> wiring.parentLines().get(wiring.lines().indexOf(l)) != l);
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

  private void warnOfParentsNames(DraftRow<Circuit> row, String panel, Lines own) {
    remarks.warning(
        row,
        "panel \"%s\" has no %s of its own; read as that of its parent, the panel's own %s."
            .formatted(panel, row.content().lines().word(), own.word()));
  }

  private void reportTwoNamings(
      String panel, Wiring wiring, DraftRow<Circuit> byParent, DraftRow<Circuit> byOwn) {
    remarks.error(
        byParent,
        "lines",
        ("Panel \"%s\" calls its lines %s, fed from %s of its parent. This circuit is named by the"
                + " parent's lines, and %s says %s, which is another conductor in each naming. Use"
                + " one naming: the panel's own %s on all its circuits.")
            .formatted(
                panel,
                Wiring.words(wiring.lines()),
                Wiring.words(wiring.parentLines()),
                byOwn.place(),
                byOwn.content().lines().word(),
                Wiring.words(wiring.lines())));
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
