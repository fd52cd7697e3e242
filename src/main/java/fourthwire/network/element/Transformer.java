package fourthwire.network.element;

import fourthwire.quantity.Phasor;

/**
 * A transformer between a feeding node and the node it makes: its secondary's ideal potentials are
 * a real matrix times the primary's, its short-circuit impedance stands behind them. No magnetising
 * current.
 *
 * <p>The feeding node of a three-phase transformer has lines 0, 1, 2 and, where it has a neutral,
 * that as conductor 3. The secondary's lines come first; its neutral, if any, is last and earthed
 * at the transformer.
 */
public final class Transformer {
  private final Kind kind;
  private final Connection connection;
  private final int from;
  private final int to;
  private final double ratio;
  private final TransformerImpedance impedance;

  private enum Kind {
    THREE_PHASE,
    SINGLE_PHASE,
    CENTRE_TAPPED
  }

  /**
   * What a three-phase connection does to the symmetrical components.
   *
   * @param clock clock number: the secondary's positive sequence lags by this many times 30°, its
   *     negative sequence leads by the same
   * @param secondaryNeutral whether the secondary star point is earthed and brought out
   * @param passesZeroSequence whether zero sequence passes: star to star with both star points
   *     connected; the primary's is tied to the feeding node's neutral, or to earth if it has none
   */
  public record Connection(int clock, boolean secondaryNeutral, boolean passesZeroSequence) {
    /** Refuses an hour outside 0 to 11 and a zero-sequence path without star points. */
    public Connection {
      if (clock < 0 || clock > 11) {
        throw new IllegalArgumentException("a clock number of " + clock + ": it is 0 to 11");
      }
      if (passesZeroSequence && (!secondaryNeutral || clock % 2 != 0)) {
        throw new IllegalArgumentException(
            "only a star to star transformer, with an even clock number and its neutral brought"
                + " out, passes zero sequence");
      }
    }
  }

  private Transformer(
      Kind kind,
      Connection connection,
      int from,
      int to,
      double ratio,
      TransformerImpedance impedance) {
    if (!(ratio > 0) || Double.isInfinite(ratio)) {
      throw new IllegalArgumentException("a transformer ratio of " + ratio + ": it is above 0");
    }
    this.kind = kind;
    this.connection = connection;
    this.from = from;
    this.to = to;
    this.ratio = ratio;
    this.impedance = impedance;
  }

  /**
   * A three-phase transformer.
   *
   * @param ratio primary over secondary voltage, both line to line
   */
  public static Transformer threePhase(
      Connection connection, double ratio, TransformerImpedance impedance) {
    return new Transformer(Kind.THREE_PHASE, connection, 0, 1, ratio, impedance);
  }

  /**
   * A single-phase transformer (Ii0) on two conductors of the feeding node; the secondary is line
   * and neutral.
   *
   * @param ratio primary over secondary voltage
   */
  public static Transformer singlePhase(
      int from, int to, double ratio, TransformerImpedance impedance) {
    return new Transformer(
        Kind.SINGLE_PHASE, new Connection(0, true, false), from, to, ratio, impedance);
  }

  /**
   * A single-phase transformer with centre-tapped secondary (Iii0) on two conductors of the feeding
   * node; the secondary is two lines and the earthed centre. Half of the impedance stands in each
   * line, uncoupled.
   *
   * @param ratio primary over whole secondary voltage, line to line
   */
  public static Transformer centreTapped(
      int from, int to, double ratio, TransformerImpedance impedance) {
    return new Transformer(
        Kind.CENTRE_TAPPED, new Connection(0, true, false), from, to, ratio, impedance);
  }

  /** Conductors of the secondary, its neutral included. */
  public int conductors() {
    return switch (kind) {
      case THREE_PHASE -> connection.secondaryNeutral() ? 4 : 3;
      case SINGLE_PHASE -> 2;
      case CENTRE_TAPPED -> 3;
    };
  }

  /**
   * The real matrix from the feeding node's potentials to the secondary's ideal ones, row by row; a
   * new array.
   *
   * @throws IllegalArgumentException if the feeding node lacks the conductors
   */
  public double[] turns(int parentConductors) {
    double[] a = new double[conductors() * parentConductors];
    switch (kind) {
      case THREE_PHASE -> writeThreePhase(a, parentConductors);
      case SINGLE_PHASE -> writeRow(a, 0, parentConductors, 1 / ratio);
      case CENTRE_TAPPED -> {
        writeRow(a, 0, parentConductors, 0.5 / ratio);
        writeRow(a, 1, parentConductors, -0.5 / ratio);
      }
    }
    return a;
  }

  private void writeRow(double[] a, int row, int parentConductors, double factor) {
    if (from == to || Math.min(from, to) < 0 || Math.max(from, to) >= parentConductors) {
      throw new IllegalArgumentException(
          "a single-phase transformer on conductors %d and %d of a node that has %d"
              .formatted(from, to, parentConductors));
    }
    a[row * parentConductors + from] = factor;
    a[row * parentConductors + to] = -factor;
  }

  /**
   * The circulant whose positive sequence is turned by -30° times the hour, negative by as much the
   * other way: c[k] = 2/3·cos(hour·30° + k·120°). It removes zero sequence; where that passes it is
   * added, reversed in the hours 2, 6 and 10, whose windings are reversed against 0, 4 and 8.
   */
  private void writeThreePhase(double[] a, int parentConductors) {
    if (parentConductors != 3 && parentConductors != 4) {
      throw new IllegalArgumentException(
          "a three-phase transformer is fed from three lines, or three lines and neutral, not from "
              + parentConductors
              + " conductors");
    }
    double zero =
        connection.passesZeroSequence() ? (connection.clock() % 4 == 0 ? 1 : -1) / ratio : 0;
    for (int row = 0; row < 3; row++) {
      for (int column = 0; column < 3; column++) {
        double angle = Math.toRadians(connection.clock() * 30 + 120 * (row - column));
        a[row * parentConductors + column] = (2 / ratio * Math.cos(angle) + zero) / 3;
      }
      if (parentConductors == 4) {
        a[row * parentConductors + 3] = -zero;
      }
    }
  }

  /**
   * The impedance matrix over the secondary's conductors at an order, ohms, row by row, real and
   * imaginary part side by side; a new array.
   */
  public double[] matrix(double order) {
    int size = conductors();
    double[] z = new double[2 * size * size];
    Phasor z1 = impedance.at(order);
    if (kind != Kind.THREE_PHASE) {
      double share = kind == Kind.CENTRE_TAPPED ? 0.5 : 1;
      for (int line = 0; line < size - 1; line++) {
        z[2 * line * (size + 1)] = z1.re() * share;
        z[2 * line * (size + 1) + 1] = z1.im() * share;
      }
      return z;
    }
    Phasor z0 = impedance.zeroSequenceAt(order);
    double[] c = {z1.re(), z1.im(), z1.re(), z1.im(), z0.re(), z0.im()};
    Sequences.toCirculant(c);
    Sequences.writeCirculant(c, z, size);
    return z;
  }
}
