package fourthwire.audit;

import fourthwire.limits.Finding;
import fourthwire.site.SiteTree;
import java.util.List;
import java.util.Optional;

/**
 * What an audit says of one node, the public contract's section 6.
 *
 * @param node name; a circuit as {@code panel:circuit}
 * @param kind what it is
 * @param fedFrom its parent; empty for the supply
 * @param supply the supply in use
 * @param design the design state; empty where the node is not supplied
 * @param designReason why there is no design state; empty text otherwise
 * @param measured what readings say of the node, one entry a meter or clamp reading
 * @param findings worst first
 * @param assumptions what was taken for granted at this node, in sentences
 */
public record NodeResult(
    String node,
    SiteTree.Kind kind,
    Optional<String> fedFrom,
    String supply,
    Optional<DesignState> design,
    String designReason,
    List<MeasuredState> measured,
    List<Finding> findings,
    List<String> assumptions) {}
