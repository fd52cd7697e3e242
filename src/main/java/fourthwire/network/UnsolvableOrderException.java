package fourthwire.network;

/**
 * At this order the network has no unique solution: admittances and the impedances that feed them
 * resonate without any loss, or an element's impedance is zero or no number.
 */
public final class UnsolvableOrderException extends RuntimeException {
  private static final long serialVersionUID = 1L;

  private final double order;
  private final int node;

  UnsolvableOrderException(double order, int node) {
    super(
        ("order %s: what hangs at node %d resonates without any loss with what feeds it, or has an"
                + " impedance of zero; give it its resistance")
            .formatted(order, node));
    this.order = order;
    this.node = node;
  }

  /** The order. */
  public double order() {
    return order;
  }

  /** The node whose elimination failed. */
  public int node() {
    return node;
  }
}
