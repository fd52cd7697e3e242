package fourthwire.audit.solve;

import fourthwire.network.Excitation;
import fourthwire.network.FactoredOrder;
import fourthwire.network.OrderSolution;
import fourthwire.network.TreeNetwork;
import fourthwire.quantity.Spectrum;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * Newton's step towards x = g(x). With K the loads' slopes seen from their groups ({@link
 * LoadGroup}), V what the network answers there, and r what each load would draw more if V stood
 * still, the step is Δ = r + K·V(Δ). Summed over each group that is an equation in the groups'
 * currents alone, solved by minimal residuals ({@link Gmres}); each load's own step follows.
 */
final class NewtonStep {
  /**
   * Newton's equations need not be solved much better than the slopes are known; but loads without
   * an impedance of their own make them ill-conditioned.
   */
  private static final double LINEAR_TOLERANCE = 3e-3;

  private static final int MOST_PRODUCTS = 120;

  /** Above this change slopes are worked out again at every pass. */
  private static final double FAR = 0.03;

  /** And where a pass leaves more than this part of the change before. */
  private static final double SLOW = 0.5;

  private final OrdersInPlay orders;
  private final List<LoadGroup> groups = new ArrayList<>();
  private final List<ActiveFilter> filters;
  private final FactoredOrder[] factors;
  private final double omega;
  private final Workers workers;
  private final SlopeBook book;
  private final Excitation[] excitations = new Excitation[Spectrum.HIGHEST_ORDER + 1];
  private final OrderSolution[] responses = new OrderSolution[Spectrum.HIGHEST_ORDER + 1];
  private final int groupsLength;
  private final int filtersLength;
  private final int filtersAt;
  private boolean known;
  private double lastChange = Double.POSITIVE_INFINITY;

  NewtonStep(
      TreeNetwork network,
      FactoredOrder[] factors,
      OrdersInPlay orders,
      List<DevicePort> loads,
      List<ActiveFilter> filters,
      double omega,
      Workers workers) {
    this.factors = factors;
    this.orders = orders;
    this.filters = filters;
    this.omega = omega;
    this.workers = workers;
    this.book = new SlopeBook(orders, loads, omega, workers);
    Map<PortPlace, LoadGroup> byPlace = new LinkedHashMap<>();
    int at = 0;
    int loadsEnd = 0;
    for (DevicePort load : loads) {
      LoadGroup group = byPlace.get(load.group());
      if (group == null) {
        group = new LoadGroup(load.group(), network, orders, at);
        byPlace.put(load.group(), group);
        groups.add(group);
        at += group.size();
      }
      group.add(load);
      loadsEnd = load.offset() + load.length(orders);
    }
    this.groupsLength = at;
    this.filtersAt = loadsEnd;
    this.filtersLength = filters.stream().mapToInt(f -> 2 * f.ports() * orders.count()).sum();
    for (int k = 0; k < orders.count(); k++) {
      int h = orders.at(k);
      excitations[h] = network.excitation();
      responses[h] = factors[h].solve(excitations[h]);
    }
  }

  /** Works the slopes out, at the state last solved, if there are none or they serve ill. */
  void renewWhereSlow(double change, double[] g) {
    if (!known || change > FAR || change > SLOW * lastChange) {
      groups.forEach(LoadGroup::forget);
      book.renew(g);
      known = true;
    }
    lastChange = change;
  }

  /** The step from x, where the loads answer g. */
  double[] step(double[] x, double[] g) {
    double[] step = new double[x.length];
    double[] b = new double[groupsLength + filtersLength];
    workers.each(groups.size(), k -> groups.get(k).gather(orders, omega, x, g, step, b));
    for (int i = 0; i < filtersLength; i++) {
      b[groupsLength + i] = g[filtersAt + i] - x[filtersAt + i];
    }
    double[] y = new Gmres(this::product, LINEAR_TOLERANCE, MOST_PRODUCTS).solve(b);
    respond(y);
    workers.each(groups.size(), k -> groups.get(k).spread(orders, responses, step));
    System.arraycopy(y, groupsLength, step, filtersAt, filtersLength);
    return step;
  }

  /** into = y - K·V(y), and of the filters y less their answer. */
  private void product(double[] y, double[] into) {
    respond(y);
    workers.each(groups.size(), k -> groups.get(k).balance(orders, responses, y, into));
    System.arraycopy(y, groupsLength, into, groupsLength, filtersLength);
    for (ActiveFilter filter : filters) {
      filter.subtractAnswer(orders, responses, y, into, groupsLength - filtersAt);
    }
  }

  private void respond(double[] y) {
    workers.each(orders.count(), k -> respond(k, y));
  }

  private void respond(int position, double[] y) {
    int h = orders.at(position);
    Excitation excitation = excitations[h].clear();
    groups.forEach(group -> group.draw(excitation, orders, position, y));
    filters.forEach(
        filter -> filter.feed(excitation, orders, position, y, groupsLength - filtersAt));
    factors[h].solve(excitation, responses[h]);
  }
}
