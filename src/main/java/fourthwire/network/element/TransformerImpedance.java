package fourthwire.network.element;

import fourthwire.quantity.Phasor;

/**
 * The short-circuit impedance of a transformer, seen from its secondary.
 *
 * <p>From the rating plate: R<sub>pu</sub> = load loss / rated power and X<sub>pu</sub> = √(Z² -
 * R²) on the base secondary voltage² / rated power (IEC 60076-1:2011, from memory). Over the order
 * the reactance is in proportion, and the resistance rises with the winding eddy loss, R(h) = R·(1
 * + p·h²)/(1 + p): the tested load loss is I²R plus the eddy loss p·I²R at the fundamental, and
 * eddy loss goes with h² (IEEE C57.110-2018, P<sub>EC-R</sub>, from memory). Other stray loss is
 * counted as I²R.
 *
 * @param resistanceOhm per phase at the fundamental, as tested, eddy loss included
 * @param reactanceOhm per phase at the fundamental
 * @param eddyFraction p, winding eddy loss per unit of rated I²R
 * @param zeroSequenceRatio zero-sequence over positive-sequence impedance, seen from the secondary
 */
public record TransformerImpedance(
    double resistanceOhm, double reactanceOhm, double eddyFraction, double zeroSequenceRatio) {
  /** Refuses negative values and what is no number. */
  public TransformerImpedance {
    requireNotNegative(resistanceOhm, "resistance");
    requireNotNegative(reactanceOhm, "reactance");
    requireNotNegative(eddyFraction, "winding eddy loss");
    requireNotNegative(zeroSequenceRatio, "zero-sequence ratio");
  }

  /**
   * From rating-plate figures, zero sequence as positive sequence.
   *
   * @param ratedKva rated power
   * @param secondaryV rated secondary voltage, line to line (single-phase: over the whole winding)
   * @param impedancePercent short-circuit impedance
   * @param loadLossW load loss at rated current
   * @param eddyFraction p, winding eddy loss per unit of rated I²R
   */
  public static TransformerImpedance ofRating(
      double ratedKva,
      double secondaryV,
      double impedancePercent,
      double loadLossW,
      double eddyFraction) {
    double impedancePu = impedancePercent / 100;
    double resistancePu = loadLossW / (1000 * ratedKva);
    if (!(resistancePu <= impedancePu)) {
      throw new IllegalArgumentException(
          "a load loss of %s W is more than an impedance of %s %% on %s kVA allows"
              .formatted(loadLossW, impedancePercent, ratedKva));
    }
    double baseOhm = secondaryV * secondaryV / (1000 * ratedKva);
    double reactancePu = Math.sqrt((impedancePu - resistancePu) * (impedancePu + resistancePu));
    return new TransformerImpedance(resistancePu * baseOhm, reactancePu * baseOhm, eddyFraction, 1);
  }

  /** The load loss, in watts, of a transformer of this ratio of X to R. */
  public static double loadLossW(double ratedKva, double impedancePercent, double xOverR) {
    return 10 * ratedKva * impedancePercent / Math.hypot(1, xOverR);
  }

  /** This with the zero-sequence impedance being this many times the positive-sequence one. */
  public TransformerImpedance withZeroSequenceRatio(double ratio) {
    return new TransformerImpedance(resistanceOhm, reactanceOhm, eddyFraction, ratio);
  }

  /** Positive- and negative-sequence impedance at an order, ohms at the secondary. */
  public Phasor at(double order) {
    double resistance = resistanceOhm * (1 + eddyFraction * order * order) / (1 + eddyFraction);
    return new Phasor(resistance, reactanceOhm * order);
  }

  /** Zero-sequence impedance at an order, ohms at the secondary. */
  public Phasor zeroSequenceAt(double order) {
    return at(order).times(zeroSequenceRatio);
  }

  /**
   * The zero-sequence path that an earthed star primary with a delta secondary is for the side that
   * feeds it, on lines 0, 1 and 2 of the feeding node.
   *
   * @param ratio primary over secondary voltage, line to line
   * @param starPoint conductor of the feeding node the star point is tied to, or {@link
   *     Shunt#EARTH}
   */
  public Shunt primaryZeroSequencePath(double ratio, int starPoint) {
    return Shunt.threeLines(
        starPoint,
        SequenceAdmittance.zeroSequenceOnly(
            (order, siemens) -> {
              Phasor y = new Phasor(1, 0).over(zeroSequenceAt(order).times(ratio * ratio));
              siemens[0] = y.re();
              siemens[1] = y.im();
            }));
  }

  private static void requireNotNegative(double value, String what) {
    if (!(value >= 0) || Double.isInfinite(value)) {
      throw new IllegalArgumentException(
          "a transformer's " + what + " of " + value + ": it must be 0 or more");
    }
  }
}
