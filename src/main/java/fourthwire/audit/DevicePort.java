package fourthwire.audit;

import fourthwire.load.LoadSolver;
import fourthwire.load.NoSteadyStateException;
import fourthwire.load.PortSpectra;
import fourthwire.network.Excitation;
import fourthwire.network.OrderSolution;
import fourthwire.network.TreeNetwork;
import fourthwire.quantity.Conductor;
import java.util.List;

/**
 * One load at its place in the network while the two are solved together: a mutable work block, for
 * one thread at a time.
 */
final class DevicePort {
  private static final int NONE = -1;

  private final Device device;
  private final int[] from;
  private final int to;
  private final LoadSolver solver;
  private final PortSpectra voltage;
  private final PortSpectra emf;
  private final PortSpectra drawn;
  private final int offset;
  private double seriesOhm;
  private double seriesHenry;
  private double voltageMovedV;
  private String failure = "";

  private DevicePort(Device device, int[] from, int to, int offset) {
    this.device = device;
    this.from = from;
    this.to = to;
    this.offset = offset;
    this.solver = device.model().newSolver();
    this.voltage = new PortSpectra(from.length);
    this.emf = new PortSpectra(from.length);
    this.drawn = new PortSpectra(from.length);
  }

  /**
   * The load at its place.
   *
   * @param offset where its currents start in the whole state
   */
  static DevicePort of(Device device, NetworkPlan plan, int offset) {
    LoadPlacement placement = device.placement();
    Place place = plan.get(placement.circuit());
    int[] from = placement.from().stream().mapToInt(c -> index(plan.network(), place, c)).toArray();
    List<Conductor> to = placement.to();
    return new DevicePort(
        device, from, to.isEmpty() ? NONE : index(plan.network(), place, to.get(0)), offset);
  }

  private static int index(TreeNetwork network, Place place, Conductor conductor) {
    return network.index(place.networkNode(), place.conductors().of(conductor));
  }

  Device device() {
    return device;
  }

  int ports() {
    return from.length;
  }

  int offset() {
    return offset;
  }

  double nominalV() {
    return device.placement().request().nominalPortV();
  }

  void setSeries(double ohm, double henry) {
    seriesOhm = ohm;
    seriesHenry = henry;
  }

  /** The largest change of a voltage of one order since the pass before, volts. */
  double voltageMovedV() {
    return voltageMovedV;
  }

  /** Why the last solution failed; empty if it did not. */
  String failure() {
    return failure;
  }

  /** Voltage of one port in one order's solution, real part. */
  double voltageRe(int port, OrderSolution s) {
    return s.potentialRe(from[port]) - (to == NONE ? 0 : s.potentialRe(to));
  }

  /** Likewise, imaginary part. */
  double voltageIm(int port, OrderSolution s) {
    return s.potentialIm(from[port]) - (to == NONE ? 0 : s.potentialIm(to));
  }

  /** Draws a current at one port: out of the line, back into the return conductor. */
  void draw(Excitation excitation, int port, double re, double im) {
    excitation.inject(from[port], -re, -im);
    if (to != NONE) {
      excitation.inject(to, re, im);
    }
  }

  /** Takes the voltages of the solved orders. */
  void takeVoltages(OrdersInPlay orders, OrderSolution[] solutions) {
    double moved = 0;
    for (int port = 0; port < from.length; port++) {
      for (int k = 0; k < orders.count(); k++) {
        int h = orders.at(k);
        double re = voltageRe(port, solutions[h]);
        double im = voltageIm(port, solutions[h]);
        moved = Math.max(moved, Math.hypot(re - voltage.re[port][h], im - voltage.im[port][h]));
        voltage.re[port][h] = re;
        voltage.im[port][h] = im;
      }
    }
    voltageMovedV = moved;
  }

  /**
   * Solves the load at the voltages taken.
   *
   * @param x the whole state, amps: what it drew when these voltages were solved
   * @param g receives what it draws now, in its place
   */
  void solve(OrdersInPlay orders, double omega, double[] x, double[] g) {
    int at = offset;
    for (int port = 0; port < from.length; port++) {
      for (int k = 0; k < orders.count(); k++) {
        int h = orders.at(k);
        double reactance = h * omega * seriesHenry;
        emf.re[port][h] = voltage.re[port][h] + seriesOhm * x[at] - reactance * x[at + 1];
        emf.im[port][h] = voltage.im[port][h] + seriesOhm * x[at + 1] + reactance * x[at];
        at += 2;
      }
    }
    failure = "";
    try {
      solver.solve(emf, seriesOhm, seriesHenry, drawn);
    } catch (NoSteadyStateException e) {
      failure = String.valueOf(e.getMessage());
      return;
    }
    at = offset;
    for (int port = 0; port < from.length; port++) {
      for (int k = 0; k < orders.count(); k++) {
        int h = orders.at(k);
        g[at++] = drawn.re[port][h];
        g[at++] = drawn.im[port][h];
      }
    }
  }
}
