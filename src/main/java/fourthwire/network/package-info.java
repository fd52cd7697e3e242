/**
 * The four-wire harmonic network: a tree of nodes with line and neutral conductors, solved exactly
 * per order by block elimination from the leaves to the root. Knows sources, links, shunts and
 * injections; nothing of buildings.
 *
 * <p>May use {@code quantity}.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.network;
