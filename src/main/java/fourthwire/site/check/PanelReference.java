package fourthwire.site.check;

import java.util.List;
import java.util.Optional;

/** Checks a cell of a column {@code panel}. */
record PanelReference(NodeIndex nodes, Remarks remarks) {
  private static final String PANEL = "panel";

  /** Whether the name is a panel's; reports it where it is not. */
  boolean check(DraftRow<?> row, String name) {
    Optional<NodeIndex.Node> node = nodes.find(name);
    if (nodes.isDoubtful(name) || (node.isEmpty() && nodes.mayHide())) {
      return false;
    }
    if (node.isEmpty()) {
      List<String> panels = nodes.names().stream().filter(n -> nodes.panel(n).isPresent()).toList();
      remarks.error(
          nodes.missing(name),
          row,
          PANEL,
          "No panel is called \"%s\".".formatted(name) + Closest.hint(name, panels));
      return false;
    }
    if (node.get().kind() != NodeIndex.Kind.PANEL) {
      remarks.error(
          "kind " + name,
          row,
          PANEL,
          "\"%s\" is a %s; a panel is needed here.".formatted(name, node.get().kind().word()));
      return false;
    }
    return true;
  }
}
