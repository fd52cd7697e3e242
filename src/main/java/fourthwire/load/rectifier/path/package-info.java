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
 * <p>How it goes: {@code OnePathSearch} looks for the state that repeats, {@code OnePathCycle}
 * marches what has to repeat, {@code PairBridge} strings steps from event to event. A step is
 * RODAS3 where the path is stiff ({@code PathStep}), else GRK4T ({@code SmoothStep}), as long as
 * {@code StepLength} has it.
 *
 * <p>Sources: Sandu et al., Atmospheric Environment 31, 1997 (RODAS3); Kaps and Rentrop, Numerische
 * Mathematik 33, 1979 (GRK4T); Alexander, SIAM Journal on Numerical Analysis 14, 1977 ({@code
 * PathTangent}); Anderson and Björck, BIT 13, 1973 ({@code EventFinder}); Tang, ACM Transactions on
 * Mathematical Software 16, 1990 ({@code QuickLog}).
 */
@org.jspecify.annotations.NullMarked
package fourthwire.load.rectifier.path;
