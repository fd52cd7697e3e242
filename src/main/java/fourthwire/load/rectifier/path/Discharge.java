package fourthwire.load.rectifier.path;

/**
 * The capacitor alone with its load while no diode conducts: v² falls linearly under constant
 * power, until the driving voltage passes v and the diodes' thresholds.
 *
 * <p>At the threshold's current the path's equation then starts with a slope of zero or more, so
 * that a conduction that begins does not end at once. Workspace of one solver, not thread-safe.
 */
public final class Discharge {
  /**
   * After an end of conduction a start is looked for only this many cells later, unless the drive
   * is clearly past: a current of about the threshold's would else come and go without end.
   */
  private static final double REST = 0.1;

  private final Drive drive;
  private final PathStep path;
  private final EventFinder.Margin excess = this::excess;

  private double from;
  private double square;
  private double fall;

  /** What would drive a current. */
  public interface Drive {
    /** Volts at a position in cells. */
    double at(double position);

    /** Volts at a node. */
    default double atNode(int node) {
      return at(node);
    }
  }

  /** Where the discharge ended, in cells. */
  public double u;

  /** The capacitor's voltage there. */
  public double v;

  /** Whether it ended because conduction begins. */
  public boolean turnedOn;

  /**
   * Of a path.
   *
   * @param drive the voltage that would drive a current
   */
  public Discharge(Drive drive, PathStep path) {
    this.drive = drive;
    this.path = path;
  }

  /**
   * Discharges from a position on, at most to another.
   *
   * @param justLeft whether a conduction has ended at this very position
   * @return false where the voltage falls to the floor
   */
  public boolean run(double position, double volts, boolean justLeft, double to, double floorV) {
    from = position;
    square = volts * volts;
    fall = 2 * path.power / path.capacitance;
    u = Math.min(to, justLeft && excess(from) < path.slopeV ? from + REST : from);
    turnedOn = u < to && excess(u) >= 0;
    boolean alive = turnedOn || toNextTurnOn(to, floorV * floorV);
    v = alive ? Math.sqrt(square - fall * (u - from)) : 0;
    return alive;
  }

  /** From node to node, comparing squares; false where the voltage falls to the floor. */
  private boolean toNextTurnOn(double to, double floor) {
    int node = (int) u;
    while (u < to) {
      node++;
      boolean last = node >= to;
      double place = last ? to : node;
      double left = square - fall * (place - from);
      double free = (last ? drive.at(to) : drive.atNode(node)) - path.onsetV;
      if (left <= floor) {
        return false;
      }
      if (free > 0 && free * free >= left) {
        turnedOn = true;
        u = turnOn(place);
        return true;
      }
      u = place;
    }
    return true;
  }

  /** Where between u and a node the drive passes. */
  private double turnOn(double node) {
    return EventFinder.find(excess, u, excess(u), node, excess(node), 1e-7, 1e-8);
  }

  private double excess(double at) {
    return drive.at(at) - path.onsetV - Math.sqrt(Math.max(0, square - fall * (at - from)));
  }
}
