/**
 * The network and its loads solved together.
 *
 * <p>Door: {@link fourthwire.audit.solve.CoupledSolver}, which gives a {@link
 * fourthwire.audit.solve.SiteSolution}. May use {@code audit.plan} and what that may use.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.audit.solve;
