package fourthwire.load.rectifier.node;

import fourthwire.load.model.SharedSource;
import fourthwire.load.rectifier.path.BridgeLoad;
import fourthwire.load.rectifier.path.QuickLog;
import java.util.List;

/**
 * Single-phase bridges that hang on what they share of a source: the circuit's numbers, time
 * counted in cells of {@code CycleTable}.
 *
 * <p>With i the signed currents into the bridges that conduct, s their signs, L and R the matrices
 * of what they share and have for themselves: L·i' = e - R·i - s·(v_d(|i|) + v), and for each C·v'
 * = |i| - P/v. L may be singular (bridges without inductance of their own share the source's) or
 * zero: the diodes' resistance keeps the equations of index one. Workspace, not thread-safe.
 */
class NodeCircuit {
  /** A current that counts as open, as a share of power over crest. */
  private static final double THRESHOLD = 1e-3;

  /** How many bridges there are. */
  final int all;

  /** Matrices by bridge, row by row: ohms, and ohms per cell. */
  final double[] ohm;

  final double[] henry;

  /** By bridge. */
  final double[] capacitance;

  final double[] power;
  final double[] threshold;

  private final double[] slopeV;
  private final double[] saturation;
  private final double[] thresholdV;

  NodeCircuit(int bridges) {
    all = bridges;
    ohm = new double[all * all];
    henry = new double[all * all];
    capacitance = new double[all];
    power = new double[all];
    threshold = new double[all];
    slopeV = new double[all];
    saturation = new double[all];
    thresholdV = new double[all];
  }

  /**
   * Takes the circuit.
   *
   * @param shared what the bridges share, and have for themselves ahead of their own leads
   * @param peak the source's crest, volts
   */
  void set(List<BridgeLoad> loads, SharedSource shared, double peak, double cellSeconds) {
    for (int k = 0; k < all; k++) {
      BridgeLoad load = loads.get(k);
      for (int m = 0; m < all; m++) {
        ohm[k * all + m] = shared.ohm(k, m);
        henry[k * all + m] = shared.henry(k, m) / cellSeconds;
      }
      ohm[k * all + k] += load.lineOhm() + load.dcOhm() + 2 * load.diode().ohm();
      henry[k * all + k] += (load.lineHenry() + load.dcHenry()) / cellSeconds;
      capacitance[k] = load.capacitanceF() / cellSeconds;
      power[k] = load.powerW();
      threshold[k] = THRESHOLD * load.powerW() / peak;
      slopeV[k] = 2 * load.diode().slopeV();
      saturation[k] = load.diode().saturationA();
      thresholdV[k] = slopeV[k] * Math.log(1 + threshold[k] / saturation[k]);
    }
  }

  /** Volts that a bridge's two diodes take but for their resistance; held below the threshold. */
  final double drop(int bridge, double amps) {
    return amps > threshold[bridge]
        ? slopeV[bridge] * QuickLog.of(1 + amps / saturation[bridge])
        : thresholdV[bridge];
  }

  /** Slope of that drop, ohms. */
  final double diodeOhm(int bridge, double amps) {
    return amps >= threshold[bridge] ? slopeV[bridge] / (amps + saturation[bridge]) : 0;
  }

  /** What a drive has to have over a bridge's capacitor for a current to start, volts. */
  final double onsetV(int bridge) {
    return thresholdV[bridge] + ohm[bridge * all + bridge] * threshold[bridge];
  }

  /** A threshold's worth of drop more: clear of any doubt about a start. */
  final double clearV(int bridge) {
    return slopeV[bridge];
  }
}
