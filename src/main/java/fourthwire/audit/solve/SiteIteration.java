package fourthwire.audit.solve;

import fourthwire.audit.AuditFailedException;
import fourthwire.audit.Progress;
import fourthwire.audit.plan.Device;
import fourthwire.audit.plan.NetworkPlan;
import fourthwire.network.TreeNetwork;
import fourthwire.network.Trunk;
import fourthwire.site.Filter;
import fourthwire.site.Survey;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** One state of a site being solved, from the first guess to where loads and network agree. */
final class SiteIteration {
  private static final int SHORTEST_STEP = 10;

  /** Below this part of a step that all loads can follow, none shorter is tried. */
  private static final double SHORTER = 0.2;

  /** A sample must have so many times fewer loads. */
  private static final int FEWER = 4;

  /** How well a sample settles. */
  private static final double ROUGHLY = 0.01;

  private final NetworkPlan plan;
  private final TreeNetwork network;
  private final OrdersInPlay orders;
  private final List<DevicePort> loads;
  private final List<ActiveFilter> filters = new ArrayList<>();
  private final StateNetwork state;

  /** Of a few loads that speak for all: where they stand. */
  private final Optional<Trunk> few;

  private final double omega;
  private final Workers workers;
  private final int mostPasses;
  private final int length;
  private double[] last = new double[0];

  /** Those that are solved together, and those that are solved each for itself. */
  private List<JointLoads> together = List.of();

  private List<DevicePort> alone;

  SiteIteration(
      Survey survey,
      NetworkPlan plan,
      List<Device> devices,
      OrdersInPlay orders,
      Workers workers,
      int mostPasses) {
    this.plan = plan;
    this.mostPasses = mostPasses;
    this.workers = workers;
    this.network = plan.network();
    this.omega = 2 * Math.PI * survey.settings().frequencyHz();
    this.orders = orders;
    this.loads = new ArrayList<>();
    this.state = new StateNetwork(plan, orders, workers);
    this.few = Optional.empty();
    int at = addLoads(devices.stream().filter(d -> !d.model().isLinear()).toList());
    for (Filter filter : survey.filters()) {
      if (filter.type() == Filter.Type.ACTIVE && plan.find(filter.panel()).isPresent()) {
        ActiveFilter active = ActiveFilter.of(filter, plan.get(filter.panel()), network, at);
        filters.add(active);
        at += 2 * active.ports() * orders.count();
      }
    }
    this.length = at;
    this.alone = loads;
  }

  /** The same state with a few loads that speak for all; active filters stand still. */
  private SiteIteration(SiteIteration whole, List<DevicePort> sample) {
    this.plan = whole.plan;
    this.mostPasses = whole.mostPasses;
    this.workers = whole.workers;
    this.network = whole.network;
    this.omega = whole.omega;
    this.orders = whole.orders;
    this.loads = sample;
    this.alone = sample;
    this.state = whole.state;
    this.few = Optional.of(Trunk.of(network, sample.stream().mapToInt(l -> l.place().node())));
    this.length = sample.stream().mapToInt(load -> load.length(orders)).sum();
  }

  private int addLoads(List<Device> devices) {
    List<PortPlace> places =
        devices.stream()
            .map(d -> PortPlace.of(d.placement(), plan.get(d.placement().circuit())))
            .toList();
    int[] loadsAt = new int[network.nodes()];
    places.forEach(place -> loadsAt[place.node()]++);
    int at = 0;
    for (int d = 0; d < devices.size(); d++) {
      PortPlace place = places.get(d);
      PortPlace group = (loadsAt[place.node()] == 1 ? place.feeding(network) : place).top(network);
      DevicePort load = new DevicePort(devices.get(d), place, group, network, at);
      loads.add(load);
      at += load.length(orders);
    }
    return at;
  }

  /**
   * Solves.
   *
   * @param guess what the loads draw, if something like it is known
   * @param book slopes found in other states, over the same orders
   */
  SiteSolution solve(LoadCurrents guess, SlopeBook book, Progress progress) {
    progress.at(0, "Eliminating the network");
    state.factor();
    double[] x = new double[length];
    if (length > 0) {
      double[] g = new double[length];
      if (!begin(x, guess) && !beginWithFew(x, book, progress)) {
        beginTogether(x);
      }
      takeUp(x);
      if (!image(x, g).isEmpty()) {
        beginTogether(x);
        takeUp(x);
        refuse(image(x, g));
      }
      iterate(x, g, book, progress);
    } else {
      solveNetwork(x);
    }
    state.check();
    return new SiteSolution(network, orders, state.solutions(), remarks());
  }

  /** What has to be known of loads' currents, by circuit. */
  private Map<String, List<String>> remarks() {
    Map<String, List<String>> byCircuit = new HashMap<>();
    for (DevicePort load : loads) {
      for (String said : load.remarks()) {
        byCircuit
            .computeIfAbsent(load.device().placement().circuit(), c -> new ArrayList<>())
            .add(said);
      }
    }
    return byCircuit;
  }

  /** Whether a load draws even orders that are not among this state's. */
  boolean losesEvenOrders() {
    return orders.oddOnly() && loads.stream().anyMatch(DevicePort::drawsEvenOrders);
  }

  /** An empty book of slopes over this state's orders. */
  SlopeBook newBook() {
    return new SlopeBook(orders, omega);
  }

  /** Whether a book's slopes are over this state's orders. */
  boolean canUse(SlopeBook book) {
    return book.covers(orders);
  }

  /** What the loads drew at last. */
  LoadCurrents currents() {
    return new LoadCurrents(orders, loads, last);
  }

  /** The first guess, if something is known. */
  private boolean begin(double[] x, LoadCurrents guess) {
    return guess.fill(orders, loads, x);
  }

  /**
   * The first guess where nothing is known: each load is solved once at the voltages of a site that
   * draws nothing, behind what all loads together see.
   */
  private void beginTogether(double[] x) {
    Arrays.fill(x, 0);
    together = List.of();
    alone = loads;
    solveNetwork(x);
    series().applyTogether(state.solutions()[1]);
    image(x, x);
  }

  /**
   * The first guess on a large site: a few loads that speak for all settle with the network first.
   *
   * @return false where that helps nothing or leads nowhere
   */
  private boolean beginWithFew(double[] x, SlopeBook book, Progress progress) {
    Map<PortPlace, PortPlace> leads =
        UpperBoards.leads(network, loads.stream().map(DevicePort::group).toList());
    LoadSample sample = new LoadSample(loads, leads, network, orders);
    if (leads.isEmpty() || sample.spokesmen().size() * FEWER > loads.size()) {
      return false;
    }
    try {
      SiteIteration few = new SiteIteration(this, sample.spokesmen());
      few.settle(book, progress);
      sample.spread(orders, few.last, x);
      return true;
    } catch (AuditFailedException notSoEasily) {
      return false;
    }
  }

  private void settle(SlopeBook book, Progress progress) {
    double[] x = new double[length];
    double[] g = new double[length];
    beginTogether(x);
    takeUp(x);
    refuse(image(x, g));
    iterate(x, g, book, progress);
  }

  /** From here every load is solved behind what it sees alone. */
  private void takeUp(double[] x) {
    series().applyAlone();
    if (few.isEmpty()) {
      together = JointLoads.among(loads);
      together.forEach(some -> some.members().forEach(load -> load.setJoint(some)));
      alone = loads.stream().filter(load -> load.joint().isEmpty()).toList();
    }
    solveNetwork(x);
  }

  private SeriesEstimate series() {
    return new SeriesEstimate(network, state.factors(), loads, omega, workers);
  }

  private void iterate(double[] x, double[] g, SlopeBook book, Progress progress) {
    Settling settling = new Settling(loads, filters, orders);
    NewtonStep newton =
        new NewtonStep(network, state.factors(), orders, loads, filters, omega, book, workers);
    boolean caughtUp = false;
    for (int pass = 1; pass <= mostPasses; pass++) {
      settling.look(x, g);
      if (few.isPresent()) {
        progress.at(0, "Network and a few loads for all, pass " + pass);
      } else {
        progress.at(settling.share(), "Network and loads together, pass " + pass);
      }
      if (few.isPresent()
          ? settling.change() <= ROUGHLY
          : settling.loadsSettled() && state.settled(g, loads, filters)) {
        last = g;
        return;
      }
      List<DevicePort> behind = few.isPresent() || caughtUp ? List.of() : settling.stragglers();
      caughtUp = behind.stream().allMatch(l -> l.joint().isEmpty()) && !behind.isEmpty();
      if (caughtUp) {
        new Stragglers(network, state, orders, behind, omega, book, workers).catchUp(x, g);
        solveNetwork(x);
        refuse(image(x, g));
      } else {
        newton.renewSlopes(settling, g);
        advance(x, g, newton.step(x, g));
      }
    }
    throw new AuditFailedException(
        "The network and its loads did not settle in %d passes: %s"
            .formatted(mostPasses, settling.worst()));
  }

  /**
   * Takes a Newton step, or the longest part of it (halved again and again) that brings the loads
   * nearer to what was injected. Where no part does, a load's current jumps: then the longest part
   * stands that every load can follow.
   */
  private void advance(double[] x, double[] g, double[] step) {
    double[] start = x.clone();
    double before = distance(x, g);
    double longest = 0;
    double part = 1;
    String failure = "";
    for (int halving = 0; halving < SHORTEST_STEP && part > longest * SHORTER; halving++) {
      failure = tryPart(part, start, step, x, g);
      if (failure.isEmpty() && distance(x, g) < before) {
        return;
      }
      longest = failure.isEmpty() ? Math.max(longest, part) : longest;
      part /= 2;
    }
    refuse(longest > 0 ? tryPart(longest, start, step, x, g) : failure);
  }

  private String tryPart(double part, double[] start, double[] step, double[] x, double[] g) {
    for (int i = 0; i < length; i++) {
      x[i] = start[i] + part * step[i];
    }
    solveNetwork(x);
    return image(x, g);
  }

  private static void refuse(String failure) {
    if (!failure.isEmpty()) {
      throw new AuditFailedException(failure);
    }
  }

  private static double distance(double[] x, double[] g) {
    double sum = 0;
    for (int i = 0; i < x.length; i++) {
      sum += (g[i] - x[i]) * (g[i] - x[i]);
    }
    return Math.sqrt(sum);
  }

  /** What the loads draw at the solved voltages, into g; the reason where one can't. */
  private String image(double[] x, double[] g) {
    workers.each(loads.size(), d -> loads.get(d).terminals().take(orders, state.solutions()));
    workers.each(together.size(), k -> together.get(k).solve(orders, omega, x, g));
    workers.each(alone.size(), d -> alone.get(d).solve(orders, omega, x, g));
    filters.forEach(filter -> filter.solve(orders, state.solutions(), x, g));
    return loads.stream()
        .filter(load -> !load.failure().isEmpty())
        .findFirst()
        .map(
            load ->
                "Load \"%s\" on %s: %s"
                    .formatted(
                        load.device().placement().load().name(),
                        load.device().placement().circuit(),
                        load.failure()))
        .orElse("");
  }

  private void solveNetwork(double[] x) {
    state.solve(x, loads, filters, few);
  }
}
