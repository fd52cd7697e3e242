package fourthwire.load.rectifier.path;

import fourthwire.load.model.PortSpectra;

/**
 * The search for the periodic state of a single-phase bridge in which one pair of diodes conducts
 * at a time: Newton's method on the state at a section of the cycle.
 *
 * <p>The state is the capacitor's voltage, and the current where conduction is continuous. It has
 * to repeat after half a cycle, mirrored, or after the whole one where the electromotive force has
 * even orders. With nothing to start from, marches of long steps come near it; the last march, of
 * accurate ones, is taken from where it began to the state itself by the derivatives it carries
 * ({@link PathTangent}).
 *
 * <p>The same derivatives tell whether the state found is stable (both multipliers within the unit
 * circle: Floquet). Workspace of one thread.
 */
public final class OnePathSearch {
  /**
   * Defect of energy at which a coarse search ends, as a share of what the load draws in a half.
   */
  private static final double NEAR = 0.04;

  /** Steps of that search, times the accurate ones. */
  private static final double COARSE = 3;

  /**
   * A defect in that measure from which on the march is taken to the state by its derivatives: what
   * that leaves out is of second order, about a millionth.
   */
  private static final double SHIFT = 3e-3;

  /** A capacitor that rings with its source can be charged over the crest, less than to twice. */
  private static final double MOST_CHARGE = 2;

  private static final int MOST_STEPS = 40;
  private static final int MOST_SUBSTITUTIONS = 200;
  private static final int REPETITIONS_TO_NEAR = 40;

  private final OnePathCycle cycle = new OnePathCycle();
  private final PairBridge bridge = cycle.bridge;

  private boolean emptied;

  /** The state found: the capacitor's voltage at the section, volts. */
  public double lastV;

  /** And the current there, amps; 0 while none flows. */
  public double lastI;

  /**
   * Takes a circuit, its voltage, and a state to start from.
   *
   * @param startV 0 where nothing is known
   */
  public void prepare(
      BridgeLoad load,
      double frequencyHz,
      PortSpectra emf,
      double seriesOhm,
      double seriesHenry,
      double startV,
      double startI) {
    lastV = startV;
    lastI = startI;
    emptied = false;
    cycle.prepare(load, frequencyHz, emf, seriesOhm, seriesHenry);
  }

  /** Largest electromotive force, volts. */
  public double peak() {
    return cycle.peak;
  }

  /** Whether half cycles of the state mirror each other. */
  public boolean halfWave() {
    return cycle.halfWave;
  }

  /**
   * Whether in the last march the choke behind the bridge drove its current on through both legs,
   * so that one path is not enough.
   */
  public boolean freewheels() {
    return bridge.freewheels;
  }

  /** Whether the capacitor ran empty when the bridge was left to itself, charged to the crest. */
  public boolean emptied() {
    return emptied;
  }

  /** The current of the state found: amps at positions in cells. */
  public PulseTrace trace() {
    return bridge.trace;
  }

  /** Ohms of the whole path, the diodes' own included. */
  public double ohm() {
    return bridge.path.resistance;
  }

  /** Henries of the whole path. */
  public double henry() {
    return bridge.path.inductance / (cycle.frequencyHz * CycleTable.CELLS);
  }

  /** Whether a stable state is found; the bridge has marched it then. */
  public boolean find() {
    return repeats() && cycle.stable() || cycle.halfWave && repeatsAfterWholeCycle();
  }

  /** Whether a state was found that repeats; it is the last, and the bridge has marched it. */
  private boolean repeats() {
    return (lastI == 0 && discontinuous()) || continuous() || substitution(0, cycle.peak);
  }

  /** The last state's voltage; else what is left of the crest after most of a half cycle. */
  private double firstGuess() {
    if (lastV > 0 && lastV < MOST_CHARGE * cycle.peak) {
      return lastV;
    }
    double fall = 2 * cycle.powerW / cycle.capacitanceF * 0.15 / cycle.frequencyHz;
    double square = 0.97 * cycle.peak * cycle.peak - fall;
    return square > 0.2 * cycle.peak * cycle.peak ? Math.sqrt(square) : 0.7 * cycle.peak;
  }

  /** One unknown; false where current flows at the section. */
  private boolean discontinuous() {
    double v = firstGuess();
    if (lastV == 0) {
      bridge.length.scale(COARSE);
      double near = newton(v, NEAR * cycle.perEnergyV, NEAR * cycle.perEnergyV);
      bridge.length.scale(1);
      v = near > 0 ? near - (bridge.v - near) / slope() : v;
    }
    double found = newton(v, SHIFT * cycle.perEnergyV, SHIFT * cycle.perEnergyV);
    if (found > 0) {
      double shift = (found - bridge.v) / slope();
      bridge.trace.shift(shift);
      found += shift;
    }
    return found > 0 && found(0, found);
  }

  /**
   * Newton steps in the voltage alone, kept between bounds.
   *
   * @param closeV accepted defect
   * @param pinchedV accepted defect where the bounds have met
   * @return the voltage that was marched last; 0 where there is none, or current flows at the
   *     section
   */
  private double newton(double start, double closeV, double pinchedV) {
    double high = MOST_CHARGE * cycle.peak;
    double low = 0;
    double v = start;
    for (int n = 0; n < MOST_STEPS; n++) {
      if (!cycle.march(0, v) || bridge.i != 0) {
        return 0;
      }
      double defect = bridge.v - v;
      boolean pinched = high - low < cycle.toleranceV;
      if (Math.abs(defect) < (pinched ? pinchedV : closeV)) {
        return v;
      }
      if (defect > 0) {
        low = Math.max(low, v);
      } else {
        high = Math.min(high, v);
      }
      double next = v - defect / slope();
      if (next >= high || next <= low) {
        next = defect > 0 ? 0.5 * (v + high) : low > 0 ? 0.5 * (v + low) : v + defect;
      }
      v = next;
    }
    return 0;
  }

  /** Derivative of the defect of the last march, within what is sensible. */
  private double slope() {
    return Math.min(-0.02, Math.max(-3, bridge.tangent.vv - 1));
  }

  private boolean found(double i, double v) {
    lastI = i;
    lastV = v;
    return true;
  }

  /** Current and voltage at the section, by repetition first where nothing is known. */
  private boolean continuous() {
    boolean cold = lastI == 0;
    double i = lastI;
    double v = cold ? cycle.peak * 0.95 : lastV;
    for (int n = 0; n < MOST_STEPS; n++) {
      if (!cycle.march(i, v)) {
        return false;
      }
      double defectI = cycle.endI() - i;
      double defectV = bridge.v - v;
      if (cycle.closes(i, defectI, defectV)) {
        return found(i, v);
      }
      if ((cold && n < 6) || i == 0 || bridge.i == 0) {
        i += defectI;
        v += defectV;
        continue;
      }
      double sign = cycle.sign();
      PathTangent t = bridge.tangent;
      double ii = sign * t.ii - 1;
      double iv = sign * t.iv;
      double vv = t.vv - 1;
      double det = ii * vv - iv * t.vi;
      double stepI = (iv * defectV - vv * defectI) / det;
      double stepV = (t.vi * defectI - ii * defectV) / det;
      double most = Math.max(Math.abs(stepV) / (0.3 * cycle.peak), Math.abs(stepI / (2 * i)));
      double share = most > 1 ? 1 / most : 1;
      i += share * stepI;
      v += share * stepV;
      if (!(v > 0)) {
        return false;
      }
    }
    return false;
  }

  /**
   * Plain repetition: slow, but it reaches the stable state if there is one; near it, and with no
   * current at the section, Newton's method goes the rest of the way.
   */
  private boolean substitution(double startI, double startV) {
    double i = startI;
    double v = startV;
    for (int n = 0; n < MOST_SUBSTITUTIONS; n++) {
      if (!cycle.march(i, v)) {
        emptied = true;
        return false;
      }
      double slack = n < MOST_SUBSTITUTIONS / 2 ? 1 : cycle.jumpV / cycle.toleranceV;
      if (cycle.closes(i, (cycle.endI() - i) / slack, (bridge.v - v) / slack)) {
        return found(i, v);
      }
      i = cycle.endI();
      v = bridge.v;
      if (n == REPETITIONS_TO_NEAR && i == 0) {
        double rest = newton(v, cycle.toleranceV, cycle.jumpV);
        if (rest > 0) {
          return found(0, rest);
        }
      }
    }
    return false;
  }

  /** From a small departure on to a state that repeats after the whole cycle only. */
  private boolean repeatsAfterWholeCycle() {
    cycle.halfWave = false;
    return substitution(lastI, 1.01 * (lastV > 0 ? lastV : 0.9 * cycle.peak)) && cycle.stable();
  }
}
