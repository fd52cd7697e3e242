package fourthwire.quantity;

import java.util.List;

/**
 * Three lines split into positive, negative and zero sequence at every order (Fortescue, 1918), on
 * the first line, magnitude-invariant: L1 = positive + negative + zero.
 *
 * <p>The transform is that of the phasors of one order. A balanced load's order <i>h</i> therefore
 * stands in the zero sequence for h = 3, 6, 9 …, in the negative for h = 2, 5, 8 … and in the
 * positive for h = 1, 4, 7 …
 *
 * @param positive sequence L1, L2, L3
 * @param negative sequence L1, L3, L2
 * @param zero the part alike in all three lines
 */
public record SymmetricalComponents(Spectrum positive, Spectrum negative, Spectrum zero) {
  private static final Phasor A = Phasor.polar(1, 120);
  private static final Phasor A2 = Phasor.polar(1, 240);
  private static final Phasor ONE = new Phasor(1, 0);

  /** The components of L1, L2, L3, or of L1-L2, L2-L3, L3-L1. */
  public static SymmetricalComponents of(List<Spectrum> lines) {
    if (lines.size() != 3) {
      throw new IllegalArgumentException("three lines are needed, given " + lines.size());
    }
    return new SymmetricalComponents(
        mix(lines, A, A2).times(1.0 / 3),
        mix(lines, A2, A).times(1.0 / 3),
        mix(lines, ONE, ONE).times(1.0 / 3));
  }

  /** The three lines again. */
  public List<Spectrum> lines() {
    List<Spectrum> sequences = List.of(zero, positive, negative);
    return List.of(mix(sequences, ONE, ONE), mix(sequences, A2, A), mix(sequences, A, A2));
  }

  /** |negative|/|positive| at the fundamental, percent. */
  public Figure negativePercent() {
    return percentOfPositive(negative);
  }

  /** |zero|/|positive| at the fundamental, percent. */
  public Figure zeroPercent() {
    return percentOfPositive(zero);
  }

  private Figure percentOfPositive(Spectrum part) {
    double reference = positive.magnitude(1);
    return reference > 0
        ? Figure.of(100 * part.magnitude(1) / reference)
        : Figure.unknown("no positive-sequence fundamental");
  }

  /** L1-L2, L2-L3, L3-L1 of three line-to-neutral voltages. */
  public static List<Spectrum> differences(List<Spectrum> lineToNeutral) {
    Spectrum l1 = lineToNeutral.get(0);
    Spectrum l2 = lineToNeutral.get(1);
    Spectrum l3 = lineToNeutral.get(2);
    return List.of(l1.minus(l2), l2.minus(l3), l3.minus(l1));
  }

  private static Spectrum mix(List<Spectrum> three, Phasor second, Phasor third) {
    return Spectrum.of(
        h ->
            three
                .get(0)
                .at(h)
                .plus(three.get(1).at(h).times(second))
                .plus(three.get(2).at(h).times(third)));
  }
}
