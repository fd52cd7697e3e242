package fourthwire.audit.plan;

import fourthwire.network.element.SeriesImpedance;
import java.util.List;

/**
 * The impedance of a feeder over its whole length.
 *
 * @param line of each line, all parallel conductors together
 * @param neutral of the neutral likewise
 * @param assumptions what was taken for granted, in sentences
 */
public record FeederPath(SeriesImpedance line, SeriesImpedance neutral, List<String> assumptions) {
  /** No impedance: the two ends are one point. */
  public static final FeederPath NONE =
      new FeederPath(SeriesImpedance.NONE, SeriesImpedance.NONE, List.of());

  /**
   * A standby supply stands at the bus itself: the feeder that the survey tells of is not in use.
   */
  static final FeederPath NOT_IN_USE =
      new FeederPath(
          SeriesImpedance.NONE,
          SeriesImpedance.NONE,
          List.of("The standby supply stands at this bus: its own feeder is not in use."));

  /** This with another feeder's neutral. */
  public FeederPath withNeutralOf(FeederPath other) {
    return new FeederPath(line, other.neutral, assumptions);
  }

  /** Heat in its conductors, watts, from the squared amps of one order. */
  public double lossW(double order, double lineSquareA, double neutralSquareA) {
    return line.at(order).re() * lineSquareA + neutral.at(order).re() * neutralSquareA;
  }
}
