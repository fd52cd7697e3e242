package fourthwire.load.rectifier.path;

/**
 * Finds where a margin rises through zero: the moment at which a diode starts or ends conducting.
 *
 * <p>Regula falsi, the side that stands still being weighed down by a parabola through the last
 * three points (Anderson and Björck, "A new high order method of regula falsi type for computing a
 * root of an equation", BIT 13, 1973).
 */
public final class EventFinder {
  private static final int MOST_TRIES = 60;

  /** By how much something is past the event; negative before it. */
  public interface Margin {
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
  public static double find(
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
      boolean again = lastIsHigh == g >= 0;
      lastIsHigh = g >= 0;
      if (lastIsHigh) {
        ga *= again ? left(g, gb) : 1;
        b = x;
        gb = g;
        if (g <= close) {
          break;
        }
      } else {
        gb *= again ? left(g, ga) : 1;
        a = x;
        ga = g;
      }
    }
    if (!lastIsHigh) {
      margin.at(b);
    }
    return b;
  }

  /** What is left of the far side's margin when the near side's goes from one value to another. */
  private static double left(double to, double from) {
    double share = 1 - to / from;
    return share > 0 ? share : 0.5;
  }
}
