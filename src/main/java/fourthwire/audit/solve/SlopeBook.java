package fourthwire.audit.solve;

import fourthwire.site.LoadKind;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;

/**
 * Finds the slopes of all loads. A slope costs a hundred solutions of its load, so it is worked out
 * for some and lent to those of the same kind whose current has nearly the same shape, turned and
 * scaled.
 */
final class SlopeBook {
  /** Shapes that differ by less than this, on the fundamental, count as alike. */
  private static final double ALIKE = 0.1;

  /** So many shapes of a kind are enough; what differs from all borrows from the nearest. */
  private static final int MOST_SHAPES = 48;

  /** Orders by which shapes are told apart. */
  private static final int HIGHEST_COMPARED = 15;

  private final OrdersInPlay orders;
  private final List<DevicePort> loads;
  private final Workers workers;
  private final double omega;

  SlopeBook(OrdersInPlay orders, List<DevicePort> loads, double omega, Workers workers) {
    this.orders = orders;
    this.loads = loads;
    this.workers = workers;
    this.omega = omega;
  }

  /** A load whose slope others borrow, with its current's shape. */
  private record Leader(DevicePort load, double[] shape, double angle, double siemens) {}

  /** Gives every load a slope at the state last solved, where it drew g. */
  void renew(double[] g) {
    Map<LoadKind, List<Leader>> leaders = new HashMap<>();
    List<Leader> all = new ArrayList<>();
    Leader[] own = new Leader[loads.size()];
    Leader[] of = new Leader[loads.size()];
    for (int d = 0; d < loads.size(); d++) {
      own[d] = look(loads.get(d), g);
      List<Leader> known =
          leaders.computeIfAbsent(
              loads.get(d).device().placement().request().kind(), k -> new ArrayList<>());
      Leader nearest = nearest(own[d], known);
      if (nearest == own[d]) {
        known.add(nearest);
        all.add(nearest);
      }
      of[d] = nearest;
    }
    DeviceSlope[] slopes = new DeviceSlope[all.size()];
    workers.each(slopes.length, k -> slopes[k] = all.get(k).load().findSlope(orders, omega));
    Map<Leader, DeviceSlope> slopeOf = new HashMap<>();
    for (int k = 0; k < slopes.length; k++) {
      slopeOf.put(all.get(k), slopes[k]);
    }
    for (int d = 0; d < own.length; d++) {
      loads
          .get(d)
          .setSlope(
              new LoadSlope(
                  Objects.requireNonNull(slopeOf.get(of[d])),
                  own[d].siemens() / of[d].siemens(),
                  own[d].angle() - of[d].angle()));
    }
  }

  /** The current as it would be with the voltage at 0° and a fundamental of 1. */
  private Leader look(DevicePort load, double[] g) {
    double[] e = load.lastEmf();
    double angle = Math.atan2(e[1], e[0]);
    double[] shape = new double[load.length(orders)];
    System.arraycopy(g, load.offset(), shape, 0, shape.length);
    orders.turn(shape, Math.cos(angle), -Math.sin(angle));
    double amps = Math.hypot(shape[0], shape[1]);
    double[] compared = new double[2 * HIGHEST_COMPARED];
    for (int k = 0; k < orders.count() && orders.at(k) < HIGHEST_COMPARED; k++) {
      compared[2 * k] = shape[2 * k] / amps;
      compared[2 * k + 1] = shape[2 * k + 1] / amps;
    }
    return new Leader(load, compared, angle, amps / Math.hypot(e[0], e[1]));
  }

  private static Leader nearest(Leader own, List<Leader> known) {
    Leader nearest = own;
    double least = known.size() < MOST_SHAPES ? ALIKE * ALIKE : Double.POSITIVE_INFINITY;
    for (Leader leader : known) {
      double square = 0;
      for (int i = 0; i < own.shape().length && square < least; i++) {
        double d = own.shape()[i] - leader.shape()[i];
        square += d * d;
      }
      if (square < least && leader.load().ports() == own.load().ports()) {
        least = square;
        nearest = leader;
      }
    }
    return nearest;
  }
}
