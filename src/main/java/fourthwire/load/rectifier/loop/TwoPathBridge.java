package fourthwire.load.rectifier.loop;

import fourthwire.load.model.PortSpectra;
import fourthwire.load.rectifier.path.BridgeLoad;

/**
 * A single-phase bridge whose two pairs of diodes may conduct together, as they do where a choke
 * behind the bridge drives its current past the voltage's zero crossing.
 *
 * <p>With x the current of the pair that carries the positive half and y the other's, the source's
 * current is x - y and the choke's x + y: while x flows, Ls·d(x-y)/dt + Rs·(x-y) + Ld·d(x+y)/dt +
 * Rd·(x+y) + 2·v_d(x) + v = e; while y flows, the same with -(x-y), y and -e; C·dv/dt = x + y -
 * P/v. By the symmetry of the four diodes both of a pair carry the same. {@link #line} holds x and
 * y; one leaves to the other, the choke's current unchanged.
 */
final class TwoPathBridge extends LoopBridge {
  /** Space for the second path's spectrum. */
  final PortSpectra second = new PortSpectra(1);

  private final Loop idle = new Loop(1);

  TwoPathBridge() {
    super(2, 1);
  }

  /**
   * Takes the circuit.
   *
   * @param sourceOhm resistance ahead of the bridge
   * @param sourceHenry inductance likewise
   */
  void set(
      double sourceOhm, double sourceHenry, BridgeLoad load, double cellSeconds, double threshold) {
    BridgeLoad bare =
        new BridgeLoad(
            load.powerW(), load.capacitanceF(), 0, 0, load.dcOhm(), load.dcHenry(), load.diode());
    pair.set(sourceOhm + load.dcOhm(), sourceHenry + load.dcHenry(), bare, cellSeconds);
    pair.threshold(threshold);
    loops.set(sourceOhm / 2, sourceHenry / 2, 0, bare, cellSeconds);
    loops.threshold(threshold);
  }

  @Override
  int lines() {
    return 2;
  }

  @Override
  double drive(double position) {
    return Math.abs(emf.between(0, 1, position));
  }

  @Override
  void turnOn() {
    line[emf.between(0, 1, u) >= 0 ? 0 : 1] = pair.threshold;
  }

  @Override
  void arrange() {
    loops.n = 0;
    for (int k = 0; k < 2; k++) {
      if (line[k] != 0) {
        loops.add(k, 1 - k, 1, line[k]);
      }
    }
    loops.couple();
  }

  @Override
  void carry(double[] amps, double[] state) {
    for (int a = 0; a < loops.n; a++) {
      state[loops.loop[a].in] = amps[a];
    }
  }

  @Override
  void leave(Loop loop) {
    double rest = line[loop.in];
    line[loop.in] = 0;
    if (line[loop.out] != 0) {
      line[loop.out] += rest;
    }
  }

  @Override
  double margin(double at) {
    if (loops.n == 2) {
      return Double.NEGATIVE_INFINITY;
    }
    Loop carrying = loops.loop[0];
    idle.set(carrying.out, carrying.in, 1);
    loops.rates(emf, at);
    return loops.margin(idle, emf, at, 0, loops.joiningDrop(0));
  }

  @Override
  void join() {
    double total = Math.max(line[idle.out], 2 * pair.threshold);
    line[idle.in] = pair.threshold;
    line[idle.out] = total - pair.threshold;
  }
}
