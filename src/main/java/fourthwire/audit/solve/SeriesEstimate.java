package fourthwire.audit.solve;

import fourthwire.network.DrivingPoints;
import fourthwire.network.Excitation;
import fourthwire.network.FactoredOrder;
import fourthwire.network.OrderSolution;
import fourthwire.network.TreeNetwork;
import fourthwire.quantity.Phasor;
import java.util.Arrays;
import java.util.List;

/**
 * The series R-L that each load sees of the network: what it is solved behind. It only shapes the
 * way of the iteration to its end (and what little of a current lies above order 50, where loads
 * are not solved together, {@link JointLoads}).
 *
 * <p>Together: every load injects a current in proportion to its size, in step with its own
 * voltage; what voltage that makes at a load, over its own current, is the impedance that acts on
 * it: its own feeder's once, a shared riser's as often as loads share it, the neutral's thrice for
 * triplen orders. That makes a good first guess of all currents at once. Alone: the driving-point
 * impedance, at the load and at its group, which leaves Newton's equations well conditioned. The
 * median over a few low orders is taken, so that a resonance at one of them does not count.
 */
final class SeriesEstimate {
  private static final int[] ORDERS = {1, 3, 5, 7, 9, 11, 13};

  private final TreeNetwork network;
  private final FactoredOrder[] factors;
  private final List<DevicePort> ports;
  private final double omega;
  private final Workers workers;

  SeriesEstimate(
      TreeNetwork network,
      FactoredOrder[] factors,
      List<DevicePort> ports,
      double omega,
      Workers workers) {
    this.network = network;
    this.factors = factors;
    this.ports = ports;
    this.omega = omega;
    this.workers = workers;
  }

  /**
   * Sets every load's series R-L as it acts on the load alone; on one that speaks for many, as it
   * acts on them together.
   */
  void applyAlone() {
    double[][] whole = new double[2 * ports.size()][ORDERS.length];
    double[][] shared = new double[2 * ports.size()][ORDERS.length];
    look(
        (k, points, d) -> {
          DevicePort port = ports.get(d);
          Phasor above = port.group().impedance(points.at(port.group().node()));
          Phasor home = port.home().impedance(points.at(port.home().node()));
          put(home.plus(above.times(port.weight() - 1)), d, k, whole);
          put(above.times(port.weight()), d, k, shared);
        });
    for (int d = 0; d < ports.size(); d++) {
      ports
          .get(d)
          .setSeries(
              new SeriesOhms(median(whole[2 * d]), median(whole[2 * d + 1])),
              new SeriesOhms(median(shared[2 * d]), median(shared[2 * d + 1])));
    }
  }

  /** Called for the number of an order, the network's impedances there, the number of a load. */
  private interface Look {
    void at(int k, DrivingPoints points, int load);
  }

  private void look(Look look) {
    workers.each(
        ORDERS.length,
        k -> {
          DrivingPoints points = factors[ORDERS[k]].drivingPoints();
          for (int d = 0; d < ports.size(); d++) {
            look.at(k, points, d);
          }
        });
  }

  private void put(Phasor z, int load, int k, double[][] ohmAndHenry) {
    ohmAndHenry[2 * load][k] = z.re();
    ohmAndHenry[2 * load + 1][k] = z.im() / (ORDERS[k] * omega);
  }

  /**
   * Sets every load's series R-L as it acts when all draw together.
   *
   * @param unloaded the fundamental solution with no load injecting
   */
  void applyTogether(OrderSolution unloaded) {
    double[] angle = ports.stream().mapToDouble(p -> angle(p, unloaded)).toArray();
    double[][] ohm = new double[ports.size()][ORDERS.length];
    double[][] henry = new double[ports.size()][ORDERS.length];
    for (int k = 0; k < ORDERS.length; k++) {
      int h = ORDERS[k];
      OrderSolution response = respond(factors[h], h, angle);
      for (int d = 0; d < ports.size(); d++) {
        DevicePort port = ports.get(d);
        double size = port.device().roughA();
        double turn = h * angle[d];
        double re = -port.terminals().re(0, response) / size;
        double im = -port.terminals().im(0, response) / size;
        ohm[d][k] = counts(port, h) ? re * Math.cos(turn) + im * Math.sin(turn) : Double.NaN;
        henry[d][k] =
            counts(port, h)
                ? (im * Math.cos(turn) - re * Math.sin(turn)) / (h * omega)
                : Double.NaN;
      }
    }
    for (int d = 0; d < ports.size(); d++) {
      ports.get(d).setSeries(new SeriesOhms(median(ohm[d]), median(henry[d])), SeriesOhms.NONE);
    }
  }

  /** A load on three lines without a neutral has no triplen orders. */
  private static boolean counts(DevicePort port, int order) {
    return port.ports() == 1 || order % 3 != 0;
  }

  private OrderSolution respond(FactoredOrder factor, int order, double[] angle) {
    Excitation excitation = network.excitation();
    for (int d = 0; d < ports.size(); d++) {
      DevicePort port = ports.get(d);
      if (counts(port, order)) {
        double size = port.device().roughA();
        for (int line = 0; line < port.ports(); line++) {
          double turn = order * (angle[d] - line * 2 * Math.PI / 3);
          port.terminals().draw(excitation, line, size * Math.cos(turn), size * Math.sin(turn));
        }
      }
    }
    return factor.solve(excitation);
  }

  private static double angle(DevicePort port, OrderSolution s) {
    return Math.atan2(port.terminals().im(0, s), port.terminals().re(0, s));
  }

  /** The median of the numbers among the values, 0 if it is negative. */
  private static double median(double[] values) {
    double[] sorted = Arrays.stream(values).filter(v -> !Double.isNaN(v)).sorted().toArray();
    return Math.max(0, sorted[sorted.length / 2]);
  }
}
