package fourthwire.load.rectifier.loop;

import fourthwire.load.rectifier.path.Discharge;
import fourthwire.load.rectifier.path.EventFinder;
import fourthwire.load.rectifier.path.PathStep;
import fourthwire.load.rectifier.path.PulseTrace;

/**
 * A bridge on one capacitor followed through time, whichever of its diodes conduct: a subclass
 * knows the loops of current that there are ({@link LoopStep}); this strings their steps together.
 *
 * <p>Each change of the conducting set is found as an event. A loop's current starts where, with a
 * diode's threshold current in it and the direct current unchanged, it would grow; it ends where it
 * falls through the threshold. Workspace, not thread-safe.
 */
abstract class LoopBridge {
  private static final int MOST_SWITCHINGS = 600;

  /**
   * After a line has left one may join only this many cells later, unless its margin is clear: a
   * current of about the threshold's would else come and go without end.
   */
  private static final double REST_OF_LEAVER = 0.1;

  final ThreeLineEmf emf = new ThreeLineEmf();

  /** One for each current in {@link #line}. */
  final PulseTrace[] trace;

  final PathStep pair = new PathStep();

  /** How long steps are; to be made fine or coarse after the circuit is set. */
  final StepGrid grid = new StepGrid(pair);

  final LoopStep loops;

  /** How the state answers to that at the start of the march; no columns, no work. */
  final LoopTangent tangent;

  /** The state's currents, 0 where none flows: signed currents of lines, or of paths. */
  final double[] line;

  /** Capacitor voltage. */
  double v;

  /** Capacitor voltage under which the load counts as having emptied it. */
  double floorV;

  /** Position in cells. */
  double u;

  /** Line currents at the start of a step. */
  private final double[] before;

  private final Discharge discharge = new Discharge(this::drive, pair);
  private final EventFinder.Margin shortfall = this::shortfall;
  private final EventFinder.Margin joinMargin = this::marginAfter;

  private boolean recording;
  private int switchings;
  private boolean justLeft;
  private double joinsFrom;

  /** End of the march. */
  private double to;

  /**
   * Of a kind.
   *
   * @param currents most of them in its state
   * @param linesOfOne how many lines in sequence belong to one bridge
   */
  LoopBridge(int currents, int linesOfOne) {
    trace = new PulseTrace[currents];
    java.util.Arrays.setAll(trace, k -> new PulseTrace());
    line = new double[currents];
    before = new double[currents];
    loops = new LoopStep(linesOfOne);
    tangent = new LoopTangent(currents);
  }

  /** How many currents there are in the state. */
  abstract int lines();

  /** The largest voltage that could drive a current at a position. */
  abstract double drive(double position);

  /** Starts the first current, with the threshold's amps, at {@link #u}. */
  abstract void turnOn();

  /** The loops in which the state's currents flow. */
  abstract void arrange();

  /** Writes the loops' currents as those of the state. */
  abstract void carry(double[] amps, double[] state);

  /** A loop's current, the smallest, ends. */
  abstract void leave(Loop loop);

  /** The margin of the idle loop that is the most willing to join. */
  abstract double margin(double at);

  /** Lets that loop in with a threshold's share of the current. */
  abstract void join();

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

  final int conducting(int from, int to) {
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
    tangent.rest(v, discharge.v);
    justLeft = false;
    u = discharge.u;
    v = discharge.v;
    if (discharge.turnedOn) {
      turnOn();
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
    tangent.enter(loops, emf, u);
    follow(fresh);
  }

  private void follow(boolean fresh) {
    grid.start(u, to, fresh);
    boolean same = true;
    while (same && u < to && v > floorV) {
      double next = grid.next(u, to);
      same = step(u < joinsFrom ? Math.min(next, joinsFrom) : next);
    }
    if (same) {
      tangent.exit(this);
    }
  }

  /** One step; false where the set of conducting lines has changed. */
  private boolean step(double next) {
    double h = next - u;
    double missing = shortfall(h);
    boolean leaves = missing > 0;
    if (leaves) {
      double short0 = pair.threshold - least(loops.from);
      h =
          EventFinder.find(
              shortfall, 0, short0, h, missing, grid.leaveWidth, 1e-3 * pair.threshold);
    }
    double margin = margin(u + h);
    boolean joins = joins(margin, u + h);
    if (joins) {
      h = joinAfter(h, margin);
      leaves = false;
    }
    put(leaves || joins ? u + h : next);
    if (leaves) {
      leaveSmallest();
    } else if (joins) {
      tangent.exit(this);
      join();
    }
    return !leaves && !joins;
  }

  private double joinAfter(double h, double margin) {
    System.arraycopy(loops.from, 0, loops.x, 0, loops.n);
    loops.v = v;
    double atStart = margin(u);
    if (atStart < 0 && u >= joinsFrom) {
      return EventFinder.find(joinMargin, 0, atStart, h, margin, grid.joinWidth, 0);
    }
    marginAfter(h);
    return h;
  }

  /** Takes over what the last step has come to, which ends at a position. */
  private void put(double end) {
    System.arraycopy(line, 0, before, 0, lines());
    double chargePerAmp = loops.chargePerAmp(end - u, v);
    tangent.step(loops, end - u, v);
    u = end;
    v = loops.v;
    System.arraycopy(loops.x, 0, loops.from, 0, loops.n);
    carry(loops.x, line);
    for (int k = 0; k < lines() && recording; k++) {
      if (line[k] != 0) {
        trace[k].next(u, line[k], chargePerAmp * (before[k] + line[k]));
      }
    }
  }

  private void leaveSmallest() {
    int gone = 0;
    for (int a = 1; a < loops.n; a++) {
      if (loops.x[a] < loops.x[gone]) {
        gone = a;
      }
    }
    tangent.end(loops, gone, emf, u);
    tangent.exit(this);
    leave(loops.loop[gone]);
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
}
