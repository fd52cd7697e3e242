package fourthwire.jobs.series;

import fourthwire.metering.ReadingRepository;
import fourthwire.metering.SeriesRepository;
import fourthwire.metering.correction.CorrectionRepository;
import fourthwire.site.Survey;
import java.util.Optional;

/** Finds the logs among the stored readings. */
public final class StoredLogs {
  private final ReadingRepository readings;
  private final SeriesRepository series;
  private final CorrectionRepository corrections;

  /** Of what is stored here. */
  public StoredLogs(
      ReadingRepository readings, SeriesRepository series, CorrectionRepository corrections) {
    this.readings = readings;
    this.series = series;
    this.corrections = corrections;
  }

  /** The reading of this id with the rows of its log; empty where it is no log, or has no row. */
  public Optional<StoredLog> find(long readingId, java.util.function.LongFunction<Survey> surveys) {
    return readings.find(readingId).flatMap(r -> of(r, surveys.apply(r.siteId())));
  }

  /** The log of a reading, its rows as read; empty where it is none, or has no row. */
  public Optional<StoredLog> of(ReadingRepository.Entry entry, Survey survey) {
    return entry.reading().log().isPresent() && entry.reading().period().isPresent()
        ? Optional.of(StoredLog.asRead(entry, survey, series, corrections))
        : Optional.empty();
  }
}
