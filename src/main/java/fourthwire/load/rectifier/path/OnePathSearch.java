package fourthwire.load.rectifier.path;

import fourthwire.load.model.NoSteadyStateException;
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
  /** Accepted defect of the capacitor's energy in a cycle, as a share of what the load draws. */
  private static final double TOLERANCE = 1e-5;

  /** Bounds of the defect of its voltage that this gives, as shares of the crest. */
  private static final double FINEST = 1e-9;

  private static final double COARSEST = 5e-7;

  /** A pulse's current, times power over crest. */
  private static final double PULSE = 3;

  /** No source rings a loaded capacitor up to so many times the crest. */
  private static final double MOST_RESONANCE = 10;

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

  /** Accepted defect of the current, as a share of itself and the load's. */
  private static final double TOLERANCE_OF_CURRENT = 1e-6;

  /** A capacitor under this share of the crest is empty: no supply runs on it. */
  private static final double LEAST_SHARE = 0.05;

  /** Largest multiplier of a stable state; a little over 1 for its own error. */
  private static final double MOST_MULTIPLIER = 1.001;

  /**
   * Where a pulse just parts in two the map may jump by the error of a time step: this share of the
   * energy is accepted where the voltage can't be told any nearer.
   */
  private static final double JUMP = 2e-4;

  private static final int MOST_STEPS = 40;
  private static final int MOST_SUBSTITUTIONS = 200;
  private static final int REPETITIONS_TO_NEAR = 40;

  private final PairBridge bridge = new PairBridge();

  /** Largest electromotive force, volts. */
  public double peak;

  /** Whether half cycles mirror each other. */
  public boolean halfWave;

  /** The state found: the capacitor's voltage at the section, volts. */
  public double lastV;

  /** And the current there, amps; 0 while none flows. */
  public double lastI;

  private double powerW;
  private double capacitanceF;
  private double frequencyHz;
  private double toleranceV;
  private double jumpV;
  private double nearV;
  private double shiftV;
  private double section;

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
    powerW = load.powerW();
    capacitanceF = load.capacitanceF();
    this.frequencyHz = frequencyHz;
    lastV = startV;
    lastI = startI;
    CycleTable table = bridge.emf;
    table.fill(emf.re[0], emf.im[0]);
    peak = table.peak();
    if (!(peak > 0) || Double.isInfinite(peak)) {
      throw new NoSteadyStateException("a capacitor-input rectifier has no voltage to draw from");
    }
    double perEnergy = load.powerW() / (2 * frequencyHz * load.capacitanceF() * peak);
    toleranceV = Math.max(FINEST * peak, Math.min(COARSEST * peak, TOLERANCE * perEnergy));
    nearV = NEAR * perEnergy;
    shiftV = SHIFT * perEnergy;
    jumpV = Math.max(toleranceV, JUMP * perEnergy);
    bridge.floorV = LEAST_SHARE * peak;
    bridge.ceilingV = MOST_RESONANCE * peak;
    double cellSeconds = 1 / (frequencyHz * CycleTable.CELLS);
    double henry = load.lineHenry() + seriesHenry;
    bridge.path.set(
        load.lineOhm() + seriesOhm + load.dcOhm(), henry + load.dcHenry(), load, cellSeconds);
    bridge.directShare = load.dcHenry() > 0 ? load.dcHenry() / (henry + load.dcHenry()) : 0;
    bridge.path.threshold(1e-3 * load.powerW() / peak);
    bridge.length.set(PULSE * load.powerW() / peak);
    halfWave = table.halfWave;
    section = sectionAfterCrossing(emf.re[0][1], emf.im[0][1]);
  }

  /**
   * Whether in the last march the choke behind the bridge drove its current on through both legs,
   * so that one path is not enough.
   */
  public boolean freewheels() {
    return bridge.freewheels;
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
    return bridge.path.inductance / (frequencyHz * CycleTable.CELLS);
  }

  /** Whether a stable state is found; the bridge has marched it then. */
  public boolean find() {
    return repeats() && stable() || halfWave && repeatsAfterWholeCycle();
  }

  /** The node 15° after the fundamental's upward zero crossing, usually without current. */
  private static double sectionAfterCrossing(double re, double im) {
    double turns = -Math.atan2(im, re) / (2 * Math.PI) + 15.0 / 360;
    return Math.floor((turns - Math.floor(turns)) * CycleTable.CELLS);
  }

  /** Marches once through what has to repeat; false where the capacitor empties. */
  private boolean march(double i, double v) {
    return bridge.march(section, halfWave ? CycleTable.CELLS / 2.0 : CycleTable.CELLS, i, v);
  }

  /** The current at the end as it has to be at the start. */
  private double endI() {
    return halfWave ? -bridge.i : bridge.i;
  }

  /** Whether a state was found that repeats; it is the last, and the bridge has marched it. */
  private boolean repeats() {
    return (lastI == 0 && discontinuous()) || continuous() || substitution(0, peak);
  }

  private double firstGuess() {
    if (lastV > 0 && lastV < MOST_CHARGE * peak) {
      return lastV;
    }
    double fall = 2 * powerW / capacitanceF * 0.15 / frequencyHz;
    double square = 0.97 * peak * peak - fall;
    return square > 0.2 * peak * peak ? Math.sqrt(square) : 0.7 * peak;
  }

  /** One unknown; false where current flows at the section. */
  private boolean discontinuous() {
    double v = firstGuess();
    if (lastV == 0) {
      bridge.length.scale(COARSE);
      double near = newton(v, nearV, nearV);
      bridge.length.scale(1);
      v = near > 0 ? near - (bridge.v - near) / slope() : v;
    }
    double found = newton(v, shiftV, shiftV);
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
   * @param jumpV accepted defect where the bounds have met
   * @return the voltage that was marched last; 0 where there is none, or current flows at the
   *     section
   */
  private double newton(double start, double closeV, double jumpV) {
    double high = MOST_CHARGE * peak;
    double low = 0;
    double v = start;
    for (int n = 0; n < MOST_STEPS; n++) {
      if (!march(0, v) || bridge.i != 0) {
        return 0;
      }
      double defect = bridge.v - v;
      boolean pinched = high - low < toleranceV;
      if (Math.abs(defect) < (pinched ? jumpV : closeV)) {
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
    double v = cold ? peak * 0.95 : lastV;
    for (int n = 0; n < MOST_STEPS; n++) {
      if (!march(i, v)) {
        return false;
      }
      double defectI = endI() - i;
      double defectV = bridge.v - v;
      if (closes(i, defectI, defectV)) {
        return found(i, v);
      }
      if ((cold && n < 6) || i == 0 || bridge.i == 0) {
        i += defectI;
        v += defectV;
        continue;
      }
      double sign = halfWave ? -1 : 1;
      PathTangent t = bridge.tangent;
      double ii = sign * t.ii - 1;
      double iv = sign * t.iv;
      double vv = t.vv - 1;
      double det = ii * vv - iv * t.vi;
      double stepI = (iv * defectV - vv * defectI) / det;
      double stepV = (t.vi * defectI - ii * defectV) / det;
      double most = Math.max(Math.abs(stepV) / (0.3 * peak), Math.abs(stepI / (2 * i)));
      double share = most > 1 ? 1 / most : 1;
      i += share * stepI;
      v += share * stepV;
      if (!(v > 0)) {
        return false;
      }
    }
    return false;
  }

  private boolean closes(double i, double defectI, double defectV) {
    return Math.abs(defectV) < toleranceV
        && Math.abs(defectI) < TOLERANCE_OF_CURRENT * (Math.abs(i) + powerW / peak);
  }

  /**
   * Plain repetition: slow, but it reaches the stable state if there is one; near it, and with no
   * current at the section, Newton's method goes the rest of the way.
   */
  private boolean substitution(double startI, double startV) {
    double i = startI;
    double v = startV;
    for (int n = 0; n < MOST_SUBSTITUTIONS; n++) {
      if (!march(i, v)) {
        return false;
      }
      double slack = n < MOST_SUBSTITUTIONS / 2 ? 1 : jumpV / toleranceV;
      if (closes(i, (endI() - i) / slack, (bridge.v - v) / slack)) {
        return found(i, v);
      }
      i = endI();
      v = bridge.v;
      if (n == REPETITIONS_TO_NEAR && i == 0) {
        double rest = newton(v, toleranceV, jumpV);
        if (rest > 0) {
          return found(0, rest);
        }
      }
    }
    return false;
  }

  /** Whether small departures from the state just marched die out. */
  private boolean stable() {
    PathTangent t = bridge.tangent;
    double sign = halfWave ? -1 : 1;
    return t.largestMultiplier(sign) < MOST_MULTIPLIER;
  }

  /** From a small departure on to a state that repeats after the whole cycle only. */
  private boolean repeatsAfterWholeCycle() {
    halfWave = false;
    return substitution(lastI, 1.01 * (lastV > 0 ? lastV : 0.9 * peak)) && stable();
  }
}
