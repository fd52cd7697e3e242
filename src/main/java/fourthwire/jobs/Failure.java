package fourthwire.jobs;

import java.util.UUID;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;

/** What is said of an error nobody foresaw: a number for the user, the trace for the log. */
final class Failure {
  private static final Logger LOG = LoggerFactory.getLogger(Failure.class);

  private Failure() {}

  /** Logs the error and gives a sentence with the number it was logged under. */
  static String sentence(String what, Throwable error) {
    String reference = UUID.randomUUID().toString().substring(0, 8);
    LOG.error("{} (reference {})", what, reference, error);
    return what
        + " ended on an error that was not foreseen. The log tells more under reference "
        + reference
        + ".";
  }
}
