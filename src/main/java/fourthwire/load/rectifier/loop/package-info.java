/**
 * Bridges in which several loops of current conduct at once: on three lines in commutation overlap,
 * two of them on one capacitor, or a single-phase bridge behind which a choke drives its current
 * past the voltage's zero crossing.
 *
 * <p>Doors: {@link fourthwire.load.rectifier.loop.MultiPulseSolver} and {@link
 * fourthwire.load.rectifier.loop.TwoPathSolver}. Inside: {@code LoopStep} takes a step of all loops
 * together, {@code LoopBridge} strings steps from event to event ({@code ThreeLineBridge}, {@code
 * TwoPathBridge}), {@code LoopTangent} carries a march's derivatives, {@code StateNewton} closes
 * the cycle. May use {@code load.rectifier.path}, {@code quantity} and {@code load.model}.
 *
 * <p>Sources: the circuit equations stand at each class.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.load.rectifier.loop;
