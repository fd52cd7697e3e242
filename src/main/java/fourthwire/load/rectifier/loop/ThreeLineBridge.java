package fourthwire.load.rectifier.loop;

import fourthwire.load.model.PortSpectra;
import fourthwire.load.rectifier.path.BridgeLoad;

/**
 * One six-pulse bridge, or two on one capacitor, followed through time: of each bridge no line
 * conducts, a pair, or three in commutation overlap; each change of the conducting set is found as
 * an event.
 *
 * <p>A line joins where, with a diode's threshold current in it and the direct current unchanged,
 * that current would grow; it leaves where its current falls through the threshold, handing it to
 * the line that stays. Workspace, not thread-safe.
 */
final class ThreeLineBridge extends LoopBridge {
  /** Space for the spectra of a second bridge's windings. */
  final PortSpectra second = new PortSpectra(3);

  private final Loop idle = new Loop(3);
  private final Loop joiner = new Loop(3);

  private int bridges = 1;

  /** Signed line currents, 0 where a line does not conduct; of a second bridge from 3 on. */
  ThreeLineBridge() {
    super(6, 3);
  }

  /**
   * Takes the circuit.
   *
   * @param sourceOhm resistance per line ahead of the bridges
   * @param sourceHenry inductance likewise
   * @param ownHenry inductance of each bridge's line
   */
  void set(
      int bridges,
      double sourceOhm,
      double sourceHenry,
      double ownHenry,
      BridgeLoad load,
      double cellSeconds,
      double threshold) {
    this.bridges = bridges;
    double ohm = 2 * (sourceOhm + load.lineOhm()) + load.dcOhm();
    double henry = 2 * (sourceHenry + ownHenry) + load.dcHenry();
    pair.set(ohm, henry, load, cellSeconds);
    pair.threshold(threshold);
    loops.set(sourceOhm, sourceHenry, ownHenry, load, cellSeconds);
    loops.threshold(threshold);
  }

  @Override
  int lines() {
    return 3 * bridges;
  }

  @Override
  double drive(double position) {
    double spread = emf.spread(0, position);
    return bridges == 1 ? spread : Math.max(spread, emf.spread(1, position));
  }

  @Override
  void turnOn() {
    int b = bridges == 1 || emf.spread(0, u) >= emf.spread(1, u) ? 0 : 1;
    line[emf.highest(b, u)] = pair.threshold;
    line[emf.lowest(b, u)] = -pair.threshold;
  }

  @Override
  void arrange() {
    loops.n = 0;
    for (int b = 0; b < bridges; b++) {
      int k = 3 * b;
      int balance = signum(line[k]) + signum(line[k + 1]) + signum(line[k + 2]);
      int sign = balance >= 0 ? 1 : -1;
      int common = line[k] * sign < 0 ? k : line[k + 1] * sign < 0 ? k + 1 : k + 2;
      for (int m = k; m < k + 3; m++) {
        if (line[m] * sign > 0) {
          loops.add(m, common, sign, line[m] * sign);
        }
      }
    }
    loops.couple();
  }

  private static int signum(double x) {
    return x > 0 ? 1 : x < 0 ? -1 : 0;
  }

  /** The line of a loop's bridge that is not in it. */
  private static int third(Loop loop) {
    return 9 * loop.bridge + 3 - loop.in - loop.out;
  }

  @Override
  void carry(double[] amps, double[] state) {
    for (int a = 0; a < loops.n; a++) {
      state[loops.loop[a].out] = 0;
    }
    for (int a = 0; a < loops.n; a++) {
      Loop loop = loops.loop[a];
      state[loop.in] = loop.sign * amps[a];
      state[loop.out] -= state[loop.in];
    }
  }

  /** To the line that stays, or with its whole pair. */
  @Override
  void leave(Loop loop) {
    int k = 3 * loop.bridge;
    double rest = line[loop.in];
    line[loop.in] = 0;
    if (conducting(k, k + 3) == 2) {
      line[third(loop)] += rest;
    } else {
      line[loop.out] = 0;
    }
  }

  /** The margin of the idle line that is the most willing to join, which becomes the joiner. */
  @Override
  double margin(double at) {
    double most = Double.NEGATIVE_INFINITY;
    if (loops.n < 2 * bridges) {
      loops.rates(emf, at);
      for (int b = 0, a = 0; b < bridges; b++) {
        int first = a;
        while (a < loops.n && loops.loop[a].bridge == b) {
          a++;
        }
        if (a == first) {
          most = Math.max(most, offMargin(3 * b, at, most));
        } else if (a == first + 1) {
          most = Math.max(most, thirdMargin(first, at, most));
        }
      }
    }
    return most;
  }

  /** Of a bridge without current: each pair of its lines, both ways. */
  private double offMargin(int k, double at, double atLeast) {
    double most = atLeast;
    double drop = loops.joiningDrop(0);
    for (int in = k; in < k + 3; in++) {
      for (int out = k; out < k + 3; out++) {
        if (in != out) {
          most = candidate(in, out, 0, drop, at, most);
        }
      }
    }
    return most;
  }

  /** Of a pair's idle line: on either side. */
  private double thirdMargin(int a, double at, double atLeast) {
    Loop loop = loops.loop[a];
    int third = third(loop);
    double carried = loops.x[a];
    double drop = loops.joiningDrop(carried);
    double up = candidate(third, loop.out, carried, drop, at, atLeast);
    return candidate(loop.in, third, carried, drop, at, up);
  }

  private double candidate(
      int in, int out, double carried, double drop, double at, double atLeast) {
    idle.set(in, out, 1);
    double margin = loops.margin(idle, emf, at, carried, drop);
    if (margin > atLeast) {
      joiner.set(in, out, 1);
      return margin;
    }
    return atLeast;
  }

  @Override
  void join() {
    double amps = pair.threshold;
    double enter = line[joiner.in];
    double leave = line[joiner.out];
    if (enter == 0 && leave == 0) {
      line[joiner.in] = amps;
      line[joiner.out] = -amps;
      return;
    }
    int yields = third(joiner);
    double total = Math.max(Math.abs(line[yields]), 2 * amps);
    int sign = enter == 0 ? 1 : -1;
    line[enter == 0 ? joiner.in : joiner.out] = sign * amps;
    line[enter == 0 ? joiner.out : joiner.in] = -sign * total;
    line[yields] = sign * (total - amps);
  }
}
