package fourthwire.network.element;

import fourthwire.quantity.Phasor;

/**
 * A resistance and a reactance in series, each with its law over the order.
 *
 * @param resistanceOhm at the fundamental, 0 or more
 * @param reactanceOhm at the fundamental
 * @param resistanceLaw such as skin effect
 * @param reactanceLaw in proportion to the order unless told otherwise
 */
public record SeriesImpedance(
    double resistanceOhm, double reactanceOhm, OrderLaw resistanceLaw, OrderLaw reactanceLaw) {
  /** No impedance at all: the two ends are one point. */
  public static final SeriesImpedance NONE = of(0, 0);

  /** Refuses a negative resistance and what is no number. */
  public SeriesImpedance {
    if (!(resistanceOhm >= 0) || Double.isInfinite(resistanceOhm)) {
      throw new IllegalArgumentException(
          "a series resistance of " + resistanceOhm + " ohm: it must be 0 or more");
    }
    if (!Double.isFinite(reactanceOhm)) {
      throw new IllegalArgumentException("a series reactance of " + reactanceOhm + " ohm");
    }
  }

  /** A resistance that holds at every order and a reactance in proportion to it. */
  public static SeriesImpedance of(double resistanceOhm, double reactanceOhm) {
    return new SeriesImpedance(
        resistanceOhm, reactanceOhm, OrderLaw.CONSTANT, OrderLaw.PROPORTIONAL);
  }

  /** The impedance of this magnitude at the fundamental, split by its ratio of X to R. */
  public static SeriesImpedance ofMagnitude(double ohm, double xOverR) {
    double resistance = ohm / Math.hypot(1, xOverR);
    return of(resistance, resistance * xOverR);
  }

  /** This with another law for its resistance. */
  public SeriesImpedance withResistanceLaw(OrderLaw law) {
    return new SeriesImpedance(resistanceOhm, reactanceOhm, law, reactanceLaw);
  }

  /** Resistance and reactance multiplied by a factor, laws kept. */
  public SeriesImpedance times(double factor) {
    return new SeriesImpedance(
        resistanceOhm * factor, reactanceOhm * factor, resistanceLaw, reactanceLaw);
  }

  /** The complex impedance at an order, ohms. */
  public Phasor at(double order) {
    return new Phasor(
        resistanceOhm * resistanceLaw.factor(order), reactanceOhm * reactanceLaw.factor(order));
  }
}
