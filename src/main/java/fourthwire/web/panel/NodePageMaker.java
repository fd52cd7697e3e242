package fourthwire.web.panel;

import fourthwire.audit.DesignState;
import fourthwire.limits.Finding;
import fourthwire.quantity.Spectrum;
import fourthwire.site.Panel;
import fourthwire.site.SiteTree;
import fourthwire.site.Transformer;
import fourthwire.web.support.FindingText;
import fourthwire.web.support.Numbers;
import fourthwire.web.support.Verdict;
import fourthwire.web.support.Words;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.springframework.stereotype.Component;

/** Makes a node's page out of its result and the survey. */
@Component
class NodePageMaker {
  /** Of the fundamental: less is not worth naming beside a resonance. */
  private static final double WORTH_SAYING = 1e-4;

  private final Words words;
  private final NodeRows rows;

  NodePageMaker(Words words, NodeRows rows) {
    this.words = words;
    this.rows = rows;
  }

  NodePage make(NodeCase node) {
    Optional<DesignState> design = node.design();
    Optional<TablesMaker> tables = design.map(d -> new TablesMaker(words, node, d));
    return new NodePage(
        node.audit().siteId(),
        node.survey().settings().name(),
        node.audit().id(),
        node.audit().surveyRevision(),
        node.node().supply(),
        node.node().node(),
        kindKey(node.node().kind()),
        facts(node),
        path(node),
        verdict(node),
        design.isPresent() ? "" : node.names().in(node.node().designReason()),
        design.map(d -> new RailsMaker(words, node, d).make()),
        design.flatMap(d -> new PicturesMaker(words, node, d).make()),
        findings(node),
        tables.map(TablesMaker::voltage),
        tables.map(TablesMaker::power),
        tables.flatMap(TablesMaker::transformer),
        tables.flatMap(TablesMaker::primary),
        design.map(d -> resonances(node, d)).orElse(List.of()),
        tables.map(TablesMaker::measured).orElse(List.of()),
        new BranchesMaker(words, node, rows).make(),
        Working.lines(words, Working.ADDER),
        node.node().assumptions().stream().map(node.names()::in).toList(),
        states(node));
  }

  private StatesView states(NodeCase node) {
    return new StatesView(
        node.node().doubt().map(d -> new SureMaker(words, node, d).make()),
        node.node().doubtReason(),
        node.node().week().map(w -> new WeekMaker(words, node, w).make()),
        node.node().weekReason(),
        node.design()
            .flatMap(
                d -> node.node().impedance().map(c -> new ImpedanceMaker(words, node, d).make(c))));
  }

  private static String kindKey(SiteTree.Kind kind) {
    return "kind." + kind.word();
  }

  private static List<NodePage.Crumb> path(NodeCase node) {
    List<SiteTree.Node> path = node.tree().path(node.node().node());
    return path.stream()
        .filter(n -> !n.name().equals(node.node().node()))
        .map(n -> new NodePage.Crumb(n.name()))
        .toList();
  }

  private NodePage.VerdictLine verdict(NodeCase node) {
    List<Finding> findings = node.node().findings();
    Optional<Finding> worst = Verdict.worst(findings);
    return new NodePage.VerdictLine(
        Verdict.of(findings),
        worst.map(f -> FindingText.about(words, f)).orElse(""),
        worst.map(f -> FindingText.sureness(words, f)).orElse(""));
  }

  private List<NodePage.Finding> findings(NodeCase node) {
    return node.node().findings().stream()
        .sorted(java.util.Comparator.comparing(Finding::severity))
        .map(
            f ->
                new NodePage.Finding(
                    Verdict.of(f.severity()),
                    FindingText.set(node.names().in(f.sentence())),
                    FindingText.figure(words, f),
                    FindingText.set(f.basis()),
                    FindingText.probability(words, f),
                    node.design()
                        .map(d -> new FindingWorking(words, node, d).steps(f))
                        .orElse(List.of())))
        .toList();
  }

  /** Where the impedance peaks, which bank makes it, and what flows at the orders beside it. */
  private List<String> resonances(NodeCase node, DesignState design) {
    return design.resonances().stream()
        .map(
            r ->
                words.of(
                    r.series() ? "resonances.sentence.series" : "resonances.sentence",
                    r.bank(),
                    Numbers.of(r.order()),
                    Numbers.of(r.ohm(), "Ω"),
                    beside(node, design, r.order())))
        .map(String::strip)
        .toList();
  }

  private String beside(NodeCase node, DesignState design, double peak) {
    String flowing = flowing(node, design, peak);
    return flowing.isEmpty() ? words.of("resonances.none") : words.of("resonances.beside", flowing);
  }

  private String flowing(NodeCase node, DesignState design, double peak) {
    return java.util.stream.IntStream.of((int) Math.floor(peak), (int) Math.floor(peak) + 1)
        .filter(h -> h >= 2 && h <= Spectrum.HIGHEST_ORDER)
        .filter(h -> flows(design, h))
        .mapToObj(h -> largest(node, design, h))
        .collect(java.util.stream.Collectors.joining(" " + words.of("headline.and") + " "));
  }

  private static boolean flows(DesignState design, int order) {
    return design.currentSpectrum().values().stream()
        .anyMatch(s -> s.magnitude(order) > WORTH_SAYING * s.magnitude(1));
  }

  private String largest(NodeCase node, DesignState design, int order) {
    return design.currentSpectrum().entrySet().stream()
        .filter(e -> e.getKey().isLine())
        .max(java.util.Comparator.comparingDouble(e -> e.getValue().magnitude(order)))
        .map(
            e ->
                words.of(
                    "resonances.order",
                    Numbers.of(e.getValue().magnitude(order), "A"),
                    Numbers.ordinal(order),
                    node.names().of(e.getKey())))
        .orElse("");
  }

  /** What the survey says of the node: voltage, system, rating, feeder. */
  private String facts(NodeCase node) {
    String name = node.node().node();
    Optional<SiteTree.Node> at = node.tree().find(name);
    List<String> facts = new ArrayList<>();
    at.ifPresent(n -> facts.add(Numbers.plain(n.nominalV(), "V")));
    at.ifPresent(
        n ->
            facts.add(
                n.conductors().stream()
                    .map(node.names()::of)
                    .collect(java.util.stream.Collectors.joining(" "))));
    node.survey().transformers().stream()
        .filter(t -> t.name().equals(name))
        .findFirst()
        .ifPresent(t -> facts.addAll(plate(t)));
    node.survey().panels().stream()
        .filter(p -> p.name().equals(name))
        .findFirst()
        .map(Panel::busRatingA)
        .ifPresent(r -> r.ifPresent(a -> facts.add(words.of("facts.bus", Numbers.plain(a, "A")))));
    at.ifPresent(n -> facts.addAll(feeder(n)));
    return String.join(" · ", facts);
  }

  private List<String> plate(Transformer t) {
    return List.of(
        Numbers.plain(t.ratedKva(), "kVA"),
        t.connection().symbol(),
        words.of("facts.impedance", Numbers.plain(t.impedancePercent(), "%")));
  }

  private List<String> feeder(SiteTree.Node node) {
    List<String> facts = new ArrayList<>();
    node.feeder()
        .lengthM()
        .ifPresent(m -> facts.add(words.of("facts.feeder", Numbers.plain(m, "m"))));
    node.feeder()
        .conductorSize()
        .ifPresent(s -> facts.add(words.of("facts.size", s.replace("mm2", "mm²"))));
    return facts;
  }
}
