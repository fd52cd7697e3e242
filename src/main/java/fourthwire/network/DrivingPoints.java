package fourthwire.network;

/** The driving-point impedances of every node at one order. */
public final class DrivingPoints {
  private final Layout layout;
  private final double[][] ohm;

  DrivingPoints(Layout layout, ImpedanceWalk walk) {
    this.layout = layout;
    ohm = new double[layout.nodes][];
    ohm[0] = walk.source();
    for (int n = 1; n < layout.nodes; n++) {
      ohm[n] = walk.step(n, ohm[layout.parent[n]]);
    }
  }

  /** The impedance at a node. */
  public DrivingPoint at(int node) {
    return new DrivingPoint(ohm[node], layout.size(node));
  }
}
