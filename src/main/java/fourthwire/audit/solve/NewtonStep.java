package fourthwire.audit.solve;

import fourthwire.network.FactoredOrder;
import fourthwire.network.TreeNetwork;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * Newton's step towards x = g(x). With K a load's slope seen from its group ({@link LoadGroup}), u
 * the change of the potentials there, and r what it would draw more if they stood still, its step
 * is r + K·u; the potentials follow from all loads' steps together ({@link BoardEquations}).
 */
final class NewtonStep {
  /**
   * Newton's equations need not be solved much better than the slopes are known; but loads without
   * an impedance of their own make them ill-conditioned.
   */
  private static final double LINEAR_TOLERANCE = 3e-3;

  /** Where most loads change by more they are not yet what they will be: slopes there mislead. */
  private static final double FAR = 0.05;

  /** A pass that leaves more than this part of the change before is held up by some loads. */
  private static final double SLOW = 0.5;

  private final OrdersInPlay orders;
  private final List<DevicePort> loads;
  private final List<LoadGroup> groups;
  private final BoardEquations boards;
  private final int loadsLength;
  private final int filtersLength;
  private final double omega;
  private final Workers workers;
  private final SlopeBook book;
  private boolean known;
  private boolean kept;
  private double lastChange = Double.POSITIVE_INFINITY;

  NewtonStep(
      TreeNetwork network,
      FactoredOrder[] factors,
      OrdersInPlay orders,
      List<DevicePort> loads,
      List<ActiveFilter> filters,
      double omega,
      SlopeBook book,
      Workers workers) {
    this.orders = orders;
    this.loads = loads;
    this.omega = omega;
    this.workers = workers;
    this.book = book;
    Map<PortPlace, List<DevicePort>> members = new LinkedHashMap<>();
    loads.forEach(l -> members.computeIfAbsent(l.group(), g -> new ArrayList<>()).add(l));
    this.boards =
        new BoardEquations(
            new BoardResponse(network, factors, orders, workers), members.keySet(), filters);
    this.groups =
        members.entrySet().stream()
            .map(e -> new LoadGroup(boards.slope(e.getKey()), e.getValue()))
            .toList();
    this.loadsLength = loads.stream().mapToInt(load -> load.length(orders)).sum();
    this.filtersLength = filters.stream().mapToInt(f -> 2 * f.ports() * orders.count()).sum();
  }

  /**
   * Works slopes out at the state last solved: for all loads where that is far from settled, else
   * for those that hold the others up.
   */
  void renewSlopes(Settling settling, double[] g) {
    double change = settling.change();
    boolean far = settling.usualChange() > FAR;
    if (known && far && !kept) {
      book.forget();
    }
    if (!known || far && !kept) {
      book.lend(loads.stream().filter(load -> !load.hasOwnSlope()).toList(), g, workers);
    }
    if (known) {
      book.giveOwn(settling.last(change > SLOW * lastChange), workers);
    }
    known = true;
    lastChange = change;
  }

  /** The loads have slopes already. */
  void keepSlopes() {
    known = true;
    kept = true;
  }

  /** The step from x, where the loads answer g. */
  double[] step(double[] x, double[] g) {
    double[] step = new double[x.length];
    double[][] sums = new double[groups.size()][];
    workers.each(groups.size(), k -> sums[k] = groups.get(k).gather(orders, omega, x, g, step));
    double[] drawn = new double[boards.row().length()];
    for (int k = 0; k < sums.length; k++) {
      groups.get(k).slope().draw(sums[k], drawn);
    }
    double[] fed = new double[filtersLength];
    for (int i = 0; i < filtersLength; i++) {
      fed[i] = g[loadsLength + i] - x[loadsLength + i];
    }
    boards.renew();
    double[] y = boards.solve(drawn, fed, LINEAR_TOLERANCE);
    workers.each(groups.size(), k -> groups.get(k).spread(orders, y, step));
    System.arraycopy(y, boards.row().length(), step, loadsLength, filtersLength);
    return step;
  }
}
