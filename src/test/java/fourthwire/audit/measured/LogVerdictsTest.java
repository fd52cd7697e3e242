package fourthwire.audit.measured;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import fourthwire.metering.assess.PeriodFigures.Outcome;
import fourthwire.metering.series.LogChunk;
import fourthwire.metering.series.LogSeries;
import fourthwire.metering.series.Parts;
import fourthwire.site.Practice;
import java.time.Duration;
import java.time.Instant;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;

/** Logs against the printed limits; each figure's source stands beside its check. */
class LogVerdictsTest {
  private static final int WEEK = 1008;

  private static LogSeries log(Map<String, double[]> columns) {
    LogSeries series = new LogSeries(List.copyOf(columns.keySet()), Parts.held(), 1 << 24);
    long[] times = new long[WEEK];
    long start = Instant.parse("2026-03-02T00:00:00Z").toEpochMilli();
    Arrays.setAll(times, k -> start + 600_000L * k);
    series.add(new LogChunk(times, columns.values().toArray(double[][]::new)), Runnable::run);
    return series;
  }

  /** Mostly one value, in so many of the ten minutes another. */
  private static double[] mostly(double value, int rows, double other) {
    double[] x = new double[WEEK];
    Arrays.setAll(x, k -> k < rows ? other : value);
    return x;
  }

  private static List<LogVerdict> judge(
      Map<String, double[]> columns, OptionalDouble demandA, OptionalDouble faultA) {
    return LogVerdicts.of(
        new LogVerdicts.Request(
            log(columns), Duration.ofMinutes(10), 400, 230.94, 50, Practice.IEC, demandA, faultA));
  }

  private static LogVerdict find(List<LogVerdict> all, String code, String basis, double percent) {
    return all.stream()
        .filter(v -> v.code().equals(code) && v.band().basis().startsWith(basis))
        .filter(v -> v.band().percent() == percent)
        .findFirst()
        .orElseThrow();
  }

  /** One day of 10 s means, every hundredth at another frequency. */
  private static List<LogVerdict> frequency(double rarely) {
    int rows = 8640;
    LogSeries series = new LogSeries(List.of("frequency_hz"), Parts.held(), 1 << 24);
    long[] times = new long[rows];
    long start = Instant.parse("2026-03-02T00:00:00Z").toEpochMilli();
    Arrays.setAll(times, k -> start + 10_000L * k);
    double[] hertz = new double[rows];
    Arrays.setAll(hertz, k -> k % 100 == 0 ? rarely : 50);
    series.add(new LogChunk(times, new double[][] {hertz}), Runnable::run);
    return LogVerdicts.of(
        new LogVerdicts.Request(
            series,
            Duration.ofSeconds(10),
            400,
            230.94,
            50,
            Practice.IEC,
            OptionalDouble.empty(),
            OptionalDouble.empty()));
  }

  /**
   * EN 50160:2010, clause 4.2.1 (from memory): 99.5 % of a year's 10 s means within 49.5 to 50.5
   * Hz, all within 47 to 52 Hz. A day leaves a year open, but one mean outside the latter is too
   * many.
   */
  @Test
  void frequencyIsHeldAgainstItsYear() {
    LogVerdict rare = find(frequency(49.4), "frequency", "EN 50160", 99.5);
    assertThat(rare.outcome()).isEqualTo(Outcome.OPEN);
    assertThat(rare.worst().figure()).isCloseTo(100 * 87 / 8640.0, within(1e-9));
    assertThat(rare.worst().sharePercent()).isCloseTo(100 / 365.0, within(1e-9));
    assertThat(find(frequency(49.4), "frequency", "EN 50160", 100).outcome())
        .isEqualTo(Outcome.OPEN);
    assertThat(find(frequency(46.9), "frequency", "EN 50160", 100).outcome())
        .isEqualTo(Outcome.OVER);
  }

  /** A mean of ten minutes outside has a mean of 10 s outside in it; one inside tells nothing. */
  @Test
  void longerRowsSayLessOfTheFrequency() {
    Map<String, double[]> columns = new LinkedHashMap<>();
    columns.put("frequency_hz", mostly(50, 3, 49.9));
    assertThat(judge(columns, OptionalDouble.empty(), OptionalDouble.empty())).isEmpty();
    assertThat(FrequencyRows.sentence(log(columns), 600, 50).orElseThrow())
        .contains("rows are of 600 s", "from 49.90 to 50.00 Hz", "does not show that every");
    columns.put("frequency_hz.min", mostly(49.8, 0, 0));
    columns.put("frequency_hz.max", mostly(50.2, 0, 0));
    assertThat(FrequencyRows.sentence(log(columns), 600, 50).orElseThrow())
        .endsWith("so every 10 s mean in them did.");
    columns.put("frequency_hz", mostly(50, 3, 49.4));
    assertThat(FrequencyRows.sentence(log(columns), 600, 50).orElseThrow())
        .contains("3 of 1008 lay outside 49.5 to 50.5 Hz");
  }

  @Test
  void voltagesAreHeldAgainstEachDocument() {
    Map<String, double[]> columns = new LinkedHashMap<>();
    columns.put("L1.voltage_thd_percent", mostly(4, 60, 8.5));
    columns.put("L2.voltage_thd_percent", mostly(3, 0, 0));
    columns.put("L1.voltage_h5_percent", mostly(3, 60, 6.5));
    columns.put("L1.voltage_h9_percent", mostly(1, 0, 0));
    columns.put("L1.rms_v", mostly(230, 40, 190));
    List<LogVerdict> all = judge(columns, OptionalDouble.empty(), OptionalDouble.empty());

    // EN 50160:2010, 4.2.5: THD 8 % in 95 % of a week; 60 of 1,008 values are 5.95 %
    LogVerdict thd = find(all, "voltage-thd", "EN 50160", 95);
    assertThat(thd.outcome()).isEqualTo(Outcome.OVER);
    assertThat(thd.worst().place()).isEqualTo("L1");
    assertThat(thd.worst().figure()).isCloseTo(8.5, within(1e-9));
    assertThat(thd.worst().limit()).isEqualTo(8);
    // the same, Table 1: the 5th 6 %, the 9th 1.5 %
    LogVerdict order = find(all, "voltage-order", "EN 50160", 95);
    assertThat(order.worst().order()).isEqualTo(5);
    assertThat(order.worst().limit()).isEqualTo(6);
    // IEEE 519-2022, Table 1: 5 % an order below 1 kV
    assertThat(find(all, "voltage-order", "IEEE 519", 95).worst().limit()).isEqualTo(5);
    // EN 50160:2010, 4.2.2: 95 % within 10 % of nominal, all within +10 and -15 %
    LogVerdict band = find(all, "rms-voltage", "EN 50160", 95);
    assertThat(band.outcome()).as("40 of 1,008").isEqualTo(Outcome.WITHIN);
    assertThat(band.worst().figure()).isCloseTo(100 * 40 / 1008.0, within(1e-9));
    assertThat(find(all, "rms-voltage", "EN 50160", 100).outcome()).isEqualTo(Outcome.OVER);
    assertThat(all).noneMatch(v -> v.code().startsWith("current"));
  }

  /**
   * IEEE 519-2022, Table 2, I_SC/I_L 50 to 100: 10 % below the 11th, TDD 12 %; 1.5 times for 99 %.
   */
  @Test
  void currentsAreHeldAgainstTheDemandCurrent() {
    Map<String, double[]> columns = new LinkedHashMap<>();
    columns.put("L1.current_h1_a", mostly(80, 0, 0));
    columns.put("L1.current_h3_a", mostly(9, 30, 16));
    columns.put("L1.current_h5_percent", mostly(5, 0, 0));
    columns.put("L1.current_h7_a", mostly(2, 0, 0));
    List<LogVerdict> all = judge(columns, OptionalDouble.of(100), OptionalDouble.of(6000));

    LogVerdict weekly95 = find(all, "current-order", "IEEE 519", 95);
    assertThat(weekly95.worst().order()).isEqualTo(3);
    assertThat(weekly95.worst().figure()).isCloseTo(9, within(1e-9));
    assertThat(weekly95.worst().limit()).isEqualTo(10);
    assertThat(weekly95.outcome()).isEqualTo(Outcome.WITHIN);
    LogVerdict weekly99 = find(all, "current-order", "IEEE 519", 99);
    assertThat(weekly99.worst().limit()).isEqualTo(15);
    assertThat(weekly99.outcome()).as("30 of 1,008 are at 16 %").isEqualTo(Outcome.OVER);
    LogVerdict tdd = find(all, "current-tdd", "IEEE 519", 95);
    assertThat(tdd.worst().limit()).isEqualTo(12);
    assertThat(tdd.worst().figure()).isCloseTo(Math.sqrt(9 * 9 + 4 * 4 + 2 * 2), within(1e-9));
  }
}
