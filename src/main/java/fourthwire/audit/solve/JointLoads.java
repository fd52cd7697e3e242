package fourthwire.audit.solve;

import fourthwire.load.model.JointSolver;
import fourthwire.load.model.LoadModel;
import fourthwire.load.model.NoSteadyStateException;
import fourthwire.load.model.PortSpectra;
import fourthwire.load.model.SharedSource;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.IntStream;

/**
 * Loads at one connection that shape each other's pulses beyond the orders the network knows: they
 * are solved together in time, behind the R-L that the network shows them all and what each has of
 * its own before it. A mutable work block, for one thread at a time.
 */
final class JointLoads implements SharedSource {
  /**
   * From so much on ({@link JointSolver#felt}) loads are solved together: solved each for itself,
   * their currents would be in error by some tenths of a percent at single orders.
   */
  private static final double FELT = 1;

  /** What has no more than this of its impedance in common with others is not felt by them. */
  private static final double LITTLE = 0.2;

  /** And from so much on one's slope can't be told without the others. */
  private static final double STRONG = 5;

  private final List<DevicePort> members;
  private final JointSolver solver;

  private JointLoads(List<DevicePort> members) {
    this.members = List.copyOf(members);
    List<LoadModel> models = members.stream().map(load -> load.device().model()).toList();
    this.solver = models.get(0).newJointSolver(models);
  }

  /** Those among loads, whose series R-L are set, that have to be solved together. */
  static List<JointLoads> among(List<DevicePort> loads) {
    Map<PortPlace, List<List<DevicePort>>> byPlace = new LinkedHashMap<>();
    for (DevicePort load : loads) {
      if (joins(load, load)) {
        List<List<DevicePort>> here =
            byPlace.computeIfAbsent(load.group(), place -> new ArrayList<>());
        here.stream()
            .filter(some -> joins(some.get(0), load))
            .findFirst()
            .orElseGet(() -> begin(here))
            .add(load);
      }
    }
    return byPlace.values().stream()
        .flatMap(List::stream)
        .flatMap(some -> closeAmong(some).stream())
        .toList();
  }

  /** Those of loads that could be solved together that have to be. */
  private static Optional<JointLoads> closeAmong(List<DevicePort> loads) {
    if (loads.size() < 2) {
      return Optional.empty();
    }
    JointLoads all = new JointLoads(loads);
    List<DevicePort> close =
        IntStream.range(0, loads.size())
            .filter(k -> all.solver.felt(k, all) > FELT || all.solver.common(k, all) > LITTLE)
            .mapToObj(loads::get)
            .toList();
    if (close.size() < loads.size()) {
      return closeAmong(close);
    }
    return all.felt() > FELT ? Optional.of(all) : Optional.empty();
  }

  private double felt() {
    return IntStream.range(0, members.size())
        .mapToDouble(k -> solver.felt(k, this))
        .max()
        .orElse(0);
  }

  private static boolean joins(DevicePort one, DevicePort other) {
    return one.device().model().joins(other.device().model());
  }

  private static List<DevicePort> begin(List<List<DevicePort>> parts) {
    List<DevicePort> part = new ArrayList<>();
    parts.add(part);
    return part;
  }

  List<DevicePort> members() {
    return members;
  }

  /** What has to be known of the currents, in sentences. */
  List<String> remarks() {
    return solver.remarks();
  }

  /** Whether a member's slope can't be told without the others. */
  boolean isStrong() {
    return felt() > STRONG;
  }

  @Override
  public double ohm(int load, int other) {
    DevicePort port = members.get(load);
    return port.shared().ohm() + (load == other ? port.own().ohm() : 0);
  }

  @Override
  public double henry(int load, int other) {
    DevicePort port = members.get(load);
    return port.shared().henry() + (load == other ? port.own().henry() : 0);
  }

  /** Solves the members at the voltages they have taken; as {@link DevicePort#solve}. */
  void solve(OrdersInPlay orders, double omega, double[] x, double[] g) {
    double[] total = sum(orders, x);
    double[] before = sum(orders, g);
    List<double[]> drew = members.stream().map(load -> load.part(orders, g)).toList();
    members.forEach(load -> load.face(orders, omega, x, total));
    String failure = solve();
    members.forEach(load -> load.draw(orders, failure, g));
    double[] moved = DevicePort.difference(sum(orders, g), before);
    for (int m = 0; m < members.size() && failure.isEmpty(); m++) {
      members.get(m).learn(orders, omega, drew.get(m), moved, g);
    }
  }

  /** The reason where there is no solution. */
  private String solve() {
    try {
      solver.solve(
          members.stream().map(DevicePort::emf).toArray(PortSpectra[]::new),
          this,
          members.stream().map(DevicePort::drawn).toArray(PortSpectra[]::new));
      return "";
    } catch (NoSteadyStateException e) {
      return String.valueOf(e.getMessage());
    }
  }

  /** The members' parts of a state together. */
  private double[] sum(OrdersInPlay orders, double[] state) {
    double[] sum = new double[members.get(0).length(orders)];
    for (DevicePort load : members) {
      for (int i = 0; i < sum.length; i++) {
        sum[i] += state[load.offset() + i];
      }
    }
    return sum;
  }

  /** What all would draw more if the network stood still: the sum of g - x. */
  double[] step(OrdersInPlay orders, double[] x, double[] g) {
    return DevicePort.difference(sum(orders, g), sum(orders, x));
  }

  /**
   * Gives the members slopes of their own, found at the state last solved, each as it is before the
   * impedance that they share, where the voltage is one for all.
   */
  void findSlopes(OrdersInPlay orders, double omega, boolean own) {
    List<DeviceSlope> slopes = stepAll(orders);
    DeviceSlope together = new DeviceSlope(members.get(0).length(orders));
    slopes.forEach(together::add);
    SeriesOhms opened = members.get(0).shared().times(DevicePort.OPENED);
    together.open(orders, opened, omega);
    for (int m = 0; m < slopes.size(); m++) {
      slopes.get(m).open(orders, opened, omega, together);
      members.get(m).setSlope(new LoadSlope(slopes.get(m), 1, 0), own);
    }
  }

  /** Slopes by small steps of the electromotive force of all. */
  private List<DeviceSlope> stepAll(OrdersInPlay orders) {
    int size = members.get(0).length(orders);
    List<double[]> before = members.stream().map(load -> load.drawnRow(orders)).toList();
    List<DeviceSlope> slopes = members.stream().map(load -> new DeviceSlope(size)).toList();
    double volts = DevicePort.SLOPE_STEP * members.get(0).nominalV();
    for (int column = 0; column < size; column++) {
      double taken = stepped(orders, column, volts);
      for (int m = 0; m < members.size() && taken != 0; m++) {
        double[] after = members.get(m).drawnRow(orders);
        for (int row = 0; row < size; row++) {
          slopes.get(m).set(row, column, (after[row] - before.get(m)[row]) / taken);
        }
      }
    }
    return slopes;
  }

  /** As {@link SlopeFinder} steps one load: forwards, else backwards, else not at all. */
  private double stepped(OrdersInPlay orders, int column, double step) {
    for (double signed : new double[] {step, -step}) {
      members.forEach(load -> load.stepEmf(orders, column, signed));
      String failure = solve();
      members.forEach(load -> load.stepEmf(orders, column, -signed));
      if (failure.isEmpty()) {
        return signed;
      }
    }
    return 0;
  }
}
