package fourthwire.intake.reading.comtrade;

/**
 * An analogue channel of a configuration file: value = a·x + b in the unit.
 *
 * @param name channel identifier
 * @param phase phase identifier, often empty
 * @param unit as written: {@code A}, {@code kV} …
 * @param a multiplier
 * @param b offset
 * @param skewS time the channel is sampled after the sample's time, seconds
 * @param highest end of the range of x
 * @param primary primary rating of its instrument transformer
 * @param secondary secondary rating
 * @param secondaryValues whether a·x + b is the secondary value (S), not the primary one (P)
 */
public record AnalogChannel(
    String name,
    String phase,
    String unit,
    double a,
    double b,
    double skewS,
    double highest,
    double primary,
    double secondary,
    boolean secondaryValues) {
  /** Factor from the values of a·x + b to primary ones; 1 where they are primary. */
  public double toPrimary() {
    return secondaryValues && primary > 0 && secondary > 0 ? primary / secondary : 1;
  }
}
