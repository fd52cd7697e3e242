package fourthwire.load.rectifier;

/**
 * Newton's method on the state of bridges at a section of the cycle: the currents of their lines,
 * which add up to zero in each bridge, and the capacitor's voltage.
 *
 * <p>The Jacobian is taken by differences once and then kept up to date by Broyden's formula ("A
 * class of methods for solving nonlinear simultaneous equations", Mathematics of Computation 19,
 * 1965), from solve to solve too, as long as that closes in. Where the set of conducting lines at
 * the section changes from turn to turn the map itself is repeated. Workspace of one solver, not
 * thread-safe.
 */
final class StateNewton {
  /** Where one period later the bridges stand; false where they do not get there. */
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
  private static final int MOST_UNKNOWNS = 5;

  /** Powers of the Jacobian to 2 to this many tell its largest multiplier to 0.1 %. */
  private static final int SQUARINGS = 14;

  /** A kept Jacobian that brings the defect down by less than this is taken anew. */
  private static final double SLOW = 0.3;

  /** Currents of the lines, then the voltage. */
  final double[] state;

  private final Period period;
  private final int volts;
  private final int linesOfOne;
  private final double[] image;
  private final double[] nudged;
  private final double[] nudgedImage;

  /** Jacobian of the defect, image less state, in units of {@link #scaleOf}. */
  private final double[][] jacobian = new double[MOST_UNKNOWNS][MOST_UNKNOWNS];

  private final double[][] matrix = new double[MOST_UNKNOWNS][MOST_UNKNOWNS + 1];
  private final double[] defect = new double[MOST_UNKNOWNS];
  private final double[] step = new double[MOST_UNKNOWNS];
  private final int[] unknown = new int[MOST_UNKNOWNS];
  private int size;

  /** Which lines conduct at the section, and for which of these the Jacobian was taken. */
  private int lines;

  private int jacobianOf = -1;

  private double peak;
  private double ampsScale;
  private double threshold;

  /**
   * Of bridges.
   *
   * @param lines how many lines they have together
   * @param linesOfOne how many of these in sequence add up to zero; 1 where each current is free,
   *     and positive
   */
  StateNewton(int lines, int linesOfOne, Period period) {
    this.period = period;
    this.linesOfOne = linesOfOne;
    volts = lines;
    state = new double[lines + 1];
    image = new double[lines + 1];
    nudged = new double[lines + 1];
    nudgedImage = new double[lines + 1];
  }

  void scale(double peakV, double amps, double thresholdA) {
    peak = peakV;
    ampsScale = amps;
    threshold = thresholdA;
  }

  /** Starts from no current and a share of the peak voltage. */
  void start(double share) {
    java.util.Arrays.fill(state, 0);
    state[volts] = share * peak;
    jacobianOf = -1;
  }

  /** The period has changed: what is known of its Jacobian does not hold. */
  void forget() {
    jacobianOf = -1;
  }

  /**
   * How a small departure from the state, which has closed, grows from period to period: the
   * largest size of the map's multipliers (Floquet), from high powers of its Jacobian; infinite
   * where a neighbouring state does not get through the period.
   */
  double largestMultiplier() {
    if (!period.map(state, image)) {
      return Double.POSITIVE_INFINITY;
    }
    unknowns();
    if (!differences()) {
      return Double.POSITIVE_INFINITY;
    }
    double[][] power = new double[size][size];
    for (int a = 0; a < size; a++) {
      for (int b = 0; b < size; b++) {
        power[a][b] = jacobian[a][b] + (a == b ? 1 : 0);
      }
    }
    double log = 0;
    double share = 1;
    for (int n = 0; n < SQUARINGS; n++) {
      double norm = 0;
      for (double[] row : power) {
        norm = Math.max(norm, norm(row));
      }
      log += share * Math.log(norm);
      power = square(power, norm);
      share /= 2;
    }
    return Math.exp(log);
  }

  private static double[][] square(double[][] a, double norm) {
    int n = a.length;
    double[][] square = new double[n][n];
    for (int r = 0; r < n; r++) {
      for (int c = 0; c < n; c++) {
        for (int k = 0; k < n; k++) {
          square[r][c] += a[r][k] / norm * (a[k][c] / norm);
        }
      }
    }
    return square;
  }

  /** Moves the state until it closes on itself; false where it does not. */
  boolean converge() {
    boolean stepped = false;
    double before = 0;
    for (int n = 0; n < MOST_TURNS; n++) {
      if (!period.map(state, image)) {
        return false;
      }
      if (closed(n < MOST_TURNS - 1 ? 1 : AT_A_JUMP)) {
        return true;
      }
      stepped = (n > 0 || jacobianOf >= 0) && sameLines() && advance(stepped, before);
      if (stepped) {
        before = norm(defect);
      } else {
        System.arraycopy(image, 0, state, 0, volts + 1);
      }
    }
    return false;
  }

  /**
   * Repeats the period plainly, as the bridges themselves would; false where they do not survive.
   */
  boolean repeat(int turns) {
    for (int n = 0; n < turns; n++) {
      if (!period.map(state, image)) {
        return false;
      }
      if (closed(1)) {
        return true;
      }
      System.arraycopy(image, 0, state, 0, volts + 1);
    }
    return true;
  }

  private boolean sameLines() {
    for (int k = 0; k < volts; k++) {
      if (Math.signum(state[k]) != Math.signum(image[k])) {
        return false;
      }
    }
    return true;
  }

  private boolean closed(double times) {
    for (int k = 0; k < volts; k++) {
      if (!(Math.abs(image[k] - state[k]) <= times * AMPS_TOLERANCE * ampsScale)) {
        return false;
      }
    }
    return Math.abs(image[volts] - state[volts]) < times * TOLERANCE * peak;
  }

  /**
   * One step from the image just found; false leaves the state to plain repetition.
   *
   * @param stepped whether the state came from such a step, with this defect before it
   */
  private boolean advance(boolean stepped, double before) {
    unknowns();
    for (int a = 0; a < size; a++) {
      defect[a] = (image[unknown[a]] - state[unknown[a]]) / scaleOf(unknown[a]);
    }
    if (jacobianOf != lines || stepped && norm(defect) > SLOW * before) {
      if (!differences()) {
        return false;
      }
    } else if (stepped) {
      update();
    }
    return eliminate() && accept();
  }

  private double scaleOf(int index) {
    return index == volts ? peak : ampsScale;
  }

  private double norm(double[] a) {
    double sum = 0;
    for (int n = 0; n < size; n++) {
      sum += a[n] * a[n];
    }
    return Math.sqrt(sum);
  }

  /** Broyden's update: what the last step has missed lies along it. */
  private void update() {
    double square = 0;
    for (int a = 0; a < size; a++) {
      square += step[a] * step[a];
    }
    for (int a = 0; a < size; a++) {
      for (int b = 0; b < size; b++) {
        jacobian[a][b] += defect[a] * step[b] / square;
      }
    }
  }

  private boolean differences() {
    jacobianOf = -1;
    for (int b = 0; b < size; b++) {
      System.arraycopy(state, 0, nudged, 0, volts + 1);
      int index = unknown[b];
      double nudge = index == volts ? 1e-6 * peak : Math.copySign(1e-5 * ampsScale, nudged[index]);
      shift(index, nudge);
      if (!period.map(nudged, nudgedImage)) {
        return false;
      }
      for (int a = 0; a < size; a++) {
        int k = unknown[a];
        jacobian[a][b] =
            (nudgedImage[k] - image[k]) / nudge * scaleOf(index) / scaleOf(k) - (a == b ? 1 : 0);
      }
    }
    jacobianOf = lines;
    return true;
  }

  /**
   * The independent unknowns of each bridge: one current of a pair, the two like-signed of three.
   */
  private void unknowns() {
    size = 0;
    lines = 0;
    for (int k = 0; k < volts; k += linesOfOne) {
      int sign = balance(k) >= 0 ? 1 : -1;
      for (int m = k; m < k + linesOfOne; m++) {
        lines = 3 * lines + 1 + (int) Math.signum(state[m]);
        if (state[m] * sign > 0) {
          unknown[size++] = m;
        }
      }
    }
    unknown[size++] = volts;
  }

  private double balance(int first) {
    double sum = 0;
    for (int k = first; k < first + linesOfOne; k++) {
      sum += Math.signum(state[k]);
    }
    return sum;
  }

  /** Changes one unknown of the nudged state, keeping the bridge's sum of currents zero. */
  private void shift(int index, double step) {
    if (index < volts) {
      int first = index - index % linesOfOne;
      for (int k = first; k < first + linesOfOne; k++) {
        if (nudged[k] * nudged[index] < 0) {
          nudged[k] -= step;
          break;
        }
      }
    }
    nudged[index] += step;
  }

  /** The step to a defect of zero, by Gauss and Jordan with row exchange. */
  private boolean eliminate() {
    for (int r = 0; r < size; r++) {
      System.arraycopy(jacobian[r], 0, matrix[r], 0, size);
      matrix[r][size] = -defect[r];
    }
    for (int p = 0; p < size; p++) {
      exchange(p);
      if (matrix[p][p] == 0) {
        return false;
      }
      for (int r = 0; r < size; r++) {
        if (r != p) {
          subtract(r, p);
        }
      }
    }
    for (int r = 0; r < size; r++) {
      step[r] = matrix[r][size] / matrix[r][r];
    }
    return true;
  }

  private void exchange(int p) {
    int best = p;
    for (int r = p + 1; r < size; r++) {
      if (Math.abs(matrix[r][p]) > Math.abs(matrix[best][p])) {
        best = r;
      }
    }
    double[] swap = matrix[p];
    matrix[p] = matrix[best];
    matrix[best] = swap;
  }

  private void subtract(int row, int pivot) {
    double factor = matrix[row][pivot] / matrix[pivot][pivot];
    for (int c = pivot; c <= size; c++) {
      matrix[row][c] -= factor * matrix[pivot][c];
    }
  }

  /** Takes the step, shortened to what is sensible; false where it would leave the lines' set. */
  private boolean accept() {
    double shrink = 1;
    for (int r = 0; r < size; r++) {
      double most = unknown[r] == volts ? 0.2 : 5;
      shrink = Math.min(shrink, most / Math.max(Math.abs(step[r]), 1e-300));
    }
    System.arraycopy(state, 0, nudged, 0, volts + 1);
    for (int r = 0; r < size; r++) {
      step[r] *= shrink;
      int k = unknown[r];
      double change = step[r] * scaleOf(k);
      if (k < volts && Math.abs(nudged[k]) + change * Math.signum(nudged[k]) <= threshold) {
        return false;
      }
      shift(k, change);
    }
    if (!(nudged[volts] > 0.05 * peak)) {
      return false;
    }
    System.arraycopy(nudged, 0, state, 0, volts + 1);
    return true;
  }
}
