package fourthwire.load.rectifier.node;

import fourthwire.load.model.SharedSource;
import fourthwire.load.rectifier.path.BridgeLoad;
import fourthwire.quantity.Spectrum;
import java.util.List;
import java.util.stream.IntStream;

/** How much rectifiers side by side feel each other ({@code JointSolver}). */
final class Felt {
  private Felt() {}

  /** By the one that feels the others most. */
  static double most(List<BridgeLoad> loads, SharedSource source, double frequencyHz) {
    double perHenry = 2 * Math.PI * frequencyHz * Spectrum.HIGHEST_ORDER;
    double all = loads.stream().mapToDouble(BridgeLoad::powerW).sum();
    return IntStream.range(0, loads.size())
        .mapToDouble(k -> share(loads.get(k), k, source, perHenry) * (all / loads.get(k).powerW() - 1))
        .max()
        .orElse(0);
  }

  /** What is common to others on all that lies before one. */
  private static double share(BridgeLoad load, int at, SharedSource source, double perHenry) {
    int other = at == 0 ? 1 : 0;
    double common = Math.hypot(source.ohm(at, other), perHenry * source.henry(at, other));
    double whole =
        Math.hypot(
            source.ohm(at, at) + load.leadOhm() + load.lineOhm(),
            perHenry * (source.henry(at, at) + load.leadHenry() + load.lineHenry()));
    return common / whole;
  }
}
