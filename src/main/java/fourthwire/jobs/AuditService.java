package fourthwire.jobs;

import fourthwire.audit.AuditRepository;
import fourthwire.site.SiteRepository;
import fourthwire.site.Supply;
import fourthwire.site.Survey;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.OptionalLong;

/** Asks for audits. */
public final class AuditService {
  /** Up to so many load rows draws are made without being asked for. */
  private static final int SMALL_SITE_LOADS = 100;

  private static final int USUAL_DRAWS = 100;

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
   * @param draws of what the survey leaves open, 0 or more; empty: the usual number
   * @return its id; empty where the site is not there
   * @throws RefusedException where the survey has no such supply
   */
  public OptionalLong ask(long siteId, Optional<String> supply, OptionalInt draws) {
    Optional<SiteRepository.Entry> site = sites.find(siteId);
    if (site.isEmpty()) {
      return OptionalLong.empty();
    }
    int revision = site.get().latestRevision();
    Survey survey = sites.survey(siteId, revision);
    supply.ifPresent(name -> check(name, survey));
    long id = audits.create(siteId, revision, supply, draws.orElse(usualDraws(survey)));
    queue.addAudit(id);
    return OptionalLong.of(id);
  }

  /** Queues an audit with the usual number of draws. */
  public OptionalLong ask(long siteId, Optional<String> supply) {
    return ask(siteId, supply, OptionalInt.empty());
  }

  /** How many draws a site gets unless asked otherwise: none where they would take long. */
  public static int usualDraws(Survey survey) {
    return survey.loads().size() <= SMALL_SITE_LOADS ? USUAL_DRAWS : 0;
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
