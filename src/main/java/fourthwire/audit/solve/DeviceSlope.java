package fourthwire.audit.solve;

import java.util.Arrays;

/**
 * How a load's current follows small changes of the electromotive force before it: the real matrix
 * of all its ports, orders and both parts of a phasor. Even a change at one order moves the current
 * at every order, and differently for the two parts, since the diodes' conduction moves; so the
 * matrix is real, not complex, and full.
 */
final class DeviceSlope {
  private final int size;
  private final double[] byColumn;

  DeviceSlope(int size) {
    this.size = size;
    this.byColumn = new double[size * size];
  }

  int size() {
    return size;
  }

  void set(int row, int column, double siemens) {
    byColumn[column * size + row] = siemens;
  }

  double get(int row, int column) {
    return byColumn[column * size + row];
  }

  /** into = Σ slope·e. */
  void multiply(double[] e, double[] into) {
    Arrays.fill(into, 0, size, 0);
    for (int column = 0; column < size; column++) {
      double factor = e[column];
      if (factor != 0) {
        int start = column * size;
        for (int row = 0; row < size; row++) {
          into[row] += factor * byColumn[start + row];
        }
      }
    }
  }

  /** into = a·(this column) + b·(the next). */
  void combine(int column, double a, double b, double[] into) {
    int at = column * size;
    for (int row = 0; row < size; row++) {
      into[row] = a * byColumn[at + row] + b * byColumn[at + size + row];
    }
  }

  /**
   * From the slope J behind a series impedance S to the slope K before it: K = (1 - J·S)⁻¹·J.
   *
   * @param reactance at the fundamental, ohms
   */
  void open(OrdersInPlay orders, double ohm, double reactance) {
    double[][] rows = new double[size][2 * size];
    for (int column = 0; column < size; column += 2) {
      double x = reactance * orders.at(column / 2 % orders.count());
      for (int row = 0; row < size; row++) {
        double re = get(row, column);
        double im = get(row, column + 1);
        rows[row][column] = -(re * ohm + im * x);
        rows[row][column + 1] = -(im * ohm - re * x);
        rows[row][size + column] = re;
        rows[row][size + column + 1] = im;
      }
    }
    for (int k = 0; k < size; k++) {
      rows[k][k] += 1;
    }
    eliminate(rows);
    for (int row = 0; row < size; row++) {
      for (int column = 0; column < size; column++) {
        set(row, column, rows[row][size + column]);
      }
    }
  }

  /** Gauss-Jordan with row exchange; the right half becomes the solution. */
  private void eliminate(double[][] rows) {
    for (int k = 0; k < size; k++) {
      int best = k;
      for (int row = k + 1; row < size; row++) {
        best = Math.abs(rows[row][k]) > Math.abs(rows[best][k]) ? row : best;
      }
      double[] pivot = rows[best];
      rows[best] = rows[k];
      rows[k] = pivot;
      for (int column = 2 * size - 1; column >= k; column--) {
        pivot[column] /= pivot[k];
      }
      for (int row = 0; row < size; row++) {
        double factor = rows[row][k];
        if (row != k && factor != 0) {
          for (int column = k; column < 2 * size; column++) {
            rows[row][column] -= factor * pivot[column];
          }
        }
      }
    }
  }
}
