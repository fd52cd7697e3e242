package fourthwire.web.panel;

import fourthwire.audit.AuditRepository;
import fourthwire.audit.NodeResult;
import fourthwire.site.SiteRepository;
import fourthwire.site.Survey;
import fourthwire.web.support.NotFoundException;
import java.util.List;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.RequestParam;

/** Shows one node of a finished audit. */
@Controller
class NodeController {
  private final AuditRepository audits;
  private final SiteRepository sites;
  private final NodePageMaker pages;

  NodeController(AuditRepository audits, SiteRepository sites, NodePageMaker pages) {
    this.audits = audits;
    this.sites = sites;
    this.pages = pages;
  }

  /** The name stands in the query: it may hold characters that a path can't. */
  @GetMapping("/audits/{audit}/node")
  String node(@PathVariable("audit") long audit, @RequestParam("name") String name, Model model) {
    AuditRepository.Entry entry =
        audits.find(audit).orElseThrow(() -> new NotFoundException("audit " + audit));
    NodeResult result =
        audits
            .node(audit, name)
            .orElseThrow(() -> new NotFoundException("node " + name + " in audit " + audit));
    NodeCase node = caseOf(entry, result);
    model.addAttribute("page", pages.make(node));
    return "panel/node";
  }

  private NodeCase caseOf(AuditRepository.Entry entry, NodeResult result) {
    Survey survey = sites.survey(entry.siteId(), entry.surveyRevision());
    NodeCase alone = new NodeCase(entry, result, List.of(), survey);
    List<NodeResult> children =
        alone.tree().children(result.node()).stream()
            .flatMap(n -> audits.node(entry.id(), n.name()).stream())
            .toList();
    return new NodeCase(entry, result, children, survey);
  }
}
