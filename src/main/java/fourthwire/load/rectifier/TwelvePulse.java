package fourthwire.load.rectifier;

import fourthwire.load.rectifier.path.BridgeLoad;

/**
 * {@code twelve-pulse}: two six-pulse bridges on one capacitor with a constant-power load, behind
 * lossless windings of 0° and 30°: the input of large drives and supplies.
 *
 * <p>With i' and i'' the line currents of the bridges, T the windings' matrix, w = T·u, w_a = (u_a
 * - u_b)/√3, the source sees i = i' + Tᵀ·i''. Each conducting bridge draws its direct current
 * through its own line choke, both through what lies ahead of the windings (network and lead) and,
 * joined, through the direct-current choke; all their loops are solved together ({@code LoopStep}),
 * so that each bridge sees the voltage that the other's current leaves. Windings 30° behind would
 * be the same circuit with its rails exchanged.
 *
 * <p>Assumed: windings that are isolated from each other, so that the currents of each bridge add
 * up to zero and none circulates between the bridges over the rails; equal windings without leakage
 * (a transformer's counts in the line choke), constant power, linear chokes. On a balanced
 * sinusoidal supply orders 5, 7, 17, 19 … cancel between the bridges and 12k ± 1 are left;
 * unbalance and distortion bring the others. Checked against circuit-simulator results with the
 * same diodes (test resources {@code load/rectifiers}); expected error 0.4 % of the fundamental at
 * each order to 39.
 */
public final class TwelvePulse extends ThreeLineRectifier {
  /** All units of a row together. */
  public TwelvePulse(BridgeLoad load, double frequencyHz) {
    super(2, load, frequencyHz);
  }
}
