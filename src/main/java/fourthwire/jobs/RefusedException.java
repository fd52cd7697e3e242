package fourthwire.jobs;

/** What was asked can't be done; the message says why and what can. Nothing was stored. */
public final class RefusedException extends RuntimeException {
  private static final long serialVersionUID = 1L;

  /** With a sentence for the user. */
  public RefusedException(String message) {
    super(message);
  }
}
