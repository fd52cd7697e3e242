package fourthwire.metering;

import java.time.Duration;
import java.time.Instant;

/**
 * A stretch of time.
 *
 * @param from its first instant
 * @param to the instant after its last; not before {@code from}
 */
public record Period(Instant from, Instant to) {
  /** Refuses a period that ends before it begins. */
  public Period {
    if (to.isBefore(from)) {
      throw new IllegalArgumentException("a period from " + from + " can't end at " + to);
    }
  }

  /** How long it is. */
  public Duration length() {
    return Duration.between(from, to);
  }
}
