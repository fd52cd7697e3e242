package fourthwire.audit.judge;

import fourthwire.audit.DesignState.Resonance;
import fourthwire.audit.ImpedanceCurve;
import fourthwire.audit.plan.NetworkPlan;
import fourthwire.audit.plan.Place;
import fourthwire.audit.solve.Workers;
import fourthwire.network.DrivingPoint;
import fourthwire.network.DrivingPoints;
import fourthwire.quantity.Phasor;
import fourthwire.site.SiteTree;
import fourthwire.site.Survey;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import java.util.stream.IntStream;

/**
 * The impedance seen from every board, transformer and supply against the order, 1 to 50 in steps
 * of 0.1: of the positive sequence on three lines, of line and return elsewhere. And the resonances
 * that banks make on three lines: parallel ones, peaks above what the same network shows without
 * its banks; series ones, dips to less than half of that (common practice, no source).
 */
final class ImpedanceScan {
  private static final double PER_ORDER = 10;
  private static final int FIRST = 10;
  private static final double DIP = 0.5;

  /** A step is parted in so many to find a peak between two. */
  private static final int FINER = 10;

  private final NetworkPlan with;
  private final NetworkPlan without;
  private final Map<String, String> banks;
  private final List<Place> places;
  private final Workers workers;
  private final double[][] ohm;
  private final Map<Integer, double[]> bare = new HashMap<>();
  private final Map<Integer, double[][]> finer = new HashMap<>();
  private final Map<String, List<Resonance>> byNode = new HashMap<>();

  /**
   * Scans.
   *
   * @param with the plan with its banks
   * @param without the same without
   */
  ImpedanceScan(Survey survey, NetworkPlan with, NetworkPlan without, Workers workers) {
    this.with = with;
    this.without = without;
    this.banks = banks(survey, with);
    this.places =
        with.places().stream().filter(p -> p.node().kind() != SiteTree.Kind.CIRCUIT).toList();
    this.workers = workers;
    this.ohm = new double[ImpedanceCurve.POINTS][];
    workers.each(ohm.length, k -> ohm[k] = magnitudes(with, order(k)));
    if (!banks.isEmpty()) {
      for (int p = 0; p < places.size(); p++) {
        if (hasSequences(places.get(p))) {
          byNode.put(places.get(p).name(), resonances(p));
        }
      }
    }
  }

  private static double order(double point) {
    return (FIRST + point) / PER_ORDER;
  }

  /** The resonances seen from a node, lowest order first. */
  List<Resonance> at(String node) {
    return byNode.getOrDefault(node, List.of());
  }

  /** The curve seen from a node; empty at circuits. */
  Optional<ImpedanceCurve> curve(String node) {
    return IntStream.range(0, places.size())
        .filter(p -> places.get(p).name().equals(node))
        .mapToObj(p -> ImpedanceCurve.of(Arrays.stream(ohm).mapToDouble(z -> z[p]).toArray()))
        .findFirst();
  }

  static boolean hasSequences(Place place) {
    return place.node().lines().size() == 3
        && place.conductors().of(place.node().lines().get(0)) == 0;
  }

  private double[] magnitudes(NetworkPlan plan, double order) {
    DrivingPoints points = plan.network().factor(order).drivingPoints();
    return places.stream().mapToDouble(p -> seen(plan, p, points).magnitude()).toArray();
  }

  private static Phasor seen(NetworkPlan plan, Place place, DrivingPoints points) {
    DrivingPoint point = points.at(plan.get(place.name()).networkNode());
    if (hasSequences(place)) {
      return point.positiveSequence();
    }
    int line = place.conductors().of(place.node().conductors().get(0));
    int back =
        place.conductors().of(place.node().conductors().get(place.node().conductors().size() - 1));
    return point.between(line, back);
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

  private List<Resonance> resonances(int place) {
    List<Resonance> found = new ArrayList<>();
    for (int k : Peaks.maxima(ohm.length, k -> ohm[k][place])) {
      if (ohm[k][place] > bare(k)[place]) {
        found.add(parallel(k, place));
      }
    }
    for (int k : Peaks.maxima(ohm.length, k -> -ohm[k][place])) {
      if (ohm[k][place] < DIP * bare(k)[place]) {
        found.add(new Resonance(order(k), ohm[k][place], maker(k), true));
      }
    }
    found.sort(Comparator.comparingDouble(Resonance::order));
    return List.copyOf(found);
  }

  /** What the network shows without its banks. */
  private double[] bare(int point) {
    return bare.computeIfAbsent(point, k -> magnitudes(without, order(k)));
  }

  private Resonance parallel(int point, int place) {
    double[][] near = finer.computeIfAbsent(point, this::near);
    int top = 1;
    for (int j = 1; j < near.length - 1; j++) {
      top = near[j][place] > near[top][place] ? j : top;
    }
    Peaks.Vertex vertex =
        Peaks.vertex(near[top - 1][place], near[top][place], near[top + 1][place]);
    double steps = (top - FINER - 1 + vertex.steps()) / FINER;
    return new Resonance(order(point + steps), vertex.ohm(), maker(point), false);
  }

  /** The impedances about a point of the scan, in finer steps. */
  private double[][] near(int point) {
    double[][] near = new double[2 * FINER + 3][];
    workers.each(
        near.length,
        j -> near[j] = magnitudes(with, order(point + (double) (j - FINER - 1) / FINER)));
    return near;
  }

  /** The bank at whose panel the impedance is highest there. */
  private String maker(int point) {
    return IntStream.range(0, places.size())
        .filter(p -> banks.containsKey(places.get(p).name()))
        .boxed()
        .max(Comparator.comparingDouble(p -> ohm[point][p]))
        .map(p -> Objects.requireNonNull(banks.get(places.get(p).name())))
        .orElse("");
  }
}
