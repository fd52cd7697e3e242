package fourthwire.audit.solve;

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

  /** into[at + row] -= Σ slope·e. */
  void subtractProduct(double[] e, double[] into, int at) {
    for (int column = 0; column < size; column++) {
      double factor = e[column];
      if (factor != 0) {
        int start = column * size;
        for (int row = 0; row < size; row++) {
          into[at + row] -= factor * byColumn[start + row];
        }
      }
    }
  }
}
