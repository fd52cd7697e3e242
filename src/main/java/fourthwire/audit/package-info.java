/**
 * One run from survey to findings: assemble the network, solve it together with its loads, judge
 * the figures.
 *
 * <p>Doors: {@link fourthwire.audit.Audit} runs, {@link fourthwire.audit.NodeResult} is what comes
 * out for each node. May use every engine package.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.audit;
