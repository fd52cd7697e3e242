package fourthwire.metering;

import fourthwire.metering.ReadingRepository.MeterRef;
import java.time.Instant;
import java.util.List;
import java.util.Optional;
import java.util.OptionalLong;

/** Where uploaded files of readings wait until they have been read, and what became of each. */
public interface ReadingUploads {
  /** State of an upload. */
  enum State {
    /** Its columns are to be confirmed first. */
    WAITING,
    QUEUED,
    RUNNING,
    DONE,
    FAILED,
    CANCELLED;

    /** The word used in the public interface. */
    public String word() {
      return name().toLowerCase(java.util.Locale.ROOT);
    }
  }

  /**
   * An upload as listed.
   *
   * @param mapping given with the files
   * @param reading id of the reading it became
   */
  record Entry(
      long id,
      long siteId,
      MeterRef meter,
      Optional<ReadingMapping> mapping,
      State state,
      double progress,
      String message,
      Instant asked,
      OptionalLong reading) {}

  /** Stores files to be read; returns the upload's id. */
  long create(
      long siteId, MeterRef meter, List<? extends RawFile> files, Optional<ReadingMapping> mapping);

  /** Stores files whose columns a person confirms before they are read; returns the upload's id. */
  long createWaiting(long siteId, MeterRef meter, List<? extends RawFile> files);

  /** Notes files that were read before, which are not kept again; returns the upload's id. */
  long createDone(long siteId, MeterRef meter, long readingId);

  /** Queues a waiting upload with the mapping that was confirmed; false where it waits no more. */
  boolean confirm(long uploadId, ReadingMapping mapping);

  /** Uploads of a site that wait to be confirmed, oldest first. */
  List<Entry> waiting(long siteId);

  /** One upload. */
  Optional<Entry> find(long uploadId);

  /** Its files, in the order they came, while it has not ended. */
  List<RawFile> files(long uploadId);

  /** Takes a queued or interrupted upload into work; false if it was cancelled or finished. */
  boolean start(long uploadId);

  /** Notes progress; false if a cancel was asked for. */
  boolean progress(long uploadId, double share, String message);

  /** Asks a queued or running upload to stop; false if it had ended. */
  boolean cancel(long uploadId);

  /** Notes the reading it became and lets go of its files. */
  void finish(long uploadId, long readingId);

  /** Stores the reason and the state failed or cancelled, and lets go of its files. */
  void end(long uploadId, State state, String message);

  /**
   * After a restart: what was running is queued again, or cancelled where that had been asked for.
   *
   * @return every queued upload, oldest first
   */
  List<Long> recover();
}
