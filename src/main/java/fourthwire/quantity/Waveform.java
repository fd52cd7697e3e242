package fourthwire.quantity;

import java.util.Arrays;

/**
 * One cycle of a current or voltage as equally spaced instantaneous values: amps or volts, as the
 * name of its holder says.
 */
public final class Waveform {
  private final double[] values;

  private Waveform(double[] values) {
    this.values = values;
  }

  /**
   * The cycle that a spectrum stands for: sample k is Σ √2·X_h·sin(2πhk/n + φ_h). Exact to
   * rounding: every sine is taken from one table of n values.
   *
   * @param count samples in the cycle; above 100 the highest order is still resolved
   */
  public static Waveform of(Spectrum spectrum, int count) {
    if (count < 1) {
      throw new IllegalArgumentException("a cycle needs samples, given " + count);
    }
    double[] sine = new double[count];
    double[] cosine = new double[count];
    for (int k = 0; k < count; k++) {
      double angle = 2 * Math.PI * k / count;
      sine[k] = Math.sqrt(2) * Math.sin(angle);
      cosine[k] = Math.sqrt(2) * Math.cos(angle);
    }
    double[] values = new double[count];
    for (int h = 1; h <= Spectrum.HIGHEST_ORDER; h++) {
      addOrder(values, spectrum.re(h), spectrum.im(h), h, sine, cosine);
    }
    return new Waveform(values);
  }

  /** X·sin(hωt + φ) = Re·sin(hωt) + Im·cos(hωt). */
  private static void addOrder(
      double[] values, double re, double im, int h, double[] sine, double[] cosine) {
    if (re == 0 && im == 0) {
      return;
    }
    int at = 0;
    int step = h % values.length;
    for (int k = 0; k < values.length; k++) {
      values[k] += re * sine[at] + im * cosine[at];
      at += step;
      at -= at >= values.length ? values.length : 0;
    }
  }

  /** Every sample raised by a direct component. */
  public Waveform raised(double direct) {
    return new Waveform(Arrays.stream(values).map(v -> v + direct).toArray());
  }

  /** Number of samples. */
  public int count() {
    return values.length;
  }

  /** Instantaneous value of sample k, from 0. */
  public double at(int k) {
    return values[k];
  }

  /** A copy of all samples. */
  public double[] toArray() {
    return values.clone();
  }

  /** Largest absolute sample. */
  public double peak() {
    double peak = 0;
    for (double v : values) {
      peak = Math.max(peak, Math.abs(v));
    }
    return peak;
  }

  /** Rms over the cycle. */
  public double rms() {
    double sum = 0;
    for (double v : values) {
      sum += v * v;
    }
    return Math.sqrt(sum / values.length);
  }

  /** Peak on rms; √2 for a sine. */
  public Figure crestFactor() {
    double rms = rms();
    return rms > 0 ? Figure.of(peak() / rms) : Figure.unknown("no current or voltage");
  }
}
