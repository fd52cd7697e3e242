package fourthwire.load;

import fourthwire.load.model.LoadModel;
import fourthwire.load.model.LoadSolver;
import fourthwire.load.model.NoSteadyStateException;
import fourthwire.load.model.PortSpectra;
import fourthwire.quantity.Phasor;

/**
 * {@code motor}: a three-phase induction motor on the line.
 *
 * <p>Constant active and reactive power on the positive-sequence fundamental, injected. To negative
 * sequence and to harmonics it is its locked-rotor impedance, a linear part of the network: X 17 %
 * on V²/(rated_w/displacement_factor), R = X/3·√h (common practice, no source). Open to zero
 * sequence.
 *
 * <p>Behind a series impedance Z the positive-sequence voltage solves V = E - Z·S*\/V*, a quadratic
 * in |V|²; where it has no real root the source cannot carry the motor. Exact against hand algebra.
 * Valid near rated voltage; the locked-rotor reactance of real motors lies between 14 and 22 %.
 */
final class Motor implements LoadModel {
  private final double frequencyHz;
  private final Phasor voltAmperes;
  private final double ohm;
  private final double reactanceOhm;

  /**
   * All units together.
   *
   * @param voltAmperes active and reactive power in this state
   * @param lockedOhm locked-rotor reactance at the fundamental, star, ohms
   */
  Motor(double frequencyHz, Phasor voltAmperes, double lockedOhm) {
    this.frequencyHz = frequencyHz;
    this.voltAmperes = voltAmperes;
    this.reactanceOhm = lockedOhm;
    this.ohm = lockedOhm / 3;
  }

  @Override
  public int ports() {
    return 3;
  }

  @Override
  public void linearSiemens(double order, double[] y) {
    double r = ohm * Math.sqrt(order);
    double x = reactanceOhm * order;
    double square = r * r + x * x;
    y[2] = r / square;
    y[3] = -x / square;
    y[0] = order == 1 ? 0 : y[2];
    y[1] = order == 1 ? 0 : y[3];
    y[4] = 0;
    y[5] = 0;
  }

  @Override
  public LoadSolver newSolver() {
    return this::inject;
  }

  private void inject(PortSpectra emf, double seriesOhm, double seriesHenry, PortSpectra current) {
    Phasor e = emf.positiveSequence();
    Phasor z = new Phasor(seriesOhm, 2 * Math.PI * frequencyHz * seriesHenry);
    Phasor perLine = voltAmperes.times(1.0 / 3).conjugate();
    Phasor drop = z.times(perLine);
    double square = e.re() * e.re() + e.im() * e.im();
    double half = square / 2 - drop.re();
    double root = half * half - drop.re() * drop.re() - drop.im() * drop.im();
    if (!(root >= 0) || !(half > 0)) {
      throw new NoSteadyStateException(
              "a motor asks for more power than its source impedance lets through")
          .since(NoSteadyStateException.Why.TOO_MUCH);
    }
    double voltsSquared = half + Math.sqrt(root);
    Phasor i = perLine.times(e).over(new Phasor(voltsSquared, 0).plus(drop));
    current.clear();
    for (int k = 0; k < 3; k++) {
      Phasor line = i.turned(-120.0 * k);
      current.re[k][1] = line.re();
      current.im[k][1] = line.im();
    }
  }
}
