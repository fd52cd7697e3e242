package fourthwire.load.trial;

import fourthwire.load.model.NoSteadyStateException;
import java.util.ArrayList;
import java.util.List;
import java.util.function.UnaryOperator;

/**
 * Finds x = g(x) by repetition with Anderson's acceleration: the next x is the combination of the
 * last few images whose residuals g(x) - x, combined alike, are least in the sense of squares.
 */
final class FixedPoint {
  private static final int MEMORY = 8;
  private static final int MOST_TURNS = 200;

  /** Keeps the small system regular where residuals repeat, relative to its diagonal. */
  private static final double RIDGE = 1e-14;

  private final List<double[]> images = new ArrayList<>();
  private final List<double[]> residuals = new ArrayList<>();

  private FixedPoint() {}

  /**
   * The fixed point.
   *
   * @param tolerance largest residual at the end, in the unit of x
   * @throws NoSteadyStateException where the repetition does not end
   */
  static double[] of(UnaryOperator<double[]> g, double[] start, double tolerance) {
    FixedPoint memory = new FixedPoint();
    double[] x = start;
    for (int turn = 0; turn < MOST_TURNS; turn++) {
      double[] image = g.apply(x);
      double[] residual = minus(image, x);
      if (largest(residual) <= tolerance) {
        return x;
      }
      x = memory.next(image, residual);
    }
    throw new NoSteadyStateException(
        "no steady state was found: the equipment's filter and the source's inductance resonate");
  }

  private double[] next(double[] image, double[] residual) {
    images.add(image);
    residuals.add(residual);
    if (images.size() > MEMORY) {
      images.remove(0);
      residuals.remove(0);
    }
    double[] next = image.clone();
    int last = images.size() - 1;
    double[] weights = weights(residual, last);
    for (int k = 0; k < last; k++) {
      for (int i = 0; i < next.length; i++) {
        next[i] -= weights[k] * (image[i] - images.get(k)[i]);
      }
    }
    return next;
  }

  /** Least squares of residual - Σ w_k·(residual - residual_k), by its normal equations. */
  private double[] weights(double[] residual, int count) {
    double[][] differences = new double[count][];
    for (int k = 0; k < count; k++) {
      differences[k] = minus(residual, residuals.get(k));
    }
    double[][] a = new double[count][count + 1];
    for (int r = 0; r < count; r++) {
      for (int c = 0; c < count; c++) {
        a[r][c] = dot(differences[r], differences[c]);
      }
      a[r][r] *= 1 + RIDGE;
      a[r][count] = dot(differences[r], residual);
    }
    return eliminated(a);
  }

  /** Gauss without exchange: the matrix is positive definite. */
  private static double[] eliminated(double[][] a) {
    int n = a.length;
    for (int p = 0; p < n; p++) {
      for (int r = p + 1; r < n; r++) {
        double factor = a[p][p] > 0 ? a[r][p] / a[p][p] : 0;
        for (int c = p; c <= n; c++) {
          a[r][c] -= factor * a[p][c];
        }
      }
    }
    double[] x = new double[n];
    for (int r = n - 1; r >= 0; r--) {
      double sum = a[r][n];
      for (int c = r + 1; c < n; c++) {
        sum -= a[r][c] * x[c];
      }
      x[r] = a[r][r] > 0 ? sum / a[r][r] : 0;
    }
    return x;
  }

  private static double[] minus(double[] a, double[] b) {
    double[] difference = new double[a.length];
    for (int i = 0; i < a.length; i++) {
      difference[i] = a[i] - b[i];
    }
    return difference;
  }

  private static double dot(double[] a, double[] b) {
    double sum = 0;
    for (int i = 0; i < a.length; i++) {
      sum += a[i] * b[i];
    }
    return sum;
  }

  private static double largest(double[] a) {
    double largest = 0;
    for (double v : a) {
      largest = Math.max(largest, Math.abs(v));
    }
    return largest;
  }
}
