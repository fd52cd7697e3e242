package fourthwire.audit.run;

import fourthwire.audit.Progress;

/**
 * Passes on how far a run is, and can say it again between the turns of a long loop, so that
 * whoever listens hears often and can stop the run at once.
 */
final class Reporter implements Progress {
  private final Progress listener;
  private double share;
  private String message = "";

  Reporter(Progress listener) {
    this.listener = listener;
  }

  @Override
  public void at(double share, String message) {
    this.share = share;
    this.message = message;
    again();
  }

  /** Says the last again. */
  void again() {
    listener.at(share, message);
  }

  /** A part of the run, whose own shares go from 0 to 1. */
  Progress part(double from, double to) {
    return (share, message) -> at(from + (to - from) * share, message);
  }
}
