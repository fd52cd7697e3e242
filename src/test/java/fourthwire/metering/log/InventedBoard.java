package fourthwire.metering.log;

import fourthwire.metering.Reading;
import fourthwire.metering.series.LogChunk;
import fourthwire.metering.series.LogSeries;
import fourthwire.metering.series.Parts;
import java.time.Instant;
import java.time.ZoneId;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Random;
import java.util.TreeMap;

/** A month of an invented board in ten-minute rows: columns by name, and when each row is. */
public final class InventedBoard {
  static final int DAYS = 28;
  public static final int PER_DAY = 144;
  public static final long STEP = 600_000;
  static final long START = Instant.parse("2025-02-02T23:00:00Z").toEpochMilli();
  public static final ZoneId ZONE = ZoneId.of("Europe/Amsterdam");

  final Map<String, double[]> columns = new TreeMap<>();
  final List<Long> times = new ArrayList<>();

  /** As the seed makes it, currents with so many decimals. */
  public InventedBoard(long seed, int decimals) {
    Random random = new Random(seed);
    double size = 20 + random.nextInt(200);
    double share = 0.15 + 0.4 * random.nextDouble();
    double[] drift = {1, 1, 1};
    for (int row = 0; row < DAYS * PER_DAY; row++) {
      times.add(START + STEP * row);
      double hour = row % PER_DAY / 6.0;
      boolean weekend = row / PER_DAY % 7 > 4;
      double day = 0.12 + (weekend || hour < 6.5 || hour > 19 ? 0.05 : 0.7);
      for (int k = 0; k < 3; k++) {
        drift[k] = 0.9 * drift[k] + 0.1 + 0.03 * random.nextGaussian();
        line(random, "L" + (k + 1), row, size * day * drift[k] * (1 + 0.2 * k), share, decimals);
      }
      double thirds = 0;
      double lines = 0;
      for (String line : LineDay.LINES) {
        thirds += at(line + ".current_h3_a", row);
        lines += at(line + ".rms_a", row);
      }
      put("N.current_h3_a", row, 0.93 * thirds, 3);
      put("N.rms_a", row, Math.hypot(0.93 * thirds, 0.08 * lines), decimals);
      put(
          "total.active_w",
          row,
          at("L1.active_w", row) + at("L2.active_w", row) + at("L3.active_w", row),
          0);
      put("frequency_hz", row, 50 + 0.02 * random.nextGaussian(), 3);
    }
  }

  private void line(Random random, String line, int row, double first, double share, int decimals) {
    double third = first * share * (1 + 0.05 * random.nextGaussian());
    double fifth = first * share * 0.5 * (1 + 0.05 * random.nextGaussian());
    double seventh = first * share * 0.3 * (1 + 0.05 * random.nextGaussian());
    double sum = Math.sqrt(third * third + fifth * fifth + seventh * seventh);
    double amps = Math.hypot(first, sum);
    double volts = 230.5 - amps / 100 + 0.5 * random.nextGaussian() + (line.equals("L2") ? 1 : 0);
    double cosine = 0.95 + 0.01 * random.nextGaussian();
    put(line + ".current_h1_a", row, first, 3);
    put(line + ".current_h3_a", row, third, 3);
    put(line + ".current_h5_a", row, fifth, 3);
    put(line + ".current_h7_a", row, seventh, 3);
    put(line + ".rms_a", row, amps, decimals);
    put(line + ".rms_v", row, volts, 1);
    put(line + ".active_w", row, volts * first * cosine, 0);
    put(line + ".power_factor", row, cosine * first / amps, 3);
    put(line + ".current_thd_percent", row, 100 * sum / first, 1);
    put(line + ".voltage_thd_percent", row, 1.5 + amps / 80 + 0.1 * random.nextDouble(), 1);
  }

  double at(String name, int row) {
    return columns.get(name)[row];
  }

  void put(String name, int row, double value, int decimals) {
    double power = Math.pow(10, decimals);
    columns.computeIfAbsent(name, n -> new double[DAYS * PER_DAY])[row] =
        Math.round(value * power) / power;
  }

  /** Multiplies a column in these rows. */
  public void scale(String name, int from, int to, double factor) {
    for (int row = from; row < to; row++) {
      columns.get(name)[row] *= factor;
    }
  }

  /** Logs apparent powers too: volts times amps. */
  void apparent() {
    for (String line : LineDay.LINES) {
      for (int row = 0; row < times.size(); row++) {
        put(line + ".apparent_va", row, at(line + ".rms_v", row) * at(line + ".rms_a", row), 0);
      }
    }
  }

  void swap(String a, String b, int from, int to) {
    for (int row = from; row < to; row++) {
      double v = columns.get(a)[row];
      columns.get(a)[row] = columns.get(b)[row];
      columns.get(b)[row] = v;
    }
  }

  void remove(int from, int to) {
    times.subList(from, to).clear();
    columns.replaceAll(
        (name, x) -> {
          double[] rest = new double[x.length - (to - from)];
          System.arraycopy(x, 0, rest, 0, from);
          System.arraycopy(x, to, rest, from, x.length - to);
          return rest;
        });
  }

  /** Writes a row twice. */
  public void repeat(int row) {
    repeat(row, row + 1);
  }

  /** Writes a block of rows twice, the second time right behind the first. */
  public void repeat(int from, int to) {
    times.addAll(to, List.copyOf(times.subList(from, to)));
    columns.replaceAll(
        (name, x) -> {
          double[] more = new double[x.length + to - from];
          System.arraycopy(x, 0, more, 0, to);
          System.arraycopy(x, from, more, to, x.length - from);
          return more;
        });
  }

  LogSeries series() {
    LogSeries series = new LogSeries(List.copyOf(columns.keySet()), Parts.held(), 1 << 24);
    for (int from = 0; from < times.size(); from += LogChunk.ROWS) {
      int first = from;
      int to = Math.min(times.size(), from + LogChunk.ROWS);
      series.add(
          new LogChunk(
              times.subList(from, to).stream().mapToLong(t -> t).toArray(),
              columns.values().stream()
                  .map(x -> java.util.Arrays.copyOfRange(x, first, to))
                  .toArray(double[][]::new)),
          Runnable::run);
    }
    return series;
  }

  /** What the log says. */
  public Reading reading() {
    return LogAnalysis.of(series(), STEP, ZONE, 50, List.of(), List.of());
  }
}
