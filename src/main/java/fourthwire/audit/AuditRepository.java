package fourthwire.audit;

import java.time.Instant;
import java.util.List;
import java.util.Optional;

/** Where audits are kept: their state while they run, their immutable result after. */
public interface AuditRepository {
  /** State of an audit. */
  enum State {
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
   * An audit as listed.
   *
   * @param supply the supply asked for; empty: the normal one
   * @param draws how many draws of the loads' spread were asked for
   */
  record Entry(
      long id,
      long siteId,
      int surveyRevision,
      Optional<String> supply,
      int draws,
      State state,
      double progress,
      String message,
      Instant asked,
      Optional<String> engineVersion,
      List<String> editions,
      List<String> notes) {}

  /** Stores a queued audit of a site's survey revision; returns its id. */
  long create(long siteId, int surveyRevision, Optional<String> supply, int draws);

  /** The same without draws. */
  default long create(long siteId, int surveyRevision, Optional<String> supply) {
    return create(siteId, surveyRevision, supply, 0);
  }

  /**
   * After a restart: what was running is queued again, or cancelled where that had been asked for.
   *
   * @return every queued audit, oldest first
   */
  List<Long> recover();

  /** One audit. */
  Optional<Entry> find(long auditId);

  /** A site's audits, newest first. */
  List<Entry> ofSite(long siteId);

  /** Takes a queued or interrupted audit into work; false if it was cancelled or finished. */
  boolean start(long auditId);

  /** Notes progress; false if a cancel was asked for. */
  boolean progress(long auditId, double share, String message);

  /** Asks a queued or running audit to stop; false if it had ended. */
  boolean cancel(long auditId);

  /**
   * Stores the result and the state done, in one transaction. Stores nothing where a cancel was
   * asked for, or where the audit is gone together with its site.
   *
   * @param progress hears how far the results are made ready, and may stop before any is stored
   */
  void finish(long auditId, AuditResult result, Progress progress);

  /** Stores the reason and the state failed or cancelled. */
  void end(long auditId, State state, String message);

  /** One row a node of a finished audit, worst first. */
  List<NodeSummary> summaries(long auditId);

  /** Every node of a finished audit, in the order of its tree. */
  List<NodeResult> nodes(long auditId);

  /** One node of a finished audit. */
  Optional<NodeResult> node(long auditId, String node);
}
