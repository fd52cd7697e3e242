/**
 * Diode rectifiers with smoothing capacitors, followed through time to their periodic steady state.
 *
 * <p>Doors: {@link fourthwire.load.rectifier.CapacitorInput}, {@link
 * fourthwire.load.rectifier.SixPulse} and {@link fourthwire.load.rectifier.TwelvePulse}, made from
 * a {@link fourthwire.load.rectifier.path.BridgeLoad}. Below: {@code path}, one path of current at
 * a time through a bridge; {@code loop}, several that share a current; {@code node}, several
 * bridges side by side. May use {@code quantity} and {@code load.model}.
 *
 * <p>Sources: the circuit equations stand at each class. Steps are RODAS3's and, where one path is
 * not stiff, GRK4T's; the periodic state is Newton's method's, on the state at a section of the
 * cycle.
 */
@org.jspecify.annotations.NullMarked
package fourthwire.load.rectifier;
