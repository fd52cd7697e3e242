package fourthwire.network;

import fourthwire.quantity.Phasor;

/**
 * Potentials and currents of every conductor at one order. Filled by {@link FactoredOrder#solve};
 * it may be filled again, so copy what must stay.
 */
public final class OrderSolution {
  private final TreeNetwork network;
  final double[] potential;
  final double[] current;
  final double[] work;

  OrderSolution(TreeNetwork network) {
    this.network = network;
    potential = new double[2 * network.conductors()];
    current = new double[2 * network.conductors()];
    work = new double[2 * network.plan().largest];
  }

  /** Potential of a node's conductor to earth, volts. */
  public Phasor potential(int node, int conductor) {
    int at = 2 * network.index(node, conductor);
    return new Phasor(potential[at], potential[at + 1]);
  }

  /** Potential of one conductor of a node over another, volts. */
  public Phasor voltage(int node, int conductor, int over) {
    return potential(node, conductor).minus(potential(node, over));
  }

  /**
   * Current that flows into a node's conductor through what feeds the node, amps: a feeder's
   * current, a transformer's secondary current, or the source's current. Positive from source to
   * load in every conductor, so a neutral's is the negative of the load-to-source current.
   */
  public Phasor current(int node, int conductor) {
    int at = 2 * network.index(node, conductor);
    return new Phasor(current[at], current[at + 1]);
  }

  /**
   * Current that what feeds a node draws from a conductor of the feeding node, amps: a
   * transformer's primary current, or the sum of the feeder's conductors joined there.
   *
   * @param node any but the source's terminals
   * @param parentConductor conductor of the feeding node
   */
  public Phasor primaryCurrent(int node, int parentConductor) {
    network.index(network.parent(node), parentConductor);
    Phasor sum = Phasor.ZERO;
    for (int k = 0; k < network.conductors(node); k++) {
      double part = network.coupling(node, k, parentConductor);
      sum = sum.plus(current(node, k).times(part));
    }
    return sum;
  }

  /**
   * Active power lost at this order in what feeds a node, watts: in all conductors of its feeder,
   * neutral included, or in its transformer's windings.
   *
   * @param node any but the source's terminals
   */
  public double lossW(int node) {
    int parent = network.parent(node);
    double watts = 0;
    for (int m = 0; m < network.conductors(parent); m++) {
      watts += realPower(potential(parent, m), primaryCurrent(node, m));
    }
    for (int k = 0; k < network.conductors(node); k++) {
      watts -= realPower(potential(node, k), current(node, k));
    }
    return watts;
  }

  private static double realPower(Phasor volts, Phasor amps) {
    return volts.re() * amps.re() + volts.im() * amps.im();
  }

  /** Real part of a potential, by the conductor's {@link TreeNetwork#index index}. */
  public double potentialRe(int index) {
    return potential[2 * index];
  }

  /** Imaginary part of a potential, by index. */
  public double potentialIm(int index) {
    return potential[2 * index + 1];
  }

  /** Real part of a feeding current, by the conductor's {@link TreeNetwork#index index}. */
  public double currentRe(int index) {
    return current[2 * index];
  }

  /** Imaginary part of a feeding current, by index. */
  public double currentIm(int index) {
    return current[2 * index + 1];
  }

  /** The network this is a solution of. */
  public TreeNetwork network() {
    return network;
  }
}
