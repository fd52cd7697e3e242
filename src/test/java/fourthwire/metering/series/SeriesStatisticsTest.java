package fourthwire.metering.series;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.time.Instant;
import java.time.ZoneId;
import java.util.Arrays;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** Statistics against numpy 1.24.2: percentile(x, q) with its linear method, and mean. */
class SeriesStatisticsTest {
  private static final ZoneId AMSTERDAM = ZoneId.of("Europe/Amsterdam");

  /** Rows of ten minutes from a Monday on. */
  private static LogSeries series(double[] x, long mostHeld) {
    LogSeries series = new LogSeries(List.of("L1.rms_a"), Parts.held(), mostHeld);
    long start = Instant.parse("2025-01-05T23:00:00Z").toEpochMilli();
    for (int from = 0; from < x.length; from += LogChunk.ROWS) {
      int first = from;
      double[] values = Arrays.copyOfRange(x, from, Math.min(x.length, from + LogChunk.ROWS));
      long[] times = new long[values.length];
      Arrays.setAll(times, k -> start + 600_000L * (first + k));
      series.add(new LogChunk(times, new double[][] {values}), Runnable::run);
    }
    return series;
  }

  @ParameterizedTest
  @CsvSource({
    "21, 315.6666666666667, 323.4, 162.66666666666669",
    "100, 322.73333333333335, 333.68, 169.52999999999997",
    "757, 319.06666666666666, 332.47999999999996, 168.0202553940995"
  })
  void percentilesAreLinear(int count, double p95, double p99, double mean) {
    double[] x = new double[count];
    Arrays.setAll(x, k -> (k * 7919 % 1009) / 3.0);
    QuantityStatistics s = SeriesStatistics.of(series(x, 1 << 20), AMSTERDAM).quantities().get(0);
    assertThat(s.p95()).isEqualTo(p95, within(1e-9));
    assertThat(s.p99()).isEqualTo(p99, within(1e-9));
    assertThat(s.mean()).isEqualTo(mean, within(1e-9));
  }

  /** numpy.percentile([1, 2, 3, 4], 95) is 3.85. */
  @Test
  void blanksAreLeftOut() {
    double[] x = {4, Double.NaN, 1, 3, 2};
    QuantityStatistics s = SeriesStatistics.of(series(x, 100), AMSTERDAM).quantities().get(0);
    assertThat(s.count()).isEqualTo(4);
    assertThat(s.p95()).isEqualTo(3.85, within(1e-12));
    double[] none = {Double.NaN};
    assertThat(SeriesStatistics.of(series(none, 9), AMSTERDAM).quantities().get(0).count())
        .isZero();
  }

  /** Each week and hour as sorting tells; in one array and in passes alike. */
  @ParameterizedTest
  @ValueSource(longs = {1, 2, 3})
  void weeksAndHoursAreThoseOfTheRows(long seed) {
    Random random = new Random(seed);
    double[] x = new double[9000];
    Arrays.setAll(
        x,
        k -> random.nextInt(50) == 0 ? Double.NaN : Math.round(random.nextGaussian() * 1e4) / 1e3);
    LogSeries series = series(x, seed == 1 ? 0 : 1 << 20);
    QuantityStatistics s = SeriesStatistics.of(series, AMSTERDAM).quantities().get(0);
    for (int week = 0; week < 9; week++) {
      double[] rows =
          Arrays.stream(Arrays.copyOfRange(x, 1008 * week, Math.min(9000, 1008 * week + 1008)))
              .filter(v -> !Double.isNaN(v))
              .sorted()
              .toArray();
      double at = (rows.length - 1) * 0.95;
      double expected = rows[(int) at] + (at - (int) at) * (rows[(int) at + 1] - rows[(int) at]);
      assertThat(s.weekP95()[week])
          .as("seed %d week %d", seed, week)
          .isEqualTo(expected, within(1e-12));
      assertThat(s.weekCount()[week]).isEqualTo(rows.length);
    }
    assertThat(new RankSearch(series, 0).percentiles(95, 99)).containsExactly(s.p95(), s.p99());
  }

  /** A clock that is set back by ten days: weeks are those of the times, whatever the order. */
  @ParameterizedTest
  @ValueSource(longs = {11, 12})
  void weeksThatComeAgainAreOne(long seed) {
    Random random = new Random(seed);
    double[] x = random.doubles(9000).toArray();
    LogSeries straight = series(x, seed == 11 ? 0 : 1 << 20);
    LogSeries turned = new LogSeries(List.of("L1.rms_a"), Parts.held(), seed == 11 ? 0 : 1 << 20);
    for (int k : new int[] {1, 0, 2}) {
      double[][] values = {straight.values(k, 0)};
      turned.add(new LogChunk(straight.startMillis(k), values), Runnable::run);
    }
    QuantityStatistics a = SeriesStatistics.of(straight, AMSTERDAM).quantities().get(0);
    QuantityStatistics b = SeriesStatistics.of(turned, AMSTERDAM).quantities().get(0);
    assertThat(b.weekCount()).as("seed %d", seed).containsExactly(a.weekCount());
    assertThat(b.weekP95()).containsExactly(a.weekP95());
    assertThat(b.weekP99()).containsExactly(a.weekP99());
    assertThat(b.p95()).isEqualTo(a.p95());
    assertThat(b.hourOfWeekMean()).containsExactly(a.hourOfWeekMean(), within(1e-12));
  }

  /** The highest twentieth tells what sorting all tells, in whatever order and however alike. */
  @ParameterizedTest
  @ValueSource(longs = {21, 22, 23, 24, 25, 26})
  void theHighestTellThePercentiles(long seed) {
    Random random = new Random(seed);
    double[] x = random.doubles(1 + random.nextInt(20_000)).toArray();
    for (int k = 0; k < x.length; k++) {
      x[k] = seed % 3 == 0 ? k : seed % 3 == 1 ? Math.rint(20 * x[k]) : x[k];
    }
    Highest highest = new Highest(x.length + random.nextInt(100));
    for (int from = 0; from < x.length; from += 1000) {
      highest.take(x, from, Math.min(x.length, from + 1000));
    }
    double[] found = highest.percentiles(95, 99);
    Arrays.sort(x);
    assertThat(found).as("seed %d", seed).containsExactly(linear(x, 95), linear(x, 99));
  }

  private static double linear(double[] sorted, double percent) {
    double at = (sorted.length - 1) * percent / 100;
    int below = (int) at;
    double above = sorted[Math.min(below + 1, sorted.length - 1)];
    return sorted[below] + (at - below) * (above - sorted[below]);
  }

  @ParameterizedTest
  @ValueSource(longs = {4, 5, 6, 7, 8, 9})
  void columnsComeBackAsTheyWere(long seed) {
    Random random = new Random(seed);
    int decimals = (int) (seed % 5);
    double[] x = new double[1000 + random.nextInt(3000)];
    for (int k = 0; k < x.length; k++) {
      double v = Math.round(random.nextGaussian() * 1e6) / Math.pow(10, decimals);
      x[k] = random.nextInt(40) == 0 ? Double.NaN : seed == 9 ? v * Math.PI : v;
    }
    assertThat(ColumnCodec.decode(ColumnCodec.encode(x), x.length))
        .as("seed %d", seed)
        .containsExactly(x);
    long[] times = new long[x.length];
    Arrays.setAll(times, k -> 1_700_000_000_000L + 60_000L * k + (k > 500 ? 3_600_000 : 0));
    byte[] coded = ColumnCodec.encode(times);
    assertThat(ColumnCodec.decodeWhole(coded, times.length)).containsExactly(times);
    assertThat(coded.length).isLessThan(times.length);
  }
}
