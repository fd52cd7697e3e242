package fourthwire.audit.doubt;

import java.util.ArrayList;
import java.util.List;

/**
 * How much of a figure's variance over the draws some columns explain, by least squares on columns
 * made orthogonal one after the other (modified Gram-Schmidt).
 */
final class Explained {
  /** A column that others make up to this part of its square adds nothing. */
  private static final double DEPENDENT = 1e-9;

  private final int draws;
  private final List<double[]> columns = new ArrayList<>();
  private final List<double[]> directions = new ArrayList<>();

  /** By which columns each direction was made: upper triangle of the decomposition. */
  private final List<double[]> triangle = new ArrayList<>();

  private final List<Integer> kept = new ArrayList<>();

  Explained(List<float[]> columns, int draws) {
    this.draws = draws;
    for (float[] column : columns) {
      add(centred(column));
    }
  }

  private void add(double[] column) {
    double[] rest = column.clone();
    double[] parts = new double[directions.size() + 1];
    for (int k = 0; k < directions.size(); k++) {
      parts[k] = dot(directions.get(k), rest);
      subtract(rest, directions.get(k), parts[k]);
    }
    double square = dot(column, column);
    double left = dot(rest, rest);
    columns.add(column);
    if (square > 0 && left > DEPENDENT * square) {
      double norm = Math.sqrt(left);
      parts[directions.size()] = norm;
      for (int i = 0; i < rest.length; i++) {
        rest[i] /= norm;
      }
      directions.add(rest);
      triangle.add(parts);
      kept.add(columns.size() - 1);
    }
  }

  static double[] centred(float[] values) {
    double sum = 0;
    for (float value : values) {
      sum += value;
    }
    double[] centred = new double[values.length];
    for (int k = 0; k < values.length; k++) {
      centred[k] = values[k] - sum / values.length;
    }
    return centred;
  }

  /**
   * The part of the variance that all columns together explain, 0 to 1, less what as many columns
   * of chance would; 0 where there is no variance.
   */
  double share(float[] figure) {
    double[] y = centred(figure);
    double whole = dot(y, y);
    int free = draws - directions.size() - 1;
    if (!(whole > 0) || free <= 0) {
      return 0;
    }
    double explained = 0;
    for (double[] direction : directions) {
      double along = dot(direction, y);
      explained += along * along;
    }
    return Math.max(0, 1 - (1 - explained / whole) * (draws - 1) / free);
  }

  /**
   * What each column explains: its coefficient times its covariance with the figure, on the
   * figure's variance. The shares sum to what all together explain (Pratt, 1987).
   */
  double[] shares(float[] figure) {
    double[] y = centred(figure);
    double whole = dot(y, y);
    double[] shares = new double[columns.size()];
    if (!(whole > 0)) {
      return shares;
    }
    double[] coefficients = coefficients(y);
    for (int k = 0; k < kept.size(); k++) {
      int column = kept.get(k);
      shares[column] = Math.max(0, coefficients[k] * dot(columns.get(column), y) / whole);
    }
    return shares;
  }

  /** Backwards through the triangle. */
  private double[] coefficients(double[] y) {
    double[] c = new double[directions.size()];
    for (int k = c.length - 1; k >= 0; k--) {
      double rest = dot(directions.get(k), y);
      for (int later = k + 1; later < c.length; later++) {
        rest -= triangle.get(later)[k] * c[later];
      }
      c[k] = rest / triangle.get(k)[k];
    }
    return c;
  }

  private static void subtract(double[] from, double[] direction, double times) {
    for (int i = 0; i < from.length; i++) {
      from[i] -= times * direction[i];
    }
  }

  private static double dot(double[] a, double[] b) {
    double sum = 0;
    for (int i = 0; i < a.length; i++) {
      sum += a[i] * b[i];
    }
    return sum;
  }
}
