package fourthwire.sample;

import fourthwire.audit.DesignState;
import fourthwire.quantity.Conductor;
import java.time.LocalDateTime;
import java.time.format.DateTimeFormatter;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Random;

/**
 * A meter's log of one week in 10-minute means, as such a meter would write it: the design figures
 * of its node, times what the schedules leave of the load, times a deviation of the real building
 * from its survey, with the unrest of people coming and going on top.
 */
final class WeekLog {
  /** Monday 00:00, in a week without a change of the clocks. */
  static final LocalDateTime START = LocalDateTime.of(2026, 3, 2, 0, 0);

  /** The site's line-to-neutral voltage at night. */
  private static final double UNLOADED_V = 232.5;

  /** Distortion of the supply by itself. */
  private static final double SUPPLY_THD_PERCENT = 1.6;

  private static final int ROWS = 7 * 24 * 6;
  private static final List<Conductor> LINES = List.of(Conductor.L1, Conductor.L2, Conductor.L3);
  private static final DateTimeFormatter TIME = DateTimeFormatter.ofPattern("yyyy-MM-dd HH:mm");

  /**
   * What a meter's node draws against its survey, and the rows its log lacks.
   *
   * @param lines of the lines' design currents
   * @param neutral of the neutral's
   */
  record Deviation(double lines, double neutral, int gapFrom, int gapRows) {}

  private final String node;
  private final Figures figures;
  private final Occupancy occupancy;
  private final Deviation deviation;
  private final Random random;
  private final Map<Conductor, Double> unrest = new LinkedHashMap<>();

  WeekLog(String node, DesignState design, Occupancy occupancy, Deviation deviation, long seed) {
    this.node = node;
    this.figures = new Figures(design);
    this.occupancy = occupancy;
    this.deviation = deviation;
    this.random = new Random(seed);
  }

  /** The file: a header, then a row for each interval by the time it starts. */
  String csv() {
    StringBuilder text = new StringBuilder();
    for (int k = 0; k < ROWS; k++) {
      LocalDateTime from = START.plusMinutes(10L * k);
      Map<String, Double> row = row(from.plusMinutes(5));
      if (k == 0) {
        text.append("Time,").append(String.join(",", row.keySet())).append('\n');
      }
      if (k < deviation.gapFrom() || k >= deviation.gapFrom() + deviation.gapRows()) {
        text.append(TIME.format(from));
        row.forEach((heading, v) -> text.append(',').append(written(heading, v)));
        text.append('\n');
      }
    }
    return text.toString();
  }

  private static String written(String heading, double value) {
    int digits = heading.contains("factor") ? 3 : heading.contains("(kW)") ? 2 : 1;
    return String.format(Locale.ROOT, "%." + digits + "f", value);
  }

  private Map<String, Double> row(LocalDateTime time) {
    double share = occupancy.all(node, time);
    Map<Conductor, Double> load = new LinkedHashMap<>();
    LINES.forEach(line -> load.put(line, share * deviation.lines() * (1 + unrest(line))));
    double neutral = occupancy.neutral(node, time) * deviation.neutral();
    double neutralA = figures.rmsA(Conductor.N) * neutral * (1 + unrest(Conductor.N));
    Map<String, Double> row = new LinkedHashMap<>();
    LINES.forEach(l -> row.put("Current " + l + " (A)", figures.rmsA(l) * load.get(l)));
    row.put("Current N (A)", neutralA);
    LINES.forEach(l -> row.put("Voltage " + l + "-N (V)", volts(l, load.get(l))));
    row.put("Active power total (kW)", kilowatts(load));
    row.put("Power factor total", powerFactor(row));
    LINES.forEach(l -> row.put("Current THD " + l + " (%)", currentThd(l, load.get(l))));
    LINES.forEach(l -> row.put("Voltage THD " + l + " (%)", voltageThd(l, share)));
    row.put("Current harmonic 3 L1 (A)", part(Conductor.L1, 3, load.get(Conductor.L1)));
    row.put("Current harmonic 5 L1 (A)", part(Conductor.L1, 5, load.get(Conductor.L1)));
    row.put("Current harmonic 3 N (A)", neutralA * figures.shareOfNeutral(3));
    return row;
  }

  /** Active power on the sum of volts times amps, as most meters work it out. */
  private static double powerFactor(Map<String, Double> row) {
    double voltAmperes =
        LINES.stream()
            .mapToDouble(l -> row.get("Voltage " + l + "-N (V)") * row.get("Current " + l + " (A)"))
            .sum();
    return 1000 * row.get("Active power total (kW)") / voltAmperes;
  }

  private double part(Conductor line, int order, double load) {
    return figures.orderA(line, order) * load * (1 + noise(0.02));
  }

  private double volts(Conductor line, double load) {
    return UNLOADED_V + (figures.rmsV(line) - UNLOADED_V) * load + noise(0.6);
  }

  private double kilowatts(Map<Conductor, Double> load) {
    double mean = load.values().stream().mapToDouble(x -> x).average().orElseThrow();
    return figures.activeW() / 1000 * mean;
  }

  /** What the supply brings along stays when the building sleeps. */
  private double voltageThd(Conductor line, double share) {
    double own = figures.voltageThdPercent(line) - SUPPLY_THD_PERCENT;
    return (SUPPLY_THD_PERCENT + own * share) * (1 + noise(0.03));
  }

  /** A load of less equipment is somewhat more distorted: what stays on at night is electronics. */
  private double currentThd(Conductor line, double load) {
    return figures.currentThdPercent(line)
        * Math.pow(Math.max(load, 0.05), -0.08)
        * (1 + noise(0.02));
  }

  /** Slow unrest, common to nothing: each conductor wanders on its own. */
  private double unrest(Conductor conductor) {
    double next = 0.85 * unrest.getOrDefault(conductor, 0.0) + noise(0.012);
    unrest.put(conductor, next);
    return next;
  }

  private double noise(double spread) {
    return spread * random.nextGaussian();
  }
}
