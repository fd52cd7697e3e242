package fourthwire.intake.survey;

/**
 * The values a number may take.
 *
 * @param lowest the smallest value, itself allowed if {@code lowestAllowed}
 * @param highest the largest value, itself allowed
 */
record Range(double lowest, boolean lowestAllowed, double highest) {
  static final Range ANY = new Range(Double.NEGATIVE_INFINITY, false, Double.POSITIVE_INFINITY);
  static final Range ABOVE_ZERO = new Range(0, false, Double.POSITIVE_INFINITY);
  static final Range NOT_NEGATIVE = new Range(0, true, Double.POSITIVE_INFINITY);
  static final Range SHARE = new Range(0, true, 1);
  static final Range SHARE_ABOVE_ZERO = new Range(0, false, 1);
  static final Range PERCENT = new Range(0, true, 100);
  static final Range PERCENT_ABOVE_ZERO = new Range(0, false, 100);
  static final Range DEGREES = new Range(-360, true, 360);

  static Range of(double lowest, double highest) {
    return new Range(lowest, true, highest);
  }

  static Range from(double lowest) {
    return new Range(lowest, true, Double.POSITIVE_INFINITY);
  }

  double checked(double value) {
    if (value > highest || value < lowest || (value == lowest && !lowestAllowed)) {
      throw new IllegalArgumentException("The value must be " + words() + ".");
    }
    return value;
  }

  /** What is accepted, in words. */
  private String words() {
    String above = lowestAllowed ? "at least " : "above ";
    if (highest == Double.POSITIVE_INFINITY) {
      return above + Numbers.print(lowest);
    }
    return lowestAllowed
        ? Numbers.print(lowest) + " to " + Numbers.print(highest)
        : above + Numbers.print(lowest) + " and at most " + Numbers.print(highest);
  }
}
