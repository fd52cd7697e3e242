package fourthwire.limits.equipment;

/**
 * One order of an equipment's current beside its limit.
 *
 * @param order 2 to 40
 * @param currentA rms amps
 * @param limitA rms amps
 * @param disregarded so small that the standard does not count it
 */
public record OrderLimit(int order, double currentA, double limitA, boolean disregarded) {
  /** Within the limit, or not counted. */
  public boolean met() {
    return disregarded || currentA <= limitA;
  }

  /** How far the limit is used, 1 at the limit; 0 where the order does not count. */
  public double ofLimit() {
    return disregarded ? 0 : currentA / limitA;
  }
}
