package fourthwire.load.rectifier.loop;

/**
 * A path of current through a bridge: in by one line, through the direct-current side, out by
 * another. Lines 0 to 2 are the first bridge's, 3 to 5 those of a second one behind windings 30°
 * ahead.
 *
 * <p>Seen from the three lines of the source a bridge's line is a direction in the plane of
 * currents without zero sequence (Clarke's transformation, power-invariant); what a current in one
 * loop drives through the source counts in another by the scalar product of their directions.
 */
final class Loop {
  private static final double[][] ALONG = new double[6][6];

  static {
    for (int k = 0; k < 6; k++) {
      for (int m = 0; m < 6; m++) {
        ALONG[k][m] = 2.0 / 3 * Math.cos(angle(k) - angle(m));
      }
    }
  }

  /** Lines by which the current enters and leaves where the sign is 1; the reverse where -1. */
  int in;

  int out;
  int sign;

  /** Which bridge it runs through; those that run through the same share a diode. */
  int bridge;

  private final int linesOfOne;

  /**
   * A loop yet to be set.
   *
   * @param linesOfOne how many lines in sequence belong to one bridge: 3; 1 where every loop has a
   *     pair of diodes to itself
   */
  Loop(int linesOfOne) {
    this.linesOfOne = linesOfOne;
  }

  private static double angle(int line) {
    return Math.toRadians(30 * (line / 3) - 120 * (line % 3));
  }

  void set(int in, int out, int sign) {
    this.in = in;
    this.out = out;
    this.sign = sign;
    bridge = in / linesOfOne;
  }

  /** The scalar product with another loop: 2 with itself, 1 with one that shares a line. */
  double along(Loop other) {
    double[] enter = ALONG[in];
    double[] leave = ALONG[out];
    return sign
        * other.sign
        * (enter[other.in] - enter[other.out] - leave[other.in] + leave[other.out]);
  }

  /** Electromotive force around it, volts. */
  double drive(ThreeLineEmf emf, double position) {
    return sign * emf.between(in, out, position);
  }

  /** Slope of that per cell. */
  double driveSlope(ThreeLineEmf emf, double position) {
    return sign * emf.slopeBetween(in, out, position);
  }
}
