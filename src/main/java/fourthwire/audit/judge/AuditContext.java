package fourthwire.audit.judge;

import fourthwire.audit.MeasuredState;
import fourthwire.audit.judge.NodeCurrents.Demand;
import fourthwire.audit.plan.Device;
import fourthwire.audit.plan.NetworkPlan;
import fourthwire.audit.plan.Place;
import fourthwire.audit.solve.SiteSolution;
import fourthwire.audit.solve.Workers;
import fourthwire.quantity.Figure;
import fourthwire.site.LoadKind;
import fourthwire.site.Practice;
import fourthwire.site.SiteTree;
import fourthwire.site.Supply;
import fourthwire.site.Survey;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.concurrent.ConcurrentHashMap;

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
  private final BankSteps bankSteps;
  private final BankFindings banks;
  private final SharedNeutralFindings sharedNeutrals;
  private final Map<String, Double> surveyedDemandA;
  private final Map<String, List<MeasuredState>> measured;
  private final Set<String> motorFeeders;
  private final Map<String, Demand> demands = new ConcurrentHashMap<>();
  private final Optional<AuditContext> design;

  /** The design state, or any state that is to be judged by itself. */
  public AuditContext(
      Survey survey,
      Supply supply,
      SiteTree tree,
      List<Device> devices,
      NetworkPlan plan,
      SiteSolution solution,
      Workers workers) {
    this(survey, supply, tree, devices, plan, solution, Map.of(), workers);
  }

  /**
   * Likewise, with what readings say.
   *
   * @param measured by node
   */
  public AuditContext(
      Survey survey,
      Supply supply,
      SiteTree tree,
      List<Device> devices,
      NetworkPlan plan,
      SiteSolution solution,
      Map<String, List<MeasuredState>> measured,
      Workers workers) {
    this.measured = Map.copyOf(measured);
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
    this.bankSteps = new BankSteps(survey, supply, tree, devices, plan, workers);
    this.banks = new BankFindings(survey, solution);
    this.sharedNeutrals = new SharedNeutralFindings(survey);
    this.surveyedDemandA = surveyedDemandA(survey);
    this.motorFeeders = motorFeeders(tree, devices);
    this.design = Optional.empty();
  }

  /** Another state of the same site; what does not depend on the state is the other's. */
  private AuditContext(
      AuditContext other,
      NetworkPlan plan,
      SiteSolution solution,
      NonlinearShare nonlinear,
      Optional<AuditContext> design) {
    this.survey = other.survey;
    this.supply = other.supply;
    this.tree = other.tree;
    this.plan = plan;
    this.solution = solution;
    this.ampacities = other.ampacities;
    this.nonlinear = nonlinear;
    this.faults = other.faults;
    this.scan = other.scan;
    this.bankSteps = other.bankSteps;
    this.banks = new BankFindings(survey, solution);
    this.sharedNeutrals = other.sharedNeutrals;
    this.surveyedDemandA = other.surveyedDemandA;
    this.measured = other.measured;
    this.motorFeeders = other.motorFeeders;
    this.design = design;
  }

  /**
   * The site at an hour: its demand currents and shares of kinds stay those of this design state.
   */
  public AuditContext hour(NetworkPlan hourPlan, SiteSolution hourSolution) {
    return new AuditContext(this, hourPlan, hourSolution, nonlinear, Optional.of(this));
  }

  /** The site as its loads were drawn: a design state of its own on the same network. */
  public AuditContext drawn(List<Device> devices, NetworkPlan drawnPlan, SiteSolution drawn) {
    return new AuditContext(
        this, drawnPlan, drawn, new NonlinearShare(tree, devices), Optional.empty());
  }

  private static Map<String, Double> surveyedDemandA(Survey survey) {
    Map<String, Double> known = new HashMap<>();
    survey.supplies().forEach(s -> s.demandA().ifPresent(a -> known.put(s.name(), a)));
    survey.transformers().forEach(t -> t.demandA().ifPresent(a -> known.put(t.name(), a)));
    survey.panels().forEach(p -> p.demandA().ifPresent(a -> known.put(p.name(), a)));
    return known;
  }

  private static Set<String> motorFeeders(SiteTree tree, List<Device> devices) {
    Set<String> feeders = new HashSet<>();
    devices.stream()
        .map(Device::placement)
        .filter(p -> p.request().kind() == LoadKind.MOTOR)
        .forEach(p -> tree.path(p.circuit()).forEach(n -> feeders.add(n.name())));
    return feeders;
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

  public BankSteps bankSteps() {
    return bankSteps;
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

  /** The demand current that TDD at a node stands on: the design state's at every hour. */
  Demand demand(Place place) {
    return design
        .map(d -> d.demand(place))
        .orElseGet(() -> demands.computeIfAbsent(place.name(), n -> newDemand(place)));
  }

  private Demand newDemand(Place place) {
    if (supply.isGenerator()) {
      return new Demand(Figure.unknown("no TDD on a generator"), "");
    }
    Optional<Double> surveyed = Optional.ofNullable(surveyedDemandA.get(place.name()));
    if (surveyed.isPresent()) {
      return new Demand(Figure.of(surveyed.get()), "Demand current as surveyed.");
    }
    return measuredDemand(place.name()).orElseGet(() -> computedDemand(place));
  }

  /** Of the first meter at the node that was there long enough. */
  private Optional<Demand> measuredDemand(String node) {
    return measured.getOrDefault(node, List.of()).stream()
        .filter(m -> m.demand().amps().value().isPresent())
        .map(
            m ->
                new Demand(
                    m.demand().amps(),
                    "As measured by " + m.meter() + ": " + m.demand().basis() + "."))
        .findFirst();
  }

  private Demand computedDemand(Place place) {
    double largest =
        place.node().lines().stream()
            .map(
                line ->
                    solution.current(
                        plan.get(place.name()).networkNode(), place.conductors(), line))
            .mapToDouble(s -> s.magnitude(1))
            .max()
            .orElse(0);
    return largest > 0
        ? new Demand(
            Figure.of(largest),
            "Largest line fundamental of the design state, none being surveyed.")
        : new Demand(Figure.unknown("no line carries current"), "");
  }

  /** Whether motors that stand on the line without a drive hang below the node. */
  public boolean feedsMotors(String node) {
    return motorFeeders.contains(node);
  }
}
