package fourthwire.load.control;

import fourthwire.load.model.LoadModel;
import fourthwire.load.model.LoadSolver;
import fourthwire.load.model.NoSteadyStateException;
import fourthwire.load.model.PortSpectra;
import fourthwire.quantity.Spectrum;

/**
 * {@code phase-dimmer}: a resistance or series R-L behind a thyristor pair that fires at an angle
 * after each crossing of the voltage and conducts until the current ends.
 *
 * <p>From firing at x_f: i(x) = p(x) - p(x_f)·exp(-(x - x_f)·R/X), p the steady current of the R-L
 * (network's and load's) under the electromotive force, all orders at once: a closed form, and so
 * are its harmonics ({@link DimmerPulse}). Between pulses no current flows, so the terminal voltage
 * is the electromotive force and its crossing the trigger's reference. A current that has not ended
 * at the next firing flows all the time: a linear load. The rating is the load's at full conduction
 * (the lamps' nameplate); firing lowers what is drawn.
 *
 * <p>Valid for leading-edge control with two like pulses a cycle, at orders to 50. Exact for R (the
 * closed form to 1e-6 at any angle and distortion) and R-L (an independent integration to 0.1 %);
 * real lamps' resistance falls with temperature when dimmed, and a universal motor's voltage rises
 * with its speed: neither is modelled, expect some percent (common practice, no source).
 */
public final class PhaseDimmer implements LoadModel {
  private static final int ORDERS = Spectrum.HIGHEST_ORDER;
  private static final ThreadLocal<DimmerPulse> WORKSPACE =
      ThreadLocal.withInitial(DimmerPulse::new);

  private final double ohm;
  private final double henry;
  private final double frequencyHz;
  private final double firing;

  /**
   * All units together.
   *
   * @param firing angle after the voltage's crossing, radians
   */
  public PhaseDimmer(double ohm, double henry, double frequencyHz, double firing) {
    this.ohm = ohm;
    this.henry = henry;
    this.frequencyHz = frequencyHz;
    this.firing = firing;
  }

  @Override
  public int ports() {
    return 1;
  }

  @Override
  public LoadSolver newSolver() {
    return this::solve;
  }

  private void solve(PortSpectra emf, double seriesOhm, double seriesHenry, PortSpectra current) {
    double[] eRe = emf.re[0];
    double[] eIm = emf.im[0];
    if (!(Math.hypot(eRe[1], eIm[1]) > 0)) {
      throw new NoSteadyStateException("a dimmer has no voltage to take its firing angle from");
    }
    DimmerPulse pulse = WORKSPACE.get();
    pulse.set(eRe, eIm, ohm + seriesOhm, 2 * Math.PI * frequencyHz * (henry + seriesHenry));
    current.clear();
    if (!pulses(pulse, eRe, eIm, current)) {
      System.arraycopy(pulse.re, 0, current.re[0], 0, ORDERS + 1);
      System.arraycopy(pulse.im, 0, current.im[0], 0, ORDERS + 1);
    }
  }

  /** Adds the pulses of a cycle; false where current flows all the time. */
  private boolean pulses(DimmerPulse pulse, double[] eRe, double[] eIm, PortSpectra current) {
    double fundamental = -Math.atan2(eIm[1], eRe[1]);
    double first = Crossing.near(eRe, eIm, fundamental, ORDERS);
    if (pulse.halfWave) {
      return pulse.add(first + firing, Math.PI, 1, current);
    }
    double second = Crossing.near(eRe, eIm, fundamental + Math.PI, ORDERS);
    return pulse.add(first + firing, second - first, 1, current)
        && pulse.add(second + firing, first + 2 * Math.PI - second, -1, current);
  }
}
