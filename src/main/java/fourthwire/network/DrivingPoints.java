package fourthwire.network;

/**
 * The driving-point impedances of every node at one order. Those of nodes that feed others are
 * worked out at once, the many leaves' when they are asked for.
 */
public final class DrivingPoints {
  private static final double[] LEAF = {};

  private final Layout layout;
  private final ImpedanceWalk walk;
  private final double[][] ohm;

  DrivingPoints(Layout layout, ImpedanceWalk walk) {
    this.layout = layout;
    this.walk = walk;
    ohm = new double[layout.nodes][];
    ohm[0] = walk.source();
    for (int n = 1; n < layout.nodes; n++) {
      int feeding = layout.parent[n];
      if (ohm[feeding].length == 0) {
        ohm[feeding] = walk.step(feeding, ohm[layout.parent[feeding]]);
      }
      ohm[n] = LEAF;
    }
  }

  /** The impedance at a node. */
  public DrivingPoint at(int node) {
    int n = layout.position[node];
    double[] known = ohm[n];
    return new DrivingPoint(
        known.length == 0 ? walk.step(n, ohm[layout.parent[n]]) : known, layout.size(n));
  }
}
