package fourthwire.load.rectifier;

import fourthwire.load.rectifier.path.BridgeLoad;

/**
 * {@code six-pulse}: three-phase diode bridge with line and direct-current chokes, a smoothing
 * capacitor and a constant-power load: the input of most drives.
 *
 * <p>While lines p and n conduct: (2L + D)·di/dt = e_p - e_n - (2R + S)·i - 2·v_d(i) - v and
 * C·dv/dt = i - P/v; in commutation overlap two lines share the current ({@code LoopStep}). L, R
 * are the network's and the line choke's, D, S the direct-current choke's. Only differences of the
 * three electromotive forces count and no zero-sequence current flows; unbalanced voltage brings
 * orders 3, 9 … in the lines. The periodic state is found by Newton's method on one section of the
 * cycle ({@code MultiPulseSolver}).
 *
 * <p>Assumed: constant power on the direct-current side, linear chokes. Overlap of four lines (a
 * short-circuited drive) is outside its validity; so are unlike drives without chokes at one soft
 * connection, beyond the orders that the network is solved for. A capacitor so small that the state
 * would not hold at constant power is given with a remark (stable where R·C·v² > L·P, about).
 * Checked against circuit-simulator results with the same diodes (test resources {@code
 * load/rectifiers}); expected error 0.4 % of the fundamental at each order to 39.
 */
public final class SixPulse extends ThreeLineRectifier {
  /** All units of a row together. */
  public SixPulse(BridgeLoad load, double frequencyHz) {
    super(1, load, frequencyHz);
  }
}
