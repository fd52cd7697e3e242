package fourthwire.load.model;

import java.util.List;

/** Finds the injected current of one load model, again and again as its voltage settles. */
public interface LoadSolver {
  /**
   * Solves the periodic steady state of the equipment behind a series R-L in each line.
   *
   * <p>The electromotive force e and the series R-L stand for the network as its node shows it
   * (Thevenin). With R = L = 0, e is the terminal voltage itself. The result is the current at
   * which e - (R + jhωL)·i is the terminal voltage that draws i.
   *
   * @param emf electromotive force by port and order, rms volts
   * @param seriesOhm series resistance per line, ohms (0 or more); for one port the whole loop's
   * @param seriesHenry series inductance likewise, henries
   * @param current receives the current into each port, rms amps, and its direct component where it
   *     has one
   * @throws NoSteadyStateException where the equipment asks for more than the source can give, or
   *     the solution does not converge
   */
  void solve(PortSpectra emf, double seriesOhm, double seriesHenry, PortSpectra current);

  /**
   * What a reader has to know of the current last solved, in sentences; none as a rule. Nothing is
   * given in silence that holds under a condition only.
   */
  default List<String> remarks() {
    return List.of();
  }
}
