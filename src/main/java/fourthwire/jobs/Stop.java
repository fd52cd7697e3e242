package fourthwire.jobs;

import java.util.concurrent.atomic.AtomicBoolean;

/**
 * Set when the service is about to stop: running work lets go at its next step and stays stored as
 * running, so that the next start runs it again.
 */
public final class Stop {
  private final AtomicBoolean asked = new AtomicBoolean();

  /** Asks running work to let go. */
  public void ask() {
    asked.set(true);
  }

  /** Whether that was asked. */
  boolean isAsked() {
    return asked.get();
  }

  /** Ends the work on this thread where a stop was asked for. */
  void check() {
    if (isAsked()) {
      throw new StoppedException();
    }
  }

  /** Ends work without an end of its stored state. */
  static final class StoppedException extends RuntimeException {
    private static final long serialVersionUID = 1L;

    StoppedException() {
      super("the service is stopping");
    }
  }
}
