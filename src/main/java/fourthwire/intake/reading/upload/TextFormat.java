package fourthwire.intake.reading.upload;

import fourthwire.intake.reading.LogProposal;
import fourthwire.intake.reading.ReadingPlan;
import fourthwire.intake.reading.ReadingRefusedException;
import fourthwire.intake.reading.ReadingSetting;
import fourthwire.intake.reading.format.Format;
import fourthwire.intake.reading.format.Layout;
import fourthwire.intake.reading.format.Mappings;
import fourthwire.intake.reading.format.Part;
import fourthwire.intake.reading.log.LogFormat;
import fourthwire.intake.reading.table.TableException;
import fourthwire.intake.reading.table.TextTable;
import fourthwire.intake.reading.table.TimeColumns;
import fourthwire.intake.reading.wave.SampleClock;
import fourthwire.intake.reading.wave.TextCapture;
import fourthwire.intake.reading.wave.WrittenRate;
import fourthwire.metering.MeasuredQuantity;
import fourthwire.metering.Reading;
import fourthwire.metering.ReadingKind;
import fourthwire.metering.ReadingMapping;
import java.util.List;
import java.util.Optional;
import java.util.function.BiPredicate;

/** A text file of rows: an interval log, or a capture of instantaneous values. */
final class TextFormat implements Format {
  private final Part part;
  private final TextTable table;

  private TextFormat(Part part, TextTable table) {
    this.part = part;
    this.table = table;
  }

  static TextFormat of(Part part) {
    try {
      return new TextFormat(part, TextTable.of(part::open));
    } catch (TableException e) {
      throw new ReadingRefusedException(
          part.name() + ": " + e.getMessage(), e.columns(), List.of());
    }
  }

  @Override
  public ReadingPlan plan(ReadingSetting setting) {
    String layout = layout();
    Mappings known = Mappings.of(setting, layout).under(table::heading);
    try {
      TimeColumns time = time(known.mapping());
      return kind(known.mapping(), time) == ReadingKind.CAPTURE
          ? new TextCapture(table, time).plan(setting, layout, known)
          : new LogFormat(table, time, part.length()).plan(setting, layout, known);
    } catch (TableException e) {
      throw timeRefused(e);
    }
  }

  private String layout() {
    return Layout.of("text", table.headings());
  }

  private ReadingRefusedException timeRefused(TableException e) {
    return new ReadingRefusedException(
        "The time of the rows can't be read.",
        table.headings(),
        List.of(new ReadingRefusedException.Question("time", String.valueOf(e.getMessage()))));
  }

  @Override
  public Optional<LogProposal> propose(ReadingSetting setting) {
    String layout = layout();
    Mappings known = Mappings.of(setting, layout).under(table::heading);
    try {
      TimeColumns time = time(known.mapping());
      return kind(known.mapping(), time) == ReadingKind.CAPTURE
          ? Optional.empty()
          : Optional.of(new LogFormat(table, time, part.length()).propose(setting, layout, known));
    } catch (TableException e) {
      throw timeRefused(e);
    }
  }

  @Override
  public Reading read(
      ReadingPlan plan, ReadingSetting setting, BiPredicate<Double, String> progress) {
    TimeColumns time = time(Optional.of(plan.mapping()));
    return plan.kind() == ReadingKind.CAPTURE
        ? new TextCapture(table, time).read(plan, setting, progress)
        : new LogFormat(table, time, part.length()).read(plan, setting, progress);
  }

  private TimeColumns time(Optional<ReadingMapping> mapping) {
    List<String> named = mapping.map(m -> m.time().columns()).orElse(List.of());
    if (!named.isEmpty()) {
      return told(TimeColumns.named(table, named));
    }
    TimeColumns found = TimeColumns.find(table);
    return found.columns().isEmpty() ? SampleClock.find(table).orElse(found) : found;
  }

  /** A column that was named may be an elapsed time that its heading does not tell. */
  private TimeColumns told(TimeColumns named) {
    return SampleClock.find(table)
        .filter(t -> t.columns().equals(named.columns()))
        .filter(t -> named.kind() == TimeColumns.Kind.CALENDAR)
        .orElse(named);
  }

  /** As told, else by what the file shows: elapsed seconds or a capture's names are a capture. */
  private ReadingKind kind(Optional<ReadingMapping> mapping, TimeColumns time) {
    Optional<ReadingKind> told = mapping.flatMap(ReadingMapping::kind);
    if (told.isEmpty() && time.elapsed() && SampleClock.isOfALog(table, time)) {
      return ReadingKind.LOG;
    }
    boolean rate =
        mapping.map(m -> m.sampleRateHz().isPresent()).orElse(false)
            || time.columns().isEmpty() && WrittenRate.of(table).isPresent();
    boolean captureNames =
        mapping.stream()
                .flatMap(m -> m.columns().values().stream())
                .anyMatch(c -> MeasuredQuantity.ofCapture(c.quantity()).isPresent())
            || table.headings().stream().anyMatch(h -> MeasuredQuantity.ofCapture(h).isPresent());
    return told.orElse(
        time.elapsed() || rate || captureNames || SampleClock.isOfAWaveform(table, time)
            ? ReadingKind.CAPTURE
            : ReadingKind.LOG);
  }
}
