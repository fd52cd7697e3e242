package fourthwire.metering.capture.window;

/**
 * Reads a band-limited signal between its samples: a sinc of the middle of the transition band
 * under a window as narrow as {@value #ATTENUATION_DB} dB ask for, so that what is to be kept
 * passes within 1e-5 and what would fold onto it is as far down.
 *
 * <p>Length by J. F. Kaiser's design formula, 1974. The window is the exponential of a semicircle
 * (A. Barnett, J. Magland, L. af Klinteberg, SIAM J. Sci. Comput. 41, 2019): as good as Kaiser's,
 * and no Bessel function to compute.
 */
final class Resampler {
  private static final double ATTENUATION_DB = 100;
  private static final double SHAPE = 0.1102 * (ATTENUATION_DB - 8.7);

  /** Places read between two samples of the fastest kernel; between them the table is linear. */
  private static final int FINEST = 3000;

  private final int reach;
  private final double[][] table;

  private Resampler(int reach, double[][] table) {
    this.reach = reach;
    this.table = table;
  }

  /**
   * A resampler.
   *
   * @param pass highest frequency kept, cycles a sample
   * @param stop lowest frequency that would fold onto what is kept
   */
  static Resampler of(double pass, double stop) {
    double transition = 2 * Math.PI * (stop - pass);
    double taps = (ATTENUATION_DB - 8) / (2.285 * transition) + 1;
    int reach = (int) Math.ceil(taps / 2);
    double cutoff = (pass + stop) / 2;
    int places = (int) Math.max(16, Math.ceil(FINEST * cutoff));
    double[] half = new double[reach * places + 1];
    for (int i = 0; i < half.length; i++) {
      half[i] = kernel((double) i / places, cutoff, reach);
    }
    double[][] table = new double[places + 1][2 * reach];
    for (int p = 0; p <= places; p++) {
      for (int j = 0; j < 2 * reach; j++) {
        // Sample j stands at j - (reach - 1); the value is read at p/places.
        table[p][j] = half[Math.abs(p + (reach - 1 - j) * places)];
      }
      scaleToOne(table[p]);
    }
    return new Resampler(reach, table);
  }

  /** A constant is read exactly, and so all but exactly the fundamental. */
  private static void scaleToOne(double[] weights) {
    double sum = 0;
    for (double w : weights) {
      sum += w;
    }
    for (int j = 0; j < weights.length; j++) {
      weights[j] /= sum;
    }
  }

  private static double kernel(double t, double cutoff, int reach) {
    double x = t / reach;
    double angle = 2 * Math.PI * cutoff * t;
    double sinc = t == 0 ? 1 : Math.sin(angle) / angle;
    double window = Math.exp(SHAPE * (Math.sqrt(Math.max(0, 1 - x * x)) - 1));
    return x >= 1 ? 0 : 2 * cutoff * sinc * window;
  }

  /** Samples needed on each side of a place between two. */
  int reach() {
    return reach;
  }

  /**
   * Weights of the samples around a place.
   *
   * @param fraction how far it is from the sample at index reach - 1 to the next, 0 to 1
   * @param weights filled; one for each of 2·reach samples
   */
  void weights(double fraction, double[] weights) {
    double at = fraction * (table.length - 1);
    int row = (int) at;
    double share = at - row;
    double[] low = table[row];
    double[] high = table[Math.min(table.length - 1, row + 1)];
    for (int j = 0; j < weights.length; j++) {
      weights[j] = low[j] + share * (high[j] - low[j]);
    }
  }

  /** The value that these weights give from the sample at {@code from} on. */
  static double value(double[] x, int from, double[] weights) {
    double a = 0;
    double b = 0;
    for (int j = 0; j < weights.length; j += 2) {
      a += weights[j] * x[from + j];
      b += weights[j + 1] * x[from + j + 1];
    }
    return a + b;
  }
}
