package fourthwire.network;

/**
 * A network eliminated at one order, to be solved for any number of excitations. Immutable: several
 * threads may solve at once, each with its own excitation and solution.
 */
public final class FactoredOrder {
  private final TreeNetwork network;
  private final double order;
  private final Elimination factors;
  private final Sweep sweep;

  FactoredOrder(TreeNetwork network, double order) {
    this.network = network;
    this.order = order;
    factors = new Elimination(network.layout(), network.plan(), order);
    factors.run();
    sweep = new Sweep(network.layout(), network.plan(), factors);
  }

  /** The order. */
  public double order() {
    return order;
  }

  /** Solves for an excitation, into a new solution. */
  public OrderSolution solve(Excitation excitation) {
    OrderSolution solution = new OrderSolution(network);
    solve(excitation, solution);
    return solution;
  }

  /**
   * Solves for an excitation, into a solution of the same network made before; nothing is
   * allocated.
   */
  public void solve(Excitation excitation, OrderSolution into) {
    requireOwn(excitation, into);
    sweep.run(excitation, into);
  }

  /**
   * Solves where currents are injected at nodes of a trunk only: potentials and currents of those
   * nodes, in linear time of their number. What the excitation and the solution hold of all other
   * nodes is neither read nor written.
   */
  public void solve(Excitation excitation, OrderSolution into, Trunk trunk) {
    requireOwn(excitation, into);
    sweep.run(excitation, into, trunk);
  }

  /** The impedance between a node's conductors and earth, as an injected current meets it. */
  public DrivingPoint drivingPoint(int node) {
    return new ImpedanceWalk(network.layout(), network.plan(), factors)
        .at(network.layout().position[node]);
  }

  /** The driving-point impedances of every node, in linear time. */
  public DrivingPoints drivingPoints() {
    return new DrivingPoints(
        network.layout(), new ImpedanceWalk(network.layout(), network.plan(), factors));
  }

  /** Kirchhoff's laws and the balance of power of a solution of this order. */
  public SolutionCheck check(Excitation excitation, OrderSolution solution) {
    requireOwn(excitation, solution);
    return SolutionCheck.of(network.layout(), factors, order, excitation, solution);
  }

  private void requireOwn(Excitation excitation, OrderSolution solution) {
    if (excitation.network() != network || solution.network() != network) {
      throw new IllegalArgumentException("the excitation or the solution is another network's");
    }
  }
}
