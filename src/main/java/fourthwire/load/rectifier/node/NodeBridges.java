package fourthwire.load.rectifier.node;

import fourthwire.load.model.SharedSource;
import fourthwire.load.rectifier.path.BridgeLoad;
import fourthwire.load.rectifier.path.CycleTable;
import fourthwire.load.rectifier.path.Discharge;
import fourthwire.load.rectifier.path.EventFinder;
import fourthwire.load.rectifier.path.PathStep;
import fourthwire.load.rectifier.path.PulseTrace;
import java.util.Arrays;
import java.util.List;

/**
 * Single-phase bridges on one node followed through time, whichever of them conduct: each starts
 * where what the others leave of the source passes its capacitor's voltage and its diodes'
 * threshold, and ends where its current falls through the threshold. Every change is found as an
 * event. Workspace, not thread-safe.
 */
final class NodeBridges {
  /** Of each bridge. */
  private static final int MOST_SWITCHINGS = 200;

  private static final double EVENT_CELLS = 1e-7;

  /**
   * After a bridge has left it may join only this many cells later, unless its margin is clear: a
   * current of about the threshold's would else come and go without end.
   */
  private static final double REST_OF_LEAVER = 0.1;

  /** First step after an event, and what steps grow by with the time since, in cells. */
  private static final double FIRST = 0.005;

  private static final double GROWTH = 0.7;

  /** Longest step. */
  private static final double LONGEST = 1;

  /** Longest step as a share of √(LC), and the least that this may come to. */
  private static final double SHARE_OF_RING = 0.3;

  private static final double LEAST_OF_RING = 0.25;

  /**
   * A current may fall by this share of itself in a step, or rise by the other: the diodes' law is
   * steep where it is small.
   */
  private static final double FALL = 0.6;

  private static final double RISE = 1;

  /** A rising current of so many thresholds is no longer told from its start. */
  private static final double LOW = 10;

  /** But no step need be shorter for that, in cells. */
  private static final double LEAST = 0.01;

  final CycleTable[] emf;
  final PulseTrace[] trace;
  final NodeStep step;
  final NodeTangent tangent;

  /** Signed currents, 0 where none flows, and capacitors' voltages. */
  final double[] amps;

  final double[] volts;

  /** Capacitor voltage under which a load counts as having emptied it. */
  double floorV;

  private final int all;
  private final PathStep[] alone;
  private final Discharge[] discharge;
  private final double[] leftAt;
  private final EventFinder.Margin shortfall = this::shortfall;
  private final EventFinder.Margin joinMargin = this::marginAfter;
  private final double[] rises;
  private double longest;
  private double u;
  private double to;

  /** The idle bridge that is the most willing to join, and what is left of the source for it. */
  private int willing;

  private double willingDrive;

  NodeBridges(int bridges) {
    all = bridges;
    emf = new CycleTable[all];
    trace = new PulseTrace[all];
    step = new NodeStep(all);
    tangent = new NodeTangent(all);
    amps = new double[all];
    volts = new double[all];
    leftAt = new double[all];
    rises = new double[all];
    alone = new PathStep[all];
    discharge = new Discharge[all];
    for (int k = 0; k < all; k++) {
      emf[k] = new CycleTable();
      trace[k] = new PulseTrace();
      alone[k] = new PathStep();
      discharge[k] = new Discharge(size(emf[k]), alone[k]);
    }
  }

  private static Discharge.Drive size(CycleTable emf) {
    return position -> Math.abs(emf.at(position));
  }

  /** Takes the circuit; the electromotive forces stand in {@link #emf}. */
  void set(List<BridgeLoad> loads, SharedSource source, double peak, double cellSeconds) {
    step.set(loads, source, peak, cellSeconds);
    double ring = Double.POSITIVE_INFINITY;
    for (int k = 0; k < all; k++) {
      double ohm = source.ohm(k, k) + loads.get(k).lineOhm() + loads.get(k).dcOhm();
      alone[k].set(ohm, 0, loads.get(k), cellSeconds);
      alone[k].threshold(step.threshold[k]);
      ring = Math.min(ring, step.henry[k * all + k] * step.capacitance[k]);
    }
    longest = Math.min(LONGEST, Math.max(LEAST_OF_RING, SHARE_OF_RING * Math.sqrt(ring)));
  }

  /**
   * Marches over a number of cells from a position, starting with {@link #amps} and {@link #volts}
   * as they stand, and with the tangent's departures.
   *
   * @return false where a load empties its capacitor, or the currents break up without end
   */
  boolean march(double from, double cells) {
    u = from;
    to = from + cells;
    Arrays.fill(leftAt, from - 1);
    Arrays.fill(rises, 0);
    for (PulseTrace one : trace) {
      one.clear();
    }
    arrange();
    tangent.begin(step);
    boolean alive = true;
    for (int n = 0; u < to && alive; n++) {
      alive = n < MOST_SWITCHINGS * all && (step.n == 0 ? rest() : conduct());
    }
    return alive;
  }

  /** Takes the bridges whose currents flow, and opens a piece of their records. */
  private void arrange() {
    step.n = 0;
    for (int k = 0; k < all; k++) {
      if (amps[k] != 0) {
        step.add(k, amps[k], volts[k]);
        trace[k].start(u, amps[k]);
      }
    }
  }

  /** No current until the first bridge starts. */
  private boolean rest() {
    double end = to;
    int first = -1;
    for (int k = 0; k < all; k++) {
      boolean alive = discharge[k].run(u, volts[k], leftAt[k] == u, end, floorV);
      if (alive && discharge[k].turnedOn) {
        end = discharge[k].u;
        first = k;
      }
    }
    boolean alive = idle(end);
    u = end;
    if (first >= 0 && alive) {
      start(first, emf[first].at(u));
    }
    return alive;
  }

  /** Lets a bridge in whose current will have the sign of a voltage. */
  private void start(int bridge, double drive) {
    tangent.join(step, bridge);
    amps[bridge] = Math.copySign(step.threshold[bridge], drive);
    rises[bridge] = 0;
    arrange();
  }

  /** Discharges the capacitors of bridges without current up to a position. */
  private boolean idle(double end) {
    boolean alive = true;
    for (int k = 0; k < all; k++) {
      if (amps[k] == 0) {
        double after = idleVolts(k, end);
        alive &= after > floorV;
        tangent.rest(k, volts[k], after);
        volts[k] = after;
      }
    }
    return alive;
  }

  private double idleVolts(int k, double at) {
    double fall = 2 * step.power[k] / step.capacitance[k] * (at - u);
    return Math.sqrt(Math.max(0, volts[k] * volts[k] - fall));
  }

  /** Steps until the set of bridges that conduct changes; false where a capacitor is empty. */
  private boolean conduct() {
    double began = u;
    if (margin(u) >= 0) {
      join();
      return true;
    }
    boolean alive = true;
    boolean same = true;
    while (alive && same && u < to) {
      double h = Math.min(next(u - began), to - u);
      double missing = shortfall(h);
      boolean leaves = missing > 0;
      if (leaves) {
        h = EventFinder.find(shortfall, 0, missingAtStart(), h, missing, EVENT_CELLS, 0);
      }
      double margin = margin(u + h);
      boolean joins = margin >= 0;
      if (joins) {
        h = joinAfter(h, margin);
      }
      alive = put(h);
      same = !leaves && !joins;
      if (joins) {
        join();
      } else if (leaves) {
        leave();
      }
    }
    return alive;
  }

  /** The length of the next step, so long after the last event. */
  private double next(double since) {
    double h = Math.min(longest, FIRST + GROWTH * since);
    for (int a = 0; a < step.n; a++) {
      double size = spare(a, step.from) + 1;
      double rise = rises[step.bridge[a]];
      double change = rise < 0 ? -FALL * size / rise : RISE * (size + LOW) / Math.max(rise, 1e-300);
      h = Math.min(h, Math.max(change, LEAST));
    }
    return h;
  }

  private double joinAfter(double h, double margin) {
    System.arraycopy(step.from, 0, step.x, 0, step.n);
    System.arraycopy(step.fromV, 0, step.v, 0, step.n);
    double atStart = margin(u);
    if (atStart < 0) {
      return EventFinder.find(joinMargin, 0, atStart, h, margin, EVENT_CELLS, 1e-8);
    }
    marginAfter(h);
    return h;
  }

  /** Takes over what the last step, of h cells, has come to. */
  private boolean put(double h) {
    tangent.step(step, h);
    double end = h < to - u ? u + h : to;
    boolean alive = idle(end);
    u = end;
    for (int a = 0; a < step.n; a++) {
      int k = step.bridge[a];
      rises[k] = (spare(a, step.x) - spare(a, step.from)) / h;
      trace[k].next(u, step.x[a], step.charge(a, h));
      amps[k] = step.x[a];
      volts[k] = step.v[a];
      alive &= volts[k] > floorV;
      step.from[a] = step.x[a];
      step.fromV[a] = step.v[a];
    }
    return alive;
  }

  private void join() {
    start(willing, willingDrive);
  }

  /** The current nearest to its threshold ends. */
  private void leave() {
    int gone = 0;
    for (int a = 1; a < step.n; a++) {
      gone = spare(a, step.x) < spare(gone, step.x) ? a : gone;
    }
    int k = step.bridge[gone];
    tangent.leave(k);
    amps[k] = 0;
    leftAt[k] = u;
    arrange();
  }

  /** By how many thresholds a current is over its own. */
  private double spare(int a, double[] signed) {
    return step.sign[a] * signed[a] / step.threshold[step.bridge[a]] - 1;
  }

  /** Steps by h cells; by how much the smallest current rises short of its threshold then. */
  private double shortfall(double h) {
    step.step(emf, u, h);
    return -least(step.x);
  }

  private double missingAtStart() {
    return -least(step.from);
  }

  private double least(double[] signed) {
    double least = Double.POSITIVE_INFINITY;
    for (int a = 0; a < step.n; a++) {
      least = Math.min(least, spare(a, signed));
    }
    return least;
  }

  private double marginAfter(double h) {
    shortfall(h);
    return margin(u + h);
  }

  /** By how many volts the idle bridge that is the most willing is past its start. */
  private double margin(double at) {
    if (step.n == all) {
      return Double.NEGATIVE_INFINITY;
    }
    step.rates(emf, at);
    double most = Double.NEGATIVE_INFINITY;
    for (int k = 0; k < all; k++) {
      if (amps[k] == 0) {
        double doubt = at < leftAt[k] + REST_OF_LEAVER ? step.clearV(k) : 0;
        double left = step.left(k, emf, at);
        double own = Math.abs(left) - idleVolts(k, at) - step.onsetV(k) - doubt;
        if (own > most) {
          most = own;
          willing = k;
          willingDrive = left;
        }
      }
    }
    return most;
  }
}
