package fourthwire.jobs;

/** Where stored work is handed in to be done soon, in the background. */
public interface JobQueue {
  /** Runs this queued audit. */
  void addAudit(long auditId);

  /** Reads this queued upload. */
  void addReading(long uploadId);
}
