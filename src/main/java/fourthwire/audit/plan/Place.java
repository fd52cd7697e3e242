package fourthwire.audit.plan;

import fourthwire.site.SiteTree;
import java.util.Optional;

/**
 * Where a site's node stands in the network.
 *
 * @param node the site's node
 * @param networkNode the network's number for it; circuits with a shared neutral have one together
 * @param conductors the number of each of its conductors at that network node
 * @param feeder what feeds it (of a transformer: its primary)
 * @param transformer of a transformer
 */
public record Place(
    SiteTree.Node node,
    int networkNode,
    Numbering conductors,
    FeederPath feeder,
    Optional<TransformerPlace> transformer) {

  /** A transformer's rating plate and where its primary terminals stand in the network. */
  public record TransformerPlace(TransformerPlate plate, int networkNode, Numbering conductors) {}

  /** Its name on the site. */
  public String name() {
    return node.name();
  }
}
