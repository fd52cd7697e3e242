package fourthwire.audit.solve;

import java.util.ArrayList;
import java.util.List;
import java.util.function.BiConsumer;
import java.util.function.UnaryOperator;

/**
 * Solves A·x = b where only A·x can be formed, by minimal residuals over a Krylov space: Y. Saad
 * and M. H. Schultz, "GMRES", SIAM J. Sci. Stat. Comput. 7 (1986), with modified Gram-Schmidt and
 * Givens rotations, not restarted. A rough solution of A·z = v leads it to the end in fewer
 * products, and may be found otherwise each time: Y. Saad, "A flexible inner-outer preconditioned
 * GMRES algorithm", SIAM J. Sci. Comput. 14 (1993).
 */
final class Gmres {
  private final BiConsumer<double[], double[]> operator;
  private final UnaryOperator<double[]> rough;
  private final double tolerance;
  private final int most;

  /**
   * A solver.
   *
   * @param operator writes A·(first) into (second)
   * @param rough gives z with A·z ≈ v
   * @param tolerance residual on |b| to reach
   * @param most largest number of products
   */
  Gmres(
      BiConsumer<double[], double[]> operator,
      UnaryOperator<double[]> rough,
      double tolerance,
      int most) {
    this.operator = operator;
    this.rough = rough;
    this.tolerance = tolerance;
    this.most = most;
  }

  /** The solution, or the best one within the allowed number of products. */
  double[] solve(double[] b) {
    double norm = norm(b);
    if (norm == 0) {
      return new double[b.length];
    }
    List<double[]> basis = new ArrayList<>();
    List<double[]> tried = new ArrayList<>();
    List<double[]> columns = new ArrayList<>();
    double[] cos = new double[most];
    double[] sin = new double[most];
    double[] rhs = new double[most + 1];
    rhs[0] = norm;
    basis.add(scaled(b, 1 / norm));
    int k = 0;
    while (k < most && Math.abs(rhs[k]) > tolerance * norm) {
      double[] w = new double[b.length];
      tried.add(rough.apply(basis.get(k)));
      operator.accept(tried.get(k), w);
      double[] column = orthogonalise(w, basis);
      rotate(column, k, cos, sin, rhs);
      columns.add(column);
      double length = norm(w);
      k++;
      if (length == 0) {
        break;
      }
      basis.add(scaled(w, 1 / length));
    }
    return combine(tried, columns, rhs, k, b.length);
  }

  /** Takes from w its part along the basis; the parts, and what is left, are the new column. */
  private static double[] orthogonalise(double[] w, List<double[]> basis) {
    double[] column = new double[basis.size() + 1];
    for (int j = 0; j < basis.size(); j++) {
      double[] q = basis.get(j);
      double along = dot(q, w);
      column[j] = along;
      for (int i = 0; i < w.length; i++) {
        w[i] -= along * q[i];
      }
    }
    column[basis.size()] = norm(w);
    return column;
  }

  /** Turns the new column into the triangular form of those before, and the right side with it. */
  private static void rotate(double[] column, int k, double[] cos, double[] sin, double[] rhs) {
    for (int j = 0; j < k; j++) {
      double upper = cos[j] * column[j] + sin[j] * column[j + 1];
      column[j + 1] = -sin[j] * column[j] + cos[j] * column[j + 1];
      column[j] = upper;
    }
    double length = Math.hypot(column[k], column[k + 1]);
    cos[k] = length == 0 ? 1 : column[k] / length;
    sin[k] = length == 0 ? 0 : column[k + 1] / length;
    column[k] = length;
    rhs[k + 1] = -sin[k] * rhs[k];
    rhs[k] = cos[k] * rhs[k];
  }

  private static double[] combine(
      List<double[]> tried, List<double[]> columns, double[] rhs, int k, int length) {
    double[] y = new double[k];
    for (int row = k - 1; row >= 0; row--) {
      double sum = rhs[row];
      for (int j = row + 1; j < k; j++) {
        sum -= columns.get(j)[row] * y[j];
      }
      double pivot = columns.get(row)[row];
      y[row] = pivot == 0 ? 0 : sum / pivot;
    }
    double[] x = new double[length];
    for (int j = 0; j < k; j++) {
      double[] q = tried.get(j);
      for (int i = 0; i < length; i++) {
        x[i] += y[j] * q[i];
      }
    }
    return x;
  }

  static double norm(double[] a) {
    return Math.sqrt(dot(a, a));
  }

  static double dot(double[] a, double[] b) {
    double sum = 0;
    for (int i = 0; i < a.length; i++) {
      sum += a[i] * b[i];
    }
    return sum;
  }

  private static double[] scaled(double[] a, double factor) {
    double[] b = new double[a.length];
    for (int i = 0; i < a.length; i++) {
      b[i] = factor * a[i];
    }
    return b;
  }
}
