package fourthwire.site.check;

import fourthwire.site.CapacitorBank;
import fourthwire.site.Filter;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.function.Function;

/** Whether banks, filters, meters and readings stand where they can and are fully described. */
final class EquipmentCheck {
  private static final int THREE_LINES = 3;

  private final SurveyDraft draft;
  private final Map<String, Wiring> wirings;
  private final PanelReference panels;
  private final References references;
  private final Remarks remarks;

  EquipmentCheck(
      SurveyDraft draft,
      NodeIndex nodes,
      Map<String, Wiring> wirings,
      References references,
      Remarks remarks) {
    this.draft = draft;
    this.wirings = wirings;
    this.panels = new PanelReference(nodes, remarks);
    this.references = references;
    this.remarks = remarks;
  }

  void check() {
    checkUnique(draft.capacitors(), "capacitor", CapacitorBank::name);
    checkUnique(draft.filters(), "filter", Filter::name);
    checkUnique(draft.meters(), "meter", m -> m.name());
    draft.capacitors().rows().stream()
        .filter(r -> r.sound("panel"))
        .forEach(
            r -> {
              if (panels.check(r, r.content().panel())) {
                checkThreeLines(r, r.content().panel(), "A capacitor bank");
              }
            });
    draft.filters().rows().forEach(this::checkFilter);
    draft.meters().rows().stream()
        .filter(r -> r.sound("at"))
        .forEach(r -> references.node(r, "at", r.content().at()));
    draft.spotReadings().rows().stream()
        .filter(r -> r.sound("at"))
        .forEach(r -> references.node(r, "at", r.content().at()));
    draft.pcc().ifPresent(r -> references.node(r, "value", r.content()));
  }

  private <T> void checkUnique(DraftTable<T> table, String column, Function<T, String> name) {
    Map<String, DraftRow<T>> first = new HashMap<>();
    for (DraftRow<T> row : table.rows()) {
      DraftRow<T> earlier =
          row.sound(column) ? first.putIfAbsent(name.apply(row.content()), row) : null;
      if (earlier != null) {
        remarks.error(
            row,
            column,
            "The name stands in %s already; each needs its own.".formatted(earlier.place()));
      }
    }
  }

  private void checkThreeLines(DraftRow<?> row, String panel, String what) {
    Wiring wiring = wirings.getOrDefault(panel, Wiring.OPEN);
    if (wiring.isKnown() && wiring.lines().size() < THREE_LINES) {
      remarks.error(
          WiringCheck.linesCause(panel),
          row,
          "panel",
          "%s is three-phase; panel \"%s\" has only %s.".formatted(what, panel, wiring.words()));
    }
  }

  private void checkFilter(DraftRow<Filter> row) {
    Filter filter = row.content();
    boolean panelFound = row.sound("panel") && panels.check(row, filter.panel());
    if (!row.sound("type")) {
      return;
    }
    switch (filter.type()) {
      case TUNED -> {
        require(row, List.of("kvar", "tuned_order"), "A tuned filter");
        if (panelFound) {
          checkThreeLines(row, filter.panel(), "A tuned filter");
        }
      }
      case ACTIVE -> require(row, List.of("rated_a"), "An active filter");
      case ZERO_SEQUENCE -> {
        require(row, List.of("impedance_percent"), "A zero-sequence filter");
        requireRating(row);
        if (panelFound) {
          checkNeutral(row);
        }
      }
    }
  }

  private void require(DraftRow<Filter> row, List<String> columns, String what) {
    List<String> missing =
        columns.stream().filter(c -> row.sound(c) && row.cell(c).isEmpty()).toList();
    if (!missing.isEmpty()) {
      remarks.error(row, missing.get(0), what + " needs " + String.join(" and ", missing) + ".");
    }
  }

  private void requireRating(DraftRow<Filter> row) {
    boolean none =
        row.sound("rated_a", "kvar", "impedance_percent")
            && !row.cell("impedance_percent").isEmpty()
            && row.cell("rated_a").isEmpty()
            && row.cell("kvar").isEmpty();
    if (none) {
      remarks.error(
          row,
          "rated_a",
          "A zero-sequence filter needs rated_a (or kvar): its impedance_percent is on its rating.");
    }
  }

  private void checkNeutral(DraftRow<Filter> row) {
    Wiring wiring = wirings.getOrDefault(row.content().panel(), Wiring.OPEN);
    if (wiring.isKnown() && !wiring.hasNeutral()) {
      remarks.error(
          WiringCheck.neutralCause(wiring),
          row,
          "panel",
          "A zero-sequence filter needs a neutral; panel \"%s\" has only %s."
              .formatted(row.content().panel(), wiring.words()));
    }
  }
}
