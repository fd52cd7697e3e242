package fourthwire.load.rectifier.node;

import fourthwire.load.model.SharedSource;
import fourthwire.load.rectifier.path.BridgeLoad;
import fourthwire.quantity.Spectrum;
import java.util.List;

/** How much rectifiers side by side feel each other ({@code JointSolver}). */
final class Felt {
  private Felt() {}

  /** What others make of one's current: their size on its own, times what is common. */
  static double by(int bridge, List<BridgeLoad> loads, SharedSource source, double frequencyHz) {
    double all = loads.stream().mapToDouble(BridgeLoad::powerW).sum();
    return common(bridge, loads, source, frequencyHz) * (all / loads.get(bridge).powerW() - 1);
  }

  /** What is common to others on all that lies before one. */
  static double common(
      int bridge, List<BridgeLoad> loads, SharedSource source, double frequencyHz) {
    BridgeLoad load = loads.get(bridge);
    double perHenry = 2 * Math.PI * frequencyHz * Spectrum.HIGHEST_ORDER;
    int other = bridge == 0 ? 1 : 0;
    double common = Math.hypot(source.ohm(bridge, other), perHenry * source.henry(bridge, other));
    double whole =
        Math.hypot(
            source.ohm(bridge, bridge) + load.leadOhm() + load.lineOhm(),
            perHenry
                * (source.henry(bridge, bridge)
                    + load.leadHenry()
                    + load.lineHenry()
                    + load.dcHenry() / 2));
    return common / whole;
  }
}
