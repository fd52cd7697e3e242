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
  private final float[] byColumn;

  DeviceSlope(int size) {
    this.size = size;
    this.byColumn = new float[size * size];
  }

  int size() {
    return size;
  }

  void set(int row, int column, double siemens) {
    byColumn[column * size + row] = (float) siemens;
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
   * @param omega of the fundamental, 1/s
   */
  void open(OrdersInPlay orders, SeriesOhms series, double omega) {
    double[][] matrix = new double[size][size];
    double[][] sides = new double[size][size];
    for (int column = 0; column < size; column += 2) {
      double x = series.henry() * omega * orders.at(column / 2 % orders.count());
      for (int row = 0; row < size; row++) {
        double re = get(row, column);
        double im = get(row, column + 1);
        matrix[row][column] = -(re * series.ohm() + im * x);
        matrix[row][column + 1] = -(im * series.ohm() - re * x);
        sides[row][column] = re;
        sides[row][column + 1] = im;
      }
    }
    for (int k = 0; k < size; k++) {
      matrix[k][k] += 1;
    }
    new DenseLu(matrix).solve(sides);
    for (int row = 0; row < size; row++) {
      for (int column = 0; column < size; column++) {
        set(row, column, sides[row][column]);
      }
    }
  }

  /** Adds another slope to this. */
  void add(DeviceSlope other) {
    for (int i = 0; i < byColumn.length; i++) {
      byColumn[i] += other.byColumn[i];
    }
  }

  /**
   * For one of several loads behind a series impedance S that they share: from its slope J behind
   * that, where all feel the same change, to K = J·(1 + S·T) before it.
   *
   * @param together T, the slope of all before it
   */
  void open(OrdersInPlay orders, SeriesOhms series, double omega, DeviceSlope together) {
    DeviceSlope behind = new DeviceSlope(size);
    double[] dropped = new double[size];
    double[] answer = new double[size];
    for (int column = 0; column < size; column++) {
      for (int row = 0; row < size; row += 2) {
        double x = series.henry() * omega * orders.at(row / 2 % orders.count());
        double re = together.get(row, column);
        double im = together.get(row + 1, column);
        dropped[row] = series.ohm() * re - x * im;
        dropped[row + 1] = series.ohm() * im + x * re;
      }
      multiply(dropped, answer);
      for (int row = 0; row < size; row++) {
        behind.set(row, column, answer[row]);
      }
    }
    add(behind);
  }
}
