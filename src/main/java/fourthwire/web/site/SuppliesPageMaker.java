package fourthwire.web.site;

import fourthwire.audit.AuditRepository;
import fourthwire.audit.NodeSummary;
import fourthwire.limits.Severity;
import fourthwire.quantity.Figure;
import fourthwire.site.SiteRepository;
import fourthwire.site.SiteTree;
import fourthwire.site.Supply;
import fourthwire.site.SupplyRole;
import fourthwire.site.Survey;
import fourthwire.web.support.Names;
import fourthwire.web.support.Numbers;
import fourthwire.web.support.Verdict;
import fourthwire.web.support.Words;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.function.Function;
import java.util.stream.Collectors;
import org.springframework.stereotype.Component;

/** Puts the newest finished audits of a site's supplies side by side. */
@Component
class SuppliesPageMaker {
  private static final String UNKNOWN = "–";

  private final AuditRepository audits;
  private final SiteRepository sites;
  private final Words words;

  SuppliesPageMaker(AuditRepository audits, SiteRepository sites, Words words) {
    this.audits = audits;
    this.sites = sites;
    this.words = words;
  }

  /** A supply with what its newest audit says by node. */
  private record OnSupply(
      Supply supply, Optional<AuditRepository.Entry> audit, Map<String, NodeSummary> nodes) {
    OptionalLong id() {
      return audit.map(a -> OptionalLong.of(a.id())).orElse(OptionalLong.empty());
    }
  }

  SuppliesPage of(SiteRepository.Entry site) {
    Survey survey = sites.survey(site.id(), site.latestRevision());
    List<OnSupply> supplies =
        survey.supplies().stream()
            .sorted(Comparator.comparing(s -> s.roleOrDefault() != SupplyRole.NORMAL))
            .map(s -> on(site, survey, s))
            .toList();
    Names names = new Names(survey.settings().practice());
    SiteTree tree = SiteTree.of(survey);
    List<SuppliesPage.Row> rows = new ArrayList<>();
    for (SiteTree.Node node : tree.nodes()) {
      if (node.kind() == SiteTree.Kind.PANEL || node.kind() == SiteTree.Kind.TRANSFORMER) {
        List<SuppliesPage.Cells> cells =
            supplies.stream().map(s -> cells(s, node.name(), names)).toList();
        rows.add(new SuppliesPage.Row(node.name(), tree.path(node.name()).size() - 2, cells));
      }
    }
    return new SuppliesPage(
        site.id(), survey.settings().name(), supplies.stream().map(this::column).toList(), rows);
  }

  private OnSupply on(SiteRepository.Entry site, Survey survey, Supply supply) {
    String normal = survey.normalSupply().name();
    Optional<AuditRepository.Entry> audit =
        audits.ofSite(site.id()).stream()
            .filter(a -> a.state() == AuditRepository.State.DONE)
            .filter(a -> a.supply().orElse(normal).equals(supply.name()))
            .findFirst();
    Map<String, NodeSummary> nodes =
        audit
            .map(
                a ->
                    audits.summaries(a.id()).stream()
                        .collect(Collectors.toMap(NodeSummary::node, Function.identity())))
            .orElse(Map.of());
    return new OnSupply(supply, audit, nodes);
  }

  private SuppliesPage.Column column(OnSupply s) {
    String verdict =
        s.audit().isEmpty()
            ? ""
            : words.of("supplies.verdict", count(s, Severity.ACT), count(s, Severity.WATCH));
    return new SuppliesPage.Column(s.supply().name(), s.id(), verdict);
  }

  private static int count(OnSupply s, Severity severity) {
    return s.nodes().values().stream().mapToInt(n -> n.count(severity)).sum();
  }

  private static SuppliesPage.Cells cells(OnSupply s, String node, Names names) {
    NodeSummary n = s.nodes().get(node);
    if (n == null) {
      return new SuppliesPage.Cells(OptionalLong.empty(), UNKNOWN, "", "", "", Verdict.NONE);
    }
    String reason = n.lineRmsA().isEmpty() ? names.in(n.activeW().reason()) : "";
    Figure line =
        n.lineRmsA().values().stream()
            .filter(f -> f.value().isPresent())
            .max(Comparator.comparingDouble(f -> f.value().getAsDouble()))
            .orElse(Figure.unknown(""));
    return new SuppliesPage.Cells(
        s.id(), reason, text(line), text(n.neutralRmsA()), text(n.voltageThdPercent()), verdict(n));
  }

  private static String text(Figure figure) {
    return figure.value().isPresent() ? Numbers.of(figure.value().getAsDouble()) : UNKNOWN;
  }

  private static Verdict verdict(NodeSummary n) {
    for (Severity severity : Severity.values()) {
      if (n.count(severity) > 0) {
        return Verdict.of(severity);
      }
    }
    return Verdict.NONE;
  }
}
