/**
 * What a network is made of: impedances and admittances over the harmonic order, sources, feeders,
 * transformers, shunts, capacitor banks.
 *
 * <p>Doors: {@link fourthwire.network.element.SourceImpedance}, {@link
 * fourthwire.network.element.FeederConductor}, {@link fourthwire.network.element.Transformer},
 * {@link fourthwire.network.element.Shunt}. May use {@code quantity}. Sources are named at the
 * types.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.network.element;
