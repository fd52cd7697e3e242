package fourthwire.audit;

/** The audit could not be brought to a figure; the message names node, order and reason. */
public final class AuditFailedException extends RuntimeException {
  private static final long serialVersionUID = 1L;

  /** With a sentence for the user. */
  public AuditFailedException(String message) {
    super(message);
  }

  /** With a sentence for the user and its cause. */
  public AuditFailedException(String message, Throwable cause) {
    super(message, cause);
  }
}
