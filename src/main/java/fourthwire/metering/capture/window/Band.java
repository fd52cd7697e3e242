package fourthwire.metering.capture.window;

import fourthwire.metering.capture.fit.HarmonicFit;
import fourthwire.metering.capture.wave.Samples;
import fourthwire.quantity.Phasor;
import java.util.List;

/**
 * Channels that go on for a little beyond both ends, as their outermost cycles do: the harmonics
 * fitted to these, and what the fit leaves, repeated. A window at the very end can then be
 * resampled like any other.
 */
final class Band {
  private static final int FITTED_CYCLES = 3;

  private final List<Samples> channels;
  private final int count;
  private final int beyond;
  private final double[][] before;
  private final double[][] after;

  /**
   * Of channels.
   *
   * @param beyond samples needed beyond each end
   * @param orders fitted to the outermost cycles
   */
  Band(List<Samples> channels, double samplesPerCycle, int beyond, int orders) {
    this.channels = channels;
    this.count = channels.get(0).count();
    this.beyond = beyond;
    int fitted = (int) Math.min(count, Math.ceil(FITTED_CYCLES * samplesPerCycle));
    this.before = ends(0, fitted, -beyond, samplesPerCycle, orders);
    this.after = ends(count - fitted, fitted, fitted, samplesPerCycle, orders);
  }

  private double[][] ends(
      int fitFrom, int fitted, int valuesFrom, double samplesPerCycle, int orders) {
    double[] times = new double[fitted];
    for (int k = 0; k < fitted; k++) {
      times[k] = k;
    }
    return channels.parallelStream()
        .map(
            channel -> {
              double[] x = new double[fitted];
              channel.copy(fitFrom, fitted, x, 0);
              HarmonicFit fit = HarmonicFit.of(times, x, fitted, 1 / samplesPerCycle, orders);
              return values(fit, valuesFrom, samplesPerCycle);
            })
        .toArray(double[][]::new);
  }

  private double[] values(HarmonicFit fit, int from, double samplesPerCycle) {
    double[] left = fit.residual();
    double[] values = new double[beyond];
    for (int k = 0; k < beyond; k++) {
      double sum = 0;
      for (int h = 1; h <= fit.orders(); h++) {
        Phasor p = fit.at(h);
        double angle = 2 * Math.PI * h * (from + k) / samplesPerCycle;
        sum += p.re() * Math.sin(angle) + p.im() * Math.cos(angle);
      }
      double rest = left[repeated(from + k, left.length, samplesPerCycle)];
      values[k] = fit.direct() + Math.sqrt(2) * sum + rest;
    }
    return values;
  }

  /** The sample nearest to whole cycles away, inside. */
  private static int repeated(int at, int length, double samplesPerCycle) {
    double inside = at;
    while (inside < 0) {
      inside += samplesPerCycle;
    }
    while (inside > length - 1) {
      inside -= samplesPerCycle;
    }
    return (int) Math.max(0, Math.round(inside));
  }

  /** How many channels there are. */
  int channels() {
    return channels.size();
  }

  /** Copies so many samples of a channel from this place on, which may lie beyond the ends. */
  void copy(int channel, int from, int length, double[] into) {
    int inside = Math.max(0, Math.min(count, from + length) - Math.max(0, from));
    int early = Math.min(length, Math.max(0, -from));
    if (early > 0) {
      System.arraycopy(before[channel], beyond + from, into, 0, early);
    }
    channels.get(channel).copy(Math.max(0, from), inside, into, early);
    int late = length - early - inside;
    if (late > 0) {
      System.arraycopy(after[channel], Math.max(0, from - count), into, early + inside, late);
    }
  }
}
