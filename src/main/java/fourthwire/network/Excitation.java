package fourthwire.network;

import fourthwire.quantity.Phasor;
import java.util.Arrays;

/**
 * What drives the network at one order: the source's electromotive forces and the currents injected
 * into conductors. A mutable work block, to be filled again for each solution; not for use by two
 * threads at once.
 */
public final class Excitation {
  private final TreeNetwork network;
  final double[] emf;
  final double[] injected;

  Excitation(TreeNetwork network, int sourceConductors) {
    this.network = network;
    emf = new double[2 * sourceConductors];
    injected = new double[2 * network.conductors()];
  }

  /** Sets everything to zero. */
  public Excitation clear() {
    Arrays.fill(emf, 0);
    return clearCurrents();
  }

  /** Sets every injected current to zero and keeps the source's electromotive forces. */
  public Excitation clearCurrents() {
    Arrays.fill(injected, 0);
    return this;
  }

  /** The source's electromotive force behind one of its conductors, volts to earth. */
  public Excitation emf(int conductor, Phasor volts) {
    if (conductor < 0 || 2 * conductor >= emf.length) {
      throw new IllegalArgumentException("the source has no conductor " + conductor);
    }
    emf[2 * conductor] = volts.re();
    emf[2 * conductor + 1] = volts.im();
    return this;
  }

  /**
   * Electromotive forces of lines 0, 1 and 2 as copies a third of a fundamental cycle apart: line k
   * stands at the first's angle - order·120°·k.
   */
  public Excitation threePhaseEmf(int order, Phasor firstLine) {
    for (int k = 0; k < 3; k++) {
      emf(k, firstLine.turned(-120.0 * (order * k % 3)));
    }
    return this;
  }

  /** Adds a current, amps, that flows into a node's conductor from outside. */
  public Excitation inject(int node, int conductor, Phasor amps) {
    return inject(network.index(node, conductor), amps.re(), amps.im());
  }

  /** Adds a current by the conductor's {@link TreeNetwork#index index}. */
  public Excitation inject(int index, double re, double im) {
    injected[2 * index] += re;
    injected[2 * index + 1] += im;
    return this;
  }

  /** Makes a current the only one injected there, by the conductor's index. */
  public Excitation set(int index, double re, double im) {
    injected[2 * index] = re;
    injected[2 * index + 1] = im;
    return this;
  }

  /** Adds a load's current: out of one conductor of a node, and back into another. */
  public Excitation draw(int node, int from, int to, Phasor amps) {
    inject(network.index(node, from), -amps.re(), -amps.im());
    return inject(node, to, amps);
  }

  /** The network this excites. */
  public TreeNetwork network() {
    return network;
  }
}
