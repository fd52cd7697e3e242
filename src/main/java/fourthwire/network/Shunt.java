package fourthwire.network;

/** A linear element between conductors of one node, or between them and earth. */
public sealed interface Shunt {
  /** In place of a conductor's number: earth. */
  int EARTH = -1;

  /** An admittance between two conductors of the node; the second may be {@link #EARTH}. */
  static Shunt between(int conductor, int other, OrderAdmittance admittance) {
    return new TwoTerminal(conductor, other, admittance);
  }

  /**
   * Three equal legs on lines 0, 1 and 2 of the node.
   *
   * @param common the conductor the zero-sequence current returns by, or {@link #EARTH}; of no
   *     effect where the zero-sequence admittance is 0
   */
  static Shunt threeLines(int common, SequenceAdmittance admittance) {
    return new ThreeTerminal(0, 1, 2, common, admittance);
  }

  /** The highest conductor number used. */
  int highestConductor();

  /** Adds this to a node's admittance matrix at an order. */
  void stamp(double order, Stamp into);

  /** An admittance between two conductors. */
  record TwoTerminal(int conductor, int other, OrderAdmittance admittance) implements Shunt {
    /** Refuses an element on one conductor or without one. */
    public TwoTerminal {
      if (conductor < 0 || other < EARTH || conductor == other) {
        throw new IllegalArgumentException(
            "a shunt between conductors %d and %d of one node".formatted(conductor, other));
      }
    }

    @Override
    public int highestConductor() {
      return Math.max(conductor, other);
    }

    @Override
    public void stamp(double order, Stamp into) {
      double[] y = into.siemens();
      admittance.at(order, y);
      into.add(conductor, conductor, y[0], y[1]);
      if (other != EARTH) {
        into.add(other, other, y[0], y[1]);
        into.add(conductor, other, -y[0], -y[1]);
        into.add(other, conductor, -y[0], -y[1]);
      }
    }
  }

  /** Three equal legs on three lines, their common point on a conductor or on earth. */
  record ThreeTerminal(int line1, int line2, int line3, int common, SequenceAdmittance admittance)
      implements Shunt {
    /** Refuses lines or a common point that coincide. */
    public ThreeTerminal {
      boolean distinct = line1 != line2 && line2 != line3 && line3 != line1;
      if (!distinct || Math.min(line1, Math.min(line2, line3)) < 0 || common < EARTH) {
        throw new IllegalArgumentException(
            "a three-line shunt on conductors %d, %d, %d and %d"
                .formatted(line1, line2, line3, common));
      }
      if (common == line1 || common == line2 || common == line3) {
        throw new IllegalArgumentException("the common point of three legs is one of their lines");
      }
    }

    @Override
    public int highestConductor() {
      return Math.max(Math.max(line1, line2), Math.max(line3, common));
    }

    @Override
    public void stamp(double order, Stamp into) {
      double[] y = into.siemens();
      admittance.at(order, y);
      double zeroRe = y[4];
      double zeroIm = y[5];
      Sequences.toCirculant(y);
      for (int row = 0; row < 3; row++) {
        for (int column = 0; column < 3; column++) {
          int k = 2 * ((row - column + 3) % 3);
          into.add(line(row), line(column), y[k], y[k + 1]);
        }
      }
      if (common != EARTH && (zeroRe != 0 || zeroIm != 0)) {
        stampCommon(zeroRe, zeroIm, into);
      }
    }

    /** All line currents return at the common conductor; each line row and column sums to Y0. */
    private void stampCommon(double zeroRe, double zeroIm, Stamp into) {
      for (int row = 0; row < 3; row++) {
        into.add(line(row), common, -zeroRe, -zeroIm);
        into.add(common, line(row), -zeroRe, -zeroIm);
      }
      into.add(common, common, 3 * zeroRe, 3 * zeroIm);
    }

    private int line(int k) {
      return k == 0 ? line1 : k == 1 ? line2 : line3;
    }
  }

  /** Where shunts add themselves up: one node's admittance matrix at one order. */
  final class Stamp {
    private final double[] siemens = new double[6];
    private double[] matrix = new double[0];
    private int offset;
    private int size;

    Stamp() {}

    Stamp on(double[] matrix, int offset, int size) {
      this.matrix = matrix;
      this.offset = offset;
      this.size = size;
      return this;
    }

    double[] siemens() {
      return siemens;
    }

    void add(int row, int column, double re, double im) {
      int at = offset + 2 * (row * size + column);
      matrix[at] += re;
      matrix[at + 1] += im;
    }
  }
}
