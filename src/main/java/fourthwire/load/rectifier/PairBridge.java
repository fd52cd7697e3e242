package fourthwire.load.rectifier;

/**
 * A single-phase bridge followed through time from a section of the cycle: off, conducting with one
 * pair of diodes, off, conducting with the other.
 *
 * <p>The ends of conduction are found as events: the start where |e| rises over the capacitor's
 * voltage and the diodes' threshold, by root finding on the exact discharge (v² falls linearly
 * under constant power); the end where the current falls through the threshold, by repeating the
 * step with another length. Workspace of one solver, not thread-safe.
 */
final class PairBridge {
  /** What a march ended with. */
  enum End {
    /** The end of the interval was reached. */
    REACHED,
    /** The load emptied the capacitor, or the current breaks up without end as it does so. */
    COLLAPSED
  }

  /** First steps after a turn-on, as shares of the way to a node: the current starts like t². */
  private static final double[] GRADING = {0.02, 0.06, 0.16, 0.36, 1};

  private static final int MOST_SWITCHINGS = 200;

  final CycleTable emf = new CycleTable();
  final PathStep path = new PathStep();
  final PulseTrace trace = new PulseTrace();

  /** Capacitor voltage under which the load counts as having emptied it. */
  double floorV;

  private boolean recording;
  private int switchings;

  /** Position in cells. */
  private double u;

  /** Signed current into the port, amps; 0 while off. */
  double i;

  /** Capacitor voltage. */
  double v;

  /** Whether the last march had an interval without current, and where its middle lay. */
  boolean wasOff;

  double middleOfOff;

  private double longestOff;

  /**
   * Marches from a position with signed current i0 and voltage v0 over a number of cells.
   *
   * @param record whether the current is kept in {@link #trace}
   */
  End march(double from, double cells, double i0, double v0, boolean record) {
    recording = record;
    switchings = 0;
    wasOff = false;
    longestOff = 0;
    u = from;
    i = i0;
    v = v0;
    if (record) {
      trace.clear();
    }
    double to = from + cells;
    boolean conducting = i0 != 0;
    while (u < to) {
      if (conducting) {
        if (!conduct(to)) {
          return End.COLLAPSED;
        }
        conducting = false;
      } else {
        if (!rest(to)) {
          return End.COLLAPSED;
        }
        conducting = u < to;
      }
    }
    return End.REACHED;
  }

  /** Off until |e| passes the capacitor; leaves u at the turn-on or at the end. */
  private boolean rest(double to) {
    double from = u;
    double square = v * v;
    double fall = 2 * path.power / path.capacitance;
    double start = Math.abs(emf.at(u)) - path.thresholdV;
    boolean on = start > v + path.slopeV;
    double before = u;
    while (!on) {
      double node = Math.min(Math.floor(before) + 1, to);
      double left = square - fall * (node - from);
      if (left <= floorV * floorV) {
        return false;
      }
      double drive = Math.abs(emf.at(node)) - path.thresholdV;
      if (drive > 0 && drive * drive >= left) {
        u = turnOn(before, node, from, square, fall);
        on = true;
      } else if (node >= to) {
        u = to;
        break;
      }
      before = node;
    }
    v = Math.sqrt(square - fall * (u - from));
    i = 0;
    if (u - from > longestOff) {
      longestOff = u - from;
      middleOfOff = (u + from) / 2;
    }
    wasOff |= u > from;
    return true;
  }

  /** Root of |e| - threshold - v between two positions, by Illinois regula falsi. */
  private double turnOn(double a, double b, double from, double square, double fall) {
    double ga = excess(a, from, square, fall);
    if (ga >= 0) {
      return b; // just turned off: let it move on, or it chatters
    }
    double gb = excess(b, from, square, fall);
    double low = a;
    double high = b;
    for (int n = 0; n < 60 && high - low > 1e-9; n++) {
      double x = high - gb * (high - low) / (gb - ga);
      double gx = excess(x, from, square, fall);
      if (Math.abs(gx) < 1e-10 * (1 + Math.sqrt(square))) {
        return x;
      }
      if (gx < 0) {
        low = x;
        ga = gx;
        gb /= 2;
      } else {
        high = x;
        gb = gx;
        ga /= 2;
      }
    }
    return high;
  }

  private double excess(double at, double from, double square, double fall) {
    return Math.abs(emf.at(at)) - path.thresholdV - Math.sqrt(square - fall * (at - from));
  }

  /**
   * On until the current falls through the threshold or the end; false if the capacitor empties.
   */
  private boolean conduct(double to) {
    if (++switchings > MOST_SWITCHINGS) {
      return false;
    }
    boolean starting = i == 0;
    int sign = (starting ? emf.at(u) : i) >= 0 ? 1 : -1;
    double amps = starting ? path.threshold : Math.abs(i);
    if (recording) {
      trace.start(u, sign * amps);
    }
    if (starting) {
      double node = path.nextNode(path.nextNode(u));
      double base = u;
      double span = Math.min(node, to) - base;
      for (double share : GRADING) {
        amps = advance(sign, amps, base + share * span);
        if (amps == 0) {
          return v > 0;
        }
      }
    }
    while (u < to) {
      amps = advance(sign, amps, Math.min(path.nextNode(u), to));
      if (amps == 0) {
        return v > 0;
      }
    }
    i = sign * amps;
    return true;
  }

  /** One step to a position; returns the current there, or 0 where it ended before. */
  private double advance(int sign, double amps, double next) {
    double h = next - u;
    double e0 = sign * emf.at(u);
    double d0 = sign * emf.slopeAt(u);
    path.step(h, amps, v, e0, d0, sign * emf.at(next));
    if (!(path.v > floorV)) {
      v = 0;
      return 0;
    }
    if (path.i < path.threshold) {
      h = turnOff(sign, amps, h, e0, d0);
      path.i = 0;
    }
    double charge = path.charge(h, v);
    u = path.i == 0 ? u + h : next;
    v = path.v;
    i = 0;
    if (recording) {
      trace.next(u, sign * path.i, sign * charge);
    }
    return path.i;
  }

  /** Length of the step after which the current is just at the threshold. */
  private double turnOff(int sign, double amps, double whole, double e0, double d0) {
    double low = 0;
    double gLow = Math.max(amps - path.threshold, 1e-12 * path.threshold);
    double high = whole;
    double gHigh = path.i - path.threshold;
    double h = whole;
    for (int n = 0; n < 40 && high - low > 1e-7; n++) {
      h = high - gHigh * (high - low) / (gHigh - gLow);
      path.step(h, amps, v, e0, d0, sign * emf.at(u + h));
      double g = path.i - path.threshold;
      if (Math.abs(g) < 1e-3 * path.threshold) {
        return h;
      }
      if (g > 0) {
        low = h;
        gLow = g;
        gHigh /= 2;
      } else {
        high = h;
        gHigh = g;
        gLow /= 2;
      }
    }
    h = high;
    path.step(h, amps, v, e0, d0, sign * emf.at(u + h));
    return h;
  }
}
