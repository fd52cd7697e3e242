package fourthwire.network.element;

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

  /** An admittance between two conductors, or between one and earth. */
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

    /** The conductor of leg 0, 1 or 2. */
    public int line(int leg) {
      return leg == 0 ? line1 : leg == 1 ? line2 : line3;
    }
  }
}
