package fourthwire.audit.week;

import fourthwire.audit.HourSeries;
import fourthwire.site.Schedule;
import fourthwire.site.Schedule.Days;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * The hours of a week, those with equal shares of every schedule together. A row for a specific day
 * beats one for all days (public contract, section 2).
 */
final class WeekHours {
  private static final int SATURDAY = 5;
  private static final int SUNDAY = 6;

  private WeekHours() {}

  /**
   * Hours alike.
   *
   * @param hours which of the 168, Monday 0 o'clock first
   * @param shares of each schedule, 0 to 1
   */
  record Alike(List<Integer> hours, Map<String, Double> shares) {
    /** In words, by the first of them: {@code Monday 8 h}. */
    String name() {
      String day =
          List.of("Monday", "Tuesday", "Wednesday", "Thursday", "Friday", "Saturday", "Sunday")
              .get(hours.get(0) / HourSeries.HOURS_A_DAY);
      return day + " " + hours.get(0) % HourSeries.HOURS_A_DAY + " h";
    }
  }

  /** Groups the week by these schedules; without any, one group of all hours. */
  static List<Alike> of(List<Schedule> schedules) {
    Map<String, Map<Days, Schedule>> byName = new LinkedHashMap<>();
    for (Schedule s : schedules) {
      byName.computeIfAbsent(s.name(), n -> new HashMap<>()).put(s.days(), s);
    }
    Map<Map<String, Double>, List<Integer>> groups = new LinkedHashMap<>();
    for (int hour = 0; hour < HourSeries.HOURS; hour++) {
      Map<String, Double> shares = new HashMap<>();
      for (Map.Entry<String, Map<Days, Schedule>> e : byName.entrySet()) {
        shares.put(e.getKey(), share(e.getKey(), e.getValue(), hour));
      }
      groups.computeIfAbsent(shares, s -> new ArrayList<>()).add(hour);
    }
    return groups.entrySet().stream().map(e -> new Alike(e.getValue(), e.getKey())).toList();
  }

  private static double share(String name, Map<Days, Schedule> rows, int hour) {
    int day = hour / HourSeries.HOURS_A_DAY;
    Days days = day == SATURDAY ? Days.SATURDAY : day == SUNDAY ? Days.SUNDAY : Days.WEEKDAY;
    Schedule row = rows.containsKey(days) ? rows.get(days) : rows.get(Days.ALL);
    if (row == null) {
      throw new IllegalArgumentException("schedule " + name + " has no row for " + days.word());
    }
    return row.shares().get(hour % HourSeries.HOURS_A_DAY);
  }
}
