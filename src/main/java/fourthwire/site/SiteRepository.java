package fourthwire.site;

import java.util.List;
import java.util.Optional;

/** Where sites and the revisions of their surveys are kept. A stored revision never changes. */
public interface SiteRepository {
  /** A site as listed. */
  record Entry(long id, String name, int latestRevision) {}

  /** Stores a new site with its survey as revision 1; returns its id. */
  long create(Survey survey);

  /** Stores a further revision and makes it the latest; returns its number. */
  int revise(long siteId, Survey survey);

  /** All sites, by name. */
  List<Entry> list();

  /** One site. */
  Optional<Entry> find(long siteId);

  /** A revision's survey; it must exist. */
  Survey survey(long siteId, int revision);

  /** Removes a site with all that belongs to it; whether it was there. */
  boolean delete(long siteId);
}
