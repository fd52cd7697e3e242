package fourthwire.audit;

import java.util.List;

/**
 * The outcome of an audit: immutable.
 *
 * @param supply the supply it ran on
 * @param engineVersion version of the engine that computed it
 * @param editions documents and editions of the limits used
 * @param nodes every node of the survey, parents before children
 * @param notes what holds for the whole site: what is not modelled, assumptions
 */
public record AuditResult(
    String supply,
    String engineVersion,
    List<String> editions,
    List<NodeResult> nodes,
    List<String> notes) {}
