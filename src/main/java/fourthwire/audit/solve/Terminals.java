package fourthwire.audit.solve;

import fourthwire.network.Excitation;
import fourthwire.network.OrderSolution;
import fourthwire.network.TreeNetwork;

/** Where a load meets the network: it takes its voltages there, and draws its current. */
final class Terminals {
  private final int[] from;
  private final int to;
  private final double weight;
  private double[] voltage = new double[0];
  private double[] standing = new double[0];
  private double movedV;

  /**
   * Terminals at a place.
   *
   * @param weight how many loads alike draw there
   */
  Terminals(PortPlace place, double weight, TreeNetwork network) {
    this.from = place.fromIndices(network);
    this.to = place.toIndex(network);
    this.weight = weight;
  }

  int ports() {
    return from.length;
  }

  double weight() {
    return weight;
  }

  /** Voltage of one port in one order's solution, real part. */
  double re(int port, OrderSolution s) {
    return s.potentialRe(from[port]) - (to == PortPlace.NONE ? 0 : s.potentialRe(to));
  }

  /** Likewise, imaginary part. */
  double im(int port, OrderSolution s) {
    return s.potentialIm(from[port]) - (to == PortPlace.NONE ? 0 : s.potentialIm(to));
  }

  /** Draws a current at one port: out of the line, back into the return conductor. */
  void draw(Excitation excitation, int port, double re, double im) {
    excitation.inject(from[port], -weight * re, -weight * im);
    if (to != PortPlace.NONE) {
      excitation.inject(to, weight * re, weight * im);
    }
  }

  /** From now on solutions tell how much the voltages differ from those taken last. */
  void standHere() {
    standing = voltage.clone();
  }

  /** From now on solutions tell the voltages. */
  void standAnywhere() {
    standing = new double[0];
  }

  /** Takes the voltages of the solved orders. */
  void take(OrdersInPlay orders, OrderSolution[] solutions) {
    voltage = voltage.length == 0 ? new double[2 * from.length * orders.count()] : voltage;
    double moved = 0;
    int at = 0;
    for (int port = 0; port < from.length; port++) {
      for (int k = 0; k < orders.count(); k++) {
        OrderSolution s = solutions[orders.at(k)];
        double re = re(port, s) + (standing.length == 0 ? 0 : standing[at]);
        double im = im(port, s) + (standing.length == 0 ? 0 : standing[at + 1]);
        moved = Math.max(moved, Math.hypot(re - voltage[at], im - voltage[at + 1]));
        voltage[at++] = re;
        voltage[at++] = im;
      }
    }
    movedV = moved;
  }

  /** A copy of the voltages taken last, port by port, order by order, both parts of a phasor. */
  double[] voltage() {
    return voltage.clone();
  }

  /** The largest change of a voltage of one order since the pass before, volts. */
  double movedV() {
    return movedV;
  }
}
