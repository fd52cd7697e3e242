package fourthwire.metering.assess;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import fourthwire.metering.assess.PeriodFigures.Outcome;
import fourthwire.metering.assess.PeriodFigures.Span;
import fourthwire.metering.series.LogChunk;
import fourthwire.metering.series.LogSeries;
import fourthwire.metering.series.Parts;
import java.time.Duration;
import java.time.Instant;
import java.util.Arrays;
import java.util.List;
import java.util.Random;
import java.util.function.IntToDoubleFunction;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * Values and periods of IEEE 519-2022 (4.2 to 4.5) and IEC 61000-4-30:2015 (4.5): 200 values of 3 s
 * make one of 10 min by root mean square; a day has 28,800 of the first, a week 1,008 of the
 * second.
 */
class PeriodFiguresTest {
  private static final Instant START = Instant.parse("2026-03-03T10:40:00Z");

  private static LogSeries log(int seconds, int rows, IntToDoubleFunction value) {
    LogSeries series = new LogSeries(List.of("L1.voltage_thd_percent"), Parts.held(), 1 << 24);
    for (int from = 0; from < rows; from += LogChunk.ROWS) {
      int count = Math.min(LogChunk.ROWS, rows - from);
      long[] times = new long[count];
      double[] values = new double[count];
      for (int k = 0; k < count; k++) {
        times[k] = START.toEpochMilli() + 1000L * seconds * (from + k);
        values[k] = value.applyAsDouble(from + k);
      }
      series.add(new LogChunk(times, new double[][] {values}), Runnable::run);
    }
    return series;
  }

  private static List<PeriodFigures> figures(LogSeries log, int seconds, Span span) {
    return PeriodFigures.of(log, k -> log.values(k, 0), Duration.ofSeconds(seconds), span);
  }

  @Test
  void aWeekThatBeganOnAnyDayIsWhole() {
    List<PeriodFigures> weeks = figures(log(600, 1008 + 100, k -> k), 600, Span.WEEK);
    assertThat(weeks).hasSize(2);
    assertThat(weeks.get(0).from()).isEqualTo(START);
    assertThat(weeks.get(0).sharePercent()).isEqualTo(100);
    assertThat(weeks.get(0).percentile(95)).isCloseTo(0.95 * 1007, within(1e-9));
    assertThat(weeks.get(1).there()).isEqualTo(100);
    assertThat(weeks.get(1).sharePercent()).isCloseTo(100 * 100 / 1008.0, within(1e-9));
  }

  @ParameterizedTest
  @ValueSource(ints = {3, 10, 60, 300})
  void shorterRowsMakeTenMinutesByRootMeanSquare(int seconds) {
    int rows = 3 * 600 / seconds;
    List<PeriodFigures> weeks =
        figures(log(seconds, rows, k -> k % 2 == 0 ? 3 : 4), seconds, Span.WEEK);
    double mean = seconds == 300 || rows % 2 == 0 ? Math.sqrt(12.5) : 0;
    assertThat(weeks.get(0).there()).isEqualTo(3);
    assertThat(weeks.get(0).percentile(50)).isCloseTo(mean, within(1e-9));
  }

  @Test
  void aDayOfThreeSecondValues() {
    List<PeriodFigures> days = figures(log(3, 28_800, k -> k), 3, Span.DAY);
    assertThat(days).hasSize(1);
    assertThat(days.get(0).needed()).isEqualTo(28_800);
    assertThat(days.get(0).percentile(99)).isCloseTo(0.99 * 28_799, within(1e-6));
    assertThat(Span.DAY.canBeMadeOf(Duration.ofSeconds(600))).isFalse();
    assertThat(Span.WEEK.canBeMadeOf(Duration.ofMinutes(15))).isFalse();
  }

  @Test
  void tenMinutesOfWhichMuchIsMissingAreNone() {
    List<PeriodFigures> weeks =
        figures(log(60, 30, k -> k >= 10 && k < 12 ? Double.NaN : 1), 60, Span.WEEK);
    assertThat(weeks.get(0).there()).isEqualTo(2);
  }

  /** Of 1,008 values 50 may be over a limit that 95 % must keep. */
  @Test
  void aVerdictStandsOnlyWhereTheMissingCouldNotTurnIt() {
    assertThat(outcome(1008, 50)).isEqualTo(Outcome.WITHIN);
    assertThat(outcome(1008, 51)).isEqualTo(Outcome.OVER);
    assertThat(outcome(605, 51)).as("60 % there, over already").isEqualTo(Outcome.OVER);
    assertThat(outcome(605, 0)).as("60 % there, none over").isEqualTo(Outcome.OPEN);
    assertThat(outcome(970, 10)).as("48 could be").isEqualTo(Outcome.WITHIN);
    assertThat(outcome(970, 13)).as("51 could be").isEqualTo(Outcome.OPEN);
  }

  private static Outcome outcome(int there, int over) {
    List<PeriodFigures> weeks =
        figures(log(600, 1008, k -> k >= there ? Double.NaN : k < over ? 9 : 5), 600, Span.WEEK);
    return weeks.get(0).judge(Double.NEGATIVE_INFINITY, 8, 95);
  }

  /** Certain verdicts are those of every way to fill what is missing; the rest are not. */
  @ParameterizedTest
  @ValueSource(longs = {1, 2, 3, 4, 5, 6, 7, 8})
  void noFillingTurnsAVerdict(long seed) {
    Random random = new Random(seed);
    double[] values = new double[1008];
    Arrays.setAll(values, k -> random.nextDouble() < 0.06 ? 9 : 5);
    double lost = 0.1 * random.nextDouble();
    double[] seen = values.clone();
    for (int k = 0; k < seen.length; k++) {
      seen[k] = random.nextDouble() < lost ? Double.NaN : seen[k];
    }
    Outcome partly =
        figures(log(600, 1008, k -> seen[k]), 600, Span.WEEK)
            .get(0)
            .judge(Double.NEGATIVE_INFINITY, 8, 95);
    Outcome low = filled(seen, 5);
    Outcome high = filled(seen, 9);
    assertThat(partly).as("seed %d", seed).isEqualTo(low == high ? low : Outcome.OPEN);
  }

  private static Outcome filled(double[] seen, double value) {
    return figures(log(600, 1008, k -> Double.isNaN(seen[k]) ? value : seen[k]), 600, Span.WEEK)
        .get(0)
        .judge(Double.NEGATIVE_INFINITY, 8, 95);
  }
}
