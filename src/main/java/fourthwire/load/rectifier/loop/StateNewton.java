package fourthwire.load.rectifier.loop;

/**
 * Newton's method on the state of bridges at a section of the cycle: the currents of their lines,
 * which add up to zero in each bridge, and the capacitor's voltage.
 *
 * <p>The Jacobian comes with each march ({@link LoopTangent}). Where the set of conducting lines at
 * the section changes from turn to turn the map itself is repeated. Workspace of one solver, not
 * thread-safe.
 */
final class StateNewton {
  /** Where one period later the bridges stand; false where they do not get there. */
  interface Period {
    /**
     * Writes the image of a state, and turns departures from the state into those of the image.
     *
     * @param columns the departures, a column each
     * @param count how many of them
     */
    boolean map(double[] from, double[] to, double[][] columns, int count);
  }

  private static final double TOLERANCE = 1e-8;
  private static final double AMPS_TOLERANCE = 1e-7;

  /** How near coarse steps are led to a state, in units of the tolerance. */
  private static final double NEAR = 1e5;

  /**
   * A line that comes and goes at the threshold's current makes the map jump by a little; then this
   * many times the tolerance is as close as any state gets.
   */
  private static final double AT_A_JUMP = 300;

  private static final int MOST_TURNS = 15;
  private static final int MOST_PATIENT_TURNS = 40;
  private static final int MOST_COARSE_TURNS = 10;

  /** A step that leads away is halved, at most so often. */
  private static final int MOST_HALVINGS = 3;

  /** Currents of the lines, then the voltage. */
  final double[] state;

  private final Period period;
  private final int volts;
  private final double[] image;

  /** Where the last step was taken from, what it was to better, and whether it was Newton's. */
  private final double[] origin;

  private double before;
  private boolean stepped;
  private final double[] nudged;

  /** Departures of the state along each unknown, then of its image. */
  private final double[][] columns;

  private final SmallMatrix jacobian = new SmallMatrix(LoopTangent.MOST);
  private final double[] step = new double[LoopTangent.MOST];
  private final StateUnknowns unknowns;

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
    volts = lines;
    state = new double[lines + 1];
    image = new double[lines + 1];
    origin = new double[lines + 1];
    nudged = new double[lines + 1];
    unknowns = new StateUnknowns(lines, linesOfOne);
    columns = new double[LoopTangent.MOST][lines + 1];
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
  }

  /** Lets a pair of lines carry a current, at a voltage. */
  void carry(int in, int out, double amps, double v) {
    state[in] = amps;
    state[out] = -amps;
    state[volts] = v;
  }

  /** Moves the state near to where it closes on itself; false where that is not soon reached. */
  boolean approach() {
    for (int n = 0; n < MOST_COARSE_TURNS; n++) {
      if (!follow()) {
        return false;
      }
      boolean near = closed(NEAR);
      advance();
      if (near) {
        return true;
      }
    }
    return false;
  }

  /** Moves the state until it closes on itself; false where it does not soon. */
  boolean converge() {
    return close(MOST_TURNS, 1);
  }

  /** Likewise with patience, and where the map jumps at the state as near as any state gets. */
  boolean settle() {
    return close(MOST_PATIENT_TURNS, AT_A_JUMP);
  }

  private boolean close(int turns, double lastTimes) {
    stepped = false;
    int halvings = 0;
    for (int n = 0; n < turns; n++) {
      boolean through = follow();
      if (through && closed(n < turns - 1 ? 1 : lastTimes)) {
        return true;
      }
      if (stepped && halvings < MOST_HALVINGS && !(through && defect() < before)) {
        halvings++;
        stepHalf();
      } else if (through) {
        halvings = 0;
        before = defect();
        advance();
      } else {
        return false;
      }
    }
    return false;
  }

  /** How far the image is from the state, in units of {@link #scaleOf}. */
  private double defect() {
    double sum = 0;
    for (int k = 0; k <= volts; k++) {
      double part = (image[k] - state[k]) / scaleOf(k);
      sum += part * part;
    }
    return Math.sqrt(sum);
  }

  /** Half way back to where the last step was taken. */
  private void stepHalf() {
    for (int k = 0; k <= volts; k++) {
      state[k] = 0.5 * (state[k] + origin[k]);
    }
  }

  /**
   * Repeats the period plainly, as the bridges themselves would; false where they do not survive.
   */
  boolean repeat(int turns) {
    for (int n = 0; n < turns; n++) {
      if (!period.map(state, image, columns, 0)) {
        return false;
      }
      if (closed(1)) {
        return true;
      }
      System.arraycopy(image, 0, state, 0, volts + 1);
    }
    return true;
  }

  /**
   * How a small departure from the state, which has closed, grows from period to period: the
   * largest size of the map's multipliers (Floquet).
   */
  double largestMultiplier() {
    takeMap();
    return jacobian.spectralRadius(unknowns.size);
  }

  /** A period on, with what departures along the unknowns come to. */
  private boolean follow() {
    unknowns.find(state);
    for (int b = 0; b < unknowns.size; b++) {
      java.util.Arrays.fill(columns[b], 0);
      unknowns.shift(columns[b], state, unknowns.at[b], 1);
    }
    return period.map(state, image, columns, unknowns.size);
  }

  /** By Newton's step where that can be taken, else to the image. */
  private void advance() {
    System.arraycopy(state, 0, origin, 0, volts + 1);
    stepped = sameLines() && solve() && accept();
    if (!stepped) {
      System.arraycopy(image, 0, state, 0, volts + 1);
    }
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

  private double scaleOf(int index) {
    return index == volts ? peak : ampsScale;
  }

  /** The map's derivative by the unknowns, in units of {@link #scaleOf}. */
  private void takeMap() {
    for (int a = 0; a < unknowns.size; a++) {
      for (int b = 0; b < unknowns.size; b++) {
        jacobian.set(
            a, b, columns[b][unknowns.at[a]] * scaleOf(unknowns.at[b]) / scaleOf(unknowns.at[a]));
      }
    }
  }

  /** The step at which image and state would agree. */
  private boolean solve() {
    takeMap();
    for (int a = 0; a < unknowns.size; a++) {
      jacobian.set(a, a, jacobian.get(a, a) - 1);
      step[a] = (state[unknowns.at[a]] - image[unknowns.at[a]]) / scaleOf(unknowns.at[a]);
    }
    return jacobian.solve(unknowns.size, step);
  }

  /** Takes the step, shortened to what is sensible; false where it would leave the lines' set. */
  private boolean accept() {
    double shrink = 1;
    for (int r = 0; r < unknowns.size; r++) {
      double most = unknowns.at[r] == volts ? 0.2 : 5;
      shrink = Math.min(shrink, most / Math.max(Math.abs(step[r]), 1e-300));
    }
    System.arraycopy(state, 0, nudged, 0, volts + 1);
    for (int r = 0; r < unknowns.size; r++) {
      int k = unknowns.at[r];
      double change = shrink * step[r] * scaleOf(k);
      if (k < volts && Math.abs(nudged[k]) + change * Math.signum(nudged[k]) <= threshold) {
        return false;
      }
      unknowns.shift(nudged, state, k, change);
    }
    if (!(nudged[volts] > 0.05 * peak)) {
      return false;
    }
    System.arraycopy(nudged, 0, state, 0, volts + 1);
    return true;
  }
}
