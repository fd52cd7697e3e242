package fourthwire.intake.survey;

import fourthwire.site.SiteSettings;
import fourthwire.site.SpotReading;
import fourthwire.site.check.DraftRow;
import fourthwire.site.check.DraftTable;
import fourthwire.site.check.DraftTable.State;
import fourthwire.site.check.SurveyDraft;
import fourthwire.site.check.SurveyError;
import java.time.DateTimeException;
import java.time.LocalDateTime;
import java.time.OffsetDateTime;
import java.time.ZoneId;
import java.util.List;
import java.util.Optional;
import java.util.Set;

/** Reads every table of a survey file by its schema. */
final class DraftReader {
  private static final Set<String> REQUIRED = Set.of("site", "supplies", "panels");

  private final SurveyFile file;
  private final Remarks remarks;

  private DraftReader(SurveyFile file, Remarks remarks) {
    this.file = file;
    this.remarks = remarks;
  }

  static SurveyDraft read(SurveyFile file, Remarks remarks) {
    return new DraftReader(file, remarks).draft();
  }

  private SurveyDraft draft() {
    SettingsReader.Settings settings = settings();
    return new SurveyDraft(
        settings.table(),
        settings.pcc(),
        table(SourceTables.SUPPLIES),
        table(SourceTables.BACKGROUND),
        table(SourceTables.TRANSFORMERS),
        table(DistributionTables.PANELS),
        table(DistributionTables.CIRCUITS),
        table(LoadTables.LOADS),
        table(LoadTables.SPECTRA),
        table(LoadTables.SCHEDULES),
        table(DistributionTables.CAPACITORS),
        table(DistributionTables.FILTERS),
        table(DistributionTables.METERS),
        spotReadings(settings.table()));
  }

  /** A time written with its offset from UTC is put into the site's local time. */
  private DraftTable<SpotReading> spotReadings(DraftTable<SiteSettings> site) {
    DraftTable<SpotReading> read = table(DistributionTables.SPOT_READINGS);
    Optional<ZoneId> zone =
        site.rows().stream().findFirst().flatMap(r -> r.content().timezone()).flatMap(this::zone);
    return new DraftTable<>(
        read.name(), read.state(), read.rows().stream().map(r -> local(r, zone)).toList());
  }

  private Optional<ZoneId> zone(String name) {
    try {
      return Optional.of(ZoneId.of(name));
    } catch (DateTimeException e) {
      return Optional.empty();
    }
  }

  private DraftRow<SpotReading> local(DraftRow<SpotReading> row, Optional<ZoneId> zone) {
    Optional<OffsetDateTime> written =
        row.sound("time") ? Formats.withOffset(row.cell("time")) : Optional.empty();
    if (written.isEmpty()) {
      return row;
    }
    if (zone.isEmpty()) {
      remarks.warning(
          row.table(),
          "row %d: the site has no timezone, so the time is kept as written, without its offset."
              .formatted(row.row()));
      return row;
    }
    LocalDateTime time = written.get().atZoneSameInstant(zone.get()).toLocalDateTime();
    return new DraftRow<>(
        row.table(), row.row(), row.content().takenAt(time), row.damaged(), row.cells());
  }

  private SettingsReader.Settings settings() {
    String name = SourceTables.SITE.name();
    Optional<SurveyTable> table = file.find(name);
    if (table.isPresent()) {
      return SettingsReader.read(table.get(), remarks);
    }
    DraftTable<SiteSettings> absent = absent(name);
    return new SettingsReader.Settings(absent, Optional.empty());
  }

  private <R> DraftTable<R> table(Schema<R> schema) {
    Optional<SurveyTable> table = file.find(schema.name());
    if (table.isEmpty()) {
      return absent(schema.name());
    }
    DraftTable<R> read = TableReader.read(schema, table.get(), remarks);
    if (read.rows().isEmpty() && REQUIRED.contains(schema.name())) {
      remarks.error(
          SurveyError.ofTable(schema.name(), "The table has no rows; it needs at least one."));
      return new DraftTable<>(schema.name(), State.UNREADABLE, List.of());
    }
    return read;
  }

  private <R> DraftTable<R> absent(String name) {
    boolean reported = file.isUnreadable(name);
    if (!reported && REQUIRED.contains(name)) {
      remarks.error(SurveyError.ofTable(name, "The table is missing; every survey needs it."));
      reported = true;
    }
    return new DraftTable<>(name, reported ? State.UNREADABLE : State.ABSENT, List.of());
  }
}
