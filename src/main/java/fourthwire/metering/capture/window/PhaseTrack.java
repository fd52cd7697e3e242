package fourthwire.metering.capture.window;

import fourthwire.metering.capture.wave.Samples;
import java.util.Arrays;
import java.util.List;

/**
 * How far the fundamental has run at every sample of an evenly sampled record: the clock of the
 * windows.
 *
 * <p>Followed from stretch to stretch of ten cycles, half overlapping, each weighted by a Hann
 * window: its side lobes leave the harmonics below 1e-5 of themselves. The advance of the angle
 * from one stretch to the next is summed over the channels by their energy, so that one line's dip
 * does not lose it. Between the stretches' middles it runs evenly.
 */
public final class PhaseTrack {
  private static final int STRETCH_CYCLES = 10;
  private static final double CLOSE = 1e-4;

  /** Below this share of the strongest two stretches' energy there is nothing to follow. */
  private static final double DEAD = 1e-4;

  private final double[] positions;
  private final double[] cycles;
  private final double share;

  private PhaseTrack(double[] positions, double[] cycles, double share) {
    this.positions = positions;
    this.cycles = cycles;
    this.share = share;
  }

  /** Of a fundamental that does not move. */
  public static PhaseTrack steady(double samplesPerCycle) {
    return new PhaseTrack(new double[] {0, samplesPerCycle}, new double[] {0, 1}, 1);
  }

  /**
   * Of these channels.
   *
   * @param channels of one unit, without missing samples, of at least twelve cycles
   * @param samplesPerCycle roughly, within 5 %
   */
  public static PhaseTrack of(List<Samples> channels, double samplesPerCycle) {
    PhaseTrack track = new Follower(channels, samplesPerCycle).track();
    double found = track.samplesPerCycle();
    return Math.abs(found / samplesPerCycle - 1) < CLOSE
        ? track
        : new Follower(channels, found).track();
  }

  /** Share of the channels' alternating energy that stands in the fundamental, 0 to 1. */
  public double share() {
    return share;
  }

  /** Mean over the whole record. */
  public double samplesPerCycle() {
    int last = positions.length - 1;
    return (positions[last] - positions[0]) / (cycles[last] - cycles[0]);
  }

  /** Cycles run through from sample 0 to this position. */
  public double cyclesAt(double position) {
    return between(positions, cycles, position);
  }

  /** Position, in samples, at which so many cycles have been run through. */
  public double positionAt(double cycle) {
    return between(cycles, positions, cycle);
  }

  /** Linear between the knots and beyond the outermost. */
  private static double between(double[] x, double[] y, double at) {
    int found = Arrays.binarySearch(x, at);
    int right = found >= 0 ? found : -found - 1;
    int k = Math.max(0, Math.min(x.length - 2, right - 1));
    return y[k] + (at - x[k]) * (y[k + 1] - y[k]) / (x[k + 1] - x[k]);
  }

  /** Follows the angle. */
  private static final class Follower {
    private final List<Samples> channels;
    private final double samplesPerCycle;
    private final double[] weightedCos;
    private final double[] weightedSin;
    private final double[] block;
    private double fundamental;
    private double all;

    Follower(List<Samples> channels, double samplesPerCycle) {
      this.channels = channels;
      this.samplesPerCycle = samplesPerCycle;
      int n = (int) Math.round(STRETCH_CYCLES * samplesPerCycle);
      this.weightedCos = new double[n];
      this.weightedSin = new double[n];
      this.block = new double[n];
      for (int k = 0; k < n; k++) {
        double w = 1 - Math.cos(2 * Math.PI * (k + 0.5) / n);
        double angle = 2 * Math.PI * (k - (n - 1) / 2.0) / samplesPerCycle;
        weightedCos[k] = w * Math.cos(angle);
        weightedSin[k] = w * Math.sin(angle);
      }
    }

    PhaseTrack track() {
      int n = block.length;
      int last = channels.get(0).count() - n;
      int steps = Math.max(1, (int) Math.ceil(last / (n / 2.0)));
      double[] positions = new double[steps + 1];
      double[][] products = new double[steps + 1][2];
      double[] before = new double[0];
      for (int m = 0; m <= steps; m++) {
        int start = (int) Math.round((double) m * last / steps);
        double[] phasors = phasors(start);
        positions[m] = start + (n - 1) / 2.0;
        products[m] = m == 0 ? new double[2] : product(before, phasors);
        before = phasors;
      }
      return new PhaseTrack(
          positions, cycles(positions, products), all > 0 ? fundamental / all : 0);
    }

    /** Cycles run through at each middle; across a stretch without a voltage it runs as told. */
    private double[] cycles(double[] positions, double[][] products) {
      double strongest = 0;
      for (double[] p : products) {
        strongest = Math.max(strongest, Math.hypot(p[0], p[1]));
      }
      double[] cycles = new double[positions.length];
      for (int m = 1; m < cycles.length; m++) {
        double[] p = products[m];
        double told = (positions[m] - positions[m - 1]) / samplesPerCycle;
        boolean dead = Math.hypot(p[0], p[1]) < DEAD * strongest;
        double found = Math.atan2(p[1], p[0]) / (2 * Math.PI);
        cycles[m] = cycles[m - 1] + told + (dead ? 0 : wrapped(found - told));
      }
      double first = positions[0] * (cycles[1] - cycles[0]) / (positions[1] - positions[0]);
      for (int m = 0; m < cycles.length; m++) {
        cycles[m] += first;
      }
      return cycles;
    }

    /** Re and Im of each channel, the angle at the stretch's middle. */
    private double[] phasors(int start) {
      double[] phasors = new double[2 * channels.size()];
      for (int c = 0; c < channels.size(); c++) {
        channels.get(c).copy(start, block.length, block, 0);
        double re = 0;
        double im = 0;
        double sum = 0;
        double square = 0;
        for (int k = 0; k < block.length; k++) {
          double x = block[k];
          re += x * weightedCos[k];
          im -= x * weightedSin[k];
          sum += x;
          square += x * x;
        }
        phasors[2 * c] = re;
        phasors[2 * c + 1] = im;
        double n = block.length;
        fundamental += 2 * (re * re + im * im) / (n * n);
        all += square / n - sum * sum / (n * n);
      }
      return phasors;
    }

    /** The sum of each channel's second phasor on its first: their advance, by their energy. */
    private static double[] product(double[] from, double[] to) {
      double re = 0;
      double im = 0;
      for (int c = 0; c < from.length; c += 2) {
        re += to[c] * from[c] + to[c + 1] * from[c + 1];
        im += to[c + 1] * from[c] - to[c] * from[c + 1];
      }
      return new double[] {re, im};
    }

    private static double wrapped(double cycles) {
      return cycles - Math.rint(cycles);
    }
  }
}
