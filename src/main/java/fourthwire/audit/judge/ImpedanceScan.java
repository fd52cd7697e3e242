package fourthwire.audit.judge;

import fourthwire.audit.DesignState.Resonance;
import fourthwire.audit.plan.NetworkPlan;
import fourthwire.audit.plan.Place;
import fourthwire.audit.solve.Workers;
import fourthwire.network.DrivingPoints;
import fourthwire.network.TreeNetwork;
import fourthwire.site.SiteTree;
import fourthwire.site.Survey;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.stream.IntStream;

/**
 * The positive-sequence impedance seen from every board and transformer against the order, 1 to 50
 * in steps of 0.1, and the parallel resonances in it: its peaks that stand above what the same
 * network shows without its banks.
 */
final class ImpedanceScan {
  private static final int FIRST = 10;
  private static final int LAST = 500;
  private static final double PER_ORDER = 10;

  private final Map<String, List<Resonance>> byNode = new HashMap<>();

  /**
   * Scans.
   *
   * @param with the plan with its banks
   * @param without the same without
   */
  ImpedanceScan(Survey survey, NetworkPlan with, NetworkPlan without, Workers workers) {
    Map<String, String> banks = banks(survey, with);
    if (banks.isEmpty()) {
      return;
    }
    List<Place> places = with.places().stream().filter(ImpedanceScan::isScanned).toList();
    double[][] ohm = scan(with.network(), places, workers);
    for (int k = FIRST + 1; k < LAST; k++) {
      addPeaks(k, ohm, places, banks, without);
    }
  }

  private void addPeaks(
      int k, double[][] ohm, List<Place> places, Map<String, String> banks, NetworkPlan without) {
    double[] here = ohm[k - FIRST];
    int[] peaks =
        IntStream.range(0, places.size())
            .filter(p -> here[p] > ohm[k - FIRST - 1][p] && here[p] >= ohm[k - FIRST + 1][p])
            .toArray();
    if (peaks.length == 0) {
      return;
    }
    DrivingPoints bare = without.network().factor(k / PER_ORDER).drivingPoints();
    String maker = maker(banks, places, here);
    for (int p : peaks) {
      String node = places.get(p).name();
      if (here[p] > bare.at(without.get(node).networkNode()).positiveSequence().magnitude()) {
        byNode
            .computeIfAbsent(node, n -> new ArrayList<>())
            .add(new Resonance(k / PER_ORDER, here[p], maker));
      }
    }
  }

  /** The parallel resonances seen from a node, lowest order first. */
  List<Resonance> at(String node) {
    return List.copyOf(byNode.getOrDefault(node, List.of()));
  }

  private static boolean isScanned(Place place) {
    return place.node().kind() != SiteTree.Kind.CIRCUIT && place.node().lines().size() == 3;
  }

  /** Bank or tuned filter by the panel it stands at. */
  private static Map<String, String> banks(Survey survey, NetworkPlan plan) {
    Map<String, String> banks = new LinkedHashMap<>();
    survey.filters().stream()
        .filter(f -> f.tunedOrder().isPresent() && plan.find(f.panel()).isPresent())
        .forEach(f -> banks.put(f.panel(), f.name()));
    survey.capacitors().stream()
        .filter(c -> plan.find(c.panel()).isPresent())
        .forEach(c -> banks.put(c.panel(), c.name()));
    return banks;
  }

  private static double[][] scan(TreeNetwork network, List<Place> places, Workers workers) {
    double[][] ohm = new double[LAST - FIRST + 1][];
    workers.each(
        ohm.length,
        k -> {
          DrivingPoints points = network.factor((FIRST + k) / PER_ORDER).drivingPoints();
          ohm[k] =
              places.stream()
                  .mapToDouble(p -> points.at(p.networkNode()).positiveSequence().magnitude())
                  .toArray();
        });
    return ohm;
  }

  /** The bank at whose panel the peak is highest. */
  private static String maker(Map<String, String> banks, List<Place> places, double[] ohm) {
    String maker = "";
    double highest = -1;
    for (int p = 0; p < places.size(); p++) {
      String bank = banks.getOrDefault(places.get(p).name(), "");
      if (!bank.isEmpty() && ohm[p] > highest) {
        highest = ohm[p];
        maker = bank;
      }
    }
    return maker;
  }
}
