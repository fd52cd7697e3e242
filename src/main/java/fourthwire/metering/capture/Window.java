package fourthwire.metering.capture;

import fourthwire.quantity.Spectrum;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;

/**
 * The part of a capture that is analysed: the largest whole number of cycles.
 *
 * @param frequencyHz the fundamental
 * @param frequencyFound whether it was found from the samples; else it is nominal
 * @param cycles whole cycles
 * @param samples samples per channel in them, from the first
 * @param orders highest order that the sampling resolves, at most 50
 * @param nominalHz the site's frequency
 */
record Window(
    double frequencyHz,
    boolean frequencyFound,
    int cycles,
    int samples,
    int orders,
    double nominalHz) {
  /** A cycle may lack this share: a record of four cycles is often a hair short of them. */
  private static final double LACKING = 0.02;

  /** Of a capture. */
  static Window of(Capture capture, double nominalHz) {
    double[] t = capture.timesS();
    if (t.length < 8) {
      throw new NoFundamentalException(
          "The capture has " + t.length + " samples a channel: at least one cycle is needed.");
    }
    Fundamental fundamental = new Fundamental(t, reference(capture), nominalHz);
    double f = fundamental.hertz();
    double span = t.length * t[t.length - 1] / (t.length - 1);
    int cycles = (int) Math.floor(span * f + LACKING);
    if (cycles < 1) {
      throw new NoFundamentalException(
          String.format(
              Locale.ROOT,
              "The capture is %.1f ms long: at least one cycle of %.0f Hz is needed.",
              1000 * span,
              nominalHz));
    }
    int samples = (int) Math.min(t.length, Math.round(t.length * cycles / (f * span)));
    return new Window(f, fundamental.settled(), cycles, samples, orders(t, samples, f), nominalHz);
  }

  /** Voltages carry the fundamental best; currents are taken where there are none. */
  private static List<double[]> reference(Capture capture) {
    List<double[]> voltages = new ArrayList<>();
    List<double[]> currents = new ArrayList<>();
    for (Capture.Channel c : capture.channels()) {
      List<double[]> kind = c.quantity().endsWith(".v") ? voltages : currents;
      if (c.quantity().startsWith("L")) {
        capture.find(c.quantity()).ifPresent(kind::add);
      }
    }
    List<double[]> reference = voltages.isEmpty() ? currents : voltages;
    if (reference.isEmpty()) {
      throw new NoFundamentalException("The capture holds no line's voltage or current.");
    }
    return reference;
  }

  private static int orders(double[] t, int samples, double f) {
    double longest = 0;
    for (int k = 1; k < samples; k++) {
      longest = Math.max(longest, t[k] - t[k - 1]);
    }
    int resolved = (int) Math.ceil(0.5 / (longest * f) - 0.5) - 1;
    if (resolved < 1) {
      throw new NoFundamentalException(
          "The samples stand too far apart: more than two to a cycle are needed.");
    }
    return Math.min(Spectrum.HIGHEST_ORDER, resolved);
  }

  /** Cycles of the standard window: 10 at 50 Hz, 12 at 60 Hz (IEC 61000-4-7, 4.4.1). */
  int standardCycles() {
    return nominalHz > 55 ? 12 : 10;
  }

  /** Over what the figures are formed. */
  String basis() {
    String used =
        String.format(
            Locale.ROOT,
            "%s at %.3f Hz%s, %d samples a channel, orders 1 to %d, without the direct component",
            count(),
            frequencyHz,
            frequencyFound ? "" : " (nominal: the record is too short to find it)",
            samples,
            orders);
    return used + ". " + aggregation();
  }

  private String aggregation() {
    return cycles < standardCycles()
        ? "Shorter than the "
            + standardCycles()
            + "-cycle window of IEC 61000-4-7, so no standard aggregation."
        : "Figures are means over these cycles, not the aggregation of IEC 61000-4-30.";
  }

  /** The cycles in words, as a sentence begins. */
  String count() {
    String[] words = {
      "One cycle",
      "Two",
      "Three",
      "Four",
      "Five",
      "Six",
      "Seven",
      "Eight",
      "Nine",
      "Ten",
      "Eleven",
      "Twelve"
    };
    return cycles == 1 ? words[0] : (cycles <= 12 ? words[cycles - 1] : cycles) + " cycles";
  }
}
