package fourthwire.load.control;

import fourthwire.load.model.LoadModel;
import fourthwire.load.model.LoadSolver;

/**
 * {@code pfc-continuous} and {@code pfc-critical}: a supply whose control makes the current repeat
 * the voltage's shape.
 *
 * <p>i = G·v outside a dead angle δ to both sides of each crossing of the terminal voltage, i = 0
 * inside, G such that the supply draws its power: a constant-power load. The dead angle grows as
 * the load falls, δ = a·(rated/actual)^b. Critical mode adds a third harmonic of {@code
 * residual_percent} of the fundamental that thins the current near the crossings, where its
 * switching frequency is limited. The input filter's capacitor is a linear part of the network.
 *
 * <p>Fit: a = 11°, b = 0.5 (continuous) and a = 9°, b = 0.5, residual 3 % (critical) put the
 * distortion at rated load inside 3 to 8 % and at a fifth of it inside 10 to 25 %, the ranges
 * published for such supplies (recalled from data sheets, low confidence). Valid while the control
 * follows: orders to 50. Expected error: a few percent of the fundamental, since every maker's
 * control differs.
 */
public final class PowerFactorCorrected implements LoadModel {
  /** Beyond this dead angle the current would be a needle no control makes. */
  private static final double WIDEST_DEGREES = 80;

  private final double powerW;
  private final double frequencyHz;
  private final double filterF;
  private final double residual;
  private final DeadZone zone;

  /**
   * All units of a row together.
   *
   * @param powerW input power in this state
   * @param filterF input filter capacitance, farads
   * @param deadDegrees dead angle in this state
   * @param residual third harmonic as a share of the fundamental
   */
  public PowerFactorCorrected(
      double powerW, double frequencyHz, double filterF, double deadDegrees, double residual) {
    this.powerW = powerW;
    this.frequencyHz = frequencyHz;
    this.filterF = filterF;
    this.residual = residual;
    this.zone = new DeadZone(Math.toRadians(Math.min(deadDegrees, WIDEST_DEGREES)));
  }

  @Override
  public int ports() {
    return 1;
  }

  @Override
  public void linearSiemens(double order, double[] y) {
    y[0] = 0;
    y[1] = 2 * Math.PI * frequencyHz * order * filterF;
  }

  @Override
  public boolean isLinear() {
    return false;
  }

  @Override
  public LoadSolver newSolver() {
    return new PfcSolver(powerW, frequencyHz, residual, zone);
  }
}
