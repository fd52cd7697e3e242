package fourthwire.load.rectifier.loop;

/**
 * How the state of a {@link LoopBridge} at a moment answers to small departures of the one its
 * march began with: a column for each departure.
 *
 * <p>Along a step the linearised circuit M·δx' = -(R + r_d)·δx - δv, C·δv' = Σδx + (P/v²)·δv is
 * taken by the two-stage, second-order, L-stable SDIRK method (Alexander, "Diagonally implicit
 * Runge-Kutta methods for stiff O.D.E.'s", SIAM Journal on Numerical Analysis 14, 1977). Where a
 * current ends, a departure moves the moment of its end, and the currents that stay change their
 * rates there: δx becomes δx + (x' before - x' after)·δt (the saltation of Aizerman and Gantmakher,
 * "On the stability of periodic motions", Journal of Applied Mathematics and Mechanics 22, 1958). A
 * current that starts does so with a slope of zero and changes nothing. Serves Newton's steps and
 * the multipliers of a steady state; a solution's own accuracy does not hang on it.
 */
final class LoopTangent {
  /** As many departures as a state has independent numbers. */
  static final int MOST = LoopStep.MOST + 1;

  /** By column: departures of the state's currents, then of the voltage. */
  final double[][] column;

  /** How many columns are carried. */
  int count;

  /** By column: the loops' currents, and by how much the last end moved. */
  private final double[][] loop = new double[MOST][LoopStep.MOST];

  private final double[] moved = new double[MOST];
  private final int volts;
  private boolean ended;

  LoopTangent(int currents) {
    volts = currents;
    column = new double[MOST][currents + 1];
  }

  /**
   * Begins a march.
   *
   * @param departures of its first state: currents, then the voltage
   */
  void start(double[][] departures, int columns) {
    count = columns;
    ended = false;
    for (int c = 0; c < count; c++) {
      int lines = departures[c].length - 1;
      System.arraycopy(departures[c], 0, column[c], 0, lines);
      column[c][volts] = departures[c][lines];
    }
  }

  /** What a column's departure of the voltage has come to. */
  double volts(int c) {
    return column[c][volts];
  }

  /** No current flows while the voltage falls, v² linearly: v·δv stays. */
  void rest(double before, double after) {
    ended = false;
    for (int c = 0; c < count; c++) {
      double v = column[c][volts];
      java.util.Arrays.fill(column[c], 0);
      column[c][volts] = v * before / after;
    }
  }

  /** Goes over to the loops in which currents flow from now on. */
  void enter(LoopStep loops, ThreeLineEmf emf, double position) {
    for (int c = 0; c < count; c++) {
      for (int a = 0; a < loops.n; a++) {
        loop[c][a] = loops.loop[a].sign * column[c][loops.loop[a].in];
      }
    }
    if (ended) {
      loops.rates(emf, position);
      addRates(loops, -1);
      ended = false;
    }
  }

  /** Carries the columns over the step that the loops have just taken, of h cells. */
  void step(LoopStep loops, double h, double volts0) {
    if (count == 0) {
      return;
    }
    loops.prepareTangent(h, 0.5 * (volts0 + loops.v));
    for (int c = 0; c < count; c++) {
      column[c][volts] = loops.tangent(loop[c], column[c][volts]);
    }
  }

  /** A loop's current has ended. */
  void end(LoopStep loops, int gone, ThreeLineEmf emf, double position) {
    if (count == 0) {
      return;
    }
    loops.rates(emf, position);
    double rate = loops.rate(gone);
    ended = !loops.resistive() && rate < 0;
    for (int c = 0; c < count && ended; c++) {
      moved[c] = -loop[c][gone] / rate;
    }
    if (ended) {
      addRates(loops, 1);
    }
    for (int c = 0; c < count; c++) {
      loop[c][gone] = 0;
    }
  }

  private void addRates(LoopStep loops, int times) {
    for (int c = 0; c < count; c++) {
      for (int a = 0; a < loops.n; a++) {
        loop[c][a] += times * moved[c] * loops.rate(a);
      }
    }
  }

  /** Back from the loops to the state's currents. */
  void exit(LoopBridge bridge) {
    for (int c = 0; c < count; c++) {
      bridge.carry(loop[c], column[c]);
    }
  }
}
