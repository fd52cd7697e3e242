package fourthwire.metering.capture.fit;

import java.util.List;

/**
 * Where a fundamental stands, to a few hundredths of a hertz: the highest peak of the Hann-windowed
 * Fourier integral from {@value #LOWEST_HZ} to {@value #HIGHEST_HZ} Hz, whatever the site's nominal
 * frequency: a capture may come from elsewhere.
 */
public final class RoughFrequency {
  private static final int LOWEST_HZ = 40;
  private static final int HIGHEST_HZ = 72;

  /** Means of neighbouring samples, some so many to a cycle, are enough for the search. */
  private static final int PER_CYCLE = 40;

  private final double[] timesS;
  private final double[][] channels;
  private final double spanS;

  private RoughFrequency(double[] timesS, double[][] channels, double spanS) {
    this.timesS = timesS;
    this.channels = channels;
    this.spanS = spanS;
  }

  /**
   * Finds it.
   *
   * @param timesS times of the samples, seconds
   * @param channels of one unit, taken together; samples that are NaN are passed over
   */
  public static double hertz(double[] timesS, List<double[]> channels) {
    double span = timesS[timesS.length - 1] - timesS[0];
    int block = (int) Math.max(1, timesS.length / (span * HIGHEST_HZ * PER_CYCLE));
    double[][] means =
        channels.stream().map(x -> withoutMean(means(x, block))).toArray(double[][]::new);
    return new RoughFrequency(means(timesS, block), means, span).peak();
  }

  private static double[] means(double[] x, int block) {
    double[] means = new double[x.length / block];
    for (int k = 0; k < means.length; k++) {
      for (int j = 0; j < block; j++) {
        means[k] += x[k * block + j] / block;
      }
    }
    return means;
  }

  private static double[] withoutMean(double[] x) {
    double sum = 0;
    int there = 0;
    for (double value : x) {
      sum += Double.isNaN(value) ? 0 : value;
      there += Double.isNaN(value) ? 0 : 1;
    }
    double mean = there == 0 ? 0 : sum / there;
    for (int k = 0; k < x.length; k++) {
      x[k] = Double.isNaN(x[k]) ? 0 : x[k] - mean;
    }
    return x;
  }

  private double peak() {
    double step = Math.min(1, 0.4 / spanS);
    double best = LOWEST_HZ;
    double largest = -1;
    for (double f = LOWEST_HZ; f <= HIGHEST_HZ; f += step) {
      double energy = energy(f);
      if (energy > largest) {
        largest = energy;
        best = f;
      }
    }
    return summit(best, step);
  }

  /** The peak of a parabola through three points, twice, the second time closer. */
  private double summit(double at, double step) {
    double f = at;
    for (double width = step; width > step / 20; width /= 10) {
      double below = energy(f - width);
      double middle = energy(f);
      double above = energy(f + width);
      double bend = below - 2 * middle + above;
      f += bend < 0 ? Math.max(-1, Math.min(1, 0.5 * (below - above) / bend)) * width : 0;
    }
    return f;
  }

  private double energy(double f) {
    double[] re = new double[channels.length];
    double[] im = new double[channels.length];
    for (int k = 0; k < timesS.length; k++) {
      double t = timesS[k] - timesS[0];
      double w = 1 - Math.cos(2 * Math.PI * t / spanS);
      double c = w * Math.cos(2 * Math.PI * f * t);
      double s = w * Math.sin(2 * Math.PI * f * t);
      for (int j = 0; j < re.length; j++) {
        re[j] += channels[j][k] * c;
        im[j] += channels[j][k] * s;
      }
    }
    double energy = 0;
    for (int j = 0; j < re.length; j++) {
      energy += re[j] * re[j] + im[j] * im[j];
    }
    return energy;
  }
}
