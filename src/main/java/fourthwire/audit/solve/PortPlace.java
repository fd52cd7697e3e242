package fourthwire.audit.solve;

import fourthwire.audit.plan.LoadPlacement;
import fourthwire.audit.plan.Place;
import fourthwire.network.DrivingPoint;
import fourthwire.network.TreeNetwork;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Phasor;
import java.util.List;

/**
 * Between which conductors of which node of the network a port, or three, stand.
 *
 * @param node the network's node
 * @param from number of the line of each port there
 * @param to number of the conductor all return to, or {@link #NONE}
 */
record PortPlace(int node, List<Integer> from, int to) {
  /** Three lines that return to nothing but each other. */
  static final int NONE = -1;

  static PortPlace of(LoadPlacement placement, Place place) {
    List<Conductor> to = placement.to();
    return new PortPlace(
        place.networkNode(),
        placement.from().stream().map(c -> place.conductors().of(c)).toList(),
        to.isEmpty() ? NONE : place.conductors().of(to.get(0)));
  }

  /** The same conductors where their feeder begins. */
  PortPlace feeding(TreeNetwork network) {
    return new PortPlace(
        network.parent(node),
        from.stream().map(c -> network.joinedTo(node, c)).toList(),
        to == NONE ? NONE : network.joinedTo(node, to));
  }

  /** The same point of the network as far up as feeders without impedance lead. */
  PortPlace top(TreeNetwork network) {
    PortPlace top = this;
    while (network.isJoined(top.node())) {
      top = top.feeding(network);
    }
    return top;
  }

  int[] fromIndices(TreeNetwork network) {
    return from.stream().mapToInt(c -> network.index(node, c)).toArray();
  }

  int toIndex(TreeNetwork network) {
    return to == NONE ? NONE : network.index(node, to);
  }

  /** What a port sees of the network here; of three, the positive sequence. */
  Phasor impedance(DrivingPoint point) {
    return from.size() == 3 ? point.positiveSequence() : point.between(from.get(0), to);
  }
}
