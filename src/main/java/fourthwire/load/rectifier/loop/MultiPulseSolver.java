package fourthwire.load.rectifier.loop;

import fourthwire.load.model.LoadSolver;
import fourthwire.load.model.NoSteadyStateException;
import fourthwire.load.model.NoSteadyStateException.Why;
import fourthwire.load.model.PortSpectra;
import fourthwire.load.rectifier.path.BridgeLoad;
import fourthwire.load.rectifier.path.CycleTable;
import fourthwire.load.rectifier.path.PulseTrace;
import java.util.List;
import java.util.Locale;

/**
 * Periodic steady state of the six- and twelve-pulse rectifiers, by Newton's method on the state at
 * a section of the cycle: capacitor voltage and, where lines conduct there, their currents ({@link
 * StateNewton}).
 *
 * <p>The map goes over a sixth of a cycle with the lines exchanged where the electromotive forces
 * are balanced, over a half where they hold odd orders only, else over a whole cycle. A section at
 * which a line is just about to change can keep Newton's method from closing; then another section
 * is taken, and at last the power is brought up in stages.
 *
 * <p>The state given repeats as the voltage does: with mirrored halves where the voltage has them.
 * With a small capacitor behind chokes it may be unstable (a multiplier of the map beyond the unit
 * circle): ideal constant power is a negative resistance to small changes, and where chokes and
 * capacitor ring at half the ripple's frequency every other pulse grows. A simulated circuit then
 * hunts, or settles with even orders after the whole cycle. Real converters, whose control is
 * slower than that and whose chokes and capacitors lose more, are measured with odd orders only
 * (the reactor tables that the presets are held to); so that state is given, no other looked for,
 * and {@link #remarks} says so. Single-phase supplies, which have no such control, are refused in
 * that case ({@code CapacitorInputSolver}).
 *
 * <p>An instance holds the last state only, to start from; the workspace is the thread's.
 */
public final class MultiPulseSolver implements LoadSolver {
  /**
   * With a direct-current choke, or a source common to two bridges, and no inductance of a bridge's
   * own, commutation would take no time; a lead's least share keeps it finite (0.001 % of V²/P).
   */
  private static final double LEAST_REACTANCE = 1e-5 / (2 * Math.PI);

  /** Cells by which the section moves on in each attempt. */
  private static final int[] SECTIONS = {0, 21, 43};

  /** Likewise where lines are taken to carry current at the section. */
  private static final int[] CARRYING_SECTIONS = {21, 32, 43, 10};

  private static final double[] STAGES = {0.1, 0.2, 0.35, 0.5, 0.65, 0.8, 0.9, 1};
  private static final int REPETITIONS = 50;
  private static final int SIXTHS = LineSpectra.SIXTHS;
  private static final double SIN_120 = Math.sqrt(3) / 2;
  private static final ThreadLocal<ThreeLineBridge> WORK =
      ThreadLocal.withInitial(ThreeLineBridge::new);

  /** Largest multiplier of a stable state; a little over 1 for its own error. */
  private static final double MOST_MULTIPLIER = 1.002;

  private final BridgeLoad load;
  private final double frequencyHz;
  private final int bridges;
  private final StateNewton newton;

  /** The thread's workspace, taken for each solve. */
  private ThreeLineBridge bridge = WORK.get();

  private double peak;
  private double firstSection;

  /** Where the map starts and how long it is, in cells. */
  private double section;

  private int cells;

  /** How many times the map goes into a cycle. */
  private int periods;

  private boolean warm;

  /** Whether the capacitor ran empty when the bridges were left to themselves. */
  private boolean starved;

  public MultiPulseSolver(int bridges, BridgeLoad load, double frequencyHz) {
    this.bridges = bridges;
    this.load = load;
    this.frequencyHz = frequencyHz;
    newton = new StateNewton(3 * bridges, 3, this::map);
  }

  @Override
  public void solve(PortSpectra emf, double seriesOhm, double seriesHenry, PortSpectra current) {
    bridge = WORK.get();
    bridge.emf.fill(emf, bridges);
    peak = bridge.emf.peak(bridges);
    if (!(peak > 0) || Double.isInfinite(peak)) {
      throw new NoSteadyStateException("a rectifier on three lines has no voltage to draw from");
    }
    firstSection = firstSection(emf);
    equip(load, seriesOhm, seriesHenry);
    warm = repeats(seriesOhm, seriesHenry);
    if (!warm) {
      throw refusal();
    }
    write(current);
  }

  /** Whether a state is found that repeats as early as the voltage allows. */
  private boolean repeats(double seriesOhm, double seriesHenry) {
    setPeriods(!bridge.emf.halfWave() ? 1 : bridge.emf.balanced ? SIXTHS : 2);
    bridge.grid.fine();
    return warm && newton.converge() || search() || inStages(seriesOhm, seriesHenry);
  }

  private void setPeriods(int parts) {
    periods = parts;
    cells = CycleTable.CELLS / parts;
  }

  private NoSteadyStateException refusal() {
    return NoSteadyStateException.of(
            "a rectifier on three lines of %s W finds no steady state at %s V peak line to line"
                + " behind its source impedance: %s",
            load.powerW(),
            peak,
            starved
                ? "the source cannot give what the load asks for"
                : "the current does not repeat from cycle to cycle")
        .since(starved ? Why.TOO_MUCH : Why.NO_REPEAT);
  }

  /** Just before the voltage of the first line passes the third's. */
  private static double firstSection(PortSpectra emf) {
    double re = emf.re[0][1];
    double im = emf.im[0][1];
    for (int k = 1; k < 3; k++) {
      double sin = k == 1 ? SIN_120 : -SIN_120;
      re += -0.5 * emf.re[k][1] - sin * emf.im[k][1];
      im += sin * emf.re[k][1] - 0.5 * emf.im[k][1];
    }
    double turns = 1.0 / 12 - Math.atan2(im, re) / (2 * Math.PI) - 1e-9;
    return Math.floor((turns - Math.floor(turns)) * CycleTable.CELLS);
  }

  private void equip(BridgeLoad equipment, double seriesOhm, double seriesHenry) {
    double amps = load.powerW() / peak;
    double sourceHenry = load.leadHenry() + seriesHenry;
    boolean momentary = load.dcHenry() > 0 || bridges > 1 && sourceHenry > 0;
    double leastHenry = momentary ? LEAST_REACTANCE * peak / amps / frequencyHz : 0;
    double ownHenry = Math.max(load.lineHenry(), leastHenry - (bridges == 1 ? sourceHenry : 0));
    double cellSeconds = 1 / (frequencyHz * CycleTable.CELLS);
    double threshold = 1e-3 * equipment.powerW() / peak;
    bridge.floorV = 0.05 * peak;
    bridge.set(
        bridges,
        load.leadOhm() + seriesOhm,
        sourceHenry,
        ownHenry,
        equipment,
        cellSeconds,
        threshold);
    newton.scale(peak, amps, threshold);
  }

  private boolean search() {
    moveSection(0);
    if (approach() && newton.converge()) {
      return true;
    }
    for (int shift : CARRYING_SECTIONS) {
      moveSection(shift);
      if (carrying() && newton.converge()) {
        return true;
      }
    }
    for (int shift : SECTIONS) {
      moveSection(shift);
      newton.start(0.95);
      if (newton.converge()) {
        return true;
      }
    }
    moveSection(0);
    newton.start(1);
    starved = !newton.repeat(REPETITIONS);
    return !starved && newton.settle();
  }

  /**
   * Starts with the highest and the lowest line carrying what the load draws: near the state where
   * the capacitor is so small that its voltage follows the bridge's.
   */
  private boolean carrying() {
    newton.start(1);
    double v = 0.98 * bridge.emf.spread(0, section);
    for (int b = 0; b < bridges && v > 0; b++) {
      double amps = load.powerW() / v / bridges;
      newton.carry(bridge.emf.highest(b, section), bridge.emf.lowest(b, section), amps, v);
    }
    return v > 0;
  }

  /** Comes near by coarse steps. */
  private boolean approach() {
    bridge.grid.coarse();
    newton.start(0.95);
    boolean near = newton.approach();
    bridge.grid.fine();
    return near;
  }

  /** Brings the power up where full power from rest empties the capacitor or does not settle. */
  private boolean inStages(double seriesOhm, double seriesHenry) {
    newton.start(0.95);
    for (double share : STAGES) {
      equip(load.atPower(share * load.powerW()), seriesOhm, seriesHenry);
      if (!newton.settle()) {
        equip(load, seriesOhm, seriesHenry);
        return false;
      }
    }
    starved = false;
    return true;
  }

  private void moveSection(int shift) {
    section = (firstSection + shift) % CycleTable.CELLS;
  }

  private void put(double[] s) {
    System.arraycopy(s, 0, bridge.line, 0, bridge.lines());
    bridge.v = s[bridge.lines()];
  }

  /** The state a period later, seen from the section's lines. */
  private boolean map(double[] from, double[] to, double[][] columns, int count) {
    put(from);
    bridge.tangent.start(columns, count);
    if (!bridge.march(section, cells, true)) {
      return false;
    }
    seenFromSection(bridge.line, to);
    to[bridge.lines()] = bridge.v;
    for (int c = 0; c < count; c++) {
      seenFromSection(bridge.tangent.column[c], columns[c]);
      columns[c][bridge.lines()] = bridge.tangent.volts(c);
    }
    return true;
  }

  private void seenFromSection(double[] i, double[] to) {
    for (int k = 0; k < bridge.lines(); k++) {
      to[k] = periods == 1 ? i[k] : periods == 2 ? -i[k] : -i[k - k % 3 + (k + 2) % 3];
    }
  }

  private void write(PortSpectra current) {
    LineSpectra.write(bridge, periods, current);
  }

  @Override
  public List<String> remarks() {
    double multiplier = newton.largestMultiplier();
    return multiplier < MOST_MULTIPLIER ? List.of() : List.of(unstable(multiplier));
  }

  private String unstable(double multiplier) {
    return String.format(
        Locale.ROOT,
        "the computed current repeats, but would not hold by itself: with a load of constant power"
            + " chokes and capacitor swing, a small departure growing by %.2g %% in each %s."
            + " Figures are those of a drive whose control damps this.",
        100 * (multiplier - 1),
        periods == SIXTHS ? "sixth of a cycle" : periods == 2 ? "half cycle" : "cycle");
  }

  /** The recorded current of a line of the last solution. */
  public PulseTrace trace(int line) {
    return bridge.trace[line];
  }

  /** Currents of the second bridge's windings in the last solution on this thread. */
  public PortSpectra secondBridge() {
    return bridge.second;
  }

  /** How many times what was recorded, with the lines exchanged, makes up the cycle. */
  public int periods() {
    return periods;
  }

  /** Number of lines of all bridges. */
  public int lines() {
    return 3 * bridges;
  }
}
