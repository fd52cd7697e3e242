package fourthwire.limits.loading;

/**
 * What one part of the current's path carries without harm, before any harmonic factor.
 *
 * @param name what carries it, as a sentence names it: "feeder", "neutral bus"
 * @param ampacityA continuous current, amps, above 0
 * @param cable whether it is a cable or a conductor in a raceway, on which harmonic factors work; a
 *     bus is not
 */
public record ConductorRating(String name, double ampacityA, boolean cable) {
  /** Refuses a rating that carries nothing. */
  public ConductorRating {
    if (!(ampacityA > 0)) {
      throw new IllegalArgumentException(name + ": ampacity " + ampacityA + " A, must be above 0");
    }
  }

  double adjustedA(double factor) {
    return cable ? ampacityA * factor : ampacityA;
  }
}
