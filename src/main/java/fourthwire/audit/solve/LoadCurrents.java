package fourthwire.audit.solve;

import fourthwire.audit.plan.LoadPlacement;
import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Map;

/** What the loads of a site drew in one state: where the next one starts from. */
final class LoadCurrents {
  /** Nothing is known of any load. */
  static final LoadCurrents NONE = new LoadCurrents();

  private final int count;
  private final Map<Key, Drawn> drawn = new HashMap<>();

  /** Which part of which row a load is. */
  private record Key(String circuit, String load, String line) {
    static Key of(DevicePort load) {
      LoadPlacement p = load.device().placement();
      return new Key(p.circuit(), p.load().name(), p.from().get(0).name());
    }
  }

  private record Drawn(double roughA, double[] amps) {}

  private LoadCurrents() {
    this.count = 0;
  }

  LoadCurrents(OrdersInPlay orders, List<DevicePort> loads, double[] g) {
    this.count = orders.count();
    for (DevicePort load : loads) {
      int from = load.offset();
      double[] amps = Arrays.copyOfRange(g, from, from + load.length(orders));
      drawn.put(Key.of(load), new Drawn(load.device().roughA(), amps));
    }
  }

  /**
   * Fills in what the loads may draw now, in proportion to their size.
   *
   * @return false, and x untouched, unless something is known of every load
   */
  boolean fill(OrdersInPlay orders, List<DevicePort> loads, double[] x) {
    if (orders.count() != count || !loads.stream().allMatch(l -> drawn.containsKey(Key.of(l)))) {
      return false;
    }
    for (DevicePort load : loads) {
      Drawn known = drawn.getOrDefault(Key.of(load), new Drawn(1, new double[0]));
      double scale = load.device().roughA() / known.roughA();
      for (int i = 0; i < known.amps().length; i++) {
        x[load.offset() + i] = scale * known.amps()[i];
      }
    }
    return true;
  }
}
