package fourthwire.site.check;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalInt;
import java.util.Set;

/** Whether each spectrum has its fundamental at 100 % and every order once. */
final class SpectrumCheck {
  private static final String ORDER = "order";
  private static final String PERCENT = "percent";
  private static final double FUNDAMENTAL_PERCENT = 100;
  private static final int ZERO_SEQUENCE_STEP = 3;

  private final DraftTable<SpectrumRow> table;
  private final Remarks remarks;
  private final Map<String, List<DraftRow<SpectrumRow>>> byName = new LinkedHashMap<>();

  SpectrumCheck(DraftTable<SpectrumRow> table, Remarks remarks) {
    this.table = table;
    this.remarks = remarks;
    table.rows().stream()
        .filter(r -> r.sound("spectrum"))
        .forEach(
            r -> byName.computeIfAbsent(r.content().spectrum(), n -> new ArrayList<>()).add(r));
  }

  void check() {
    byName.forEach(this::check);
  }

  boolean has(String name) {
    return byName.containsKey(name);
  }

  Set<String> names() {
    return byName.keySet();
  }

  /** The lowest order of zero sequence that this spectrum has any of. */
  OptionalInt zeroSequenceOrder(String name) {
    return byName.getOrDefault(name, List.of()).stream()
        .filter(r -> r.sound(ORDER, PERCENT) && r.content().order().percent() > 0)
        .mapToInt(r -> r.content().order().order())
        .filter(order -> order % ZERO_SEQUENCE_STEP == 0)
        .min();
  }

  private void check(String name, List<DraftRow<SpectrumRow>> rows) {
    Map<Integer, DraftRow<SpectrumRow>> byOrder = new HashMap<>();
    boolean allOrdersSound = rows.stream().allMatch(r -> r.sound(ORDER));
    for (DraftRow<SpectrumRow> row : rows) {
      DraftRow<SpectrumRow> first =
          row.sound(ORDER) ? byOrder.putIfAbsent(row.content().order().order(), row) : null;
      if (first != null) {
        remarks.error(
            row,
            ORDER,
            "Spectrum \"%s\" has this order in %s already.".formatted(name, first.place()));
      }
    }
    DraftRow<SpectrumRow> fundamental = byOrder.get(1);
    boolean anyTwice = byOrder.size() < rows.size();
    if (fundamental == null && allOrdersSound && !anyTwice && !table.mayHide("spectrum")) {
      remarks.error(
          rows.get(0),
          ORDER,
          "Spectrum \"%s\" has no order 1; it must be there with 100 %%.".formatted(name));
    }
    if (fundamental != null
        && fundamental.sound(PERCENT)
        && fundamental.content().order().percent() != FUNDAMENTAL_PERCENT) {
      remarks.error(
          fundamental, PERCENT, "Order 1 is the fundamental itself: its percent must be 100.");
    }
  }
}
