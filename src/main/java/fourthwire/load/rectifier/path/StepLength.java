package fourthwire.load.rectifier.path;

/**
 * How long the steps of a pulse are: short after a turn-on, growing with the time since; short
 * where the current nears zero, that its end is found and a pulse that just parts in two is seen
 * to; a share of the ring between inductance and capacitor until that has died out.
 *
 * <p>Lengths follow from the state alone, without jumps, so that the march is a smooth function of
 * its start for Newton's steps. In cells of {@link CycleTable}.
 */
final class StepLength {
  /** First step after a turn-on. */
  private static final double FIRST = 0.03;

  /** What steps grow by with the time since the turn-on. */
  private static final double GROWTH = 0.7;

  /** Longest step: the electromotive force of order 50 repeats in 7.7 cells. */
  private static final double LONGEST = 2;

  /** Longest step where the path is stiff. */
  private static final double LONGEST_STIFF = 1;

  /** Longest step of a path that rings, in radians; and the least length that may force. */
  private static final double RADIANS = 0.5;

  private static final double LEAST_OF_RING = 0.25;

  /**
   * The ring falls by e^-damping a cell; for equal errors of fourth order steps grow by its fifth.
   */
  private static final double SHARE_OF_DAMPING = 0.2;

  /** The current may fall by this share of itself in a step, or rise by the other. */
  private static final double FALL = 0.75;

  private static final double RISE = 1;

  /** A current of so many thresholds is no longer told from its end. */
  private static final double LOW = 50;

  /** That rule shortens a stiff step to this at most: there the slope is not sure. */
  private static final double LEAST_STIFF = 0.1;

  /** Time constants in a step from which on a path counts as stiff. */
  private static final double STIFF = 2;

  private final PathStep path;
  private double ringCells;
  private double damping;
  private double scale;

  /** Whether the step is to be taken as a stiff one. */
  boolean stiff;

  StepLength(PathStep path) {
    this.path = path;
  }

  /**
   * Takes the path's ring and how it dies out.
   *
   * @param amps a current as it flows in the pulse
   */
  void set(double amps) {
    ringCells = Math.max(LEAST_OF_RING, RADIANS * path.ring);
    double ohm = path.resistance + path.diodeOhm(amps);
    damping = path.inductance > 0 ? ohm / (2 * path.inductance) : 0;
    scale = 1;
  }

  /** All steps so many times as long, while a march need not be accurate. */
  void scale(double times) {
    scale = times;
  }

  /**
   * The length of the next step.
   *
   * @param since cells since the turn-on
   * @param push volts that drive the current's change
   */
  double next(double since, double amps, double push) {
    double gone = SHARE_OF_DAMPING * damping * since;
    double ring = ringCells * (1 + gone * (1 + 0.5 * gone));
    double h = scale * Math.min(Math.min(LONGEST, ring), FIRST + GROWTH * since);
    stiff = (path.resistance + path.diodeOhm(amps)) * h >= STIFF * path.inductance;
    double share = scale * (push < 0 ? FALL : RISE);
    double change = share * path.inductance * (amps + LOW * path.threshold) / Math.abs(push);
    if (!stiff) {
      return Math.min(h, change);
    }
    h = Math.min(h, scale * LONGEST_STIFF);
    return path.inductance > 0 ? Math.min(h, Math.max(change, scale * LEAST_STIFF)) : h;
  }
}
