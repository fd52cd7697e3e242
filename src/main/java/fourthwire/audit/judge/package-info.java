/**
 * The figures of every node and what the limits say of them.
 *
 * <p>Door: {@link fourthwire.audit.judge.NodeReport}. May use {@code audit.solve}, {@code
 * audit.plan}, {@code limits} and what those may use.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.audit.judge;
