package fourthwire.web.panel;

import fourthwire.audit.DesignState;
import fourthwire.audit.NodeResult;
import fourthwire.quantity.Figure;
import fourthwire.site.Circuit;
import fourthwire.site.Load;
import fourthwire.web.support.Column;
import fourthwire.web.support.Numbers;
import fourthwire.web.support.Reasons;
import fourthwire.web.support.Words;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Collectors;

/**
 * Lists what hangs directly on a node, ranked by what it adds to the neutral's current; what adds
 * nothing, having no neutral, comes last.
 */
final class BranchesMaker {
  private final Words words;
  private final NodeCase node;
  private final NodeRows rows;
  private final Map<String, Double> adds;

  BranchesMaker(Words words, NodeCase node, NodeRows rows) {
    this.words = words;
    this.node = node;
    this.rows = rows;
    this.adds =
        node.design().map(DesignState::neutralAdders).orElse(List.of()).stream()
            .collect(
                Collectors.toMap(
                    DesignState.NeutralAdder::node, DesignState.NeutralAdder::amps, Double::sum));
  }

  List<NodePage.Branch> make() {
    List<NodeResult> ranked =
        node.children().stream()
            .sorted(
                Comparator.comparingDouble(
                    (NodeResult c) -> -adds.getOrDefault(c.node(), Double.NEGATIVE_INFINITY)))
            .toList();
    List<String> amps = amps(ranked);
    List<NodeRow> listed = rows.of(ranked, node.tree(), node.survey());
    List<NodePage.Branch> branches = new ArrayList<>();
    for (int i = 0; i < ranked.size(); i++) {
      String child = ranked.get(i).node();
      branches.add(
          new NodePage.Branch(
              listed.get(i), lines(child), known(child), amps.get(i), share(child)));
    }
    return branches;
  }

  private String share(String child) {
    Double amps = adds.get(child);
    double whole = neutralA();
    return amps == null || whole == 0 ? "" : Numbers.withDecimals(100 * amps / whole, 0);
  }

  private double neutralA() {
    return node.design().map(d -> d.neutral().rmsA().value().orElse(0)).orElse(0.0);
  }

  private List<String> amps(List<NodeResult> ranked) {
    List<Figure> figures =
        ranked.stream()
            .map(c -> Optional.ofNullable(adds.get(c.node())))
            .map(a -> a.map(Figure::of).orElse(Figure.unknown("")))
            .toList();
    return Column.of(figures, new Reasons()).stream().map(Column.Cell::text).toList();
  }

  private String lines(String child) {
    return node.survey().circuits().stream()
        .filter(c -> c.id().equals(child))
        .findFirst()
        .map(Circuit::lines)
        .map(l -> node.names().of(l.word()))
        .orElse("");
  }

  /** How the loads of a circuit are known, the surest first. */
  private String known(String child) {
    return node.survey().loads().stream()
        .filter(l -> l.circuitId().equals(child))
        .map(l -> l.confidence().orElse(Load.Confidence.GUESS))
        .distinct()
        .sorted()
        .map(c -> words.of("confidence." + c.word()))
        .collect(Collectors.joining(", "));
  }
}
