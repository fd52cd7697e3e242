/**
 * Rectifiers side by side on one node, followed through time together: each shapes the voltage that
 * the others draw from.
 *
 * <p>Doors: {@link fourthwire.load.rectifier.node.NodeRectifiers} for single-phase ones of any
 * kinds, {@link fourthwire.load.rectifier.node.AlikeRectifiers} for others of one design. May use
 * {@code quantity}, {@code load.model}, {@code load.rectifier.path} and the small matrices of
 * {@code load.rectifier.loop}.
 *
 * <p>Sources: the circuit's own equations; steps are RODAS3's (Sandu et al., Atmospheric
 * Environment 31, 1997), their derivatives SDIRK's (Alexander, SIAM Journal on Numerical Analysis
 * 14, 1977).
 */
@org.jspecify.annotations.NullMarked
package fourthwire.load.rectifier.node;
