package fourthwire.load.rectifier.path;

import fourthwire.quantity.Spectrum;

/**
 * Fourier integrals of a function that is given piece by piece, each piece within one of the panels
 * of {@value #WIDTH} cells ({@link CycleTable}) that make up the cycle.
 *
 * <p>Around the middle c of a panel, e^(-jhω(c + x)) = e^(-jhωc)·Σ (-jhωx)^n/n!: the pieces leave
 * the moments ∫ i·x^n dx, n = 0 to 7, and all orders take them at once. As |hωx| ≤ 0.82 at order
 * 50, what is left out is under 1e-5 of a piece's part. Each piece is a cubic polynomial, taken at
 * the three points of the Gauss-Legendre rule. Workspace of one thread.
 */
final class FourierSum {
  /** Cells in a panel. */
  static final int WIDTH = 2;

  private static final int PANELS = CycleTable.CELLS / WIDTH;
  private static final double GAUSS_X = Math.sqrt(0.15);
  private static final double GAUSS_SIDE = 5.0 / 18;
  private static final double GAUSS_MIDDLE = 8.0 / 18;

  private static final int ORDERS = Spectrum.HIGHEST_ORDER;
  private static final int ODD_ORDERS = (ORDERS + 1) / 2;

  /** Sines and cosines at the middle of each panel, odd orders first. */
  private static final double[][] SIN = new double[PANELS][ORDERS];

  private static final double[][] COS = new double[PANELS][ORDERS];

  /** (hω)^n/n!, by order in the same sequence. */
  private static final double[][] POWER = new double[8][ORDERS];

  static {
    for (int q = 0; q < ORDERS; q++) {
      double turn = 2 * Math.PI / CycleTable.CELLS * order(q);
      for (int k = 0; k < PANELS; k++) {
        SIN[k][q] = Math.sin(turn * WIDTH * (k + 0.5));
        COS[k][q] = Math.cos(turn * WIDTH * (k + 0.5));
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
  private int panel;
  private double m0;
  private double m1;
  private double m2;
  private double m3;
  private double m4;
  private double m5;
  private double m6;
  private double m7;

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

  private void open(int next) {
    panel = next;
    m0 = m1 = m2 = m3 = m4 = m5 = m6 = m7 = 0;
  }

  /**
   * Adds a polynomial c0 + c1·y + c2·y² + c3·y³ of y = (position - origin)·perCell from one
   * position to another. Pieces come in the order of time.
   */
  void add(
      double from,
      double to,
      double origin,
      double perCell,
      double c0,
      double c1,
      double c2,
      double c3) {
    double left = from;
    while (left < to) {
      int here = (int) left / WIDTH;
      double right = Math.min(WIDTH * (here + 1.0), to);
      if (here != panel) {
        close();
        open(here);
      }
      double width = right - left;
      double middle = 0.5 * (left + right);
      double y = (middle - origin) * perCell;
      double side = GAUSS_X * width * perCell;
      double z = y + side;
      double w = y - side;
      addPoints(
          middle - WIDTH * (here + 0.5),
          GAUSS_X * width,
          width * GAUSS_MIDDLE * (c0 + y * (c1 + y * (c2 + y * c3))),
          width * GAUSS_SIDE * (c0 + w * (c1 + w * (c2 + w * c3))),
          width * GAUSS_SIDE * (c0 + z * (c1 + z * (c2 + z * c3))));
      left = right;
    }
  }

  /** Weighted values at a place from the panel's middle and at equal distances from it. */
  private void addPoints(double x, double distance, double middle, double before, double after) {
    double a = x - distance;
    double b = x + distance;
    double p = before;
    double q = middle;
    double r = after;
    m0 += p + q + r;
    m1 += (p *= a) + (q *= x) + (r *= b);
    m2 += (p *= a) + (q *= x) + (r *= b);
    m3 += (p *= a) + (q *= x) + (r *= b);
    m4 += (p *= a) + (q *= x) + (r *= b);
    m5 += (p *= a) + (q *= x) + (r *= b);
    m6 += (p *= a) + (q *= x) + (r *= b);
    m7 += p * a + q * x + r * b;
  }

  /** Takes the open panel's moments into every order. */
  private void close() {
    double[] sin = SIN[panel % PANELS];
    double[] cos = COS[panel % PANELS];
    for (int q = 0; q < count; q++) {
      double even = m0 - m2 * POWER[2][q] + m4 * POWER[4][q] - m6 * POWER[6][q];
      double odd = m1 * POWER[1][q] - m3 * POWER[3][q] + m5 * POWER[5][q] - m7 * POWER[7][q];
      sines[q] += sin[q] * even + cos[q] * odd;
      cosines[q] += cos[q] * even - sin[q] * odd;
    }
  }

  /** Ends the sum: writes it times a factor, by order; zero where an order was not asked for. */
  void write(double factor, double[] re, double[] im) {
    close();
    for (int q = 0; q < ORDERS; q++) {
      re[order(q)] = q < count ? factor * sines[q] : 0;
      im[order(q)] = q < count ? factor * cosines[q] : 0;
    }
  }
}
