package fourthwire.network;

import fourthwire.network.element.FeederConductor;
import fourthwire.network.element.OrderLaw;
import fourthwire.network.element.SeriesImpedance;
import fourthwire.network.element.Shunt;
import fourthwire.network.element.SourceImpedance;
import fourthwire.network.element.Transformer;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Builds a {@link TreeNetwork}, the source first, then node by node away from it. Every method that
 * makes a node returns its number; numbers count from 0, the source's terminals, in the order of
 * making. A node's conductors are numbered from 0.
 *
 * <pre>{@code
 * NetworkBuilder net = new NetworkBuilder();
 * int supply = net.source(SourceImpedance.fourWire(z1, z0));
 * int board = net.feeder(supply, from(0, line), from(1, line), from(2, line), from(3, neutral));
 * int lamp = net.feeder(board, from(0, line), from(3, neutral));
 * net.shunt(lamp, Shunt.between(0, 1, OrderAdmittance.ofSeries(SeriesImpedance.of(23, 0))));
 * TreeNetwork network = net.build();
 * }</pre>
 */
public final class NetworkBuilder {
  private final List<Draft> drafts = new ArrayList<>();
  private final Map<Laws, Integer> laws = new LinkedHashMap<>();
  private Optional<SourceImpedance> source = Optional.empty();

  /** The laws of one impedance over the order. */
  record Laws(OrderLaw resistance, OrderLaw reactance) {}

  /** A node as it is noted down until the network is built. */
  record Draft(
      int parent,
      int conductors,
      List<FeederConductor> feeder,
      int[] laws,
      Optional<Transformer> transformer,
      List<Shunt> shunts) {}

  /**
   * The source, whose terminals are node 0.
   *
   * @throws IllegalStateException if there is one already
   */
  public int source(SourceImpedance impedance) {
    if (source.isPresent()) {
      throw new IllegalStateException("a network has one source");
    }
    source = Optional.of(impedance);
    return add(0, impedance.conductors(), List.of(), Optional.empty());
  }

  /**
   * A node at the far end of a feeder. Its conductors are numbered as given; several may be joined
   * to the same conductor of the feeding node, as the circuits of a shared neutral on one line are.
   */
  public int feeder(int parent, FeederConductor... conductors) {
    return feeder(parent, List.of(conductors));
  }

  /** A node at the far end of a feeder; see {@link #feeder(int, FeederConductor...)}. */
  public int feeder(int parent, List<FeederConductor> conductors) {
    requireNode(parent);
    if (conductors.isEmpty()) {
      throw new IllegalArgumentException("a feeder has one conductor or more");
    }
    for (FeederConductor conductor : conductors) {
      requireConductor(parent, conductor.parentConductor());
    }
    return add(parent, conductors.size(), List.copyOf(conductors), Optional.empty());
  }

  /** The node that is a transformer's secondary terminals. */
  public int transformer(int parent, Transformer transformer) {
    requireNode(parent);
    transformer.turns(drafts.get(parent).conductors());
    return add(parent, transformer.conductors(), List.of(), Optional.of(transformer));
  }

  /** Adds a linear element to a node. */
  public NetworkBuilder shunt(int node, Shunt shunt) {
    requireNode(node);
    requireConductor(node, shunt.highestConductor());
    drafts.get(node).shunts().add(shunt);
    return this;
  }

  /**
   * The network as built so far.
   *
   * @throws IllegalStateException if it has no source
   */
  public TreeNetwork build() {
    return new TreeNetwork(
        new Layout(
            source.orElseThrow(() -> new IllegalStateException("a network needs a source")),
            drafts,
            laws.keySet()));
  }

  private int add(
      int parent, int conductors, List<FeederConductor> feeder, Optional<Transformer> transformer) {
    int[] lawNumbers = feeder.stream().mapToInt(c -> lawNumber(c.impedance())).toArray();
    drafts.add(new Draft(parent, conductors, feeder, lawNumbers, transformer, new ArrayList<>(0)));
    return drafts.size() - 1;
  }

  private int lawNumber(SeriesImpedance impedance) {
    Laws pair = new Laws(impedance.resistanceLaw(), impedance.reactanceLaw());
    Integer known = laws.putIfAbsent(pair, laws.size());
    return known == null ? laws.size() - 1 : known;
  }

  private void requireNode(int node) {
    if (node < 0 || node >= drafts.size()) {
      throw new IllegalArgumentException(
          "there is no node " + node + "; this network has " + drafts.size() + " so far");
    }
  }

  private void requireConductor(int node, int conductor) {
    int count = drafts.get(node).conductors();
    if (conductor < 0 || conductor >= count) {
      throw new IllegalArgumentException(
          "node %d has no conductor %d; it has %d, counted from 0"
              .formatted(node, conductor, count));
    }
  }
}
