package fourthwire.network;

import fourthwire.quantity.Phasor;

/**
 * The driving-point impedance of a node at one order, ohms: the potentials of its conductors per
 * ampere injected into each, everything else being as it is and every source dead. With the
 * potentials while nothing is injected it is the Thévenin equivalent of the network at the node.
 */
public final class DrivingPoint {
  private final double[] ohm;
  private final int size;

  DrivingPoint(double[] ohm, int size) {
    this.ohm = ohm;
    this.size = size;
  }

  /** Potential of one conductor per ampere injected into another (or itself). */
  public Phasor at(int conductor, int injectedInto) {
    if (Math.min(conductor, injectedInto) < 0 || Math.max(conductor, injectedInto) >= size) {
      throw new IllegalArgumentException(
          "conductors %d and %d of a node that has %d".formatted(conductor, injectedInto, size));
    }
    int at = 2 * (conductor * size + injectedInto);
    return new Phasor(ohm[at], ohm[at + 1]);
  }

  /** Impedance between two conductors: what a load across them sees. */
  public Phasor between(int conductor, int other) {
    return at(conductor, conductor)
        .plus(at(other, other))
        .minus(at(conductor, other))
        .minus(at(other, conductor));
  }

  /** Impedance to the positive sequence of lines 0, 1 and 2. */
  public Phasor positiveSequence() {
    return sequence(120);
  }

  /** Impedance to the negative sequence of lines 0, 1 and 2. */
  public Phasor negativeSequence() {
    return sequence(-120);
  }

  /** Σ over rows and columns of z[i][j]·1∠(i - j)·turn, over 3: diagonal of the sequence matrix. */
  private Phasor sequence(double turn) {
    Phasor sum = Phasor.ZERO;
    for (int i = 0; i < 3; i++) {
      for (int j = 0; j < 3; j++) {
        sum = sum.plus(at(i, j).turned(turn * (i - j)));
      }
    }
    return sum.times(1.0 / 3);
  }

  /** How many conductors the node has. */
  public int conductors() {
    return size;
  }
}
