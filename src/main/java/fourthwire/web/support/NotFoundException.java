package fourthwire.web.support;

/** What was asked for is not there; the page says what. */
public final class NotFoundException extends RuntimeException {
  private static final long serialVersionUID = 1L;

  /** Names what was looked for: "audit 14". */
  public NotFoundException(String what) {
    super(what);
  }
}
