package fourthwire.audit;

import fourthwire.quantity.Figure;
import java.util.Map;

/**
 * A node through a week of hours, every load at its schedule's share, on the normal supply.
 *
 * @param solvedHours how many different hours were solved
 * @param basis how the week was made, one sentence
 * @param hoursOverLimit by the word of the check: in how many hours its figure passes its limit
 * @param series each headline figure that the node has, hour by hour
 * @param energy what the week takes and loses
 */
public record WeekState(
    int solvedHours,
    String basis,
    Map<String, Integer> hoursOverLimit,
    Map<HeadlineFigure, HourSeries> series,
    Energy energy) {

  /**
   * Energy of one week.
   *
   * @param activeKwh through the node
   * @param feederLossKwh lost in the feeder of the node (of a transformer: of its primary)
   * @param feederHarmonicLossKwh of that, what orders above the fundamental make
   * @param windingLossKwh lost in a transformer's windings; 0 at other nodes
   * @param windingHarmonicLossKwh of that, what orders above the fundamental make
   * @param pricePerKwh as surveyed
   * @param currency of the price; empty where not surveyed
   */
  public record Energy(
      double activeKwh,
      double feederLossKwh,
      double feederHarmonicLossKwh,
      double windingLossKwh,
      double windingHarmonicLossKwh,
      Figure pricePerKwh,
      String currency) {
    /** Feeder and windings. */
    public double lossKwh() {
      return feederLossKwh + windingLossKwh;
    }

    /** What of the loss orders above the fundamental make. */
    public double harmonicLossKwh() {
      return feederHarmonicLossKwh + windingHarmonicLossKwh;
    }

    /** Price of so much energy. */
    public Figure cost(double kwh) {
      return pricePerKwh.map(price -> price * kwh);
    }
  }
}
