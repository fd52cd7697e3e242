package fourthwire.jobs;

import fourthwire.intake.reading.ReadingSetting;
import fourthwire.metering.RawFile;
import fourthwire.metering.ReadingMapping;
import fourthwire.metering.ReadingRepository;
import fourthwire.metering.ReadingRepository.MeterRef;
import fourthwire.site.Meter;
import fourthwire.site.SiteRepository;
import fourthwire.site.SiteTree;
import fourthwire.site.Survey;
import java.time.DateTimeException;
import java.time.ZoneId;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalLong;

/** What is known about a meter's file from the site's latest survey and its earlier files. */
public final class ReadingSettings {
  private final SiteRepository sites;
  private final ReadingRepository readings;

  /** From what is stored here. */
  public ReadingSettings(SiteRepository sites, ReadingRepository readings) {
    this.sites = sites;
    this.readings = readings;
  }

  /** The setting of a meter's file; the site must be there. */
  ReadingSetting of(long siteId, MeterRef ref, Optional<ReadingMapping> mapping) {
    Survey survey = survey(siteId);
    Optional<Meter> meter =
        survey.meters().stream().filter(m -> m.name().equals(ref.name())).findFirst();
    return new ReadingSetting(
        survey.settings().timezone().flatMap(ReadingSettings::zone),
        survey.settings().frequencyHz(),
        mapping,
        layout -> readings.mapping(siteId, ref.name(), layout),
        meter.map(Meter::ctReversed).orElse(List.of()),
        meter.map(Meter::ctRatio).orElse(OptionalDouble.empty()),
        SiteTree.of(survey).nodes().stream()
            .filter(n -> n.name().equals(ref.node()))
            .mapToDouble(SiteTree.Node::lineToNeutralV)
            .findFirst());
  }

  /**
   * The reading that these files became before. Where they were read by another mapping they are
   * refused: the earlier reading would be answered as if it were this one.
   *
   * @return its id
   * @throws RefusedException naming the earlier reading
   */
  OptionalLong readBefore(long siteId, MeterRef ref, List<RawFile> files, ReadingMapping mapping) {
    Optional<ReadingRepository.Entry> before = readings.same(siteId, ref.name(), files);
    before
        .filter(entry -> !entry.mapping().equals(mapping))
        .ifPresent(
            entry -> {
              throw new RefusedException(
                  "this file is already there as reading "
                      + entry.id()
                      + " of "
                      + ref.name()
                      + ", read by another mapping; delete that reading first to read it"
                      + " otherwise");
            });
    return before.stream().mapToLong(ReadingRepository.Entry::id).findFirst();
  }

  /** Remembers what files that were read before say of their meter. */
  void remember(long siteId, MeterRef meter, String layout, Optional<ReadingMapping> confirmed) {
    readings.remember(siteId, meter, layout, confirmed);
  }

  /** The site's latest survey; the site must be there. */
  Survey survey(long siteId) {
    SiteRepository.Entry site = sites.find(siteId).orElseThrow();
    return sites.survey(siteId, site.latestRevision());
  }

  private static Optional<ZoneId> zone(String name) {
    try {
      return Optional.of(ZoneId.of(name));
    } catch (DateTimeException e) {
      return Optional.empty();
    }
  }
}
