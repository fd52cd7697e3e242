package fourthwire.audit.solve;

import fourthwire.audit.plan.Device;
import fourthwire.load.model.LoadSolver;
import fourthwire.load.model.NoSteadyStateException;
import fourthwire.load.model.PortSpectra;
import fourthwire.network.TreeNetwork;
import fourthwire.quantity.Spectrum;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/**
 * One load at its place in the network while the two are solved together: a mutable work block, for
 * one thread at a time.
 */
final class DevicePort {
  /** Part of the nominal voltage by which one order is stepped to find a slope. */
  static final double SLOPE_STEP = 1e-4;

  /**
   * How much of the impedance above the group is taken out of the slope of a load with next to no
   * impedance of its own. It would answer a voltage there without bounds, and Newton's equations
   * could not be solved; what is left bounds it, and costs a fiftieth of what the load moves by in
   * a pass.
   */
  static final double OPENED = 0.98;

  /** A change of the current, on its rms, that need not be solved for: the slope tells enough. */
  private static final double NOT_FELT = 2e-6;

  private final Device device;
  private final PortPlace place;
  private final PortPlace group;
  private final PortPlace home;
  private final Terminals terminals;
  private final LoadSolver solver;
  private final PortSpectra emf;
  private final PortSpectra drawn;
  private final int offset;
  private SeriesOhms series = SeriesOhms.NONE;
  private SeriesOhms shared = SeriesOhms.NONE;
  private double[] behind = new double[0];
  private double[] facing = new double[0];
  private Optional<LoadSlope> slope = Optional.empty();
  private boolean ownSlope;
  private Optional<JointLoads> joint = Optional.empty();
  private String failure = "";

  /**
   * The load at its place.
   *
   * @param group where Newton's equations see it: its own place, or where its circuit begins if it
   *     has that for itself
   * @param offset where its currents start in the whole state
   */
  DevicePort(Device device, PortPlace place, PortPlace group, TreeNetwork network, int offset) {
    this(device, place, group, place, 1, network, offset);
  }

  private DevicePort(
      Device device,
      PortPlace place,
      PortPlace group,
      PortPlace home,
      double weight,
      TreeNetwork network,
      int offset) {
    this.device = device;
    this.place = place;
    this.group = group;
    this.home = home;
    this.terminals = new Terminals(place, weight, network);
    this.offset = offset;
    this.solver = device.model().newSolver();
    this.emf = new PortSpectra(ports());
    this.drawn = new PortSpectra(ports());
  }

  /**
   * The same load, standing for many like it.
   *
   * @param count how many
   * @param lead where the network sees them all, each behind its own way from there
   */
  DevicePort speakingFor(double count, PortPlace lead, TreeNetwork network, int at) {
    return new DevicePort(device, lead, lead, home, count, network, at);
  }

  /** Where the network sees it. */
  PortPlace place() {
    return place;
  }

  /** Where it really stands. */
  PortPlace home() {
    return home;
  }

  PortPlace group() {
    return group;
  }

  Device device() {
    return device;
  }

  int ports() {
    return terminals.ports();
  }

  int offset() {
    return offset;
  }

  double nominalV() {
    return device.placement().request().nominalPortV();
  }

  /** How many loads like it stand here. */
  double weight() {
    return terminals.weight();
  }

  /** Where it meets the network. */
  Terminals terminals() {
    return terminals;
  }

  /**
   * Sets what it is solved behind.
   *
   * @param shared of that, what lies above the group
   */
  void setSeries(SeriesOhms whole, SeriesOhms shared) {
    this.series = whole;
    this.shared = shared;
  }

  /** Of the series impedance, what lies above the group. */
  SeriesOhms shared() {
    return shared;
  }

  /** Of the impedance above the group, what is taken out of the slope. */
  SeriesOhms opened() {
    boolean bounded = joint.isEmpty() && own().isAtLeast(shared.times(1 - OPENED));
    return bounded ? shared : shared.times(OPENED);
  }

  /** Of the series impedance, what lies below the group. */
  SeriesOhms own() {
    return series.beyond(shared);
  }

  /** It is solved with others from now on. */
  void setJoint(JointLoads loads) {
    joint = Optional.of(loads);
  }

  /** Those it is solved with, itself among them. */
  Optional<JointLoads> joint() {
    return joint;
  }

  /** How many numbers of the state are its own. */
  int length(OrdersInPlay orders) {
    return 2 * ports() * orders.count();
  }

  /** Why the last solution failed; empty if it did not. */
  String failure() {
    return failure;
  }

  /** What has to be known of the current that it draws, in sentences that name the load. */
  List<String> remarks() {
    return joint.map(JointLoads::remarks).orElseGet(solver::remarks).stream()
        .map(said -> device.placement().load().name() + ": " + said)
        .toList();
  }

  /**
   * Solves the load at the voltages taken; where its slope says that its current hardly moves, by
   * that slope.
   *
   * @param x the whole state, amps: what it drew when these voltages were solved
   * @param g receives what it draws now, in its place
   */
  void solve(OrdersInPlay orders, double omega, double[] x, double[] g) {
    double[] now = terminals.voltage();
    series.addDrop(orders, omega, x, offset, now);
    if (slope.isEmpty()) {
      solveAt(orders, now, g);
      return;
    }
    double[] change = difference(now, behind);
    double[] before = Arrays.copyOfRange(g, offset, offset + now.length);
    double[] answer = new double[now.length];
    slope.get().multiply(orders, change, answer);
    if (failure.isEmpty() && Gmres.norm(answer) <= NOT_FELT * Gmres.norm(before)) {
      for (int i = 0; i < answer.length; i++) {
        g[offset + i] += answer[i];
      }
      behind = now;
      return;
    }
    solveAt(orders, now, g);
    if (failure.isEmpty()) {
      double[] moved = difference(Arrays.copyOfRange(g, offset, offset + now.length), before);
      opened().times(-1).addDrop(orders, omega, moved, 0, change);
      slope.get().learn(orders, change, moved);
    }
  }

  static double[] difference(double[] a, double[] b) {
    double[] d = new double[a.length];
    for (int i = 0; i < d.length; i++) {
      d[i] = a[i] - b[i];
    }
    return d;
  }

  /**
   * How its current changes if what the network shows at the group stands still: g - x, and what
   * follows from that behind the impedance above the group.
   */
  double[] stepAlone(OrdersInPlay orders, double omega, double[] x, double[] g) {
    int size = length(orders);
    double[] step = difference(part(orders, g), part(orders, x));
    double[] drop = new double[size];
    double[] all = joint.map(loads -> loads.step(orders, x, g)).orElse(step);
    opened().addDrop(orders, omega, all, 0, drop);
    double[] answer = new double[size];
    slope().multiply(orders, drop, answer);
    for (int i = 0; i < size; i++) {
      step[i] += answer[i];
    }
    return step;
  }

  private void solveAt(OrdersInPlay orders, double[] now, double[] g) {
    putEmf(orders, now);
    failure = "";
    try {
      solver.solve(emf, series.ohm(), series.henry(), drawn);
      orders.copy(drawn, g, offset);
      behind = now;
    } catch (NoSteadyStateException e) {
      failure = String.valueOf(e.getMessage());
    }
  }

  private void putEmf(OrdersInPlay orders, double[] now) {
    int at = 0;
    for (int port = 0; port < ports(); port++) {
      for (int k = 0; k < orders.count(); k++) {
        emf.re[port][orders.at(k)] = now[at++];
        emf.im[port][orders.at(k)] = now[at++];
      }
    }
  }

  /** Its part of a state. */
  double[] part(OrdersInPlay orders, double[] state) {
    return Arrays.copyOfRange(state, offset, offset + length(orders));
  }

  /** The electromotive force at which it is to be solved. */
  PortSpectra emf() {
    return emf;
  }

  /** What it drew there. */
  PortSpectra drawn() {
    return drawn;
  }

  double[] drawnRow(OrdersInPlay orders) {
    double[] row = new double[length(orders)];
    orders.copy(drawn, row, 0);
    return row;
  }

  /** Steps one part of the electromotive force, by where it stands in a row. */
  void stepEmf(OrdersInPlay orders, int column, double volts) {
    double[][] part = column % 2 == 0 ? emf.re : emf.im;
    part[column / (2 * orders.count())][orders.at(column / 2 % orders.count())] += volts;
  }

  /**
   * Of a load that is solved with others: takes the electromotive force behind what all share.
   *
   * @param total what all of them drew when its voltage was solved
   */
  void face(OrdersInPlay orders, double omega, double[] x, double[] total) {
    facing = terminals.voltage();
    own().addDrop(orders, omega, x, offset, facing);
    shared.addDrop(orders, omega, total, 0, facing);
    putEmf(orders, facing);
  }

  /** Takes what it drew, solved with others. */
  void draw(OrdersInPlay orders, String reason, double[] g) {
    failure = reason;
    if (failure.isEmpty()) {
      orders.copy(drawn, g, offset);
    }
  }

  /**
   * Lets its slope learn from that.
   *
   * @param before what it drew before
   * @param all by how much the current of all changed
   */
  void learn(OrdersInPlay orders, double omega, double[] before, double[] all, double[] g) {
    if (slope.isPresent()) {
      double[] change = difference(facing, behind);
      opened().times(-1).addDrop(orders, omega, all, 0, change);
      slope.get().learn(orders, change, difference(part(orders, g), before));
    }
    behind = facing;
  }

  /** Whether the two half-waves of what it drew last differ. */
  boolean drawsEvenOrders() {
    double even = 0;
    double odd = 0;
    for (int port = 0; port < drawn.ports(); port++) {
      for (int h = 1; h <= Spectrum.HIGHEST_ORDER; h++) {
        double amps = Math.hypot(drawn.re[port][h], drawn.im[port][h]);
        even = Math.max(even, h % 2 == 0 ? amps : 0);
        odd = Math.max(odd, h % 2 == 1 ? amps : 0);
      }
    }
    return even > CoupledSolver.LOAD_TOLERANCE * odd;
  }

  /** The electromotive force last solved at. */
  double[] lastEmf() {
    return behind;
  }

  void setSlope(LoadSlope known, boolean own) {
    slope = Optional.of(known);
    ownSlope = own;
  }

  /** Whether its slope was worked out for itself alone. */
  boolean hasOwnSlope() {
    return ownSlope;
  }

  boolean hasSlope() {
    return slope.isPresent();
  }

  LoadSlope slope() {
    return slope.orElseThrow();
  }

  /**
   * The slope at the electromotive force last solved (which it follows at once), as it is before
   * the impedance above the group. Of a load that is solved with others, as it would be alone at
   * the voltage that is there; zero if it would find no steady state so.
   *
   * @param wholly steps all lines of a load on three ({@link SlopeFinder})
   */
  void findSlope(OrdersInPlay orders, double omega, boolean wholly, DeviceSlope slope) {
    if (joint.isPresent() && !solvesAlone(orders, omega)) {
      return;
    }
    new SlopeFinder(solver, emf, drawn, series)
        .find(orders, SLOPE_STEP * nominalV(), wholly, slope);
    slope.open(orders, opened(), omega);
  }

  private boolean solvesAlone(OrdersInPlay orders, double omega) {
    double[] now = terminals.voltage();
    series.addDrop(orders, omega, drawnRow(orders), 0, now);
    putEmf(orders, now);
    try {
      solver.solve(emf, series.ohm(), series.henry(), drawn);
      return true;
    } catch (NoSteadyStateException none) {
      return false;
    }
  }
}
