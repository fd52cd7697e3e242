package fourthwire.testsupport;

import fourthwire.quantity.Dft;
import fourthwire.quantity.Phasor;
import fourthwire.quantity.Spectrum;

/**
 * Samples over whole cycles, transformed, as tests look at them.
 *
 * @param spectrum orders 1 to 50, zero above what the sampling resolves
 * @param rms with the direct component
 */
public record Transform(double direct, Spectrum spectrum, double rms) {
  /** Of an even number of samples. */
  public static Transform of(double[] samples, int cycles) {
    double[] re = new double[samples.length / 2];
    double[] im = new double[samples.length / 2];
    new Dft(samples.length).transform(samples.clone(), re, im);
    double square = 0;
    for (double x : samples) {
      square += x * x;
    }
    return new Transform(
        re[0],
        Spectrum.of(
            h -> h * cycles < re.length ? new Phasor(re[h * cycles], im[h * cycles]) : Phasor.ZERO),
        Math.sqrt(square / samples.length));
  }
}
