package fourthwire.metering.log;

import fourthwire.metering.LogResult;
import fourthwire.metering.LogResult.KeyInterval;
import java.time.Instant;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import org.jspecify.annotations.Nullable;

/** Finds the rows that stand for a log beside computed figures, and its first and last times. */
final class KeyRows {
  private static final String NEUTRAL = "N.rms_a";

  /** The columns that choose the rows. */
  static final List<String> COLUMNS =
      List.of(
          NEUTRAL,
          "L1.rms_a",
          "L2.rms_a",
          "L3.rms_a",
          "total.active_w",
          "L1.active_w",
          "L2.active_w",
          "L3.active_w");

  private final Peak current = new Peak();
  private final Peak power = new Peak();
  private boolean neutral;
  private long from = Long.MAX_VALUE;
  private long to = Long.MIN_VALUE;

  private static final class Peak {
    private double value = Double.NaN;
    private @Nullable Instant start;
    private Map<String, Double> values = Map.of();
  }

  void take(LogDay day) {
    Optional<double[]> n = day.find(NEUTRAL);
    neutral = n.isPresent();
    List<double[]> lines = columns(day, ".rms_a");
    List<double[]> watts =
        day.find("total.active_w").map(List::of).orElseGet(() -> columns(day, ".active_w"));
    for (int row = 0; row < day.rows(); row++) {
      from = Math.min(from, day.startMillis(row));
      to = Math.max(to, day.startMillis(row) + day.intervalMillis());
      keep(current, day, row, neutral ? n.orElseThrow()[row] : largest(lines, row));
      keep(power, day, row, sum(watts, row));
    }
  }

  private static List<double[]> columns(LogDay day, String measure) {
    List<double[]> columns = new ArrayList<>();
    for (String line : LineDay.LINES) {
      day.find(line + measure).ifPresent(columns::add);
    }
    return columns;
  }

  private static double largest(List<double[]> columns, int row) {
    double largest = Double.NaN;
    for (double[] x : columns) {
      largest = Double.isNaN(x[row]) || x[row] < largest ? largest : x[row];
    }
    return largest;
  }

  private static double sum(List<double[]> columns, int row) {
    double sum = columns.isEmpty() ? Double.NaN : 0;
    for (double[] x : columns) {
      sum += x[row];
    }
    return sum;
  }

  private static void keep(Peak peak, LogDay day, int row, double value) {
    if (Double.isNaN(value) || value <= peak.value) {
      return;
    }
    peak.value = value;
    peak.start = Instant.ofEpochMilli(day.startMillis(row));
    Map<String, Double> values = new LinkedHashMap<>();
    for (int q = 0; q < day.quantities().size(); q++) {
      if (!Double.isNaN(day.of(q)[row])) {
        values.put(day.quantities().get(q), day.of(q)[row]);
      }
    }
    peak.values = values;
  }

  long fromMillis() {
    return from;
  }

  long toMillis() {
    return to;
  }

  List<KeyInterval> found() {
    List<KeyInterval> found = new ArrayList<>();
    add(
        found,
        LogResult.PEAK_CURRENT,
        current,
        String.format(
            Locale.ROOT,
            "the interval with the highest %s current, %.1f A",
            neutral ? "neutral" : "line",
            current.value));
    add(
        found,
        LogResult.PEAK_POWER,
        power,
        String.format(
            Locale.ROOT,
            "the interval with the highest active power, %.1f kW",
            power.value / 1000));
    return found;
  }

  private static void add(List<KeyInterval> found, String code, Peak peak, String reason) {
    Instant start = peak.start;
    if (start != null) {
      found.add(new KeyInterval(code, start, reason, peak.values));
    }
  }
}
