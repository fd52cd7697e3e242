package fourthwire.network;

/**
 * A network eliminated at one order, to be solved for any number of excitations. Immutable: several
 * threads may solve at once, each with its own excitation and solution.
 */
public final class FactoredOrder {
  private final Layout layout;
  private final double order;
  private final Elimination factors;
  private final Sweep sweep;

  FactoredOrder(Layout layout, double order) {
    this.layout = layout;
    this.order = order;
    factors = new Elimination(layout, order);
    factors.run();
    sweep = new Sweep(layout, factors);
  }

  /** The order. */
  public double order() {
    return order;
  }

  /** Solves for an excitation, into a new solution. */
  public OrderSolution solve(Excitation excitation) {
    OrderSolution solution = new OrderSolution(excitation.network(), layout.largest);
    solve(excitation, solution);
    return solution;
  }

  /**
   * Solves for an excitation, into a solution of the same network made before; nothing is
   * allocated.
   */
  public void solve(Excitation excitation, OrderSolution into) {
    if (excitation.network().layout() != layout || into.network().layout() != layout) {
      throw new IllegalArgumentException("the excitation or the solution is another network's");
    }
    sweep.run(excitation, into);
  }

  /** The impedance between a node's conductors and earth, as an injected current meets it. */
  public DrivingPoint drivingPoint(int node) {
    return new DrivingPoints(layout, factors).at(node);
  }

  /** The driving-point impedances of every node, worked out once, in linear time. */
  public DrivingPoints drivingPoints() {
    DrivingPoints all = new DrivingPoints(layout, factors);
    all.all();
    return all;
  }

  /** Kirchhoff's laws and the balance of power of a solution of this order. */
  public SolutionCheck check(Excitation excitation, OrderSolution solution) {
    return SolutionCheck.of(layout, factors, order, excitation, solution);
  }
}
