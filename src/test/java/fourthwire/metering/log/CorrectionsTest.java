package fourthwire.metering.log;

import static org.assertj.core.api.Assertions.assertThat;

import fourthwire.metering.Correction;
import fourthwire.metering.QualityFinding;
import fourthwire.metering.QuantitySummary;
import fourthwire.metering.correction.CorrectedSeries;
import fourthwire.metering.series.LogSeries;
import fourthwire.metering.series.QuantityStatistics;
import java.nio.ByteBuffer;
import java.time.Duration;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collections;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Random;
import java.util.function.Consumer;
import java.util.stream.Stream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * A fault planted in an invented board, corrected as offered, gives the statistics of the board
 * without the fault, but for what the fault has lost: the truth is the board itself.
 */
class CorrectionsTest {
  private static final int D = 10 * InventedBoard.PER_DAY;
  private static final int E = 14 * InventedBoard.PER_DAY;

  /**
   * What a fault loses of the truth.
   *
   * @param columns that lose rows, a regular expression
   * @param from first of the rows lost
   * @param to after the last; none where they are alike
   */
  private record Lost(String columns, int from, int to) {}

  private static final Lost NOTHING = new Lost("", 0, 0);

  private static Arguments fault(
      String name, String code, Consumer<InventedBoard> plant, Lost lost) {
    return Arguments.of(name, code, plant, lost);
  }

  static Stream<Arguments> faults() {
    return Stream.of(
        fault(
            "repeated rows",
            QualityFinding.REPEATED_ROWS,
            b -> {
              b.repeat(D);
              b.repeat(D + 2);
            },
            NOTHING),
        fault(
            "a block written twice",
            QualityFinding.REPEATED_ROWS,
            b -> b.repeat(D, D + 20),
            NOTHING),
        fault(
            "a day written twice",
            QualityFinding.REPEATED_ROWS,
            b -> b.repeat(D, D + 144),
            NOTHING),
        fault(
            "clock set back",
            QualityFinding.CLOCK_JUMP,
            b -> setClock(b, D + 6, -6 * InventedBoard.STEP),
            NOTHING),
        fault(
            "clock off the grid",
            QualityFinding.CLOCK_JUMP,
            b -> setClock(b, D + 1, 217_000),
            NOTHING),
        fault(
            "the meter stands still",
            QualityFinding.FLAT_LINE,
            b -> b.columns.values().forEach(x -> Arrays.fill(x, D + 60, D + 84, x[D + 60])),
            new Lost(".*", D + 60, D + 84)),
        fault(
            "overflow marks",
            QualityFinding.IMPOSSIBLE_VALUE,
            b -> b.columns.get("L1.rms_a")[D] = 65535,
            new Lost("L1.rms_a", D, D + 1)),
        fault(
            "negative volts",
            QualityFinding.IMPOSSIBLE_VALUE,
            b -> Arrays.fill(b.columns.get("L3.rms_v"), D, D + 4, -1),
            new Lost("L3.rms_v", D, D + 4)),
        fault(
            "currents of two lines swapped",
            QualityFinding.SWAPPED_LINES,
            b -> b.swap("L1.rms_a", "L2.rms_a", D, E),
            NOTHING),
        fault(
            "voltages of two lines swapped",
            QualityFinding.SWAPPED_LINES,
            b -> b.swap("L1.rms_v", "L2.rms_v", D, E),
            new Lost("L[12].voltage_thd_percent", -1, -1)),
        fault(
            "a clamp turned, the total formed from it",
            QualityFinding.REVERSED_CLAMP,
            b -> {
              for (int row = D; row < E; row++) {
                b.columns.get("total.active_w")[row] -= 2 * b.at("L2.active_w", row);
              }
              b.scale("L2.active_w", D, E, -1);
              b.scale("L2.power_factor", D, E, -1);
            },
            NOTHING),
        fault(
            "a power ten times what it can be, the total formed from it",
            QualityFinding.WRONG_RATIO,
            b -> {
              b.apparent();
              for (int row = D; row < E; row++) {
                b.columns.get("total.active_w")[row] += 9 * b.at("L2.active_w", row);
              }
              b.scale("L2.active_w", D, E, 10);
            },
            NOTHING),
        fault(
            "a clamp turned for four hours",
            QualityFinding.REVERSED_CLAMP,
            b -> {
              b.scale("L2.active_w", D + 50, D + 74, -1);
              b.scale("L2.power_factor", D + 50, D + 74, -1);
            },
            NOTHING),
        fault(
            "a clamp turned, the total right",
            QualityFinding.REVERSED_CLAMP,
            b -> {
              b.scale("L2.active_w", D, E, -1);
              b.scale("L2.power_factor", D, E, -1);
            },
            NOTHING),
        fault(
            "amps by a wrong ratio",
            QualityFinding.WRONG_RATIO,
            b -> b.scale("L3.rms_a", D, E, 0.5),
            NOTHING),
        fault(
            "watts that are kilowatts",
            QualityFinding.WRONG_RATIO,
            b -> b.scale("L1.active_w", D, E, 0.001),
            NOTHING),
        fault(
            "a clamp turned from mid-morning to another day's evening",
            QualityFinding.REVERSED_CLAMP,
            b -> {
              b.scale("L2.active_w", D + 63, E + 110, -1);
              b.scale("L2.power_factor", D + 63, E + 110, -1);
            },
            NOTHING),
        fault(
            "amps by a wrong ratio from an evening to a morning",
            QualityFinding.WRONG_RATIO,
            b -> b.scale("L3.rms_a", D + 100, E + 40, 0.5),
            NOTHING),
        fault(
            "currents swapped within one day",
            QualityFinding.SWAPPED_LINES,
            b -> b.swap("L1.rms_a", "L2.rms_a", D + 10, D + 133),
            NOTHING),
        fault(
            "clamps on each other's conductors",
            QualityFinding.SWAPPED_LINES,
            CorrectionsTest::cross,
            new Lost("(L[12]|total)\\.(active_w|power_factor)", D, E)),
        fault(
            "neutral above all lines",
            QualityFinding.NEUTRAL_NOT_SUM,
            b -> b.scale("N.rms_a", D, E, 15),
            new Lost("none", D, E)));
  }

  private static void setClock(InventedBoard b, int row, long millis) {
    long from = InventedBoard.START + InventedBoard.STEP * row;
    b.times.replaceAll(t -> t >= from ? t + millis : t);
  }

  /** Each clamp's current against the other's voltage; what is formed from all lines follows. */
  private static void cross(InventedBoard b) {
    for (int row = D; row < E; row++) {
      double phi =
          Math.acos(b.at("L3.active_w", row) / b.at("L3.rms_v", row) / b.at("L3.rms_a", row));
      for (int line = 1; line <= 2; line++) {
        double cosine = Math.cos(2 * Math.PI / 3 + (line == 1 ? phi : -phi));
        String other = line == 1 ? "L2.rms_a" : "L1.rms_a";
        b.columns.get("L" + line + ".active_w")[row] =
            b.at("L" + line + ".rms_v", row) * b.at(other, row) * cosine;
        b.columns.get("L" + line + ".power_factor")[row] = cosine;
      }
      b.columns.get("total.active_w")[row] =
          b.at("L1.active_w", row) + b.at("L2.active_w", row) + b.at("L3.active_w", row);
    }
    for (String measure :
        List.of(
            "rms_a",
            "current_h1_a",
            "current_h3_a",
            "current_h5_a",
            "current_h7_a",
            "current_thd_percent")) {
      b.swap("L1." + measure, "L2." + measure, D, E);
    }
  }

  @ParameterizedTest(name = "{0}")
  @MethodSource("faults")
  void theOfferedCorrectionRestoresTheTruth(
      String name, String code, Consumer<InventedBoard> plant, Lost lost) {
    for (long seed = 21; seed < 24; seed++) {
      InventedBoard faulty = new InventedBoard(seed, 2);
      plant.accept(faulty);
      QualityFinding found =
          faulty.reading().quality().stream()
              .filter(f -> f.code().equals(code))
              .findFirst()
              .orElseThrow();
      assertThat(found.corrections()).as("seed %d", seed).isNotEmpty();
      CleanedLog cleaned = cleaned(faulty, List.of(found.corrections().get(0)));
      check(cleaned, truth(new InventedBoard(seed, 2), lost), lost, seed);
    }
  }

  private static Map<String, QuantitySummary> truth(InventedBoard board, Lost lost) {
    board.columns.forEach(
        (name, x) -> {
          if (name.matches(lost.columns()) && lost.from() >= 0) {
            Arrays.fill(x, lost.from(), lost.to(), Double.NaN);
          }
        });
    return cleaned(board, List.of()).log().quantities();
  }

  private static void check(
      CleanedLog cleaned, Map<String, QuantitySummary> truth, Lost lost, long seed) {
    truth.forEach(
        (quantity, t) -> {
          if (lost.from() < 0 && quantity.matches(lost.columns())) {
            return;
          }
          QuantitySummary c = cleaned.log().quantities().get(quantity);
          double tolerance = 1e-9 * Math.max(Math.abs(t.max()), Math.abs(t.min()));
          assertThat(c.count()).as("%s, seed %d", quantity, seed).isEqualTo(t.count());
          double[] got = {c.min(), c.mean(), c.max(), c.p95(), c.p99()};
          double[] wanted = {t.min(), t.mean(), t.max(), t.p95(), t.p99()};
          for (int k = 0; k < got.length; k++) {
            assertThat(Math.abs(got[k] - wanted[k]))
                .as("%s, seed %d: %s for %s", quantity, seed, c, t)
                .isLessThanOrEqualTo(tolerance);
          }
        });
  }

  /** THD that harmonics make, within the digits it and they are printed in. */
  @ParameterizedTest
  @ValueSource(longs = {21, 22, 23})
  void aDistortionMisreadIsFormedFromItsHarmonics(long seed) {
    InventedBoard faulty = new InventedBoard(seed, 2);
    faulty.scale("L1.current_thd_percent", D, E, 0.6);
    Correction offered = faulty.reading().quality().get(0).corrections().get(0);
    QuantitySummary c =
        cleaned(faulty, List.of(offered)).log().quantities().get("L1.current_thd_percent");
    QuantitySummary t = truth(new InventedBoard(seed, 2), NOTHING).get("L1.current_thd_percent");
    assertThat(Math.abs(c.mean() - t.mean())).as("seed %d", seed).isLessThan(0.05);
    assertThat(Math.abs(c.p95() - t.p95())).as("seed %d", seed).isLessThan(0.1);
  }

  /** Corrections made and taken back in any order leave statistics of the same bytes. */
  @ParameterizedTest
  @ValueSource(longs = {1, 2, 3, 4, 5})
  void takenBackInAnyOrderNothingIsLeft(long seed) {
    InventedBoard board = new InventedBoard(seed, 2);
    board.repeat(D);
    board.scale("L2.active_w", D, E, -1);
    board.scale("L3.rms_a", D, E, 0.5);
    board.columns.get("L1.rms_a")[40] = 65535;
    setClock(board, E + 20, 217_000);
    List<Correction> offered = new ArrayList<>();
    board.reading().quality().forEach(f -> offered.addAll(f.corrections()));
    assertThat(offered).as("seed %d", seed).hasSizeGreaterThan(4);
    LogSeries series = board.series();
    byte[] before = bytes(cleaned(series, List.of()));

    Random random = new Random(seed);
    Collections.shuffle(offered, random);
    List<Correction> made = new ArrayList<>();
    List<byte[]> after = new ArrayList<>(List.of(before));
    for (Correction c : offered) {
      made.add(c);
      after.add(bytes(cleaned(series, made)));
    }
    assertThat(Arrays.equals(after.get(after.size() - 1), before)).as("seed %d", seed).isFalse();
    List<Correction> kept = made.subList(0, 2);
    List<Correction> left = new ArrayList<>(made);
    List<Integer> undone = new ArrayList<>();
    for (int k = 2; k < made.size(); k++) {
      undone.add(k);
    }
    Collections.shuffle(undone, random);
    List<Boolean> holds = new ArrayList<>(Collections.nCopies(made.size(), true));
    for (int k : undone) {
      holds.set(k, false);
      left.clear();
      for (int j = 0; j < made.size(); j++) {
        if (holds.get(j)) {
          left.add(made.get(j));
        }
      }
      bytes(cleaned(series, left));
    }
    assertThat(left).isEqualTo(kept);
    assertThat(Arrays.equals(bytes(cleaned(series, left)), after.get(2)))
        .as("seed %d", seed)
        .isTrue();
    assertThat(Arrays.equals(bytes(cleaned(series, List.of())), before))
        .as("seed %d", seed)
        .isTrue();
  }

  private static CleanedLog cleaned(InventedBoard board, List<Correction> corrections) {
    return cleaned(board.series(), corrections);
  }

  private static CleanedLog cleaned(LogSeries series, List<Correction> corrections) {
    return CleanedLog.of(
        new CorrectedSeries(series, corrections),
        Duration.ofMillis(InventedBoard.STEP),
        InventedBoard.ZONE,
        q -> Optional.empty());
  }

  private static byte[] bytes(CleanedLog log) {
    ByteBuffer bytes = ByteBuffer.allocate(1 << 20);
    bytes.putLong(log.rows());
    for (QuantityStatistics s : log.statistics().quantities()) {
      bytes.putLong(s.count()).putDouble(s.min()).putDouble(s.mean()).putDouble(s.max());
      bytes.putDouble(s.p95()).putDouble(s.p99());
      Arrays.stream(s.weekCount()).forEach(bytes::putLong);
      Arrays.stream(s.weekP95()).forEach(bytes::putDouble);
      Arrays.stream(s.weekP99()).forEach(bytes::putDouble);
      Arrays.stream(s.hourOfWeekMean()).forEach(bytes::putDouble);
    }
    bytes.put(log.log().toString().getBytes(java.nio.charset.StandardCharsets.UTF_8));
    return Arrays.copyOf(bytes.array(), bytes.position());
  }
}
