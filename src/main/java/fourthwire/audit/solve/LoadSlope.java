package fourthwire.audit.solve;

import java.util.ArrayList;
import java.util.List;

/**
 * The slope of one load: that of a load of like shape, turned to this one's angle and scaled to its
 * size, put right by what the load's own solutions have shown since. Each shows how the current
 * answered one change of the electromotive force; the slope is made to agree with it by the least
 * change (C. G. Broyden, Math. Comp. 19 (1965)), load by load, as A. Griewank and Ph. L. Toint,
 * "Partitioned variable metric updates", Numer. Math. 39 (1982), do for sums of many functions.
 */
final class LoadSlope {
  private final DeviceSlope shape;
  private final double scale;
  private final double cos;
  private final double sin;
  private boolean added;
  private int addedChanges;
  private final List<double[]> changes = new ArrayList<>(4);
  private final List<double[]> corrections = new ArrayList<>(4);

  /**
   * The slope.
   *
   * @param scale this load's size on the other's
   * @param turn by how much, radians of the fundamental, this load stands before the other
   */
  LoadSlope(DeviceSlope shape, double scale, double turn) {
    this.shape = shape;
    this.scale = scale;
    this.cos = Math.cos(turn);
    this.sin = Math.sin(turn);
  }

  /** into = slope·e, both as long as the load's part of the state. */
  void multiply(OrdersInPlay orders, double[] e, double[] into) {
    if (sin == 0 && cos == 1) {
      shape.multiply(e, into);
    } else {
      double[] turned = e.clone();
      orders.turn(turned, cos, -sin);
      shape.multiply(turned, into);
      orders.turn(into, cos, sin);
    }
    for (int i = 0; i < into.length; i++) {
      into[i] *= scale;
    }
    for (int k = 0; k < changes.size(); k++) {
      double along = Gmres.dot(changes.get(k), e);
      double[] correction = corrections.get(k);
      for (int i = 0; i < into.length; i++) {
        into[i] += along * correction[i];
      }
    }
  }

  /** Whether it was added to the sum over its group. */
  boolean isAdded() {
    return added;
  }

  /** The sum is made anew. */
  void forgetAdded() {
    added = false;
    addedChanges = 0;
  }

  /**
   * Adds the matrix, so many times, to another: the whole of it, or what was learned since the last
   * time.
   */
  void addTo(OrdersInPlay orders, double count, float[] byColumn) {
    if (!added) {
      addShape(orders, count * scale, byColumn);
      added = true;
    }
    for (; addedChanges < changes.size(); addedChanges++) {
      double[] change = changes.get(addedChanges);
      double[] correction = corrections.get(addedChanges);
      int at = 0;
      for (double along : change) {
        for (double siemens : correction) {
          byColumn[at++] += (float) (count * along * siemens);
        }
      }
    }
  }

  private void addShape(OrdersInPlay orders, double factor, float[] byColumn) {
    int size = shape.size();
    double[] angles = new double[size];
    for (int i = 0; i < size; i += 2) {
      angles[i] = 1;
    }
    orders.turn(angles, cos, sin);
    double[] re = new double[size];
    double[] im = new double[size];
    for (int column = 0; column < size; column += 2) {
      double c = factor * angles[column];
      double s = factor * angles[column + 1];
      shape.combine(column, c, -s, re);
      shape.combine(column, s, c, im);
      addTurned(re, angles, byColumn, column * size);
      addTurned(im, angles, byColumn, (column + 1) * size);
    }
  }

  private static void addTurned(double[] phasors, double[] angles, float[] into, int at) {
    for (int i = 0; i < phasors.length; i += 2) {
      into[at + i] += (float) (phasors[i] * angles[i] - phasors[i + 1] * angles[i + 1]);
      into[at + i + 1] += (float) (phasors[i] * angles[i + 1] + phasors[i + 1] * angles[i]);
    }
  }

  /** Takes in that the current answered a change of the electromotive force so. */
  void learn(OrdersInPlay orders, double[] change, double[] answer) {
    double square = Gmres.dot(change, change);
    if (square == 0) {
      return;
    }
    double[] correction = new double[change.length];
    multiply(orders, change, correction);
    for (int i = 0; i < correction.length; i++) {
      correction[i] = (answer[i] - correction[i]) / square;
    }
    changes.add(change);
    corrections.add(correction);
  }
}
