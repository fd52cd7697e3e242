package fourthwire.jobs.measured;

import fourthwire.audit.MeasuredState;
import fourthwire.metering.ReadingRepository;
import fourthwire.site.Survey;
import java.time.ZoneId;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.stream.Stream;

/**
 * What readings say of each node, in the shape an audit sets beside its own figures: meters'
 * captures first, then logs, newest of each first, then the survey's clamp readings.
 */
public final class MeasuredStates {
  private final ReadingRepository readings;

  /** From what is stored here. */
  public MeasuredStates(ReadingRepository readings) {
    this.readings = readings;
  }

  /** By node, of this site. */
  public Map<String, List<MeasuredState>> of(long siteId, Survey survey) {
    List<ReadingRepository.Entry> stored = readings.ofSite(siteId);
    Map<String, List<MeasuredState>> byNode = new LinkedHashMap<>();
    captures(stored).forEach(e -> add(byNode, e.meter().node(), CaptureStates.of(e, survey)));
    logs(stored)
        .forEach(e -> LogStates.of(e, survey).ifPresent(s -> add(byNode, e.meter().node(), s)));
    ZoneId zone = SiteZone.of(survey);
    survey.spotReadings().forEach(r -> add(byNode, r.at(), ClampStates.of(r, zone)));
    return byNode;
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
