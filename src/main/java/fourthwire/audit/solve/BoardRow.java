package fourthwire.audit.solve;

import fourthwire.network.TreeNetwork;
import java.util.Arrays;
import java.util.stream.IntStream;

/**
 * How potentials and currents of some boards stand in one row of numbers: conductor by conductor,
 * order by order, both parts of a phasor.
 */
final class BoardRow {
  private final int[] nodes;
  private final int[] conductors;
  private final int[] startOf;
  private final int perConductor;

  BoardRow(TreeNetwork network, OrdersInPlay orders, IntStream nodes) {
    this.nodes = nodes.distinct().sorted().toArray();
    this.perConductor = 2 * orders.count();
    this.conductors =
        IntStream.of(this.nodes)
            .flatMap(n -> IntStream.range(0, network.conductors(n)).map(c -> network.index(n, c)))
            .toArray();
    this.startOf = new int[network.conductors()];
    Arrays.fill(startOf, -1);
    for (int k = 0; k < conductors.length; k++) {
      startOf[conductors[k]] = k * perConductor;
    }
  }

  IntStream nodes() {
    return IntStream.of(nodes);
  }

  /** Which board of the row a node is. */
  int position(int node) {
    return Arrays.binarySearch(nodes, node);
  }

  /** How many conductors there are. */
  int count() {
    return conductors.length;
  }

  /** The conductor at a position, by its index in the network. */
  int conductor(int position) {
    return conductors[position];
  }

  int perConductor() {
    return perConductor;
  }

  int length() {
    return perConductor * conductors.length;
  }

  /** Where a conductor of the network begins, or -1. */
  int start(int conductor) {
    return startOf[conductor];
  }
}
