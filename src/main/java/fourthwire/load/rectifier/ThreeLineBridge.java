package fourthwire.load.rectifier;

/**
 * A six-pulse bridge followed through time: no line conducting, a pair, or three in commutation
 * overlap; each change of the conducting set is found as an event.
 *
 * <p>A third line joins where, with a diode's threshold current in it and the direct current
 * unchanged, that current would grow; a line leaves where its current falls through the threshold,
 * handing it to the line that stays. Both look at the same equations at the same currents, so that
 * a line that has joined does not leave at once. Workspace of one solver, not thread-safe.
 */
final class ThreeLineBridge {
  /** First steps after a change, as shares of the way to a node: the current starts like t². */
  private static final double[] GRADING = {0.02, 0.06, 0.16, 0.36, 1};

  private static final int MOST_SWITCHINGS = 600;
  private static final double EVENT_CELLS = 1e-7;

  /**
   * A line that has left may join again only this many cells later, unless its margin is clear: a
   * current of about the threshold's would else come and go without end.
   */
  private static final double REST_OF_LEAVER = 0.1;

  final ThreeLineEmf emf = new ThreeLineEmf();
  final PulseTrace[] trace = {new PulseTrace(), new PulseTrace(), new PulseTrace()};
  final PathStep pair = new PathStep();

  /** Signed line currents, 0 where a line does not conduct. */
  final double[] line = new double[3];

  /** Capacitor voltage. */
  double v;

  /** Capacitor voltage under which the load counts as having emptied it. */
  double floorV;

  private final OverlapStep overlap = new OverlapStep();
  private final Discharge discharge = new Discharge(emf::spread, pair);
  private final EventFinder.Margin pairShortfall = this::pairShortfall;
  private final EventFinder.Margin joinMargin = this::joinMarginAfter;
  private final EventFinder.Margin overlapShortfall = this::overlapShortfall;

  private boolean recording;
  private int switchings;
  private boolean justLeft;
  private double joinsFrom;

  /** Position in cells, and the end of the march. */
  private double u;

  private double to;

  /** Lines of a pair: current enters by p, returns by n, t idles. */
  private int p;

  private int n;
  private int t;

  /** Lines of an overlap: a and b share the current that returns by c; sign of a's current. */
  private int a;

  private int b;
  private int c;
  private int sign;

  /** Shared currents at the start of a step. */
  private double xa;

  private double xb;

  void set(double ohm, double henry, BridgeLoad load, double cellSeconds, double threshold) {
    pair.set(2 * ohm + load.dcOhm(), 2 * henry + load.dcHenry(), load, cellSeconds);
    overlap.set(ohm, henry, load, cellSeconds);
    pair.threshold(threshold);
    overlap.threshold(threshold);
  }

  /**
   * Marches over a number of cells from a position, starting with {@link #line} and {@link #v} as
   * they stand.
   *
   * @return false where the load empties the capacitor, or the current breaks up without end
   */
  boolean march(double from, double cells, boolean record) {
    recording = record;
    switchings = 0;
    justLeft = false;
    joinsFrom = from;
    u = from;
    to = from + cells;
    if (record) {
      for (PulseTrace each : trace) {
        each.clear();
      }
    }
    int before = conducting();
    while (u < to && v > floorV && switchings <= MOST_SWITCHINGS) {
      int now = conducting();
      if (now == 0) {
        rest();
      } else {
        begin();
        conduct(now, now > before);
      }
      before = now;
    }
    return u >= to && v > floorV;
  }

  private int conducting() {
    return (line[0] != 0 ? 1 : 0) + (line[1] != 0 ? 1 : 0) + (line[2] != 0 ? 1 : 0);
  }

  private void begin() {
    switchings++;
    if (recording) {
      for (int k = 0; k < 3; k++) {
        if (line[k] != 0) {
          trace[k].start(u, line[k]);
        }
      }
    }
  }

  private void rest() {
    if (!discharge.run(u, v, justLeft, to, floorV)) {
      v = 0;
      return;
    }
    justLeft = false;
    u = discharge.u;
    v = discharge.v;
    if (discharge.turnedOn) {
      line[emf.highest(u)] = pair.threshold;
      line[emf.lowest(u)] = -pair.threshold;
    }
  }

  /** Steps until the set of conducting lines changes. */
  private void conduct(int lines, boolean fresh) {
    if (lines == 2) {
      p = line[0] > 0 ? 0 : line[1] > 0 ? 1 : 2;
      n = line[0] < 0 ? 0 : line[1] < 0 ? 1 : 2;
      t = 3 - p - n;
      if (joins(joinMargin(line[p], u, v), u)) {
        join();
        return;
      }
    } else {
      int positive = (line[0] > 0 ? 1 : 0) + (line[1] > 0 ? 1 : 0) + (line[2] > 0 ? 1 : 0);
      sign = positive == 2 ? 1 : -1;
      c = line[0] * sign < 0 ? 0 : line[1] * sign < 0 ? 1 : 2;
      a = c == 0 ? 1 : 0;
      b = 3 - a - c;
    }
    double base = u;
    double span = Math.min(pair.nextNode(pair.nextNode(u)), to) - u;
    int graded = fresh ? 0 : GRADING.length;
    boolean same = true;
    while (same && u < to && v > floorV) {
      double next =
          graded < GRADING.length
              ? base + GRADING[graded++] * span
              : Math.min(pair.nextNode(u), to);
      if (u < joinsFrom) {
        next = Math.min(next, joinsFrom);
      }
      same = lines == 2 ? stepPair(next) : stepOverlap(next);
    }
  }

  /** One step of a pair; false where the set of conducting lines has changed. */
  private boolean stepPair(double next) {
    xa = line[p];
    double h = next - u;
    double short0 = pairShortfall(h);
    boolean leaves = short0 > 0;
    if (leaves) {
      h = EventFinder.find(pairShortfall, 0, pair.threshold - xa, h, short0, EVENT_CELLS, 0);
    }
    double margin = joinMargin(pair.i, u + h, pair.v);
    boolean joins = joins(margin, u + h);
    if (joins) {
      h = joinAfter(h, margin);
      leaves = false;
    }
    double charge = pair.charge(h, v);
    u = leaves || joins ? u + h : next;
    v = pair.v;
    line[p] = pair.i;
    line[n] = -pair.i;
    if (recording) {
      trace[p].next(u, pair.i, charge);
      trace[n].next(u, -pair.i, -charge);
    }
    if (leaves) {
      endPair();
    } else if (joins) {
      join();
    }
    return !leaves && !joins;
  }

  private double joinAfter(double h, double margin) {
    double before = joinMargin(xa, u, v);
    return before < 0 && u >= joinsFrom
        ? EventFinder.find(joinMargin, 0, before, h, margin, EVENT_CELLS, 0)
        : h;
  }

  private void endPair() {
    line[p] = 0;
    line[n] = 0;
    justLeft = true;
  }

  /** Steps the pair by h cells; by how much its current falls short of the threshold then. */
  private double pairShortfall(double h) {
    pair.step(h, xa, v, emf.between(p, n, u), emf.slopeBetween(p, n, u), emf.between(p, n, u + h));
    return pair.threshold - pair.i;
  }

  private boolean joins(double margin, double at) {
    return margin >= (at < joinsFrom ? pair.slopeV : 0);
  }

  private double joinMarginAfter(double h) {
    pairShortfall(h);
    return joinMargin(pair.i, u + h, pair.v);
  }

  /** The idle line's margin on the side where it is larger, volts. */
  private double joinMargin(double amps, double at, double volts) {
    double drive = emf.between(p, n, at);
    double above = emf.between(t, n, at);
    return overlap.margin(amps, volts, drive, Math.max(above, drive - above));
  }

  /** Lets the idle line in on its side, with a threshold's share of the current. */
  private void join() {
    double above = emf.between(t, n, u);
    double total = Math.max(line[p], 2 * pair.threshold);
    boolean up = 2 * above > emf.between(p, n, u);
    line[p] = total;
    line[n] = -total;
    line[t] = up ? pair.threshold : -pair.threshold;
    line[up ? p : n] -= line[t];
  }

  /** One step of an overlap; false where the set of conducting lines has changed. */
  private boolean stepOverlap(double next) {
    xa = sign * line[a];
    xb = sign * line[b];
    double h = next - u;
    double short0 = overlapShortfall(h);
    boolean leaves = short0 > 0;
    if (leaves) {
      double before = pair.threshold - Math.min(xa, xb);
      h = EventFinder.find(overlapShortfall, 0, before, h, short0, EVENT_CELLS, 0);
    }
    u = leaves ? u + h : next;
    v = overlap.v;
    line[a] = sign * overlap.xa;
    line[b] = sign * overlap.xb;
    line[c] = -line[a] - line[b];
    if (recording) {
      for (int k = 0; k < 3; k++) {
        trace[k].next(u, line[k], Double.NaN);
      }
    }
    if (leaves) {
      leave();
    }
    return !leaves;
  }

  private void leave() {
    joinsFrom = u + REST_OF_LEAVER;
    int gone = overlap.xa < overlap.xb ? a : b;
    line[gone] = 0;
    line[a + b - gone] = -line[c];
  }

  private double overlapShortfall(double h) {
    double end = u + h;
    overlap.step(
        h,
        xa,
        xb,
        v,
        sign * emf.between(a, c, u),
        sign * emf.slopeBetween(a, c, u),
        sign * emf.between(a, c, end),
        sign * emf.between(b, c, u),
        sign * emf.slopeBetween(b, c, u),
        sign * emf.between(b, c, end));
    return pair.threshold - Math.min(overlap.xa, overlap.xb);
  }
}
