package fourthwire.network.element;

import fourthwire.quantity.Phasor;

/**
 * What lies between a source's ideal, earthed electromotive forces and its terminals: a matrix over
 * the terminals' conductors. The lines come first; a neutral, if any, is last and earthed at the
 * source itself.
 */
public final class SourceImpedance {
  private final int lines;
  private final boolean neutral;
  private final boolean regulated;
  private final SeriesImpedance positive;
  private final SeriesImpedance negative;
  private final SeriesImpedance zero;

  private SourceImpedance(
      int lines,
      boolean neutral,
      boolean regulated,
      SeriesImpedance positive,
      SeriesImpedance negative,
      SeriesImpedance zero) {
    this.lines = lines;
    this.neutral = neutral;
    this.regulated = regulated;
    this.positive = positive;
    this.negative = negative;
    this.zero = zero;
  }

  /** Three lines and an earthed neutral, by sequence impedances; negative is as positive. */
  public static SourceImpedance fourWire(SeriesImpedance positive, SeriesImpedance zero) {
    return new SourceImpedance(3, true, false, positive, positive, zero);
  }

  /** Three lines without a neutral, by sequence impedances; negative is as positive. */
  public static SourceImpedance threeWire(SeriesImpedance positive, SeriesImpedance zero) {
    return new SourceImpedance(3, false, false, positive, positive, zero);
  }

  /** One line and an earthed neutral; the whole of the loop's impedance lies in the line. */
  public static SourceImpedance singlePhase(SeriesImpedance line) {
    return new SourceImpedance(1, true, false, line, line, line);
  }

  /** Two lines and an earthed neutral; each line has this impedance, uncoupled. */
  public static SourceImpedance splitPhase(SeriesImpedance perLine) {
    return new SourceImpedance(2, true, false, perLine, perLine, perLine);
  }

  /** This with another negative-sequence impedance; three lines only. */
  public SourceImpedance withNegativeSequence(SeriesImpedance other) {
    requireThreeLines("a negative-sequence impedance");
    return new SourceImpedance(lines, neutral, regulated, positive, other, zero);
  }

  /**
   * This with its fundamental terminal voltage held, as a generator's regulator does: the
   * positive-sequence impedance (of one or two lines: the lines') is 0 at order 1 exactly, so that
   * the electromotive force of order 1 is the terminal voltage.
   */
  public SourceImpedance regulated() {
    return new SourceImpedance(lines, neutral, true, positive, negative, zero);
  }

  /** Conductors at the terminals, the neutral included. */
  public int conductors() {
    return lines + (neutral ? 1 : 0);
  }

  /** Line conductors at the terminals. */
  public int lines() {
    return lines;
  }

  private void requireThreeLines(String what) {
    if (lines != 3) {
      throw new IllegalStateException(what + " belongs to a source with three lines");
    }
  }

  /**
   * The impedance matrix over the conductors at an order, ohms, row by row, real and imaginary part
   * side by side; a new array.
   */
  public double[] matrix(double order) {
    int size = conductors();
    double[] z = new double[2 * size * size];
    Phasor z1 = regulated && order == 1 ? Phasor.ZERO : positive.at(order);
    if (lines < 3) {
      for (int line = 0; line < lines; line++) {
        z[2 * line * (size + 1)] = z1.re();
        z[2 * line * (size + 1) + 1] = z1.im();
      }
      return z;
    }
    Phasor z2 = negative.at(order);
    Phasor z0 = zero.at(order);
    double[] c = {z1.re(), z1.im(), z2.re(), z2.im(), z0.re(), z0.im()};
    Sequences.toCirculant(c);
    Sequences.writeCirculant(c, z, size);
    return z;
  }
}
