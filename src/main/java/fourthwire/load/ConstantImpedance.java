package fourthwire.load;

import fourthwire.load.model.LoadModel;
import fourthwire.load.model.LoadSolver;

/**
 * {@code resistive} and {@code linear}: a constant impedance, sized at nominal voltage.
 *
 * <p>A resistance, or a series R-L (lagging) or R-C (leading) whose fundamental draws the rated
 * power at its displacement factor; Z(h) = R + jhX or R - jX/h with R, X constant. On three lines
 * it is a delta: open to zero sequence. It has no injected current. Exact by definition; real
 * heaters' resistance changes by a few percent from cold to hot (common practice, no source).
 */
final class ConstantImpedance implements LoadModel {
  private final int ports;
  private final double ohm;
  private final double reactanceOhm;

  /**
   * Sized at nominal voltage.
   *
   * @param portV nominal port voltage; line to line for three ports
   * @param va apparent power of all units together
   * @param displacementFactor lagging positive, leading negative
   */
  ConstantImpedance(int ports, double portV, double va, double displacementFactor) {
    this.ports = ports;
    double z = portV * portV / va;
    double cos = Math.abs(displacementFactor);
    this.ohm = z * cos;
    this.reactanceOhm = Math.copySign(z * Math.sqrt(1 - cos * cos), displacementFactor);
  }

  @Override
  public int ports() {
    return ports;
  }

  @Override
  public void linearSiemens(double order, double[] y) {
    double x = reactanceOhm >= 0 ? order * reactanceOhm : reactanceOhm / order;
    double square = ohm * ohm + x * x;
    y[0] = ohm / square;
    y[1] = -x / square;
    if (ports == 3) {
      y[2] = y[0];
      y[3] = y[1];
      y[4] = 0;
      y[5] = 0;
    }
  }

  @Override
  public boolean isLinear() {
    return true;
  }

  @Override
  public LoadSolver newSolver() {
    return (emf, seriesOhm, seriesHenry, current) -> current.clear();
  }
}
