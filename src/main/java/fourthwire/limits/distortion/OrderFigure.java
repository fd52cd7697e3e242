package fourthwire.limits.distortion;

/**
 * One order of one conductor beside its limit.
 *
 * @param line what carries it, {@code L1} or {@code L1-L2}
 * @param percent of the reference of the limit
 * @param limit percent likewise
 */
record OrderFigure(String line, int order, double percent, double limit) {
  /** How far the limit is used, 1 at the limit. */
  double ofLimit() {
    return percent / limit;
  }
}
