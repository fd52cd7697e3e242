package fourthwire.audit.solve;

import fourthwire.network.Excitation;
import fourthwire.network.TreeNetwork;
import fourthwire.network.Trunk;
import java.util.Collection;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import java.util.stream.Collectors;
import java.util.stream.IntStream;

/**
 * Newton's equations at the boards: with K the slopes of what hangs there ({@link PlaceSlope}), Z
 * what the network answers to a current, and c what it answers to the currents that the loads would
 * draw more anyway, the change of the boards' potentials is u = c + Z·K·u. Solved by minimal
 * residuals ({@link Gmres}); a product is one sweep of the boards alone ({@link Trunk}).
 *
 * <p>Most of what loads do to each other they do through what many boards have in common: the
 * supply, a transformer, a riser. So the same equations are first solved for a few boards above,
 * which see those below through their feeders, and that leads the solution for all ({@link
 * UpperBoards}); those above are led by each of them solved alone ({@link BoardInverse}). Active
 * filters' currents are further unknowns, behind the potentials.
 */
final class BoardEquations {
  private static final int MOST_PRODUCTS = 120;

  /** Boards above, if no more than this, are solved one by one to lead their own solution. */
  private static final int MOST_INVERSES = 100;

  private final BoardResponse response;
  private final BoardRow row;
  private final Trunk trunk;
  private final Map<PortPlace, PlaceSlope> slopes = new LinkedHashMap<>();
  private final List<List<PlaceSlope>> byBoard;
  private final List<ActiveFilter> filters;
  private final int filtersLength;
  private final Optional<UpperBoards> upper;
  private final List<BoardInverse> inverses;

  /**
   * Equations for loads at these places.
   *
   * @param filters the active filters, whose currents are unknowns too
   */
  BoardEquations(BoardResponse response, Collection<PortPlace> places, List<ActiveFilter> filters) {
    TreeNetwork network = response.network();
    this.response = response;
    this.filters = filters;
    this.filtersLength =
        filters.stream().mapToInt(f -> 2 * f.ports() * response.orders().count()).sum();
    Map<PortPlace, PortPlace> leads = UpperBoards.leads(network, places);
    Optional<BoardEquations> above =
        leads.isEmpty()
            ? Optional.empty()
            : Optional.of(new BoardEquations(response, leads.values(), List.of()));
    IntStream boards =
        IntStream.concat(
            places.stream().mapToInt(PortPlace::node),
            above.stream().flatMapToInt(equations -> equations.row().nodes()));
    this.row = new BoardRow(network, response.orders(), boards);
    this.trunk =
        Trunk.of(
            network, IntStream.concat(row.nodes(), filters.stream().mapToInt(ActiveFilter::node)));
    places.forEach(place -> slopes.computeIfAbsent(place, p -> new PlaceSlope(p, network, row)));
    this.byBoard =
        slopes.values().stream()
            .collect(
                Collectors.collectingAndThen(
                    Collectors.groupingBy(s -> s.place().node(), TreeMap::new, Collectors.toList()),
                    boardsOf -> List.copyOf(boardsOf.values())));
    this.inverses = above.isEmpty() && byBoard.size() <= MOST_INVERSES ? inverses() : List.of();
    this.upper = above.map(equations -> new UpperBoards(response, equations, leadsOf(leads), row));
  }

  private List<BoardInverse> inverses() {
    List<FeederOhms> whole = FeederOhms.whole(row, response);
    return byBoard.stream()
        .map(slopes -> whole.get(row.position(slopes.get(0).place().node())))
        .map(ohms -> new BoardInverse(ohms, row.perConductor()))
        .toList();
  }

  /** Whether a board is in the row. */
  boolean stands(int node) {
    return row.start(response.network().index(node, 0)) >= 0;
  }

  private Map<PlaceSlope, PortPlace> leadsOf(Map<PortPlace, PortPlace> leads) {
    Map<PlaceSlope, PortPlace> bySlope = new LinkedHashMap<>();
    leads.forEach((place, lead) -> bySlope.put(slope(place), lead));
    return bySlope;
  }

  BoardRow row() {
    return row;
  }

  /** The slope of all that hangs at a place. */
  PlaceSlope slope(PortPlace place) {
    return Optional.ofNullable(slopes.get(place)).orElseThrow();
  }

  /** To be called when slopes have changed. */
  void renew() {
    upper.ifPresent(UpperBoards::renew);
    response.workers().each(inverses.size(), b -> inverses.get(b).renew(byBoard.get(b)));
  }

  /**
   * Solves.
   *
   * @param drawn row of what is drawn more anyway
   * @param fed what the filters feed more anyway
   * @return the row of potentials, and behind it what the filters feed
   */
  double[] solve(double[] drawn, double[] fed, double tolerance) {
    double[] none = new double[row.length() + filtersLength];
    double[] c = new double[row.length() + filtersLength];
    respond(drawn, none, c);
    for (int i = 0; i < filtersLength; i++) {
      c[row.length() + i] += fed[i];
    }
    return solve(c, tolerance);
  }

  /** The unknowns for this right side. */
  double[] solve(double[] c, double tolerance) {
    return new Gmres(this::product, this::rough, tolerance, MOST_PRODUCTS).solve(c);
  }

  private double[] rough(double[] c) {
    if (upper.isPresent()) {
      return upper.get().lead(c);
    }
    if (inverses.isEmpty()) {
      return c;
    }
    double[] solved = c.clone();
    response.workers().each(inverses.size(), b -> inverses.get(b).solve(solved));
    return solved;
  }

  /** into = y less what the network answers where slopes and filters answer to y. */
  private void product(double[] y, double[] into) {
    double[] drawn = new double[row.length()];
    response
        .workers()
        .each(byBoard.size(), b -> byBoard.get(b).forEach(slope -> slope.answer(y, drawn)));
    respond(drawn, y, into);
    for (int i = 0; i < into.length; i++) {
      into[i] = y[i] - into[i];
    }
  }

  /** What the network answers to currents drawn and to what filters feed in y. */
  private void respond(double[] drawn, double[] y, double[] into) {
    response.find(
        trunk,
        row,
        drawn,
        filters.isEmpty()
            ? Optional.empty()
            : Optional.of((excitation, position) -> feed(excitation, position, y)),
        into);
    for (ActiveFilter filter : filters) {
      filter.answer(response.orders(), response.solutions(), y, into, shift(filter));
    }
  }

  private void feed(Excitation excitation, int position, double[] y) {
    filters.forEach(f -> f.feed(excitation, response.orders(), position, y, shift(f)));
  }

  /** By how much later a filter's currents stand here than in the whole state. */
  private int shift(ActiveFilter filter) {
    return row.length() - filters.get(0).offset();
  }
}
