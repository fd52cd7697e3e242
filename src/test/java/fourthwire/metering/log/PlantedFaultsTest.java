package fourthwire.metering.log;

import static org.assertj.core.api.Assertions.assertThat;

import fourthwire.metering.Correction;
import fourthwire.metering.Period;
import fourthwire.metering.QualityFinding;
import java.time.Instant;
import java.util.List;
import java.util.function.BiConsumer;
import java.util.stream.Stream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;

/** Faults planted in logs of invented boards are found; clean days raise no alarm. */
class PlantedFaultsTest {
  private static final int PER_DAY = InventedBoard.PER_DAY;
  private static final long STEP = InventedBoard.STEP;
  private static final double TURN = 2 * Math.PI / 3;
  private static final long START = InventedBoard.START;

  @ParameterizedTest
  @ValueSource(longs = {1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12, 13, 14, 15, 16, 17, 18, 19, 20})
  void cleanDaysRaiseNoAlarm(long seed) {
    assertThat(new InventedBoard(seed, (int) (seed % 3)).reading().quality())
        .as("seed %d", seed)
        .isEmpty();
  }

  private static Arguments fault(
      String name, String code, int from, int to, BiConsumer<InventedBoard, int[]> plant) {
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
            "a block of rows written twice",
            QualityFinding.REPEATED_ROWS,
            d + 40,
            d + 60,
            (b, p) -> b.repeat(p[0], p[1])),
        fault(
            "a day written twice",
            QualityFinding.REPEATED_ROWS,
            d,
            d + PER_DAY,
            (b, p) -> b.repeat(p[0], p[1])),
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
            "a clamp turned for four hours",
            QualityFinding.REVERSED_CLAMP,
            d + 50,
            d + 74,
            PlantedFaultsTest::turn),
        fault(
            "a clamp turned for seventeen hours across midnight",
            QualityFinding.REVERSED_CLAMP,
            d + 112,
            d + 212,
            PlantedFaultsTest::turn),
        fault(
            "a clamp turned for fifteen hours",
            QualityFinding.REVERSED_CLAMP,
            d + 30,
            d + 120,
            PlantedFaultsTest::turn),
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
            "a power ten times what it can be, beside an apparent power",
            QualityFinding.WRONG_RATIO,
            d,
            e,
            (b, p) -> {
              b.apparent();
              b.columns.keySet().removeIf(name -> name.endsWith("power_factor"));
              b.scale("L1.active_w", p[0], p[1], 10);
              b.columns.remove("total.active_w");
            }),
        fault(
            "neutral above all lines",
            QualityFinding.NEUTRAL_NOT_SUM,
            d,
            e,
            (b, p) -> b.scale("N.rms_a", p[0], p[1], 15)),
        fault(
            "a total by a wrong ratio, beside volts and amps alone",
            QualityFinding.WRONG_RATIO,
            d,
            e,
            (b, p) -> {
              b.columns.keySet().removeIf(name -> name.matches("L..(active_w|power_factor)"));
              b.scale("total.active_w", p[0], p[1], 3);
            }),
        fault(
            "amps twice what they are, beside volts and watts alone",
            QualityFinding.WRONG_RATIO,
            d,
            e,
            (b, p) -> {
              b.columns.keySet().removeIf(name -> name.matches(".*(power_factor|_h\\d).*|N.*"));
              b.scale("L2.rms_a", p[0], p[1], 2);
            }),
        fault(
            "a neutral by another ratio for some days, beside amps alone",
            QualityFinding.NEUTRAL_NOT_SUM,
            d,
            e,
            (b, p) -> {
              b.columns.keySet().removeIf(name -> !name.endsWith("rms_a"));
              b.scale("N.rms_a", p[0], p[1], 0.1);
            }),
        fault(
            "amps twice what they are, on lines that feed back at noon",
            QualityFinding.WRONG_RATIO,
            d,
            e,
            (b, p) -> {
              feedBack(b);
              b.scale("L2.rms_a", p[0], p[1], 2);
            }),
        fault(
            "a neutral by another ratio all along, beside the orders of the lines",
            QualityFinding.NEUTRAL_NOT_SUM,
            0,
            InventedBoard.DAYS * InventedBoard.PER_DAY,
            (b, p) -> {
              b.columns.remove("N.current_h3_a");
              b.scale("N.rms_a", p[0], p[1], 3);
            }),
        fault(
            "a distortion smoothed over a day",
            QualityFinding.DISTORTION_MISREAD,
            d,
            e,
            (b, p) -> {
              for (int row = 0; row < b.times.size(); row++) {
                for (String name :
                    List.of(
                        "current_h3_a", "current_h5_a", "current_h7_a", "current_thd_percent")) {
                  b.scale("L1." + name, row, row + 1, 0.8 + 0.2 * Math.sin(row * Math.PI / 72));
                }
              }
              smooth(b.columns.get("L1.current_thd_percent"), p[0], p[1]);
            }),
        fault(
            "a line without volts for days",
            QualityFinding.WRONG_RATIO,
            d,
            e,
            (b, p) -> b.scale("L2.rms_v", p[0], p[1], 0)),
        fault(
            "a neutral by a tenth, beside percentages of harmonics",
            QualityFinding.NEUTRAL_NOT_SUM,
            d,
            e,
            (b, p) -> {
              for (String line : LineDay.LINES) {
                double[] percent = b.columns.get(line + ".current_h3_a");
                java.util.Arrays.setAll(
                    percent, k -> 100 * percent[k] / b.at(line + ".current_h1_a", k));
                b.columns.put(line + ".current_h3_percent", percent);
              }
              b.columns.keySet().removeIf(name -> name.matches(".*_h\\d_a"));
              b.scale("N.rms_a", p[0], p[1], 0.1);
            }),
        fault(
            "a distortion averaged otherwise",
            QualityFinding.DISTORTION_MISREAD,
            d,
            e,
            (b, p) -> b.scale("L1.current_thd_percent", p[0], p[1], 0.6)));
  }

  /** Volts, amps, watts and vars alone, less what roofs of panels make. */
  private static void feedBack(InventedBoard b) {
    for (String line : LineDay.LINES) {
      for (int row = 0; row < b.times.size(); row++) {
        double hour = row % InventedBoard.PER_DAY / 6.0;
        double volts = b.at(line + ".rms_v", row);
        double first = b.at(line + ".current_h1_a", row);
        double rest = b.at(line + ".rms_a", row) / first;
        double sun = 0.8 * Math.max(0, Math.sin((hour - 6) / 12 * Math.PI));
        double watts = b.at(line + ".active_w", row) * (1 - sun);
        double vars = 0.4 * volts * first;
        b.put(line + ".active_w", row, watts, 0);
        b.put(line + ".reactive_var", row, vars, 0);
        b.put(line + ".rms_a", row, rest * Math.hypot(watts, vars) / volts, 2);
      }
    }
    b.columns
        .keySet()
        .removeIf(name -> !name.matches("L\\d\\.(rms_v|rms_a|active_w|reactive_var)"));
  }

  private static void smooth(double[] x, int from, int to) {
    double[] raw = x.clone();
    for (int row = from; row < to; row++) {
      double mean = java.util.Arrays.stream(raw, row - 72, row + 72).average().orElseThrow();
      x[row] = Math.round(10 * mean) / 10.0;
    }
  }

  private static void turn(InventedBoard b, int[] p) {
    b.scale("L2.active_w", p[0], p[1], -1);
    b.scale("L2.power_factor", p[0], p[1], -1);
    for (int row = p[0]; row < p[1]; row++) {
      b.columns.get("total.active_w")[row] += 2 * b.at("L2.active_w", row);
    }
  }

  /** Power fed back around noon, on all lines or from a source on one, is no clamp. */
  @ParameterizedTest
  @ValueSource(longs = {21, 22, 23, 24, 25})
  void powerFedBackIsNoTurnedClamp(long seed) {
    for (List<String> fed : List.of(List.of("L1", "L2", "L3"), List.of("L2"))) {
      InventedBoard board = new InventedBoard(seed, 2);
      board.columns.keySet().removeIf(name -> name.matches(".*(_factor|_h\\d_a|_thd.*)|N.*"));
      for (int row = 0; row < board.times.size(); row++) {
        double sun = 2.5 * Math.max(0, Math.sin(Math.PI * (row % PER_DAY - 45) / 54.0));
        sun = row % PER_DAY < 45 || row % PER_DAY > 99 ? 0 : sun;
        for (String line : fed) {
          double volts = board.at(line + ".rms_v", row);
          double before = board.at(line + ".active_w", row);
          double after = Math.rint(before * (1 - sun));
          double amps = board.at(line + ".rms_a", row) * volts;
          double rest = Math.sqrt(Math.max(0, amps * amps - before * before));
          board.put(line + ".active_w", row, after, 0);
          board.put(line + ".rms_a", row, Math.hypot(after, rest) / volts, 2);
          board.columns.get("total.active_w")[row] += after - before;
        }
      }
      assertThat(board.reading().quality())
          .as("seed %d, %s", seed, fed)
          .noneMatch(f -> f.code().equals(QualityFinding.REVERSED_CLAMP));
    }
  }

  @ParameterizedTest(name = "{0}")
  @MethodSource("faults")
  void isFoundWhereItIs(
      String name, String code, int from, int to, BiConsumer<InventedBoard, int[]> plant) {
    for (long seed = 21; seed < 26; seed++) {
      InventedBoard board = new InventedBoard(seed, 2);
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

  /** A fault's time is that of the rows which its correction mends, not of whole days. */
  @ParameterizedTest
  @ValueSource(longs = {21, 22, 23})
  void aFaultLastsAsLongAsTheRowsMended(long seed) {
    InventedBoard board = new InventedBoard(seed, 2);
    board.scale("L2.active_w", 400, 820, -1);
    board.scale("L2.power_factor", 400, 820, -1);
    board.columns.remove("total.active_w");
    Period period = board.reading().quality().get(0).period().orElseThrow();
    assertThat(period.from()).isEqualTo(Instant.ofEpochMilli(START + STEP * 400));
    assertThat(period.to()).isEqualTo(Instant.ofEpochMilli(START + STEP * 820));
  }

  /** Lines exchanged between two rows are exchanged back in just these, whatever powers show it. */
  @ParameterizedTest
  @ValueSource(strings = {"power_factor", "active_w", "crossed"})
  void linesExchangedForSomeDaysAreMendedInTheirRows(String shown) {
    InventedBoard board = new InventedBoard(21, 2);
    board.columns.keySet().removeIf(name -> name.matches(".*(_h\\d_a|_thd.*)|N.*"));
    board.columns.keySet().removeIf(name -> name.contains("factor") && !name.contains(shown));
    board.swap("L1.rms_a", "L3.rms_a", 353, 820);
    for (int row = 353; row < 820 && shown.equals("crossed"); row++) {
      double phi = Math.acos(0.92);
      board.put("L1.active_w", row, voltAmps(board, "L1", row) * Math.cos(TURN + phi), 0);
      board.put("L3.active_w", row, voltAmps(board, "L3", row) * Math.cos(TURN - phi), 0);
      board.put("L2.active_w", row, voltAmps(board, "L2", row) * 0.92, 0);
    }
    board.columns.remove("total.active_w");
    assertThat(board.reading().quality())
        .singleElement()
        .satisfies(
            f -> {
              assertThat(f.code()).isEqualTo(QualityFinding.SWAPPED_LINES);
              Period period = f.period().orElseThrow();
              assertThat(period.from()).isEqualTo(Instant.ofEpochMilli(START + STEP * 353));
              assertThat(period.to()).isEqualTo(Instant.ofEpochMilli(START + STEP * 820));
              assertThat(f.corrections().get(0).sentence()).startsWith("Exchange L1 and L3");
            });
  }

  private static double voltAmps(InventedBoard board, String line, int row) {
    return board.at(line + ".rms_v", row) * board.at(line + ".rms_a", row);
  }

  /** A neutral by a tenth or tenfold between two rows is mended in these, by the round factor. */
  @ParameterizedTest
  @ValueSource(doubles = {10, 0.1})
  void aNeutralOfAnotherRatioIsToldOnceByItsRows(double factor) {
    InventedBoard board = new InventedBoard(21, 2);
    board.scale("N.rms_a", 497, 936, factor);
    assertThat(board.reading().quality())
        .singleElement()
        .satisfies(
            f -> {
              Period period = f.period().orElseThrow();
              assertThat(period.from()).isEqualTo(Instant.ofEpochMilli(START + STEP * 497));
              assertThat(period.to()).isEqualTo(Instant.ofEpochMilli(START + STEP * 936));
              assertThat(f.corrections().get(0).sentence())
                  .isEqualTo("Multiply N.rms_a by " + (factor > 1 ? "0.1" : "10"));
            });
  }

  /**
   * Where the orders of the lines tell a neutral's ratio, it is offered ahead of leaving it out.
   */
  @ParameterizedTest
  @ValueSource(doubles = {10, 5, 0.1})
  void aNeutralOfAnotherRatioAllAlongIsMended(double factor) {
    InventedBoard board = new InventedBoard(21, 3);
    board.columns.remove("N.current_h3_a");
    board.scale("N.rms_a", 0, board.times.size(), factor);
    assertThat(board.reading().quality())
        .singleElement()
        .satisfies(
            f -> {
              assertThat(f.code()).isEqualTo(QualityFinding.NEUTRAL_NOT_SUM);
              assertThat(f.corrections().get(0).sentence())
                  .isEqualTo("Multiply N.rms_a by " + LikelyRatio.text(1 / factor));
            });
  }

  /** A clock set and later set back by as much moves the rows between, no others. */
  @ParameterizedTest
  @ValueSource(longs = {180, -17, -60, 13})
  void aClockSetForAWhileIsToldOnce(long minutes) {
    InventedBoard board = new InventedBoard(21, 2);
    for (int row = 504; row < 792; row++) {
      board.times.set(row, board.times.get(row) + 60_000 * minutes);
    }
    assertThat(board.reading().quality())
        .singleElement()
        .satisfies(
            f -> {
              assertThat(f.code()).isEqualTo(QualityFinding.CLOCK_JUMP);
              assertThat(f.corrections().get(0).steps())
                  .containsExactly(
                      new Correction.ShiftClock(-60_000 * minutes, new Correction.Rows(504, 792)));
            });
  }

  /** Amps by a fifth beside watts alone: five is offered, not five times the power factor. */
  @ParameterizedTest
  @ValueSource(booleans = {true, false})
  void theRatioOfAmpsLeavesAPowerFactor(boolean neutralToo) {
    InventedBoard board = new InventedBoard(24, 2);
    board.columns.keySet().removeIf(name -> name.matches(".*(_factor|_h\\d_a|_thd.*)"));
    for (String line : neutralToo ? List.of("L1", "L2", "L3", "N") : List.of("L1", "L2", "L3")) {
      board.scale(line + ".rms_a", 497, 936, 0.2);
    }
    List<QualityFinding> found = board.reading().quality();
    assertThat(found)
        .singleElement()
        .extracting(QualityFinding::code)
        .isEqualTo(QualityFinding.WRONG_RATIO);
    assertThat(found.get(0).corrections())
        .extracting(Correction::sentence)
        .first()
        .isEqualTo(
            "Multiply L1.rms_a, L2.rms_a"
                + (neutralToo ? ", L3.rms_a and N.rms_a by 5" : " and L3.rms_a by 5"));
  }

  /** A total that is right proves which line's watts are not, and that its amps are. */
  @ParameterizedTest
  @ValueSource(longs = {21, 22, 23})
  void aTotalProvesTheWattsOfALineWrong(long seed) {
    InventedBoard board = new InventedBoard(seed, 2);
    board.columns.keySet().removeIf(name -> name.matches(".*(_factor|_h\\d_a|_thd.*)|N.*"));
    board.scale("L2.active_w", 497, 936, 2);
    assertThat(board.reading().quality())
        .as("seed %d", seed)
        .singleElement()
        .satisfies(
            f ->
                assertThat(f.corrections())
                    .extracting(Correction::sentence)
                    .containsExactly("Multiply L2.active_w by 0.5"));
  }

  /** A total by a twentieth leaves a power factor that no load has all day. */
  @ParameterizedTest
  @ValueSource(longs = {21, 22, 23})
  void aTotalOfNextToNoPowerFactorIsOfAWrongRatio(long seed) {
    InventedBoard board = new InventedBoard(seed, 2);
    board.columns.keySet().removeIf(name -> name.matches("L.\\.active_w|.*(_factor|_thd.*)|N.*"));
    board.scale("total.active_w", 0, board.times.size(), 0.05);
    assertThat(board.reading().quality())
        .as("seed %d", seed)
        .singleElement()
        .satisfies(
            f ->
                assertThat(f.corrections().get(0).sentence())
                    .isEqualTo("Multiply total.active_w by 20"));
  }

  /** A clock that is fast by forty seconds a day, written to the second; jitter is no drift. */
  @ParameterizedTest
  @ValueSource(longs = {40, 0})
  void aClockThatRunsFastIsFound(long secondsADay) {
    InventedBoard board = new InventedBoard(21, 2);
    java.util.Random random = new java.util.Random(21);
    for (int row = 0; row < board.times.size(); row++) {
      long drift = Math.round((double) secondsADay * row / PER_DAY);
      long jitter = secondsADay == 0 ? random.nextInt(20) : 0;
      board.times.set(row, board.times.get(row) + 1000 * (drift + jitter));
    }
    List<QualityFinding> found = board.reading().quality();
    assertThat(found).hasSize(secondsADay == 0 ? 0 : 1);
    assertThat(found)
        .allSatisfy(
            f -> {
              assertThat(f.code()).isEqualTo(QualityFinding.CLOCK_JUMP);
              assertThat(f.sentence()).contains("longer than the interval", "40 s a day", "fast");
            });
  }

  /** A source of a line's own that feeds back as much as it took, each midday, is no clamp. */
  @ParameterizedTest
  @ValueSource(longs = {21, 22})
  void aSourceOfTheSameHoursIsNoTurnedClamp(long seed) {
    InventedBoard board = new InventedBoard(seed, 2);
    for (int row = 0; row < board.times.size(); row++) {
      if (row % PER_DAY >= 60 && row % PER_DAY < 90) {
        turn(board, new int[] {row, row + 1});
      }
    }
    assertThat(board.reading().quality()).as("seed %d", seed).isEmpty();
  }

  /** Where all amps are five times too large, N is offered the same factor as the lines. */
  @ParameterizedTest
  @ValueSource(longs = {21, 22, 23})
  void allClampsOfOneRatioAreMendedWithN(long seed) {
    InventedBoard board = new InventedBoard(seed, 2);
    board.apparent();
    board.columns.forEach(
        (name, x) -> {
          if (name.matches(".*\\.(rms_a|current_h\\d_a)")) {
            board.scale(name, 0, x.length, 5);
          }
        });
    List<QualityFinding> found = board.reading().quality();
    assertThat(found)
        .as("seed %d: %s", seed, found)
        .anyMatch(
            f ->
                f.corrections().stream()
                    .anyMatch(
                        c ->
                            c.sentence()
                                .equals(
                                    "Multiply L1.rms_a, L2.rms_a, L3.rms_a and N.rms_a, with their"
                                        + " harmonics, by 0.2")));
    assertThat(found).filteredOn(f -> f.code().equals(QualityFinding.WRONG_RATIO)).hasSize(1);
  }

  /** An hour that is missing is a pause, or a clock set to summer time: either is offered. */
  @ParameterizedTest
  @ValueSource(longs = {21, 22})
  void anHourOnIsToldAsBoth(long seed) {
    InventedBoard board = new InventedBoard(seed, 2);
    board.times.replaceAll(t -> t >= START + STEP * 500 ? t + 3_600_000 : t);
    assertThat(board.reading().quality())
        .as("seed %d", seed)
        .extracting(QualityFinding::code)
        .containsExactlyInAnyOrder(QualityFinding.CLOCK_JUMP, QualityFinding.GAP);
  }

  /** A generator that rests has neither volts nor frequency; a small load has few digits. */
  @ParameterizedTest
  @ValueSource(longs = {24, 25, 26})
  void whatRestsRaisesNoAlarm(long seed) {
    InventedBoard board = new InventedBoard(seed, 1);
    for (int row = 0; row < board.times.size(); row++) {
      boolean off = row % PER_DAY < 110 || row / PER_DAY % 7 > 4;
      double load = seed == 25 ? 0.0004 : off ? 0 : 1;
      for (String name : List.copyOf(board.columns.keySet())) {
        boolean volts = name.matches(".*rms_v|frequency_hz") && seed != 25;
        boolean amps = name.matches(".*(_a|_w)");
        if (off && (volts || amps || name.endsWith("_percent")) && seed != 26 || amps && off) {
          int decimals = name.endsWith("_w") ? 0 : name.contains("_h") ? 3 : 1;
          double at = name.endsWith("_percent") ? 0 : board.at(name, row) * load;
          board.put(name, row, at, decimals);
        }
      }
    }
    assertThat(board.reading().quality()).as("seed %d", seed).isEmpty();
  }

  /** Means over a day, two hours, or all lines, written in every row. */
  @ParameterizedTest
  @ValueSource(ints = {PER_DAY, 12, 0})
  void aDistortionAveragedOverLongerIsFound(int rows) {
    InventedBoard board = new InventedBoard(21, 2);
    board.columns.keySet().removeIf(name -> name.matches(".*_h\\d+_.*"));
    double[] thd = board.columns.get("L1.current_thd_percent");
    for (int from = 0; from < thd.length && rows > 0; from += rows) {
      double mean = java.util.Arrays.stream(thd, from, from + rows).average().orElseThrow();
      java.util.Arrays.fill(thd, from, from + rows, Math.round(100 * mean) / 100.0);
    }
    if (rows == 0) {
      board.columns.put("L2.current_thd_percent", thd.clone());
      board.columns.put("L3.current_thd_percent", thd.clone());
    }
    assertThat(board.reading().quality())
        .singleElement()
        .satisfies(
            f -> {
              assertThat(f.code()).isEqualTo(QualityFinding.DISTORTION_MISREAD);
              assertThat(f.sentence()).startsWith("L1.current_thd_percent");
              assertThat(f.corrections()).hasSize(1);
            });
  }

  /** A clock set forward by what is no whole interval is told once, and the way back offered. */
  @ParameterizedTest
  @ValueSource(longs = {21, 22, 23})
  void aClockSetForwardIsToldOnce(long seed) {
    InventedBoard board = new InventedBoard(seed, 2);
    board.times.replaceAll(t -> t >= START + STEP * 500 ? t + 13 * 60_000 : t);
    assertThat(board.reading().quality())
        .as("seed %d", seed)
        .singleElement()
        .satisfies(
            f -> {
              assertThat(f.code()).isEqualTo(QualityFinding.CLOCK_JUMP);
              assertThat(f.sentence()).contains("set forward by 13 min");
              assertThat(f.corrections().get(0).sentence())
                  .isEqualTo("Set the rows after the jump 13 min earlier");
            });
  }

  /** The sentence of a clock set back names what its button does. */
  @ParameterizedTest
  @ValueSource(longs = {21, 22, 23})
  void aClockSetBackIsTimedFromTheStepThatIsDue(long seed) {
    InventedBoard board = new InventedBoard(seed, 2);
    board.times.replaceAll(t -> t >= START + STEP * 500 ? t - 47 * 60_000 : t);
    assertThat(board.reading().quality())
        .as("seed %d", seed)
        .singleElement()
        .satisfies(
            f -> {
              assertThat(f.sentence()).contains("a step of 10 min is due", "set back by 47 min");
              assertThat(f.corrections().get(0).sentence())
                  .isEqualTo("Set the rows after the jump 47 min later");
            });
  }

  /** Blocks written twice are no clock set back, and leave no gap. */
  @ParameterizedTest
  @ValueSource(longs = {21, 22, 23})
  void aBlockWrittenTwiceIsToldOnce(long seed) {
    InventedBoard board = new InventedBoard(seed, 2);
    board.repeat(480, 500);
    board.repeat(2000, 2000 + PER_DAY);
    assertThat(board.reading().quality())
        .as("seed %d", seed)
        .singleElement()
        .satisfies(
            f -> {
              assertThat(f.code()).isEqualTo(QualityFinding.REPEATED_ROWS);
              assertThat(f.sentence()).startsWith("164 rows stand in the file a second time");
              assertThat(f.corrections()).hasSize(1);
            });
  }

  /** They share time, and neither begins a day before the other. */
  private static boolean overlaps(Period found, Period planted) {
    return !found.from().isAfter(planted.to())
        && !found.to().isBefore(planted.from())
        && found.from().isAfter(planted.from().minusSeconds(90_000));
  }
}
