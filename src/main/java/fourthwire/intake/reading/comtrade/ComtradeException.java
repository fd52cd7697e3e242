package fourthwire.intake.reading.comtrade;

/** A COMTRADE record that can't be read; the message says where and what is wrong. */
public class ComtradeException extends RuntimeException {
  private static final long serialVersionUID = 1L;

  /** With a sentence for the user. */
  public ComtradeException(String message) {
    super(message);
  }

  /** A record that does not tell when its samples were taken: the rate must be given. */
  public static final class NoRate extends ComtradeException {
    private static final long serialVersionUID = 1L;

    NoRate(String message) {
      super(message);
    }
  }
}
