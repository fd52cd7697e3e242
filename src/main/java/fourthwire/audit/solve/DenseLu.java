package fourthwire.audit.solve;

/**
 * A small real matrix in triangular factors, with row exchange (Gauss; G. H. Golub and C. F. Van
 * Loan, "Matrix Computations", 3.4). A matrix without an inverse leaves figures that are not
 * finite.
 */
final class DenseLu {
  private final double[][] rows;
  private final int[] from;

  /**
   * Factors a matrix.
   *
   * @param rows the matrix, which the factors take the place of
   */
  DenseLu(double[][] rows) {
    this.rows = rows;
    this.from = new int[rows.length];
    for (int k = 0; k < rows.length; k++) {
      from[k] = exchange(k);
      double[] pivot = rows[k];
      for (int i = k + 1; i < rows.length; i++) {
        double factor = rows[i][k] / pivot[k];
        rows[i][k] = factor;
        subtract(factor, pivot, rows[i], k + 1);
      }
    }
  }

  private int exchange(int k) {
    int best = k;
    for (int i = k + 1; i < rows.length; i++) {
      best = Math.abs(rows[i][k]) > Math.abs(rows[best][k]) ? i : best;
    }
    double[] pivot = rows[best];
    rows[best] = rows[k];
    rows[k] = pivot;
    return best;
  }

  /** Row by row: right sides become solutions. */
  void solve(double[][] sides) {
    for (int k = 0; k < rows.length; k++) {
      double[] side = sides[from[k]];
      sides[from[k]] = sides[k];
      sides[k] = side;
    }
    for (int i = 0; i < rows.length; i++) {
      for (int k = 0; k < i; k++) {
        subtract(rows[i][k], sides[k], sides[i], 0);
      }
    }
    for (int i = rows.length - 1; i >= 0; i--) {
      for (int k = i + 1; k < rows.length; k++) {
        subtract(rows[i][k], sides[k], sides[i], 0);
      }
      for (int column = 0; column < sides[i].length; column++) {
        sides[i][column] /= rows[i][i];
      }
    }
  }

  /** One right side becomes the solution. */
  void solve(double[] side) {
    for (int k = 0; k < rows.length; k++) {
      double moved = side[from[k]];
      side[from[k]] = side[k];
      side[k] = moved;
    }
    for (int i = 0; i < rows.length; i++) {
      side[i] -= along(rows[i], side, 0, i);
    }
    for (int i = rows.length - 1; i >= 0; i--) {
      side[i] = (side[i] - along(rows[i], side, i + 1, rows.length)) / rows[i][i];
    }
  }

  private static double along(double[] row, double[] side, int from, int to) {
    double sum = 0;
    for (int k = from; k < to; k++) {
      sum += row[k] * side[k];
    }
    return sum;
  }

  private static void subtract(double factor, double[] row, double[] from, int start) {
    for (int column = start; column < from.length; column++) {
      from[column] -= factor * row[column];
    }
  }
}
