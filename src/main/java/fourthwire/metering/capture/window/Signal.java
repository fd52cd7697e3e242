package fourthwire.metering.capture.window;

import fourthwire.metering.capture.wave.Samples;
import java.util.List;

/**
 * A quantity to be analysed: a channel's samples, or sample by sample a sum of other channels'.
 *
 * @param quantity its name
 * @param parts indices of the channels it is made of
 * @param factors of each of them
 */
public record Signal(String quantity, List<Integer> parts, List<Double> factors) {
  /** Copies the lists. */
  public Signal {
    parts = List.copyOf(parts);
    factors = List.copyOf(factors);
  }

  /**
   * The channels that signals are made of.
   *
   * @param quantity its name
   * @param samples evenly spaced, none missing
   * @param lateS time after the common instant at which it is sampled, seconds
   */
  public record Channel(String quantity, Samples samples, double lateS) {}

  /** A channel as it is. */
  static Signal of(String quantity, int index) {
    return new Signal(quantity, List.of(index), List.of(1.0));
  }
}
