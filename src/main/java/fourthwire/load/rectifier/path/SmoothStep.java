package fourthwire.load.rectifier.path;

/**
 * A longer step of a conducting path where it is not stiff, in the middle of a pulse.
 *
 * <p>The equations are those of {@link PathStep}, taken by the four-stage, fourth-order Rosenbrock
 * method GRK4T (Kaps and Rentrop, "Generalized Runge-Kutta methods of order four with stepsize
 * control for stiff ordinary differential equations", Numerische Mathematik 33, 1979), which looks
 * at the slopes three times: no dearer a step than RODAS3, and at half a radian of the path's ring
 * a thirtieth of its error. It damps what is stiff by half a step only, and L may not be 0. It
 * needs the electromotive force at two places within the step.
 */
final class SmoothStep {
  /** Where in the step the electromotive force is asked for. */
  static final double SECOND = 0.462;

  static final double THIRD = 0.880208333333;

  private static final double GAMMA = 0.231;
  private static final double A2 = 2;
  private static final double A31 = 4.52470820736;
  private static final double A32 = 4.16352878860;
  private static final double C21 = -5.07167533877;
  private static final double C31 = 6.02015272865;
  private static final double C32 = 0.159750684673;
  private static final double C41 = -1.856343618677;
  private static final double C42 = -8.50538085819;
  private static final double C43 = -2.08407513602;
  private static final double B1 = 3.95750374663;
  private static final double B2 = 4.62489238836;
  private static final double B3 = 0.617477263873;
  private static final double B4 = 1.282612945268;
  private static final double D2 = -0.0396296677520;
  private static final double D3 = 0.550778939579;
  private static final double D4 = -0.0553509845700;

  private final PathStep path;

  SmoothStep(PathStep path) {
    this.path = path;
  }

  /**
   * Steps from (i0, v0) over h cells; the result is the path's.
   *
   * @param e0 the drive at the start, its slope per cell d0
   * @param e2 the drive at {@link #SECOND} of the step
   * @param e3 at {@link #THIRD}
   */
  void step(double h, double i0, double v0, double e0, double d0, double e2, double e3) {
    double rate = 1 / h;
    double lh = path.inductance * rate;
    double ch = path.capacitance * rate;
    double perVolt = 1 / v0;
    double drawn = path.power * perVolt;
    double a = lh * (1 / GAMMA) + path.resistance + path.diodeOhm(i0);
    double d = ch * (1 / GAMMA) - drawn * perVolt;
    double det = 1 / (a * d + 1);
    double hd = h * d0;

    double r1 = path.push(i0, v0, e0) + GAMMA * hd;
    double r2 = i0 - drawn;
    double g1i = (r1 * d - r2) * det;
    double g1v = (a * r2 + r1) * det;

    double yi = i0 + A2 * g1i;
    double yv = v0 + A2 * g1v;
    r1 = e2 - yv - path.resistance * yi - path.drop(yi) + D2 * hd + C21 * lh * g1i;
    r2 = yi - path.power / yv + C21 * ch * g1v;
    double g2i = (r1 * d - r2) * det;
    double g2v = (a * r2 + r1) * det;

    yi = i0 + A31 * g1i + A32 * g2i;
    yv = v0 + A31 * g1v + A32 * g2v;
    double drop = path.drop(yi);
    double f1 = e3 - yv - path.resistance * yi - drop;
    double f2 = yi - path.power / yv;
    r1 = f1 + D3 * hd + lh * (C31 * g1i + C32 * g2i);
    r2 = f2 + ch * (C31 * g1v + C32 * g2v);
    double g3i = (r1 * d - r2) * det;
    double g3v = (a * r2 + r1) * det;

    r1 = f1 + D4 * hd + lh * (C41 * g1i + C42 * g2i + C43 * g3i);
    r2 = f2 + ch * (C41 * g1v + C42 * g2v + C43 * g3v);
    double i = i0 + B1 * g1i + B2 * g2i + B3 * g3i + B4 * (r1 * d - r2) * det;
    double v = v0 + B1 * g1v + B2 * g2v + B3 * g3v + B4 * (a * r2 + r1) * det;
    path.end(i, v, path.drop(i, yi, drop));
  }
}
