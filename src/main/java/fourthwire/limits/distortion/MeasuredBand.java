package fourthwire.limits.distortion;

/**
 * What a standard allows of measured values over a day or a week.
 *
 * @param weekly true: the 10 min values of a week; false: the 3 s values of a day
 * @param percent of the period's values that must lie in the band, 100 for all
 * @param low least value, in the limit's unit
 * @param high largest value
 * @param basis document, edition, clause, and whether figures are from memory
 */
public record MeasuredBand(boolean weekly, double percent, double low, double high, String basis) {
  /** A limit from above alone. */
  static MeasuredBand upTo(boolean weekly, double percent, double high, String basis) {
    return new MeasuredBand(weekly, percent, Double.NEGATIVE_INFINITY, high, basis);
  }

  /** Whether it has a lower end too. */
  public boolean isTwoSided() {
    return low > Double.NEGATIVE_INFINITY;
  }
}
