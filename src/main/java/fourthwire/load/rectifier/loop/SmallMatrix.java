package fourthwire.load.rectifier.loop;

/**
 * A square matrix of a few rows: linear equations by Gauss and Jordan's elimination with row
 * exchange, and the spectral radius from high powers. A workspace, not thread-safe.
 */
public final class SmallMatrix {
  /** Powers up to 2 to this many tell the spectral radius to 0.1 %. */
  private static final int SQUARINGS = 14;

  private final double[][] entry;
  private final double[][] work;

  /** Of so many rows at most. */
  public SmallMatrix(int most) {
    entry = new double[most][most];
    work = new double[most][most + 1];
  }

  /** Sets an entry. */
  public void set(int row, int column, double value) {
    entry[row][column] = value;
  }

  /** An entry. */
  public double get(int row, int column) {
    return entry[row][column];
  }

  /**
   * Solves the equations of the first rows and columns.
   *
   * @param x the right-hand side, becomes the solution
   * @return false where there is none
   */
  public boolean solve(int size, double[] x) {
    for (int r = 0; r < size; r++) {
      System.arraycopy(entry[r], 0, work[r], 0, size);
      work[r][size] = x[r];
    }
    for (int p = 0; p < size; p++) {
      exchange(size, p);
      if (!(Math.abs(work[p][p]) > 0)) {
        return false;
      }
      for (int r = 0; r < size; r++) {
        if (r != p) {
          subtract(size, r, p);
        }
      }
    }
    for (int r = 0; r < size; r++) {
      x[r] = work[r][size] / work[r][r];
    }
    return true;
  }

  private void exchange(int size, int p) {
    int best = p;
    for (int r = p + 1; r < size; r++) {
      if (Math.abs(work[r][p]) > Math.abs(work[best][p])) {
        best = r;
      }
    }
    double[] swap = work[p];
    work[p] = work[best];
    work[best] = swap;
  }

  private void subtract(int size, int row, int pivot) {
    double factor = work[row][pivot] / work[pivot][pivot];
    for (int c = pivot; c <= size; c++) {
      work[row][c] -= factor * work[pivot][c];
    }
  }

  /** The largest size of an eigenvalue of the first rows and columns, which are spent. */
  public double spectralRadius(int size) {
    double log = 0;
    double share = 1;
    for (int n = 0; n < SQUARINGS; n++) {
      double norm = norm(size);
      if (norm == 0) {
        return 0;
      }
      log += share * Math.log(norm);
      square(size, 1 / norm);
      share /= 2;
    }
    return Math.exp(log);
  }

  private double norm(int size) {
    double sum = 0;
    for (int r = 0; r < size; r++) {
      for (int c = 0; c < size; c++) {
        sum += entry[r][c] * entry[r][c];
      }
    }
    return Math.sqrt(sum);
  }

  private void square(int size, double scale) {
    for (int r = 0; r < size; r++) {
      for (int c = 0; c < size; c++) {
        double sum = 0;
        for (int k = 0; k < size; k++) {
          sum += entry[r][k] * entry[k][c];
        }
        work[r][c] = scale * scale * sum;
      }
    }
    for (int r = 0; r < size; r++) {
      System.arraycopy(work[r], 0, entry[r], 0, size);
    }
  }
}
