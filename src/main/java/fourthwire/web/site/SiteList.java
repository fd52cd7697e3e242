package fourthwire.web.site;

import fourthwire.audit.AuditRepository;
import fourthwire.audit.NodeSummary;
import fourthwire.limits.Severity;
import fourthwire.site.SiteRepository;
import fourthwire.site.Survey;
import fourthwire.web.support.Moments;
import fourthwire.web.support.Verdict;
import fourthwire.web.support.Words;
import java.util.List;
import java.util.Optional;
import org.springframework.stereotype.Component;

/** Makes the rows of the list of sites. */
@Component
class SiteList {
  private final SiteRepository sites;
  private final AuditRepository audits;
  private final Words words;

  SiteList(SiteRepository sites, AuditRepository audits, Words words) {
    this.sites = sites;
    this.audits = audits;
    this.words = words;
  }

  /**
   * A site in the list.
   *
   * @param audited whether it has a finished audit
   * @param found what that found, in words
   * @param when it was asked for
   */
  record Row(
      long id,
      String name,
      int revision,
      boolean audited,
      Verdict verdict,
      String found,
      String when) {}

  List<Row> rows() {
    return sites.list().stream().map(this::row).toList();
  }

  private Row row(SiteRepository.Entry site) {
    Optional<AuditRepository.Entry> last =
        audits.ofSite(site.id()).stream()
            .filter(a -> a.state() == AuditRepository.State.DONE)
            .findFirst();
    if (last.isEmpty()) {
      return new Row(
          site.id(),
          site.name(),
          site.latestRevision(),
          false,
          Verdict.NONE,
          words.of("sites.unaudited"),
          "");
    }
    List<NodeSummary> nodes = audits.summaries(last.get().id());
    long act = count(nodes, Severity.ACT);
    long watch = count(nodes, Severity.WATCH);
    Survey survey = sites.survey(site.id(), last.get().surveyRevision());
    return new Row(
        site.id(),
        site.name(),
        site.latestRevision(),
        true,
        act > 0 ? Verdict.ACT : watch > 0 ? Verdict.WATCH : Verdict.NONE,
        words.of("sites.found", act, watch, nodes.size()),
        Moments.of(survey).minute(last.get().asked()));
  }

  private static long count(List<NodeSummary> nodes, Severity severity) {
    return nodes.stream().filter(n -> n.count(severity) > 0).count();
  }
}
