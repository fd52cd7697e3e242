package fourthwire.metering.capture;

import java.util.List;

/**
 * The fundamental frequency of a capture, found from its samples.
 *
 * <p>First the highest peak of the Hann-windowed Fourier integral within 20 % of nominal, over the
 * first second; then least squares with the frequency among the unknowns (IEEE 1057-2017, the
 * four-parameter sine fit, with orders above the first), over a stretch that doubles until it is
 * the whole record. A record of less than two cycles can't settle it: nominal is taken.
 */
final class Fundamental {
  /** Orders fitted beside the frequency: those left out bias a short record. */
  private static final int ORDERS_SHORT = 50;

  private static final int ORDERS_LONG = 15;
  private static final int SHORT_SAMPLES = 100_000;
  private static final int MOST_STEPS = 40;
  private static final int COARSE = 40;
  private static final double FIRST_STRETCH_S = 1;

  private final double[] timesS;
  private final List<double[]> channels;
  private final double nominalHz;

  /**
   * For these channels taken together, of one unit: voltages, or where there are none, currents.
   */
  Fundamental(double[] timesS, List<double[]> channels, double nominalHz) {
    this.timesS = timesS;
    this.channels = channels;
    this.nominalHz = nominalHz;
  }

  /** Whether the record is long enough to settle the frequency. */
  boolean settled() {
    return spanS(timesS.length) * nominalHz >= 1.95;
  }

  /** Finds it, in hertz. */
  double hertz() {
    if (!settled()) {
      return nominalHz;
    }
    int count = samplesIn(FIRST_STRETCH_S);
    double f = refined(coarse(count), count);
    while (count < timesS.length) {
      count = (int) Math.min(timesS.length, 2L * count);
      f = refined(f, count);
    }
    requireStrong(f);
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

  /** Means of neighbouring samples, some {@value #COARSE} to a cycle, are enough for the search. */
  private double coarse(int count) {
    double span = spanS(count);
    int block = (int) Math.max(1, count / (span * nominalHz * COARSE));
    double[] t = means(timesS, count, block);
    List<double[]> x = channels.stream().map(c -> means(c, count, block)).toList();
    double best = nominalHz;
    double largest = -1;
    for (double f = 0.8 * nominalHz; f <= 1.2 * nominalHz; f += Math.min(0.1 / span, 0.5)) {
      double energy = 0;
      for (double[] channel : x) {
        energy += windowedEnergy(t, channel, f, span);
      }
      if (energy > largest) {
        largest = energy;
        best = f;
      }
    }
    return best;
  }

  private static double[] means(double[] x, int count, int block) {
    double[] means = new double[count / block];
    for (int k = 0; k < means.length; k++) {
      for (int j = 0; j < block; j++) {
        means[k] += x[k * block + j] / block;
      }
    }
    return means;
  }

  private static double windowedEnergy(double[] t, double[] x, double f, double span) {
    double mean = mean(x, x.length);
    double re = 0;
    double im = 0;
    for (int k = 0; k < x.length; k++) {
      if (!Double.isNaN(x[k])) {
        double w = (x[k] - mean) * (1 - Math.cos(2 * Math.PI * t[k] / span));
        re += w * Math.cos(2 * Math.PI * f * t[k]);
        im += w * Math.sin(2 * Math.PI * f * t[k]);
      }
    }
    return re * re + im * im;
  }

  private static double mean(double[] x, int count) {
    double sum = 0;
    int there = 0;
    for (int k = 0; k < count; k++) {
      if (!Double.isNaN(x[k])) {
        sum += x[k];
        there++;
      }
    }
    return there == 0 ? 0 : sum / there;
  }

  /** Gauss-Newton on the frequency, the amplitudes eliminated at every step. */
  private double refined(double start, int count) {
    double f = start;
    double bin = 1 / spanS(count);
    int orders = ordersFor(start, count);
    for (int i = 0; i < MOST_STEPS; i++) {
      double step = step(f, count, orders);
      f += Math.max(-bin / 2, Math.min(bin / 2, step));
      if (Math.abs(f - start) > 2 * bin) {
        break;
      }
      if (Math.abs(step) < 1e-9 * nominalHz) {
        return f;
      }
    }
    throw none();
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
    if (!(square > 0)) {
      throw none();
    }
    return along / square;
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
        "No steady fundamental was found within 20 % of "
            + Math.round(nominalHz)
            + " Hz: check the site's frequency and the capture's sample rate.");
  }
}
