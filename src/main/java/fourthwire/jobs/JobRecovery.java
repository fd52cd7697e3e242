package fourthwire.jobs;

import fourthwire.audit.AuditRepository;
import fourthwire.metering.ReadingUploads;

/** What a start does first: work that a stop interrupted is handed in again. */
public final class JobRecovery {
  private final AuditRepository audits;
  private final ReadingUploads uploads;
  private final JobQueue queue;

  /** For the work stored here. */
  public JobRecovery(AuditRepository audits, ReadingUploads uploads, JobQueue queue) {
    this.audits = audits;
    this.uploads = uploads;
    this.queue = queue;
  }

  /** Hands in everything that waits or was interrupted. Only before the queue is worked off. */
  public void run() {
    uploads.recover().forEach(queue::addReading);
    audits.recover().forEach(queue::addAudit);
  }
}
