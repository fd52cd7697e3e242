package fourthwire.load.rectifier.loop;

import fourthwire.load.model.PortSpectra;
import fourthwire.load.rectifier.path.BridgeLoad;
import fourthwire.load.rectifier.path.CycleTable;
import fourthwire.load.rectifier.path.PulseTrace;
import fourthwire.quantity.Spectrum;

/**
 * Periodic steady state of a single-phase bridge whose choke behind it drives its current past the
 * voltage's zero crossing ({@link TwoPathBridge}), by Newton's method on the state at a section
 * ({@link StateNewton}).
 *
 * <p>The map goes over half a cycle, after which the two paths have changed places, or over a whole
 * one where the electromotive force has even orders. A state is given where it is stable; where the
 * one of mirrored halves is not, the one that repeats after the whole cycle is looked for. Constant
 * power is a negative resistance to small changes: with little capacitance and little resistance
 * the choke swings with the capacitor for ever, and no state is given.
 */
public final class TwoPathSolver {
  /**
   * With no inductance ahead of the bridge, commutation would take no time; a lead's least share
   * keeps it finite (0.0001 % of V²/P).
   */
  private static final double LEAST_REACTANCE = 1e-6 / (2 * Math.PI);

  /** Largest multiplier of a stable state; a little over 1 for its own error. */
  private static final double MOST_MULTIPLIER = 1.002;

  /** Cells from the upward crossing to the section in each attempt: about the crest. */
  private static final int[] SECTIONS = {96, 75, 117};

  private static final int REPETITIONS = 200;
  private static final ThreadLocal<TwoPathBridge> WORK =
      ThreadLocal.withInitial(TwoPathBridge::new);

  private final BridgeLoad load;
  private final double frequencyHz;
  private final StateNewton newton = new StateNewton(2, 1, this::map);

  /** The thread's workspace, taken for each solve. */
  private TwoPathBridge bridge = WORK.get();

  private double crossing;
  private double section;
  private boolean halfWave;
  private boolean warm;
  private boolean hunts;
  private boolean emptied;

  public TwoPathSolver(BridgeLoad load, double frequencyHz) {
    this.load = load;
    this.frequencyHz = frequencyHz;
  }

  /**
   * Writes the port's current.
   *
   * @param peak of the electromotive force, volts
   * @return false where no stable state is found
   */
  public boolean solve(
      PortSpectra emf, double peak, double seriesOhm, double seriesHenry, PortSpectra current) {
    bridge = WORK.get();
    bridge.emf.fillPort(emf);
    equip(peak, seriesOhm, seriesHenry);
    double turns = -Math.atan2(emf.im[0][1], emf.re[0][1]) / (2 * Math.PI);
    crossing = Math.floor((turns - Math.floor(turns)) * CycleTable.CELLS);
    boolean mirrored = bridge.emf.portHalfWave();
    warm &= mirrored == halfWave;
    halfWave = mirrored;
    bridge.grid.fine();
    emptied = false;
    boolean found = warm && newton.converge() || search();
    warm = found && stable() || mirrored && wholeCycle();
    hunts = found && !warm;
    if (warm) {
      write(current);
    }
    return warm;
  }

  /** Whether the last solution failed because the state found is not stable. */
  public boolean hunts() {
    return hunts;
  }

  /** Whether the capacitor ran empty when the bridge was left to itself. */
  public boolean emptied() {
    return emptied;
  }

  private void equip(double peak, double seriesOhm, double seriesHenry) {
    double amps = load.powerW() / peak;
    double least = LEAST_REACTANCE * peak / amps / frequencyHz;
    double threshold = 1e-3 * amps;
    bridge.floorV = 0.05 * peak;
    bridge.set(
        load.lineOhm() + seriesOhm,
        Math.max(least, load.lineHenry() + seriesHenry),
        load,
        1 / (frequencyHz * CycleTable.CELLS),
        threshold);
    newton.scale(peak, amps, threshold);
  }

  private boolean search() {
    for (int shift : SECTIONS) {
      section = (crossing + shift) % CycleTable.CELLS;
      newton.start(0.8);
      if (newton.converge()) {
        return true;
      }
    }
    section = (crossing + SECTIONS[0]) % CycleTable.CELLS;
    newton.start(1);
    emptied = !newton.repeat(REPETITIONS);
    return !emptied && newton.settle();
  }

  private boolean stable() {
    return newton.largestMultiplier() < MOST_MULTIPLIER;
  }

  /** From a small departure on to a state that repeats after the whole cycle only. */
  private boolean wholeCycle() {
    halfWave = false;
    newton.start(0.9);
    return newton.repeat(REPETITIONS) && newton.settle() && stable();
  }

  private void put(double[] s) {
    System.arraycopy(s, 0, bridge.line, 0, 2);
    bridge.v = s[2];
  }

  /** The state a period later; after half a cycle the paths have changed places. */
  private boolean map(double[] from, double[] to, double[][] columns, int count) {
    put(from);
    bridge.tangent.start(columns, count);
    if (!bridge.march(section, CycleTable.CELLS / (halfWave ? 2 : 1), true)) {
      return false;
    }
    seenFromSection(bridge.line, to);
    to[2] = bridge.v;
    for (int c = 0; c < count; c++) {
      seenFromSection(bridge.tangent.column[c], columns[c]);
      columns[c][2] = bridge.tangent.volts(c);
    }
    return true;
  }

  private void seenFromSection(double[] paths, double[] to) {
    to[0] = paths[halfWave ? 1 : 0];
    to[1] = paths[halfWave ? 0 : 1];
  }

  private void write(PortSpectra current) {
    bridge.trace[0].harmonics(halfWave, current.re[0], current.im[0]);
    PortSpectra second = bridge.second;
    bridge.trace[1].harmonics(halfWave, second.re[0], second.im[0]);
    for (int h = 1; h <= Spectrum.HIGHEST_ORDER; h++) {
      current.re[0][h] -= second.re[0][h];
      current.im[0][h] -= second.im[0][h];
    }
    current.direct[0] = bridge.trace[0].direct(halfWave) - bridge.trace[1].direct(halfWave);
  }

  /** Whether that record is half a cycle, whose mirror image is the other. */
  public boolean halfWave() {
    return halfWave;
  }

  /** The recorded current of a path in the last solution on this thread. */
  public PulseTrace trace(int path) {
    return bridge.trace[path];
  }
}
