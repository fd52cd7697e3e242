package fourthwire.load.model;

import java.util.List;

/**
 * Finds the injected currents of several loads that feel each other through what they share of the
 * network, beyond the orders that the network is solved for.
 *
 * <p>Loads that draw their current in pulses and have little impedance of their own shape each
 * other's pulses: where one starts to conduct, the voltage at the others breaks within
 * microseconds. So they are solved together in time, as {@link LoadSolver} does one.
 */
public interface JointSolver {
  /**
   * How much one of the loads feels the others: what part of its current they make, just above the
   * orders that networks are solved for. Well under 1 it may be solved for itself, behind its own
   * port.
   */
  double felt(int load, SharedSource source);

  /**
   * How much of the impedance before a load is common to all: where it is little the others hardly
   * feel that load.
   */
  double common(int load, SharedSource source);

  /**
   * Solves the periodic steady state of the loads behind what they share of the network.
   *
   * @param emf electromotive force of each load, rms volts
   * @param source what stands before them: e - (R + jhωL)·i is what is left at their ports
   * @param current receives the current into each load, rms amps
   * @throws NoSteadyStateException as {@link LoadSolver#solve}
   */
  void solve(PortSpectra[] emf, SharedSource source, PortSpectra[] current);

  /** As {@link LoadSolver#remarks}, of all. */
  default List<String> remarks() {
    return List.of();
  }
}
