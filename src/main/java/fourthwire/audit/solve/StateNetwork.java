package fourthwire.audit.solve;

import fourthwire.audit.AuditFailedException;
import fourthwire.audit.plan.NetworkPlan;
import fourthwire.network.Excitation;
import fourthwire.network.FactoredOrder;
import fourthwire.network.OrderSolution;
import fourthwire.network.SolutionCheck;
import fourthwire.network.Trunk;
import fourthwire.network.UnsolvableOrderException;
import fourthwire.quantity.Spectrum;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.function.IntConsumer;
import java.util.stream.IntStream;

/** The network of one state, order by order: eliminated once, solved for what the loads draw. */
final class StateNetwork {
  private final NetworkPlan plan;
  private final OrdersInPlay orders;
  private final Workers workers;
  private final FactoredOrder[] factors = new FactoredOrder[Spectrum.HIGHEST_ORDER + 1];
  private final Excitation[] excitations = new Excitation[Spectrum.HIGHEST_ORDER + 1];
  private final OrderSolution[] solutions = new OrderSolution[Spectrum.HIGHEST_ORDER + 1];

  StateNetwork(NetworkPlan plan, OrdersInPlay orders, Workers workers) {
    this.plan = plan;
    this.orders = orders;
    this.workers = workers;
  }

  /** By order. */
  FactoredOrder[] factors() {
    return factors;
  }

  /** By order: what was solved last. */
  OrderSolution[] solutions() {
    return solutions;
  }

  /** Eliminates every order. */
  void factor() {
    eachOrder(this::factor);
  }

  private void factor(int order) {
    try {
      factors[order] = plan.network().factor(order);
    } catch (UnsolvableOrderException e) {
      throw new AuditFailedException(
          "The network has no unique solution at order %d: %s".formatted(order, e.getMessage()), e);
    }
    excitations[order] = plan.network().excitation();
    solutions[order] = factors[order].solve(excitations[order]);
  }

  /**
   * Solves every order.
   *
   * @param x what loads draw and filters feed
   * @param part where all loads stand, if only that is to be solved
   */
  void solve(double[] x, List<DevicePort> loads, List<ActiveFilter> filters, Optional<Trunk> part) {
    workers.each(orders.count(), k -> solve(k, x, loads, filters, part));
  }

  private void solve(
      int position,
      double[] x,
      List<DevicePort> loads,
      List<ActiveFilter> filters,
      Optional<Trunk> part) {
    int h = orders.at(position);
    Excitation excitation = excitations[h].clear();
    plan.supply().excite(h, excitation);
    draw(position, x, loads, excitation);
    for (ActiveFilter filter : filters) {
      filter.feed(excitation, orders, position, x, 0);
    }
    if (part.isPresent()) {
      factors[h].solve(excitation, solutions[h], part.get());
    } else {
      factors[h].solve(excitation, solutions[h]);
    }
  }

  /** Adds to one order, by its position, what loads draw. */
  void draw(int position, double[] x, List<DevicePort> loads, Excitation excitation) {
    for (DevicePort load : loads) {
      for (int port = 0; port < load.ports(); port++) {
        int at = load.offset() + 2 * (port * orders.count() + position);
        load.terminals().draw(excitation, port, x[at], x[at + 1]);
      }
    }
  }

  /** Solves the network for what the loads draw now, and says whether its currents stood still. */
  boolean settled(double[] g, List<DevicePort> loads, List<ActiveFilter> filters) {
    int conductors = plan.network().conductors();
    double[] square = new double[conductors];
    double[] moved = new double[conductors];
    double[] before = new double[2 * conductors];
    for (int k = 0; k < orders.count(); k++) {
      OrderSolution s = solutions[orders.at(k)];
      for (int c = 0; c < conductors; c++) {
        before[2 * c] = s.currentRe(c);
        before[2 * c + 1] = s.currentIm(c);
      }
      solve(k, g, loads, filters, Optional.empty());
      for (int c = 0; c < conductors; c++) {
        double re = s.currentRe(c);
        double im = s.currentIm(c);
        square[c] += re * re + im * im;
        double dRe = re - before[2 * c];
        double dIm = im - before[2 * c + 1];
        moved[c] += dRe * dRe + dIm * dIm;
      }
    }
    double largest = Math.sqrt(Arrays.stream(square).max().orElse(0));
    return IntStream.range(0, conductors)
        .allMatch(
            c ->
                Math.sqrt(moved[c])
                    <= CoupledSolver.CONDUCTOR_TOLERANCE * (Math.sqrt(square[c]) + largest / 100));
  }

  /** Nothing leaves here that breaks Kirchhoff's laws or the balance of power. */
  void check() {
    eachOrder(
        h -> {
          SolutionCheck check = factors[h].check(excitations[h], solutions[h]);
          if (!(check.worst() <= CoupledSolver.CHECK_TOLERANCE)) {
            throw new AuditFailedException(
                String.format(
                    Locale.ROOT,
                    "The solution of order %d does not balance (%.2e); no figure is given",
                    h,
                    check.worst()));
          }
        });
  }

  private void eachOrder(IntConsumer action) {
    workers.each(orders.count(), k -> action.accept(orders.at(k)));
  }
}
