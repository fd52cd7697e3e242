package fourthwire.load.rectifier;

import fourthwire.load.model.LoadSolver;
import fourthwire.load.model.NoSteadyStateException;
import fourthwire.load.model.PortSpectra;
import fourthwire.load.rectifier.loop.TwoPathSolver;
import fourthwire.load.rectifier.path.BridgeLoad;
import fourthwire.load.rectifier.path.CycleTable;
import fourthwire.load.rectifier.path.PairBridge;
import fourthwire.load.rectifier.path.PathTangent;
import fourthwire.load.rectifier.path.PulseTrace;
import java.util.Optional;

/**
 * Periodic steady state of the capacitor-input rectifier, by shooting.
 *
 * <p>The state at a section of the cycle is the capacitor's voltage, and the current where
 * conduction is continuous. The map over half a cycle (the whole one where the electromotive force
 * has even orders) is brought to its fixed point by Newton steps with the derivatives that the
 * march itself carries ({@link PathTangent}), so that slow transients need not die out; three to
 * four marches do.
 *
 * <p>The same derivatives tell whether the state found is stable (both multipliers within the unit
 * circle: Floquet). Where the state that repeats in mirrored halves is not, the circuit goes to one
 * that repeats only after the whole cycle, with even orders in its current; it is looked for, and
 * refused where it does not settle either.
 *
 * <p>Where the march shows that a choke behind the bridge drives its current past the voltage's
 * crossing, one path is not enough and both pairs of diodes are followed ({@link TwoPathSolver}).
 *
 * <p>An instance is a few numbers (the last state, to start from); the workspace is the thread's.
 */
final class CapacitorInputSolver implements LoadSolver {
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
  private static final double NEAR = 0.03;

  /** Steps of that search, times the accurate ones. */
  private static final double COARSE = 2;

  /**
   * A defect in that measure from which on the march is taken to the state by its derivatives: what
   * that leaves out is of second order, about a millionth.
   */
  private static final double SHIFT = 2e-3;

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

  private static final String UNSETTLED =
      "the source cannot give what the load asks for, or the current does not repeat from cycle to"
          + " cycle";

  private static final String HUNTS =
      "its choke and capacitor swing against its constant power, and the current does not repeat"
          + " from cycle to cycle; more capacitance or a smaller choke behind the bridge settles"
          + " it";

  private static final ThreadLocal<PairBridge> WORKSPACE = ThreadLocal.withInitial(PairBridge::new);

  private final BridgeLoad load;
  private final double frequencyHz;

  private PairBridge bridge = WORKSPACE.get();
  private double peak;
  private double toleranceV;
  private double jumpV;
  private double nearV;
  private double shiftV;
  private double section;
  private boolean halfWave;
  private double lastV;
  private double lastI;

  /** Follows both pairs of diodes where the choke's current was found to pass the crossing. */
  private Optional<TwoPathSolver> twoPaths = Optional.empty();

  CapacitorInputSolver(BridgeLoad load, double frequencyHz) {
    this.load = load;
    this.frequencyHz = frequencyHz;
  }

  @Override
  public void solve(PortSpectra emf, double seriesOhm, double seriesHenry, PortSpectra current) {
    bridge = WORKSPACE.get();
    prepare(emf, seriesOhm, seriesHenry);
    if (twoPaths.isEmpty() && onePath(current)) {
      return;
    }
    if (twoPaths.isEmpty() || !twoPaths.get().solve(emf, peak, seriesOhm, seriesHenry, current)) {
      NoSteadyStateException refusal = refusal();
      forget();
      throw refusal;
    }
  }

  /** Whether one path at a time gives the current; else both are followed from here on. */
  private boolean onePath(PortSpectra current) {
    boolean found = repeats() && stable() || halfWave && repeatsAfterWholeCycle();
    if (load.dcHenry() > 0 && (!found || bridge.freewheels)) {
      twoPaths = Optional.of(new TwoPathSolver(load, frequencyHz));
      return false;
    }
    if (found) {
      bridge.trace.harmonics(halfWave, current.re[0], current.im[0]);
    }
    return found;
  }

  /** Forgets the last state: the next solution starts cold. */
  void forget() {
    lastV = 0;
    lastI = 0;
    twoPaths = Optional.empty();
  }

  private NoSteadyStateException refusal() {
    return NoSteadyStateException.of(
        "a capacitor-input rectifier of %s W finds no steady state at %s V peak behind %s ohm"
            + " and %s mH: %s",
        load.powerW(),
        peak,
        bridge.path.resistance,
        bridge.path.inductance / (frequencyHz * CycleTable.CELLS) * 1e3,
        twoPaths.isPresent() && twoPaths.get().hunts() ? HUNTS : UNSETTLED);
  }

  private void prepare(PortSpectra emf, double seriesOhm, double seriesHenry) {
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
    double fall = 2 * load.powerW() / load.capacitanceF() * 0.15 / frequencyHz;
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
        && Math.abs(defectI) < TOLERANCE_OF_CURRENT * (Math.abs(i) + load.powerW() / peak);
  }

  /** Plain repetition: slow, but it reaches the stable state if there is one. */
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

  /** Whether that record is half a cycle, whose mirror image is the other. */
  boolean halfWave() {
    return twoPaths.map(TwoPathSolver::halfWave).orElse(halfWave);
  }

  /** How many recorded currents make up the port's, the second counting against the first. */
  int paths() {
    return twoPaths.isPresent() ? 2 : 1;
  }

  /** A recorded current of the last solution on this thread: amps at positions in cells. */
  PulseTrace trace(int path) {
    return twoPaths.map(both -> both.trace(path)).orElse(bridge.trace);
  }
}
