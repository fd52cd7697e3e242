package fourthwire.load.control;

import fourthwire.quantity.Spectrum;

/**
 * The stretch around a zero crossing in which a power-factor-corrected supply draws nothing, as a
 * linear map of spectra: the part of a voltage that lies inside the stretch.
 *
 * <p>Integrals over the stretch by Gauss-Legendre quadrature with enough points for products of two
 * waves of order 50. Immutable.
 */
final class DeadZone {
  private static final int ORDERS = Spectrum.HIGHEST_ORDER;

  private final double[] weight;
  private final double[][] sin;
  private final double[][] cos;

  /** The zone that reaches this many radians to both sides of a crossing. */
  DeadZone(double halfWidth) {
    int points = 10 + (int) Math.ceil(2 * ORDERS * halfWidth);
    double[][] rule = GaussLegendre.rule(points);
    weight = new double[points];
    sin = new double[points][ORDERS + 1];
    cos = new double[points][ORDERS + 1];
    for (int p = 0; p < points; p++) {
      weight[p] = halfWidth * rule[1][p];
      for (int h = 1; h <= ORDERS; h++) {
        sin[p][h] = Math.sin(h * halfWidth * rule[0][p]);
        cos[p][h] = Math.cos(h * halfWidth * rule[0][p]);
      }
    }
  }

  /**
   * Adds the inside part of a voltage whose crossing lies at t = 0.
   *
   * @param vRe rms phasors of the voltage, turned so that the crossing is at 0
   * @param step 1, or 2 where only odd orders count
   * @param share 1, or 2 where the zone stands for both of a half-wave symmetric cycle
   */
  void add(double[] vRe, double[] vIm, int step, double share, double[] re, double[] im) {
    for (int p = 0; p < weight.length; p++) {
      double[] s = sin[p];
      double[] c = cos[p];
      double v = 0;
      for (int h = 1; h <= ORDERS; h += step) {
        v += vRe[h] * s[h] + vIm[h] * c[h];
      }
      // v is over √2, and √2/2π·∫ gives rms: together 1/π.
      double w = share * v * weight[p] / Math.PI;
      for (int h = 1; h <= ORDERS; h += step) {
        re[h] += w * s[h];
        im[h] += w * c[h];
      }
    }
  }
}
