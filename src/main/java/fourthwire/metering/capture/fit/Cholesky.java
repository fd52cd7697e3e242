package fourthwire.metering.capture.fit;

/** Solution of a symmetric positive definite system by Cholesky's factors. */
final class Cholesky {
  private Cholesky() {}

  /**
   * Solves A·x = b.
   *
   * @param a lower triangle of A; overwritten by its factor
   * @throws NoFundamentalException where A is singular: the samples do not tell the unknowns apart
   */
  static double[] solve(double[][] a, double[] b) {
    factor(a);
    int n = b.length;
    double[] x = b.clone();
    for (int i = 0; i < n; i++) {
      for (int k = 0; k < i; k++) {
        x[i] -= a[i][k] * x[k];
      }
      x[i] /= a[i][i];
    }
    for (int i = n - 1; i >= 0; i--) {
      for (int k = i + 1; k < n; k++) {
        x[i] -= a[k][i] * x[k];
      }
      x[i] /= a[i][i];
    }
    return x;
  }

  private static void factor(double[][] a) {
    double largest = 0;
    for (int i = 0; i < a.length; i++) {
      largest = Math.max(largest, a[i][i]);
    }
    for (int j = 0; j < a.length; j++) {
      for (int i = j; i < a.length; i++) {
        double sum = a[i][j];
        for (int k = 0; k < j; k++) {
          sum -= a[i][k] * a[j][k];
        }
        if (i == j && !(sum > 1e-9 * largest)) {
          throw new NoFundamentalException(
              "The samples do not tell the orders apart: too few, or too many were not recorded.");
        }
        a[i][j] = i == j ? Math.sqrt(sum) : sum / a[j][j];
      }
    }
  }
}
