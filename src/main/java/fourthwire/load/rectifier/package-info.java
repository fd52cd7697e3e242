/**
 * Diode rectifiers with smoothing capacitors, followed through time to their periodic steady state.
 *
 * <p>Doors: {@link fourthwire.load.rectifier.CapacitorInput}, {@link
 * fourthwire.load.rectifier.SixPulse} and {@link fourthwire.load.rectifier.TwelvePulse}, made from
 * a {@link fourthwire.load.rectifier.BridgeLoad}. Inside: {@code CycleTable} and {@code
 * ThreeLineEmf} hold the driving voltage; {@code PathStep} takes one step of a single path, {@code
 * LoopStep} of several that share a current; {@code PairBridge} and {@code LoopBridge} ({@code
 * TwoPathBridge}, {@code ThreeLineBridge}) string steps together from event to event; the solvers
 * close the cycle; {@code PathTangent} carries a march's derivatives; {@code PulseTrace} and {@code
 * FourierSum} take the harmonics. May use {@code quantity} and {@code load.model}.
 *
 * <p>Sources: the circuit equations stand at each class; the stepping method is RODAS3 (Sandu et
 * al., Atmospheric Environment 31, 1997).
 */
@org.jspecify.annotations.NullMarked
package fourthwire.load.rectifier;
