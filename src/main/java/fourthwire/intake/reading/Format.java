package fourthwire.intake.reading;

import fourthwire.metering.Reading;
import java.util.function.BiPredicate;

/** One upload in one format. */
interface Format {
  /** Settles how it is read. */
  ReadingPlan plan(ReadingSetting setting);

  /** Reads and analyses it. */
  Reading read(ReadingPlan plan, ReadingSetting setting, BiPredicate<Double, String> progress);
}
