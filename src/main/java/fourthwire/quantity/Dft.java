package fourthwire.quantity;

import org.jtransforms.fft.DoubleFFT_1D;

/**
 * The discrete Fourier transform of samples over a whole number of cycles, without a window: orders
 * fall on bins, nothing leaks (IEC 61000-4-7:2002+A1:2008, clause 4: a rectangular window locked to
 * the fundamental). For one number of points; not for two threads at once.
 */
public final class Dft {
  private final int points;
  private final DoubleFFT_1D transform;

  /**
   * Of so many points.
   *
   * @param points even, at least 4
   */
  public Dft(int points) {
    if (points < 4 || points % 2 != 0) {
      throw new IllegalArgumentException(points + " points: an even number from 4 is needed");
    }
    this.points = points;
    this.transform = new DoubleFFT_1D(points);
  }

  /**
   * Transforms samples, equally spaced; the one after the last would repeat the first. Bin k is the
   * rms phasor of k periods in them, sine reference, t = 0 at the first; bin 0 is the direct
   * component.
   *
   * @param samples instantaneous values; overwritten
   * @param re takes the real parts of bins 0 to its length - 1, below half the points
   * @param im takes the imaginary parts
   */
  public void transform(double[] samples, double[] re, double[] im) {
    if (samples.length != points || re.length > points / 2 || im.length != re.length) {
      throw new IllegalArgumentException(
          samples.length + " samples and " + re.length + " bins for " + points + " points");
    }
    transform.realForward(samples);
    // The library has Σ x·cos - j·Σ x·sin; √2·X·sin(kωt + φ) gives n/√2·X·(sin φ - j·cos φ).
    double scale = Math.sqrt(2) / points;
    for (int k = 1; k < re.length; k++) {
      re[k] = -scale * samples[2 * k + 1];
      im[k] = scale * samples[2 * k];
    }
    re[0] = samples[0] / points;
    im[0] = 0;
  }
}
