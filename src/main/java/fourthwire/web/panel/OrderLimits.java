package fourthwire.web.panel;

import fourthwire.audit.DesignState;
import fourthwire.limits.distortion.CurrentDistortion519;
import fourthwire.limits.distortion.Edition519;
import fourthwire.site.SiteTree;
import fourthwire.site.Supply;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * The limits of a line's current by order, in amps, as marks in the spectrum: IEEE 519-2022 on the
 * demand current and short-circuit current of this node. They bind at the point of common coupling
 * and are guidance elsewhere; on a generator there are none.
 */
final class OrderLimits {
  private final CurrentDistortion519 limits;
  private final double demandA;
  private final boolean binding;

  private OrderLimits(CurrentDistortion519 limits, double demandA, boolean binding) {
    this.limits = limits;
    this.demandA = demandA;
    this.binding = binding;
  }

  /** The limits at this node; none where a current they stand on is not known. */
  static Optional<OrderLimits> at(NodeCase node, DesignState design) {
    OptionalDouble demandA = design.demandA().value();
    OptionalDouble shortCircuitA = design.shortCircuitA().value();
    Optional<SiteTree.Node> place = node.tree().find(node.node().node());
    if (demandA.isEmpty()
        || shortCircuitA.isEmpty()
        || place.isEmpty()
        || !(demandA.getAsDouble() > 0)
        || onGenerator(node)) {
      return Optional.empty();
    }
    CurrentDistortion519 limits =
        CurrentDistortion519.of(
            Edition519.IEEE_519_2022,
            place.get().nominalV(),
            shortCircuitA.getAsDouble(),
            demandA.getAsDouble());
    String pcc =
        node.survey().settings().pcc().orElseGet(() -> node.survey().normalSupply().name());
    return Optional.of(
        new OrderLimits(limits, demandA.getAsDouble(), pcc.equals(node.node().node())));
  }

  private static boolean onGenerator(NodeCase node) {
    return node.survey().supplies().stream()
        .filter(s -> s.name().equals(node.node().supply()))
        .anyMatch(Supply::isGenerator);
  }

  /** The limit of one order, amps; none for the fundamental. */
  OptionalDouble amps(int order) {
    return order < 2
        ? OptionalDouble.empty()
        : OptionalDouble.of(limits.orderLimitPercent(order) / 100 * demandA);
  }

  /** Whether they bind here. */
  boolean binding() {
    return binding;
  }

  /** Document and table. */
  String basis() {
    return limits.basis();
  }
}
