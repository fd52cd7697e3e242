package fourthwire.metering;

/** Turns an interval log into what it says. */
public final class LogAnalysis {
  private LogAnalysis() {}
}
