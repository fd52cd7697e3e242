package fourthwire.audit.judge;

import fourthwire.audit.plan.Device;
import fourthwire.audit.plan.NetworkPlan;
import fourthwire.audit.solve.SiteSolution;
import fourthwire.audit.solve.Workers;
import fourthwire.site.LoadKind;
import fourthwire.site.Panel;
import fourthwire.site.Practice;
import fourthwire.site.SiteTree;
import fourthwire.site.Supply;
import fourthwire.site.Survey;
import fourthwire.site.Transformer;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;

/** What every node of one audit is judged with: the survey, the solution and what follows. */
public final class AuditContext {
  private final Survey survey;
  private final Supply supply;
  private final SiteTree tree;
  private final NetworkPlan plan;
  private final SiteSolution solution;
  private final Ampacities ampacities;
  private final NonlinearShare nonlinear;
  private final FaultLevels faults;
  private final ImpedanceScan scan;
  private final BankFindings banks;
  private final SharedNeutralFindings sharedNeutrals;
  private final Map<String, Double> demandA = new HashMap<>();
  private final Set<String> motorFeeders = new HashSet<>();

  public AuditContext(
      Survey survey,
      Supply supply,
      SiteTree tree,
      List<Device> devices,
      NetworkPlan plan,
      SiteSolution solution,
      Workers workers) {
    this.survey = survey;
    this.supply = supply;
    this.tree = tree;
    this.plan = plan;
    this.solution = solution;
    this.ampacities = new Ampacities(survey);
    this.nonlinear = new NonlinearShare(tree, devices);
    this.faults =
        new FaultLevels(
            NetworkPlan.of(survey, supply, tree, List.of(), false), supply.isGenerator());
    this.scan =
        new ImpedanceScan(
            survey, plan, NetworkPlan.of(survey, supply, tree, devices, false), workers);
    this.banks = new BankFindings(survey, solution);
    this.sharedNeutrals = new SharedNeutralFindings(survey);
    survey.supplies().forEach(s -> demand(s.name(), s.demandA()));
    survey.transformers().forEach((Transformer t) -> demand(t.name(), t.demandA()));
    survey.panels().forEach((Panel p) -> demand(p.name(), p.demandA()));
    devices.stream()
        .map(Device::placement)
        .filter(p -> p.request().kind() == LoadKind.MOTOR)
        .forEach(p -> tree.path(p.circuit()).forEach(n -> motorFeeders.add(n.name())));
  }

  private void demand(String node, OptionalDouble amps) {
    amps.ifPresent(a -> demandA.put(node, a));
  }

  public Supply supply() {
    return supply;
  }

  public SiteTree tree() {
    return tree;
  }

  public NetworkPlan plan() {
    return plan;
  }

  public SiteSolution solution() {
    return solution;
  }

  public Ampacities ampacities() {
    return ampacities;
  }

  public NonlinearShare nonlinear() {
    return nonlinear;
  }

  public FaultLevels faults() {
    return faults;
  }

  public ImpedanceScan scan() {
    return scan;
  }

  public BankFindings banks() {
    return banks;
  }

  public SharedNeutralFindings sharedNeutrals() {
    return sharedNeutrals;
  }

  public Practice practice() {
    return survey.settings().practice();
  }

  /** The point of common coupling: as surveyed, else the normal supply. */
  public String pcc() {
    return survey.settings().pcc().orElse(survey.normalSupply().name());
  }

  public Optional<Double> surveyedDemandA(String node) {
    return Optional.ofNullable(demandA.get(node));
  }

  /** Whether motors that stand on the line without a drive hang below the node. */
  public boolean feedsMotors(String node) {
    return motorFeeders.contains(node);
  }
}
