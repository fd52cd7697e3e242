package fourthwire.intake.reading.pqdif;

/** A PQDIF file that can't be read; the message says where and what is wrong. */
public final class PqdifException extends RuntimeException {
  private static final long serialVersionUID = 1L;

  /** With a sentence for the user. */
  public PqdifException(String message) {
    super(message);
  }
}
