package fourthwire.metering.capture.fit;

/** A capture in which no steady fundamental can be found: no figure can be given. */
public final class NoFundamentalException extends RuntimeException {
  private static final long serialVersionUID = 1L;

  /** With a sentence for the user. */
  public NoFundamentalException(String message) {
    super(message);
  }
}
