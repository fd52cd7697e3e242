package fourthwire.network;

import fourthwire.network.element.FeederConductor;
import fourthwire.network.element.SeriesImpedance;
import fourthwire.network.element.Shunt;
import fourthwire.network.element.SourceImpedance;
import fourthwire.network.element.Transformer;
import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Collection;
import java.util.Deque;
import java.util.List;
import java.util.stream.IntStream;

/**
 * The network as flat arrays: what every order shares. Nodes stand depth first, each with its
 * leaves right behind it, so that a sweep goes through memory as it goes through the tree.
 * Conductors of all nodes stand in one row; node n has those from {@code first[n]} to {@code
 * first[n + 1]}.
 */
final class Layout {
  final SourceImpedance source;
  final int nodes;

  /** Where each node stands, by its number as it was added. */
  final int[] position;

  /** The number of the node that stands here, as it was added. */
  final int[] number;

  final int[] parent;
  final int[] first;

  /** For a feeder's conductors: the conductor of the feeding node each is joined to. */
  final int[] joinedTo;

  final double[] resistance;
  final double[] reactance;

  /** For a feeder's conductors: which of {@link #laws} their impedance follows. */
  final int[] law;

  final NetworkBuilder.Laws[] laws;

  /** Index into {@link #transformers}, or -1 for the root and for feeders. */
  final int[] transformerOf;

  final Transformer[] transformers;

  /** Every transformer's real matrix from its primary's to its secondary's potentials. */
  final double[][] turns;

  /** Node n has the shunts from {@code firstShunt[n]} to {@code firstShunt[n + 1]}. */
  final int[] firstShunt;

  final Shunt[] shunts;

  Layout(
      SourceImpedance source,
      List<NetworkBuilder.Draft> drafts,
      Collection<NetworkBuilder.Laws> laws) {
    this.source = source;
    this.laws = laws.toArray(NetworkBuilder.Laws[]::new);
    nodes = drafts.size();
    number = depthFirst(drafts);
    position = new int[nodes];
    for (int n = 0; n < nodes; n++) {
      position[number[n]] = n;
    }
    parent =
        IntStream.of(number)
            .map(k -> drafts.get(k).parent())
            .map(up -> up < 0 ? up : position[up])
            .toArray();
    first = new int[nodes + 1];
    firstShunt = new int[nodes + 1];
    transformerOf = new int[nodes];
    int count = 0;
    for (int n = 0; n < nodes; n++) {
      NetworkBuilder.Draft draft = drafts.get(number[n]);
      first[n + 1] = first[n] + draft.conductors();
      firstShunt[n + 1] = firstShunt[n] + draft.shunts().size();
      transformerOf[n] = draft.transformer().isPresent() ? count++ : -1;
    }
    joinedTo = new int[first[nodes]];
    resistance = new double[first[nodes]];
    reactance = new double[first[nodes]];
    law = new int[first[nodes]];
    transformers = new Transformer[count];
    turns = new double[count][];
    shunts = new Shunt[firstShunt[nodes]];
    for (int n = 0; n < nodes; n++) {
      place(n, drafts.get(number[n]));
    }
  }

  /** Numbers of the nodes, each before what it feeds, leaves before what feeds others. */
  private static int[] depthFirst(List<NetworkBuilder.Draft> drafts) {
    List<List<Integer>> fed = new ArrayList<>();
    for (int k = 0; k < drafts.size(); k++) {
      fed.add(new ArrayList<>(0));
      if (k > 0) {
        fed.get(drafts.get(k).parent()).add(k);
      }
    }
    int[] order = new int[drafts.size()];
    int count = 0;
    Deque<Integer> next = new ArrayDeque<>(List.of(0));
    while (!next.isEmpty()) {
      int node = next.pop();
      order[count++] = node;
      for (int child : fed.get(node)) {
        if (fed.get(child).isEmpty()) {
          order[count++] = child;
        } else {
          next.push(child);
        }
      }
    }
    return order;
  }

  private void place(int n, NetworkBuilder.Draft draft) {
    for (int k = 0; k < draft.feeder().size(); k++) {
      FeederConductor conductor = draft.feeder().get(k);
      int at = first[n] + k;
      joinedTo[at] = first[parent[n]] + conductor.parentConductor();
      SeriesImpedance impedance = conductor.impedance();
      resistance[at] = impedance.resistanceOhm();
      reactance[at] = impedance.reactanceOhm();
      law[at] = draft.laws()[k];
    }
    draft
        .transformer()
        .ifPresent(
            t -> {
              transformers[transformerOf[n]] = t;
              turns[transformerOf[n]] = t.turns(size(parent[n]));
            });
    for (int k = 0; k < draft.shunts().size(); k++) {
      shunts[firstShunt[n] + k] = draft.shunts().get(k);
    }
  }

  /** How many conductors a node has. */
  int size(int node) {
    return first[node + 1] - first[node];
  }

  int conductors() {
    return first[nodes];
  }

  /** Whether a feeder feeds the node; else it is the root, or a transformer's secondary. */
  boolean isFeeder(int node) {
    return node > 0 && transformerOf[node] < 0;
  }

  /**
   * The part that conductor m of the feeding node has in the ideal potential of the node's
   * conductor k, and k's current in m's: an entry of A.
   */
  double coupling(int node, int k, int m) {
    int feeding = parent[node];
    return isFeeder(node)
        ? joinedTo[first[node] + k] == first[feeding] + m ? 1 : 0
        : turns[transformerOf[node]][k * size(feeding) + m];
  }
}
