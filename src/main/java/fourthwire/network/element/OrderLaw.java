package fourthwire.network.element;

/**
 * How a resistance or a reactance changes with the harmonic order: the factor on its value at the
 * fundamental. Laws are evaluated once per order and network, so conductors of one kind should
 * share one law object.
 */
@FunctionalInterface
public interface OrderLaw {
  /** The same at every order. */
  OrderLaw CONSTANT = order -> 1;

  /** In proportion to the order, as a reactance of fixed inductance. */
  OrderLaw PROPORTIONAL = order -> order;

  /**
   * The factor at this order.
   *
   * @param order above 0, also between whole orders
   */
  double factor(double order);
}
