package fourthwire.audit.solve;

import fourthwire.network.Excitation;
import fourthwire.network.FactoredOrder;
import fourthwire.network.OrderSolution;
import fourthwire.network.TreeNetwork;
import fourthwire.network.Trunk;
import fourthwire.quantity.Spectrum;
import java.util.Arrays;
import java.util.List;

/**
 * A few loads that are behind all others, such as drives near the limit of a steady state: they
 * catch up by themselves, with what the network answers to their own changes, while all other loads
 * stand still. That costs next to nothing, where a pass of the whole site would.
 */
final class Stragglers {
  private static final int MOST_PASSES = 12;

  private final List<DevicePort> loads;
  private final StateNetwork state;
  private final OrdersInPlay orders;
  private final double omega;
  private final Workers workers;
  private final Trunk trunk;
  private final NewtonStep newton;
  private final Settling settling;
  private final Excitation[] excitations = new Excitation[Spectrum.HIGHEST_ORDER + 1];
  private final OrderSolution[] answers = new OrderSolution[Spectrum.HIGHEST_ORDER + 1];

  /**
   * Loads behind.
   *
   * @param loads each with a slope, none of them solved together with others
   */
  Stragglers(
      TreeNetwork network,
      StateNetwork state,
      OrdersInPlay orders,
      List<DevicePort> loads,
      double omega,
      SlopeBook book,
      Workers workers) {
    this.loads = loads;
    this.state = state;
    this.orders = orders;
    this.omega = omega;
    this.workers = workers;
    this.trunk = Trunk.of(network, loads.stream().mapToInt(load -> load.place().node()));
    FactoredOrder[] factors = state.factors();
    this.newton = new NewtonStep(network, factors, orders, loads, List.of(), omega, book, workers);
    this.settling = new Settling(loads, List.of(), orders);
    for (int k = 0; k < orders.count(); k++) {
      int h = orders.at(k);
      excitations[h] = network.excitation();
      answers[h] = factors[h].solve(excitations[h]);
    }
  }

  /**
   * Lets them catch up; where they get no nearer, x stays as it was.
   *
   * @param x what all loads were taken to draw at the voltages last solved; receives what these do
   * @param g what all draw there; receives what these do when solved last
   */
  void catchUp(double[] x, double[] g) {
    double[] start = x.clone();
    if (loads.stream().allMatch(DevicePort::hasSlope)) {
      newton.keepSlopes();
    }
    loads.forEach(load -> load.terminals().standHere());
    settling.look(x, g);
    double before = settling.change();
    for (int pass = 1; pass <= MOST_PASSES && !settled(); pass++) {
      newton.renewSlopes(settling, g);
      double[] step = newton.step(x, g);
      for (DevicePort load : loads) {
        for (int i = load.offset(); i < load.offset() + load.length(orders); i++) {
          x[i] += step[i];
        }
      }
      answer(x, start);
      workers.each(loads.size(), d -> follow(loads.get(d), x, g));
      if (failed()) {
        break;
      }
      settling.look(x, g);
    }
    loads.forEach(load -> load.terminals().standAnywhere());
    loads.forEach(load -> load.slope().forgetAdded());
    if (failed() || settling.change() > before) {
      System.arraycopy(start, 0, x, 0, x.length);
    }
  }

  private boolean settled() {
    return settling.change() <= CoupledSolver.LOAD_TOLERANCE;
  }

  private boolean failed() {
    return loads.stream().anyMatch(load -> !load.failure().isEmpty());
  }

  private void follow(DevicePort load, double[] x, double[] g) {
    load.terminals().take(orders, answers);
    load.solve(orders, omega, x, g);
  }

  /** What the network answers to their changes alone. */
  private void answer(double[] x, double[] start) {
    double[] change = new double[x.length];
    Arrays.setAll(change, i -> x[i] - start[i]);
    workers.each(
        orders.count(),
        k -> {
          int h = orders.at(k);
          state.draw(k, change, loads, excitations[h].clear());
          state.factors()[h].solve(excitations[h], answers[h], trunk);
        });
  }
}
