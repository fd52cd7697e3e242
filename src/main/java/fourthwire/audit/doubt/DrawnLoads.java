package fourthwire.audit.doubt;

import fourthwire.audit.plan.Device;
import fourthwire.load.DesignPowers;
import fourthwire.load.PresetParameter;
import fourthwire.site.Load;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.IdentityHashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;

/**
 * Every load of a site as each draw has it. Half of the variance of a row's amount is shared by its
 * kind over the site, half is its own; parameters are shared by kind altogether (methods, section
 * 5).
 */
final class DrawnLoads {
  private static final double HALF_OF_VARIANCE = Math.sqrt(0.5);

  private final List<OpenLoad> loads = new ArrayList<>();

  /** The row of each load; the parts of one row are drawn together. */
  private final List<OpenInput.RowAmount> rows = new ArrayList<>();

  private final Map<OpenInput, float[]> deviates = new LinkedHashMap<>();

  /**
   * Draws.
   *
   * @param devices every load that draws in the design state
   */
  DrawnLoads(List<Device> devices, LatinHypercube hypercube) {
    Map<Load, OpenInput.RowAmount> rowOf = new IdentityHashMap<>();
    Map<String, Integer> alike = new HashMap<>();
    for (Device device : devices) {
      OpenLoad load = new OpenLoad(device);
      Load row = load.placement().load();
      String circuit = load.placement().circuit();
      loads.add(load);
      rows.add(
          rowOf.computeIfAbsent(
              row,
              r ->
                  new OpenInput.RowAmount(
                      circuit, r.name(), alike.merge(circuit + '/' + r.name(), 1, Integer::sum))));
      open(new OpenInput.KindAmount(load.kind()), hypercube);
      load.parameters()
          .keySet()
          .forEach(p -> open(new OpenInput.KindParameter(load.kind(), p), hypercube));
      open(rows.get(rows.size() - 1), hypercube);
    }
  }

  private void open(OpenInput input, LatinHypercube hypercube) {
    deviates.computeIfAbsent(input, i -> hypercube.deviates(i.name()));
  }

  /** The loads of one draw. */
  List<Device> at(int draw) {
    List<Device> drawn = new ArrayList<>();
    DesignPowers known = new DesignPowers();
    for (int k = 0; k < loads.size(); k++) {
      OpenLoad load = loads.get(k);
      double shared = deviate(new OpenInput.KindAmount(load.kind()), draw);
      double own = deviate(rows.get(k), draw);
      drawn.add(
          load.drawn(
              HALF_OF_VARIANCE * (shared + own),
              (PresetParameter p) -> deviate(new OpenInput.KindParameter(load.kind(), p), draw),
              known));
    }
    return drawn;
  }

  private double deviate(OpenInput input, int draw) {
    return deviates(input)[draw];
  }

  /** Standard normal deviates of an input, by draw. */
  float[] deviates(OpenInput input) {
    return Objects.requireNonNull(deviates.get(input));
  }

  /** Every input, in the order the survey's rows first open it. */
  List<OpenInput> inputs() {
    return List.copyOf(deviates.keySet());
  }

  /** Every load with the row it belongs to, in the survey's order. */
  List<OpenLoad> loads() {
    return List.copyOf(loads);
  }

  /** The row of the load at this position of {@link #loads}. */
  OpenInput.RowAmount row(int load) {
    return rows.get(load);
  }
}
