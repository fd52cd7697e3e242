package fourthwire.audit.solve;

import fourthwire.audit.AuditFailedException;
import fourthwire.audit.Progress;
import fourthwire.audit.plan.Device;
import fourthwire.audit.plan.NetworkPlan;
import fourthwire.network.Excitation;
import fourthwire.network.FactoredOrder;
import fourthwire.network.OrderSolution;
import fourthwire.network.SolutionCheck;
import fourthwire.network.TreeNetwork;
import fourthwire.network.UnsolvableOrderException;
import fourthwire.quantity.Spectrum;
import fourthwire.site.Filter;
import fourthwire.site.Survey;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.stream.IntStream;

/**
 * Solves the network and its loads together: voltages shape the currents and currents the voltages.
 *
 * <p>The unknown x is what the loads draw. The network answers it with voltages in linear time (see
 * {@code fourthwire.network}); each load, solved behind the series R-L that the network shows it
 * ({@link SeriesEstimate}), answers those with its current again: g(x). Two plain passes lead near
 * x = g(x), then Newton's method to it, its linear equations solved by minimal residuals ({@link
 * Gmres}) from the slopes of the loads and the network's own linear answer, so that no matrix over
 * the site is ever formed and a resonance or a soft generator costs a few more products, no more.
 *
 * <p>Converged means: every load's current at the final voltages equals what was injected within
 * {@value #LOAD_TOLERANCE} of its rms, no load's voltage moved by more than {@value
 * #VOLTAGE_TOLERANCE} of nominal, and no conductor's current by more than {@value
 * #CONDUCTOR_TOLERANCE} of its rms (and a hundredth of that of the site's largest). Otherwise
 * {@link AuditFailedException} names the load and the order; the last iterate is never a result.
 */
public final class CoupledSolver {
  /** A tenth of what is promised, so that what follows from the solution holds it too. */
  public static final double LOAD_TOLERANCE = 1e-5;

  /** Likewise a tenth. */
  public static final double VOLTAGE_TOLERANCE = 1e-6;

  /** As promised. */
  public static final double CONDUCTOR_TOLERANCE = 1e-4;

  /** Kirchhoff's laws and the balance of power hold at least this well, relative. */
  public static final double CHECK_TOLERANCE = 1e-8;

  private static final int MOST_PASSES = 60;
  private static final int PLAIN_PASSES = 2;
  private static final int SHORTEST_STEP = 10;

  private final NetworkPlan plan;
  private final TreeNetwork network;
  private final OrdersInPlay orders;
  private final List<DevicePort> loads = new ArrayList<>();
  private final List<ActiveFilter> filters = new ArrayList<>();
  private final FactoredOrder[] factors = new FactoredOrder[Spectrum.HIGHEST_ORDER + 1];
  private final Excitation[] excitations = new Excitation[Spectrum.HIGHEST_ORDER + 1];
  private final OrderSolution[] solutions = new OrderSolution[Spectrum.HIGHEST_ORDER + 1];
  private final double omega;
  private final int length;

  /**
   * Prepares a solution.
   *
   * @param devices every load; their linear parts stand in the plan's network already
   */
  public CoupledSolver(Survey survey, NetworkPlan plan, List<Device> devices) {
    this.plan = plan;
    this.network = plan.network();
    this.omega = 2 * Math.PI * survey.settings().frequencyHz();
    this.orders = OrdersInPlay.of(survey.background(), devices);
    int at = 0;
    for (Device device : devices) {
      if (!device.model().isLinear()) {
        loads.add(DevicePort.of(device, plan, at));
        at += 2 * device.model().ports() * orders.count();
      }
    }
    for (Filter filter : survey.filters()) {
      if (filter.type() == Filter.Type.ACTIVE && plan.find(filter.panel()).isPresent()) {
        ActiveFilter active = ActiveFilter.of(filter, plan.get(filter.panel()), network, at);
        filters.add(active);
        at += 2 * active.ports() * orders.count();
      }
    }
    this.length = at;
  }

  /** Solves; {@code progress} is told of every pass. */
  public SiteSolution solve(Progress progress) {
    progress.at(0, "Eliminating the network");
    eachOrder(this::factor);
    solveNetwork(new double[length]);
    if (length > 0) {
      iterate(progress);
    }
    check();
    return new SiteSolution(network, orders, solutions);
  }

  private void iterate(Progress progress) {
    SeriesEstimate series = new SeriesEstimate(network, factors, loads, omega);
    series.applyTogether(solutions[1]);
    double[] x = new double[length];
    double[] g = new double[length];
    Settling settling = new Settling(loads, filters, orders);
    for (int pass = 1; pass <= PLAIN_PASSES && image(x, g).isEmpty(); pass++) {
      settling.look(x, g);
      System.arraycopy(g, 0, x, 0, length);
      solveNetwork(x);
    }
    series.applyAlone(plan);
    refuse(image(x, g));
    NewtonStep newton = new NewtonStep(network, factors, orders, loads, filters, omega);
    for (int pass = PLAIN_PASSES + 1; pass <= MOST_PASSES; pass++) {
      settling.look(x, g);
      progress.at(settling.share(), "Network and loads together, pass " + pass);
      if (settling.loadsSettled() && conductorsSettled(g)) {
        return;
      }
      newton.renewWhereSlow(settling.change());
      advance(x, g, newton.step(x, g));
    }
    throw new AuditFailedException(
        "The network and its loads did not settle in %d passes: %s"
            .formatted(MOST_PASSES, settling.worst()));
  }

  /**
   * Takes a Newton step, or the longest part of it (halved again and again) that brings the loads
   * nearer to what was injected.
   */
  private void advance(double[] x, double[] g, double[] step) {
    double[] start = x.clone();
    double before = distance(x, g);
    String failure = "";
    double part = 1;
    for (int halving = 0; halving < SHORTEST_STEP; halving++) {
      for (int i = 0; i < length; i++) {
        x[i] = start[i] + part * step[i];
      }
      solveNetwork(x);
      failure = image(x, g);
      if (failure.isEmpty() && distance(x, g) < before) {
        return;
      }
      part /= 2;
    }
    // The shortest step stands: near the end rounding can keep the distance from falling.
    refuse(failure);
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
    loads.parallelStream()
        .forEach(
            load -> {
              load.takeVoltages(orders, solutions);
              load.solve(orders, omega, x, g);
            });
    filters.forEach(filter -> filter.solve(orders, solutions, x, g));
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

  private void factor(int order) {
    try {
      factors[order] = network.factor(order);
    } catch (UnsolvableOrderException e) {
      throw new AuditFailedException(
          "The network has no unique solution at order %d: %s".formatted(order, e.getMessage()), e);
    }
    excitations[order] = network.excitation();
    solutions[order] = factors[order].solve(excitations[order]);
  }

  private void solveNetwork(double[] x) {
    IntStream.range(0, orders.count()).parallel().forEach(k -> solveOrder(k, x));
  }

  private void solveOrder(int position, double[] x) {
    int h = orders.at(position);
    Excitation excitation = excitations[h].clear();
    plan.supply().excite(h, excitation);
    for (DevicePort load : loads) {
      for (int port = 0; port < load.ports(); port++) {
        int at = load.offset() + 2 * (port * orders.count() + position);
        load.draw(excitation, port, x[at], x[at + 1]);
      }
    }
    for (ActiveFilter filter : filters) {
      filter.feed(excitation, orders, position, x);
    }
    factors[h].solve(excitation, solutions[h]);
  }

  /** Solves the network for what the loads draw now, and says whether its currents stood still. */
  private boolean conductorsSettled(double[] g) {
    int conductors = network.conductors();
    double[] square = new double[conductors];
    double[] moved = new double[conductors];
    double[] before = new double[2 * conductors];
    for (int k = 0; k < orders.count(); k++) {
      OrderSolution s = solutions[orders.at(k)];
      for (int c = 0; c < conductors; c++) {
        before[2 * c] = s.currentRe(c);
        before[2 * c + 1] = s.currentIm(c);
      }
      solveOrder(k, g);
      for (int c = 0; c < conductors; c++) {
        double re = s.currentRe(c);
        double im = s.currentIm(c);
        square[c] += re * re + im * im;
        double dRe = re - before[2 * c];
        double dIm = im - before[2 * c + 1];
        moved[c] += dRe * dRe + dIm * dIm;
      }
    }
    double largest = Math.sqrt(Arrays.stream(square).max().orElse(0));
    return IntStream.range(0, conductors)
        .allMatch(
            c ->
                Math.sqrt(moved[c])
                    <= CONDUCTOR_TOLERANCE * (Math.sqrt(square[c]) + largest / 100));
  }

  /** Nothing leaves here that breaks Kirchhoff's laws or the balance of power. */
  private void check() {
    eachOrder(
        h -> {
          SolutionCheck check = factors[h].check(excitations[h], solutions[h]);
          if (!(check.worst() <= CHECK_TOLERANCE)) {
            throw new AuditFailedException(
                String.format(
                    Locale.ROOT,
                    "The solution of order %d does not balance (%.2e); no figure is given",
                    h,
                    check.worst()));
          }
        });
  }

  private void eachOrder(java.util.function.IntConsumer action) {
    IntStream.range(0, orders.count()).map(orders::at).parallel().forEach(action);
  }
}
