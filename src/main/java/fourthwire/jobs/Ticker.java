package fourthwire.jobs;

import java.time.Duration;
import java.util.function.LongSupplier;

/**
 * Lets through the first call and then one every 400 ms, so that progress costs next to nothing.
 */
final class Ticker {
  private static final long STEP_NANOS = Duration.ofMillis(400).toNanos();

  private final LongSupplier nanoTime;
  private boolean begun;
  private long last;

  Ticker(LongSupplier nanoTime) {
    this.nanoTime = nanoTime;
  }

  boolean isDue() {
    long now = nanoTime.getAsLong();
    if (begun && now - last < STEP_NANOS) {
      return false;
    }
    begun = true;
    last = now;
    return true;
  }
}
