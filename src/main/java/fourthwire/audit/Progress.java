package fourthwire.audit;

/** Where a running audit says how far it is, and asks whether it should go on. */
public interface Progress {
  /** A listener that hears nothing and never stops the run. */
  Progress SILENT = (share, message) -> {};

  /**
   * Called at least at every stage.
   *
   * @param share 0 to 1
   * @param message what is being done
   * @throws CancelledException to stop the run
   */
  void at(double share, String message);

  /** Thrown by a listener to stop the run. */
  final class CancelledException extends RuntimeException {
    private static final long serialVersionUID = 1L;

    /** Says so. */
    public CancelledException() {
      super("cancelled");
    }
  }
}
