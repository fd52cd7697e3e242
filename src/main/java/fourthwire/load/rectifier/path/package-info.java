/**
 * One path of current through a bridge and its capacitor, and what every rectifier is computed
 * with: the equipment's data, the driving voltage over a cycle, a step in time, the rest between
 * pulses, events, the recorded current and its harmonics.
 *
 * <p>Doors: {@link fourthwire.load.rectifier.path.BridgeLoad} with its {@link
 * fourthwire.load.rectifier.path.Diode} for everyone; the others, work blocks of hot loops with
 * open fields, for the solvers of {@code load.rectifier} and {@code load.rectifier.loop} only. May
 * use {@code quantity} and {@code load.model}.
 *
 * <p>Sources: Sandu et al., Atmospheric Environment 31, 1997 (RODAS3, {@code PathStep}); Kaps and
 * Rentrop, Numerische Mathematik 33, 1979 (GRK4T, {@code SmoothStep}).
 */
@org.jspecify.annotations.NullMarked
package fourthwire.load.rectifier.path;
