package fourthwire.intake.reading;

import java.math.BigDecimal;
import java.time.Duration;
import java.time.LocalDateTime;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Random;

/**
 * The rows that every layout of {@link LayoutTest} writes: an invented four-wire board over two
 * days and a half in steps of ten minutes, each value a decimal number, so that what comes back can
 * be compared to the last digit. Volts times amps, powers, harmonics and distortion belong
 * together, as an instrument would measure them.
 */
final class LayoutTruth {
  static final LocalDateTime START = LocalDateTime.of(2025, 2, 11, 21, 0);
  static final Duration STEP = Duration.ofMinutes(10);
  static final int ROWS = 360;
  private static final List<String> LINES = List.of("L1", "L2", "L3");
  private static final int[] ORDERS = {3, 5, 7, 9};
  private static final double[] SHARES = {0.31, 0.18, 0.09, 0.05};

  private LayoutTruth() {}

  /** By quantity, in SI units. */
  static Map<String, BigDecimal[]> columns() {
    Map<String, BigDecimal[]> columns = new LinkedHashMap<>();
    Random random = new Random(11);
    for (int row = 0; row < ROWS; row++) {
      double day = 0.55 + 0.45 * Math.sin((row - 30) * Math.PI / 72);
      double p = 0;
      double q = 0;
      double s = 0;
      for (int k = 0; k < 3; k++) {
        double volts = 230.5 + k - 2 * day + random.nextGaussian() * 0.4;
        double first = (14 + 5 * k + 70 * day) * (1 + 0.05 * random.nextGaussian());
        double squares = harmonics(columns, row, LINES.get(k), first, random);
        double amps = Math.sqrt(first * first + squares);
        double watts = volts * first * 0.95;
        double vars = volts * first * Math.sqrt(1 - 0.95 * 0.95);
        put(columns, LINES.get(k) + ".rms_v", row, volts, 1);
        put(columns, LINES.get(k) + ".rms_a", row, amps, 2);
        put(columns, LINES.get(k) + ".active_w", row, watts, -1);
        put(columns, LINES.get(k) + ".reactive_var", row, vars, -1);
        put(columns, LINES.get(k) + ".apparent_va", row, volts * amps, -1);
        put(columns, LINES.get(k) + ".power_factor", row, watts / volts / amps, 3);
        put(
            columns,
            LINES.get(k) + ".current_thd_percent",
            row,
            100 * Math.sqrt(squares) / first,
            1);
        put(columns, LINES.get(k) + ".voltage_thd_percent", row, 1.4 + 2 * day, 2);
        p += watts;
        q += vars;
        s += volts * amps;
      }
      put(columns, "N.rms_a", row, 30 * day + 4 + random.nextDouble(), 2);
      put(columns, "total.active_w", row, p, -1);
      put(columns, "total.reactive_var", row, q, -1);
      put(columns, "total.apparent_va", row, s, -1);
      put(columns, "total.power_factor", row, p / s, 3);
      put(columns, "frequency_hz", row, 50 + 0.02 * random.nextGaussian(), 3);
      put(columns, "total.energy_wh", row, 12_345_600 + 3000.0 * row, -2);
      put(columns, "L1-L2.rms_v", row, 399 + random.nextDouble(), 1);
      put(columns, "L2-L3.rms_v", row, 400 + random.nextDouble(), 1);
      put(columns, "L3-L1.rms_v", row, 401 + random.nextDouble(), 1);
    }
    return columns;
  }

  /** Amps and percent of each order; returns the sum of squares. */
  private static double harmonics(
      Map<String, BigDecimal[]> columns, int row, String line, double first, Random random) {
    put(columns, line + ".current_h1_a", row, first, 3);
    put(columns, line + ".current_h1_percent", row, 100, 1);
    double squares = 0;
    for (int k = 0; k < ORDERS.length; k++) {
      double amps = first * SHARES[k] * (1 + 0.1 * random.nextGaussian());
      squares += amps * amps;
      put(columns, line + ".current_h" + ORDERS[k] + "_a", row, amps, 3);
      put(columns, line + ".current_h" + ORDERS[k] + "_percent", row, 100 * amps / first, 2);
    }
    return squares;
  }

  private static void put(
      Map<String, BigDecimal[]> columns, String quantity, int row, double value, int decimals) {
    BigDecimal[] column = columns.computeIfAbsent(quantity, q -> new BigDecimal[ROWS]);
    column[row] =
        new BigDecimal(value)
            .setScale(decimals, java.math.RoundingMode.HALF_EVEN)
            .setScale(Math.max(0, decimals));
  }
}
