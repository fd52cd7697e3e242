package fourthwire.audit.solve;

import fourthwire.audit.plan.Numbering;
import fourthwire.network.OrderSolution;
import fourthwire.network.TreeNetwork;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Spectrum;
import java.util.List;
import java.util.Map;

/** The solved network of a site: potentials and feeding currents of every node at every order. */
public final class SiteSolution {
  private final TreeNetwork network;
  private final OrdersInPlay orders;
  private final OrderSolution[] solutions;
  private final Map<String, List<String>> remarks;

  /**
   * Holds solved orders.
   *
   * @param solutions by whole order; those in play are there
   * @param remarks what has to be known of loads' currents, in sentences, by circuit
   */
  public SiteSolution(
      TreeNetwork network,
      OrdersInPlay orders,
      OrderSolution[] solutions,
      Map<String, List<String>> remarks) {
    this.network = network;
    this.orders = orders;
    this.solutions = solutions.clone();
    this.remarks = Map.copyOf(remarks);
  }

  /** What has to be known of the currents that the loads of a circuit draw, in sentences. */
  public List<String> remarks(String circuit) {
    return remarks.getOrDefault(circuit, List.of());
  }

  /** Potential to earth of a conductor of a network node, volts. */
  public Spectrum potential(int networkNode, int conductor) {
    int index = network.index(networkNode, conductor);
    double[] re = new double[Spectrum.HIGHEST_ORDER + 1];
    double[] im = new double[Spectrum.HIGHEST_ORDER + 1];
    for (int k = 0; k < orders.count(); k++) {
      int h = orders.at(k);
      re[h] = solutions[h].potentialRe(index);
      im[h] = solutions[h].potentialIm(index);
    }
    return Spectrum.of(re, im);
  }

  /**
   * Current of a node's conductor in the contract's sense: lines from source to load, the neutral
   * from load to source, amps.
   */
  public Spectrum current(int networkNode, Numbering conductors, Conductor conductor) {
    int index = network.index(networkNode, conductors.of(conductor));
    double sign = conductor.isLine() ? 1 : -1;
    double[] re = new double[Spectrum.HIGHEST_ORDER + 1];
    double[] im = new double[Spectrum.HIGHEST_ORDER + 1];
    for (int k = 0; k < orders.count(); k++) {
      int h = orders.at(k);
      re[h] = sign * solutions[h].currentRe(index);
      im[h] = sign * solutions[h].currentIm(index);
    }
    return Spectrum.of(re, im);
  }
}
