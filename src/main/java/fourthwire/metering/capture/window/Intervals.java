package fourthwire.metering.capture.window;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * How windows fall into the standard intervals (IEC 61000-4-30:2015, 4.5): fifteen of them make a
 * very short one; those that begin within ten minutes of the clock make a short one, twelve of
 * which make a long one. Fifteen are counted anew from each full ten minutes. (The standard lets
 * the window that begins at the full ten minutes overlap the one before; here windows stay gapless
 * and one that crosses the mark belongs where it begins.) Long ones begin at even hours.
 */
final class Intervals {
  private static final double TEN_MINUTES_S = 600;
  private static final int IN_TWO_HOURS = 12;

  private final WindowPlan plan;
  private final double secondsToEvenHour;

  Intervals(WindowPlan plan, double secondsToEvenHour) {
    this.plan = plan;
    this.secondsToEvenHour = secondsToEvenHour;
  }

  /** Windows that are summed together: at most fifteen, of one ten minutes. */
  record Stretch(int fromCycle, int toCycle, long tenMinutes) {}

  /** All windows in order, and the rest at the end. */
  List<Stretch> stretches() {
    List<Stretch> stretches = new ArrayList<>();
    int full = plan.windows() * plan.cycles();
    int from = 0;
    for (int cycle = plan.cycles(); from < full; cycle += plan.cycles()) {
      boolean many = cycle - from == WindowAnalysis.IN_VERY_SHORT * plan.cycles();
      if (cycle >= full || many || tenMinutes(cycle) != tenMinutes(from)) {
        stretches.add(new Stretch(from, Math.min(cycle, full), tenMinutes(from)));
        from = Math.min(cycle, full);
      }
    }
    if (full < plan.totalCycles()) {
      stretches.add(new Stretch(full, plan.totalCycles(), tenMinutes(full)));
    }
    return stretches;
  }

  private long tenMinutes(int cycle) {
    return (long)
        Math.floor(
            (plan.position(cycle) / plan.rateHz() - secondsToEvenHour) / TEN_MINUTES_S + 1e-9);
  }

  /** The whole ones: of fifteen windows, of a full ten minutes, of twelve of those. */
  List<Interval> standard(List<Interval> stretches) {
    List<Interval> standard =
        new ArrayList<>(
            stretches.stream().filter(i -> i.windows() == WindowAnalysis.IN_VERY_SHORT).toList());
    Map<Long, List<Interval>> byTick = new LinkedHashMap<>();
    for (Interval i : stretches) {
      byTick.computeIfAbsent(tenMinutes(i.fromCycle()), t -> new ArrayList<>()).add(i);
    }
    double end = plan.position(plan.windows() * plan.cycles()) / plan.rateHz();
    Map<Long, List<Interval>> byHours = new LinkedHashMap<>();
    byTick.forEach(
        (tick, of) -> {
          double begins = secondsToEvenHour + tick * TEN_MINUTES_S;
          double window = plan.cycles() * plan.track().samplesPerCycle() / plan.rateHz();
          if (begins > -window / 2 && begins + TEN_MINUTES_S < end + window) {
            Interval short10 = merged(Interval.Length.TEN_MINUTES, of);
            standard.add(short10);
            byHours
                .computeIfAbsent(Math.floorDiv(tick, (long) IN_TWO_HOURS), t -> new ArrayList<>())
                .add(short10);
          }
        });
    byHours.values().stream()
        .filter(of -> of.size() == IN_TWO_HOURS)
        .forEach(of -> standard.add(merged(Interval.Length.TWO_HOURS, of)));
    return standard;
  }

  private Interval merged(Interval.Length length, List<Interval> of) {
    WindowSums sums = new WindowSums(plan.signals().size(), plan.pairs().size(), 0);
    of.forEach(i -> sums.addOrders(i.sums()));
    int last = of.get(of.size() - 1).toCycle();
    return new Interval(plan, length, of.get(0).fromCycle(), last, sums);
  }
}
