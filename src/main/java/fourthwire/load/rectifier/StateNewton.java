package fourthwire.load.rectifier;

/**
 * Newton's method on the state of a bridge at a section of the cycle: three line currents that add
 * up to zero, and the capacitor's voltage. Where the set of conducting lines at the section changes
 * from turn to turn the map itself is repeated. Workspace of one solver, not thread-safe.
 */
final class StateNewton {
  /** Where one period later the bridge stands; false where it does not get there. */
  interface Period {
    /** Writes the image of a state. */
    boolean map(double[] from, double[] to);
  }

  private static final double TOLERANCE = 1e-8;
  private static final double AMPS_TOLERANCE = 1e-7;

  /**
   * A line that comes and goes at the threshold's current makes the map jump by a little; then this
   * many times the tolerance is as close as any state gets.
   */
  private static final double AT_A_JUMP = 300;

  private static final int MOST_TURNS = 40;
  private static final int VOLTS = 3;

  /** Currents of the lines, then the voltage. */
  final double[] state = new double[4];

  private final Period period;
  private final double[] image = new double[4];
  private final double[] nudged = new double[4];
  private final double[] nudgedImage = new double[4];
  private final double[][] matrix = new double[3][4];
  private final int[] unknown = new int[3];

  private double peak;
  private double ampsScale;
  private double threshold;

  StateNewton(Period period) {
    this.period = period;
  }

  void scale(double peakV, double amps, double thresholdA) {
    peak = peakV;
    ampsScale = amps;
    threshold = thresholdA;
  }

  /** Starts from no current and a share of the peak voltage. */
  void start(double share) {
    java.util.Arrays.fill(state, 0);
    state[VOLTS] = share * peak;
  }

  /** Moves the state until it closes on itself; false where it does not. */
  boolean converge() {
    for (int n = 0; n < MOST_TURNS; n++) {
      if (!period.map(state, image)) {
        return false;
      }
      if (closed(n < MOST_TURNS - 1 ? 1 : AT_A_JUMP)) {
        return true;
      }
      if (n < 1 || !sameLines() || !step()) {
        System.arraycopy(image, 0, state, 0, 4);
      }
    }
    return false;
  }

  /** Repeats the period plainly, as the bridge itself would; false where it does not survive. */
  boolean repeat(int turns) {
    for (int n = 0; n < turns; n++) {
      if (!period.map(state, image)) {
        return false;
      }
      if (closed(1)) {
        return true;
      }
      System.arraycopy(image, 0, state, 0, 4);
    }
    return true;
  }

  private boolean sameLines() {
    for (int k = 0; k < VOLTS; k++) {
      if (Math.signum(state[k]) != Math.signum(image[k])) {
        return false;
      }
    }
    return true;
  }

  private boolean closed(double times) {
    for (int k = 0; k < VOLTS; k++) {
      if (Math.abs(image[k] - state[k]) > times * AMPS_TOLERANCE * ampsScale) {
        return false;
      }
    }
    return Math.abs(image[VOLTS] - state[VOLTS]) < times * TOLERANCE * peak;
  }

  /** One step with a Jacobian by differences; false leaves the state to plain repetition. */
  private boolean step() {
    int size = unknowns();
    for (int column = 0; column < size; column++) {
      System.arraycopy(state, 0, nudged, 0, 4);
      double step = nudge(unknown[column]);
      if (!period.map(nudged, nudgedImage)) {
        return false;
      }
      for (int row = 0; row < size; row++) {
        int k = unknown[row];
        matrix[row][column] = (nudgedImage[k] - image[k]) / step - (row == column ? 1 : 0);
      }
    }
    for (int row = 0; row < size; row++) {
      matrix[row][3] = state[unknown[row]] - image[unknown[row]];
    }
    return eliminate(size) && accept(size);
  }

  /** The independent unknowns: one current of a pair, the two like-signed ones of three. */
  private int unknowns() {
    int size = 0;
    int balance = 0;
    for (int k = 0; k < VOLTS; k++) {
      balance += (int) Math.signum(state[k]);
    }
    int sign = balance >= 0 ? 1 : -1;
    for (int k = 0; k < VOLTS; k++) {
      if (state[k] * sign > 0) {
        unknown[size++] = k;
      }
    }
    unknown[size++] = VOLTS;
    return size;
  }

  /** Enlarges one unknown of the nudged state a little; returns the signed change. */
  private double nudge(int index) {
    double step = index == VOLTS ? 1e-6 * peak : Math.copySign(1e-5 * ampsScale, nudged[index]);
    shift(index, step);
    return step;
  }

  /** Changes one unknown, keeping the sum of currents zero. */
  private void shift(int index, double step) {
    if (index < VOLTS) {
      for (int k = 0; k < VOLTS; k++) {
        if (nudged[k] * nudged[index] < 0) {
          nudged[k] -= step;
          break;
        }
      }
    }
    nudged[index] += step;
  }

  /** Gauss-Jordan with row exchange. */
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
          subtract(r, p, size);
        }
      }
    }
    return true;
  }

  private void subtract(int row, int pivot, int size) {
    double factor = matrix[row][pivot] / matrix[pivot][pivot];
    for (int c = pivot; c < size; c++) {
      matrix[row][c] -= factor * matrix[pivot][c];
    }
    matrix[row][3] -= factor * matrix[pivot][3];
  }

  /** Takes the step, shortened to what is sensible; false where it would leave the lines' set. */
  private boolean accept(int size) {
    double shrink = 1;
    for (int r = 0; r < size; r++) {
      double step = Math.abs(matrix[r][3] / matrix[r][r]);
      double most = unknown[r] == VOLTS ? 0.2 * peak : 5 * ampsScale;
      shrink = Math.min(shrink, most / Math.max(step, 1e-300));
    }
    System.arraycopy(state, 0, nudged, 0, 4);
    for (int r = 0; r < size; r++) {
      double step = shrink * matrix[r][3] / matrix[r][r];
      int k = unknown[r];
      if (k < VOLTS && Math.abs(nudged[k]) + step * Math.signum(nudged[k]) <= threshold) {
        return false;
      }
      shift(k, step);
    }
    if (!(nudged[VOLTS] > 0.05 * peak)) {
      return false;
    }
    System.arraycopy(nudged, 0, state, 0, 4);
    return true;
  }
}
