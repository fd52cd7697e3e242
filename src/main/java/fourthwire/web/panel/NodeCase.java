package fourthwire.web.panel;

import fourthwire.audit.AuditRepository;
import fourthwire.audit.DesignState;
import fourthwire.audit.NodeResult;
import fourthwire.quantity.Conductor;
import fourthwire.site.SiteTree;
import fourthwire.site.Survey;
import fourthwire.web.support.Names;
import java.util.List;
import java.util.Optional;

/**
 * All that a node's page is made from.
 *
 * @param audit the audit it belongs to
 * @param node its result
 * @param children the results of what hangs directly on it
 * @param survey the revision the audit was run on
 */
record NodeCase(
    AuditRepository.Entry audit, NodeResult node, List<NodeResult> children, Survey survey) {
  /** The tree on the audit's supply; on the normal one where this node is not supplied. */
  SiteTree tree() {
    SiteTree tree =
        survey.supplies().stream()
            .filter(s -> s.name().equals(node.supply()))
            .findFirst()
            .map(s -> SiteTree.of(survey, s))
            .orElseGet(() -> SiteTree.of(survey));
    return tree.find(node.node()).isPresent() ? tree : SiteTree.of(survey);
  }

  Names names() {
    return new Names(survey.settings().practice());
  }

  Optional<DesignState> design() {
    return node.design();
  }

  /** The lines that have a current, in order. */
  List<Conductor> lines(DesignState design) {
    return design.lines().keySet().stream().sorted().toList();
  }
}
