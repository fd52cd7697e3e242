package fourthwire.web.load;

import fourthwire.quantity.Spectrum;
import fourthwire.quantity.Waveform;

/**
 * What flows in one conductor.
 *
 * @param orders 1 to 50, rms amps
 * @param direct component besides, amps; 0 where the half-waves mirror each other
 */
record Flow(Spectrum orders, double direct) {
  private static final double WORTH_SAYING = 1e-4;

  Flow plus(Flow other) {
    return new Flow(orders.plus(other.orders), direct + other.direct);
  }

  /** The direct component included. */
  double rms() {
    return Math.hypot(orders.rms(), direct);
  }

  /** Whether there is a direct component to speak of. */
  boolean hasDirect() {
    return Math.abs(direct) > WORTH_SAYING * orders.rms();
  }

  /** As it flows, the direct component included. */
  Waveform wave(int samples) {
    return Waveform.of(orders, samples).raised(direct);
  }
}
