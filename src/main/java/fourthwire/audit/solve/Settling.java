package fourthwire.audit.solve;

import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import java.util.Set;
import java.util.stream.Collectors;
import java.util.stream.IntStream;

/** Watches the loads settle: what they draw against what was injected, and how voltages move. */
final class Settling {
  /** Of the worst change: what counts as nearly as bad. */
  private static final double NEARLY = 0.2;

  /** Above what nine loads of ten change at most. */
  private static final double FAR_BEHIND = 10;

  private static final int MOST = 8;

  private final List<DevicePort> loads;
  private final List<ActiveFilter> filters;
  private final OrdersInPlay orders;
  private final double[] changes;
  private double worstChange;
  private double worstMove;
  private double filtersChange;
  private double firstChange;
  private String worst = "";

  Settling(List<DevicePort> loads, List<ActiveFilter> filters, OrdersInPlay orders) {
    this.loads = loads;
    this.filters = filters;
    this.orders = orders;
    this.changes = new double[loads.size()];
  }

  /**
   * Looks at one pass.
   *
   * @param x what was injected
   * @param g what the loads draw at the voltages that made
   */
  void look(double[] x, double[] g) {
    worstChange = 0;
    worstMove = 0;
    filtersChange = 0;
    for (int d = 0; d < changes.length; d++) {
      DevicePort load = loads.get(d);
      changes[d] = look(load, x, g);
      worstMove = Math.max(worstMove, load.terminals().movedV() / load.nominalV());
    }
    for (ActiveFilter filter : filters) {
      double change = change(filter.offset(), 2 * filter.ports() * orders.count(), x, g);
      filtersChange = Math.max(filtersChange, change);
    }
    worstChange = Math.max(worstChange, filtersChange);
    firstChange = Math.max(firstChange, worstChange);
  }

  private double look(DevicePort load, double[] x, double[] g) {
    double change = change(load.offset(), 2 * load.ports() * orders.count(), x, g);
    if (change >= worstChange) {
      worstChange = change;
      worst = sentence(load, x, g, change);
    }
    return change;
  }

  /** Rms of the change over rms of the current. */
  private static double change(int offset, int length, double[] x, double[] g) {
    double moved = 0;
    double square = 0;
    for (int i = offset; i < offset + length; i++) {
      moved += (g[i] - x[i]) * (g[i] - x[i]);
      square += g[i] * g[i];
    }
    return square == 0 ? Math.sqrt(moved) : Math.sqrt(moved / square);
  }

  private String sentence(DevicePort load, double[] x, double[] g, double change) {
    int worstOrder = 1;
    double most = 0;
    for (int k = 0; k < orders.count(); k++) {
      int at = load.offset() + 2 * k;
      double moved = Math.hypot(g[at] - x[at], g[at + 1] - x[at + 1]);
      if (moved > most) {
        most = moved;
        worstOrder = orders.at(k);
      }
    }
    return String.format(
        Locale.ROOT,
        "load \"%s\" on %s still changes by %.2g %% of its current, most at order %d",
        load.device().placement().load().name(),
        load.device().placement().circuit(),
        100 * change,
        worstOrder);
  }

  /** Whether every load draws what was injected, at voltages that stand still. */
  boolean loadsSettled() {
    return worstChange <= CoupledSolver.LOAD_TOLERANCE
        && worstMove <= CoupledSolver.VOLTAGE_TOLERANCE;
  }

  /** The largest change of a load's current, on its rms. */
  double change() {
    return worstChange;
  }

  /**
   * The few loads that are far behind the others: what they draw does not follow their voltage as
   * their slopes say.
   *
   * @param slow whether the last pass brought little: then the very last ones in any case
   */
  List<DevicePort> last(boolean slow) {
    double[] sorted = changes.clone();
    Arrays.sort(sorted);
    double most = sorted.length == 0 ? 0 : sorted[sorted.length * 9 / 10];
    double behind = slow ? worstChange * NEARLY : Math.max(FAR_BEHIND * most, worstChange * NEARLY);
    return IntStream.range(0, changes.length)
        .filter(d -> changes[d] >= behind && changes[d] > CoupledSolver.LOAD_TOLERANCE)
        .boxed()
        .sorted(Comparator.comparingDouble((Integer d) -> changes[d]).reversed())
        .limit(MOST)
        .map(loads::get)
        .toList();
  }

  /**
   * The few loads that have not settled where nearly all others, and all filters, have, with those
   * beside them on their boards; none where they are many.
   */
  List<DevicePort> stragglers() {
    if (filtersChange > CoupledSolver.LOAD_TOLERANCE
        || usualChange() > CoupledSolver.LOAD_TOLERANCE) {
      return List.of();
    }
    Set<Integer> boards =
        IntStream.range(0, changes.length)
            .filter(d -> changes[d] > CoupledSolver.LOAD_TOLERANCE)
            .mapToObj(d -> loads.get(d).group().node())
            .collect(Collectors.toSet());
    return loads.stream().filter(load -> boards.contains(load.group().node())).toList();
  }

  /** What nineteen loads of twenty change at most. */
  double usualChange() {
    double[] sorted = changes.clone();
    Arrays.sort(sorted);
    return sorted.length == 0 ? 0 : sorted[(sorted.length - 1) * 19 / 20];
  }

  /** How far the way to the tolerance is gone, on a logarithmic scale, 0 to 1. */
  double share() {
    double whole = Math.log(firstChange / CoupledSolver.LOAD_TOLERANCE);
    double done = Math.log(firstChange / Math.max(worstChange, CoupledSolver.LOAD_TOLERANCE));
    return whole > 0 ? Math.min(1, Math.max(0, done / whole)) : 1;
  }

  /** Which load is furthest from settled, and at which order. */
  String worst() {
    return worst;
  }
}
