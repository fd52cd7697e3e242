package fourthwire.load.rectifier.path;

import fourthwire.quantity.Spectrum;

/**
 * One port's electromotive force over a cycle, sampled with its slope at {@value #CELLS} equal
 * cells, as the time-domain rectifier models integrate it.
 *
 * <p>Positions are counted in cells from t = 0; between samples a cubic Hermite polynomial is taken
 * (at order 50 its error is 0.1 % of that order). Workspace of one solver, not thread-safe.
 */
public final class CycleTable {
  /** Cells to a cycle: a multiple of 12, so that sixths and halves of a cycle are whole. */
  public static final int CELLS = 384;

  private static final int HALF = CELLS / 2;
  private static final int QUARTER = CELLS / 4;
  private static final double ROOT2 = Math.sqrt(2);

  /** Sines and cosines of each order at the nodes of a quarter cycle: symmetry tells the rest. */
  private static final double[][] SIN = new double[Spectrum.HIGHEST_ORDER + 1][QUARTER + 1];

  private static final double[][] COS = new double[Spectrum.HIGHEST_ORDER + 1][QUARTER + 1];

  static {
    for (int h = 1; h <= Spectrum.HIGHEST_ORDER; h++) {
      for (int k = 0; k <= QUARTER; k++) {
        double x = 2 * Math.PI * ((h * k) % CELLS) / CELLS;
        SIN[h][k] = Math.sin(x);
        COS[h][k] = Math.cos(x);
      }
    }
  }

  /** Samples at positions 0 to 2·CELLS, so that a cycle may start anywhere in the first. */
  public final double[] value = new double[2 * CELLS + 1];

  /** Slope per cell likewise. */
  public final double[] slope = new double[2 * CELLS + 1];

  /** Sine and cosine parts of value and slope over a quarter cycle, one parity at a time. */
  private final double[] sines = new double[QUARTER + 1];

  private final double[] cosines = new double[QUARTER + 1];
  private final double[] sineSlopes = new double[QUARTER + 1];
  private final double[] cosineSlopes = new double[QUARTER + 1];

  /** Whether the last fill held odd orders only, so that half cycles mirror each other. */
  public boolean halfWave;

  /** Samples rms phasors of the orders 1 to 50. */
  public void fill(double[] re, double[] im) {
    addOrders(1, re, im);
    for (int k = 0; k <= QUARTER; k++) {
      value[k] = sines[k] + cosines[k];
      value[HALF - k] = sines[k] - cosines[k];
      slope[k] = sineSlopes[k] + cosineSlopes[k];
      slope[HALF - k] = cosineSlopes[k] - sineSlopes[k];
    }
    for (int k = 0; k < HALF; k++) {
      value[k + HALF] = -value[k];
      slope[k + HALF] = -slope[k];
    }
    halfWave = !addOrders(2, re, im);
    if (!halfWave) {
      addEven(0);
      addEven(HALF);
    }
    System.arraycopy(value, 0, value, CELLS, CELLS);
    System.arraycopy(slope, 0, slope, CELLS, CELLS);
    value[2 * CELLS] = value[0];
    slope[2 * CELLS] = slope[0];
  }

  /** Adds up the odd or the even orders over a quarter cycle; whether there are any. */
  private boolean addOrders(int first, double[] re, double[] im) {
    java.util.Arrays.fill(sines, 0);
    java.util.Arrays.fill(cosines, 0);
    java.util.Arrays.fill(sineSlopes, 0);
    java.util.Arrays.fill(cosineSlopes, 0);
    boolean any = false;
    for (int h = first; h <= Spectrum.HIGHEST_ORDER; h += 2) {
      if (re[h] != 0 || im[h] != 0) {
        any = true;
        add(SIN[h], COS[h], 2 * Math.PI * h / CELLS, ROOT2 * re[h], ROOT2 * im[h]);
      }
    }
    return any;
  }

  private void add(double[] sin, double[] cos, double turn, double a, double b) {
    double slopeA = turn * a;
    double slopeB = -turn * b;
    for (int k = 0; k <= QUARTER; k++) {
      sines[k] += a * sin[k];
      cosines[k] += b * cos[k];
      sineSlopes[k] += slopeA * cos[k];
      cosineSlopes[k] += slopeB * sin[k];
    }
  }

  /** Adds the even orders, which repeat after half a cycle, to the half that starts at a node. */
  private void addEven(int start) {
    for (int k = 0; k < QUARTER; k++) {
      value[start + k] += sines[k] + cosines[k];
      slope[start + k] += sineSlopes[k] + cosineSlopes[k];
    }
    for (int k = 1; k <= QUARTER; k++) {
      value[start + HALF - k] += cosines[k] - sines[k];
      slope[start + HALF - k] += sineSlopes[k] - cosineSlopes[k];
    }
  }

  /** The sample at a position between 0 and 2·CELLS. */
  public double at(double position) {
    int k = (int) position;
    double x = position - k;
    if (x == 0) {
      return value[k];
    }
    double y = 1 - x;
    return y * y * ((1 + 2 * x) * value[k] + x * slope[k])
        + x * x * ((1 + 2 * y) * value[k + 1] - y * slope[k + 1]);
  }

  /** Slope per cell at a position between 0 and 2·CELLS. */
  public double slopeAt(double position) {
    int k = (int) position;
    double x = position - k;
    if (x == 0) {
      return slope[k];
    }
    double y = 1 - x;
    return 6 * x * y * (value[k + 1] - value[k])
        + y * (1 - 3 * x) * slope[k]
        + x * (1 - 3 * y) * slope[k + 1];
  }

  /** Largest absolute sample. */
  public double peak() {
    double peak = 0;
    for (int k = 0; k < (halfWave ? HALF : CELLS); k++) {
      double size = Math.abs(value[k]);
      if (size > peak || Double.isNaN(size)) {
        peak = size;
      }
    }
    return peak;
  }
}
