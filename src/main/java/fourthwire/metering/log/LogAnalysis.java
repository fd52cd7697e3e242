package fourthwire.metering.log;

import fourthwire.metering.LogResult;
import fourthwire.metering.Period;
import fourthwire.metering.QualityFinding;
import fourthwire.metering.QuantitySummary;
import fourthwire.metering.Reading;
import fourthwire.metering.ReadingKind;
import fourthwire.metering.series.LogSeries;
import fourthwire.metering.series.QuantityStatistics;
import fourthwire.metering.series.SeriesStatistics;
import java.time.Duration;
import java.time.Instant;
import java.time.ZoneId;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * Turns the rows of a log into what they say: statistics of every quantity over the rows as read,
 * the rows that stand for the log beside computed figures, and what is wrong with it.
 */
public final class LogAnalysis {
  private LogAnalysis() {}

  /**
   * Analyses a log of at least one row.
   *
   * @param intervalMillis length of a row
   * @param zone in which days and weeks begin
   * @param nominalHz the site's frequency
   * @param notes how the file was read
   * @param seen what was already found wrong while reading it
   */
  public static Reading of(
      LogSeries series,
      long intervalMillis,
      ZoneId zone,
      double nominalHz,
      List<String> notes,
      List<QualityFinding> seen) {
    SeriesStatistics statistics = SeriesStatistics.of(series, zone);
    List<String> names = series.quantities();
    List<DayCheck> checks =
        List.of(
            new PowerRelations(),
            new ConductorRelations(names),
            new ImpossibleValues(names, statistics.quantities(), nominalHz),
            new HeldDistortion(names),
            new FlatLines(names),
            new LogClock(series));
    KeyRows key = new KeyRows();
    DayBatch batch = new DayBatch(checks);
    LogDays.forEach(
        series,
        zone,
        intervalMillis,
        day -> {
          batch.take(day);
          key.take(day);
        });
    batch.pass();
    List<QualityFinding> quality = new ArrayList<>();
    checks.forEach(check -> quality.addAll(check.findings()));
    List<QualityFinding> found = List.copyOf(quality);
    quality.removeIf(f -> found.stream().anyMatch(other -> RatioOffers.explains(other, f)));
    quality.addAll(seen);
    return reading(series, statistics, key, intervalMillis, notes, quality);
  }

  private static Reading reading(
      LogSeries series,
      SeriesStatistics statistics,
      KeyRows key,
      long intervalMillis,
      List<String> notes,
      List<QualityFinding> quality) {
    return new Reading(
        ReadingKind.LOG,
        Optional.of(
            new Period(
                Instant.ofEpochMilli(key.fromMillis()), Instant.ofEpochMilli(key.toMillis()))),
        series.rows(),
        OptionalDouble.of(1000.0 / intervalMillis),
        notes,
        quality,
        Optional.of(
            new LogResult(
                Duration.ofMillis(intervalMillis),
                summaries(series.quantities(), statistics),
                key.found(),
                Optional.of(new LogResult.Detail(series, statistics)))),
        Optional.empty());
  }

  /** Statistics by quantity, without those that have no value. */
  static Map<String, QuantitySummary> summaries(List<String> names, SeriesStatistics statistics) {
    Map<String, QuantitySummary> quantities = new LinkedHashMap<>();
    for (int q = 0; q < names.size(); q++) {
      QuantityStatistics s = statistics.quantities().get(q);
      if (s.count() > 0) {
        quantities.put(
            names.get(q),
            new QuantitySummary(s.count(), s.min(), s.mean(), s.max(), s.p95(), s.p99()));
      }
    }
    return quantities;
  }
}
