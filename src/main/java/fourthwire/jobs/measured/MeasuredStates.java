package fourthwire.jobs.measured;

import fourthwire.audit.MeasuredState;
import fourthwire.metering.ReadingRepository;
import fourthwire.metering.SeriesRepository;
import fourthwire.metering.assess.DemandCurrent;
import fourthwire.metering.correction.CorrectedSeries;
import fourthwire.metering.correction.CorrectionRepository;
import fourthwire.metering.series.Series;
import fourthwire.site.Survey;
import java.time.Duration;
import java.time.ZoneId;
import java.time.ZoneOffset;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Stream;

/**
 * What readings say of each node, in the shape an audit sets beside its own figures: meters'
 * captures first, then logs, newest of each first, then the survey's clamp readings.
 */
public final class MeasuredStates {
  private static final Duration NEARLY_A_YEAR = Duration.ofDays(360);

  private final ReadingRepository readings;
  private final SeriesRepository series;
  private final CorrectionRepository corrections;

  /** From what is stored here. */
  public MeasuredStates(
      ReadingRepository readings, SeriesRepository series, CorrectionRepository corrections) {
    this.readings = readings;
    this.series = series;
    this.corrections = corrections;
  }

  /** By node, of this site. */
  public Map<String, List<MeasuredState>> of(long siteId, Survey survey) {
    List<ReadingRepository.Entry> stored = readings.ofSite(siteId);
    Map<String, List<MeasuredState>> byNode = new LinkedHashMap<>();
    captures(stored).forEach(e -> add(byNode, e.meter().node(), CaptureStates.of(e, survey)));
    logs(stored).forEach(e -> log(e, survey).ifPresent(s -> add(byNode, e.meter().node(), s)));
    ZoneId zone = SiteZone.of(survey);
    survey.spotReadings().forEach(r -> add(byNode, r.at(), ClampStates.of(r, zone)));
    return byNode;
  }

  private Optional<MeasuredState> log(ReadingRepository.Entry entry, Survey survey) {
    LogSet set = LogSet.of(entry, corrections);
    return LogStates.of(entry, set, demand(entry, set), survey);
  }

  /** From the rows that are used; a log too short for it is not gone through. */
  private MeasuredState.Demand demand(ReadingRepository.Entry entry, LogSet set) {
    boolean aYear =
        entry.reading().period().filter(p -> p.length().compareTo(NEARLY_A_YEAR) > 0).isPresent();
    Optional<Series> rows = aYear ? series.series(entry.id()) : Optional.empty();
    return rows.map(
            read ->
                DemandCurrent.of(
                    new CorrectedSeries(read, set.corrections()),
                    set.log().interval(),
                    entry.mapping().time().zone().map(ZoneId::of).orElse(ZoneOffset.UTC)))
        .map(
            d ->
                new MeasuredState.Demand(
                    d.amps(), d.basis().isEmpty() ? "" : d.basis() + ", " + set.words()))
        .orElse(MeasuredState.Demand.NONE);
  }

  private static Stream<ReadingRepository.Entry> captures(List<ReadingRepository.Entry> stored) {
    return stored.stream().filter(e -> e.reading().capture().isPresent());
  }

  private static Stream<ReadingRepository.Entry> logs(List<ReadingRepository.Entry> stored) {
    return stored.stream().filter(e -> e.reading().log().isPresent());
  }

  private static void add(
      Map<String, List<MeasuredState>> byNode, String node, MeasuredState state) {
    byNode.computeIfAbsent(node, n -> new ArrayList<>()).add(state);
  }
}
