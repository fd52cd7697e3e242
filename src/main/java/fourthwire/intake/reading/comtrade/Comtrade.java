package fourthwire.intake.reading.comtrade;

import fourthwire.metering.capture.wave.Samples;
import fourthwire.metering.capture.wave.TimeAxis;
import java.time.LocalDateTime;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * A COMTRADE record: its channels and their samples, in the units the record states, primary or
 * secondary as it says.
 */
public final class Comtrade {
  private final Configuration configuration;
  private final TimeAxis time;
  private final List<Samples> samples;
  private final List<String> notes;

  Comtrade(Configuration configuration, TimeAxis time, List<Samples> samples, List<String> notes) {
    this.configuration = configuration;
    this.time = time;
    this.samples = List.copyOf(samples);
    this.notes = List.copyOf(notes);
  }

  /**
   * Reads a configuration and its data.
   *
   * @param rateHz samples a second where the record is known not to tell them
   * @throws ComtradeException where it can't be read
   */
  public static Comtrade of(byte[] configuration, byte[] data, OptionalDouble rateHz) {
    Configuration c = new ConfigurationReader(configuration).read();
    return new DataReader(rateHz.isPresent() ? c.at(rateHz.getAsDouble()) : c, data).read();
  }

  /** Whether a configuration leaves the sample rate to the data's own times. */
  public static boolean statesNoRate(byte[] configuration) {
    return new ConfigurationReader(configuration).read().rates().isEmpty();
  }

  /** The analogue channels of a configuration alone. */
  public static List<AnalogChannel> channels(byte[] configuration) {
    return new ConfigurationReader(configuration).read().channels();
  }

  /**
   * Reads a single file that holds all parts (CFF, revision 2013).
   *
   * @throws ComtradeException where it can't be read
   */
  public static Comtrade ofCombined(byte[] file, OptionalDouble rateHz) {
    CombinedFile parts = CombinedFile.of(file);
    return of(parts.configuration(), parts.data(), rateHz);
  }

  /** The configuration part of a single file that holds all parts. */
  public static byte[] configurationOf(byte[] combined) {
    return CombinedFile.of(combined).configuration();
  }

  /** The analogue channels, in order. */
  public List<AnalogChannel> channels() {
    return configuration.channels();
  }

  /** Samples of a channel, from 0, as a·x + b; NaN where the record marks them as missing. */
  public Samples samples(int channel) {
    return samples.get(channel);
  }

  /** When the samples stand. */
  public TimeAxis time() {
    return time;
  }

  /** Time of the first sample as written; local, or UTC with the offset. */
  public Optional<LocalDateTime> start() {
    return configuration.start();
  }

  /** Offset of the written times from UTC, as {@code +05:30}. */
  public Optional<String> utcOffset() {
    return configuration.utcOffset();
  }

  /** Line frequency the record states. */
  public OptionalDouble lineHz() {
    return configuration.lineHz() > 0
        ? OptionalDouble.of(configuration.lineHz())
        : OptionalDouble.empty();
  }

  /** How the record was read: what it left open, in sentences. */
  public List<String> notes() {
    return notes;
  }
}
