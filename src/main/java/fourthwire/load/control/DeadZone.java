package fourthwire.load.control;

import fourthwire.quantity.Spectrum;

/**
 * The stretch around a zero crossing in which a power-factor-corrected supply draws nothing, as a
 * linear map of spectra: the part of a voltage that lies inside the stretch.
 *
 * <p>With the crossing at 0 and δ to both sides, sines map to sines and cosines to cosines, order n
 * to order h by (q(h - n) ∓ q(h + n))/π, q(k) = sin(kδ)/k, q(0) = δ: the integrals of the products
 * in closed form. Immutable.
 */
final class DeadZone {
  private static final int ORDERS = Spectrum.HIGHEST_ORDER;

  /** q(k)/π. */
  private final double[] share = new double[2 * ORDERS + 1];

  /** The zone that reaches this many radians to both sides of a crossing. */
  DeadZone(double halfWidth) {
    share[0] = halfWidth / Math.PI;
    for (int k = 1; k < share.length; k++) {
      share[k] = Math.sin(k * halfWidth) / (k * Math.PI);
    }
  }

  /** Mean over the cycle of the inside part of such a voltage, volts. */
  double mean(double[] vIm) {
    double sum = 0;
    for (int n = 1; n <= ORDERS; n++) {
      sum += share[n] * vIm[n];
    }
    return Math.sqrt(2) * sum;
  }

  /**
   * Adds the inside part of a voltage whose crossing lies at t = 0.
   *
   * @param vRe rms phasors of the voltage, turned so that the crossing is at 0
   * @param step 1, or 2 where only odd orders count
   * @param zones 1, or 2 where the zone stands for both of a half-wave symmetric cycle
   */
  void add(double[] vRe, double[] vIm, int step, double zones, double[] re, double[] im) {
    for (int h = 1; h <= ORDERS; h += step) {
      double sines = 0;
      double cosines = 0;
      for (int n = 1; n <= ORDERS; n += step) {
        double near = share[Math.abs(h - n)];
        double far = share[h + n];
        sines += (near - far) * vRe[n];
        cosines += (near + far) * vIm[n];
      }
      re[h] += zones * sines;
      im[h] += zones * cosines;
    }
  }
}
