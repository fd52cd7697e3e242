package fourthwire.audit;

/** Runs audits. */
public interface Audit {
  /**
   * Runs one audit.
   *
   * @throws AuditFailedException where no figure can be given
   * @throws Progress.CancelledException where the listener asked to stop
   */
  AuditResult run(AuditRequest request, Progress progress);
}
