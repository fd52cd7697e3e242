package fourthwire.intake.reading.format;

import java.util.concurrent.CancellationException;
import java.util.function.BiPredicate;

/** What a reading tells of itself while it runs. */
public final class Progress {
  private Progress() {}

  /**
   * Tells how far it is; stops where asked to.
   *
   * @param listener answers false to stop the reading
   * @param share 0 to 1
   * @throws CancellationException where the listener answered false
   */
  public static void go(BiPredicate<Double, String> listener, double share, String message) {
    if (!listener.test(share, message)) {
      throw new CancellationException("stopped while " + message);
    }
  }
}
