/**
 * The four-wire harmonic network: a tree of nodes with line and neutral conductors, solved exactly
 * per order by block elimination from the leaves to the root. Knows sources, links, shunts and
 * injections; nothing of buildings.
 *
 * <p>Door: {@link fourthwire.network.NetworkBuilder}, which makes a {@link
 * fourthwire.network.TreeNetwork}; that is factored per order into a {@link
 * fourthwire.network.FactoredOrder}, which solves for any number of {@link
 * fourthwire.network.Excitation excitations}. May use {@code quantity}.
 *
 * <p>What a network is made of stands in {@link fourthwire.network.element}.
 *
 * <p>Sources: Kirchhoff's laws; Norton and Thévenin equivalents; block elimination of a tree.
 * Impedances are in ohms, admittances in siemens, potentials in volts to earth, all rms phasors of
 * one order.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.network;
