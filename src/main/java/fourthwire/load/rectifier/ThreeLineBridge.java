package fourthwire.load.rectifier;

import fourthwire.load.model.NoSteadyStateException;
import fourthwire.load.model.PortSpectra;

/**
 * A six-pulse bridge followed through time: no line conducting, a pair, or three in commutation
 * overlap; each change of the conducting set is found as an event.
 *
 * <p>A third line joins where its electromotive force passes the potential of the bridge's upper or
 * lower rail by a diode's threshold; a line leaves where its current falls through the threshold.
 * Workspace of one solver, not thread-safe.
 */
final class ThreeLineBridge {
  private static final double[] GRADING = {0.02, 0.06, 0.16, 0.36, 1};
  private static final int MOST_SWITCHINGS = 600;

  /** A line that has left stands just at its rail: for this many cells rounding could recall it. */
  private static final double REST_OF_LEAVER = 0.1;

  /** Unless it is past a rail (the other one) by this many volts. */
  private static final double CLEARLY_PAST_V = 1;

  private static final double SHORTEST_STEP = 1e-9;

  final CycleTable[] emf = {new CycleTable(), new CycleTable(), new CycleTable()};
  final PulseTrace[] trace = {new PulseTrace(), new PulseTrace(), new PulseTrace()};
  final PathStep pair = new PathStep();
  final OverlapStep overlap = new OverlapStep();

  /** Signed line currents, 0 where a line does not conduct. */
  final double[] line = new double[3];

  /** Capacitor voltage. */
  double v;

  /** Capacitor voltage under which the load counts as having emptied it. */
  double floorV;

  private double lineInductance;
  private double lineOhm;
  private boolean recording;
  private int switchings;
  private double u;
  private double joinNotBefore;

  void set(double ohm, double henry, BridgeLoad load, double cellSeconds) {
    pair.set(2 * ohm + load.dcOhm(), 2 * henry + load.dcHenry(), load, cellSeconds);
    overlap.set(ohm, henry, load, cellSeconds);
    lineInductance = henry / cellSeconds;
    lineOhm = ohm + load.diode().ohm();
  }

  void threshold(double amps) {
    pair.threshold(amps);
    overlap.threshold(amps);
  }

  /**
   * Samples the three electromotive forces and takes their common part away, which drives nothing.
   */
  void fill(PortSpectra spectra) {
    for (int k = 0; k < 3; k++) {
      emf[k].fill(spectra.re[k], spectra.im[k]);
    }
    for (int n = 0; n <= 2 * CycleTable.CELLS; n++) {
      double mean = (emf[0].value[n] + emf[1].value[n] + emf[2].value[n]) / 3;
      double drift = (emf[0].slope[n] + emf[1].slope[n] + emf[2].slope[n]) / 3;
      for (int k = 0; k < 3; k++) {
        emf[k].value[n] -= mean;
        emf[k].slope[n] -= drift;
      }
    }
  }

  /**
   * Marches over a number of cells from a position, starting with {@link #line} and {@link #v} as
   * they stand.
   *
   * @return false where the load empties the capacitor
   */
  boolean march(double from, double cells, boolean record) {
    recording = record;
    switchings = 0;
    u = from;
    joinNotBefore = from;
    double to = from + cells;
    if (record) {
      for (PulseTrace t : trace) {
        t.clear();
      }
    }
    boolean fresh = false;
    while (u < to) {
      int conducting = conducting();
      boolean alive;
      if (conducting == 0) {
        alive = rest(to);
        fresh = true;
      } else if (conducting == 2) {
        alive = runPair(to, fresh);
        fresh = conducting() == 3;
      } else {
        alive = runOverlap(to, fresh);
        fresh = false;
      }
      if (!alive) {
        return false;
      }
    }
    return true;
  }

  int conducting() {
    int count = 0;
    for (double i : line) {
      if (i != 0) {
        count++;
      }
    }
    return count;
  }

  private void begin() {
    if (++switchings > MOST_SWITCHINGS) {
      throw new NoSteadyStateException("the drive's current switches too often to be followed");
    }
    if (recording) {
      for (int k = 0; k < 3; k++) {
        if (line[k] != 0) {
          trace[k].start(u, line[k]);
        }
      }
    }
  }

  private int highest(double at) {
    double a = emf[0].at(at);
    double b = emf[1].at(at);
    double c = emf[2].at(at);
    return a >= b ? (a >= c ? 0 : 2) : (b >= c ? 1 : 2);
  }

  private int lowest(double at) {
    double a = emf[0].at(at);
    double b = emf[1].at(at);
    double c = emf[2].at(at);
    return a <= b ? (a <= c ? 0 : 2) : (b <= c ? 1 : 2);
  }

  private double difference(double at) {
    double a = emf[0].at(at);
    double b = emf[1].at(at);
    double c = emf[2].at(at);
    return Math.max(a, Math.max(b, c)) - Math.min(a, Math.min(b, c));
  }

  private boolean rest(double to) {
    double from = u;
    double square = v * v;
    double fall = 2 * pair.power / pair.capacitance;
    double before = u;
    boolean on = difference(u) - pair.thresholdV > v + pair.slopeV;
    while (!on) {
      double node = Math.min(Math.floor(before) + 1, to);
      double left = square - fall * (node - from);
      if (left <= floorV * floorV) {
        return false;
      }
      double drive = difference(node) - pair.thresholdV;
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
    if (on) {
      line[highest(u)] = pair.threshold;
      line[lowest(u)] = -pair.threshold;
    }
    return true;
  }

  private double turnOn(double a, double b, double from, double square, double fall) {
    double low = a;
    double high = b;
    double gLow = excess(a, from, square, fall);
    if (gLow >= 0) {
      return b; // just turned off: let it move on, or it chatters
    }
    double gHigh = excess(b, from, square, fall);
    for (int n = 0; n < 60 && high - low > 1e-9; n++) {
      double x = high - gHigh * (high - low) / (gHigh - gLow);
      double g = excess(x, from, square, fall);
      if (g < 0) {
        low = x;
        gLow = g;
        gHigh /= 2;
      } else {
        high = x;
        gHigh = g;
        gLow /= 2;
      }
    }
    return high;
  }

  private double excess(double at, double from, double square, double fall) {
    return difference(at) - pair.thresholdV - Math.sqrt(square - fall * (at - from));
  }

  private boolean runPair(double to, boolean fresh) {
    begin();
    int p = line[0] > 0 ? 0 : line[1] > 0 ? 1 : 2;
    int n = line[0] < 0 ? 0 : line[1] < 0 ? 1 : 2;
    double clearly = u < joinNotBefore ? CLEARLY_PAST_V : 0;
    if (joinMargin(p, n, 3 - p - n, line[p], u, v) > clearly) {
      join(p, n, 3 - p - n);
      return true;
    }
    double base = u;
    double span = gradedSpan(to);
    int graded = fresh ? 0 : GRADING.length;
    while (u < to) {
      double next =
          graded < GRADING.length
              ? base + GRADING[graded++] * span
              : Math.min(pair.nextNode(u), to);
      if (!stepPair(p, n, next)) {
        return v > 0;
      }
    }
    return true;
  }

  private double gradedSpan(double to) {
    return Math.min(pair.nextNode(pair.nextNode(u)), to) - u;
  }

  /** One step of a pair; false where the set of conducting lines has changed. */
  private boolean stepPair(int p, int n, double next) {
    double x = line[p];
    double h = next - u;
    double v0 = v;
    double e0 = emf[p].at(u) - emf[n].at(u);
    double d0 = emf[p].slopeAt(u) - emf[n].slopeAt(u);
    int third = 3 - p - n;
    double start = u;
    tryPair(h, x, v0, e0, d0, p, n, start);
    boolean leaves = pair.i < pair.threshold;
    if (leaves) {
      h = leaveOfPair(h, x, v0, e0, d0, p, n, start);
    }
    boolean joins =
        start + h >= joinNotBefore && joinMargin(p, n, third, pair.i, start + h, pair.v) > 0;
    if (joins) {
      h = joinOfPair(h, x, v0, e0, d0, p, n, start);
      leaves = false;
    }
    double charge = pair.charge(h, v);
    u = leaves || joins ? start + h : next;
    v = pair.v;
    line[p] = pair.i;
    line[n] = -pair.i;
    if (recording) {
      trace[p].next(u, pair.i, charge);
      trace[n].next(u, -pair.i, -charge);
    }
    if (!(v > floorV)) {
      v = 0;
      return false;
    }
    if (leaves) {
      line[p] = 0;
      line[n] = 0;
      return false;
    }
    if (joins) {
      join(p, n, third);
    }
    return !joins;
  }

  private void tryPair(
      double h, double x, double v0, double e0, double d0, int p, int n, double start) {
    pair.step(h, x, v0, e0, d0, emf[p].at(start + h) - emf[n].at(start + h));
  }

  private double leaveOfPair(
      double whole, double x, double v0, double e0, double d0, int p, int n, double start) {
    double low = 0;
    double high = whole;
    double gLow = Math.max(x - pair.threshold, 1e-12 * pair.threshold);
    double gHigh = pair.i - pair.threshold;
    for (int k = 0; k < 40 && high - low > 1e-7; k++) {
      double h = high - gHigh * (high - low) / (gHigh - gLow);
      tryPair(h, x, v0, e0, d0, p, n, start);
      double g = pair.i - pair.threshold;
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
    tryPair(high, x, v0, e0, d0, p, n, start);
    return Math.max(high, SHORTEST_STEP);
  }

  private double joinOfPair(
      double whole, double x, double v0, double e0, double d0, int p, int n, double start) {
    int third = 3 - p - n;
    double low = 0;
    double high = whole;
    double gLow = Math.min(joinMargin(p, n, third, x, start, v0), -1e-12);
    double gHigh = joinMargin(p, n, third, pair.i, start + whole, pair.v);
    for (int k = 0; k < 40 && high - low > 1e-7; k++) {
      double h = high - gHigh * (high - low) / (gHigh - gLow);
      tryPair(h, x, v0, e0, d0, p, n, start);
      double g = joinMargin(p, n, third, pair.i, start + h, pair.v);
      if (g < 0) {
        low = h;
        gLow = g;
        gHigh /= 2;
      } else {
        high = h;
        gHigh = g;
        gLow /= 2;
      }
    }
    tryPair(high, x, v0, e0, d0, p, n, start);
    return Math.max(high, SHORTEST_STEP);
  }

  /** By how many volts the idle line passes a rail and a diode's threshold; negative inside. */
  private double joinMargin(int p, int n, int third, double x, double at, double volts) {
    double upper = emf[p].at(at);
    double lower = emf[n].at(at);
    double own = pair.slopeV * 0.5 * Math.log(1 + x / pair.saturation);
    double residual = upper - lower - volts - pair.resistance * x - 2 * own;
    double share = lineInductance == 0 ? 0 : lineInductance / pair.inductance;
    double drop = share * residual + lineOhm * x + own;
    double e = emf[third].at(at);
    return Math.max(e - (upper - drop), lower + drop - e) - overlap.thresholdV;
  }

  /** Lets the idle line in on the rail it has passed, with a threshold's current. */
  private void join(int p, int n, int third) {
    boolean up = 2 * emf[third].at(u) > emf[p].at(u) + emf[n].at(u);
    double little = pair.threshold;
    line[p] = Math.max(line[p], 2 * little);
    line[n] = -line[p];
    line[third] = up ? little : -little;
    line[up ? p : n] -= line[third];
  }

  private boolean runOverlap(double to, boolean fresh) {
    begin();
    int positive = (line[0] > 0 ? 1 : 0) + (line[1] > 0 ? 1 : 0) + (line[2] > 0 ? 1 : 0);
    int sign = positive == 2 ? 1 : -1;
    int c = line[0] * sign < 0 ? 0 : line[1] * sign < 0 ? 1 : 2;
    int a = c == 0 ? 1 : 0;
    int b = 3 - a - c;
    double base = u;
    double span = gradedSpan(to);
    int graded = fresh ? 0 : GRADING.length;
    while (u < to) {
      double next =
          graded < GRADING.length
              ? base + GRADING[graded++] * span
              : Math.min(pair.nextNode(u), to);
      if (!stepOverlap(a, b, c, sign, next)) {
        return v > 0;
      }
    }
    return true;
  }

  private boolean stepOverlap(int a, int b, int c, int sign, double next) {
    double start = u;
    double h = next - start;
    double xa = sign * line[a];
    double xb = sign * line[b];
    tryOverlap(h, xa, xb, a, b, c, sign, start);
    double least = Math.min(overlap.xa, overlap.xb) - pair.threshold;
    boolean leaves = least < 0;
    if (leaves) {
      double low = 0;
      double gLow = Math.max(Math.min(xa, xb) - pair.threshold, 1e-12 * pair.threshold);
      double high = h;
      double gHigh = least;
      for (int k = 0; k < 40 && high - low > 1e-7; k++) {
        h = high - gHigh * (high - low) / (gHigh - gLow);
        tryOverlap(h, xa, xb, a, b, c, sign, start);
        double g = Math.min(overlap.xa, overlap.xb) - pair.threshold;
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
      h = Math.max(high, SHORTEST_STEP);
      tryOverlap(h, xa, xb, a, b, c, sign, start);
    }
    u = leaves ? start + h : next;
    v = overlap.v;
    line[a] = sign * overlap.xa;
    line[b] = sign * overlap.xb;
    line[c] = -sign * (overlap.xa + overlap.xb);
    if (recording) {
      for (int k = 0; k < 3; k++) {
        trace[k].next(u, line[k], Double.NaN);
      }
    }
    if (!(v > floorV)) {
      v = 0;
      return false;
    }
    if (leaves) {
      leave(a, b, c, sign);
    }
    return !leaves;
  }

  private void leave(int a, int b, int c, int sign) {
    joinNotBefore = u + REST_OF_LEAVER;
    int gone = overlap.xa < overlap.xb ? a : b;
    int stays = gone == a ? b : a;
    double x = Math.max(overlap.xa, overlap.xb);
    line[gone] = 0;
    line[stays] = x > pair.threshold ? sign * x : 0;
    line[c] = -line[stays];
  }

  private void tryOverlap(
      double h, double xa, double xb, int a, int b, int c, int sign, double start) {
    double end = start + h;
    double ec = emf[c].at(start);
    double sc = emf[c].slopeAt(start);
    double fc = emf[c].at(end);
    overlap.step(
        h,
        xa,
        xb,
        v,
        sign * (emf[a].at(start) - ec),
        sign * (emf[a].slopeAt(start) - sc),
        sign * (emf[a].at(end) - fc),
        sign * (emf[b].at(start) - ec),
        sign * (emf[b].slopeAt(start) - sc),
        sign * (emf[b].at(end) - fc));
  }
}
