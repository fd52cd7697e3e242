package fourthwire.jobs;

import fourthwire.audit.AuditRepository;
import fourthwire.site.SiteRepository;
import fourthwire.site.Supply;
import fourthwire.site.Survey;
import java.util.List;
import java.util.Optional;
import java.util.OptionalLong;

/** Asks for audits. */
public final class AuditService {
  private final AuditRepository audits;
  private final SiteRepository sites;
  private final JobQueue queue;

  /** On what is stored here. */
  public AuditService(AuditRepository audits, SiteRepository sites, JobQueue queue) {
    this.audits = audits;
    this.sites = sites;
    this.queue = queue;
  }

  /**
   * Queues an audit of a site's latest survey.
   *
   * @param supply to run on; empty: the normal one
   * @param draws of the loads' spread, 0 or more
   * @return its id; empty where the site is not there
   * @throws RefusedException where the survey has no such supply
   */
  public OptionalLong ask(long siteId, Optional<String> supply, int draws) {
    Optional<SiteRepository.Entry> site = sites.find(siteId);
    if (site.isEmpty()) {
      return OptionalLong.empty();
    }
    int revision = site.get().latestRevision();
    supply.ifPresent(name -> check(name, sites.survey(siteId, revision)));
    long id = audits.create(siteId, revision, supply, draws);
    queue.addAudit(id);
    return OptionalLong.of(id);
  }

  /** Queues an audit without draws. */
  public OptionalLong ask(long siteId, Optional<String> supply) {
    return ask(siteId, supply, 0);
  }

  private static void check(String supply, Survey survey) {
    List<String> names = survey.supplies().stream().map(Supply::name).toList();
    if (!names.contains(supply)) {
      throw new RefusedException(
          "the survey has no supply \"" + supply + "\"; it has " + String.join(", ", names));
    }
  }

  /** Asks a queued or running audit to stop; false if it had ended or is not there. */
  public boolean cancel(long auditId) {
    return audits.cancel(auditId);
  }
}
