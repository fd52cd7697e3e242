package fourthwire.audit.judge;

import fourthwire.audit.Progress;
import fourthwire.audit.plan.Device;
import fourthwire.audit.plan.NetworkPlan;
import fourthwire.audit.solve.CoupledSolver;
import fourthwire.audit.solve.SiteSolution;
import fourthwire.audit.solve.Workers;
import fourthwire.site.SiteTree;
import fourthwire.site.Supply;
import fourthwire.site.Survey;
import java.util.List;

/**
 * A site on one supply with its loads as they are at one time, solved.
 *
 * @param devices every load that draws
 * @param plan the network they stand in
 * @param solution voltages and currents of both together
 */
public record SiteState(List<Device> devices, NetworkPlan plan, SiteSolution solution) {

  /**
   * Solves states of a site on one supply, one after the other, each from where the one before
   * ended.
   *
   * @param workers share the loops of each state
   * @param solver of all of them
   */
  public record Source(
      Survey survey, Supply supply, SiteTree tree, Workers workers, CoupledSolver solver) {
    /** A source that starts from nothing. */
    public static Source of(Survey survey, Supply supply, SiteTree tree, Workers workers) {
      return new Source(survey, supply, tree, workers, new CoupledSolver(survey, workers));
    }

    /** Lays out and solves. */
    public SiteState solve(List<Device> devices, Progress progress) {
      NetworkPlan plan = NetworkPlan.of(survey, supply, tree, devices, true);
      return new SiteState(devices, plan, solver.solve(plan, devices, progress));
    }
  }
}
