package fourthwire.metering;

import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * What one meter's file says, analysed; immutable. Exactly one of {@code log} and {@code capture}
 * is there.
 *
 * @param period from the first value to the end of the last; empty where the file has no clock time
 * @param count rows of a log, samples per channel of a capture, as read
 * @param sampleRateHz rows or samples a second; empty where a capture's rate changes on the way
 * @param notes how the file was read: what was taken from where, in sentences
 * @param quality what is wrong with it, worst first
 */
public record Reading(
    ReadingKind kind,
    Optional<Period> period,
    long count,
    OptionalDouble sampleRateHz,
    List<String> notes,
    List<QualityFinding> quality,
    Optional<LogResult> log,
    Optional<CaptureResult> capture) {
  /** Refuses a reading that is not of its kind. */
  public Reading {
    if (log.isPresent() != (kind == ReadingKind.LOG)
        || capture.isPresent() != (kind == ReadingKind.CAPTURE)) {
      throw new IllegalArgumentException("a " + kind.word() + " holds the result of one");
    }
    notes = List.copyOf(notes);
    quality = List.copyOf(quality);
  }
}
