package fourthwire.metering.capture.window;

import fourthwire.quantity.Dft;
import fourthwire.quantity.Spectrum;

/**
 * Takes windows one after the other: raw mean and mean square over exactly the window, then the
 * channels resampled to {@value #POINTS} points a window and transformed. Signals that are sums of
 * channels are added up sample by sample for the mean square, bin by bin for the spectrum. Not for
 * two threads at once.
 */
final class WindowPass {
  /** Points of a resampled window: order 50 of 12 cycles stands at bin 600, far below half. */
  static final int POINTS = 2048;

  private final WindowPlan plan;
  private final Dft transform = new Dft(POINTS);
  private final double[][] blocks;
  private final double[][] points;
  private final double[] weights;
  private final double[][] channelRe;
  private final double[][] channelIm;
  private final double[][] re;
  private final double[][] im;
  private double[] sum = new double[0];

  WindowPass(WindowPlan plan) {
    int channels = plan.band().channels();
    this.plan = plan;
    this.blocks = new double[channels][0];
    this.points = new double[channels][POINTS];
    this.weights = new double[2 * plan.resampler().reach()];
    this.channelRe = new double[channels][plan.bins()];
    this.channelIm = new double[channels][plan.bins()];
    this.re = new double[plan.signals().size()][plan.bins()];
    this.im = new double[plan.signals().size()][plan.bins()];
  }

  /** Adds the full window that begins with this cycle. */
  void addFull(int cycle, WindowSums into) {
    add(cycle, cycle, cycle + plan.cycles(), into);
    for (int s = 0; s < re.length; s++) {
      double[] squares = into.binSquare[s];
      for (int k = 1; k < squares.length; k++) {
        squares[k] += re[s][k] * re[s][k] + im[s][k] * im[s][k];
      }
    }
    into.fullWindows++;
  }

  /**
   * Adds the cycles that are left after the last full window: their mean squares, and the orders of
   * the full window that ends with them, for a shorter one would not tell orders from what lies
   * between.
   */
  void addRest(int cycle, WindowSums into) {
    add(plan.totalCycles() - plan.cycles(), cycle, plan.totalCycles(), into);
  }

  /** Orders of the full window from one cycle on, mean squares from another to the end. */
  private void add(int windowCycle, int cycle, int endCycle, WindowSums into) {
    double begin = plan.position(windowCycle);
    double from = plan.position(cycle);
    double to = plan.position(endCycle);
    int first = (int) Math.floor(begin) - weights.length / 2;
    int length = (int) Math.ceil(to) + weights.length / 2 + 2 - first;
    for (int c = 0; c < blocks.length; c++) {
      if (blocks[c].length < length) {
        blocks[c] = new double[length + length / 50];
      }
      plan.band().copy(c, first, length, blocks[c]);
    }
    int cycles = endCycle - cycle;
    for (int s = 0; s < re.length; s++) {
      moments(s, from - first, to - first, length, cycles, into);
    }
    transform(begin - first, to - begin);
    spectra(cycles, into);
    into.cycles += cycles;
    into.seconds += (to - from) / plan.rateHz();
  }

  private void transform(double from, double length) {
    resample(from, length);
    for (int c = 0; c < points.length; c++) {
      transform.transform(points[c], channelRe[c], channelIm[c]);
      turnBack(c, plan.lateSamples(c) / length);
    }
  }

  private void moments(
      int signal, double from, double to, int length, int cycles, WindowSums into) {
    Signal s = plan.signals().get(signal);
    double[] x = blocks[s.parts().get(0)];
    if (s.parts().size() > 1) {
      x = sum(s, length);
    }
    int low = (int) Math.ceil(from);
    int high = (int) Math.floor(to);
    double mean = 0;
    double square = 0;
    for (int k = low; k <= high; k++) {
      mean += x[k];
      square += x[k] * x[k];
    }
    double left = low - from;
    double right = to - high;
    mean += edge(x[low], x[low - 1], left) + edge(x[high], x[high + 1], right);
    square +=
        edge(x[low] * x[low], x[low - 1] * x[low - 1], left)
            + edge(x[high] * x[high], x[high + 1] * x[high + 1], right);
    into.direct[signal] += cycles * mean / (to - from);
    into.square[signal] += cycles * square / (to - from);
  }

  /**
   * What a trapezoid rule over the whole samples and a part of a step beyond has at this end more
   * than the plain sum: minus half the last value, plus the part of the step.
   */
  private static double edge(double last, double next, double part) {
    return -last / 2 + part * (last + part * (next - last) / 2);
  }

  private double[] sum(Signal s, int length) {
    if (sum.length < length) {
      sum = new double[length + length / 50];
    }
    java.util.Arrays.fill(sum, 0, length, 0);
    for (int p = 0; p < s.parts().size(); p++) {
      double factor = s.factors().get(p);
      double[] x = blocks[s.parts().get(p)];
      for (int k = 0; k < length; k++) {
        sum[k] += factor * x[k];
      }
    }
    return sum;
  }

  private void resample(double from, double length) {
    int reach = weights.length / 2;
    for (int n = 0; n < POINTS; n++) {
      double at = from + length * n / POINTS;
      int whole = (int) at;
      plan.resampler().weights(at - whole, weights);
      for (int c = 0; c < points.length; c++) {
        points[c][n] = Resampler.value(blocks[c], whole - reach + 1, weights);
      }
    }
  }

  /** A channel sampled late shows a later part of the wave: its angles are ahead by that much. */
  private void turnBack(int channel, double windows) {
    for (int k = 1; k < plan.bins() && windows != 0; k++) {
      double c = Math.cos(2 * Math.PI * k * windows);
      double s = Math.sin(2 * Math.PI * k * windows);
      double r = channelRe[channel][k];
      channelRe[channel][k] = r * c + channelIm[channel][k] * s;
      channelIm[channel][k] = channelIm[channel][k] * c - r * s;
    }
  }

  private void spectra(int cycles, WindowSums into) {
    for (int s = 0; s < re.length; s++) {
      bins(plan.signals().get(s), re[s], im[s]);
      orders(s, cycles, into);
    }
    for (int p = 0; p < plan.pairs().size(); p++) {
      WindowPlan.Pair pair = plan.pairs().get(p);
      double sum = 0;
      for (int k = 1; k < plan.bins(); k++) {
        sum += re[pair.first()][k] * re[pair.second()][k];
        sum += im[pair.first()][k] * im[pair.second()][k];
      }
      into.products[p] += cycles * sum;
    }
  }

  private void bins(Signal s, double[] intoRe, double[] intoIm) {
    for (int p = 0; p < s.parts().size(); p++) {
      double factor = s.factors().get(p);
      double[] r = channelRe[s.parts().get(p)];
      double[] i = channelIm[s.parts().get(p)];
      for (int k = 0; k < r.length; k++) {
        intoRe[k] = p == 0 ? factor * r[k] : intoRe[k] + factor * r[k];
        intoIm[k] = p == 0 ? factor * i[k] : intoIm[k] + factor * i[k];
      }
    }
  }

  private void orders(int signal, int cycles, WindowSums into) {
    for (int h = 1; h <= Math.min(plan.orders(), Spectrum.HIGHEST_ORDER); h++) {
      double r = re[signal][h * plan.cycles()];
      double i = im[signal][h * plan.cycles()];
      into.re[signal][h] += cycles * r;
      into.im[signal][h] += cycles * i;
      into.orderSquare[signal][h] += cycles * (r * r + i * i);
    }
  }
}
