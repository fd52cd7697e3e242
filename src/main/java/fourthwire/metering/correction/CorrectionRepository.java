package fourthwire.metering.correction;

import fourthwire.metering.Correction;
import fourthwire.metering.LogResult;
import fourthwire.metering.log.CleanedLog;
import java.time.Instant;
import java.util.List;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.function.Function;

/** Where corrections of readings are recorded, and the second set of statistics they make. */
public interface CorrectionRepository {
  /**
   * A correction that was made.
   *
   * @param finding position in the reading's findings of the one it mends
   * @param undone when it was taken back; empty while it holds
   */
  record Entry(
      long id,
      long readingId,
      int finding,
      Correction correction,
      Instant made,
      Optional<Instant> undone) {
    /** Whether it holds. */
    public boolean holds() {
      return undone.isEmpty();
    }
  }

  /**
   * What a log says as corrected.
   *
   * @param rows that are left
   * @param log its figures; without detail where it comes from the store
   */
  record Cleaned(long rows, LogResult log) {}

  /**
   * Records a correction and stores what the log then says, in one transaction: no other of the
   * same reading comes between.
   *
   * @param make forms the second set from the corrections that then hold
   * @return its id; empty where the finding is mended already
   */
  OptionalLong add(
      long readingId,
      int finding,
      Correction correction,
      Function<List<Correction>, CleanedLog> make);

  /** Takes a correction back, likewise; false where it did not hold. */
  boolean undo(long readingId, long id, Function<List<Correction>, CleanedLog> make);

  /** All of a reading, those taken back too, oldest first. */
  List<Entry> ofReading(long readingId);

  /** What a log says as corrected; empty while no correction holds. */
  Optional<Cleaned> cleaned(long readingId);
}
