package fourthwire.metering.assess;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import fourthwire.metering.series.LogChunk;
import fourthwire.metering.series.LogSeries;
import fourthwire.metering.series.Parts;
import java.time.Duration;
import java.time.ZoneId;
import java.time.ZonedDateTime;
import java.util.Arrays;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/**
 * I_L after IEEE 519-2022, 3.1: the currents at the maximum demand of each of the twelve preceding
 * months, added up and divided by twelve. Peaks are planted, so that the answer is their mean.
 */
class DemandCurrentTest {
  private static final ZoneId ZONE = ZoneId.of("Europe/Vienna");
  private static final ZonedDateTime START = ZonedDateTime.of(2025, 1, 1, 0, 0, 0, 0, ZONE);

  /** A base of 20 to 30 A; in each month one half hour of a peak. */
  private static LogSeries log(int minutes, int months, boolean fundamental, double[] peaks) {
    Random random = new Random(5);
    ZonedDateTime end = START.plusMonths(months);
    int rows = (int) (Duration.between(START, end).toMinutes() / minutes);
    long[] times = new long[rows];
    double[] amps = new double[rows];
    for (int k = 0; k < rows; k++) {
      times[k] = START.toInstant().toEpochMilli() + 60_000L * minutes * k;
      amps[k] = 20 + 10 * random.nextDouble();
    }
    for (int m = 0; m < peaks.length; m++) {
      long from = START.plusMonths(m).plusDays(9).plusHours(11).toInstant().toEpochMilli();
      for (int k = 0; k < rows; k++) {
        amps[k] = times[k] >= from && times[k] < from + 1_800_000 ? peaks[m] : amps[k];
      }
    }
    double[] low = Arrays.stream(amps).map(a -> 0.5 * a).toArray();
    List<String> names =
        fundamental
            ? List.of("L1.current_h1_a", "L2.current_h1_a", "L1.rms_a")
            : List.of("L1.rms_a", "L2.rms_a", "L1.current_thd_percent");
    double[] third = new double[rows];
    Arrays.fill(third, fundamental ? 999 : 75);
    LogSeries series = new LogSeries(names, Parts.held(), 1 << 24);
    for (int from = 0; from < rows; from += LogChunk.ROWS) {
      int to = Math.min(rows, from + LogChunk.ROWS);
      series.add(
          new LogChunk(
              Arrays.copyOfRange(times, from, to),
              new double[][] {
                Arrays.copyOfRange(amps, from, to),
                Arrays.copyOfRange(low, from, to),
                Arrays.copyOfRange(third, from, to)
              }),
          Runnable::run);
    }
    return series;
  }

  private static final double[] PEAKS = {60, 62, 70, 75, 80, 95, 99, 97, 85, 70, 65, 61};

  @ParameterizedTest
  @CsvSource({"5", "10", "15", "30"})
  void aYearGivesTheMeanOfItsTwelvePeaks(int minutes) {
    DemandCurrent found =
        DemandCurrent.of(log(minutes, 12, true, PEAKS), Duration.ofMinutes(minutes), ZONE);
    assertThat(found.amps().value().orElseThrow())
        .isCloseTo(Arrays.stream(PEAKS).average().orElseThrow(), within(1e-9));
    assertThat(found.basis()).contains(minutes % 10 == 0 ? "30 min" : "15 min", "as logged");
  }

  /** Of fourteen months the last twelve count. */
  @Test
  void ofALongerLogTheLastTwelveMonthsCount() {
    double[] peaks = new double[14];
    Arrays.fill(peaks, 50);
    peaks[0] = 500;
    peaks[1] = 400;
    peaks[13] = 62;
    DemandCurrent found = DemandCurrent.of(log(15, 14, true, peaks), Duration.ofMinutes(15), ZONE);
    assertThat(found.amps().value().orElseThrow()).isCloseTo(51, within(1e-9));
  }

  /** I1 = I / √(1 + THD²): 75 % makes 0.8. */
  @Test
  void withoutFundamentalsRmsIsClearedOfItsDistortion() {
    DemandCurrent found = DemandCurrent.of(log(15, 12, false, PEAKS), Duration.ofMinutes(15), ZONE);
    double mean = Arrays.stream(PEAKS).average().orElseThrow();
    assertThat(found.amps().value().orElseThrow())
        .as("L2 has no distortion logged and half the amps")
        .isCloseTo(0.8 * mean, within(1e-9));
  }

  @Test
  void whatIsTooShortOrTooCoarseOrHasHolesSaysSo() {
    assertThat(
            DemandCurrent.of(log(15, 3, true, PEAKS), Duration.ofMinutes(15), ZONE).amps().reason())
        .contains("of the twelve months");
    assertThat(
            DemandCurrent.of(log(60, 12, true, PEAKS), Duration.ofMinutes(60), ZONE)
                .amps()
                .reason())
        .contains("3600 s");
    LogSeries whole = log(15, 12, true, PEAKS);
    LogSeries holes = new LogSeries(whole.quantities(), Parts.held(), 1 << 24);
    for (int k = 0; k < whole.chunks(); k++) {
      double[][] values = new double[3][];
      for (int q = 0; q < 3; q++) {
        values[q] = whole.values(k, q).clone();
        Arrays.fill(values[q], 0, k == 4 ? 400 : 0, Double.NaN);
      }
      holes.add(new LogChunk(whole.startMillis(k), values), Runnable::run);
    }
    assertThat(DemandCurrent.of(holes, Duration.ofMinutes(15), ZONE).amps().reason())
        .contains("% of the demand is there");
  }
}
