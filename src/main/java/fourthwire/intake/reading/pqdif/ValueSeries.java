package fourthwire.intake.reading.pqdif;

import java.time.Instant;

/** The values of one channel of an observation, at their times. Immutable. */
public final class ValueSeries {
  private final Origin origin;
  private final double[] secondsS;
  private final double[] values;

  /**
   * Where values come from and what they are.
   *
   * @param observation its number in the file, from 1
   * @param observationName as written
   * @param start when the observation begins
   * @param channel name as written
   * @param phase which conductor
   * @param unit of the values
   * @param measures voltage, current or something else
   * @param kind what they are of it: rms, distortion …
   * @param isWaveform whether its channel holds waveforms; else it is a log of values
   * @param statistic what of an interval
   */
  public record Origin(
      int observation,
      String observationName,
      Instant start,
      String channel,
      Phase phase,
      SeriesUnit unit,
      Measures measures,
      Kind kind,
      boolean isWaveform,
      Statistic statistic) {}

  /** What a channel measures. */
  public enum Measures {
    VOLTAGE,
    CURRENT,
    OTHER
  }

  /** What values are of what is measured. */
  public enum Kind {
    INSTANTANEOUS,
    RMS,
    DISTORTION,
    ACTIVE_POWER,
    REACTIVE_POWER,
    APPARENT_POWER,
    POWER_FACTOR,
    DISPLACEMENT_FACTOR,
    FREQUENCY,
    ENERGY,
    /** What is not said. */
    UNSAID,
    /** An identifier that is not known here. */
    OTHER
  }

  /** What a value is of its interval. */
  public enum Statistic {
    MIN,
    MAX,
    MEAN,
    INSTANT
  }

  ValueSeries(Origin origin, double[] secondsS, double[] values) {
    this.origin = origin;
    this.secondsS = secondsS.clone();
    this.values = values.clone();
  }

  /** Where they come from. */
  public Origin origin() {
    return origin;
  }

  /** How many there are. */
  public int count() {
    return values.length;
  }

  /** A value, in its unit. */
  public double at(int k) {
    return values[k];
  }

  /** Its time after the observation's start, seconds. */
  public double secondsAt(int k) {
    return secondsS[k];
  }

  /** Whether another stands at the same times, in one observation or in several. */
  public boolean isBeside(ValueSeries other) {
    int last = values.length - 1;
    return origin.start().equals(other.origin.start())
        && values.length == other.values.length
        && Math.abs(secondsS[0] - other.secondsS[0]) < 1e-6
        && Math.abs(secondsS[last] - other.secondsS[last]) < 1e-6;
  }
}
