/**
 * What an audit is asked and what it answers: requests, results by node, progress, and where audits
 * are kept.
 *
 * <p>Doors: {@link fourthwire.audit.Audit} and {@link fourthwire.audit.NodeResult}. The work is
 * done in the packages below, each using only those before it: {@code plan} lays the site out as a
 * network, {@code solve} solves it together with its loads, {@code judge} makes figures and
 * findings of every node, {@code run} does one after the other. May use every engine package.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.audit;
