package fourthwire.network;

/**
 * Small dense complex matrices inside flat arrays: row by row, real and imaginary part side by
 * side. Inner loops of the elimination; no allocation.
 */
final class Blocks {
  private Blocks() {}

  /**
   * Solves M·X = B in place by Gaussian elimination with partial pivoting: M is destroyed, B
   * becomes X.
   *
   * @param m size × size, from index 0
   * @param b size × columns, from offset
   * @return false if M is singular or holds what is no number
   */
  static boolean solve(double[] m, int size, double[] b, int offset, int columns) {
    for (int k = 0; k < size; k++) {
      int pivot = pivotRow(m, size, k);
      if (pivot < 0) {
        return false;
      }
      if (pivot != k) {
        swapRows(m, 0, size, k, pivot);
        swapRows(b, offset, columns, k, pivot);
      }
      int diagonal = 2 * (k * size + k);
      double re = m[diagonal];
      double im = m[diagonal + 1];
      double square = re * re + im * im;
      scaleRow(m, 2 * k * size, k + 1, size, re / square, -im / square);
      scaleRow(b, offset + 2 * k * columns, 0, columns, re / square, -im / square);
      for (int row = k + 1; row < size; row++) {
        eliminate(m, size, row, k, b, offset, columns);
      }
    }
    for (int k = size - 1; k > 0; k--) {
      for (int row = 0; row < k; row++) {
        int at = 2 * (row * size + k);
        subtractRow(
            b, offset + 2 * row * columns, offset + 2 * k * columns, 0, columns, m[at], m[at + 1]);
      }
    }
    return true;
  }

  private static void eliminate(
      double[] m, int size, int row, int k, double[] b, int offset, int columns) {
    int at = 2 * (row * size + k);
    double re = m[at];
    double im = m[at + 1];
    if (re != 0 || im != 0) {
      subtractRow(m, 2 * row * size, 2 * k * size, k + 1, size, re, im);
      subtractRow(b, offset + 2 * row * columns, offset + 2 * k * columns, 0, columns, re, im);
    }
  }

  private static int pivotRow(double[] m, int size, int k) {
    int best = -1;
    double largest = 0;
    for (int row = k; row < size; row++) {
      int at = 2 * (row * size + k);
      double square = m[at] * m[at] + m[at + 1] * m[at + 1];
      if (!(square <= Double.MAX_VALUE)) {
        return -1;
      }
      if (square > largest) {
        largest = square;
        best = row;
      }
    }
    return best;
  }

  private static void swapRows(double[] m, int offset, int columns, int row, int other) {
    int a = offset + 2 * row * columns;
    int b = offset + 2 * other * columns;
    for (int k = 0; k < 2 * columns; k++) {
      double kept = m[a + k];
      m[a + k] = m[b + k];
      m[b + k] = kept;
    }
  }

  private static void scaleRow(double[] m, int start, int from, int to, double re, double im) {
    for (int at = start + 2 * from; at < start + 2 * to; at += 2) {
      double x = m[at];
      double y = m[at + 1];
      m[at] = x * re - y * im;
      m[at + 1] = x * im + y * re;
    }
  }

  /** Row at target minus (re, im) times row at source, columns from to to. */
  private static void subtractRow(
      double[] m, int target, int source, int from, int to, double re, double im) {
    for (int k = 2 * from; k < 2 * to; k += 2) {
      double x = m[source + k];
      double y = m[source + k + 1];
      m[target + k] -= x * re - y * im;
      m[target + k + 1] -= x * im + y * re;
    }
  }

  /** result = sign·M·x + result, M size × size at offset; x and result from their own offsets. */
  static void addProduct(
      double sign, double[] m, int offset, int size, double[] x, int xAt, double[] y, int yAt) {
    int at = offset;
    for (int row = 0; row < size; row++) {
      double re = 0;
      double im = 0;
      for (int k = xAt; k < xAt + 2 * size; k += 2) {
        re += m[at] * x[k] - m[at + 1] * x[k + 1];
        im += m[at] * x[k + 1] + m[at + 1] * x[k];
        at += 2;
      }
      y[yAt + 2 * row] += sign * re;
      y[yAt + 2 * row + 1] += sign * im;
    }
  }

  /** The product A·B of two square matrices, from their offsets, as a new matrix. */
  static double[] product(double[] a, int aAt, double[] b, int bAt, int size) {
    double[] c = new double[2 * size * size];
    for (int row = 0; row < size; row++) {
      for (int k = 0; k < size; k++) {
        int at = aAt + 2 * (row * size + k);
        subtractRowOf(b, bAt + 2 * k * size, c, 2 * row * size, size, -a[at], -a[at + 1]);
      }
    }
    return c;
  }

  private static void subtractRowOf(
      double[] from, int source, double[] m, int target, int columns, double re, double im) {
    for (int k = 0; k < 2 * columns; k += 2) {
      double x = from[source + k];
      double y = from[source + k + 1];
      m[target + k] -= x * re - y * im;
      m[target + k + 1] -= x * im + y * re;
    }
  }

  /** 1 - M, in place. */
  static void subtractFromIdentity(double[] m, int size) {
    for (int k = 0; k < 2 * size * size; k++) {
      m[k] = -m[k];
    }
    for (int k = 0; k < size; k++) {
      m[2 * k * (size + 1)] += 1;
    }
  }

  /** Whether so many values from the offset are all numbers. */
  static boolean isFinite(double[] m, int offset, int length) {
    for (int k = offset; k < offset + length; k++) {
      if (!Double.isFinite(m[k])) {
        return false;
      }
    }
    return true;
  }
}
