package fourthwire.web.panel;

import fourthwire.audit.DesignState;
import fourthwire.audit.NodeResult;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Figure;
import fourthwire.site.SiteTree;
import fourthwire.site.Survey;
import fourthwire.web.figure.SmallRails;
import fourthwire.web.support.Column;
import fourthwire.web.support.FindingText;
import fourthwire.web.support.Names;
import fourthwire.web.support.Numbers;
import fourthwire.web.support.Verdict;
import fourthwire.web.support.Words;
import java.util.ArrayList;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.OptionalDouble;
import java.util.function.Function;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.springframework.stereotype.Component;

/** Makes rows of nodes, their figures aligned, each with the four conductors in little. */
@Component
public final class NodeRows {
  private final Words words;

  NodeRows(Words words) {
    this.words = words;
  }

  /** The rows of these results, in their order; depths are counted in the tree. */
  public List<NodeRow> of(List<NodeResult> results, SiteTree tree, Survey survey) {
    return of(results, List.of(), tree, survey);
  }

  /** The same, each row saying besides what was found at those of these circuits that it feeds. */
  public List<NodeRow> of(
      List<NodeResult> results, List<NodeResult> circuits, SiteTree tree, Survey survey) {
    int top = results.stream().mapToInt(r -> depth(tree, r.node())).min().orElse(0);
    List<String> line = column(results, NodeRows::lineLoading);
    List<String> neutral = column(results, d -> d.neutral().loadingPercent());
    List<String> amps = results.stream().map(NodeRows::neutralAmps).toList();
    List<String> thd = column(results, NodeRows::voltageThd);
    List<NodeRow> rows = new ArrayList<>();
    for (int i = 0; i < results.size(); i++) {
      NodeResult result = results.get(i);
      rows.add(
          new NodeRow(
              result.node(),
              shortName(result),
              "kind." + result.kind().word(),
              depth(tree, result.node()) - top,
              about(result, survey),
              result.design().map(d -> rails(d, survey)).orElse(""),
              line.get(i),
              neutral.get(i).isEmpty() ? amps.get(i) : neutral.get(i),
              thd.get(i),
              Verdict.of(result.findings()),
              about(result),
              below(result, circuits)));
    }
    return rows;
  }

  private String about(NodeResult result) {
    return result.design().isEmpty()
        ? words.of("row.unsupplied")
        : Verdict.worst(result.findings()).map(f -> FindingText.about(words, f)).orElse("");
  }

  private List<NodeRow.Below> below(NodeResult feeding, List<NodeResult> circuits) {
    List<Verdict> verdicts =
        circuits.stream()
            .filter(c -> c.fedFrom().filter(feeding.node()::equals).isPresent())
            .map(c -> Verdict.of(c.findings()))
            .toList();
    return Stream.of(Verdict.ACT, Verdict.WATCH)
        .filter(verdicts::contains)
        .map(v -> below(v, (int) verdicts.stream().filter(v::equals).count()))
        .toList();
  }

  private NodeRow.Below below(Verdict verdict, int count) {
    String key = "row.below." + verdict.word() + (count == 1 ? ".one" : ".many");
    return new NodeRow.Below(verdict, words.of(key, words.count(count)));
  }

  private static String shortName(NodeResult result) {
    String name = result.node();
    return result.kind() == SiteTree.Kind.CIRCUIT ? name.substring(name.indexOf(':') + 1) : name;
  }

  private static int depth(SiteTree tree, String node) {
    return Math.max(0, Math.min(4, tree.path(node).size() - 1));
  }

  private String about(NodeResult result, Survey survey) {
    return switch (result.kind()) {
      case TRANSFORMER ->
          survey.transformers().stream()
              .filter(t -> t.name().equals(result.node()))
              .map(t -> Numbers.plain(t.ratedKva(), "kVA") + " " + t.connection().symbol())
              .findFirst()
              .orElse("");
      case CIRCUIT ->
          survey.loads().stream()
              .filter(l -> l.circuitId().equals(result.node()))
              .map(
                  l ->
                      (l.quantity() == 1 ? "" : Numbers.plain(l.quantity(), "") + "\u00a0× ")
                          + l.name())
              .collect(Collectors.joining("; "));
      case SUPPLY, PANEL -> "";
    };
  }

  private String rails(DesignState design, Survey survey) {
    Names names = new Names(survey.settings().practice());
    Map<Conductor, OptionalDouble> shares = new EnumMap<>(Conductor.class);
    design.lines().forEach((c, l) -> shares.put(c, share(l.loadingPercent())));
    if (design.neutral().rmsA().value().isPresent()) {
      shares.put(Conductor.N, share(design.neutral().loadingPercent()));
    }
    String list =
        shares.entrySet().stream()
            .map(e -> names.of(e.getKey()) + " " + percent(e.getValue()))
            .collect(Collectors.joining(", "));
    return SmallRails.draw(shares, words.of("rails.small", list));
  }

  private String percent(OptionalDouble share) {
    return share.isPresent()
        ? Numbers.of(100 * share.getAsDouble(), "%")
        : words.of("rails.small.unknown");
  }

  private static OptionalDouble share(Figure percent) {
    return percent.value().isPresent()
        ? OptionalDouble.of(percent.value().getAsDouble() / 100)
        : OptionalDouble.empty();
  }

  /** Where no ampacity is known: what the neutral carries. */
  private static String neutralAmps(NodeResult result) {
    return result
        .design()
        .map(d -> d.neutral().rmsA().value())
        .filter(OptionalDouble::isPresent)
        .map(a -> Numbers.of(a.getAsDouble(), "A"))
        .orElse("");
  }

  private static List<String> column(
      List<NodeResult> results, Function<DesignState, Figure> figure) {
    List<Figure> figures =
        results.stream()
            .map(r -> r.design().map(figure).orElse(Figure.unknown("")))
            .map(f -> f.value().isPresent() ? f : Figure.unknown(""))
            .toList();
    return Column.of(figures, new fourthwire.web.support.Reasons()).stream()
        .map(Column.Cell::text)
        .toList();
  }

  private static Figure lineLoading(DesignState design) {
    return worst(design.lines().values().stream().map(DesignState.LineCurrent::loadingPercent));
  }

  private static Figure voltageThd(DesignState design) {
    return worst(
        design.voltage().entrySet().stream()
            .filter(e -> !e.getKey().equals(Conductor.N.name()))
            .map(e -> e.getValue().thdPercent()));
  }

  private static Figure worst(Stream<Figure> figures) {
    return figures
        .filter(f -> f.value().isPresent())
        .max(java.util.Comparator.comparingDouble(f -> Objects.requireNonNull(f).value().orElse(0)))
        .orElse(Figure.unknown(""));
  }
}
