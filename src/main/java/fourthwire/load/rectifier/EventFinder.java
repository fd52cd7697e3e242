package fourthwire.load.rectifier;

/**
 * Finds where a margin rises through zero: the moment at which a diode starts or ends conducting.
 *
 * <p>Regula falsi with halving of the side that stands still (the Illinois rule; Dowell and
 * Jarratt, "A modified regula falsi method", BIT 11, 1971).
 */
final class EventFinder {
  private static final int MOST_TRIES = 60;

  /** By how much something is past the event; negative before it. */
  interface Margin {
    /** At a place; may leave the caller's workspace as it is there. */
    double at(double place);
  }

  private EventFinder() {}

  /**
   * The first found place at which the margin is no longer negative: never before the event, and
   * the margin was evaluated there last.
   *
   * @param margin negative at {@code low}, zero or more at {@code high}
   * @param atLow its value at low; held to be just under zero where rounding has it above
   * @param atHigh its value at high
   * @param width how near to the event the place has to be
   * @param close a margin of zero to this much ends the search
   */
  static double find(
      Margin margin,
      double low,
      double atLow,
      double high,
      double atHigh,
      double width,
      double close) {
    double a = low;
    double b = high;
    double ga = Math.min(atLow, -1e-12 * Math.abs(atHigh));
    double gb = atHigh;
    boolean lastIsHigh = true;
    for (int n = 0; n < MOST_TRIES && b - a > width; n++) {
      double x = b - gb * (b - a) / (gb - ga);
      double g = margin.at(x);
      lastIsHigh = g >= 0;
      if (lastIsHigh) {
        b = x;
        gb = g;
        ga /= 2;
        if (g <= close) {
          break;
        }
      } else {
        a = x;
        ga = g;
        gb /= 2;
      }
    }
    if (!lastIsHigh) {
      margin.at(b);
    }
    return b;
  }
}
