package fourthwire.metering;

import java.time.Instant;
import java.util.List;
import java.util.Optional;
import java.util.function.DoublePredicate;

/**
 * Where readings are kept: the file as it came, the mapping it was read by, and what it says.
 * Readings of a meter outlive revisions of the survey.
 */
public interface ReadingRepository {
  /**
   * A measuring point as readings know it.
   *
   * @param name the meter's name: of the survey's {@code meters}, or of the node it was made at
   * @param node the node it measures, a circuit as {@code panel:circuit}
   */
  record MeterRef(String name, String node) {}

  /**
   * A reading to be stored.
   *
   * @param files the uploaded files as they came
   * @param layout signature of the file's header; a later file of the same is read the same way
   * @param mapping the full mapping it was read by
   * @param confirmed the mapping the user gave; remembered as given for this meter and layout.
   *     Empty where the mapping was remembered or only proposed: a proposal is no confirmation
   */
  record Addition(
      long siteId,
      MeterRef meter,
      List<RawFile> files,
      String layout,
      ReadingMapping mapping,
      Optional<ReadingMapping> confirmed,
      Reading reading) {
    /** Copies the list. */
    public Addition {
      files = List.copyOf(files);
    }
  }

  /**
   * A stored reading.
   *
   * @param files names of the uploaded files
   * @param sha256 of the uploaded file; of a set of files, of their digests in name order
   */
  record Entry(
      long id,
      long siteId,
      MeterRef meter,
      List<String> files,
      String sha256,
      Instant added,
      ReadingMapping mapping,
      Reading reading) {}

  /**
   * Stores a reading, whole or not at all: the rows of a log in pieces, which nothing shows before
   * the last is there. The same bytes at the same meter a second time add nothing: the id of the
   * first comes back.
   *
   * @param goesOn is told the share stored; false gives up
   * @throws java.util.concurrent.CancellationException where it was false; nothing is left then
   */
  long add(Addition addition, DoublePredicate goesOn);

  /** Stores a reading to its end; returns its id. */
  default long add(Addition addition) {
    return add(addition, share -> true);
  }

  /** Remembers where a meter is, and a mapping that was confirmed for its files of a layout. */
  void remember(long siteId, MeterRef meter, String layout, Optional<ReadingMapping> confirmed);

  /** A site's readings, newest first. */
  List<Entry> ofSite(long siteId);

  /** One reading. */
  Optional<Entry> find(long readingId);

  /** Removes a reading with its file; whether it was there. */
  boolean delete(long readingId);

  /** The reading that these same bytes became at this meter before. */
  Optional<Entry> same(long siteId, String meter, List<RawFile> files);

  /** The mapping last confirmed for files of this layout at this meter, as it was given. */
  Optional<ReadingMapping> mapping(long siteId, String meter, String layout);

  /** The meters of a site that have readings or were made for one. */
  List<MeterRef> meters(long siteId);
}
