package fourthwire.intake.reading.format;

import fourthwire.intake.reading.LogProposal;
import fourthwire.intake.reading.ReadingPlan;
import fourthwire.intake.reading.ReadingSetting;
import fourthwire.metering.Reading;
import java.util.Optional;
import java.util.function.BiPredicate;

/** One upload in one format. */
public interface Format {
  /** Settles how it is read. */
  ReadingPlan plan(ReadingSetting setting);

  /** How a log would be read; empty for a capture. */
  default Optional<LogProposal> propose(ReadingSetting setting) {
    return Optional.empty();
  }

  /** Reads and analyses it. */
  Reading read(ReadingPlan plan, ReadingSetting setting, BiPredicate<Double, String> progress);
}
