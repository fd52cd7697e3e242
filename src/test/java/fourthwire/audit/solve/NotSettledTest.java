package fourthwire.audit.solve;

import static org.assertj.core.api.Assertions.assertThatThrownBy;

import fourthwire.audit.AuditFailedException;
import fourthwire.audit.Progress;
import fourthwire.audit.plan.Device;
import fourthwire.audit.plan.LoadPlacements;
import fourthwire.audit.plan.NetworkPlan;
import fourthwire.load.DesignPowers;
import fourthwire.site.SiteTree;
import fourthwire.site.Survey;
import fourthwire.testsupport.MixedSite;
import java.util.List;
import org.junit.jupiter.api.Test;

/**
 * What does not settle is no result: the refusal names the load, where it stands, and the order.
 */
class NotSettledTest {
  @Test
  void namesLoadAndOrder() {
    Survey survey = MixedSite.survey(4, 40, 1);
    SiteTree tree = SiteTree.of(survey);
    DesignPowers known = new DesignPowers();
    List<Device> devices =
        LoadPlacements.of(survey, tree).stream().map(p -> Device.of(p, known)).toList();
    NetworkPlan plan = NetworkPlan.of(survey, survey.normalSupply(), tree, devices, true);
    try (Workers workers = new Workers(1, () -> {})) {
      CoupledSolver solver = new CoupledSolver(survey, workers, 1);
      assertThatThrownBy(() -> solver.solve(plan, devices, Progress.SILENT))
          .isInstanceOf(AuditFailedException.class)
          .hasMessageMatching(
              "The network and its loads did not settle in 1 passes: load \"load \\d+\" on"
                  + " LP-\\d+:\\d+ still changes by .* % of its current, most at order \\d+");
    }
  }
}
