package fourthwire.load.rectifier.path;

import fourthwire.quantity.Spectrum;

/**
 * Fourier integrals of a function that is given piece by piece, each piece within one cell of
 * {@link CycleTable}.
 *
 * <p>Inside cell k, e^(-jhω(k + ½ + x)) = e^(-jhω(k + ½))·Σ (-jhωx)^n/n!: the pieces leave the
 * moments ∫ i·x^n dx, n = 0 to 5, and all orders take them at once. As |hωx| ≤ 0.41 at order 50,
 * what is left out is under 1e-5 of a piece's part. Workspace of one thread.
 */
final class FourierSum {
  private static final int ORDERS = Spectrum.HIGHEST_ORDER;
  private static final int ODD_ORDERS = (ORDERS + 1) / 2;

  /** Sines and cosines at the middle of each cell, odd orders first. */
  private static final double[][] SIN = new double[CycleTable.CELLS][ORDERS];

  private static final double[][] COS = new double[CycleTable.CELLS][ORDERS];

  /** (hω)^n/n!, by order in the same sequence. */
  private static final double[][] POWER = new double[6][ORDERS];

  static {
    for (int q = 0; q < ORDERS; q++) {
      double turn = 2 * Math.PI / CycleTable.CELLS * order(q);
      for (int k = 0; k < CycleTable.CELLS; k++) {
        SIN[k][q] = Math.sin(turn * (k + 0.5));
        COS[k][q] = Math.cos(turn * (k + 0.5));
      }
      POWER[0][q] = 1;
      for (int n = 1; n < POWER.length; n++) {
        POWER[n][q] = POWER[n - 1][q] * turn / n;
      }
    }
  }

  private final double[] sines = new double[ORDERS];
  private final double[] cosines = new double[ORDERS];

  private int count;
  private int cell;
  private double m0;
  private double m1;
  private double m2;
  private double m3;
  private double m4;
  private double m5;

  private static int order(int q) {
    return q < ODD_ORDERS ? 2 * q + 1 : 2 * (q - ODD_ORDERS + 1);
  }

  /** Starts a sum over the odd orders, or over all. */
  void clear(boolean oddOnly) {
    count = oddOnly ? ODD_ORDERS : ORDERS;
    java.util.Arrays.fill(sines, 0);
    java.util.Arrays.fill(cosines, 0);
    open(0);
  }

  /** Following points lie in this cell. */
  void open(int next) {
    cell = next;
    m0 = m1 = m2 = m3 = m4 = m5 = 0;
  }

  /** The cell that is open. */
  int cell() {
    return cell;
  }

  /** Adds a point of a quadrature in the open cell. */
  void add(double position, double weight) {
    double x = position - (cell + 0.5);
    double w = weight;
    m0 += w;
    w *= x;
    m1 += w;
    w *= x;
    m2 += w;
    w *= x;
    m3 += w;
    w *= x;
    m4 += w;
    w *= x;
    m5 += w;
  }

  /** Takes the open cell's moments into every order. */
  void close() {
    double[] sin = SIN[cell % CycleTable.CELLS];
    double[] cos = COS[cell % CycleTable.CELLS];
    for (int q = 0; q < count; q++) {
      double even = m0 - m2 * POWER[2][q] + m4 * POWER[4][q];
      double odd = m1 * POWER[1][q] - m3 * POWER[3][q] + m5 * POWER[5][q];
      sines[q] += sin[q] * even + cos[q] * odd;
      cosines[q] += cos[q] * even - sin[q] * odd;
    }
  }

  /** Writes the sums times a factor, by order; zero where an order was not asked for. */
  void write(double factor, double[] re, double[] im) {
    for (int q = 0; q < ORDERS; q++) {
      re[order(q)] = q < count ? factor * sines[q] : 0;
      im[order(q)] = q < count ? factor * cosines[q] : 0;
    }
  }
}
