package fourthwire.load;

import fourthwire.load.model.LoadModel;
import fourthwire.load.model.NoSteadyStateException;
import java.util.Locale;
import java.util.function.DoubleFunction;

/**
 * Finds the direct-current power at which one unit draws its rating from a stiff nominal sinusoidal
 * voltage.
 */
final class DesignPower {
  private static final int MOST_TRIES = 60;

  private final LoadRequest request;

  DesignPower(LoadRequest request) {
    this.request = request;
  }

  /**
   * The rated power in the model's own variable, watts.
   *
   * @param unit the model of one unit at a given rated power
   */
  double find(DoubleFunction<LoadModel> unit) {
    LoadRequest.Rating rating = request.rating();
    double target = Ratings.amount(rating);
    double portW =
        rating instanceof LoadRequest.Rating.Amps a ? Ratings.voltAmperes(request, a.a()) : target;
    double high = portW;
    double x = portW * (rating instanceof LoadRequest.Rating.Watts ? 0.97 : 0.6);
    double low = 0;
    for (int n = 0; n < MOST_TRIES; n++) {
      double drawn = drawn(unit, x);
      double error = drawn - target;
      if (Math.abs(error) < 1e-7 * target) {
        return x;
      }
      if (error > 0) {
        high = Math.min(high, x);
      } else {
        low = x;
      }
      double next = x * target / drawn;
      x = next > low && next < high ? next : 0.5 * (low + high);
    }
    throw new IllegalArgumentException(
        String.format(
            Locale.ROOT,
            "no equipment of kind %s draws its rating at %.4g V with these model columns: check"
                + " the rating and the source impedance",
            request.kind().word(),
            request.nominalPortV()));
  }

  /** What a unit draws, in the rating's own unit; infinite where it has no steady state. */
  private double drawn(DoubleFunction<LoadModel> unit, double powerW) {
    try {
      return NominalDraw.of(unit.apply(powerW), request).as(request.rating());
    } catch (NoSteadyStateException none) {
      return Double.POSITIVE_INFINITY;
    }
  }
}
