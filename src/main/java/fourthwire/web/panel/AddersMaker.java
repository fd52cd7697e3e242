package fourthwire.web.panel;

import fourthwire.audit.DesignState;
import fourthwire.site.Circuit;
import fourthwire.site.Load;
import fourthwire.site.LoadKind;
import fourthwire.site.Survey;
import fourthwire.web.support.Column;
import fourthwire.web.support.Numbers;
import fourthwire.web.support.Words;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.stream.Collectors;

/** Ranks what hangs on a node by what it adds to the neutral's current, and says what it is. */
final class AddersMaker {
  private final Words words;
  private final NodeCase node;
  private final DesignState design;
  private final Survey survey;

  AddersMaker(Words words, NodeCase node, DesignState design) {
    this.words = words;
    this.node = node;
    this.design = design;
    this.survey = node.survey();
  }

  List<NodePage.Adder> make() {
    List<DesignState.NeutralAdder> ranked =
        design.neutralAdders().stream()
            .sorted(Comparator.comparingDouble(DesignState.NeutralAdder::amps).reversed())
            .toList();
    List<String> amps =
        Column.aligned(ranked.stream().map(DesignState.NeutralAdder::amps).toList());
    List<NodePage.Adder> adders = new ArrayList<>();
    for (int i = 0; i < ranked.size(); i++) {
      adders.add(adder(ranked.get(i), amps.get(i)));
    }
    return adders;
  }

  private NodePage.Adder adder(DesignState.NeutralAdder adder, String amps) {
    double whole = design.neutral().rmsA().value().orElse(0);
    List<Load> loads =
        survey.loads().stream().filter(l -> l.circuitId().equals(adder.node())).toList();
    return new NodePage.Adder(
        adder.node(),
        adder.node().substring(adder.node().indexOf(':') + 1),
        lines(adder.node()),
        loads.stream().map(this::loadText).collect(Collectors.joining("; ")),
        amps,
        whole > 0 ? Numbers.withDecimals(100 * adder.amps() / whole, 0) : "",
        known(loads));
  }

  private String lines(String child) {
    return survey.circuits().stream()
        .filter(c -> c.id().equals(child))
        .findFirst()
        .map(Circuit::lines)
        .map(l -> node.names().of(l.word()))
        .orElse("");
  }

  private String loadText(Load load) {
    String quantity = load.quantity() == 1 ? "" : Numbers.plain(load.quantity(), "") + "\u00a0× ";
    return words.of("adder.load", quantity, load.name(), kind(load));
  }

  private String kind(Load load) {
    Optional<String> kind = load.kind().map(LoadKind::word);
    return kind.or(load::preset).or(load::spectrum).orElse("");
  }

  private String known(List<Load> loads) {
    return loads.stream()
        .map(l -> l.confidence().orElse(Load.Confidence.GUESS))
        .distinct()
        .sorted()
        .map(c -> words.of("confidence." + c.word()))
        .collect(Collectors.joining(", "));
  }
}
