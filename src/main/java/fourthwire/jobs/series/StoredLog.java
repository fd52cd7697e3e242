package fourthwire.jobs.series;

import fourthwire.jobs.measured.SiteZone;
import fourthwire.metering.Correction;
import fourthwire.metering.LogResult;
import fourthwire.metering.Period;
import fourthwire.metering.ReadingRepository;
import fourthwire.metering.SeriesRepository;
import fourthwire.metering.correction.CorrectedSeries;
import fourthwire.metering.correction.CorrectionRepository;
import fourthwire.metering.reduce.DayCoverage;
import fourthwire.metering.reduce.HourMeans;
import fourthwire.metering.reduce.LogSpan;
import fourthwire.metering.reduce.StepPercentiles;
import fourthwire.metering.reduce.StepValues;
import fourthwire.metering.reduce.TimeSteps;
import fourthwire.metering.reduce.ValuesBySize;
import fourthwire.metering.series.Series;
import fourthwire.site.Survey;
import java.time.Instant;
import java.time.ZoneId;
import java.util.ArrayList;
import java.util.List;
import java.util.LongSummaryStatistics;
import java.util.Optional;
import java.util.stream.LongStream;

/**
 * A log and what is asked of its rows, as read or as corrected; its days and hours are the site's.
 * Not thread-safe.
 */
public final class StoredLog {
  private final ReadingRepository.Entry entry;
  private final Survey survey;
  private final SeriesRepository series;
  private final CorrectionRepository corrections;
  private final Optional<CorrectedRows> corrected;
  private final LogSpan.Source chunks;
  private final LogResult log;
  private final ZoneId zone;

  private StoredLog(
      ReadingRepository.Entry entry,
      Survey survey,
      SeriesRepository series,
      CorrectionRepository corrections,
      Optional<CorrectedRows> corrected,
      LogResult log) {
    this.entry = entry;
    this.survey = survey;
    this.series = series;
    this.corrections = corrections;
    this.corrected = corrected;
    this.chunks = corrected.<LogSpan.Source>map(c -> c).orElseGet(() -> series.chunks(entry.id()));
    this.log = log;
    this.zone = SiteZone.of(survey);
  }

  static StoredLog asRead(
      ReadingRepository.Entry entry,
      Survey survey,
      SeriesRepository series,
      CorrectionRepository corrections) {
    LogResult log = entry.reading().log().orElseThrow();
    return new StoredLog(entry, survey, series, corrections, Optional.empty(), log);
  }

  /** The same log with the corrections that hold; empty where none does. */
  public Optional<StoredLog> corrected() {
    List<Correction> holding =
        corrections.ofReading(entry.id()).stream()
            .filter(CorrectionRepository.Entry::holds)
            .map(CorrectionRepository.Entry::correction)
            .toList();
    return holding.isEmpty()
        ? Optional.empty()
        : corrections
            .cleaned(entry.id())
            .flatMap(
                cleaned -> series.series(entry.id()).map(read -> with(read, holding, cleaned)));
  }

  private StoredLog with(
      Series read, List<Correction> holding, CorrectionRepository.Cleaned cleaned) {
    CorrectedRows rows =
        new CorrectedRows(series.chunks(entry.id()), new CorrectedSeries(read, holding));
    return new StoredLog(entry, survey, series, corrections, Optional.of(rows), cleaned.log());
  }

  /** Whether its rows are those as corrected. */
  public boolean isCorrected() {
    return corrected.isPresent();
  }

  /** Whether a quantity's rows are others than those as read. */
  public boolean changes(String quantity) {
    return corrected.filter(c -> c.changes(quantity)).isPresent();
  }

  /** The reading. */
  public ReadingRepository.Entry entry() {
    return entry;
  }

  /** The site's latest survey. */
  public Survey survey() {
    return survey;
  }

  /** The time zone of its days and hours. */
  public ZoneId zone() {
    return zone;
  }

  /** From its first row to the end of its last. */
  public Period period() {
    return corrected
        .filter(CorrectedRows::changesRows)
        .map(c -> period(c.times()))
        .orElseGet(() -> entry.reading().period().orElseThrow());
  }

  /** Rows left out or another clock can move it. */
  private Period period(List<long[]> times) {
    LongSummaryStatistics all = times.stream().flatMapToLong(LongStream::of).summaryStatistics();
    return new Period(
        Instant.ofEpochMilli(all.getMin()),
        Instant.ofEpochMilli(all.getMax()).plusMillis(intervalMillis()));
  }

  /** Length of a row, milliseconds. */
  public long intervalMillis() {
    return Math.max(1, log.interval().toMillis());
  }

  /** Quantities that have any value, in the order of the file's columns. */
  public List<String> quantities() {
    return List.copyOf(log.quantities().keySet());
  }

  /** A span of it in round steps, at most so many. */
  public TimeSteps steps(Period span, int most) {
    return TimeSteps.of(
        span.from().toEpochMilli(), span.to().toEpochMilli(), intervalMillis(), most, zone);
  }

  /** Least, mean and largest values in each step; one for each quantity. */
  public List<StepValues> values(List<String> quantities, TimeSteps steps) {
    return values(quantities, List.of(steps)).stream().map(of -> of.get(0)).toList();
  }

  /** The same in steps of several lengths at once; for each quantity one of each. */
  public List<List<StepValues>> values(List<String> quantities, List<TimeSteps> lengths) {
    long from = lengths.stream().mapToLong(TimeSteps::from).min().orElseThrow();
    long to = lengths.stream().mapToLong(TimeSteps::to).max().orElseThrow();
    LogSpan span = span(from, to);
    List<List<StepValues>> all = new ArrayList<>();
    for (String quantity : quantities) {
      List<StepValues> each =
          lengths.stream().map(steps -> new StepValues(steps, intervalMillis())).toList();
      span.rows(quantity, (times, values) -> each.forEach(e -> e.take(times, values)));
      all.add(each);
    }
    return all;
  }

  /** Percentiles of a quantity in each step. */
  public StepPercentiles percentiles(String quantity, TimeSteps steps) {
    StepPercentiles percentiles = new StepPercentiles(steps, intervalMillis());
    span(steps.from(), steps.to()).rows(quantity, percentiles);
    return percentiles;
  }

  /** A quantity over a span: its values in order of size, and its means by hour of the week. */
  public record Spread(ValuesBySize bySize, HourMeans hours) {}

  /** Each of these quantities over a span. */
  public List<Spread> spreads(List<String> quantities, Period over) {
    long from = over.from().toEpochMilli();
    long to = over.to().toEpochMilli();
    LogSpan span = span(from, to);
    List<Spread> all = new ArrayList<>();
    for (String quantity : quantities) {
      Spread spread =
          new Spread(new ValuesBySize(from, to, intervalMillis()), new HourMeans(from, to, zone));
      span.rows(
          quantity,
          (times, values) -> {
            spread.bySize().take(times, values);
            spread.hours().take(times, values);
          });
      all.add(spread);
    }
    return all;
  }

  /** Every day from its first to its last. */
  public List<DayCoverage.Day> days() {
    return DayCoverage.of(
        LogSpan.whole(chunks),
        period().from().toEpochMilli(),
        period().to().toEpochMilli(),
        intervalMillis(),
        zone);
  }

  /** What a quantity was by week, as stored when the log was read; empty where that changed. */
  public Optional<SeriesRepository.Weeks> weeks(String quantity) {
    return changes(quantity) ? Optional.empty() : series.weeks(entry.id(), quantity);
  }

  private LogSpan span(long fromMillis, long toMillis) {
    return LogSpan.of(chunks, fromMillis - intervalMillis(), toMillis + intervalMillis());
  }
}
