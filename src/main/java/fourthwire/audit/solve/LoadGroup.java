package fourthwire.audit.solve;

import java.util.List;

/**
 * Loads that hang on the same conductors of one board, each behind its own circuit: to the network
 * above they are one. Their slopes add up here, so that Newton's equations have a few unknowns a
 * board, however many circuits it has.
 */
final class LoadGroup {
  private final PlaceSlope slope;
  private final List<DevicePort> members;

  LoadGroup(PlaceSlope slope, List<DevicePort> members) {
    this.slope = slope;
    this.members = members;
    members.stream().filter(DevicePort::hasSlope).forEach(load -> load.slope().forgetAdded());
  }

  PlaceSlope slope() {
    return slope;
  }

  /**
   * Takes in the members' slopes, and adds up what they would draw more if the voltage here stood
   * still.
   *
   * @param alone receives that, member by member, in the whole state
   */
  double[] gather(OrdersInPlay orders, double omega, double[] x, double[] g, double[] alone) {
    if (!members.stream().allMatch(member -> member.slope().isAdded())) {
      slope.clear();
      members.forEach(member -> member.slope().forgetAdded());
    }
    double[] total = new double[slope.size()];
    for (DevicePort member : members) {
      double[] step = member.stepAlone(orders, omega, x, g);
      System.arraycopy(step, 0, alone, member.offset(), step.length);
      for (int i = 0; i < total.length; i++) {
        total[i] += member.weight() * step[i];
      }
      slope.add(orders, member.slope(), member.weight());
    }
    return total;
  }

  /** step += each member's slope times the voltage here. */
  void spread(OrdersInPlay orders, double[] potentials, double[] step) {
    double[] volts = slope.voltages(potentials);
    double[] answer = new double[volts.length];
    for (DevicePort member : members) {
      member.slope().multiply(orders, volts, answer);
      for (int i = 0; i < answer.length; i++) {
        step[member.offset() + i] += answer[i];
      }
    }
  }
}
