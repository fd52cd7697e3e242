package fourthwire.metering.capture;

import java.time.Instant;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * Instantaneous values of several channels at common instants, in volts and amps; a value that was
 * not recorded is NaN. Immutable.
 */
public final class Capture {
  private final Optional<Instant> start;
  private final OptionalDouble sampleRateHz;
  private final double[] timesS;
  private final List<Channel> channels;
  private final Map<String, double[]> samples;

  /**
   * A channel.
   *
   * @param name as the file has it
   * @param quantity what it holds: {@code L1.v}, {@code L1-L2.v}, {@code L1.i}, {@code N.i} …
   */
  public record Channel(String name, String quantity) {}

  /**
   * A capture.
   *
   * @param start clock time of the first sample, where the file has one
   * @param sampleRateHz empty where it changes on the way
   * @param timesS time of each sample after the first, seconds, rising
   * @param channels what is held, each quantity once
   * @param samples of each channel, in the same order, as many as times
   */
  public Capture(
      Optional<Instant> start,
      OptionalDouble sampleRateHz,
      double[] timesS,
      List<Channel> channels,
      List<double[]> samples) {
    this.start = start;
    this.sampleRateHz = sampleRateHz;
    this.timesS = timesS.clone();
    this.channels = List.copyOf(channels);
    this.samples = new LinkedHashMap<>();
    for (int k = 0; k < channels.size(); k++) {
      if (samples.get(k).length != timesS.length) {
        throw new IllegalArgumentException(
            "channel " + channels.get(k).name() + " has not one sample for each time");
      }
      if (this.samples.put(channels.get(k).quantity(), samples.get(k).clone()) != null) {
        throw new IllegalArgumentException(channels.get(k).quantity() + " is held by two channels");
      }
    }
  }

  /** Clock time of the first sample, where the file has one. */
  public Optional<Instant> start() {
    return start;
  }

  /** Samples a second; empty where the rate changes on the way. */
  public OptionalDouble sampleRateHz() {
    return sampleRateHz;
  }

  /** Samples per channel. */
  public int count() {
    return timesS.length;
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

  /** A copy of the samples of a quantity; empty where no channel holds it. */
  public Optional<double[]> find(String quantity) {
    return Optional.ofNullable(samples.get(quantity)).map(double[]::clone);
  }

  /** A copy of the times, seconds after the first sample. */
  public double[] timesS() {
    return timesS.clone();
  }

  /** The same capture with these quantities' signs turned. */
  public Capture turned(List<String> quantities) {
    List<double[]> turned = new ArrayList<>();
    for (Channel c : channels) {
      double[] x = samples.getOrDefault(c.quantity(), new double[0]).clone();
      if (quantities.contains(c.quantity())) {
        for (int k = 0; k < x.length; k++) {
          x[k] = -x[k];
        }
      }
      turned.add(x);
    }
    return new Capture(start, sampleRateHz, timesS, channels, turned);
  }
}
