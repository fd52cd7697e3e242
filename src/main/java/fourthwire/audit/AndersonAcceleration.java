package fourthwire.audit;

/**
 * Speeds up a fixed-point iteration x = g(x) by combining the last few steps so that the combined
 * residual is smallest.
 *
 * <p>D. G. Anderson, "Iterative procedures for nonlinear integral equations", J. ACM 12 (1965); in
 * the unconstrained form of H. Walker and P. Ni, "Anderson acceleration for fixed-point
 * iterations", SIAM J. Numer. Anal. 49 (2011), section 2: with f = g(x) - x and Δ the differences
 * of successive iterates, γ = argmin |f - ΔF·γ| and the next x is g(x) - (ΔX + ΔF)·γ. The least
 * squares are solved by modified Gram-Schmidt; directions that add nothing are left out.
 */
final class AndersonAcceleration {
  /** A direction whose new part is smaller than this share of it adds nothing but noise. */
  private static final double DEPENDENT = 1e-8;

  private final int depth;
  private final double[] weight;
  private final double[][] deltaX;
  private final double[][] deltaF;
  private final double[][] basis;
  private final double[] lastX;
  private final double[] lastF;
  private int seen;

  /**
   * An accelerator for a state of this length.
   *
   * @param weight by entry: what a residual of 1 there counts
   * @param depth how many past steps are combined
   */
  AndersonAcceleration(double[] weight, int depth) {
    int length = weight.length;
    this.depth = depth;
    this.weight = weight;
    deltaX = new double[depth][length];
    deltaF = new double[depth][length];
    basis = new double[depth][length];
    lastX = new double[length];
    lastF = new double[length];
  }

  /** Forgets the past steps. */
  void restart() {
    seen = 0;
  }

  /**
   * Replaces x by the next iterate.
   *
   * @param x the iterate
   * @param g the image of x
   */
  void step(double[] x, double[] g) {
    int length = x.length;
    if (seen > 0) {
      double[] dx = deltaX[(seen - 1) % depth];
      double[] df = deltaF[(seen - 1) % depth];
      for (int i = 0; i < length; i++) {
        dx[i] = x[i] - lastX[i];
        df[i] = g[i] - x[i] - lastF[i];
      }
    }
    for (int i = 0; i < length; i++) {
      lastX[i] = x[i];
      lastF[i] = g[i] - x[i];
    }
    double[] gamma = leastSquares(Math.min(seen, depth));
    System.arraycopy(g, 0, x, 0, length);
    for (int k = 0; k < gamma.length; k++) {
      for (int i = 0; i < length; i++) {
        x[i] -= gamma[k] * (deltaX[k][i] + deltaF[k][i]);
      }
    }
    seen++;
  }

  /** γ that minimises the weighted |f - ΔF·γ|, newest directions first. */
  private double[] leastSquares(int columns) {
    double[] gamma = new double[columns];
    double[][] r = new double[columns][columns];
    double[] projected = new double[columns];
    int[] column = new int[columns];
    int kept = 0;
    for (int age = 0; age < columns; age++) {
      int k = Math.floorMod(seen - 1 - age, depth);
      double[] q = basis[kept];
      for (int i = 0; i < q.length; i++) {
        q[i] = weight[i] * deltaF[k][i];
      }
      double before = norm(q);
      for (int j = 0; j < kept; j++) {
        r[j][kept] = dot(basis[j], q);
        subtract(q, basis[j], r[j][kept]);
      }
      double after = norm(q);
      if (after > DEPENDENT * before && after > 0) {
        r[kept][kept] = after;
        scale(q, 1 / after);
        projected[kept] = weightedDot(q, lastF);
        column[kept++] = k;
      }
    }
    for (int row = kept - 1; row >= 0; row--) {
      double sum = projected[row];
      for (int j = row + 1; j < kept; j++) {
        sum -= r[row][j] * gamma[column[j]];
      }
      gamma[column[row]] = sum / r[row][row];
    }
    return gamma;
  }

  private double weightedDot(double[] q, double[] f) {
    double sum = 0;
    for (int i = 0; i < q.length; i++) {
      sum += q[i] * weight[i] * f[i];
    }
    return sum;
  }

  private static double dot(double[] a, double[] b) {
    double sum = 0;
    for (int i = 0; i < a.length; i++) {
      sum += a[i] * b[i];
    }
    return sum;
  }

  private static double norm(double[] a) {
    return Math.sqrt(dot(a, a));
  }

  private static void subtract(double[] from, double[] direction, double amount) {
    for (int i = 0; i < from.length; i++) {
      from[i] -= amount * direction[i];
    }
  }

  private static void scale(double[] a, double factor) {
    for (int i = 0; i < a.length; i++) {
      a[i] *= factor;
    }
  }
}
