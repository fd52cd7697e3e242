package fourthwire.intake.reading;

import fourthwire.metering.RawFile;
import fourthwire.metering.Reading;
import java.util.List;
import java.util.Optional;
import java.util.function.BiPredicate;

/** Reads meters' files. */
public interface ReadingReader {
  /**
   * Settles how files are read, without reading more of them than that takes.
   *
   * @param files one file, or a capture's two, or a zip of them
   * @throws ReadingRefusedException with the columns found and what must be mapped
   */
  ReadingPlan plan(List<RawFile> files, ReadingSetting setting);

  /**
   * How a log would be read, for a person to confirm; empty for a capture, whose channels are asked
   * for by a refusal alone.
   *
   * @throws ReadingRefusedException where the files hold no table
   */
  Optional<LogProposal> propose(List<RawFile> files, ReadingSetting setting);

  /**
   * Reads and analyses files as planned.
   *
   * @param progress told how far it is, 0 to 1, and with what; answers false to stop the reading
   * @throws ReadingRefusedException where a value can't be read as planned
   * @throws java.util.concurrent.CancellationException where {@code progress} answered false
   */
  Reading read(
      List<RawFile> files,
      ReadingPlan plan,
      ReadingSetting setting,
      BiPredicate<Double, String> progress);
}
