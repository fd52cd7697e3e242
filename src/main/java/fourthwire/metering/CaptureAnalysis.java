package fourthwire.metering;

/** Turns a waveform capture into what it says. */
public final class CaptureAnalysis {
  private CaptureAnalysis() {}
}
