package fourthwire.network;

import java.util.stream.IntStream;

/**
 * A radial network: a source, and a tree of nodes behind feeders and transformers, with linear
 * elements at the nodes. Immutable; different orders may be factored by different threads at once.
 */
public final class TreeNetwork {
  /** The number of the source's terminals. */
  public static final int SOURCE = 0;

  private final Layout layout;
  private final Plan plan;

  TreeNetwork(Layout layout) {
    this.layout = layout;
    plan = new Plan(layout);
  }

  /** How many nodes there are, the source's terminals included. */
  public int nodes() {
    return layout.nodes;
  }

  /** How many conductors a node has. */
  public int conductors(int node) {
    return layout.size(layout.position[node]);
  }

  /** How many conductors all nodes have together. */
  public int conductors() {
    return layout.conductors();
  }

  /** The node that feeds this one; the source's terminals have none. */
  public int parent(int node) {
    if (node == SOURCE) {
      throw new IllegalArgumentException("nothing feeds the source's terminals");
    }
    return layout.number[layout.parent[layout.position[node]]];
  }

  /** Whether a feeder feeds the node: not a transformer, and not the source itself. */
  public boolean isFedByFeeder(int node) {
    return layout.isFeeder(layout.position[node]);
  }

  /** Whether a feeder without any impedance feeds the node: the two are one point. */
  public boolean isJoined(int node) {
    int position = layout.position[node];
    return layout.isFeeder(position)
        && IntStream.range(layout.first[position], layout.first[position + 1])
            .allMatch(c -> layout.resistance[c] == 0 && layout.reactance[c] == 0);
  }

  /**
   * The conductor of the feeding node, by its number there, that a feeder's conductor begins at.
   */
  public int joinedTo(int node, int conductor) {
    int at = index(node, conductor);
    if (!isFedByFeeder(node)) {
      throw new IllegalArgumentException("node " + node + " is not fed by a feeder");
    }
    return layout.joinedTo[at] - layout.first[layout.parent[layout.position[node]]];
  }

  /**
   * Where a node's conductor stands among all conductors of the network: for hot loops that read
   * and write by index.
   */
  public int index(int node, int conductor) {
    int position = layout.position[node];
    int at = layout.first[position] + conductor;
    if (conductor < 0 || at >= layout.first[position + 1]) {
      throw new IllegalArgumentException(
          "node %d has no conductor %d; it has %d, counted from 0"
              .formatted(node, conductor, layout.size(position)));
    }
    return at;
  }

  /**
   * Eliminates the network at one order, from the leaves to the source.
   *
   * @param order above 0, also between whole orders
   * @throws UnsolvableOrderException if the network has no unique solution at this order
   */
  public FactoredOrder factor(double order) {
    if (!(order > 0) || Double.isInfinite(order)) {
      throw new IllegalArgumentException("order " + order + ": it is above 0");
    }
    return new FactoredOrder(this, order);
  }

  /** An excitation of this network that is zero everywhere. */
  public Excitation excitation() {
    return new Excitation(this, layout.size(SOURCE));
  }

  /** See {@link Layout#coupling}. */
  double coupling(int node, int k, int m) {
    return layout.coupling(layout.position[node], k, m);
  }

  Layout layout() {
    return layout;
  }

  Plan plan() {
    return plan;
  }
}
