package fourthwire.audit.solve;

import fourthwire.network.Excitation;
import fourthwire.network.OrderSolution;
import fourthwire.network.TreeNetwork;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * Loads that hang on the same conductors of one board, each behind its own circuit: to the network
 * above they are one. Their slopes add up here, so that Newton's equations have a few unknowns a
 * board, however many circuits it has.
 */
final class LoadGroup {
  private final int[] from;
  private final int to;
  private final int offset;
  private final int size;
  private final List<DevicePort> members = new ArrayList<>();
  private final float[] byColumn;

  /**
   * An empty group.
   *
   * @param port where the members' circuits begin
   * @param offset where its currents start among those of all groups
   */
  LoadGroup(PortPlace port, TreeNetwork network, OrdersInPlay orders, int offset) {
    this.from = port.fromIndices(network);
    this.to = port.toIndex(network);
    this.offset = offset;
    this.size = 2 * from.length * orders.count();
    this.byColumn = new float[size * size];
  }

  void add(DevicePort member) {
    members.add(member);
  }

  /** Forgets all slopes: the members have new ones. */
  void forget() {
    Arrays.fill(byColumn, 0);
  }

  int size() {
    return size;
  }

  /**
   * Takes in the members' slopes, and adds up what they would draw more if the voltage here stood
   * still.
   *
   * @param alone receives that, member by member, in the whole state
   * @param sum receives it in all, among the groups' currents
   */
  void gather(
      OrdersInPlay orders, double omega, double[] x, double[] g, double[] alone, double[] sum) {
    double[] total = new double[size];
    for (DevicePort member : members) {
      double[] step = member.stepAlone(orders, omega, x, g);
      System.arraycopy(step, 0, alone, member.offset(), size);
      for (int i = 0; i < size; i++) {
        total[i] += step[i];
      }
      member.slope().addTo(orders, byColumn);
    }
    System.arraycopy(total, 0, sum, offset, size);
  }

  /** Draws its current of the order at this position, out of the groups' currents. */
  void draw(Excitation excitation, OrdersInPlay orders, int position, double[] currents) {
    for (int port = 0; port < from.length; port++) {
      int at = offset + 2 * (port * orders.count() + position);
      excitation.inject(from[port], -currents[at], -currents[at + 1]);
      if (to >= 0) {
        excitation.inject(to, currents[at], currents[at + 1]);
      }
    }
  }

  /** into = currents - slope·voltage, both its part of all groups' currents. */
  void balance(OrdersInPlay orders, OrderSolution[] response, double[] currents, double[] into) {
    double[] volts = voltages(orders, response);
    float[] answer = new float[size];
    for (int column = 0; column < size; column++) {
      float factor = (float) volts[column];
      int start = column * size;
      for (int row = 0; row < size; row++) {
        answer[row] += factor * byColumn[start + row];
      }
    }
    for (int i = 0; i < size; i++) {
      into[offset + i] = currents[offset + i] - answer[i];
    }
  }

  /** step += each member's slope times the voltage here. */
  void spread(OrdersInPlay orders, OrderSolution[] response, double[] step) {
    double[] volts = voltages(orders, response);
    double[] answer = new double[size];
    for (DevicePort member : members) {
      member.slope().multiply(orders, volts, answer);
      for (int i = 0; i < size; i++) {
        step[member.offset() + i] += answer[i];
      }
    }
  }

  private double[] voltages(OrdersInPlay orders, OrderSolution[] response) {
    double[] volts = new double[size];
    int at = 0;
    for (int line : from) {
      for (int k = 0; k < orders.count(); k++) {
        OrderSolution s = response[orders.at(k)];
        volts[at++] = s.potentialRe(line) - (to < 0 ? 0 : s.potentialRe(to));
        volts[at++] = s.potentialIm(line) - (to < 0 ? 0 : s.potentialIm(to));
      }
    }
    return volts;
  }
}
