package fourthwire.load.control;

import fourthwire.load.model.LoadModel;
import fourthwire.load.model.LoadSolver;
import fourthwire.load.model.NoSteadyStateException;
import fourthwire.load.model.PortSpectra;
import fourthwire.quantity.Spectrum;
import java.util.Arrays;

/**
 * {@code phase-dimmer}: a resistance or series R-L behind a thyristor pair that fires at an angle
 * after each crossing of the voltage and conducts until the current ends.
 *
 * <p>From firing at x_f: i(x) = p(x) - p(x_f)·exp(-(x - x_f)·R/X), p the steady current of the R-L
 * (network's and load's) under the electromotive force, all orders at once: a closed form. Between
 * pulses no current flows, so the terminal voltage is the electromotive force and its crossing the
 * trigger's reference. A current that has not ended at the next firing flows all the time: a linear
 * load. The rating is the load's at full conduction (the lamps' nameplate); firing lowers what is
 * drawn.
 *
 * <p>Valid for leading-edge control with two like pulses a cycle, at orders to 50. Exact for R (the
 * closed form to 1e-6 at any angle and distortion) and R-L (an independent integration to 0.1 %);
 * real lamps' resistance falls with temperature when dimmed, and a universal motor's voltage rises
 * with its speed: neither is modelled, expect some percent (common practice, no source).
 */
public final class PhaseDimmer implements LoadModel {
  private static final int ORDERS = Spectrum.HIGHEST_ORDER;
  private static final double[][] RULE = GaussLegendre.rule(220);

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
  public void linearSiemens(double order, double[] y) {
    y[0] = 0;
    y[1] = 0;
  }

  @Override
  public boolean isLinear() {
    return false;
  }

  @Override
  public LoadSolver newSolver() {
    return new Solver();
  }

  /** Workspace of one dimmer's solution. */
  private final class Solver implements LoadSolver {
    /** Steady current of the R-L, peak values over √2. */
    private final double[] pRe = new double[ORDERS + 1];

    private final double[] pIm = new double[ORDERS + 1];
    private double decay;
    private double fired;
    private double atFiring;

    @Override
    public void solve(PortSpectra emf, double seriesOhm, double seriesHenry, PortSpectra current) {
      double[] eRe = emf.re[0];
      double[] eIm = emf.im[0];
      if (!(Math.hypot(eRe[1], eIm[1]) > 0)) {
        throw new NoSteadyStateException("a dimmer has no voltage to take its firing angle from");
      }
      double r = ohm + seriesOhm;
      double x = 2 * Math.PI * frequencyHz * (henry + seriesHenry);
      decay = x > 0 ? r / x : Double.POSITIVE_INFINITY;
      boolean halfWave = steadyCurrent(eRe, eIm, r, x);
      Arrays.fill(current.re[0], 0);
      Arrays.fill(current.im[0], 0);
      double fundamental = -Math.atan2(eIm[1], eRe[1]);
      double first = Crossing.near(eRe, eIm, fundamental, Spectrum.HIGHEST_ORDER);
      boolean pulsed;
      if (halfWave) {
        pulsed = pulse(first, Math.PI, 1, 2, current);
      } else {
        double second = Crossing.near(eRe, eIm, fundamental + Math.PI, Spectrum.HIGHEST_ORDER);
        pulsed =
            pulse(first, second - first, 1, 1, current)
                && pulse(second, first + 2 * Math.PI - second, -1, 1, current);
      }
      if (!pulsed) {
        System.arraycopy(pRe, 0, current.re[0], 0, ORDERS + 1);
        System.arraycopy(pIm, 0, current.im[0], 0, ORDERS + 1);
      }
    }

    private boolean steadyCurrent(double[] eRe, double[] eIm, double r, double x) {
      boolean halfWave = true;
      for (int h = 1; h <= ORDERS; h++) {
        double square = r * r + h * x * h * x;
        pRe[h] = (eRe[h] * r + eIm[h] * h * x) / square;
        pIm[h] = (eIm[h] * r - eRe[h] * h * x) / square;
        halfWave &= h % 2 == 1 || (eRe[h] == 0 && eIm[h] == 0);
      }
      return halfWave;
    }

    private double current(double at) {
      double p = Crossing.value(pRe, pIm, at);
      return decay == Double.POSITIVE_INFINITY ? p : p - atFiring * Math.exp(-(at - fired) * decay);
    }

    /**
     * Adds one pulse; false where it would last beyond the next firing.
     *
     * @param toNext from this crossing (and so from this firing) to the next
     */
    private boolean pulse(double crossing, double toNext, int sign, int share, PortSpectra into) {
      fired = crossing + firing;
      atFiring = Crossing.value(pRe, pIm, fired);
      double end = extinction(sign, toNext);
      if (Double.isNaN(end)) {
        return false;
      }
      double half = (end - fired) / 2;
      for (int g = 0; g < RULE[0].length; g++) {
        double at = fired + half * (1 + RULE[0][g]);
        // the current is over √2, and √2/2π·∫ gives rms: together 1/π.
        add(at, share * half * RULE[1][g] * current(at) / Math.PI, share, into);
      }
      return true;
    }

    private void add(double at, double weight, int step, PortSpectra into) {
      for (int h = 1; h <= ORDERS; h += step) {
        into.re[0][h] += weight * Math.sin(h * at);
        into.im[0][h] += weight * Math.cos(h * at);
      }
    }

    /** Where the current falls back to zero; NaN where it does not before the next firing. */
    private double extinction(int sign, double toNext) {
      int steps = 720;
      double width = toNext / steps;
      double before = fired;
      for (int n = 1; n <= steps; n++) {
        double at = fired + n * width;
        if (sign * current(at) <= 0) {
          return n == 1 ? fired : bisect(before, at, sign);
        }
        before = at;
      }
      return Double.NaN;
    }

    private double bisect(double low, double high, int sign) {
      double a = low;
      double b = high;
      for (int n = 0; n < 50; n++) {
        double middle = (a + b) / 2;
        if (sign * current(middle) > 0) {
          a = middle;
        } else {
          b = middle;
        }
      }
      return (a + b) / 2;
    }
  }
}
