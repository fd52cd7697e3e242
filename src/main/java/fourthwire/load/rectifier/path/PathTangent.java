package fourthwire.load.rectifier.path;

/**
 * How current and capacitor voltage of a march answer to those it started with: the derivative of
 * the one pair by the other.
 *
 * <p>Along a conducting step the linearised path L·δi' = -(R + r_d)·δi - δv, C·δv' = δi + (P/v²)·δv
 * is taken by the two-stage, second-order, L-stable SDIRK method (Alexander, "Diagonally implicit
 * Runge-Kutta methods for stiff O.D.E.'s", SIAM Journal on Numerical Analysis 14, 1977), the
 * diodes' slope r_d at the mean current. It serves the Newton steps of the solver, tells whether a
 * steady state is stable, and takes the last march over what little is left to the state ({@code
 * OnePathSearch}): there its own error counts, times that little.
 */
final class PathTangent {
  private static final double GAMMA = 1 - Math.sqrt(0.5);
  private static final double SECOND = (1 - GAMMA) / GAMMA;

  /** Derivatives of the signed current by the starting current and by the starting voltage. */
  double ii;

  double iv;

  /** Derivatives of the voltage likewise. */
  double vi;

  double vv;

  /** At the start of a march. */
  void clear(boolean conducting) {
    ii = conducting ? 1 : 0;
    iv = 0;
    vi = 0;
    vv = 1;
  }

  /** After a time without current, in which v² fell by a given amount: v·δv stays. */
  void rest(double before, double after) {
    ii = 0;
    iv = 0;
    vi *= before / after;
    vv *= before / after;
  }

  /** A current ends and the opposite one begins at once; its slope is so many times the other's. */
  void reverse(double ratio) {
    ii *= ratio;
    iv *= ratio;
  }

  /** A conducting step of h cells with current and voltage in the middle of it. */
  void step(PathStep path, int sign, double h, double amps, double volts) {
    double l = path.inductance / (GAMMA * h);
    double c = path.capacitance / (GAMMA * h);
    double a = l + path.resistance + path.diodeOhm(amps);
    double d = c - path.power / (volts * volts);
    double det = 1 / (a * d + 1);
    double bii = d * l * det;
    double biv = -c * det * sign;
    double bvi = l * det * sign;
    double bvv = a * c * det;
    double kii = 1 - SECOND + SECOND * bii;
    double kiv = SECOND * biv;
    double kvi = SECOND * bvi;
    double kvv = 1 - SECOND + SECOND * bvv;
    times(
        kii * bii + kiv * bvi, kii * biv + kiv * bvv, kvi * bii + kvv * bvi, kvi * biv + kvv * bvv);
  }

  /**
   * The larger size of the two eigenvalues: how a departure from a repeating state grows.
   *
   * @param sign -1 where the current has to come back with the other sign, else 1
   */
  double largestMultiplier(double sign) {
    double half = (sign * ii + vv) / 2;
    double product = sign * (ii * vv - iv * vi);
    double square = half * half - product;
    return square < 0 ? Math.sqrt(product) : Math.abs(half) + Math.sqrt(square);
  }

  private void times(double tii, double tiv, double tvi, double tvv) {
    double endI = tii * ii + tiv * vi;
    vi = tvi * ii + tvv * vi;
    ii = endI;
    endI = tii * iv + tiv * vv;
    vv = tvi * iv + tvv * vv;
    iv = endI;
  }
}
