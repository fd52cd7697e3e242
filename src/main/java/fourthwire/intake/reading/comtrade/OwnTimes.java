package fourthwire.intake.reading.comtrade;

import java.util.Arrays;

/** The times that stand in the data itself, in seconds; NaN where one is missing. */
final class OwnTimes {
  private static final double COUNTER = 4294967296.0;

  private final double tickS;
  private double[] ticks = new double[1024];
  private double wrapped;
  private int count;

  OwnTimes(Configuration c) {
    this.tickS =
        (c.nanoseconds() ? 1e-9 : 1e-6) * (c.timeMultiplier() > 0 ? c.timeMultiplier() : 1);
  }

  /** Adds a time as it stands, in units of the record; a counter that ran over goes on. */
  void add(double tick) {
    if (count == ticks.length) {
      ticks = Arrays.copyOf(ticks, 2 * count);
    }
    double before = count == 0 ? Double.NaN : ticks[count - 1];
    if (before - (tick + wrapped) > COUNTER / 2) {
      wrapped += COUNTER;
    }
    ticks[count++] = tick + wrapped;
  }

  /** One unit of the record, seconds. */
  double tickS() {
    return tickS;
  }

  /** Seconds from the first sample to this one. */
  double at(int k) {
    return (ticks[k] - ticks[0]) * tickS;
  }

  /** Whether every sample has one and they rise. */
  boolean rise() {
    for (int k = 1; k < count; k++) {
      if (!(ticks[k] > ticks[k - 1])) {
        return false;
      }
    }
    return count > 1;
  }
}
