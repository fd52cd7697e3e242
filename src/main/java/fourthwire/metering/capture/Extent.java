package fourthwire.metering.capture;

import fourthwire.metering.capture.window.PhaseTrack;
import java.util.Locale;
import java.util.Optional;

/**
 * The part of a capture that is analysed: the largest whole number of cycles, and how.
 *
 * @param frequencyHz the fundamental, mean over the record
 * @param certainty where the frequency comes from
 * @param cycles whole cycles
 * @param samples samples per channel in them, from the first
 * @param orders highest order that the sampling resolves, at most 50
 * @param nominalHz 50 or 60, whichever the fundamental is nearer to
 * @param track the fundamental's clock, where the record holds standard windows
 */
record Extent(
    double frequencyHz,
    Certainty certainty,
    int cycles,
    int samples,
    int orders,
    double nominalHz,
    Optional<PhaseTrack> track) {

  /** Where the frequency comes from. */
  enum Certainty {
    /** Found from the samples. */
    FOUND(""),
    /** Found, but it moves too much for one figure to be exact. */
    UNSTEADY(" (unsteady: the strongest line of the record)"),
    /** The site's. */
    NOMINAL(" (nominal: the record is too short to find it)");

    private final String remark;

    Certainty(String remark) {
      this.remark = remark;
    }
  }

  /** Cycles of the standard window: 10 at 50 Hz, 12 at 60 Hz (IEC 61000-4-7, 4.4.1). */
  static int standardCycles(double nominalHz) {
    return nominalHz > 55 ? 12 : 10;
  }

  /** Likewise, of this record. */
  int standardCycles() {
    return standardCycles(nominalHz);
  }

  /** The same, its orders fitted instead of formed in windows. */
  Extent withoutWindows() {
    return new Extent(frequencyHz, certainty, cycles, samples, orders, nominalHz, Optional.empty());
  }

  /** Over what the figures are formed. */
  String basis() {
    String used =
        String.format(
            Locale.ROOT,
            "%s at %.3f Hz%s, %d samples a channel, orders 1 to %d, without the direct component",
            count(),
            frequencyHz,
            certainty.remark,
            samples,
            orders);
    return used + ". " + aggregation();
  }

  private String aggregation() {
    if (track.isPresent()) {
      return windows();
    }
    return cycles < standardCycles()
        ? "Shorter than the "
            + standardCycles()
            + "-cycle window of IEC 61000-4-7, so no standard aggregation."
        : "The sampling is uneven, too sparse or has gaps, so figures are fitted over these cycles"
            + " and there are no windows of IEC 61000-4-7.";
  }

  private String windows() {
    int full = cycles / standardCycles();
    int rest = cycles % standardCycles();
    return String.format(
        Locale.ROOT,
        "Root mean squares of %d gapless %d-cycle window%s (IEC 61000-4-7)%s.",
        full,
        standardCycles(),
        full == 1 ? "" : "s",
        rest == 0
            ? ""
            : rest == 1
                ? ", and by its share the cycle after them"
                : ", and by their share the " + rest + " cycles after them");
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
