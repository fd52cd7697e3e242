package fourthwire.load;

import fourthwire.load.model.LoadModel;
import fourthwire.load.model.NoSteadyStateException;
import java.util.Locale;
import java.util.function.DoubleFunction;

/**
 * Finds the direct-current power at which one unit draws its rating from a stiff nominal sinusoidal
 * voltage. One search.
 *
 * <p>What a unit draws grows almost in proportion to its power, so the secant rule needs three or
 * four solutions. A power without a steady state bounds the search from above; it ends where that
 * bound meets the largest power with one, or the least that is worth a try.
 */
final class DesignPower {
  private static final double CLOSE = 1e-7;
  private static final int MOST_TRIES = 40;

  /** A power with a steady state and one without, this near to each other, end the search. */
  private static final double NARROW = 3e-3;

  /** The least share of the rating that is tried as direct-current power. */
  private static final double LEAST_SHARE = 0.02;

  private final LoadRequest request;
  private final double target;

  /** The largest power known to draw less, the least known to draw more or to have no state. */
  private double low;

  private double high;

  /** Why the upper bound has no steady state; empty where it has one. */
  private String obstacle = "";

  /** The power tried before, and what it drew. */
  private double before;

  private double beforeDrawn;

  DesignPower(LoadRequest request) {
    this.request = request;
    this.target = Ratings.amount(request.rating());
    this.high =
        request.rating() instanceof LoadRequest.Rating.Amps a
            ? Ratings.voltAmperes(request, a.a())
            : target;
  }

  /**
   * The rated power in the model's own variable, watts.
   *
   * @param unit the model of one unit at a given rated power
   * @throws IllegalArgumentException where no power draws the rating
   */
  double find(DoubleFunction<LoadModel> unit) {
    double least = LEAST_SHARE * high;
    double x = high * (request.rating() instanceof LoadRequest.Rating.Watts ? 0.97 : 0.6);
    for (int n = 0; n < MOST_TRIES && x > least && !hopeless(); n++) {
      double drawn = drawn(unit, x);
      if (Math.abs(drawn - target) < CLOSE * target) {
        return x;
      }
      x = next(x, drawn);
      if (isPinned()) {
        return x;
      }
    }
    throw new IllegalArgumentException(
        String.format(
            Locale.ROOT,
            "no equipment of kind %s draws its rating at %.4g V with these model columns: check"
                + " the rating and the source impedance%s",
            request.kind().word(),
            request.nominalPortV(),
            obstacle.isEmpty() ? "" : " (" + obstacle + ")"));
  }

  /** The rating lies in a jump of what is drawn, where a diode's pulse comes or goes. */
  private boolean isPinned() {
    return obstacle.isEmpty() && high - low < CLOSE * high;
  }

  private boolean hopeless() {
    return !obstacle.isEmpty() && high - low < NARROW * high;
  }

  /** What a unit draws, in the rating's own unit; infinite where it has no steady state. */
  private double drawn(DoubleFunction<LoadModel> unit, double powerW) {
    try {
      return NominalDraw.of(unit.apply(powerW), request).as(request.rating());
    } catch (NoSteadyStateException none) {
      obstacle = String.valueOf(none.getMessage());
      return Double.POSITIVE_INFINITY;
    }
  }

  private double next(double x, double drawn) {
    if (drawn > target) {
      high = Math.min(high, x);
    } else {
      low = Math.max(low, x);
    }
    double middle = 0.5 * (low + high);
    if (Double.isInfinite(drawn)) {
      return middle;
    }
    obstacle = drawn > target ? "" : obstacle;
    double next = x + (target - drawn) * (x - before) / (drawn - beforeDrawn);
    before = x;
    beforeDrawn = drawn;
    return next > low && next < high ? next : middle;
  }
}
