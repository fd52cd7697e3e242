package fourthwire.site.check;

import fourthwire.quantity.Conductor;
import fourthwire.site.Circuit;
import fourthwire.site.Lines;
import java.util.ArrayList;
import java.util.EnumMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** Whether circuits of one panel that share a neutral agree on it. */
final class SharedNeutralCheck {
  private static final String LABEL = "shared_neutral";
  private static final List<String> NEUTRAL_COLUMNS =
      List.of(
          "neutral_size",
          "neutral_conductors",
          "neutral_ampacity_a",
          "neutral_resistance_ohm_per_km",
          "neutral_reactance_ohm_per_km");

  private final DraftTable<Circuit> circuits;
  private final Map<Integer, Lines> ownLines;
  private final Remarks remarks;

  /**
   * @param ownLines by row, the lines of circuits that were named as the panel's parent names them
   */
  SharedNeutralCheck(DraftTable<Circuit> circuits, Map<Integer, Lines> ownLines, Remarks remarks) {
    this.circuits = circuits;
    this.ownLines = ownLines;
    this.remarks = remarks;
  }

  void check() {
    Map<String, List<DraftRow<Circuit>>> groups = new LinkedHashMap<>();
    for (DraftRow<Circuit> row : circuits.rows()) {
      Optional<String> label = row.content().sharedNeutral();
      if (label.isPresent() && row.sound("panel", "lines", LABEL)) {
        checkNeutral(row);
        // A colon can't stand in a panel's name, so the two parts can't run into each other.
        String key = row.content().panel() + ":" + label.get();
        groups.computeIfAbsent(key, k -> new ArrayList<>()).add(row);
      }
    }
    groups.values().forEach(this::checkGroup);
  }

  private void checkNeutral(DraftRow<Circuit> row) {
    if (!row.content().lines().hasNeutral()) {
      remarks.error(
          row,
          LABEL,
          "A circuit on %s has no neutral to share.".formatted(row.content().lines().word()));
    }
  }

  private void checkGroup(List<DraftRow<Circuit>> rows) {
    NEUTRAL_COLUMNS.forEach(column -> checkAlike(rows, column));
    warnOfSameLine(rows);
  }

  private void checkAlike(List<DraftRow<Circuit>> rows, String column) {
    List<DraftRow<Circuit>> given =
        rows.stream().filter(r -> r.sound(column) && !r.cell(column).isEmpty()).toList();
    given.stream()
        .skip(1)
        .filter(r -> !r.cell(column).equals(given.get(0).cell(column)))
        .findFirst()
        .ifPresent(
            r ->
                remarks.error(
                    r,
                    column,
                    ("The circuits share one neutral, and %s gives %s for it. Put it on one row, or"
                            + " alike on all.")
                        .formatted(given.get(0).place(), given.get(0).cell(column))));
  }

  private void warnOfSameLine(List<DraftRow<Circuit>> rows) {
    Map<Conductor, DraftRow<Circuit>> byLine = new EnumMap<>(Conductor.class);
    for (DraftRow<Circuit> row : rows) {
      for (Conductor line : ownLines.getOrDefault(row.row(), row.content().lines()).lines()) {
        DraftRow<Circuit> first = byLine.putIfAbsent(line, row);
        if (first != null && row.content().lines().hasNeutral()) {
          remarks.warning(
              row,
              ("circuits \"%s\" and \"%s\" are on the same line %s and share one neutral, which"
                      + " carries the sum of both.")
                  .formatted(first.content().id(), row.content().id(), line));
        }
      }
    }
  }
}
