package fourthwire.network.element;

/**
 * One conductor of a feeder: which conductor of the feeding node it is joined to, and what lies
 * between.
 *
 * @param parentConductor its number at the feeding node, counted from 0
 * @param impedance of the conductor itself, over its whole length
 */
public record FeederConductor(int parentConductor, SeriesImpedance impedance) {
  /** A conductor joined to this conductor of the feeding node. */
  public static FeederConductor from(int parentConductor, SeriesImpedance impedance) {
    return new FeederConductor(parentConductor, impedance);
  }
}
