package fourthwire.metering.reduce;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.time.DayOfWeek;
import java.time.Instant;
import java.time.LocalDate;
import java.time.ZoneId;
import java.time.ZonedDateTime;
import java.time.temporal.TemporalAdjusters;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.DoubleSummaryStatistics;
import java.util.List;
import java.util.Map;
import java.util.Random;
import java.util.TreeMap;
import java.util.function.Function;
import java.util.stream.IntStream;
import java.util.stream.LongStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * Reductions against the plain way: every row put into its step by the calendar of {@code
 * java.time}, summed up by its own statistics. The rows run over both changes of the clocks, with
 * gaps, repeats, blanks and a jump back.
 */
class ReductionTest {
  private static final ZoneId VIENNA = ZoneId.of("Europe/Vienna");
  private static final int CHUNK = 1000;

  /** Rows in chunks, as they are stored. */
  private record Rows(long[] starts, double[] values) implements LogSpan.Source {
    @Override
    public List<long[]> times() {
      return IntStream.range(0, (starts.length + CHUNK - 1) / CHUNK)
          .mapToObj(k -> Arrays.copyOfRange(starts, k * CHUNK, end(k)))
          .toList();
    }

    private int end(int chunk) {
      return Math.min(starts.length, (chunk + 1) * CHUNK);
    }

    @Override
    public void values(String quantity, int first, int last, LogSpan.ChunkTaker taker) {
      for (int k = first; k <= Math.min(last, (starts.length - 1) / CHUNK); k++) {
        taker.take(k, Arrays.copyOfRange(values, k * CHUNK, end(k)));
      }
    }
  }

  private static Rows random(long seed, String from, int rows, long intervalMillis) {
    Random random = new Random(seed);
    long at = Instant.parse(from).toEpochMilli();
    long[] times = new long[rows];
    double[] values = new double[rows];
    for (int k = 0; k < rows; k++) {
      times[k] = at;
      values[k] = random.nextInt(20) == 0 ? Double.NaN : 50 + 20 * random.nextGaussian();
      int what = random.nextInt(500);
      long steps = what == 0 ? random.nextInt(300) : what == 1 ? 0 : what == 2 ? -7 : 1;
      at += steps * intervalMillis;
    }
    return new Rows(times, values);
  }

  @ParameterizedTest(name = "seed {0}: {1} rows of {2} s in at most {3} steps of {4}")
  @CsvSource({
    "1, 9000, 60, 1300, PT10M",
    "2, 9000, 60, 200, PT1H",
    "3, 9000, 600, 1200, PT2H",
    "4, 20000, 600, 720, PT6H",
    "5, 20000, 600, 300, P1D",
    "6, 30000, 600, 60, P7D",
    "7, 30000, 600, 14, P1M",
    "8, 700, 60, 5000, PT1M",
    "9, 9000, 420, 3000, PT2H",
  })
  void everyStepIsWhatItsRowsAre(long seed, int count, long intervalS, int most, String length) {
    for (String from : List.of("2025-03-26T22:17:00Z", "2025-10-22T05:00:00Z")) {
      Rows rows = random(seed, from, count, 1000 * intervalS);
      long first = Arrays.stream(rows.starts()).min().orElseThrow();
      long end = Arrays.stream(rows.starts()).max().orElseThrow() + 1000 * intervalS;
      TimeSteps steps = TimeSteps.of(first, end, 1000 * intervalS, most, VIENNA);
      assertThat(steps.length()).hasToString(length);
      assertThat(steps.count()).isLessThanOrEqualTo(most);
      StepValues found = new StepValues(steps, 1000 * intervalS);
      LogSpan.whole(rows).rows("x", found);

      Map<Long, DoubleSummaryStatistics> plain = plain(rows, 500 * intervalS, begin(length));
      for (int k = 0; k < steps.count(); k++) {
        DoubleSummaryStatistics want = plain.remove(steps.edge(k));
        assertThat(found.count(k)).isEqualTo(want == null ? 0 : (int) want.getCount());
        if (want != null) {
          assertThat(found.min(k)).isEqualTo(want.getMin());
          assertThat(found.max(k)).isEqualTo(want.getMax());
          assertThat(found.mean(k)).isCloseTo(want.getAverage(), within(1e-9));
        } else {
          assertThat(found.min(k)).isNaN();
        }
      }
      assertThat(plain).as("every row is in a step").isEmpty();
    }
  }

  private static Map<Long, DoubleSummaryStatistics> plain(
      Rows rows, long halfMillis, Function<ZonedDateTime, ZonedDateTime> begin) {
    Map<Long, DoubleSummaryStatistics> plain = new TreeMap<>();
    for (int k = 0; k < rows.starts().length; k++) {
      ZonedDateTime middle = Instant.ofEpochMilli(rows.starts()[k] + halfMillis).atZone(VIENNA);
      if (!Double.isNaN(rows.values()[k])) {
        plain
            .computeIfAbsent(
                begin.apply(middle).toInstant().toEpochMilli(), at -> new DoubleSummaryStatistics())
            .accept(rows.values()[k]);
      }
    }
    return plain;
  }

  /** The first instant of the step of this length that a time lies in. */
  private static Function<ZonedDateTime, ZonedDateTime> begin(String length) {
    return switch (length) {
      case "PT1M" -> t -> t.withSecond(0);
      case "PT10M" -> t -> t.withSecond(0).withMinute(t.getMinute() / 10 * 10);
      case "PT1H" -> t -> t.withSecond(0).withMinute(0);
      case "PT2H", "PT6H" -> {
        int hours = length.charAt(2) - '0';
        yield t -> t.toLocalDate().atTime(t.getHour() / hours * hours, 0).atZone(VIENNA);
      }
      case "P1D" -> t -> t.toLocalDate().atStartOfDay(VIENNA);
      case "P7D" ->
          t ->
              t.toLocalDate()
                  .with(TemporalAdjusters.previousOrSame(DayOfWeek.MONDAY))
                  .atStartOfDay(VIENNA);
      case "P1M" -> t -> t.toLocalDate().withDayOfMonth(1).atStartOfDay(VIENNA);
      default -> throw new IllegalArgumentException(length);
    };
  }

  @ParameterizedTest
  @ValueSource(longs = {11, 12, 13})
  void aPartOfALogIsWhatTheWholeIsThere(long seed) {
    Rows rows = random(seed, "2025-03-20T00:00:00Z", 20_000, 60_000);
    long from = Instant.parse("2025-03-29T23:00:00Z").toEpochMilli();
    long to = Instant.parse("2025-03-30T22:00:00Z").toEpochMilli();
    TimeSteps steps = TimeSteps.of(from, to, 60_000, 60, VIENNA);
    StepValues whole = new StepValues(steps, 60_000);
    LogSpan.whole(rows).rows("x", whole);
    StepValues part = new StepValues(steps, 60_000);
    LogSpan.of(rows, from - 60_000, to + 60_000).rows("x", part);
    for (int k = 0; k < steps.count(); k++) {
      assertThat(part.count(k)).isEqualTo(whole.count(k));
      assertThat((Object) part.max(k)).isEqualTo(whole.max(k));
    }
    assertThat(steps.length()).hasToString("PT30M");
    assertThat(steps.count()).as("the day has 23 hours").isEqualTo(46);
  }

  @ParameterizedTest
  @ValueSource(longs = {21, 22})
  void daysAreCountedByTheLocalCalendar(long seed) {
    Rows rows = random(seed, "2025-10-20T22:00:00Z", 20_000, 60_000);
    long end = Arrays.stream(rows.starts()).max().orElseThrow() + 60_000;
    List<DayCoverage.Day> days =
        DayCoverage.of(LogSpan.whole(rows), rows.starts()[0], end, 60_000, VIENNA);
    Map<LocalDate, Integer> plain = new TreeMap<>();
    long before = -1;
    for (long t : rows.starts()) {
      if (t != before) {
        plain.merge(Instant.ofEpochMilli(t).atZone(VIENNA).toLocalDate(), 1, Integer::sum);
      }
      before = t;
    }
    for (DayCoverage.Day day : days) {
      assertThat(day.rows()).isEqualTo(plain.getOrDefault(day.date(), 0));
      boolean longDay = day.date().equals(LocalDate.of(2025, 10, 26));
      assertThat(day.share())
          .isCloseTo(Math.min(1, day.rows() / (longDay ? 1500.0 : 1440.0)), within(1e-12));
    }
  }

  /** numpy.percentile([1, 2, 3, 4], [5, 50, 95]) is 1.15, 2.5, 3.85 (linear method). */
  @Test
  void percentilesAreLinear() {
    long[] times = {0, 1000, 2000, 3000, 4000};
    double[] values = {3, Double.NaN, 1, 4, 2};
    ValuesBySize bySize = new ValuesBySize(0, 5000, 1000);
    bySize.take(times, values);
    assertThat(bySize.percentile(5)).isCloseTo(1.15, within(1e-12));
    assertThat(bySize.percentile(50)).isEqualTo(2.5);
    assertThat(bySize.percentile(95)).isCloseTo(3.85, within(1e-12));
    assertThat(bySize.shareAbove(2)).isEqualTo(0.5);
    assertThat(bySize.shareAbove(4)).isZero();

    StepPercentiles days = new StepPercentiles(TimeSteps.days(0, 5000, ZoneId.of("UTC")), 1000);
    days.take(times, values);
    assertThat(days.of(0, 5, 95)).containsExactly(new double[] {1.15, 3.85}, within(1e-12));
  }

  /** Against the whole array in order; values in steps, far off, alike and of both signs. */
  @ParameterizedTest(name = "seed {0}")
  @ValueSource(longs = {1, 2, 3, 4, 5, 6, 7, 8})
  void ranksAreThoseOfAllInOrder(long seed) {
    Random random = new Random(seed);
    int count = 1 + random.nextInt(20_000);
    double[] values = new double[count];
    Arrays.setAll(
        values,
        k ->
            switch ((int) (seed % 4)) {
              case 0 -> Math.rint(10 * random.nextGaussian());
              case 1 -> k == 0 ? 1e12 : random.nextDouble();
              case 2 -> -7.5;
              default -> 230 + random.nextGaussian();
            });
    ValuesBySize bySize = new ValuesBySize(0, 1000L * count, 1000);
    bySize.take(LongStream.range(0, count).map(k -> 1000 * k).toArray(), values);
    double[] ordered = values.clone();
    Arrays.sort(ordered);
    for (int k = 0; k <= 200; k++) {
      double position = (count - 1) * (k / 2.0) / 100;
      int below = (int) position;
      double above = ordered[Math.min(below + 1, count - 1)];
      assertThat(bySize.percentile(k / 2.0))
          .isEqualTo(ordered[below] + (position - below) * (above - ordered[below]));
      double limit = ordered[below] + (k % 3 - 1) * 0.1;
      assertThat(bySize.shareAbove(limit))
          .isEqualTo((double) Arrays.stream(values).filter(v -> v > limit).count() / count);
    }
  }

  @Test
  void hoursOfTheWeekAreLocal() {
    long monday = Instant.parse("2025-07-06T22:00:00Z").toEpochMilli();
    HourMeans hours = new HourMeans(monday, monday + 3_600_000, VIENNA);
    hours.take(new long[] {monday, monday + 1_800_000, monday + 3_600_000}, new double[] {1, 2, 9});
    assertThat(hours.mean(0)).isEqualTo(1.5);
    assertThat(hours.mean(1)).isNaN();
  }

  @Test
  void anySpanFindsSteps() {
    long hundredYears = 100L * 366 * 86_400_000;
    List<Integer> counts = new ArrayList<>();
    for (int most : new int[] {2, 3, 50, 5000}) {
      counts.add(TimeSteps.of(0, hundredYears, 1, most, VIENNA).count());
    }
    assertThat(counts).allSatisfy(n -> assertThat(n).isBetween(1, 5000)).isSorted();
  }
}
