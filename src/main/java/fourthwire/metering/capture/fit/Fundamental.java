package fourthwire.metering.capture.fit;

import java.util.List;
import java.util.OptionalDouble;

/**
 * The fundamental frequency of a capture, found from its samples.
 *
 * <p>First roughly ({@link RoughFrequency}); then least squares with the frequency among the
 * unknowns (IEEE 1057-2017, the four-parameter sine fit, with orders above the first), over a
 * stretch that doubles until it is the whole record. A record of less than two cycles can't settle
 * it: nominal is taken. One so unsteady that the fit does not settle keeps the rough frequency.
 */
public final class Fundamental {
  /** Orders fitted beside the frequency: those left out bias a short record. */
  private static final int ORDERS_SHORT = 50;

  private static final int ORDERS_LONG = 15;
  private static final int SHORT_SAMPLES = 100_000;
  private static final int MOST_STEPS = 40;
  private static final double FIRST_STRETCH_S = 1;

  private final double[] timesS;
  private final List<double[]> channels;
  private final double nominalHz;
  private boolean steady = true;

  /**
   * For these channels taken together, of one unit: voltages, or where there are none, currents.
   */
  public Fundamental(double[] timesS, List<double[]> channels, double nominalHz) {
    this.timesS = timesS;
    this.channels = channels;
    this.nominalHz = nominalHz;
  }

  /** Whether the record is long enough to settle the frequency. */
  public boolean settled() {
    return spanS(timesS.length) * nominalHz >= 1.95;
  }

  /**
   * Finds it, in hertz.
   *
   * @throws NoFundamentalException where hardly anything stands at any frequency looked at
   */
  public double hertz() {
    if (!settled()) {
      return nominalHz;
    }
    double rough = RoughFrequency.hertz(timesS, channels);
    OptionalDouble fine = fine(rough);
    steady = fine.isPresent();
    double f = fine.orElse(rough);
    requireStrong(f);
    return f;
  }

  /** Whether the fit settled: else the rough frequency was kept. */
  public boolean isSteady() {
    return steady;
  }

  private OptionalDouble fine(double rough) {
    int count = samplesIn(FIRST_STRETCH_S);
    OptionalDouble f = refined(rough, count);
    while (f.isPresent() && count < timesS.length) {
      count = (int) Math.min(timesS.length, 2L * count);
      f = refined(f.getAsDouble(), count);
    }
    return f;
  }

  private double spanS(int count) {
    return count * timesS[count - 1] / (count - 1);
  }

  private int samplesIn(double seconds) {
    int count = timesS.length;
    while (count > 2 && spanS(count) > seconds && spanS(count / 2) * nominalHz > 4) {
      count /= 2;
    }
    return count;
  }

  /** Gauss-Newton on the frequency, the amplitudes eliminated at every step. */
  private OptionalDouble refined(double start, int count) {
    double f = start;
    double bin = 1 / spanS(count);
    int orders = ordersFor(start, count);
    for (int i = 0; i < MOST_STEPS; i++) {
      double step = step(f, count, orders);
      if (Double.isNaN(step)) {
        break;
      }
      f += Math.max(-bin / 2, Math.min(bin / 2, step));
      if (Math.abs(f - start) > 2 * bin) {
        break;
      }
      if (Math.abs(step) < 1e-9 * nominalHz) {
        return OptionalDouble.of(f);
      }
    }
    return OptionalDouble.empty();
  }

  private int ordersFor(double f, int count) {
    int most = count <= SHORT_SAMPLES ? ORDERS_SHORT : ORDERS_LONG;
    double nyquist = 0.5 / (spanS(count) / count);
    return Math.max(1, Math.min(most, (int) Math.ceil(nyquist / f - 0.5) - 1));
  }

  /**
   * The frequency's own column is d = Σ h·t·√2·(re·cos - im·sin)·2π; what the orders explain of it
   * is taken out by a fit, and the residual of the samples is projected on the rest.
   */
  private double step(double f, int count, int orders) {
    double along = 0;
    double square = 0;
    for (double[] x : channels) {
      HarmonicFit fit = HarmonicFit.of(timesS, x, count, f, orders);
      double[] d = slope(fit, f, count, x);
      double[] own = HarmonicFit.of(timesS, d, count, f, orders).residual();
      for (int k = 0; k < count; k++) {
        if (!Double.isNaN(own[k])) {
          along += own[k] * fit.residual()[k];
          square += own[k] * own[k];
        }
      }
    }
    return square > 0 ? along / square : Double.NaN;
  }

  private double[] slope(HarmonicFit fit, double f, int count, double[] x) {
    double[] d = new double[count];
    double middle = timesS[count - 1] / 2;
    for (int k = 0; k < count; k++) {
      double sum = Double.isNaN(x[k]) ? Double.NaN : 0;
      for (int h = 1; h <= fit.orders(); h++) {
        double angle = 2 * Math.PI * h * f * timesS[k];
        sum += h * (fit.at(h).re() * Math.cos(angle) - fit.at(h).im() * Math.sin(angle));
      }
      d[k] = 2 * Math.PI * Math.sqrt(2) * (timesS[k] - middle) * sum;
    }
    return d;
  }

  /** Less than a tenth of the alternating energy in the fundamental is none that can be trusted. */
  private void requireStrong(double f) {
    double fundamental = 0;
    double all = 0;
    for (double[] x : channels) {
      HarmonicFit fit = HarmonicFit.of(timesS, x, timesS.length, f, 1);
      fundamental += Math.pow(fit.at(1).magnitude(), 2);
      all += Math.pow(fit.alternatingRms(), 2);
    }
    if (!(fundamental > 0.1 * all)) {
      throw none();
    }
  }

  private NoFundamentalException none() {
    return new NoFundamentalException(
        "No fundamental was found between 40 and 72 Hz: check the capture's sample rate.");
  }
}
