package fourthwire.load.rectifier.path;

/**
 * The exponential diode law of the rectifier models: v = n·25.86 mV·ln(1 + i/Is) + i·R.
 *
 * <p>Shockley's law with a series resistance. The defaults are those of the public contract,
 * section 3 (common practice, no source): 3e-11 A, n = 1.2, 1 mΩ.
 *
 * @param saturationA saturation current Is, amps
 * @param emission emission coefficient n
 * @param ohm series resistance R, ohms
 */
public record Diode(double saturationA, double emission, double ohm) {
  /** Thermal voltage kT/q at 27 °C, volts. */
  static final double THERMAL_V = 0.02586;

  /** n·kT/q, volts: the drop grows by this with each e-fold of current. */
  public double slopeV() {
    return emission * THERMAL_V;
  }

  /** Forward drop at a current of zero or more, volts. */
  public double drop(double amps) {
    return slopeV() * Math.log1p(amps / saturationA) + amps * ohm;
  }

  /** N of these side by side as one. */
  public Diode parallel(double units) {
    return new Diode(saturationA * units, emission, ohm / units);
  }
}
