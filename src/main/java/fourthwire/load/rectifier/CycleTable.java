package fourthwire.load.rectifier;

import fourthwire.quantity.Spectrum;

/**
 * One port's electromotive force over a cycle, sampled with its slope at {@value #CELLS} equal
 * cells, as the time-domain rectifier models integrate it.
 *
 * <p>Positions are counted in cells from t = 0; between samples a cubic Hermite polynomial is taken
 * (at order 50 its error is 0.1 % of that order). Workspace of one solver, not thread-safe.
 */
final class CycleTable {
  /** Cells to a cycle: a multiple of 12, so that sixths and halves of a cycle are whole. */
  static final int CELLS = 384;

  private static final int HALF = CELLS / 2;
  private static final double ROOT2 = Math.sqrt(2);
  private static final double[][] SIN = new double[Spectrum.HIGHEST_ORDER + 1][HALF];
  private static final double[][] COS = new double[Spectrum.HIGHEST_ORDER + 1][HALF];

  static {
    for (int h = 1; h <= Spectrum.HIGHEST_ORDER; h++) {
      for (int k = 0; k < HALF; k++) {
        double x = 2 * Math.PI * ((h * k) % CELLS) / CELLS;
        SIN[h][k] = Math.sin(x);
        COS[h][k] = Math.cos(x);
      }
    }
  }

  /** Samples at positions 0 to 2·CELLS, so that a cycle may start anywhere in the first. */
  final double[] value = new double[2 * CELLS + 1];

  /** Slope per cell likewise. */
  final double[] slope = new double[2 * CELLS + 1];

  private final double[] oddValue = new double[HALF];
  private final double[] oddSlope = new double[HALF];
  private final double[] evenValue = new double[HALF];
  private final double[] evenSlope = new double[HALF];

  /** Whether the last fill held odd orders only, so that half cycles mirror each other. */
  boolean halfWave;

  /** Samples rms phasors of the orders 1 to 50. */
  void fill(double[] re, double[] im) {
    halfWave = true;
    clear(oddValue, oddSlope);
    for (int h = 1; h <= Spectrum.HIGHEST_ORDER; h += 2) {
      add(h, re[h], im[h], oddValue, oddSlope);
    }
    clear(evenValue, evenSlope);
    for (int h = 2; h <= Spectrum.HIGHEST_ORDER; h += 2) {
      if (re[h] != 0 || im[h] != 0) {
        halfWave = false;
        add(h, re[h], im[h], evenValue, evenSlope);
      }
    }
    unfold(oddValue, evenValue, value);
    unfold(oddSlope, evenSlope, slope);
  }

  private static void clear(double[] a, double[] b) {
    java.util.Arrays.fill(a, 0);
    java.util.Arrays.fill(b, 0);
  }

  private static void add(int h, double re, double im, double[] value, double[] slope) {
    if (re == 0 && im == 0) {
      return;
    }
    double a = ROOT2 * re;
    double b = ROOT2 * im;
    double w = 2 * Math.PI * h / CELLS;
    double aw = a * w;
    double bw = b * w;
    double[] sin = SIN[h];
    double[] cos = COS[h];
    for (int k = 0; k < HALF; k++) {
      value[k] += a * sin[k] + b * cos[k];
      slope[k] += aw * cos[k] - bw * sin[k];
    }
  }

  private static void unfold(double[] odd, double[] even, double[] whole) {
    for (int k = 0; k < HALF; k++) {
      double first = even[k] + odd[k];
      double second = even[k] - odd[k];
      whole[k] = first;
      whole[k + HALF] = second;
      whole[k + CELLS] = first;
      whole[k + CELLS + HALF] = second;
    }
    whole[2 * CELLS] = whole[0];
  }

  /** The sample at a position between 0 and 2·CELLS. */
  double at(double position) {
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
  double slopeAt(double position) {
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
  double peak() {
    double peak = 0;
    for (int k = 0; k < CELLS; k++) {
      peak = Math.max(peak, Math.abs(value[k]));
    }
    return peak;
  }
}
