package fourthwire.metering.log;

import fourthwire.metering.LogResult;
import fourthwire.metering.LogResult.KeyInterval;
import fourthwire.metering.Period;
import fourthwire.metering.QualityFinding;
import fourthwire.metering.QuantitySummary;
import fourthwire.metering.Reading;
import fourthwire.metering.ReadingKind;
import fourthwire.metering.series.LogSeries;
import fourthwire.metering.series.QuantityStatistics;
import fourthwire.metering.series.SeriesStatistics;
import java.time.Instant;
import java.time.ZoneId;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import java.util.function.IntToDoubleFunction;

/**
 * Turns an interval log into what it says: statistics of every quantity over the rows as read, the
 * rows that stand for the log beside computed figures, and what is wrong with it.
 */
public final class LogAnalysis {
  private final IntervalLog log;

  private LogAnalysis(IntervalLog log) {
    this.log = log;
  }

  /**
   * Analyses a log of at least one row.
   *
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
    IntervalLog log = IntervalLog.of(series, intervalMillis);
    List<QualityFinding> quality = new ArrayList<>();
    quality.addAll(new LogWiring(log).findings());
    quality.addAll(new LogValues(log, nominalHz).findings());
    quality.addAll(new LogClock(log).findings());
    quality.addAll(seen);
    return new LogAnalysis(log).reading(new LogResult.Detail(series, statistics), notes, quality);
  }

  private Reading reading(
      LogResult.Detail detail, List<String> notes, List<QualityFinding> quality) {
    Map<String, QuantitySummary> quantities = new LinkedHashMap<>();
    for (int q = 0; q < detail.series().quantities().size(); q++) {
      QuantityStatistics s = detail.statistics().quantities().get(q);
      if (s.count() > 0) {
        quantities.put(
            detail.series().quantities().get(q),
            new QuantitySummary(s.count(), s.min(), s.mean(), s.max(), s.p95(), s.p99()));
      }
    }
    return new Reading(
        ReadingKind.LOG,
        Optional.of(period()),
        log.rows(),
        OptionalDouble.of(1000.0 / log.intervalMillis()),
        notes,
        quality,
        Optional.of(new LogResult(log.interval(), quantities, keyIntervals(), Optional.of(detail))),
        Optional.empty());
  }

  private Period period() {
    long from = Long.MAX_VALUE;
    long to = Long.MIN_VALUE;
    for (int k = 0; k < log.rows(); k++) {
      from = Math.min(from, log.startMillis(k));
      to = Math.max(to, log.startMillis(k));
    }
    return new Period(Instant.ofEpochMilli(from), Instant.ofEpochMilli(to + log.intervalMillis()));
  }

  private List<KeyInterval> keyIntervals() {
    List<KeyInterval> key = new ArrayList<>();
    boolean neutral = log.has("N.rms_a");
    highest(row -> neutral ? log.at("N.rms_a", row) : largestLine(row))
        .ifPresent(
            row ->
                key.add(
                    interval(
                        LogResult.PEAK_CURRENT,
                        row,
                        String.format(
                            Locale.ROOT,
                            "the interval with the highest %s current, %.1f A",
                            neutral ? "neutral" : "line",
                            neutral ? log.at("N.rms_a", row) : largestLine(row)))));
    highest(this::activeW)
        .ifPresent(
            row ->
                key.add(
                    interval(
                        LogResult.PEAK_POWER,
                        row,
                        String.format(
                            Locale.ROOT,
                            "the interval with the highest active power, %.1f kW",
                            activeW(row) / 1000))));
    return key;
  }

  private double largestLine(int row) {
    double largest = Double.NaN;
    for (String line : LogWiring.LINES) {
      double a = log.at(line + ".rms_a", row);
      largest = Double.isNaN(a) || a < largest ? largest : a;
    }
    return largest;
  }

  /** Total as logged, else the sum of the lines that have a column. */
  private double activeW(int row) {
    if (log.has("total.active_w")) {
      return log.at("total.active_w", row);
    }
    double sum = 0;
    boolean any = false;
    for (String line : LogWiring.LINES) {
      if (log.has(line + ".active_w")) {
        sum += log.at(line + ".active_w", row);
        any = true;
      }
    }
    return any ? sum : Double.NaN;
  }

  private OptionalInt highest(IntToDoubleFunction figure) {
    int best = -1;
    for (int row = 0; row < log.rows(); row++) {
      double value = figure.applyAsDouble(row);
      if (!Double.isNaN(value) && (best < 0 || value > figure.applyAsDouble(best))) {
        best = row;
      }
    }
    return best < 0 ? OptionalInt.empty() : OptionalInt.of(best);
  }

  private KeyInterval interval(String code, int row, String reason) {
    Map<String, Double> values = new LinkedHashMap<>();
    for (String quantity : log.quantities()) {
      double value = log.at(quantity, row);
      if (!Double.isNaN(value)) {
        values.put(quantity, value);
      }
    }
    return new KeyInterval(code, log.start(row), reason, values);
  }
}
