package fourthwire.web.api;

/** Results are asked of an audit that has none, now or for good. */
final class NotFinishedException extends RuntimeException {
  private static final long serialVersionUID = 1L;

  NotFinishedException(String message) {
    super(message);
  }
}
