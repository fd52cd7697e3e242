package fourthwire.load.rectifier;

import fourthwire.load.model.PortSpectra;

/**
 * One six-pulse bridge, or two on one capacitor, followed through time: of each bridge no line
 * conducts, a pair, or three in commutation overlap; each change of the conducting set is found as
 * an event.
 *
 * <p>A line joins where, with a diode's threshold current in it and the direct current unchanged,
 * that current would grow; it leaves where its current falls through the threshold, handing it to
 * the line that stays. Workspace, not thread-safe.
 */
final class ThreeLineBridge {
  /** First steps after a change, as shares of the way to a node: the current starts like t². */
  private static final double[] GRADING = {0.02, 0.06, 0.16, 0.36, 1};

  private static final int MOST_SWITCHINGS = 600;
  private static final double EVENT_CELLS = 1e-7;

  /**
   * After a line has left one may join only this many cells later, unless its margin is clear: a
   * current of about the threshold's would else come and go without end.
   */
  private static final double REST_OF_LEAVER = 0.1;

  final ThreeLineEmf emf = new ThreeLineEmf();
  final PulseTrace[] trace = new PulseTrace[6];
  final PathStep pair = new PathStep();

  /** Space for the spectra of a second bridge's windings. */
  final PortSpectra second = new PortSpectra(3);

  /** Signed line currents, 0 where a line does not conduct; of a second bridge from 3 on. */
  final double[] line = new double[6];

  /** Capacitor voltage. */
  double v;

  /** Capacitor voltage under which the load counts as having emptied it. */
  double floorV;

  /** Line currents at the start of a step. */
  private final double[] before = new double[6];

  private final LoopStep loops = new LoopStep();
  private final Loop idle = new Loop();
  private final Loop joiner = new Loop();
  private final Discharge discharge = new Discharge(this::spread, pair);
  private final EventFinder.Margin shortfall = this::shortfall;
  private final EventFinder.Margin joinMargin = this::marginAfter;

  private int bridges = 1;
  private boolean recording;
  private int switchings;
  private boolean justLeft;
  private double joinsFrom;

  /** Position in cells, and the end of the march. */
  private double u;

  private double to;

  ThreeLineBridge() {
    java.util.Arrays.setAll(trace, k -> new PulseTrace());
  }

  /**
   * Takes the circuit.
   *
   * @param sourceOhm resistance per line ahead of the bridges
   * @param sourceHenry inductance likewise
   * @param ownHenry inductance of each bridge's line
   */
  void set(
      int bridges,
      double sourceOhm,
      double sourceHenry,
      double ownHenry,
      BridgeLoad load,
      double cellSeconds,
      double threshold) {
    this.bridges = bridges;
    double ohm = 2 * (sourceOhm + load.lineOhm()) + load.dcOhm();
    double henry = 2 * (sourceHenry + ownHenry) + load.dcHenry();
    pair.set(ohm, henry, load, cellSeconds);
    pair.threshold(threshold);
    loops.set(sourceOhm, sourceHenry, ownHenry, load, cellSeconds);
    loops.threshold(threshold);
  }

  int lines() {
    return 3 * bridges;
  }

  private double spread(double position) {
    double spread = emf.spread(0, position);
    return bridges == 1 ? spread : Math.max(spread, emf.spread(1, position));
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
    for (int k = 0; k < lines() && record; k++) {
      trace[k].clear();
    }
    int earlier = conducting(0, lines());
    while (u < to && v > floorV && switchings <= MOST_SWITCHINGS) {
      int now = conducting(0, lines());
      if (now == 0) {
        rest();
      } else {
        begin();
        conduct(now > earlier);
      }
      earlier = now;
    }
    return u >= to && v > floorV;
  }

  private int conducting(int from, int to) {
    int count = 0;
    for (int k = from; k < to; k++) {
      count += line[k] != 0 ? 1 : 0;
    }
    return count;
  }

  private void begin() {
    switchings++;
    for (int k = 0; k < lines() && recording; k++) {
      if (line[k] != 0) {
        trace[k].start(u, line[k]);
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
      int b = bridges == 1 || emf.spread(0, u) >= emf.spread(1, u) ? 0 : 1;
      line[emf.highest(b, u)] = pair.threshold;
      line[emf.lowest(b, u)] = -pair.threshold;
    }
  }

  /** Steps until the set of conducting lines changes. */
  private void conduct(boolean fresh) {
    arrange();
    System.arraycopy(loops.from, 0, loops.x, 0, loops.n);
    loops.v = v;
    if (joins(margin(u), u)) {
      join();
      return;
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
      same = step(u < joinsFrom ? Math.min(next, joinsFrom) : next);
    }
  }

  /** The loops in which the conducting lines share the current. */
  private void arrange() {
    loops.n = 0;
    for (int b = 0; b < bridges; b++) {
      int k = 3 * b;
      int balance = signum(line[k]) + signum(line[k + 1]) + signum(line[k + 2]);
      int sign = balance >= 0 ? 1 : -1;
      int common = line[k] * sign < 0 ? k : line[k + 1] * sign < 0 ? k + 1 : k + 2;
      for (int m = k; m < k + 3; m++) {
        if (line[m] * sign > 0) {
          loops.add(m, common, sign, line[m] * sign);
        }
      }
    }
    loops.couple();
  }

  private static int signum(double x) {
    return x > 0 ? 1 : x < 0 ? -1 : 0;
  }

  /** The line of a loop's bridge that is not in it. */
  private static int third(Loop loop) {
    return 9 * loop.bridge() + 3 - loop.in - loop.out;
  }

  /** One step; false where the set of conducting lines has changed. */
  private boolean step(double next) {
    double h = next - u;
    double missing = shortfall(h);
    boolean leaves = missing > 0;
    if (leaves) {
      double short0 = pair.threshold - least(loops.from);
      h = EventFinder.find(shortfall, 0, short0, h, missing, EVENT_CELLS, 1e-3 * pair.threshold);
    }
    double margin = margin(u + h);
    boolean joins = joins(margin, u + h);
    if (joins) {
      h = joinAfter(h, margin);
      leaves = false;
    }
    put(leaves || joins ? u + h : next);
    if (leaves) {
      leave();
    } else if (joins) {
      join();
    }
    return !leaves && !joins;
  }

  private double joinAfter(double h, double margin) {
    System.arraycopy(loops.from, 0, loops.x, 0, loops.n);
    loops.v = v;
    double atStart = margin(u);
    if (atStart < 0 && u >= joinsFrom) {
      return EventFinder.find(joinMargin, 0, atStart, h, margin, EVENT_CELLS, 0);
    }
    marginAfter(h);
    return h;
  }

  /** Takes over what the last step has come to, which ends at a position. */
  private void put(double end) {
    System.arraycopy(line, 0, before, 0, lines());
    double chargePerAmp = loops.chargePerAmp(end - u, v);
    u = end;
    v = loops.v;
    for (int a = 0; a < loops.n; a++) {
      line[loops.loop[a].out] = 0;
    }
    for (int a = 0; a < loops.n; a++) {
      Loop loop = loops.loop[a];
      loops.from[a] = loops.x[a];
      line[loop.in] = loop.sign * loops.x[a];
      line[loop.out] -= line[loop.in];
    }
    for (int k = 0; k < lines() && recording; k++) {
      if (line[k] != 0) {
        trace[k].next(u, line[k], chargePerAmp * (before[k] + line[k]));
      }
    }
  }

  /** The smallest current leaves its line: to the line that stays, or with its whole pair. */
  private void leave() {
    int gone = 0;
    for (int a = 1; a < loops.n; a++) {
      if (loops.x[a] < loops.x[gone]) {
        gone = a;
      }
    }
    Loop loop = loops.loop[gone];
    int k = 3 * loop.bridge();
    double rest = line[loop.in];
    line[loop.in] = 0;
    if (conducting(k, k + 3) == 2) {
      line[third(loop)] += rest;
    } else {
      line[loop.out] = 0;
    }
    justLeft = loops.n == 1;
    joinsFrom = u + REST_OF_LEAVER;
  }

  /** Steps by h cells; by how much the smallest current falls short of the threshold then. */
  private double shortfall(double h) {
    if (loops.n > 1) {
      loops.step(emf, u, h, v);
    } else {
      Loop one = loops.loop[0];
      pair.step(
          h, loops.from[0], v, one.drive(emf, u), one.driveSlope(emf, u), one.drive(emf, u + h));
      loops.x[0] = pair.i;
      loops.v = pair.v;
    }
    return pair.threshold - least(loops.x);
  }

  private double least(double[] amps) {
    double least = amps[0];
    for (int a = 1; a < loops.n; a++) {
      least = Math.min(least, amps[a]);
    }
    return least;
  }

  private boolean joins(double margin, double at) {
    return margin >= (at < joinsFrom ? pair.slopeV : 0);
  }

  private double marginAfter(double h) {
    shortfall(h);
    return margin(u + h);
  }

  /** The margin of the idle line that is the most willing to join, which becomes the joiner. */
  private double margin(double at) {
    double most = Double.NEGATIVE_INFINITY;
    if (loops.n < 2 * bridges) {
      loops.rates(emf, at);
      for (int b = 0, a = 0; b < bridges; b++) {
        int first = a;
        while (a < loops.n && loops.loop[a].bridge() == b) {
          a++;
        }
        if (a == first) {
          most = Math.max(most, offMargin(3 * b, at, most));
        } else if (a == first + 1) {
          most = Math.max(most, thirdMargin(first, at, most));
        }
      }
    }
    return most;
  }

  /** Of a bridge without current: each pair of its lines, both ways. */
  private double offMargin(int k, double at, double atLeast) {
    double most = atLeast;
    for (int in = k; in < k + 3; in++) {
      for (int out = k; out < k + 3; out++) {
        if (in != out) {
          most = candidate(in, out, 0, at, most);
        }
      }
    }
    return most;
  }

  /** Of a pair's idle line: on either side. */
  private double thirdMargin(int a, double at, double atLeast) {
    Loop loop = loops.loop[a];
    int third = third(loop);
    double up = candidate(third, loop.out, loops.x[a], at, atLeast);
    return candidate(loop.in, third, loops.x[a], at, up);
  }

  private double candidate(int in, int out, double carried, double at, double atLeast) {
    idle.set(in, out, 1);
    double margin = loops.margin(idle, emf, at, carried);
    if (margin > atLeast) {
      joiner.set(in, out, 1);
      return margin;
    }
    return atLeast;
  }

  /** Lets the joiner in with a threshold's share of the current. */
  private void join() {
    double amps = pair.threshold;
    double enter = line[joiner.in];
    double leave = line[joiner.out];
    if (enter == 0 && leave == 0) {
      line[joiner.in] = amps;
      line[joiner.out] = -amps;
      return;
    }
    int yields = third(joiner);
    double total = Math.max(Math.abs(line[yields]), 2 * amps);
    int sign = enter == 0 ? 1 : -1;
    line[enter == 0 ? joiner.in : joiner.out] = sign * amps;
    line[enter == 0 ? joiner.out : joiner.in] = -sign * total;
    line[yields] = sign * (total - amps);
  }
}
