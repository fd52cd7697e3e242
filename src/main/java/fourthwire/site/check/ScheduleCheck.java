package fourthwire.site.check;

import fourthwire.site.Schedule;
import fourthwire.site.Schedule.Days;
import java.util.ArrayList;
import java.util.EnumMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.stream.Collectors;
import java.util.stream.Stream;

/** Whether each schedule names every day once. */
final class ScheduleCheck {
  private static final String DAYS = "days";

  private final DraftTable<Schedule> table;
  private final Remarks remarks;
  private final Map<String, List<DraftRow<Schedule>>> byName = new LinkedHashMap<>();

  ScheduleCheck(DraftTable<Schedule> table, Remarks remarks) {
    this.table = table;
    this.remarks = remarks;
    table.rows().stream()
        .filter(r -> r.sound("schedule"))
        .forEach(r -> byName.computeIfAbsent(r.content().name(), n -> new ArrayList<>()).add(r));
  }

  void check() {
    byName.forEach(this::check);
  }

  Set<String> names() {
    return byName.keySet();
  }

  private void check(String name, List<DraftRow<Schedule>> rows) {
    if (!rows.stream().allMatch(r -> r.sound(DAYS))) {
      return;
    }
    Map<Days, DraftRow<Schedule>> byDays = new EnumMap<>(Days.class);
    for (DraftRow<Schedule> row : rows) {
      DraftRow<Schedule> first = byDays.putIfAbsent(row.content().days(), row);
      if (first != null) {
        remarks.error(
            row,
            DAYS,
            "Schedule \"%s\" has these days in %s already.".formatted(name, first.place()));
      }
    }
    boolean anyTwice = byDays.size() < rows.size();
    String unnamed =
        Stream.of(Days.WEEKDAY, Days.SATURDAY, Days.SUNDAY)
            .filter(d -> !byDays.containsKey(d))
            .map(Days::word)
            .collect(Collectors.joining(", "));
    boolean complete = byDays.containsKey(Days.ALL) || unnamed.isEmpty();
    if (!complete && !anyTwice && !table.mayHide("schedule")) {
      remarks.error(
          rows.get(0),
          DAYS,
          "Schedule \"%s\" names no row for %s. Add it, or a row for all."
              .formatted(name, unnamed));
    }
  }
}
