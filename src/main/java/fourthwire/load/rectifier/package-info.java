/**
 * Diode rectifiers with smoothing capacitors, followed through time to their periodic steady state.
 *
 * <p>Doors: {@link fourthwire.load.rectifier.CapacitorInput} and {@link
 * fourthwire.load.rectifier.SixPulse}, made from a {@link fourthwire.load.rectifier.BridgeLoad}.
 * Inside: {@code CycleTable} holds the driving voltage; {@code PathStep} and {@code OverlapStep}
 * take one step of two or three conducting lines; {@code PairBridge} and {@code ThreeLineBridge}
 * string steps together from event to event; the solvers close the cycle; {@code PulseTrace} takes
 * the harmonics. May use {@code quantity} and {@code load.model}.
 *
 * <p>Sources: the circuit equations stand at each class; the stepping method is RODAS3 (Sandu et
 * al., Atmospheric Environment 31, 1997).
 */
@org.jspecify.annotations.NullMarked
package fourthwire.load.rectifier;
