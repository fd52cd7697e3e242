package fourthwire.site;

import java.time.Instant;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;

/** Where sites and the revisions of their surveys are kept. A stored revision never changes. */
public interface SiteRepository {
  /** A site as listed. */
  record Entry(long id, String name, int latestRevision) {}

  /**
   * A stored revision of a site's survey.
   *
   * @param sha256 of the canonical zip of its tables, lower-case hexadecimal
   * @param warnings what was noted when it was read, in sentences
   */
  record Revision(int number, Instant created, String sha256, List<String> warnings) {
    /** Copies the list. */
    public Revision {
      warnings = List.copyOf(warnings);
    }
  }

  /** Stores a new site with its survey as revision 1; returns its id. */
  long create(Survey survey, List<String> warnings);

  /**
   * Stores a further revision and makes it the latest.
   *
   * @return its number; empty where the site is not there
   */
  OptionalInt revise(long siteId, Survey survey, List<String> warnings);

  /** The revisions of a site's survey, newest first. */
  List<Revision> revisions(long siteId);

  /** All sites, by name. */
  List<Entry> list();

  /** One site. */
  Optional<Entry> find(long siteId);

  /** A revision's survey; it must exist. */
  Survey survey(long siteId, int revision);

  /** Removes a site with all that belongs to it; whether it was there. */
  boolean delete(long siteId);
}
