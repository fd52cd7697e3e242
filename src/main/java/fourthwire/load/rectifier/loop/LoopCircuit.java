package fourthwire.load.rectifier.loop;

import fourthwire.load.rectifier.path.BridgeLoad;
import fourthwire.load.rectifier.path.QuickLog;

/**
 * The circuit of all loops of current that conduct in one bridge or in two on one capacitor: what
 * they share of the source, the line chokes and the direct-current choke, and the diodes' law.
 *
 * <p>With x the loops' currents, M and R the matrices of what they share: M·x' = e - R·x - v_d - v
 * and C·v' = Σx - P/v, where v_d is the drop of the diode that a loop has for itself plus that of
 * the one which carries all loops of its bridge. M may be singular (no inductance). Workspace, not
 * thread-safe.
 */
abstract class LoopCircuit {
  /** Two lines of each bridge share a current. */
  static final int MOST = 4;

  /** Loops, those of a bridge next to each other. */
  final Loop[] loop = new Loop[MOST];

  /** How many of them conduct. */
  int n;

  private double sourceOhm;
  private double sourceHenry;
  private double ownOhm;
  private double ownHenry;
  private double dcOhm;
  private double dcHenry;
  private boolean resistive;
  double capacitance;
  double power;
  double slopeV;
  double saturation;
  double threshold;

  /** The matrices R and M, M per cell, row by row. */
  final double[] ohm = new double[MOST * MOST];

  final double[] henry = new double[MOST * MOST];

  /** As {@link Loop#Loop}. */
  LoopCircuit(int linesOfOne) {
    java.util.Arrays.setAll(loop, a -> new Loop(linesOfOne));
  }

  /**
   * Takes the circuit.
   *
   * @param sourceOhm resistance per line ahead of both bridges
   * @param sourceHenry inductance likewise
   */
  void set(
      double sourceOhm, double sourceHenry, double ownHenry, BridgeLoad load, double cellSeconds) {
    this.sourceOhm = sourceOhm;
    this.sourceHenry = sourceHenry / cellSeconds;
    ownOhm = load.lineOhm() + load.diode().ohm();
    this.ownHenry = ownHenry / cellSeconds;
    dcOhm = load.dcOhm();
    dcHenry = load.dcHenry() / cellSeconds;
    resistive = sourceHenry + ownHenry + load.dcHenry() == 0;
    capacitance = load.capacitanceF() / cellSeconds;
    power = load.powerW();
    slopeV = load.diode().slopeV();
    saturation = load.diode().saturationA();
  }

  void threshold(double amps) {
    threshold = amps;
  }

  /** The matrices of the loops as they stand. */
  void couple() {
    for (int a = 0; a < n; a++) {
      for (int b = 0; b <= a; b++) {
        ohm[a * MOST + b] = ohm[b * MOST + a] = mutualOhm(loop[a], loop[b]);
        henry[a * MOST + b] = henry[b * MOST + a] = mutualHenry(loop[a], loop[b]);
      }
    }
  }

  double mutualOhm(Loop a, Loop b) {
    return (a.bridge == b.bridge ? ownOhm + sourceOhm : sourceOhm) * a.along(b) + dcOhm;
  }

  double mutualHenry(Loop a, Loop b) {
    return (a.bridge == b.bridge ? ownHenry + sourceHenry : sourceHenry) * a.along(b) + dcHenry;
  }

  /** All loops of this one's bridge together: the current in their common diode. */
  double shared(int a, double[] amps) {
    double sum = amps[a];
    if (a > 0 && loop[a - 1].bridge == loop[a].bridge) {
      sum += amps[a - 1];
    } else if (a + 1 < n && loop[a + 1].bridge == loop[a].bridge) {
      sum += amps[a + 1];
    }
    return sum;
  }

  /** Logarithmic drop of two diodes. */
  double drops(double one, double other) {
    return slopeV
        * QuickLog.of(
            (1 + Math.max(one, threshold) / saturation)
                * (1 + Math.max(other, threshold) / saturation));
  }

  double conductance(double amps) {
    return amps >= threshold ? slopeV / (amps + saturation) : 0;
  }

  /** Whether nothing keeps a current going. */
  final boolean resistive() {
    return resistive;
  }

  double inductive(int a, double[] rates) {
    double sum = 0;
    for (int b = 0; b < n; b++) {
      sum += henry[a * MOST + b] * rates[b];
    }
    return sum;
  }

  /**
   * What a line that joins has its drops come to beside one that carries a current already: both
   * diodes', with the threshold's current in its own.
   */
  double joiningDrop(double carried) {
    double held = Math.max(carried, threshold);
    return drops(0, held) + (carried > 0 ? slopeV * 2 * threshold / held : 0);
  }
}
