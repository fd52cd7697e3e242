package fourthwire.audit.solve;

import fourthwire.network.TreeNetwork;
import java.util.ArrayList;
import java.util.Collection;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * A few boards above many, at whose voltage all below are taken to stand: of n boards each is led
 * by the nearest above it, or itself, that has √n boards at or below, else by the topmost of its
 * voltage level.
 */
final class UpperBoards {
  /** Fewer boards than this need none to lead them. */
  private static final int FEW = 12;

  /** Those above are worth their while if they are so many times fewer. */
  private static final int TIMES_FEWER = 3;

  /** How well their own equations are solved, each time they lead. */
  private static final double ROUGH = 0.3;

  private final BoardEquations equations;
  private final Map<PlaceSlope, List<PlaceSlope>> parts = new LinkedHashMap<>();

  /** For each conductor among those led, where the one begins that leads it, or -1. */
  private final int[] leading;

  private final BoardRow led;

  /**
   * Boards above others.
   *
   * @param equations theirs
   * @param leads which of their places leads each slope below
   * @param led how those below stand in a row; it has all of these boards too
   */
  UpperBoards(
      TreeNetwork network,
      BoardEquations equations,
      Map<PlaceSlope, PortPlace> leads,
      BoardRow led) {
    this.equations = equations;
    this.led = led;
    leads.forEach(
        (slope, lead) ->
            parts.computeIfAbsent(equations.slope(lead), s -> new ArrayList<>()).add(slope));
    this.leading = new int[led.count()];
    int at = 0;
    for (int node : led.nodes().toArray()) {
      for (int c = 0; c < network.conductors(node); c++) {
        leading[at++] = leading(network, node, c);
      }
    }
  }

  private int leading(TreeNetwork network, int node, int conductor) {
    int n = node;
    int c = conductor;
    while (equations.row().start(network.index(n, c)) < 0 && network.isFedByFeeder(n)) {
      c = network.joinedTo(n, c);
      n = network.parent(n);
    }
    return equations.row().start(network.index(n, c));
  }

  /** Which place leads each; none if those that lead are too many to help. */
  static Map<PortPlace, PortPlace> leads(TreeNetwork network, Collection<PortPlace> places) {
    int[] boards = places.stream().mapToInt(PortPlace::node).distinct().toArray();
    if (boards.length < FEW) {
      return Map.of();
    }
    int[] below = boardsBelow(network, boards);
    Map<PortPlace, PortPlace> leads = new LinkedHashMap<>();
    for (PortPlace place : places) {
      PortPlace lead = place;
      while (below[lead.node()] < Math.sqrt(boards.length) && network.isFedByFeeder(lead.node())) {
        lead = lead.feeding(network);
      }
      leads.put(place, lead);
    }
    long few = leads.values().stream().mapToInt(PortPlace::node).distinct().count();
    return few * TIMES_FEWER > boards.length ? Map.of() : leads;
  }

  private static int[] boardsBelow(TreeNetwork network, int[] boards) {
    int[] below = new int[network.nodes()];
    for (int board : boards) {
      below[board]++;
    }
    for (int n = network.nodes() - 1; n > 0; n--) {
      below[network.parent(n)] += below[n];
    }
    return below;
  }

  /** Takes up new slopes of those led. */
  void renew(Workers workers) {
    List<PlaceSlope> sums = List.copyOf(parts.keySet());
    workers.each(
        sums.size(),
        k -> {
          sums.get(k).clear();
          parts.getOrDefault(sums.get(k), List.of()).forEach(sums.get(k)::add);
        });
    equations.renew();
  }

  /** A rough solution for all: right in what the boards below one of these have in common. */
  double[] lead(double[] c) {
    BoardRow own = equations.row();
    double[] above = new double[own.length()];
    for (int k = 0; k < own.count(); k++) {
      System.arraycopy(
          c, led.start(own.conductor(k)), above, k * own.perConductor(), own.perConductor());
    }
    double[] solved = equations.solve(above, ROUGH);
    double[] u = c.clone();
    for (int k = 0; k < leading.length; k++) {
      for (int i = 0; i < led.perConductor() && leading[k] >= 0; i++) {
        u[k * led.perConductor() + i] += solved[leading[k] + i] - above[leading[k] + i];
      }
    }
    return u;
  }
}
