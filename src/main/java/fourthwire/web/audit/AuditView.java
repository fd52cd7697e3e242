package fourthwire.web.audit;

import fourthwire.audit.AuditRepository;
import fourthwire.site.Survey;
import fourthwire.web.support.Moments;

/**
 * An audit as a page shows it.
 *
 * @param supply it runs on
 * @param stateKey message key of its state
 * @param percent how far it is, 0 to 100
 * @param message what is being done, or why it failed
 * @param open whether it is still waiting or running
 */
public record AuditView(
    long id,
    long siteId,
    int surveyRevision,
    String supply,
    String stateKey,
    boolean open,
    boolean done,
    boolean failed,
    int percent,
    String message,
    String asked) {

  /** An entry in the site's own time. */
  public static AuditView of(AuditRepository.Entry entry, Survey survey) {
    AuditRepository.State state = entry.state();
    return new AuditView(
        entry.id(),
        entry.siteId(),
        entry.surveyRevision(),
        entry.supply().orElseGet(() -> survey.normalSupply().name()),
        "audit.state." + state.word(),
        isOpen(state),
        state == AuditRepository.State.DONE,
        state == AuditRepository.State.FAILED,
        (int) Math.round(100 * entry.progress()),
        entry.message(),
        Moments.of(survey).minute(entry.asked()));
  }

  /** Whether an audit in this state is still waiting or running. */
  public static boolean isOpen(AuditRepository.State state) {
    return state == AuditRepository.State.QUEUED || state == AuditRepository.State.RUNNING;
  }
}
