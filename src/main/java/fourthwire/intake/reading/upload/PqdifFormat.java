package fourthwire.intake.reading.upload;

import fourthwire.intake.reading.LogProposal;
import fourthwire.intake.reading.ReadingPlan;
import fourthwire.intake.reading.ReadingRefusedException;
import fourthwire.intake.reading.ReadingSetting;
import fourthwire.intake.reading.format.Format;
import fourthwire.intake.reading.format.Part;
import fourthwire.intake.reading.pqdif.IntervalTable;
import fourthwire.intake.reading.pqdif.Pqdif;
import fourthwire.intake.reading.pqdif.PqdifException;
import fourthwire.intake.reading.wave.PqdifCapture;
import fourthwire.metering.Reading;
import fourthwire.metering.ReadingKind;
import fourthwire.metering.ReadingMapping;
import java.io.ByteArrayInputStream;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.BiPredicate;

/**
 * A PQDIF file: its interval data as a log, or the waveforms of one observation as a capture. A
 * file of both is read as a log unless the mapping asks for the capture.
 */
final class PqdifFormat implements Format {
  private static final int MOST_BYTES = 200_000_000;

  private final Pqdif file;
  private final Optional<Format> log;
  private final Optional<Format> capture;

  private PqdifFormat(Pqdif file, String name) {
    this.file = file;
    this.log =
        IntervalTable.of(file)
            .map(
                csv ->
                    TextFormat.of(new Part(name, csv.length, () -> new ByteArrayInputStream(csv))));
    this.capture = PqdifCapture.of(file).map(c -> c);
  }

  static PqdifFormat of(Part part) {
    try {
      return new PqdifFormat(Pqdif.of(part.bytes(MOST_BYTES)), part.name());
    } catch (PqdifException e) {
      throw new ReadingRefusedException(part.name() + ": " + e.getMessage());
    }
  }

  @Override
  public ReadingPlan plan(ReadingSetting setting) {
    ReadingPlan plan = of(setting.mapping()).plan(setting);
    List<String> notes = new ArrayList<>(plan.notes());
    notes.addAll(file.notes());
    if (log.isPresent() && capture.isPresent()) {
      notes.add(
          "The file holds both interval data and waveforms; this reads the "
              + (plan.kind() == ReadingKind.LOG ? "interval data" : "waveforms")
              + ". Give \"kind\" in the mapping to choose.");
    }
    notes.add(
        "PQDIF was read by the published layout; quantities that it only describes by identifiers"
            + " unknown here stand under their channel's own name.");
    return new ReadingPlan(
        plan.kind(), plan.layout(), plan.mapping(), plan.columns(), plan.confidence(), notes);
  }

  @Override
  public Optional<LogProposal> propose(ReadingSetting setting) {
    return of(setting.mapping()).propose(setting);
  }

  private Format of(Optional<ReadingMapping> mapping) {
    boolean captured =
        mapping.flatMap(ReadingMapping::kind).filter(k -> k == ReadingKind.CAPTURE).isPresent();
    return (captured ? capture.or(() -> log) : log.or(() -> capture))
        .orElseThrow(
            () ->
                new ReadingRefusedException(
                    "The PQDIF file holds neither interval data nor waveforms in volts or amps."));
  }

  @Override
  public Reading read(
      ReadingPlan plan, ReadingSetting setting, BiPredicate<Double, String> progress) {
    return of(Optional.of(plan.mapping())).read(plan, setting, progress);
  }
}
