package fourthwire.load.rectifier.loop;

import fourthwire.load.rectifier.path.PathStep;

/**
 * The places to which a {@link LoopBridge} steps, and how near its events are to be found: fine for
 * a solution, coarse to come near one.
 */
final class StepGrid {
  /** First steps after a change, as shares of the way to a node: the current starts like t². */
  private static final double[] GRADING = {0.02, 0.06, 0.16, 0.36, 1};

  private static final double[] COARSE_GRADING = {0.1, 0.4, 1};

  /** Longest step as a share of √(LC). */
  private static final double STEP_OF_RING = 0.3;

  private static final double MOST_DIVISIONS = 4;

  /** Cells to a coarse step where the circuit does not ring within one. */
  private static final double COARSE_CELLS = 4;

  private static final double EVENT_CELLS = 1e-7;

  /** How near a start has to be found: its current begins with a slope of zero. */
  private static final double JOIN_CELLS = 1e-5;

  private static final double COARSE_EVENT_CELLS = 1e-3;

  /** How near the end of a current has to be found, cells. */
  double leaveWidth;

  /** How near the start of one. */
  double joinWidth;

  private final PathStep path;
  private double stride;
  private double[] grading = GRADING;
  private int graded;
  private double base;
  private double span;

  StepGrid(PathStep path) {
    this.path = path;
  }

  /** Steps as long as accuracy bears. */
  void fine() {
    stride = longest();
    grading = GRADING;
    leaveWidth = EVENT_CELLS;
    joinWidth = JOIN_CELLS;
  }

  /** Longer steps: good enough to come near a steady state. */
  void coarse() {
    double fine = longest();
    stride = fine < 1 ? 2 * fine : COARSE_CELLS;
    grading = COARSE_GRADING;
    leaveWidth = COARSE_EVENT_CELLS;
    joinWidth = COARSE_EVENT_CELLS;
  }

  /** A cell, divided where the circuit would ring within one. */
  private double longest() {
    double ring = Math.sqrt(path.inductance * path.capacitance);
    return 1 / Math.min(MOST_DIVISIONS, Math.ceil(1 / (STEP_OF_RING * ring + 1e-9)));
  }

  private double node(double position) {
    return (Math.floor(position / stride + 1e-9) + 1) * stride;
  }

  /**
   * Begins with a set of conducting lines.
   *
   * @param fresh whether a current has just started
   */
  void start(double position, double to, boolean fresh) {
    base = position;
    span = Math.min(node(node(position)), to) - position;
    graded = fresh ? 0 : grading.length;
  }

  /** Where the next step leads. */
  double next(double position, double to) {
    return graded < grading.length ? base + grading[graded++] * span : Math.min(node(position), to);
  }
}
