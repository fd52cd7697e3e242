package fourthwire.limits.distortion;

/**
 * What a standard allows of measured values over a day, a week or a year.
 *
 * @param values which it counts
 * @param percent of the period's values that must lie in the band, 100 for all
 * @param low least value, in the limit's unit
 * @param high largest value
 * @param basis document, edition, clause, and whether figures are from memory
 */
public record MeasuredBand(Values values, double percent, double low, double high, String basis) {
  /** Values that are counted, and over what. */
  public enum Values {
    /** 3 s values of a day. */
    OF_A_DAY("day", 3),
    /** 10 min values of a week. */
    OF_A_WEEK("week", 600),
    /** 10 s values of a year. */
    OF_A_YEAR("year", 10);

    private final String word;
    private final int seconds;

    Values(String word, int seconds) {
      this.word = word;
      this.seconds = seconds;
    }

    /** The period's word: day, week, year. */
    public String word() {
      return word;
    }

    /** Length of a value, seconds. */
    public int seconds() {
      return seconds;
    }
  }

  /** A limit from above alone. */
  static MeasuredBand upTo(Values values, double percent, double high, String basis) {
    return new MeasuredBand(values, percent, Double.NEGATIVE_INFINITY, high, basis);
  }

  /** Whether it has a lower end too. */
  public boolean isTwoSided() {
    return low > Double.NEGATIVE_INFINITY;
  }
}
