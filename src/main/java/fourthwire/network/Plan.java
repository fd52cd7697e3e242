package fourthwire.network;

import fourthwire.network.element.Shunt;
import java.util.Arrays;
import java.util.stream.IntStream;

/**
 * How much work each node of a layout is, the same at every order: most circuits of a site need no
 * matrix at all.
 */
final class Plan {
  /** No admittance at or below the node: its current is what is injected. */
  static final byte PASSIVE = 0;

  /** A leaf behind a feeder with admittances between one pair of conductors only. */
  static final byte PAIR = 1;

  /** Everything else: a full matrix. */
  static final byte FULL = 2;

  final byte[] role;

  /** Where the node's block starts in the factors' array of doubles. */
  final int[] block;

  final int blocksLength;

  /** For a {@link #PAIR}: its two conductors, by their place in the layout. */
  final int[] pairFrom;

  final int[] pairTo;

  /**
   * The nodes in spans: one node, or a run of consecutive circuits that need no matrix, which are
   * swept conductor by conductor. Span s has the nodes from {@code span[s]} to {@code span[s + 1]}.
   */
  final int[] span;

  /** The nodes that are a {@link #PAIR}. */
  final int[] pairs;

  /** For every span, where its own nodes start among {@link #pairs}. */
  final int[] firstPairOfSpan;

  /** Conductors of the largest node. */
  final int largest;

  private final Layout layout;

  /** Which nodes feed others. */
  private final boolean[] feeds;

  Plan(Layout layout) {
    this.layout = layout;
    int nodes = layout.nodes;
    role = new byte[nodes];
    pairFrom = new int[nodes];
    pairTo = new int[nodes];
    feeds = new boolean[nodes];
    assignRoles();
    block = new int[nodes];
    blocksLength = assignBlocks();
    span =
        IntStream.rangeClosed(0, nodes)
            .filter(n -> n == 0 || n == nodes || !isSimple(n - 1) || !isSimple(n))
            .toArray();
    pairs = IntStream.range(0, nodes).filter(n -> role[n] == PAIR).toArray();
    firstPairOfSpan = Arrays.stream(span).map(this::pairsBefore).toArray();
    largest = IntStream.range(0, nodes).map(layout::size).max().orElse(0);
  }

  /** A leaf behind a feeder that needs no matrix. */
  boolean isSimple(int node) {
    return role[node] != FULL && layout.isFeeder(node) && !feeds[node];
  }

  private void assignRoles() {
    for (int n = layout.nodes - 1; n >= 0; n--) {
      if (role[n] == PASSIVE && layout.firstShunt[n + 1] > layout.firstShunt[n]) {
        role[n] = layout.isFeeder(n) && !feeds[n] && isOnePair(n) ? PAIR : FULL;
      }
      if (n > 0) {
        int parent = layout.parent[n];
        feeds[parent] = true;
        role[parent] = role[n] == PASSIVE ? role[parent] : FULL;
      }
    }
  }

  private boolean isOnePair(int n) {
    int from = -1;
    int to = -1;
    for (int k = layout.firstShunt[n]; k < layout.firstShunt[n + 1]; k++) {
      if (!(layout.shunts[k] instanceof Shunt.TwoTerminal s) || s.other() == Shunt.EARTH) {
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
    pairFrom[n] = layout.first[n] + from;
    pairTo[n] = layout.first[n] + to;
    return true;
  }

  private int assignBlocks() {
    int length = 0;
    for (int n = 0; n < layout.nodes; n++) {
      block[n] = length;
      int size = layout.size(n);
      length += role[n] == FULL ? 2 * size * size : role[n] == PAIR ? 2 : 0;
    }
    return length;
  }

  private int pairsBefore(int node) {
    int found = Arrays.binarySearch(pairs, node);
    return found < 0 ? -found - 1 : found;
  }
}
