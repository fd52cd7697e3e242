package fourthwire.audit.solve;

import java.util.List;
import java.util.Locale;

/** Watches the loads settle: what they draw against what was injected, and how voltages move. */
final class Settling {
  private final List<DevicePort> loads;
  private final List<ActiveFilter> filters;
  private final OrdersInPlay orders;
  private double worstChange;
  private double worstMove;
  private double firstChange;
  private String worst = "";

  Settling(List<DevicePort> loads, List<ActiveFilter> filters, OrdersInPlay orders) {
    this.loads = loads;
    this.filters = filters;
    this.orders = orders;
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
    for (DevicePort load : loads) {
      look(load, x, g);
      worstMove = Math.max(worstMove, load.voltageMovedV() / load.nominalV());
    }
    for (ActiveFilter filter : filters) {
      double change = change(filter.offset(), 2 * filter.ports() * orders.count(), x, g);
      worstChange = Math.max(worstChange, change);
    }
    firstChange = Math.max(firstChange, worstChange);
  }

  private void look(DevicePort load, double[] x, double[] g) {
    double change = change(load.offset(), 2 * load.ports() * orders.count(), x, g);
    if (change >= worstChange) {
      worstChange = change;
      worst = sentence(load, x, g, change);
    }
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
