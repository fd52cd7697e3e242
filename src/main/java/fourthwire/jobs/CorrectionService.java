package fourthwire.jobs;

import fourthwire.metering.Correction;
import fourthwire.metering.LogResult;
import fourthwire.metering.QualityFinding;
import fourthwire.metering.QuantitySummary;
import fourthwire.metering.ReadingRepository;
import fourthwire.metering.SeriesRepository;
import fourthwire.metering.correction.CorrectedSeries;
import fourthwire.metering.correction.CorrectionRepository;
import fourthwire.metering.log.CleanedLog;
import fourthwire.metering.series.QuantityStatistics;
import fourthwire.metering.series.Series;
import java.time.ZoneId;
import java.time.ZoneOffset;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.atomic.AtomicInteger;
import java.util.function.DoubleConsumer;

/** Makes corrections of logs and takes them back. */
public final class CorrectionService {
  private final ReadingRepository readings;
  private final SeriesRepository series;
  private final CorrectionRepository corrections;

  /** On what is stored here. */
  public CorrectionService(
      ReadingRepository readings, SeriesRepository series, CorrectionRepository corrections) {
    this.readings = readings;
    this.series = series;
    this.corrections = corrections;
  }

  /**
   * Makes a correction that a finding offers; the reading must be there.
   *
   * @param finding position among the reading's findings
   * @param offer position among the finding's corrections
   * @param listener hears what share is done; what it throws ends the work, and nothing is made
   * @return its id
   * @throws RefusedException where there is no such finding or offer, or the finding is mended
   */
  public long make(long readingId, int finding, int offer, DoubleConsumer listener) {
    ReadingRepository.Entry entry = readings.find(readingId).orElseThrow();
    Correction correction = offered(entry.reading().quality(), finding, offer);
    return corrections
        .add(readingId, finding, correction, holding -> cleaned(entry, holding, listener))
        .orElseThrow(
            () ->
                new RefusedException(
                    "finding " + finding + " is corrected already; take that back first"));
  }

  private static Correction offered(List<QualityFinding> findings, int finding, int offer) {
    if (finding < 0 || finding >= findings.size()) {
      throw new RefusedException(
          "the reading has " + findings.size() + " findings, counted from 0, and none " + finding);
    }
    List<Correction> offers = findings.get(finding).corrections();
    if (offer < 0 || offer >= offers.size()) {
      throw new RefusedException(
          offers.isEmpty()
              ? "finding " + finding + " can't be corrected"
              : "finding "
                  + finding
                  + " has "
                  + offers.size()
                  + " corrections, counted from 0, and none "
                  + offer);
    }
    return offers.get(offer);
  }

  /** Takes a correction back; false where it does not hold. Otherwise as {@link #make}. */
  public boolean undo(long readingId, long correctionId, DoubleConsumer listener) {
    ReadingRepository.Entry entry = readings.find(readingId).orElseThrow();
    return corrections.undo(readingId, correctionId, holding -> cleaned(entry, holding, listener));
  }

  private CleanedLog cleaned(
      ReadingRepository.Entry entry, List<Correction> holding, DoubleConsumer listener) {
    LogResult log = entry.reading().log().orElseThrow();
    Series read =
        series
            .series(entry.id())
            .orElseThrow(
                () ->
                    new RefusedException(
                        "the rows of this log are not stored; upload its file again"));
    CorrectedSeries corrected = new CorrectedSeries(read, holding);
    AtomicInteger begun = new AtomicInteger();
    return CleanedLog.of(
        corrected,
        log.interval(),
        zone(entry),
        q -> {
          listener.accept((double) begun.getAndIncrement() / read.quantities().size());
          return asRead(entry.id(), log, corrected, read.quantities().get(q));
        });
  }

  private static ZoneId zone(ReadingRepository.Entry entry) {
    return entry.mapping().time().zone().map(ZoneId::of).orElse(ZoneOffset.UTC);
  }

  /** What is known of a column that no correction touches. */
  private Optional<QuantityStatistics> asRead(
      long readingId, LogResult log, CorrectedSeries corrected, String quantity) {
    if (corrected.changesRows() || corrected.changes(quantity)) {
      return Optional.empty();
    }
    Optional<QuantitySummary> summary = Optional.ofNullable(log.quantities().get(quantity));
    return summary.flatMap(
        s -> series.weeks(readingId, quantity).map(weeks -> statistics(s, weeks)));
  }

  private static QuantityStatistics statistics(QuantitySummary s, SeriesRepository.Weeks w) {
    return new QuantityStatistics(
        s.count(),
        s.min(),
        s.mean(),
        s.max(),
        s.p95(),
        s.p99(),
        Arrays.stream(w.weekCount()).mapToLong(Math::round).toArray(),
        w.weekP95(),
        w.weekP99(),
        w.hourOfWeekMean());
  }
}
