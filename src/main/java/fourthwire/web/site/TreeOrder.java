package fourthwire.web.site;

import fourthwire.site.SiteTree;
import fourthwire.site.Survey;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;

/** The nodes of a site but its circuits, each below the one that feeds it, as a reader expects. */
final class TreeOrder {
  private TreeOrder() {}

  /** First what this tree holds, then what the survey has beside it and is not supplied here. */
  static List<String> of(Survey survey, SiteTree tree) {
    Set<String> order = new LinkedHashSet<>();
    walk(tree, order);
    walk(SiteTree.of(survey), order);
    return List.copyOf(order);
  }

  private static void walk(SiteTree tree, Set<String> into) {
    Map<String, List<String>> below = new HashMap<>();
    for (SiteTree.Node node : tree.nodes()) {
      if (node.kind() != SiteTree.Kind.CIRCUIT) {
        node.parent()
            .ifPresent(p -> below.computeIfAbsent(p, k -> new ArrayList<>()).add(node.name()));
      }
    }
    visit(tree.nodes().get(0).name(), below, into);
  }

  private static void visit(String node, Map<String, List<String>> below, Set<String> into) {
    into.add(node);
    below.getOrDefault(node, List.of()).forEach(child -> visit(child, below, into));
  }
}
