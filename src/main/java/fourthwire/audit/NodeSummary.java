package fourthwire.audit;

import fourthwire.limits.Severity;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Figure;
import fourthwire.site.SiteTree;
import java.util.Comparator;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.Function;

/**
 * One row of an audit's list of nodes.
 *
 * @param node name; a circuit as {@code panel:circuit}
 * @param findings how many of each severity, all three present
 * @param lineRmsA by line, amps
 * @param currentThdPercent the worst line's
 * @param tddPercent the worst line's
 * @param voltageThdPercent the worst line's or pair's
 */
public record NodeSummary(
    String node,
    SiteTree.Kind kind,
    Optional<String> fedFrom,
    Map<Severity, Integer> findings,
    Figure neutralRmsA,
    Figure neutralLoadingPercent,
    Map<Conductor, Figure> lineRmsA,
    Figure currentThdPercent,
    Figure tddPercent,
    Figure voltageThdPercent,
    Figure transformerLoadingPercent,
    Figure harmonicLossFactor,
    Figure activeW,
    Figure powerFactor,
    Figure lossesW) {

  /**
   * Worst first: more findings to act on, then to watch, then the neutral loaded highest, then more
   * notes. Nodes alike in all of these keep their order.
   */
  public static final Comparator<NodeSummary> WORST_FIRST =
      Comparator.comparingInt((NodeSummary n) -> -n.count(Severity.ACT))
          .thenComparingInt(n -> -n.count(Severity.WATCH))
          .thenComparingDouble(n -> -n.neutralLoadingPercent().value().orElse(-1))
          .thenComparingInt(n -> -n.count(Severity.NOTE));

  /** How many findings of this severity. */
  public int count(Severity severity) {
    return findings.getOrDefault(severity, 0);
  }

  /** The row of a node's result. */
  public static NodeSummary of(NodeResult result) {
    Function<Function<DesignState, Figure>, Figure> figure =
        f -> result.design().map(f).orElse(Figure.unknown(result.designReason()));
    return new NodeSummary(
        result.node(),
        result.kind(),
        result.fedFrom(),
        counts(result),
        figure.apply(d -> d.neutral().rmsA()),
        figure.apply(d -> d.neutral().loadingPercent()),
        lines(result),
        figure.apply(d -> worst(d.lines().values(), DesignState.LineCurrent::thdPercent)),
        figure.apply(d -> worst(d.lines().values(), DesignState.LineCurrent::tddPercent)),
        figure.apply(d -> worst(d.voltage().values(), DesignState.LineVoltage::thdPercent)),
        figure.apply(NodeSummary::transformerLoading),
        figure.apply(DesignState::harmonicLossFactor),
        figure.apply(d -> d.power().activeW()),
        figure.apply(d -> d.power().powerFactor()),
        figure.apply(DesignState::lossesW));
  }

  private static Map<Severity, Integer> counts(NodeResult result) {
    Map<Severity, Integer> counts = new EnumMap<>(Severity.class);
    for (Severity s : Severity.values()) {
      counts.put(s, (int) result.findings().stream().filter(f -> f.severity() == s).count());
    }
    return counts;
  }

  private static Map<Conductor, Figure> lines(NodeResult result) {
    Map<Conductor, Figure> lines = new EnumMap<>(Conductor.class);
    result.design().ifPresent(d -> d.lines().forEach((line, c) -> lines.put(line, c.rmsA())));
    return lines;
  }

  private static Figure transformerLoading(DesignState design) {
    return design
        .transformer()
        .map(DesignState.TransformerState::loadingPercent)
        .orElse(Figure.unknown("not a transformer"));
  }

  /** The largest known one; where none is known, the first one's reason. */
  private static <T> Figure worst(Iterable<T> of, Function<T, Figure> figure) {
    List<Figure> all = new java.util.ArrayList<>();
    of.forEach(t -> all.add(figure.apply(t)));
    return all.stream()
        .filter(f -> f.value().isPresent())
        .max(Comparator.comparingDouble(f -> f.value().getAsDouble()))
        .or(() -> all.stream().findFirst())
        .orElse(Figure.unknown("no line conductor"));
  }
}
