package fourthwire.metering.capture.fit;

import fourthwire.quantity.Phasor;
import fourthwire.quantity.Spectrum;
import java.util.Arrays;

/**
 * Least-squares fit of a direct component and the orders 1 to H of a known fundamental to samples.
 *
 * <p>Over a whole number of cycles of equally spaced samples this is the discrete Fourier
 * transform; elsewhere it is still exact for a signal made of these orders, needs no resampling (so
 * nothing is interpolated or smoothed), and passes over samples that were not recorded. Normal
 * equations (IEEE 1057-2017, the three-parameter sine fit, with more orders): their matrix is made
 * of the sums Σcos(mωt) and Σsin(mωt), m to 2H.
 */
public final class HarmonicFit {
  private static final double ROOT2 = Math.sqrt(2);

  private final double direct;
  private final double[] re;
  private final double[] im;
  private final double[] residual;
  private final double peak;

  private HarmonicFit(double direct, double[] re, double[] im, double[] residual, double peak) {
    this.direct = direct;
    this.re = re;
    this.im = im;
    this.residual = residual;
    this.peak = peak;
  }

  /**
   * Fits.
   *
   * @param timesS times of the samples, seconds
   * @param samples values at these times; NaN is passed over
   * @param count how many of them, from the first
   * @param frequencyHz the fundamental
   * @param orders highest order H; the samples that are there must outnumber 2H + 1 and resolve H
   */
  public static HarmonicFit of(
      double[] timesS, double[] samples, int count, double frequencyHz, int orders) {
    double[] cosSums = new double[2 * orders + 1];
    double[] sinSums = new double[2 * orders + 1];
    double[] right = new double[2 * orders + 1];
    double omega = 2 * Math.PI * frequencyHz;
    for (int k = 0; k < count; k++) {
      double x = samples[k];
      if (!Double.isNaN(x)) {
        add(cosSums, sinSums, right, omega * timesS[k], x, orders);
      }
    }
    double[] solution = Cholesky.solve(matrix(cosSums, sinSums, orders), right);
    double[] re = new double[orders + 1];
    double[] im = new double[orders + 1];
    for (int h = 1; h <= orders; h++) {
      re[h] = solution[2 * h - 1];
      im[h] = solution[2 * h];
    }
    double[] residual = Arrays.copyOf(samples, count);
    double peak = 0;
    for (double x : residual) {
      peak = Math.max(peak, Double.isNaN(x) ? 0 : Math.abs(x - solution[0]));
    }
    subtract(residual, timesS, omega, solution[0], re, im);
    return new HarmonicFit(solution[0], re, im, residual, peak);
  }

  /** One sample's part of the sums; cos and sin of all multiples by one complex recurrence. */
  private static void add(
      double[] cosSums, double[] sinSums, double[] right, double angle, double x, int orders) {
    double c1 = Math.cos(angle);
    double s1 = Math.sin(angle);
    double c = 1;
    double s = 0;
    cosSums[0]++;
    right[0] += x;
    for (int m = 1; m < cosSums.length; m++) {
      double next = c * c1 - s * s1;
      s = s * c1 + c * s1;
      c = next;
      cosSums[m] += c;
      sinSums[m] += s;
      if (m <= orders) {
        right[2 * m - 1] += ROOT2 * s * x;
        right[2 * m] += ROOT2 * c * x;
      }
    }
  }

  /** Inner products of 1, √2·sin(hωt), √2·cos(hωt) from the sums. */
  private static double[][] matrix(double[] c, double[] s, int orders) {
    double[][] a = new double[2 * orders + 1][2 * orders + 1];
    a[0][0] = c[0];
    for (int h = 1; h <= orders; h++) {
      a[2 * h - 1][0] = ROOT2 * s[h];
      a[2 * h][0] = ROOT2 * c[h];
      for (int k = 1; k <= h; k++) {
        a[2 * h - 1][2 * k - 1] = c[h - k] - c[h + k];
        a[2 * h][2 * k] = c[h - k] + c[h + k];
        a[2 * h][2 * k - 1] = s[h + k] - s[h - k];
        if (2 * k < 2 * h - 1) {
          a[2 * h - 1][2 * k] = s[h + k] + s[h - k];
        }
      }
    }
    return a;
  }

  private static void subtract(
      double[] x, double[] timesS, double omega, double direct, double[] re, double[] im) {
    for (int k = 0; k < x.length; k++) {
      double c1 = Math.cos(omega * timesS[k]);
      double s1 = Math.sin(omega * timesS[k]);
      double c = 1;
      double s = 0;
      double sum = 0;
      for (int h = 1; h < re.length; h++) {
        double next = c * c1 - s * s1;
        s = s * c1 + c * s1;
        c = next;
        sum += re[h] * s + im[h] * c;
      }
      x[k] -= direct + ROOT2 * sum;
    }
  }

  /** The direct component. */
  public double direct() {
    return direct;
  }

  /** Largest absolute sample, the direct component taken off. */
  public double peak() {
    return peak;
  }

  /** Highest order fitted. */
  public int orders() {
    return re.length - 1;
  }

  /** Rms phasor of an order, t = 0 at time 0; zero above the highest fitted. */
  public Phasor at(int order) {
    return order < re.length ? new Phasor(re[order], im[order]) : Phasor.ZERO;
  }

  /** Orders 1 to 50, t = 0 where the fundamental of this angle at time 0 crosses zero upwards. */
  public Spectrum spectrum(double referenceDegrees) {
    return Spectrum.of(h -> at(h).turned(-h * referenceDegrees));
  }

  /** What is left of the samples: other frequencies, noise; NaN where none was recorded. Shared. */
  public double[] residual() {
    return residual;
  }

  /** Rms without the direct component: the fitted orders and everything that is left. */
  public double alternatingRms() {
    double square = meanProduct(this);
    for (int h = 1; h < re.length; h++) {
      square += re[h] * re[h] + im[h] * im[h];
    }
    return Math.sqrt(square);
  }

  /** Mean product with another quantity of the same instants, direct components left out. */
  public double activePower(HarmonicFit other) {
    double power = meanProduct(other);
    for (int h = 1; h < Math.min(re.length, other.re.length); h++) {
      power += re[h] * other.re[h] + im[h] * other.im[h];
    }
    return power;
  }

  private double meanProduct(HarmonicFit other) {
    double sum = 0;
    int count = 0;
    for (int k = 0; k < residual.length; k++) {
      double product = residual[k] * other.residual[k];
      if (!Double.isNaN(product)) {
        sum += product;
        count++;
      }
    }
    return count == 0 ? 0 : sum / count;
  }
}
