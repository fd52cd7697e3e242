package fourthwire.intake.reading.upload;

import fourthwire.intake.reading.LogProposal;
import fourthwire.intake.reading.ReadingPlan;
import fourthwire.intake.reading.ReadingReader;
import fourthwire.intake.reading.ReadingSetting;
import fourthwire.metering.RawFile;
import fourthwire.metering.Reading;
import java.util.List;
import java.util.Optional;
import java.util.function.BiPredicate;

/** The reader of every format that is supported: interval logs and captures as CSV, COMTRADE. */
public final class FormatReader implements ReadingReader {
  /** Ready to use; holds nothing. */
  public FormatReader() {}

  @Override
  public ReadingPlan plan(List<RawFile> files, ReadingSetting setting) {
    return Upload.format(files).plan(setting);
  }

  @Override
  public Optional<LogProposal> propose(List<RawFile> files, ReadingSetting setting) {
    return Upload.format(files).propose(setting);
  }

  @Override
  public Reading read(
      List<RawFile> files,
      ReadingPlan plan,
      ReadingSetting setting,
      BiPredicate<Double, String> progress) {
    return Upload.format(files).read(plan, setting, progress);
  }
}
