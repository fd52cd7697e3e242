package fourthwire.metering.capture;

import fourthwire.metering.capture.wave.Samples;
import fourthwire.metering.capture.wave.TimeAxis;
import java.time.Instant;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Instantaneous values of several channels at common instants, in volts and amps; a value that was
 * not recorded is NaN. Immutable.
 */
public final class Capture {
  /** Samples of all channels that one capture may hold: 256 MB. */
  public static final long MOST_SAMPLES = 64_000_000;

  private final Optional<Instant> start;
  private final TimeAxis time;
  private final List<Channel> channels;
  private final Map<String, Samples> samples;

  /**
   * A channel.
   *
   * @param name as the file has it
   * @param quantity what it holds: {@code L1.v}, {@code L1-L2.v}, {@code L1.i}, {@code N.i} …
   * @param lateS time after the common instants at which it is sampled, seconds
   */
  public record Channel(String name, String quantity, double lateS) {
    /** Sampled at the common instants. */
    public Channel(String name, String quantity) {
      this(name, quantity, 0);
    }
  }

  /**
   * A capture.
   *
   * @param start clock time of the first sample, where the file has one
   * @param time when the samples stand
   * @param channels what is held, each quantity once
   * @param samples of each channel, in the same order, as many as times
   */
  public Capture(
      Optional<Instant> start, TimeAxis time, List<Channel> channels, List<Samples> samples) {
    this.start = start;
    this.time = time;
    this.channels = List.copyOf(channels);
    this.samples = new LinkedHashMap<>();
    for (int k = 0; k < channels.size(); k++) {
      if (samples.get(k).count() != time.count()) {
        throw new IllegalArgumentException(
            "channel " + channels.get(k).name() + " has not one sample for each time");
      }
      if (this.samples.put(channels.get(k).quantity(), samples.get(k)) != null) {
        throw new IllegalArgumentException(channels.get(k).quantity() + " is held by two channels");
      }
    }
  }

  /** Clock time of the first sample, where the file has one. */
  public Optional<Instant> start() {
    return start;
  }

  /** When the samples stand. */
  public TimeAxis time() {
    return time;
  }

  /** Samples per channel. */
  public int count() {
    return time.count();
  }

  /** The channels, in the file's order. */
  public List<Channel> channels() {
    return channels;
  }

  /** The file's name of the channel that holds this quantity. */
  public Optional<String> nameOf(String quantity) {
    return channels.stream()
        .filter(c -> c.quantity().equals(quantity))
        .map(Channel::name)
        .findFirst();
  }

  /** The samples of a quantity; empty where no channel holds it. */
  public Optional<Samples> find(String quantity) {
    return Optional.ofNullable(samples.get(quantity));
  }

  /** The samples of a channel of this capture. */
  public Samples of(Channel channel) {
    return find(channel.quantity()).orElseThrow();
  }

  /** The same capture with these quantities' signs turned. */
  public Capture turned(List<String> quantities) {
    return new Capture(
        start,
        time,
        channels,
        channels.stream()
            .map(c -> quantities.contains(c.quantity()) ? of(c).times(-1) : of(c))
            .toList());
  }
}
