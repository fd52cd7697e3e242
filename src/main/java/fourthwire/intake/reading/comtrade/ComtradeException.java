package fourthwire.intake.reading.comtrade;

/** A COMTRADE record that can't be read; the message says where and what is wrong. */
public final class ComtradeException extends RuntimeException {
  private static final long serialVersionUID = 1L;

  /** With a sentence for the user. */
  public ComtradeException(String message) {
    super(message);
  }
}
