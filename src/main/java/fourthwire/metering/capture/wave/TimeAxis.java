package fourthwire.metering.capture.wave;

import java.util.OptionalDouble;

/**
 * The instants of a capture's samples, seconds after the first. Immutable.
 *
 * <p>Either even, at one rate, or each told, as where a recorder changes its rate on the way.
 */
public final class TimeAxis {
  private final int count;
  private final double stepS;
  private final double[] told;

  private TimeAxis(int count, double stepS, double[] told) {
    this.count = count;
    this.stepS = stepS;
    this.told = told;
  }

  /** So many samples at this rate. */
  public static TimeAxis even(double rateHz, int count) {
    return new TimeAxis(count, 1 / rateHz, new double[0]);
  }

  /**
   * Samples at these times.
   *
   * @param timesS after the first, rising, at least one
   */
  public static TimeAxis told(double[] timesS) {
    int n = timesS.length;
    return new TimeAxis(n, n < 2 ? 0 : timesS[n - 1] / (n - 1), timesS.clone());
  }

  /** How many samples there are. */
  public int count() {
    return count;
  }

  /** Whether all stand at one rate. */
  public boolean isEven() {
    return told.length == 0;
  }

  /** Samples a second; empty where the rate changes. */
  public OptionalDouble rateHz() {
    return isEven() ? OptionalDouble.of(1 / stepS) : OptionalDouble.empty();
  }

  /** Time of a sample, seconds. */
  public double at(int k) {
    return isEven() ? k * stepS : told[k];
  }

  /** Time that so many samples stand for, the last one's own step included, seconds. */
  public double spanS(int samples) {
    return isEven() ? samples * stepS : samples * told[samples - 1] / (samples - 1);
  }

  /** The longest step within the first so many samples, seconds. */
  public double longestStepS(int samples) {
    double longest = isEven() ? stepS : 0;
    for (int k = 1; k < samples && !isEven(); k++) {
      longest = Math.max(longest, told[k] - told[k - 1]);
    }
    return longest;
  }

  /** Times of the first so many samples. */
  public double[] first(int samples) {
    double[] t = new double[samples];
    for (int k = 0; k < samples; k++) {
      t[k] = at(k);
    }
    return t;
  }
}
