package fourthwire.load.rectifier.node;

import java.util.Arrays;

/**
 * How the state of {@link NodeBridges} at a moment answers to small departures of the one its march
 * began with: a column for each departure.
 *
 * <p>What is carried from step to step are the departures of the inductances' flux, L·δi, and of
 * the capacitors' voltages. Both stay where a current starts or ends, as the forces on either side
 * of such a moment are the same; so a bridge that leaves takes no departure of the flux with it,
 * and one that joins finds that of what it shares. That holds for bridges with an inductance of
 * their own and without.
 */
final class NodeTangent {
  /** By column and bridge: currents, capacitors' voltages. */
  final double[][] amps;

  final double[][] volts;
  private final double[][] flux;
  private final double[] packedFlux;
  private final double[] packedAmps;
  private final double[] packedVolts;

  /** How many columns are carried. */
  int count;

  NodeTangent(int bridges) {
    amps = new double[2 * bridges][bridges];
    volts = new double[2 * bridges][bridges];
    flux = new double[2 * bridges][bridges];
    packedFlux = new double[bridges];
    packedAmps = new double[bridges];
    packedVolts = new double[bridges];
  }

  /** No departures. */
  void clear() {
    count = 0;
  }

  /** Another departure, of a bridge's voltage or of its current. */
  void depart(int bridge, boolean ofCurrent) {
    Arrays.fill(amps[count], 0);
    Arrays.fill(volts[count], 0);
    Arrays.fill(flux[count], 0);
    (ofCurrent ? amps : volts)[count][bridge] = 1;
    count++;
  }

  /** At the start of a march, with the bridges that conduct. */
  void begin(NodeStep step) {
    for (int c = 0; c < count; c++) {
      for (int a = 0; a < step.n; a++) {
        packedAmps[a] = amps[c][step.bridge[a]];
      }
      for (int a = 0; a < step.n; a++) {
        flux[c][step.bridge[a]] = step.flux(step.bridge[a], packedAmps);
      }
    }
  }

  /** A capacitor alone with its load: v·δv stays. */
  void rest(int bridge, double before, double after) {
    for (int c = 0; c < count; c++) {
      volts[c][bridge] *= before / after;
    }
  }

  /** A bridge joins those that conduct, which do not count it yet. */
  void join(NodeStep step, int bridge) {
    for (int c = 0; c < count; c++) {
      for (int a = 0; a < step.n; a++) {
        packedAmps[a] = amps[c][step.bridge[a]];
      }
      flux[c][bridge] = step.flux(bridge, packedAmps);
      amps[c][bridge] = 0;
    }
  }

  /** A bridge's current has ended. */
  void leave(int bridge) {
    for (int c = 0; c < count; c++) {
      amps[c][bridge] = 0;
      flux[c][bridge] = 0;
    }
  }

  /** Carries the columns over the step just taken, of h cells. */
  void step(NodeStep step, double h) {
    if (count == 0) {
      return;
    }
    step.prepareTangent(h);
    for (int c = 0; c < count; c++) {
      for (int a = 0; a < step.n; a++) {
        packedFlux[a] = flux[c][step.bridge[a]];
        packedVolts[a] = volts[c][step.bridge[a]];
      }
      step.tangent(packedFlux, packedAmps, packedVolts);
      for (int a = 0; a < step.n; a++) {
        flux[c][step.bridge[a]] = packedFlux[a];
        amps[c][step.bridge[a]] = packedAmps[a];
        volts[c][step.bridge[a]] = packedVolts[a];
      }
    }
  }
}
