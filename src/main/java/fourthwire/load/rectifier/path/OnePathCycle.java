package fourthwire.load.rectifier.path;

import fourthwire.load.model.NoSteadyStateException;
import fourthwire.load.model.PortSpectra;

/**
 * What has to repeat of a single-phase bridge: half a cycle, mirrored, or the whole one where the
 * electromotive force has even orders. Marched once from a state at a section of the cycle, it
 * leaves the state at the end in the bridge; what is left between both counts as none within {@link
 * #closes}. Workspace of one thread.
 */
final class OnePathCycle {
  /** Accepted defect of the capacitor's energy in a cycle, as a share of what the load draws. */
  private static final double TOLERANCE = 1e-5;

  /** Bounds of the defect of its voltage that this gives, as shares of the crest. */
  private static final double FINEST = 1e-9;

  private static final double COARSEST = 5e-7;

  /** Accepted defect of the current, as a share of itself and the load's. */
  private static final double TOLERANCE_OF_CURRENT = 1e-6;

  /**
   * Where a pulse just parts in two the map may jump by the error of a time step: this share of the
   * energy is accepted where the voltage can't be told any nearer.
   */
  private static final double JUMP = 2e-4;

  /** A pulse's current, times power over crest. */
  private static final double PULSE = 3;

  /** No source rings a loaded capacitor up to so many times the crest. */
  private static final double MOST_RESONANCE = 10;

  /** A capacitor under this share of the crest is empty: no supply runs on it. */
  private static final double LEAST_SHARE = 0.05;

  /** Largest multiplier of a stable state; a little over 1 for its own error. */
  private static final double MOST_MULTIPLIER = 1.001;

  final PairBridge bridge = new PairBridge();

  /** Largest electromotive force, volts. */
  double peak;

  /** Whether half cycles mirror each other. */
  boolean halfWave;

  double powerW;
  double capacitanceF;
  double frequencyHz;

  /**
   * Volts by which the capacitor's voltage changes where the load's energy of a half is missing.
   */
  double perEnergyV;

  /** Accepted defect of voltage, volts; and where a pulse just parts in two. */
  double toleranceV;

  double jumpV;

  /** Where the march begins, in cells. */
  private double section;

  /** Takes a circuit and its voltage. */
  void prepare(
      BridgeLoad load, double frequencyHz, PortSpectra emf, double seriesOhm, double seriesHenry) {
    powerW = load.powerW();
    capacitanceF = load.capacitanceF();
    this.frequencyHz = frequencyHz;
    bridge.emf.fill(emf.re[0], emf.im[0]);
    peak = bridge.emf.peak();
    if (!(peak > 0) || Double.isInfinite(peak)) {
      throw new NoSteadyStateException("a capacitor-input rectifier has no voltage to draw from");
    }
    perEnergyV = powerW / (2 * frequencyHz * capacitanceF * peak);
    toleranceV = Math.max(FINEST * peak, Math.min(COARSEST * peak, TOLERANCE * perEnergyV));
    jumpV = Math.max(toleranceV, JUMP * perEnergyV);
    prepareBridge(load, seriesOhm, load.lineHenry() + seriesHenry);
    halfWave = bridge.emf.halfWave;
    section = sectionAfterCrossing(emf.re[0][1], emf.im[0][1]);
  }

  private void prepareBridge(BridgeLoad load, double seriesOhm, double henry) {
    bridge.floorV = LEAST_SHARE * peak;
    bridge.ceilingV = MOST_RESONANCE * peak;
    double cellSeconds = 1 / (frequencyHz * CycleTable.CELLS);
    bridge.path.set(
        load.lineOhm() + seriesOhm + load.dcOhm(), henry + load.dcHenry(), load, cellSeconds);
    bridge.directShare = load.dcHenry() > 0 ? load.dcHenry() / (henry + load.dcHenry()) : 0;
    bridge.path.threshold(1e-3 * powerW / peak);
    bridge.length.set(PULSE * powerW / peak);
  }

  /** The node 15° after the fundamental's upward zero crossing, usually without current. */
  private static double sectionAfterCrossing(double re, double im) {
    double turns = -Math.atan2(im, re) / (2 * Math.PI) + 15.0 / 360;
    return Math.floor((turns - Math.floor(turns)) * CycleTable.CELLS);
  }

  /** Marches once through what has to repeat; false where the capacitor empties. */
  boolean march(double i, double v) {
    return bridge.march(section, halfWave ? CycleTable.CELLS / 2.0 : CycleTable.CELLS, i, v);
  }

  /** By what the current's direction changes from the start to the end. */
  double sign() {
    return halfWave ? -1 : 1;
  }

  /** The current at the end as it has to be at the start. */
  double endI() {
    return halfWave ? -bridge.i : bridge.i;
  }

  /** Whether defects of current and voltage of the last march, from a current, count as none. */
  boolean closes(double i, double defectI, double defectV) {
    return Math.abs(defectV) < toleranceV
        && Math.abs(defectI) < TOLERANCE_OF_CURRENT * (Math.abs(i) + powerW / peak);
  }

  /** Whether small departures from the state just marched die out. */
  boolean stable() {
    return bridge.tangent.largestMultiplier(sign()) < MOST_MULTIPLIER;
  }
}
