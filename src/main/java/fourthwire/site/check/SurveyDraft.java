package fourthwire.site.check;

import fourthwire.site.Background;
import fourthwire.site.CapacitorBank;
import fourthwire.site.Circuit;
import fourthwire.site.Filter;
import fourthwire.site.Load;
import fourthwire.site.Meter;
import fourthwire.site.Panel;
import fourthwire.site.Schedule;
import fourthwire.site.SiteSettings;
import fourthwire.site.SpotReading;
import fourthwire.site.Supply;
import fourthwire.site.Transformer;
import java.util.Optional;
import java.util.stream.Stream;

/**
 * A survey as its tables were read, not yet checked as a whole.
 *
 * @param settings one row, or none where the table could not be read
 * @param pcc the row of the site table that names the point of common coupling
 */
public record SurveyDraft(
    DraftTable<SiteSettings> settings,
    Optional<DraftRow<String>> pcc,
    DraftTable<Supply> supplies,
    DraftTable<Background> background,
    DraftTable<Transformer> transformers,
    DraftTable<Panel> panels,
    DraftTable<Circuit> circuits,
    DraftTable<Load> loads,
    DraftTable<SpectrumRow> spectra,
    DraftTable<Schedule> schedules,
    DraftTable<CapacitorBank> capacitors,
    DraftTable<Filter> filters,
    DraftTable<Meter> meters,
    DraftTable<SpotReading> spotReadings) {

  /** Whether every cell of every table could be read. */
  boolean isSound() {
    return Stream.of(
            settings,
            supplies,
            background,
            transformers,
            panels,
            circuits,
            loads,
            spectra,
            schedules,
            capacitors,
            filters,
            meters,
            spotReadings)
        .allMatch(DraftTable::isSound);
  }
}
