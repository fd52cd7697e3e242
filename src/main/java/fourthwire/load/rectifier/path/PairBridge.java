package fourthwire.load.rectifier.path;

/**
 * A single-phase bridge followed through time from a section of the cycle: off, conducting with one
 * pair of diodes, off, conducting with the other.
 *
 * <p>The ends of conduction are found as events: the start where |e| rises over the capacitor's
 * voltage and the diodes' threshold ({@link Discharge}), the end where the current falls through
 * the threshold, by repeating the step with another length. Workspace of one solver, not
 * thread-safe.
 */
final class PairBridge {
  private static final int MOST_SWITCHINGS = 200;
  private static final double EVENT_CELLS = 1e-7;

  /** Cells since the turn-on of a current that flows already: no step is short for that. */
  private static final double LONG_AGO = 10;

  final CycleTable emf = new CycleTable();
  final PathStep path = new PathStep();
  final StepLength length = new StepLength(path);
  final PulseTrace trace = new PulseTrace();
  final PathTangent tangent = new PathTangent();

  /** Capacitor voltage under which the load counts as having emptied it. */
  double floorV;

  /** Capacitor voltage beyond which a march is a runaway of a guess, no state of the circuit. */
  double ceilingV;

  /** Share of the path's inductance that lies between bridge and capacitor. */
  double directShare;

  /**
   * Whether in the last recorded march the choke behind the bridge drove its current on through
   * both legs: the voltage behind the bridge would have been negative, which one path can't tell.
   */
  boolean freewheels;

  /** Signed current into the port, amps; 0 while off. */
  double i;

  /** Capacitor voltage. */
  double v;

  private final SmoothStep smooth = new SmoothStep(path);
  private final Discharge discharge = new Discharge(new Size(), path);
  private final EventFinder.Margin shortfall = this::shortfall;

  /** Position in cells. */
  private double u;

  /** Where the pulse began. */
  private double began;

  /** Direction of the current and its size at the start of a step. */
  private int sign;

  private double amps;

  /** The electromotive force in the current's direction and its slope per cell there. */
  private double drive;

  private double driveSlope;

  /** And at the end of the step. */
  private double driveAfter;

  /**
   * Marches from a position with signed current i0 and voltage v0 over a number of cells, keeping
   * the current in {@link #trace} and the derivatives of the end by the start in {@link #tangent}.
   *
   * @return false where the load empties the capacitor, the voltage runs away, or the current
   *     breaks up without end
   */
  boolean march(double from, double cells, double i0, double v0) {
    u = from;
    i = i0;
    v = v0;
    trace.clear();
    tangent.clear(i0 != 0);
    freewheels = false;
    double to = from + cells;
    boolean justLeft = false;
    int switchings = 0;
    while (u < to) {
      if (i == 0 && !rest(justLeft, to)) {
        return false;
      }
      if (u < to) {
        conduct(to);
        justLeft = true;
        if (!(v > floorV && v < ceilingV) || ++switchings > MOST_SWITCHINGS) {
          return false;
        }
      }
    }
    return true;
  }

  /** The size of the electromotive force. */
  private final class Size implements Discharge.Drive {
    @Override
    public double at(double position) {
      return Math.abs(emf.at(position));
    }

    @Override
    public double atNode(int node) {
      return Math.abs(emf.value[node]);
    }
  }

  /** Off until |e| passes the capacitor; leaves u at the turn-on or at the end. */
  private boolean rest(boolean justLeft, double to) {
    boolean alive = discharge.run(u, v, justLeft, to, floorV);
    if (justLeft && discharge.turnedOn && discharge.u == u) {
      double size = Math.abs(emf.at(u));
      double held = v + path.onsetV;
      tangent.reverse(sign * emf.at(u) > 0 ? 1 : (size - held) / (size + held));
    } else {
      tangent.rest(v, discharge.v);
    }
    u = discharge.u;
    v = discharge.v;
    return alive;
  }

  /** On until the current falls through the threshold, the capacitor empties, or the end. */
  private void conduct(double to) {
    boolean starting = i == 0;
    sign = (starting ? emf.at(u) : i) >= 0 ? 1 : -1;
    amps = starting ? path.threshold : Math.abs(i);
    trace.start(u, sign * amps);
    driveAfter = sign * emf.at(u);
    began = starting ? u : u - LONG_AGO;
    while (u < to && amps > 0 && v > floorV && v < ceilingV) {
      advance(to);
    }
    i = sign * amps;
  }

  /** One step towards a position, or to where the current ends before. */
  private void advance(double to) {
    drive = driveAfter;
    driveSlope = sign * emf.slopeAt(u);
    double h = Math.min(length.next(u - began, amps, path.push(amps, v, drive)), to - u);
    double missing = shortfall(h);
    boolean ends = missing > 0;
    if (ends) {
      double close = path.threshold;
      h = EventFinder.find(shortfall, 0, path.threshold - amps, h, missing, EVENT_CELLS, close);
    }
    double end = ends ? 0 : path.i;
    double charge = path.charge(h, v);
    double gain = tangent.vv;
    tangent.step(path, sign, h, 0.5 * (amps + path.i), 0.5 * (v + path.v));
    u = ends || h < to - u ? u + h : to;
    v = path.v;
    amps = end;
    freewheels |= directShare > 0 && directShare * driveAfter + (1 - directShare) * v < 0;
    trace.next(u, sign * end, sign * charge);
    trace.gains(tangent.iv, sign * path.capacitance * (tangent.vv - gain));
  }

  /** Steps by h cells; by how much the current falls short of the threshold then. */
  private double shortfall(double h) {
    driveAfter = sign * emf.at(u + h);
    if (length.stiff) {
      path.step(h, amps, v, drive, driveSlope, driveAfter);
    } else {
      double second = sign * emf.at(u + SmoothStep.SECOND * h);
      double third = sign * emf.at(u + SmoothStep.THIRD * h);
      smooth.step(h, amps, v, drive, driveSlope, second, third);
    }
    return path.threshold - path.i;
  }
}
