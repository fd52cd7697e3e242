package fourthwire.audit.solve;

import fourthwire.network.Excitation;
import fourthwire.network.FactoredOrder;
import fourthwire.network.OrderSolution;
import fourthwire.network.TreeNetwork;
import fourthwire.quantity.Spectrum;
import java.util.List;
import java.util.stream.IntStream;

/**
 * Newton's step towards x = g(x): with J the loads' slopes, Z the network's answer to what they
 * draw and S the series R-L they are solved behind, (1 - J·(S - Z))·Δ = g(x) - x.
 *
 * <p>The slopes are worked out once and kept until the iteration slows down.
 */
final class NewtonStep {
  private static final double LINEAR_TOLERANCE = 1e-3;
  private static final int MOST_PRODUCTS = 120;

  /** Slopes are worked out again where a pass leaves more than this part of the change before. */
  private static final double SLOW = 0.2;

  private final OrdersInPlay orders;
  private final List<DevicePort> loads;
  private final List<ActiveFilter> filters;
  private final FactoredOrder[] factors;
  private final double omega;
  private final Excitation[] excitations = new Excitation[Spectrum.HIGHEST_ORDER + 1];
  private final OrderSolution[] responses = new OrderSolution[Spectrum.HIGHEST_ORDER + 1];
  private List<DeviceSlope> slopes = List.of();
  private double lastChange = Double.POSITIVE_INFINITY;

  NewtonStep(
      TreeNetwork network,
      FactoredOrder[] factors,
      OrdersInPlay orders,
      List<DevicePort> loads,
      List<ActiveFilter> filters,
      double omega) {
    this.factors = factors;
    this.orders = orders;
    this.loads = loads;
    this.filters = filters;
    this.omega = omega;
    for (int k = 0; k < orders.count(); k++) {
      int h = orders.at(k);
      excitations[h] = network.excitation();
      responses[h] = factors[h].solve(excitations[h]);
    }
  }

  /** Works the slopes out, at the voltages last solved, if there are none or they serve ill. */
  void renewWhereSlow(double change) {
    if (slopes.isEmpty() || change > SLOW * lastChange) {
      slopes = loads.parallelStream().map(load -> load.slope(orders)).toList();
    }
    lastChange = change;
  }

  /** The step from x, where the loads answer g. */
  double[] step(double[] x, double[] g) {
    double[] residual = new double[x.length];
    for (int i = 0; i < x.length; i++) {
      residual[i] = g[i] - x[i];
    }
    return new Gmres(this::product, LINEAR_TOLERANCE, MOST_PRODUCTS).solve(residual);
  }

  /** into = y - J·(S - Z)·y, and of the filters y less their answer. */
  private void product(double[] y, double[] into) {
    IntStream.range(0, orders.count()).parallel().forEach(k -> respond(k, y));
    System.arraycopy(y, 0, into, 0, y.length);
    IntStream.range(0, loads.size())
        .parallel()
        .forEach(
            d -> slopes.get(d).subtractProduct(emf(loads.get(d), y), into, loads.get(d).offset()));
    filters.forEach(filter -> filter.subtractAnswer(orders, responses, y, into));
  }

  private void respond(int position, double[] y) {
    int h = orders.at(position);
    Excitation excitation = excitations[h].clear();
    for (DevicePort load : loads) {
      for (int port = 0; port < load.ports(); port++) {
        int at = load.offset() + 2 * (port * orders.count() + position);
        load.draw(excitation, port, y[at], y[at + 1]);
      }
    }
    filters.forEach(filter -> filter.feed(excitation, orders, position, y));
    factors[h].solve(excitation, responses[h]);
  }

  /**
   * The change of the electromotive force before a load: of its voltage, and over its series R-L.
   */
  private double[] emf(DevicePort load, double[] y) {
    double[] emf = new double[load.length(orders)];
    int at = 0;
    for (int port = 0; port < load.ports(); port++) {
      for (int k = 0; k < orders.count(); k++) {
        int h = orders.at(k);
        double re = y[load.offset() + at];
        double im = y[load.offset() + at + 1];
        double reactance = h * omega * load.seriesHenry();
        emf[at] = load.voltageRe(port, responses[h]) + load.seriesOhm() * re - reactance * im;
        emf[at + 1] = load.voltageIm(port, responses[h]) + load.seriesOhm() * im + reactance * re;
        at += 2;
      }
    }
    return emf;
  }
}
