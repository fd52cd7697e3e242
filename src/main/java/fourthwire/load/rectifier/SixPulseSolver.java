package fourthwire.load.rectifier;

import fourthwire.load.model.LoadSolver;
import fourthwire.load.model.NoSteadyStateException;
import fourthwire.load.model.PortSpectra;
import fourthwire.quantity.Spectrum;
import java.util.Locale;

/**
 * Periodic steady state of the six-pulse rectifier, by Newton's method on the state at a section of
 * the cycle: capacitor voltage and, where lines conduct there, their currents.
 *
 * <p>The map goes over a sixth of a cycle with the lines exchanged where the electromotive forces
 * are balanced, over a half where they hold odd orders only, else over a whole cycle.
 */
final class SixPulseSolver implements LoadSolver {
  private static final double TOLERANCE = 1e-8;

  /**
   * With a direct-current choke and no line inductance at all commutation would take no time; a
   * lead's least share keeps it finite (0.001 % of V²/P).
   */
  private static final double LEAST_REACTANCE = 1e-5 / (2 * Math.PI);

  private static final int MOST_NEWTONS = 60;
  private static final int MOST_SUBSTITUTIONS = 400;

  private final BridgeLoad load;
  private final double frequencyHz;
  private final ThreeLineBridge bridge = new ThreeLineBridge();

  private double peak;
  private double ampsScale;
  private double section;
  private double cells;

  /** State at the section: currents of the lines, then the voltage. */
  private final double[] state = new double[4];

  private final double[] image = new double[4];
  private final double[] nudged = new double[4];
  private final double[][] matrix = new double[3][4];
  private final int[] unknown = new int[3];
  private boolean warm;

  SixPulseSolver(BridgeLoad load, double frequencyHz) {
    this.load = load;
    this.frequencyHz = frequencyHz;
  }

  @Override
  public void solve(PortSpectra emf, double seriesOhm, double seriesHenry, PortSpectra current) {
    prepare(emf, seriesOhm, seriesHenry);
    boolean found = warm && newton();
    if (!found) {
      firstGuess();
      found = newton();
    }
    if (!found) {
      found = substitution() && newton();
    }
    warm = found;
    if (!found) {
      throw new NoSteadyStateException(
          String.format(
              Locale.ROOT,
              "a six-pulse rectifier of %.4g W has no steady state at %.4g V peak line to line"
                  + " behind its source impedance: the source cannot give what the load asks for",
              load.powerW(),
              peak));
    }
    write(current);
  }

  private void write(PortSpectra current) {
    boolean halfWave = halfWave();
    put(state);
    bridge.march(section, halfWave ? CycleTable.CELLS / 2.0 : CycleTable.CELLS, true);
    for (int k = 0; k < 2; k++) {
      bridge.trace[k].harmonics(halfWave, current.re[k], current.im[k]);
    }
    for (int h = 1; h <= Spectrum.HIGHEST_ORDER; h++) {
      current.re[2][h] = -current.re[0][h] - current.re[1][h];
      current.im[2][h] = -current.im[0][h] - current.im[1][h];
    }
  }

  private boolean halfWave() {
    return bridge.emf[0].halfWave && bridge.emf[1].halfWave && bridge.emf[2].halfWave;
  }

  private void prepare(PortSpectra emf, double seriesOhm, double seriesHenry) {
    bridge.fill(emf);
    double cellSeconds = 1 / (frequencyHz * CycleTable.CELLS);
    peak = 0;
    for (int n = 0; n < CycleTable.CELLS; n++) {
      double a = bridge.emf[0].value[n];
      double b = bridge.emf[1].value[n];
      double c = bridge.emf[2].value[n];
      peak = Math.max(peak, Math.max(Math.abs(a - b), Math.max(Math.abs(b - c), Math.abs(c - a))));
    }
    if (!(peak > 0) || Double.isInfinite(peak)) {
      throw new NoSteadyStateException("a six-pulse rectifier has no voltage to draw from");
    }
    ampsScale = load.powerW() / peak;
    bridge.floorV = 0.05 * peak;
    double leastHenry = load.dcHenry() > 0 ? LEAST_REACTANCE * peak / ampsScale / frequencyHz : 0;
    double henry = Math.max(load.lineHenry() + seriesHenry, leastHenry);
    bridge.set(load.lineOhm() + seriesOhm, henry, load, cellSeconds);
    bridge.threshold(1e-3 * ampsScale);
    double share = !halfWave() ? 1 : balanced() ? 1.0 / 6 : 0.5;
    cells = CycleTable.CELLS * share;
    var positive = emf.positiveSequence();
    double turns = 1.0 / 12 - Math.atan2(positive.im(), positive.re()) / (2 * Math.PI) - 1e-9;
    section = Math.floor((turns - Math.floor(turns)) * CycleTable.CELLS);
  }

  /** Whether line b repeats line a, and c repeats b, a third of a cycle later. */
  private boolean balanced() {
    int third = CycleTable.CELLS / 3;
    for (int n = 0; n < CycleTable.CELLS; n++) {
      double a = bridge.emf[0].value[n];
      if (Math.abs(bridge.emf[1].value[n + third] - a) > 1e-9 * peak
          || Math.abs(bridge.emf[2].value[(n + 2 * third) % CycleTable.CELLS] - a) > 1e-9 * peak) {
        return false;
      }
    }
    return true;
  }

  private void firstGuess() {
    java.util.Arrays.fill(state, 0);
    state[3] = 0.95 * peak;
  }

  private void put(double[] s) {
    bridge.line[0] = s[0];
    bridge.line[1] = s[1];
    bridge.line[2] = s[2];
    bridge.v = s[3];
  }

  /** The state a map later, seen from the section's lines. */
  private boolean map(double[] from, double[] to) {
    put(from);
    if (!bridge.march(section, cells, false)) {
      return false;
    }
    double[] i = bridge.line;
    to[3] = bridge.v;
    if (cells == CycleTable.CELLS) {
      System.arraycopy(i, 0, to, 0, 3);
    } else if (2 * cells == CycleTable.CELLS) {
      for (int k = 0; k < 3; k++) {
        to[k] = -i[k];
      }
    } else {
      to[1] = -i[0];
      to[2] = -i[1];
      to[0] = -i[2];
    }
    return true;
  }

  private static boolean sameLines(double[] a, double[] b) {
    for (int k = 0; k < 3; k++) {
      if (Math.signum(a[k]) != Math.signum(b[k])) {
        return false;
      }
    }
    return true;
  }

  private boolean closed() {
    for (int k = 0; k < 3; k++) {
      if (Math.abs(image[k] - state[k]) > 1e-7 * ampsScale) {
        return false;
      }
    }
    return Math.abs(image[3] - state[3]) < TOLERANCE * peak;
  }

  private boolean newton() {
    for (int n = 0; n < MOST_NEWTONS; n++) {
      if (!map(state, image)) {
        return false;
      }
      if (closed()) {
        return true;
      }
      if (n < 1 || !sameLines(state, image) || !newtonStep()) {
        System.arraycopy(image, 0, state, 0, 4);
      }
    }
    return false;
  }

  /** One Newton step with a Jacobian by differences; false leaves the state to plain repetition. */
  private boolean newtonStep() {
    int size = unknowns();
    for (int column = 0; column < size; column++) {
      System.arraycopy(state, 0, nudged, 0, 4);
      double step = unknown[column] == 3 ? 1e-6 * peak : 1e-5 * ampsScale;
      step = move(nudged, unknown[column], step);
      System.arraycopy(image, 0, saved, 0, 4);
      boolean alive = map(nudged, image);
      for (int row = 0; row < size && alive; row++) {
        matrix[row][column] =
            (image[unknown[row]] - saved[unknown[row]]) / step - (row == column ? 1 : 0);
      }
      System.arraycopy(saved, 0, image, 0, 4);
      if (!alive) {
        return false;
      }
    }
    for (int row = 0; row < size; row++) {
      matrix[row][3] = state[unknown[row]] - image[unknown[row]];
    }
    return eliminate(size) && accept(size);
  }

  private final double[] saved = new double[4];

  /** The independent unknowns: one current of a pair, the two like-signed ones of three. */
  private int unknowns() {
    int size = 0;
    int positive = 0;
    int negative = 0;
    for (int k = 0; k < 3; k++) {
      positive += state[k] > 0 ? 1 : 0;
      negative += state[k] < 0 ? 1 : 0;
    }
    int sign = positive >= negative ? 1 : -1;
    for (int k = 0; k < 3; k++) {
      if (state[k] * sign > 0) {
        unknown[size++] = k;
      }
    }
    unknown[size++] = 3;
    return size;
  }

  /** Moves one unknown, keeping the sum of currents zero; returns the signed step. */
  private static double move(double[] s, int index, double step) {
    if (index == 3) {
      s[3] += step;
      return step;
    }
    double signed = Math.copySign(step, s[index]);
    s[index] += signed;
    for (int k = 0; k < 3; k++) {
      if (s[k] * s[index] < 0) {
        s[k] -= signed;
        break;
      }
    }
    return signed;
  }

  private boolean eliminate(int size) {
    for (int p = 0; p < size; p++) {
      int best = p;
      for (int r = p + 1; r < size; r++) {
        if (Math.abs(matrix[r][p]) > Math.abs(matrix[best][p])) {
          best = r;
        }
      }
      double[] swap = matrix[p];
      matrix[p] = matrix[best];
      matrix[best] = swap;
      if (matrix[p][p] == 0) {
        return false;
      }
      for (int r = 0; r < size; r++) {
        if (r != p) {
          double factor = matrix[r][p] / matrix[p][p];
          for (int c = p; c < size; c++) {
            matrix[r][c] -= factor * matrix[p][c];
          }
          matrix[r][3] -= factor * matrix[p][3];
        }
      }
    }
    return true;
  }

  private boolean accept(int size) {
    double shrink = 1;
    for (int r = 0; r < size; r++) {
      double step = Math.abs(matrix[r][3] / matrix[r][r]);
      double most = unknown[r] == 3 ? 0.2 * peak : 5 * ampsScale;
      shrink = Math.min(shrink, most / Math.max(step, 1e-300));
    }
    System.arraycopy(state, 0, nudged, 0, 4);
    for (int r = 0; r < size; r++) {
      double step = shrink * matrix[r][3] / matrix[r][r];
      int k = unknown[r];
      if (k < 3) {
        double signed = step * Math.signum(nudged[k]);
        if (Math.abs(nudged[k]) + signed <= bridge.pair.threshold) {
          return false;
        }
      }
      shift(nudged, k, step);
    }
    if (!(nudged[3] > 0.05 * peak)) {
      return false;
    }
    System.arraycopy(nudged, 0, state, 0, 4);
    return true;
  }

  private static void shift(double[] s, int index, double step) {
    if (index < 3) {
      for (int k = 0; k < 3; k++) {
        if (s[k] * s[index] < 0) {
          s[k] -= step;
          break;
        }
      }
    }
    s[index] += step;
  }

  private boolean substitution() {
    java.util.Arrays.fill(state, 0);
    state[3] = peak;
    for (int n = 0; n < MOST_SUBSTITUTIONS; n++) {
      if (!map(state, image)) {
        return false;
      }
      if (closed()) {
        return true;
      }
      System.arraycopy(image, 0, state, 0, 4);
    }
    return true;
  }

  /** The recorded current of a line of the last solution. */
  PulseTrace trace(int line) {
    return bridge.trace[line];
  }
}
