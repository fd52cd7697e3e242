package fourthwire.network;

import java.util.BitSet;
import java.util.stream.IntStream;

/**
 * Some nodes of a network and all that feeds them. Where currents are injected there only, and
 * potentials are asked for there only, a factored order is swept over these nodes alone ({@link
 * FactoredOrder#solve(Excitation, OrderSolution, Trunk)}): what hangs beside them is eliminated
 * already. Immutable.
 */
public final class Trunk {
  private final TreeNetwork network;

  /** Where they stand in the layout, parents first. */
  final int[] nodes;

  private Trunk(TreeNetwork network, int[] nodes) {
    this.network = network;
    this.nodes = nodes;
  }

  /** The trunk that reaches these nodes. */
  public static Trunk of(TreeNetwork network, IntStream reached) {
    BitSet in = new BitSet(network.nodes());
    in.set(TreeNetwork.SOURCE);
    reached.forEach(
        node -> {
          for (int n = node; !in.get(n); n = network.parent(n)) {
            in.set(n);
          }
        });
    return new Trunk(
        network, in.stream().map(n -> network.layout().position[n]).sorted().toArray());
  }

  /** The network this is a part of. */
  public TreeNetwork network() {
    return network;
  }
}
