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
 * @param impedance seen from a board, transformer or supply; empty elsewhere
 * @param bankSteps the resonance at each step of the switched banks at the node
 * @param doubt how sure the figures are
 * @param doubtReason why that is not known; empty text otherwise
 * @param week the node through a week
 * @param weekReason why there is no week; empty text otherwise
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
    Optional<ImpedanceCurve> impedance,
    List<BankStep> bankSteps,
    Optional<NodeDoubt> doubt,
    String doubtReason,
    Optional<WeekState> week,
    String weekReason,
    List<MeasuredState> measured,
    List<Finding> findings,
    List<String> assumptions) {
  private static final String NOT_COMPUTED = "not computed";

  /** A node of which only the design state is known. */
  public NodeResult(
      String node,
      SiteTree.Kind kind,
      Optional<String> fedFrom,
      String supply,
      Optional<DesignState> design,
      String designReason,
      List<MeasuredState> measured,
      List<Finding> findings,
      List<String> assumptions) {
    this(
        node,
        kind,
        fedFrom,
        supply,
        design,
        designReason,
        Optional.empty(),
        List.of(),
        Optional.empty(),
        NOT_COMPUTED,
        Optional.empty(),
        NOT_COMPUTED,
        measured,
        findings,
        assumptions);
  }

  /** This with its impedance and what switching its banks does to it. */
  public NodeResult withImpedance(Optional<ImpedanceCurve> curve, List<BankStep> steps) {
    return new NodeResult(
        node,
        kind,
        fedFrom,
        supply,
        design,
        designReason,
        curve,
        steps,
        doubt,
        doubtReason,
        week,
        weekReason,
        measured,
        findings,
        assumptions);
  }

  /** This with its week, or why there is none. */
  public NodeResult withWeek(Optional<WeekState> other, String reason) {
    return new NodeResult(
        node,
        kind,
        fedFrom,
        supply,
        design,
        designReason,
        impedance,
        bankSteps,
        doubt,
        doubtReason,
        other,
        reason,
        measured,
        findings,
        assumptions);
  }

  /** This with how sure it is, or why that is not known, and the findings that then hold. */
  public NodeResult withDoubt(Optional<NodeDoubt> other, String reason, List<Finding> then) {
    return new NodeResult(
        node,
        kind,
        fedFrom,
        supply,
        design,
        designReason,
        impedance,
        bankSteps,
        other,
        reason,
        week,
        weekReason,
        measured,
        then,
        assumptions);
  }
}
