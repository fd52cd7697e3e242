package fourthwire.web.site;

import fourthwire.audit.AuditRepository;
import fourthwire.audit.NodeResult;
import fourthwire.audit.NodeSummary;
import fourthwire.jobs.AuditService;
import fourthwire.limits.Severity;
import fourthwire.site.SiteRepository;
import fourthwire.site.SiteTree;
import fourthwire.site.Supply;
import fourthwire.site.SupplyRole;
import fourthwire.site.Survey;
import fourthwire.web.audit.AuditView;
import fourthwire.web.panel.NodeRows;
import fourthwire.web.panel.StatesView;
import fourthwire.web.support.Headline;
import fourthwire.web.support.Names;
import fourthwire.web.support.Numbers;
import fourthwire.web.support.Words;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;
import org.springframework.stereotype.Component;

/** Makes a site's page out of its survey and one of its audits. */
@Component
class SitePageMaker {
  private final AuditRepository audits;
  private final SiteRepository sites;
  private final NodeRows rows;
  private final Words words;

  SitePageMaker(AuditRepository audits, SiteRepository sites, NodeRows rows, Words words) {
    this.audits = audits;
    this.sites = sites;
    this.rows = rows;
    this.words = words;
  }

  /** The page on the newest finished audit. */
  SitePage latest(SiteRepository.Entry site) {
    Optional<AuditRepository.Entry> done =
        audits.ofSite(site.id()).stream()
            .filter(a -> a.state() == AuditRepository.State.DONE)
            .findFirst();
    return done.map(a -> audited(site, a)).orElseGet(() -> unaudited(site));
  }

  /** The page on this finished audit. */
  SitePage audited(SiteRepository.Entry site, AuditRepository.Entry audit) {
    Survey survey = sites.survey(site.id(), audit.surveyRevision());
    SiteTree tree = tree(survey, audit);
    List<NodeResult> shown = nodes(audit, TreeOrder.of(survey, tree));
    List<NodeResult> circuits = nodes(audit, circuitsWithFindings(audit));
    List<NodeResult> all = Stream.concat(shown.stream(), circuits.stream()).toList();
    return new SitePage(
        site.id(),
        survey.settings().name(),
        system(survey),
        Optional.of(AuditView.of(audit, survey)),
        pending(site, survey),
        new Headline(words).of(all, survey),
        holds(survey),
        rows.of(shown, circuits, tree, survey),
        supplies(survey),
        AuditService.usualDraws(survey),
        site.latestRevision() > audit.surveyRevision(),
        clampNext(shown),
        audit.notes().stream().map(new Names(survey.settings().practice())::in).toList(),
        audit.editions());
  }

  /** What the supply's result says; it is the first of the tree. */
  private Optional<List<StatesView.Share>> clampNext(List<NodeResult> shown) {
    return shown.stream()
        .filter(n -> n.kind() == SiteTree.Kind.SUPPLY)
        .flatMap(n -> n.doubt().stream())
        .findFirst()
        .map(
            d ->
                d.clampNext().stream().map(c -> StatesView.Share.of(c.node(), c.share())).toList());
  }

  private List<NodeResult> nodes(AuditRepository.Entry audit, List<String> names) {
    return names.stream().flatMap(n -> audits.node(audit.id(), n).stream()).toList();
  }

  private List<String> circuitsWithFindings(AuditRepository.Entry audit) {
    return audits.summaries(audit.id()).stream()
        .filter(s -> s.kind() == SiteTree.Kind.CIRCUIT)
        .filter(s -> s.count(Severity.ACT) + s.count(Severity.WATCH) > 0)
        .map(NodeSummary::node)
        .toList();
  }

  private SitePage unaudited(SiteRepository.Entry site) {
    Survey survey = sites.survey(site.id(), site.latestRevision());
    return new SitePage(
        site.id(),
        survey.settings().name(),
        system(survey),
        Optional.empty(),
        pending(site, survey),
        new Headline.Text(words.of("site.unaudited"), ""),
        holds(survey),
        List.of(),
        supplies(survey),
        AuditService.usualDraws(survey),
        false,
        Optional.empty(),
        List.of(),
        List.of());
  }

  private static SiteTree tree(Survey survey, AuditRepository.Entry audit) {
    return audit
        .supply()
        .flatMap(name -> survey.supplies().stream().filter(s -> s.name().equals(name)).findFirst())
        .map(s -> SiteTree.of(survey, s))
        .orElseGet(() -> SiteTree.of(survey));
  }

  private Optional<AuditView> pending(SiteRepository.Entry site, Survey survey) {
    return audits.ofSite(site.id()).stream()
        .filter(a -> AuditView.isOpen(a.state()))
        .findFirst()
        .map(a -> AuditView.of(a, survey));
  }

  private String system(Survey survey) {
    return words.of(
        "site.system",
        Numbers.plain(survey.normalSupply().lineVoltageV(), "V"),
        Numbers.plain(survey.settings().frequencyHz(), "Hz"));
  }

  private List<String> holds(Survey survey) {
    return List.of(
        words.of("site.holds.nodes", survey.panels().size(), survey.circuits().size()),
        words.of("site.holds.meters", survey.meters().size(), survey.spotReadings().size()));
  }

  private static List<String> supplies(Survey survey) {
    return survey.supplies().stream()
        .sorted(Comparator.comparing(s -> s.roleOrDefault() != SupplyRole.NORMAL))
        .map(Supply::name)
        .toList();
  }
}
