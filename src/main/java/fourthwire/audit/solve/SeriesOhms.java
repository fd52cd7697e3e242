package fourthwire.audit.solve;

/**
 * A resistance and an inductance in series before a load.
 *
 * @param ohm resistance, ohms
 * @param henry inductance, henries
 */
record SeriesOhms(double ohm, double henry) {
  static final SeriesOhms NONE = new SeriesOhms(0, 0);

  /** So much of it. */
  SeriesOhms times(double part) {
    return new SeriesOhms(part * ohm, part * henry);
  }

  /** What it has beyond another; where that is the larger, nothing. */
  SeriesOhms beyond(SeriesOhms other) {
    return new SeriesOhms(Math.max(0, ohm - other.ohm), Math.max(0, henry - other.henry));
  }

  /** Whether it is no smaller than another, in resistance and in inductance. */
  boolean isAtLeast(SeriesOhms other) {
    return ohm >= other.ohm && henry >= other.henry;
  }

  /** Adds what a load's current, from its place in a row, drops over it. */
  void addDrop(OrdersInPlay orders, double omega, double[] amps, int start, double[] volts) {
    for (int at = 0; at < volts.length; at += 2) {
      double re = amps[start + at];
      double im = amps[start + at + 1];
      double x = orders.at(at / 2 % orders.count()) * omega * henry;
      volts[at] += ohm * re - x * im;
      volts[at + 1] += ohm * im + x * re;
    }
  }
}
