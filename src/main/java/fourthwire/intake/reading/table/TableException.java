package fourthwire.intake.reading.table;

/** A text table that can't be read; the message says where and what is wrong. */
public final class TableException extends RuntimeException {
  private static final long serialVersionUID = 1L;

  /** With a sentence for the user. */
  public TableException(String message) {
    super(message);
  }
}
