package fourthwire.audit.solve;

import fourthwire.network.TreeNetwork;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collection;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.function.Predicate;

/**
 * A few boards above many: of n boards each is led by the nearest above it, or itself, that has √n
 * boards at or below, else by the topmost of its voltage level. What hangs at a board is seen from
 * above behind the feeders between ({@link FedSlope}); what boards do to each other below the one
 * that leads them, and what three-line loads do to the lines beside them there, is left aside.
 */
final class UpperBoards {
  /** Fewer boards than this need none to lead them. */
  private static final int FEW = 12;

  /** Those above are worth their while if they are so many times fewer. */
  private static final int TIMES_FEWER = 3;

  /** How well their own equations are solved, each time they lead. */
  private static final double ROUGH = 0.03;

  private final BoardResponse response;
  private final BoardEquations equations;
  private final BoardRow led;

  /** For each conductor among those led, where the one begins that leads it. */
  private final int[] leading;

  private final List<FeederOhms> feeders;
  private final List<List<FedSlope>> byBoard;
  private final Map<PlaceSlope, List<FedSlope>> parts = new LinkedHashMap<>();

  /**
   * Boards above others.
   *
   * @param equations theirs
   * @param leads which of their places leads each slope below
   * @param led how those below stand in a row; it has all of these boards too
   */
  UpperBoards(
      BoardResponse response,
      BoardEquations equations,
      Map<PlaceSlope, PortPlace> leads,
      BoardRow led) {
    this.response = response;
    this.equations = equations;
    this.led = led;
    List<BoardAbove> above = led.nodes().mapToObj(this::above).toList();
    this.leading =
        above.stream()
            .flatMapToInt(a -> Arrays.stream(a.conductors()).map(c -> network().index(a.node(), c)))
            .map(equations.row()::start)
            .toArray();
    this.feeders = FeederOhms.below(above, led, response);
    Map<Integer, List<FedSlope>> boards = new TreeMap<>();
    leads.forEach(
        (slope, lead) -> {
          FeederOhms feeder = feeders.get(led.position(slope.place().node()));
          FedSlope fed = new FedSlope(slope, feeder, network(), led);
          parts.computeIfAbsent(equations.slope(lead), s -> new ArrayList<>()).add(fed);
          boards.computeIfAbsent(slope.place().node(), n -> new ArrayList<>()).add(fed);
        });
    this.byBoard = List.copyOf(boards.values());
  }

  private TreeNetwork network() {
    return response.network();
  }

  /** The board that leads a node, and how its conductors are joined to it. */
  private BoardAbove above(int node) {
    int[] conductors = new int[network().conductors(node)];
    Arrays.setAll(conductors, c -> c);
    int lead = node;
    while (!equations.stands(lead) && network().isFedByFeeder(lead)) {
      for (int c = 0; c < conductors.length; c++) {
        conductors[c] = network().joinedTo(lead, conductors[c]);
      }
      lead = network().parent(lead);
    }
    return new BoardAbove(lead, conductors);
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
  void renew() {
    Workers workers = response.workers();
    workers.each(byBoard.size(), b -> byBoard.get(b).forEach(FedSlope::renew));
    List<PlaceSlope> sums = List.copyOf(parts.keySet());
    workers.each(
        sums.size(),
        k -> {
          sums.get(k).clear();
          parts.getOrDefault(sums.get(k), List.of()).forEach(fed -> sums.get(k).add(fed.seen()));
        });
    equations.renew();
  }

  /** A rough solution for all: what is drawn at c, what follows above, what follows from both. */
  double[] lead(double[] c) {
    double[] drawn = new double[led.length()];
    drawAt(c, drawn, fed -> true);
    double[] solved = equations.solve(summed(drawn), new double[0], ROUGH);
    double[] u = c.clone();
    int length = led.perConductor();
    for (int k = 0; k < leading.length; k++) {
      for (int i = 0; i < length; i++) {
        u[k * length + i] += solved[leading[k] + i];
      }
    }
    Arrays.fill(drawn, 0);
    drawAt(u, drawn, FedSlope::isBehind);
    response.workers().each(feeders.size(), b -> feeders.get(b).fall(drawn, u));
    return u;
  }

  private double[] summed(double[] drawn) {
    double[] sums = new double[equations.row().length()];
    int length = led.perConductor();
    for (int k = 0; k < leading.length; k++) {
      for (int i = 0; i < length; i++) {
        sums[leading[k] + i] += drawn[k * length + i];
      }
    }
    return sums;
  }

  private void drawAt(double[] potentials, double[] drawn, Predicate<FedSlope> which) {
    response
        .workers()
        .each(
            byBoard.size(),
            b -> {
              for (FedSlope fed : byBoard.get(b)) {
                if (which.test(fed)) {
                  fed.seen().answer(potentials, drawn);
                }
              }
            });
  }
}
