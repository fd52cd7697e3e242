package fourthwire.audit.solve;

import fourthwire.audit.plan.Device;
import fourthwire.quantity.Spectrum;
import fourthwire.site.Background;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;

/**
 * The orders that can occur: all of 1 to 50 where a source or a given spectrum has an even one,
 * else the odd ones, since every computed load then draws alike half-waves.
 */
final class OrdersInPlay {
  private final int[] orders;

  private OrdersInPlay(int[] orders) {
    this.orders = orders;
  }

  static OrdersInPlay of(List<Background> background, List<Device> devices) {
    boolean even =
        background.stream().anyMatch(b -> b.order() % 2 == 0 && b.percent() != 0)
            || devices.stream()
                .map(d -> d.placement().request().spectrum())
                .flatMap(Optional::stream)
                .anyMatch(OrdersInPlay::hasEven);
    return new OrdersInPlay(
        IntStream.rangeClosed(1, Spectrum.HIGHEST_ORDER).filter(h -> even || h % 2 == 1).toArray());
  }

  private static boolean hasEven(Spectrum spectrum) {
    return IntStream.iterate(2, h -> h <= Spectrum.HIGHEST_ORDER, h -> h + 2)
        .anyMatch(h -> spectrum.magnitude(h) != 0);
  }

  int count() {
    return orders.length;
  }

  int at(int position) {
    return orders[position];
  }
}
