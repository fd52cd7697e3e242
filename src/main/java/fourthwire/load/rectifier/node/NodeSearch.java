package fourthwire.load.rectifier.node;

import fourthwire.load.rectifier.loop.SmallMatrix;
import fourthwire.load.rectifier.path.CycleTable;

/**
 * The search for the periodic state of the bridges on a node: Newton's method on their capacitors'
 * voltages at a section of the cycle, and the currents that flow there, to where they repeat after
 * half a cycle, mirrored, or after the whole one.
 */
final class NodeSearch {
  /** Accepted defect of voltages, of the crest, and of currents, of power over crest. */
  private static final double TOLERANCE = 1e-8;

  private static final double AMPS_TOLERANCE = 1e-6;

  /**
   * Where a pulse just parts in two the map jumps by a little; so many times the tolerance is then
   * as close as any state gets.
   */
  private static final double AT_A_JUMP = 300;

  /** Largest multiplier of a stable state; a little over 1 for its own error. */
  private static final double MOST_MULTIPLIER = 1.001;

  /** Of the crest: what a capacitor is taken to hold where nothing is known. */
  private static final double FIRST_GUESS = 0.93;

  private static final int[] SECTIONS = {0, 21, 43};

  private static final int TURNS_TO_COME_NEAR = 4;
  private static final int MOST_TURNS = 30;
  private static final int MOST_REPETITIONS = 300;
  private static final int REPETITIONS_TO_NEAR = 40;
  private static final int MOST_HALVINGS = 4;

  private final NodeBridges bridges;
  private final int all;

  /** Voltages, then currents, of the state, its image, and the state before the last step. */
  private final double[] state;

  private final double[] image;
  private final double[] origin;
  private final double[] scale;
  private final double[] step;
  private final int[] unknown;
  private final SmallMatrix jacobian;
  private int unknowns;
  private double section;
  private boolean halfWave;
  private boolean known;
  private boolean emptied;

  NodeSearch(NodeBridges bridges, int all) {
    this.bridges = bridges;
    this.all = all;
    state = new double[2 * all];
    image = new double[2 * all];
    origin = new double[2 * all];
    scale = new double[2 * all];
    step = new double[2 * all];
    unknown = new int[2 * all];
    jacobian = new SmallMatrix(2 * all);
  }

  /**
   * Finds a stable state; the bridges have marched it then.
   *
   * @param from the section, in cells
   * @param mirrored whether half cycles of the electromotive force mirror each other
   * @param power of each load, watts
   */
  boolean find(double from, boolean mirrored, double peak, double[] power) {
    section = known ? section : from;
    for (int k = 0; k < all; k++) {
      scale[k] = peak;
      scale[all + k] = power[k] / peak;
    }
    halfWave = mirrored;
    emptied = false;
    boolean found = known && newton(1) && stable() || comeNear() && stable();
    if (!found && !emptied) {
      halfWave = false;
      found = repeat(1.01 * FIRST_GUESS) && stable();
    }
    known = found && halfWave == mirrored;
    return found;
  }

  /** Whether the state found repeats in mirrored halves. */
  boolean halfWave() {
    return halfWave;
  }

  /** Whether a capacitor ran empty when the bridges were left to themselves. */
  boolean emptied() {
    return emptied;
  }

  /** At one section after the other, as some bridge may just start or end at one. */
  private boolean comeNear() {
    double first = section;
    for (int shift : SECTIONS) {
      section = (first + shift) % CycleTable.CELLS;
      if (nearAndNewton()) {
        return true;
      }
    }
    return repeat(1);
  }

  private boolean nearAndNewton() {
    start(FIRST_GUESS);
    for (int n = 0; n < TURNS_TO_COME_NEAR; n++) {
      if (!follow(false)) {
        return false;
      }
      accept();
    }
    return newton(1);
  }

  private void start(double share) {
    for (int k = 0; k < all; k++) {
      state[k] = share * scale[k];
      state[all + k] = 0;
    }
  }

  /** Newton's steps; one that leads away is halved, a few times. */
  private boolean newton(double times) {
    boolean stepped = false;
    int halvings = 0;
    double before = Double.POSITIVE_INFINITY;
    for (int n = 0; n < MOST_TURNS; n++) {
      boolean through = follow(true);
      if (through && closed(times)) {
        return true;
      }
      if (stepped && halvings < MOST_HALVINGS && !(through && defect() < before)) {
        halvings++;
        for (int k = 0; k < 2 * all; k++) {
          state[k] = 0.5 * (state[k] + origin[k]);
        }
      } else if (through) {
        halvings = 0;
        before = defect();
        System.arraycopy(state, 0, origin, 0, 2 * all);
        stepped = advance();
        if (!stepped) {
          accept();
        }
      } else {
        return false;
      }
    }
    return false;
  }

  /** Plain repetition: slow, but it reaches the stable state if there is one. */
  private boolean repeat(double share) {
    start(share);
    for (int n = 0; n < MOST_REPETITIONS; n++) {
      boolean last = n > MOST_REPETITIONS / 2;
      if (!follow(true)) {
        emptied = true;
        return false;
      }
      if (closed(last ? AT_A_JUMP : 1)) {
        return true;
      }
      accept();
      if (n % REPETITIONS_TO_NEAR == REPETITIONS_TO_NEAR - 1 && newtonFromHere()) {
        return true;
      }
    }
    return false;
  }

  /** Newton's method the rest of the way to a stable state; else nothing is changed. */
  private boolean newtonFromHere() {
    double[] here = state.clone();
    if (newton(1) && stable()) {
      return true;
    }
    System.arraycopy(here, 0, state, 0, 2 * all);
    return false;
  }

  private void accept() {
    System.arraycopy(image, 0, state, 0, 2 * all);
  }

  /** Marches once through what has to repeat, if need be with the derivatives. */
  private boolean follow(boolean derive) {
    System.arraycopy(state, 0, bridges.volts, 0, all);
    System.arraycopy(state, all, bridges.amps, 0, all);
    bridges.tangent.clear();
    unknowns = 0;
    for (int k = 0; k < 2 * all && derive; k++) {
      if (k < all || state[k] != 0) {
        bridges.tangent.depart(k % all, k >= all);
        unknown[unknowns++] = k;
      }
    }
    boolean alive = bridges.march(section, CycleTable.CELLS / (halfWave ? 2.0 : 1.0));
    for (int k = 0; k < all; k++) {
      image[k] = bridges.volts[k];
      image[all + k] = sign() * bridges.amps[k];
    }
    return alive;
  }

  private double sign() {
    return halfWave ? -1 : 1;
  }

  private boolean closed(double times) {
    for (int k = 0; k < 2 * all; k++) {
      double most = (k < all ? TOLERANCE : AMPS_TOLERANCE) * times * scale[k];
      if (!(Math.abs(image[k] - state[k]) <= most)) {
        return false;
      }
    }
    return true;
  }

  private double defect() {
    double sum = 0;
    for (int k = 0; k < 2 * all; k++) {
      double part = (image[k] - state[k]) / scale[k];
      sum += part * part;
    }
    return Math.sqrt(sum);
  }

  /** The map's derivative by the unknowns, in units of their scale. */
  private void takeMap() {
    for (int b = 0; b < unknowns; b++) {
      for (int a = 0; a < unknowns; a++) {
        int row = unknown[a];
        double part =
            row < all ? bridges.tangent.volts[b][row] : sign() * bridges.tangent.amps[b][row - all];
        jacobian.set(a, b, part * scale[unknown[b]] / scale[row]);
      }
    }
  }

  private boolean stable() {
    takeMap();
    return jacobian.spectralRadius(unknowns) < MOST_MULTIPLIER;
  }

  /** Newton's step; false where none can be taken, or other bridges conduct at the end. */
  private boolean advance() {
    for (int k = all; k < 2 * all; k++) {
      if (Math.signum(state[k]) != Math.signum(image[k])) {
        return false;
      }
    }
    takeMap();
    for (int a = 0; a < unknowns; a++) {
      jacobian.set(a, a, jacobian.get(a, a) - 1);
      step[a] = (state[unknown[a]] - image[unknown[a]]) / scale[unknown[a]];
    }
    return jacobian.solve(unknowns, step) && take();
  }

  /** Takes the step, shortened to what is sensible; false where a current would turn. */
  private boolean take() {
    double shrink = 1;
    for (int a = 0; a < unknowns; a++) {
      double most = unknown[a] < all ? 0.2 : 3;
      shrink = Math.min(shrink, most / Math.max(Math.abs(step[a]), 1e-300));
    }
    for (int a = 0; a < unknowns; a++) {
      int k = unknown[a];
      double next = state[k] + shrink * step[a] * scale[k];
      if (k >= all && next * state[k] <= 0) {
        return false;
      }
    }
    for (int a = 0; a < unknowns; a++) {
      state[unknown[a]] += shrink * step[a] * scale[unknown[a]];
    }
    return true;
  }
}
