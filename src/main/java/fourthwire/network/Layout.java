package fourthwire.network;

import java.util.Arrays;
import java.util.List;
import java.util.stream.IntStream;

/**
 * The network as flat arrays, parents before children: what every order shares. Conductors of all
 * nodes stand in one row; node n has those from {@code first[n]} to {@code first[n + 1]}.
 */
final class Layout {
  /** No admittance at or below the node: its current is what is injected. */
  static final byte PASSIVE = 0;

  /** A leaf with admittances between one pair of conductors only. */
  static final byte PAIR = 1;

  /** Everything else: a full matrix. */
  static final byte FULL = 2;

  final SourceImpedance source;
  final int nodes;
  final int[] parent;
  final int[] first;

  /** For a feeder's conductors: the conductor of the feeding node each is joined to. */
  final int[] joinedTo;

  final double[] resistance;
  final double[] reactance;
  final int[] resistanceLaw;
  final int[] reactanceLaw;
  final OrderLaw[] laws;

  /** Index into {@link #transformers}, or -1 for the root and for feeders. */
  final int[] transformerOf;

  final Transformer[] transformers;
  final double[][] turns;

  final int[] firstShunt;
  final Shunt[] shunts;

  final byte[] role;

  /** Where the node's block starts in the factors' array of doubles. */
  final int[] block;

  final int blocksLength;

  /** For a {@link #PAIR}: its two conductors. */
  final int[] pairFrom;

  final int[] pairTo;

  final int largest;

  /**
   * The nodes in spans: one node, or a run of consecutive feeders that need no matrix, which are
   * swept conductor by conductor. Span s has the nodes from {@code span[s]} to {@code span[s + 1]}.
   */
  final int[] span;

  /** The nodes that are a {@link #PAIR}, and for every span the first of its own among them. */
  final int[] pairs;

  final int[] firstPairOfSpan;

  Layout(SourceImpedance source, List<NetworkBuilder.Draft> drafts, OrderLaw[] laws) {
    this.source = source;
    this.laws = laws.clone();
    nodes = drafts.size();
    parent = new int[nodes];
    first = new int[nodes + 1];
    transformerOf = new int[nodes];
    firstShunt = new int[nodes + 1];
    role = new byte[nodes];
    block = new int[nodes];
    pairFrom = new int[nodes];
    pairTo = new int[nodes];
    int transformerCount = 0;
    for (int n = 0; n < nodes; n++) {
      NetworkBuilder.Draft draft = drafts.get(n);
      parent[n] = draft.parent();
      first[n + 1] = first[n] + draft.conductors();
      firstShunt[n + 1] = firstShunt[n] + draft.shunts().size();
      transformerOf[n] = draft.transformer().isPresent() ? transformerCount++ : -1;
    }
    int conductors = first[nodes];
    joinedTo = new int[conductors];
    resistance = new double[conductors];
    reactance = new double[conductors];
    resistanceLaw = new int[conductors];
    reactanceLaw = new int[conductors];
    transformers = new Transformer[transformerCount];
    turns = new double[transformerCount][];
    shunts = new Shunt[firstShunt[nodes]];
    for (int n = 0; n < nodes; n++) {
      place(n, drafts.get(n));
    }
    assignRoles();
    blocksLength = assignBlocks();
    largest = IntStream.range(0, nodes).map(this::size).max().orElse(0);
    span =
        IntStream.rangeClosed(0, nodes)
            .filter(n -> n == 0 || n == nodes || !isSimple(n - 1) || !isSimple(n))
            .toArray();
    pairs = IntStream.range(0, nodes).filter(n -> role[n] == PAIR).toArray();
    firstPairOfSpan = new int[span.length];
    for (int s = 0; s < span.length; s++) {
      int found = Arrays.binarySearch(pairs, span[s]);
      firstPairOfSpan[s] = found < 0 ? -found - 1 : found;
    }
  }

  int size(int node) {
    return first[node + 1] - first[node];
  }

  int conductors() {
    return first[nodes];
  }

  boolean isFeeder(int node) {
    return node > 0 && transformerOf[node] < 0;
  }

  /** A feeder that needs no matrix. */
  boolean isSimple(int node) {
    return role[node] != FULL && isFeeder(node);
  }

  private void place(int n, NetworkBuilder.Draft draft) {
    for (int k = 0; k < draft.feeder().size(); k++) {
      int at = first[n] + k;
      joinedTo[at] = first[parent[n]] + draft.feeder().get(k).parentConductor();
      SeriesImpedance impedance = draft.feeder().get(k).impedance();
      resistance[at] = impedance.resistanceOhm();
      reactance[at] = impedance.reactanceOhm();
      resistanceLaw[at] = draft.resistanceLaws()[k];
      reactanceLaw[at] = draft.reactanceLaws()[k];
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

  private void assignRoles() {
    boolean[] feeds = new boolean[nodes];
    for (int n = nodes - 1; n >= 0; n--) {
      if (role[n] == PASSIVE && firstShunt[n + 1] > firstShunt[n]) {
        role[n] = isFeeder(n) && !feeds[n] && isOnePair(n) ? PAIR : FULL;
      }
      if (n > 0) {
        feeds[parent[n]] = true;
        role[parent[n]] = role[n] == PASSIVE ? role[parent[n]] : FULL;
      }
    }
  }

  private boolean isOnePair(int n) {
    int from = -1;
    int to = -1;
    for (int k = firstShunt[n]; k < firstShunt[n + 1]; k++) {
      if (!(shunts[k] instanceof Shunt.TwoTerminal s) || s.other() == Shunt.EARTH) {
        return false;
      }
      int low = Math.min(s.conductor(), s.other());
      int high = Math.max(s.conductor(), s.other());
      if (from >= 0 && (low != from || high != to)) {
        return false;
      }
      from = low;
      to = high;
    }
    pairFrom[n] = first[n] + from;
    pairTo[n] = first[n] + to;
    return true;
  }

  private int assignBlocks() {
    int length = 0;
    for (int n = 0; n < nodes; n++) {
      block[n] = length;
      length += role[n] == FULL ? 2 * size(n) * size(n) : role[n] == PAIR ? 2 : 0;
    }
    return length;
  }
}
