package fourthwire.audit.solve;

import fourthwire.network.TreeNetwork;
import fourthwire.site.LoadKind;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * A few loads that speak for all: of each kind below each of the boards above ({@link
 * UpperBoards}), by size, the middle one of every quarter for all of its quarter.
 */
final class LoadSample {
  private static final int PARTS = 4;

  private final List<DevicePort> spokesmen = new ArrayList<>();
  private final Map<DevicePort, DevicePort> spokesmanOf = new HashMap<>();

  private record Cluster(PortPlace lead, LoadKind kind) {}

  /**
   * The sample, each as large as all it speaks for and standing at the board above.
   *
   * @param leads by the group of a load, where that is
   */
  LoadSample(
      List<DevicePort> loads,
      Map<PortPlace, PortPlace> leads,
      TreeNetwork network,
      OrdersInPlay orders) {
    Map<Cluster, List<DevicePort>> clusters = new LinkedHashMap<>();
    for (DevicePort load : loads) {
      PortPlace lead = leads.getOrDefault(load.group(), load.group());
      LoadKind kind = load.device().placement().request().kind();
      clusters.computeIfAbsent(new Cluster(lead, kind), c -> new ArrayList<>()).add(load);
    }
    int at = 0;
    for (Map.Entry<Cluster, List<DevicePort>> entry : clusters.entrySet()) {
      for (List<DevicePort> part : parts(entry.getValue())) {
        DevicePort middle = part.get(part.size() / 2);
        double amps = part.stream().mapToDouble(load -> load.device().roughA()).sum();
        DevicePort spokesman =
            middle.speakingFor(amps / middle.device().roughA(), entry.getKey().lead(), network, at);
        spokesmen.add(spokesman);
        part.forEach(load -> spokesmanOf.put(load, spokesman));
        at += spokesman.length(orders);
      }
    }
  }

  private static List<List<DevicePort>> parts(List<DevicePort> cluster) {
    List<DevicePort> bySize =
        cluster.stream().sorted(Comparator.comparingDouble(l -> l.device().roughA())).toList();
    int parts = Math.min(PARTS, bySize.size());
    List<List<DevicePort>> result = new ArrayList<>();
    for (int k = 0; k < parts; k++) {
      result.add(bySize.subList(k * bySize.size() / parts, (k + 1) * bySize.size() / parts));
    }
    return result;
  }

  List<DevicePort> spokesmen() {
    return spokesmen;
  }

  /**
   * Lets each load draw what its spokesman does, in proportion to its size.
   *
   * @param drawn by the spokesmen
   * @param x receives what all draw
   */
  void spread(OrdersInPlay orders, double[] drawn, double[] x) {
    spokesmanOf.forEach(
        (load, spokesman) -> {
          double scale = load.device().roughA() / spokesman.device().roughA();
          for (int i = 0; i < load.length(orders); i++) {
            x[load.offset() + i] = scale * drawn[spokesman.offset() + i];
          }
        });
  }
}
