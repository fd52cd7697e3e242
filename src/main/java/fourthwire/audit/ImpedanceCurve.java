package fourthwire.audit;

import java.util.Arrays;

/**
 * The impedance seen from a node against the order, 1 to 50 in steps of 0.1, ohms: of the positive
 * sequence on three lines, of the loop of line and return elsewhere.
 */
public final class ImpedanceCurve {
  /** The first order. */
  public static final double FIRST_ORDER = 1;

  /** Between one order and the next. */
  public static final double STEP = 0.1;

  /** How many orders. */
  public static final int POINTS = 491;

  private final double[] ohm;

  private ImpedanceCurve(double[] ohm) {
    this.ohm = ohm;
  }

  /** The curve through these magnitudes. */
  public static ImpedanceCurve of(double[] ohm) {
    if (ohm.length != POINTS) {
      throw new IllegalArgumentException("an impedance curve has 491 points, not " + ohm.length);
    }
    return new ImpedanceCurve(ohm.clone());
  }

  /** Magnitude at a point, 0 to 490. */
  public double ohm(int point) {
    return ohm[point];
  }

  /** The order at a point. */
  public static double order(int point) {
    return FIRST_ORDER + point / 10.0;
  }

  @Override
  public boolean equals(Object other) {
    return other instanceof ImpedanceCurve c && Arrays.equals(ohm, c.ohm);
  }

  @Override
  public int hashCode() {
    return Arrays.hashCode(ohm);
  }

  @Override
  public String toString() {
    return "ImpedanceCurve[" + ohm[0] + " ohm at order 1]";
  }
}
