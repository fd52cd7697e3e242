package fourthwire.load.rectifier;

import fourthwire.load.model.JointSolver;
import fourthwire.load.model.LoadModel;
import fourthwire.load.model.LoadSolver;
import fourthwire.load.rectifier.node.NodeRectifiers;
import fourthwire.load.rectifier.path.BridgeLoad;
import java.util.List;

/**
 * {@code capacitor-input}: single-phase diode bridge, source R-L, smoothing capacitor and a
 * constant-power load: the supply of nearly everything electronic without power factor correction.
 *
 * <p>While |e| exceeds the capacitor's voltage v: L·di/dt = |e| - R·i - 2·v_d(i) - v and C·dv/dt =
 * i - P/v, with v_d the exponential law of {@code Diode}; otherwise i = 0. R and L are the
 * equipment's own and the network's together. The periodic state is found by shooting: Newton's
 * method on the state at a section, first with long steps, then with accurate ones ({@link
 * CapacitorInputSolver}).
 *
 * <p>{@code capacitor-input-choke} is the same with a choke in the lead or behind the bridge; the
 * latter is in series with the former as long as its current ends before the voltage behind the
 * bridge crosses zero. Where it flows on, both pairs of diodes carry it together and commutate
 * ({@code TwoPathBridge}).
 *
 * <p>A small capacitor behind a choke may have no stable state that repeats in mirrored halves; the
 * one that repeats after the whole cycle, with even orders, is then found, or it is said that none
 * settles.
 *
 * <p>Beside others at one connection it is followed together with them where they shape each
 * other's pulses ({@link NodeRectifiers}).
 *
 * <p>Assumed: constant power at every instant, an ideal capacitor (its loss resistance counts in
 * the diode's), a linear choke, no drift of an inrush limiter. Valid from stiff to soft sources, in
 * discontinuous and continuous conduction, under any voltage of orders 1 to 50. Source: the
 * circuit's own equations; checked against circuit-simulator results with the same diode (test
 * resources {@code load/rectifiers}). Expected error 0.4 % of the fundamental at each order to 39;
 * of real equipment its data's spread, which the presets state.
 */
public final class CapacitorInput implements LoadModel {
  private final BridgeLoad load;
  private final double frequencyHz;

  public CapacitorInput(BridgeLoad load, double frequencyHz) {
    this.load = load;
    this.frequencyHz = frequencyHz;
  }

  @Override
  public int ports() {
    return 1;
  }

  @Override
  public boolean joins(LoadModel other) {
    return load.dcHenry() == 0 && other instanceof CapacitorInput c && c.load.dcHenry() == 0;
  }

  @Override
  public JointSolver newJointSolver(List<LoadModel> all) {
    List<BridgeLoad> loads = all.stream().map(other -> ((CapacitorInput) other).load).toList();
    return new NodeRectifiers(loads, frequencyHz);
  }

  @Override
  public LoadSolver newSolver() {
    return new CapacitorInputSolver(load, frequencyHz);
  }
}
