package fourthwire.audit.doubt;

import fourthwire.audit.AuditFailedException;
import fourthwire.audit.HeadlineFigure;
import fourthwire.audit.NodeDoubt;
import fourthwire.audit.NodeDoubt.ClampPoint;
import fourthwire.audit.Progress;
import fourthwire.audit.judge.AuditContext;
import fourthwire.audit.judge.NodeFigures;
import fourthwire.audit.judge.SiteState;
import fourthwire.audit.plan.Device;
import fourthwire.audit.plan.Place;
import fourthwire.limits.Check;
import fourthwire.limits.Finding;
import fourthwire.site.SiteTree;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Draws sites from what the survey leaves open, solves each as the site itself is solved, and says
 * how sure the figures and verdicts are.
 *
 * <p>The same seed gives the same figures to the last bit, whatever the number of threads: the
 * draws are solved one after the other. A draw that can't be solved ends the work with an {@link
 * AuditFailedException} that names it: leaving it out would bend the percentiles.
 */
public final class Doubt {
  private final SiteState.Source states;
  private final AuditContext design;
  private final int draws;
  private final long seed;
  private final DrawnLoads loads;
  private final Map<String, NodeDraws> nodes = new LinkedHashMap<>();

  /**
   * Prepares the draws around a design state.
   *
   * @param states solves the draws
   * @param devices the loads of the design state
   * @param draws how many, 1 or more
   */
  public Doubt(
      SiteState.Source states, AuditContext design, List<Device> devices, int draws, long seed) {
    this.states = states;
    this.design = design;
    this.draws = draws;
    this.seed = seed;
    this.loads = new DrawnLoads(devices, new LatinHypercube(seed, draws));
    for (Place place : design.plan().places()) {
      nodes.put(place.name(), new NodeDraws(new NodeFigures(design, place), draws));
    }
  }

  /**
   * What the draws say of a node.
   *
   * @param doubt ranges and where they come from
   * @param findings the design state's figures with their probabilities, worst first
   */
  public record Outcome(NodeDoubt doubt, List<Finding> findings) {}

  /** Solves every draw and answers by node. */
  public Map<String, Outcome> solve(Progress progress) {
    for (int draw = 0; draw < draws; draw++) {
      fill(draw, progress);
    }
    return outcomes();
  }

  private void fill(int draw, Progress progress) {
    AuditContext drawn = solve(draw, progress);
    List<Place> places = drawn.plan().places();
    states
        .workers()
        .each(
            places.size(),
            p -> drawn(places.get(p).name()).put(draw, new NodeFigures(drawn, places.get(p))));
  }

  private AuditContext solve(int draw, Progress progress) {
    String message = "Solving sites drawn from what is not known, %d of %d".formatted(draw, draws);
    progress.at((double) draw / draws, message);
    try {
      List<Device> devices = loads.at(draw);
      SiteState state =
          states.solve(devices, (share, pass) -> progress.at((draw + share) / draws, message));
      return design.drawn(devices, state.plan(), state.solution());
    } catch (AuditFailedException e) {
      throw new AuditFailedException(
          "Draw %d of %d: %s".formatted(draw + 1, draws, e.getMessage()), e);
    }
  }

  private Map<String, Outcome> outcomes() {
    InputRanking ranking = InputRanking.of(loads, draws);
    List<ClampPoint> clampNext = clampNext();
    Map<String, Outcome> outcomes = new LinkedHashMap<>();
    for (Place place : design.plan().places()) {
      boolean root = place.node().kind() == SiteTree.Kind.SUPPLY;
      NodeDoubt doubt = doubt(place.name(), ranking, root ? clampNext : List.of());
      outcomes.put(place.name(), new Outcome(doubt, findings(place)));
    }
    return outcomes;
  }

  private List<ClampPoint> clampNext() {
    Map<String, NodeDraws> points = new LinkedHashMap<>();
    for (Place place : design.plan().places()) {
      SiteTree.Kind kind = place.node().kind();
      if (kind == SiteTree.Kind.PANEL || kind == SiteTree.Kind.TRANSFORMER) {
        Optional.ofNullable(nodes.get(place.name())).ifPresent(n -> points.put(place.name(), n));
      }
    }
    return new ClampNext(nodes.values().stream(), draws).best(points);
  }

  private NodeDoubt doubt(String node, InputRanking ranking, List<ClampPoint> clampNext) {
    NodeDraws drawn = drawn(node);
    HeadlineFigure ranked =
        Optional.of(HeadlineFigure.NEUTRAL_RMS)
            .filter(f -> drawn.figure(f).isPresent())
            .orElse(HeadlineFigure.ACTIVE);
    return new NodeDoubt(
        draws,
        seed,
        drawn.ranges(),
        ranked,
        drawn.figure(ranked).map(ranking::of).orElse(List.of()),
        clampNext);
  }

  private List<Finding> findings(Place place) {
    NodeFigures figures = new NodeFigures(design, place);
    NodeDraws drawn = drawn(place.name());
    List<Finding> findings = new ArrayList<>();
    for (Check check : figures.checks()) {
      check.finding(drawn.probability(check.key())).ifPresent(findings::add);
    }
    findings.addAll(figures.notes());
    findings.sort(Comparator.comparing(Finding::severity));
    return List.copyOf(findings);
  }

  private NodeDraws drawn(String node) {
    return Optional.ofNullable(nodes.get(node)).orElseThrow();
  }
}
