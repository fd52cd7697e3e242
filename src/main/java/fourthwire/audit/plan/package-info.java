/**
 * A surveyed site laid out as a network: its supply and transformers from their rating plates, its
 * feeders from their columns, its loads on their conductors, its banks and filters.
 *
 * <p>Doors: {@link fourthwire.audit.plan.NetworkPlan}, {@link
 * fourthwire.audit.plan.LoadPlacements}. May use {@code site}, {@code load}, {@code network},
 * {@code quantity} and {@code audit}. Source: the public contract, sections 2 and 3.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.audit.plan;
