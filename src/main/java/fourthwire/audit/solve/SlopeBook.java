package fourthwire.audit.solve;

import fourthwire.site.LoadKind;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Finds the slopes of loads. A slope costs a hundred solutions of its load, so it is worked out for
 * some and lent to those of the same kind whose current has nearly the same shape, turned and
 * scaled. What was worked out once is kept, for all states of a site.
 */
final class SlopeBook {
  /** Shapes that differ by less than this, on the fundamental, count as alike. */
  private static final double ALIKE = 0.1;

  /** So many shapes of a kind are enough; what differs from all borrows from the nearest. */
  private static final int MOST_SHAPES = 64;

  /** Orders by which shapes are told apart. */
  private static final int HIGHEST_COMPARED = 15;

  private final OrdersInPlay orders;
  private final double omega;
  private final Map<Kind, List<Leader>> leaders = new HashMap<>();

  SlopeBook(OrdersInPlay orders, double omega) {
    this.orders = orders;
    this.omega = omega;
  }

  /** What loads must have in common to borrow from each other at all. */
  private record Kind(LoadKind kind, int ports) {
    static Kind of(DevicePort load) {
      return new Kind(load.device().placement().request().kind(), load.ports());
    }
  }

  /** A slope that others borrow, and what the current of its load looked like. */
  private record Leader(DeviceSlope slope, Look look) {}

  /**
   * A load's current at a state.
   *
   * @param shape as it would be with the voltage at 0° and a fundamental of 1
   * @param angle the voltage's, radians
   * @param siemens the fundamental current on the fundamental voltage
   */
  private record Look(double[] shape, double angle, double siemens) {
    double squareTo(Look other, double enough) {
      double square = 0;
      for (int i = 0; i < shape.length && square < enough; i++) {
        double d = shape[i] - other.shape[i];
        square += d * d;
      }
      return square;
    }
  }

  /** Whether it holds slopes over so many orders. */
  boolean covers(OrdersInPlay others) {
    return orders.count() == others.count();
  }

  /** Forgets what was worked out so far. */
  void forget() {
    leaders.clear();
  }

  /** Gives loads a slope at the state last solved, where they drew g. */
  void lend(List<DevicePort> all, double[] g, Workers workers) {
    List<JointLoads> strong = together(all).stream().filter(JointLoads::isStrong).toList();
    workers.each(strong.size(), k -> strong.get(k).findSlopes(orders, omega, false));
    List<DevicePort> loads =
        all.stream().filter(load -> load.joint().filter(JointLoads::isStrong).isEmpty()).toList();
    Look[] looks = new Look[loads.size()];
    workers.each(looks.length, d -> looks[d] = look(loads.get(d), g));
    Leader[] of = new Leader[looks.length];
    List<Integer> first = new ArrayList<>();
    for (int d = 0; d < looks.length; d++) {
      List<Leader> alike = leaders.computeIfAbsent(Kind.of(loads.get(d)), k -> new ArrayList<>());
      Optional<Leader> nearest = nearest(looks[d], alike);
      of[d] = nearest.orElse(new Leader(new DeviceSlope(loads.get(d).length(orders)), looks[d]));
      if (nearest.isEmpty()) {
        alike.add(of[d]);
        first.add(d);
      }
    }
    workers.each(
        first.size(),
        k -> {
          int d = first.get(k);
          loads.get(d).findSlope(orders, omega, false, of[d].slope());
        });
    for (int d = 0; d < of.length; d++) {
      Look look = of[d].look();
      double scale = looks[d].siemens() / look.siemens();
      double turn = looks[d].angle() - look.angle();
      loads.get(d).setSlope(new LoadSlope(of[d].slope(), scale, turn), false);
    }
  }

  /** Gives loads that resemble no other a slope of their own. */
  void giveOwn(List<DevicePort> loads, Workers workers) {
    List<JointLoads> together = together(loads);
    workers.each(together.size(), k -> together.get(k).findSlopes(orders, omega, true));
    giveEach(loads.stream().filter(load -> load.joint().isEmpty()).toList(), workers);
  }

  private static List<JointLoads> together(List<DevicePort> loads) {
    return loads.stream().flatMap(load -> load.joint().stream()).distinct().toList();
  }

  private void giveEach(List<DevicePort> loads, Workers workers) {
    workers.each(
        loads.size(),
        k -> {
          DevicePort load = loads.get(k);
          DeviceSlope slope = new DeviceSlope(load.length(orders));
          load.findSlope(orders, omega, true, slope);
          load.setSlope(new LoadSlope(slope, 1, 0), true);
        });
  }

  private Look look(DevicePort load, double[] g) {
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
    return new Look(compared, angle, amps / Math.hypot(e[0], e[1]));
  }

  private static Optional<Leader> nearest(Look own, List<Leader> known) {
    Optional<Leader> nearest = Optional.empty();
    double least = known.size() < MOST_SHAPES ? ALIKE * ALIKE : Double.POSITIVE_INFINITY;
    for (Leader leader : known) {
      double square = own.squareTo(leader.look(), least);
      if (square < least) {
        least = square;
        nearest = Optional.of(leader);
      }
    }
    return nearest;
  }
}
