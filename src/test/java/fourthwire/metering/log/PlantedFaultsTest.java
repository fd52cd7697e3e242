package fourthwire.metering.log;

import static org.assertj.core.api.Assertions.assertThat;

import fourthwire.metering.Period;
import fourthwire.metering.QualityFinding;
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
import java.util.function.BiConsumer;
import java.util.stream.Stream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;

/** Faults planted in logs of invented boards are found; clean days raise no alarm. */
class PlantedFaultsTest {
  private static final int DAYS = 28;
  private static final int PER_DAY = 144;
  private static final long STEP = 600_000;
  private static final long START = Instant.parse("2025-02-02T23:00:00Z").toEpochMilli();

  /** Columns by name, and when each row is. */
  private static final class Board {
    private final Map<String, double[]> columns = new TreeMap<>();
    private final List<Long> times = new ArrayList<>();

    Board(long seed, int decimals) {
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

    private void line(
        Random random, String line, int row, double first, double share, int decimals) {
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

    void scale(String name, int from, int to, double factor) {
      for (int row = from; row < to; row++) {
        columns.get(name)[row] *= factor;
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

    void repeat(int row) {
      times.add(row, times.get(row));
      columns.replaceAll(
          (name, x) -> {
            double[] more = new double[x.length + 1];
            System.arraycopy(x, 0, more, 0, row + 1);
            System.arraycopy(x, row, more, row + 1, x.length - row);
            return more;
          });
    }

    Reading reading() {
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
      return LogAnalysis.of(series, STEP, ZoneId.of("Europe/Amsterdam"), 50, List.of(), List.of());
    }
  }

  @ParameterizedTest
  @ValueSource(longs = {1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12, 13, 14, 15, 16, 17, 18, 19, 20})
  void cleanDaysRaiseNoAlarm(long seed) {
    assertThat(new Board(seed, (int) (seed % 3)).reading().quality()).as("seed %d", seed).isEmpty();
  }

  private static Arguments fault(
      String name, String code, int from, int to, BiConsumer<Board, int[]> plant) {
    return Arguments.of(name, code, from, to, plant);
  }

  static Stream<Arguments> faults() {
    int d = 10 * PER_DAY;
    int e = 14 * PER_DAY;
    return Stream.of(
        fault("gap", QualityFinding.GAP, d, d + 50, (b, p) -> b.remove(p[0], p[1])),
        fault(
            "repeated rows",
            QualityFinding.REPEATED_ROWS,
            d,
            d + 3,
            (b, p) -> {
              b.repeat(p[0]);
              b.repeat(p[0] + 2);
            }),
        fault(
            "clock set back",
            QualityFinding.CLOCK_JUMP,
            d,
            d + 6,
            (b, p) -> b.times.replaceAll(t -> t >= START + STEP * p[1] ? t - 6 * STEP : t)),
        fault(
            "clock off the grid",
            QualityFinding.CLOCK_JUMP,
            d,
            d + 1,
            (b, p) -> b.times.replaceAll(t -> t >= START + STEP * p[1] ? t + 217_000 : t)),
        fault(
            "one quantity stands still",
            QualityFinding.FLAT_LINE,
            d + 60,
            d + 96,
            (b, p) -> java.util.Arrays.fill(b.columns.get("L2.rms_v"), p[0], p[1], 230.4)),
        fault(
            "the meter stands still",
            QualityFinding.FLAT_LINE,
            d + 60,
            d + 84,
            (b, p) ->
                b.columns.values().forEach(x -> java.util.Arrays.fill(x, p[0], p[1], x[p[0]]))),
        fault(
            "overflow marks",
            QualityFinding.IMPOSSIBLE_VALUE,
            d,
            d + 2,
            (b, p) -> b.columns.get("L1.rms_a")[p[0]] = 65535),
        fault(
            "power factor above one",
            QualityFinding.IMPOSSIBLE_VALUE,
            d,
            d + 2,
            (b, p) -> b.columns.get("L3.power_factor")[p[0]] = 1.31),
        fault(
            "negative volts",
            QualityFinding.IMPOSSIBLE_VALUE,
            d,
            d + 2,
            (b, p) -> b.columns.get("L3.rms_v")[p[0]] = -1),
        fault(
            "currents of two lines swapped",
            QualityFinding.SWAPPED_LINES,
            d,
            e,
            (b, p) -> b.swap("L1.rms_a", "L2.rms_a", p[0], p[1])),
        fault(
            "voltages of two lines swapped",
            QualityFinding.SWAPPED_LINES,
            d,
            e,
            (b, p) -> b.swap("L1.rms_v", "L2.rms_v", p[0], p[1])),
        fault(
            "clamps crossed",
            QualityFinding.SWAPPED_LINES,
            d,
            e,
            (b, p) -> {
              for (int row = p[0]; row < p[1]; row++) {
                double phi = Math.acos(0.92);
                b.columns.get("L1.active_w")[row] =
                    b.at("L1.rms_v", row) * b.at("L1.rms_a", row) * Math.cos(2 * Math.PI / 3 + phi);
                b.columns.get("L2.active_w")[row] =
                    b.at("L2.rms_v", row) * b.at("L2.rms_a", row) * Math.cos(2 * Math.PI / 3 - phi);
                b.columns.get("L1.power_factor")[row] = Math.cos(2 * Math.PI / 3 + phi);
                b.columns.get("L2.power_factor")[row] = Math.cos(2 * Math.PI / 3 - phi);
                b.columns.get("L3.active_w")[row] =
                    b.at("L3.rms_v", row) * b.at("L3.rms_a", row) * 0.92;
              }
            }),
        fault(
            "a clamp turned",
            QualityFinding.REVERSED_CLAMP,
            d,
            e,
            (b, p) -> {
              b.scale("L2.active_w", p[0], p[1], -1);
              b.scale("L2.power_factor", p[0], p[1], -1);
            }),
        fault(
            "amps by a wrong ratio",
            QualityFinding.WRONG_RATIO,
            d,
            e,
            (b, p) -> b.scale("L3.rms_a", p[0], p[1], 0.5)),
        fault(
            "watts that are kilowatts",
            QualityFinding.WRONG_RATIO,
            d,
            e,
            (b, p) -> b.scale("L1.active_w", p[0], p[1], 0.001)),
        fault(
            "neutral above all lines",
            QualityFinding.NEUTRAL_NOT_SUM,
            d,
            e,
            (b, p) -> b.scale("N.rms_a", p[0], p[1], 15)),
        fault(
            "a distortion averaged otherwise",
            QualityFinding.DISTORTION_MISREAD,
            d,
            e,
            (b, p) -> b.scale("L1.current_thd_percent", p[0], p[1], 0.6)));
  }

  @ParameterizedTest(name = "{0}")
  @MethodSource("faults")
  void isFoundWhereItIs(
      String name, String code, int from, int to, BiConsumer<Board, int[]> plant) {
    for (long seed = 21; seed < 26; seed++) {
      Board board = new Board(seed, 2);
      plant.accept(board, new int[] {from, to});
      List<QualityFinding> found = board.reading().quality();
      Period planted =
          new Period(
              Instant.ofEpochMilli(START + STEP * from), Instant.ofEpochMilli(START + STEP * to));
      assertThat(found)
          .as("seed %d: %s", seed, found)
          .anySatisfy(
              f -> {
                assertThat(f.code()).isEqualTo(code);
                assertThat(overlaps(f.period().orElseThrow(), planted)).isTrue();
              });
      assertThat(found)
          .as("seed %d", seed)
          .allSatisfy(f -> assertThat(overlaps(f.period().orElseThrow(), planted)).isTrue());
    }
  }

  /** They share time, and neither begins a day before the other. */
  private static boolean overlaps(Period found, Period planted) {
    return !found.from().isAfter(planted.to())
        && !found.to().isBefore(planted.from())
        && found.from().isAfter(planted.from().minusSeconds(90_000));
  }
}
