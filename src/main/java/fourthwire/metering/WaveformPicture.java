package fourthwire.metering;

import java.util.List;
import java.util.Map;

/**
 * A capture's waveforms as they are drawn: of each short stretch the lowest and the highest sample.
 *
 * @param stepS length of a stretch, seconds
 * @param channels by quantity, {@code L1.i}, {@code L1.v} …
 */
public record WaveformPicture(double stepS, Map<String, Trace> channels) {

  /** How long it is, seconds; to a stretch. */
  public double lengthS() {
    return stepS * channels.values().stream().mapToInt(t -> t.lowest().size()).max().orElse(0);
  }

  /**
   * One channel, as many values as stretches.
   *
   * @param lowest amps or volts
   * @param highest likewise
   */
  public record Trace(List<Double> lowest, List<Double> highest) {
    /** Copies the lists. */
    public Trace {
      lowest = List.copyOf(lowest);
      highest = List.copyOf(highest);
    }
  }
}
