package fourthwire.audit.solve;

import fourthwire.audit.AuditFailedException;
import fourthwire.audit.Progress;
import fourthwire.audit.plan.Device;
import fourthwire.audit.plan.NetworkPlan;
import fourthwire.site.Survey;
import java.util.List;
import java.util.Optional;

/**
 * Solves the network and its loads together, state by state: voltages shape the currents and
 * currents the voltages.
 *
 * <p>The unknown x is what the loads draw. The network answers it with voltages in linear time (see
 * {@code fourthwire.network}); each load, solved behind the series R-L that the network shows it
 * ({@link SeriesEstimate}), answers those with its current again: g(x). Rectifiers at one
 * connection that shape each other's pulses beyond the orders of the network answer together
 * ({@link JointLoads}). Newton's method leads to x = g(x) ({@link NewtonStep}); slopes are worked
 * out for a few loads, lent to those alike ({@link SlopeBook}) and corrected by what each load's
 * own solutions show ({@link LoadSlope}). So a resonance, a soft generator or a shared riser costs
 * a few more passes, no more, and no matrix over the site is ever formed. A load whose slope says
 * that it hardly moves is not solved again, and a few that lag behind all others catch up with
 * their boards while the rest stands still ({@link Stragglers}).
 *
 * <p>Converged means: every load's current at the final voltages equals what was injected within
 * {@value #LOAD_TOLERANCE} of its rms, no load's voltage moved by more than {@value
 * #VOLTAGE_TOLERANCE} of nominal, and no conductor's current by more than {@value
 * #CONDUCTOR_TOLERANCE} of its rms (and a hundredth of that of the site's largest). Otherwise
 * {@link AuditFailedException} names the load and the order; the last iterate is never a result.
 * Kirchhoff's laws and the balance of power are checked on every result.
 *
 * <p>One solver serves many states of a site, one after the other: hours, draws, supplies. Each
 * starts from what the loads drew in the one before, whatever of them is still there, and so takes
 * fewer passes. Results are the same, to the last bit, for any number of threads.
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

  private final Survey survey;
  private final Workers workers;
  private final int mostPasses;
  private boolean allOrders;
  private LoadCurrents before = LoadCurrents.NONE;
  private Optional<SlopeBook> book = Optional.empty();

  /** A solver for states of this survey. */
  public CoupledSolver(Survey survey, Workers workers) {
    this(survey, workers, MOST_PASSES);
  }

  CoupledSolver(Survey survey, Workers workers, int mostPasses) {
    this.mostPasses = mostPasses;
    this.survey = survey;
    this.workers = workers;
  }

  /**
   * Solves one state.
   *
   * @param plan the network of this state
   * @param devices every load of this state; their linear parts stand in the plan's network already
   * @param progress told of every pass; what it throws ends the solution
   * @throws AuditFailedException where network and loads do not settle
   */
  public SiteSolution solve(NetworkPlan plan, List<Device> devices, Progress progress) {
    OrdersInPlay orders =
        allOrders ? OrdersInPlay.all() : OrdersInPlay.of(survey.background(), devices);
    SiteIteration iteration = new SiteIteration(survey, plan, devices, orders, workers, mostPasses);
    SlopeBook slopes = book.filter(iteration::canUse).orElseGet(iteration::newBook);
    book = Optional.of(slopes);
    SiteSolution solution;
    try {
      solution = iteration.solve(before, slopes, progress);
    } catch (AuditFailedException e) {
      if (iteration.losesEvenOrders()) {
        return withAllOrders(plan, devices, progress);
      }
      throw e;
    }
    if (iteration.losesEvenOrders()) {
      return withAllOrders(plan, devices, progress);
    }
    before = iteration.currents();
    return solution;
  }

  /**
   * Once a load has shown half-waves that differ, this state and those to come are solved whole.
   */
  private SiteSolution withAllOrders(NetworkPlan plan, List<Device> devices, Progress progress) {
    allOrders = true;
    return solve(plan, devices, progress);
  }
}
