package fourthwire.testsupport;

import fourthwire.metering.Reading;
import fourthwire.metering.capture.Capture;
import fourthwire.metering.capture.CaptureAnalysis;
import fourthwire.metering.capture.wave.Samples;
import fourthwire.metering.capture.wave.TimeAxis;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** Four seconds of three lines and a neutral with 3rd and 5th orders, and a dip in the middle. */
public final class SmallCapture {
  private static final int RATE_HZ = 3200;
  private static final int COUNT = 4 * RATE_HZ;

  private SmallCapture() {}

  /** What it says. */
  public static Reading reading() {
    List<Capture.Channel> channels = new ArrayList<>();
    List<Samples> samples = new ArrayList<>();
    double[] neutral = new double[COUNT];
    for (int line = 0; line < 3; line++) {
      double[] v = new double[COUNT];
      double[] i = new double[COUNT];
      for (int k = 0; k < COUNT; k++) {
        double w = 2 * Math.PI * (49.97 * k / RATE_HZ - line / 3.0);
        double depth = k > COUNT / 2 && k < COUNT / 2 + RATE_HZ / 5 ? 0.7 : 1;
        v[k] = 325 * depth * Math.sin(w) + 6 * Math.sin(5 * w);
        i[k] = (20 + 4 * line) * Math.sin(w - 0.4) + 9 * Math.sin(3 * w + 1) + 3 * Math.sin(5 * w);
        neutral[k] += i[k];
      }
      channels.add(new Capture.Channel("U" + (line + 1), "L" + (line + 1) + ".v"));
      samples.add(Samples.of(v));
      channels.add(new Capture.Channel("I" + (line + 1), "L" + (line + 1) + ".i"));
      samples.add(Samples.of(i));
    }
    channels.add(new Capture.Channel("IN", "N.i"));
    samples.add(Samples.of(neutral));
    Capture capture =
        new Capture(
            Optional.of(Instant.parse("2026-03-02T09:00:00Z")),
            TimeAxis.even(RATE_HZ, COUNT),
            channels,
            samples);
    return CaptureAnalysis.of(capture, 50, List.of());
  }
}
