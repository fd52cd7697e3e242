package fourthwire.load.model;

/** The equipment has no periodic steady state at this voltage, or none was found; says why. */
public final class NoSteadyStateException extends RuntimeException {
  private static final long serialVersionUID = 1L;

  /** With the reason as a sentence a user can read. */
  public NoSteadyStateException(String reason) {
    super(reason);
  }
}
