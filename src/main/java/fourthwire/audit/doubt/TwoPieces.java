package fourthwire.audit.doubt;

import fourthwire.load.Spread;

/**
 * A figure whose median and percentiles 5 and 95 are known, as a function of a standard normal
 * deviate: log-normal below and above the median, each piece with its own width; where a percentile
 * is 0 or below, normal pieces, never below 0.
 */
final class TwoPieces {
  /** The deviate that one in twenty passes. */
  private static final double ONE_IN_TWENTY = NormalQuantile.of(0.95);

  private TwoPieces() {}

  /** The figure at a deviate. */
  static double at(Spread spread, double deviate) {
    double end = deviate < 0 ? spread.low() : spread.high();
    double part = Math.abs(deviate) / ONE_IN_TWENTY;
    if (spread.low() <= 0) {
      return Math.max(0, spread.typical() + part * (end - spread.typical()));
    }
    return spread.typical() * Math.pow(end / spread.typical(), part);
  }

  /** The figure on the median; 1 where the median is 0. */
  static double factor(Spread spread, double deviate) {
    return spread.typical() == 0 ? 1 : at(spread, deviate) / spread.typical();
  }
}
