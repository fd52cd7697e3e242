package fourthwire.intake.reading;

import fourthwire.metering.ReadingMapping;
import java.util.Optional;

/**
 * The mapping known before a file is looked at.
 *
 * @param mapping given with the upload, else remembered for the layout
 * @param whence which of them
 */
record Mappings(Optional<ReadingMapping> mapping, ReadingPlan.Confidence whence) {
  static Mappings of(ReadingSetting setting, String layout) {
    return setting.mapping().isPresent()
        ? new Mappings(setting.mapping(), ReadingPlan.Confidence.GIVEN)
        : new Mappings(setting.remembered().apply(layout), ReadingPlan.Confidence.REMEMBERED);
  }
}
