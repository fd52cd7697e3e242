package fourthwire.web.api;

/** What the address names is not there. */
final class MissingException extends RuntimeException {
  private static final long serialVersionUID = 1L;

  MissingException(String message) {
    super(message);
  }

  static MissingException site(long id) {
    return new MissingException("there is no site " + id);
  }

  static MissingException audit(long id) {
    return new MissingException("there is no audit " + id);
  }

  static MissingException reading(long id) {
    return new MissingException("there is no reading " + id);
  }

  static MissingException job(long id) {
    return new MissingException("there is no job " + id);
  }
}
