package fourthwire.audit.run;

import fourthwire.audit.Audit;
import fourthwire.audit.AuditFailedException;
import fourthwire.audit.AuditRequest;
import fourthwire.audit.AuditResult;
import fourthwire.audit.MeasuredState;
import fourthwire.audit.NodeResult;
import fourthwire.audit.Progress;
import fourthwire.audit.WeekState;
import fourthwire.audit.doubt.Doubt;
import fourthwire.audit.judge.AuditContext;
import fourthwire.audit.judge.NodeReport;
import fourthwire.audit.judge.SiteState;
import fourthwire.audit.plan.Device;
import fourthwire.audit.plan.LoadPlacements;
import fourthwire.audit.solve.Workers;
import fourthwire.audit.week.Week;
import fourthwire.limits.LimitEditions;
import fourthwire.load.DesignPowers;
import fourthwire.site.SiteTree;
import fourthwire.site.Supply;
import fourthwire.site.SupplyRole;
import fourthwire.site.Survey;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.Supplier;

/**
 * The audit: assembles the site's network, solves it together with its loads in the design state,
 * and reports every node.
 */
public final class HarmonicAudit implements Audit {
  /** Version of the engine: rises whenever the same survey can give other figures. */
  public static final String ENGINE_VERSION = "1.3";

  private static final String NO_WEEK = "the week is computed on the normal supply";

  private static final String NO_DRAWS = "no draws were asked for";
  private static final String NOT_ASKED_FOR = "not asked for";

  private static final List<String> NOTES =
      List.of(
          "Design state: every load at its demand, schedules ignored, all capacitor steps in.",
          "No-load loss and magnetising current of transformers are outside the network.",
          "Mutual coupling between conductors and the proximity effect are not modelled.");

  private final int threads;

  /** An audit that uses every processor of the machine. */
  public HarmonicAudit() {
    this(Runtime.getRuntime().availableProcessors());
  }

  /** An audit on so many threads; its figures do not depend on their number. */
  public HarmonicAudit(int threads) {
    this.threads = threads;
  }

  @Override
  public AuditResult run(AuditRequest request, Progress progress) {
    Reporter reporter = new Reporter(progress);
    try (Workers workers = new Workers(threads, reporter::again)) {
      return run(request, reporter, workers);
    }
  }

  private static AuditResult run(AuditRequest request, Reporter progress, Workers workers) {
    Survey survey = request.survey();
    Supply supply = supply(survey, request.supply());
    progress.at(0.02, "Building the load models");
    SiteTree tree = SiteTree.of(survey, supply);
    DesignPowers known = new DesignPowers();
    List<Device> devices = workers.map(LoadPlacements.of(survey, tree), p -> Device.of(p, known));
    SiteState.Source states = SiteState.Source.of(survey, supply, tree, workers);
    SiteState state = states.solve(devices, progress.part(0.05, 0.3));
    progress.at(0.3, "Scanning the impedance over the orders");
    AuditContext context =
        new AuditContext(
            survey,
            supply,
            tree,
            devices,
            state.plan(),
            state.solution(),
            request.measured(),
            workers);
    progress.at(0.38, "Judging the nodes");
    List<NodeResult> nodes = new ArrayList<>(report(context, request.measured(), workers));
    addWeek(
        request,
        context,
        () -> new Week(states, context, devices, known),
        nodes,
        progress.part(0.4, 0.6));
    addDoubt(
        request,
        () -> new Doubt(states, context, devices, request.draws(), request.seed()),
        nodes,
        progress.part(0.6, 0.99));
    nodes.addAll(notSupplied(survey, tree, supply, request.measured()));
    progress.at(1, "Done");
    return new AuditResult(
        supply.name(), ENGINE_VERSION, LimitEditions.editions(), List.copyOf(nodes), NOTES);
  }

  private static void addWeek(
      AuditRequest request,
      AuditContext context,
      Supplier<Week> week,
      List<NodeResult> nodes,
      Progress progress) {
    if (!request.week() || context.supply().roleOrDefault() != SupplyRole.NORMAL) {
      String reason = request.week() ? NO_WEEK : NOT_ASKED_FOR;
      nodes.replaceAll(n -> n.withWeek(Optional.empty(), reason));
      return;
    }
    Map<String, WeekState> weeks = week.get().solve(progress);
    nodes.replaceAll(n -> n.withWeek(Optional.ofNullable(weeks.get(n.node())), ""));
  }

  private static void addDoubt(
      AuditRequest request, Supplier<Doubt> doubt, List<NodeResult> nodes, Progress progress) {
    if (request.draws() == 0) {
      nodes.replaceAll(n -> n.withDoubt(Optional.empty(), NO_DRAWS, n.findings()));
      return;
    }
    try {
      Map<String, Doubt.Outcome> outcomes = doubt.get().solve(progress);
      nodes.replaceAll(
          n ->
              Optional.ofNullable(outcomes.get(n.node()))
                  .map(o -> n.withDoubt(Optional.of(o.doubt()), "", o.findings()))
                  .orElse(n));
    } catch (AuditFailedException e) {
      String reason = String.valueOf(e.getMessage());
      nodes.replaceAll(n -> n.withDoubt(Optional.empty(), reason, n.findings()));
    }
  }

  private static Supply supply(Survey survey, Optional<String> name) {
    if (name.isEmpty()) {
      return survey.normalSupply();
    }
    return survey.supplies().stream()
        .filter(s -> s.name().equals(name.get()))
        .findFirst()
        .orElseThrow(
            () -> new AuditFailedException("The survey has no supply called " + name.get()));
  }

  private static List<NodeResult> report(
      AuditContext context, Map<String, List<MeasuredState>> measured, Workers workers) {
    return workers.map(
        context.tree().nodes(),
        node ->
            new NodeReport(context, context.plan().get(node.name()))
                .result(measured.getOrDefault(node.name(), List.of())));
  }

  /** The nodes that the supply in use does not feed, with the reason instead of figures. */
  private static List<NodeResult> notSupplied(
      Survey survey, SiteTree tree, Supply supply, Map<String, List<MeasuredState>> measured) {
    List<NodeResult> nodes = new ArrayList<>();
    SiteTree whole = SiteTree.of(survey);
    for (SiteTree.Node node : whole.nodes()) {
      if (tree.find(node.name()).isEmpty()) {
        nodes.add(
            new NodeResult(
                    node.name(),
                    node.kind(),
                    node.parent(),
                    supply.name(),
                    Optional.empty(),
                    "not supplied from " + supply.name(),
                    measured.getOrDefault(node.name(), List.of()),
                    List.of(),
                    List.of())
                .withWeek(Optional.empty(), "not supplied from " + supply.name())
                .withDoubt(Optional.empty(), "not supplied from " + supply.name(), List.of()));
      }
    }
    return nodes;
  }
}
