package fourthwire.intake.reading.comtrade;

import java.time.LocalDateTime;
import java.util.List;
import java.util.Optional;

/**
 * A configuration file.
 *
 * @param revision 1991, 1999 or 2013
 * @param channels analogue channels
 * @param digital number of status channels
 * @param lineHz line frequency, 0 where not stated
 * @param rates sample rates; empty where the data's own times rule
 * @param start time of the first sample, as written
 * @param utcOffset offset of the times from UTC (2013), as {@code +05:30}; empty if not written
 * @param format of the data; empty where not stated
 * @param timeMultiplier of the data's own times
 * @param nanoseconds whether times are written to the nanosecond, so the data's own count
 *     nanoseconds, not microseconds
 */
record Configuration(
    int revision,
    List<AnalogChannel> channels,
    int digital,
    double lineHz,
    List<Rate> rates,
    Optional<LocalDateTime> start,
    Optional<String> utcOffset,
    Optional<DataFormat> format,
    double timeMultiplier,
    boolean nanoseconds) {
  /**
   * A stretch sampled at one rate.
   *
   * @param hertz samples a second
   * @param lastSample number of its last sample, from 1
   */
  record Rate(double hertz, long lastSample) {}

  /** The same at one rate from outside. */
  Configuration at(double hertz) {
    return new Configuration(
        revision,
        channels,
        digital,
        lineHz,
        List.of(new Rate(hertz, Long.MAX_VALUE)),
        start,
        utcOffset,
        format,
        timeMultiplier,
        nanoseconds);
  }
}
