package fourthwire.quantity;

import org.jtransforms.fft.DoubleFFT_1D;

/**
 * The discrete Fourier transform of samples over a whole number of cycles, without a window: orders
 * fall on bins, nothing leaks (IEC 61000-4-7:2002+A1:2008, clause 4: a rectangular window locked to
 * the fundamental).
 *
 * @param direct mean of the samples: the direct component
 * @param spectrum rms phasors of orders 1 to 50, sine reference, t = 0 at the first sample; zero
 *     above {@code highestOrder}
 * @param rms total rms of the samples, with the direct component, interharmonics and all orders
 * @param highestOrder highest order that the sampling resolves, at most 50
 */
public record Dft(double direct, Spectrum spectrum, double rms, int highestOrder) {
  /**
   * Transforms samples.
   *
   * @param samples instantaneous values, equally spaced over exactly this many cycles (the sample
   *     after the last would repeat the first)
   * @param cycles whole cycles in the samples
   * @throws IllegalArgumentException where there are not more than two samples to a cycle
   */
  public static Dft of(double[] samples, int cycles) {
    int n = samples.length;
    if (cycles < 1 || n <= 2 * cycles) {
      throw new IllegalArgumentException(
          n + " samples over " + cycles + " cycles: more than two to a cycle are needed");
    }
    double[] bins = new double[2 * n];
    System.arraycopy(samples, 0, bins, 0, n);
    new DoubleFFT_1D(n).realForwardFull(bins);
    int highest = Math.min(Spectrum.HIGHEST_ORDER, (n - 1) / (2 * cycles));
    // Bin k holds Σ x·cos - j·Σ x·sin; an order √2·X·sin(hωt + φ) gives n/√2·X·(sin φ - j·cos φ).
    double scale = Math.sqrt(2) / n;
    Spectrum spectrum =
        Spectrum.of(
            h ->
                h > highest
                    ? Phasor.ZERO
                    : new Phasor(-scale * bins[2 * h * cycles + 1], scale * bins[2 * h * cycles]));
    return new Dft(bins[0] / n, spectrum, rms(samples), highest);
  }

  private static double rms(double[] samples) {
    double sum = 0;
    for (double x : samples) {
      sum += x * x;
    }
    return Math.sqrt(sum / samples.length);
  }
}
