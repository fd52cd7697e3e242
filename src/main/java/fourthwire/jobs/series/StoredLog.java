package fourthwire.jobs.series;

import fourthwire.jobs.measured.SiteZone;
import fourthwire.metering.LogResult;
import fourthwire.metering.Period;
import fourthwire.metering.ReadingRepository;
import fourthwire.metering.SeriesRepository;
import fourthwire.metering.reduce.DayCoverage;
import fourthwire.metering.reduce.HourMeans;
import fourthwire.metering.reduce.LogSpan;
import fourthwire.metering.reduce.RowTaker;
import fourthwire.metering.reduce.StepPercentiles;
import fourthwire.metering.reduce.StepValues;
import fourthwire.metering.reduce.TimeSteps;
import fourthwire.metering.reduce.ValuesBySize;
import fourthwire.site.Survey;
import java.time.ZoneId;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** A log and what is asked of its rows as read; its days and hours are the site's. */
public final class StoredLog {
  private final ReadingRepository.Entry entry;
  private final Survey survey;
  private final SeriesRepository series;
  private final LogResult log;
  private final ZoneId zone;

  StoredLog(ReadingRepository.Entry entry, Survey survey, SeriesRepository series) {
    this.entry = entry;
    this.survey = survey;
    this.series = series;
    this.log = entry.reading().log().orElseThrow();
    this.zone = SiteZone.of(survey);
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
    return entry.reading().period().orElseThrow();
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
    return taken(
        span(steps.from(), steps.to()), quantity, new StepPercentiles(steps, intervalMillis()));
  }

  /** The values of a span in order of size. */
  public ValuesBySize bySize(String quantity, Period span) {
    long from = span.from().toEpochMilli();
    long to = span.to().toEpochMilli();
    return taken(span(from, to), quantity, new ValuesBySize(from, to, intervalMillis()));
  }

  /** Means by hour of the week over a span. */
  public HourMeans hours(String quantity, Period span) {
    long from = span.from().toEpochMilli();
    long to = span.to().toEpochMilli();
    return taken(span(from, to), quantity, new HourMeans(from, to, zone));
  }

  /** Every day from its first to its last. */
  public List<DayCoverage.Day> days() {
    return DayCoverage.of(
        LogSpan.whole(series.chunks(entry.id())),
        period().from().toEpochMilli(),
        period().to().toEpochMilli(),
        intervalMillis(),
        zone);
  }

  /** What a quantity was by week, as stored when the log was read. */
  public Optional<SeriesRepository.Weeks> weeks(String quantity) {
    return series.weeks(entry.id(), quantity);
  }

  private LogSpan span(long fromMillis, long toMillis) {
    return LogSpan.of(
        series.chunks(entry.id()), fromMillis - intervalMillis(), toMillis + intervalMillis());
  }

  private static <T extends RowTaker> T taken(LogSpan span, String quantity, T taker) {
    span.rows(quantity, taker);
    return taker;
  }
}
