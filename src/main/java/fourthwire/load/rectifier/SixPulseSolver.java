package fourthwire.load.rectifier;

import fourthwire.load.model.LoadSolver;
import fourthwire.load.model.NoSteadyStateException;
import fourthwire.load.model.PortSpectra;
import fourthwire.quantity.Phasor;
import fourthwire.quantity.Spectrum;
import java.util.Locale;

/**
 * Periodic steady state of the six-pulse rectifier, by Newton's method on the state at a section of
 * the cycle: capacitor voltage and, where lines conduct there, their currents ({@link
 * StateNewton}).
 *
 * <p>The map goes over a sixth of a cycle with the lines exchanged where the electromotive forces
 * are balanced, over a half where they hold odd orders only, else over a whole cycle. A section at
 * which a line is just about to change can keep Newton's method from closing; then another section
 * is taken, and at last the power is brought up in stages.
 */
final class SixPulseSolver implements LoadSolver {
  /**
   * With a direct-current choke and no line inductance at all commutation would take no time; a
   * lead's least share keeps it finite (0.001 % of V²/P).
   */
  private static final double LEAST_REACTANCE = 1e-5 / (2 * Math.PI);

  /** Cells by which the section moves on in each attempt. */
  private static final int[] SECTIONS = {0, 21, 43};

  private static final double[] STAGES = {0.1, 0.2, 0.35, 0.5, 0.65, 0.8, 0.9, 1};
  private static final int REPETITIONS = 60;

  private final BridgeLoad load;
  private final double frequencyHz;
  private final ThreeLineBridge bridge = new ThreeLineBridge();
  private final StateNewton newton = new StateNewton(this::map);

  private double peak;
  private double firstSection;

  /** Where the map starts and how long it is, in cells. */
  private double section;

  private double cells;
  private boolean warm;

  /** By how many cells the last section found lies after the first choice. */
  private int later;

  SixPulseSolver(BridgeLoad load, double frequencyHz) {
    this.load = load;
    this.frequencyHz = frequencyHz;
  }

  @Override
  public void solve(PortSpectra emf, double seriesOhm, double seriesHenry, PortSpectra current) {
    bridge.emf.fill(emf);
    peak = bridge.emf.peak();
    if (!(peak > 0) || Double.isInfinite(peak)) {
      throw new NoSteadyStateException("a six-pulse rectifier has no voltage to draw from");
    }
    double share = !bridge.emf.halfWave() ? 1 : bridge.emf.balanced(peak) ? 1.0 / 6 : 0.5;
    cells = CycleTable.CELLS * share;
    firstSection = firstSection(emf.positiveSequence());
    moveSection(later);
    equip(load, seriesOhm, seriesHenry);
    warm = warm && newton.converge() || search() || inStages(seriesOhm, seriesHenry);
    if (!warm) {
      throw new NoSteadyStateException(refusal());
    }
    write(current);
  }

  private String refusal() {
    return String.format(
        Locale.ROOT,
        "a six-pulse rectifier of %.4g W finds no steady state at %.4g V peak line to line behind"
            + " its source impedance: the source cannot give what the load asks for, or the"
            + " current does not repeat from cycle to cycle",
        load.powerW(),
        peak);
  }

  /** Just before the voltage of the first line passes the third's. */
  private static double firstSection(Phasor positive) {
    double turns = 1.0 / 12 - Math.atan2(positive.im(), positive.re()) / (2 * Math.PI) - 1e-9;
    return Math.floor((turns - Math.floor(turns)) * CycleTable.CELLS);
  }

  private void equip(BridgeLoad equipment, double seriesOhm, double seriesHenry) {
    double amps = load.powerW() / peak;
    double leastHenry = load.dcHenry() > 0 ? LEAST_REACTANCE * peak / amps / frequencyHz : 0;
    double henry = Math.max(load.lineHenry() + seriesHenry, leastHenry);
    double cellSeconds = 1 / (frequencyHz * CycleTable.CELLS);
    double threshold = 1e-3 * equipment.powerW() / peak;
    bridge.floorV = 0.05 * peak;
    bridge.set(load.lineOhm() + seriesOhm, henry, equipment, cellSeconds, threshold);
    newton.scale(peak, amps, threshold);
  }

  private boolean search() {
    for (int shift : SECTIONS) {
      moveSection(shift);
      newton.start(0.95);
      if (newton.converge()) {
        return true;
      }
    }
    moveSection(0);
    newton.start(1);
    return newton.repeat(REPETITIONS) && newton.converge();
  }

  private boolean inStages(double seriesOhm, double seriesHenry) {
    for (int shift : SECTIONS) {
      moveSection(shift);
      newton.start(0.95);
      boolean found = true;
      for (int s = 0; s < STAGES.length && found; s++) {
        equip(load.atPower(STAGES[s] * load.powerW()), seriesOhm, seriesHenry);
        found = newton.converge();
      }
      if (found) {
        return true;
      }
    }
    return false;
  }

  private void moveSection(int shift) {
    later = shift;
    section = (firstSection + shift) % CycleTable.CELLS;
  }

  private void put(double[] s) {
    System.arraycopy(s, 0, bridge.line, 0, 3);
    bridge.v = s[3];
  }

  /** The state a period later, seen from the section's lines. */
  private boolean map(double[] from, double[] to) {
    put(from);
    if (!bridge.march(section, cells, false)) {
      return false;
    }
    double[] i = bridge.line;
    boolean whole = cells == CycleTable.CELLS;
    boolean half = 2 * cells == CycleTable.CELLS;
    for (int k = 0; k < 3; k++) {
      to[k] = whole ? i[k] : half ? -i[k] : -i[(k + 2) % 3];
    }
    to[3] = bridge.v;
    return true;
  }

  private void write(PortSpectra current) {
    boolean halfWave = bridge.emf.halfWave();
    put(newton.state);
    bridge.march(section, halfWave ? CycleTable.CELLS / 2.0 : CycleTable.CELLS, true);
    for (int k = 0; k < 2; k++) {
      bridge.trace[k].harmonics(halfWave, current.re[k], current.im[k]);
    }
    for (int h = 1; h <= Spectrum.HIGHEST_ORDER; h++) {
      current.re[2][h] = -current.re[0][h] - current.re[1][h];
      current.im[2][h] = -current.im[0][h] - current.im[1][h];
    }
  }

  /** The recorded current of a line of the last solution. */
  PulseTrace trace(int line) {
    return bridge.trace[line];
  }
}
