package fourthwire.load.rectifier;

import fourthwire.load.model.NoSteadyStateException;
import fourthwire.quantity.Spectrum;

/**
 * A current recorded at the nodes of a time-domain solution, piece by smooth piece, and its
 * harmonics by direct integration.
 *
 * <p>Inside a piece the current is a cubic Hermite polynomial between nodes, its slopes from
 * parabolas through neighbouring nodes, plus a parabola that makes its charge right; each interval
 * is integrated against e^(-jhωt) with the three-point Gauss-Legendre rule. Workspace of one
 * solver, not thread-safe.
 */
final class PulseTrace {
  private static final int CAPACITY = 8192;

  /** An interval this much shorter than its neighbour tells nothing about slopes. */
  private static final double SHORT = 0.02;

  private static final double[] GAUSS_X = {
    0.5 - Math.sqrt(0.15), 0.5, 0.5 + Math.sqrt(0.15),
  };
  private static final double[] GAUSS_W = {5.0 / 18, 8.0 / 18, 5.0 / 18};

  private final double[] position = new double[CAPACITY];
  private final double[] amps = new double[CAPACITY];
  private final boolean[] starts = new boolean[CAPACITY];
  private final double[] slope = new double[CAPACITY];
  private final double[] charge = new double[CAPACITY];
  private int size;

  void clear() {
    size = 0;
  }

  /** Opens a smooth piece at its first node. */
  void start(double position, double amps) {
    append(position, amps, true);
  }

  /**
   * Adds the next node of the piece.
   *
   * @param ampCells the charge since the node before: a stiff path's current is less sure than the
   *     capacitor's voltage, and the charge comes from that; NaN where it is not known
   */
  void next(double position, double amps, double ampCells) {
    append(position, amps, false);
    charge[size - 1] = ampCells;
  }

  private void append(double at, double value, boolean start) {
    if (size == CAPACITY) {
      throw new NoSteadyStateException("the current switches too often to be followed");
    }
    position[size] = at;
    amps[size] = value;
    starts[size] = start;
    size++;
  }

  /**
   * Writes the rms phasors of the recorded current.
   *
   * @param halfWave the record is half a cycle whose mirror image follows: odd orders only
   */
  void harmonics(boolean halfWave, double[] re, double[] im) {
    java.util.Arrays.fill(re, 0);
    java.util.Arrays.fill(im, 0);
    slopes();
    int step = halfWave ? 2 : 1;
    for (int n = 1; n < size; n++) {
      if (!starts[n]) {
        addInterval(n - 1, step, re, im);
      }
    }
    // (2/T)·∫ i·sin and cos give peak values; over √2 they are rms; a half record counts twice.
    double scale = Math.sqrt(2) / CycleTable.CELLS * (halfWave ? 2 : 1);
    for (int h = 1; h <= Spectrum.HIGHEST_ORDER; h += step) {
      re[h] *= scale;
      im[h] *= scale;
    }
  }

  private void addInterval(int n, int step, double[] re, double[] im) {
    double width = position[n + 1] - position[n];
    if (width <= 0) {
      return;
    }
    for (int g = 0; g < 3; g++) {
      double x = GAUSS_X[g];
      double current = inside(n, width, x);
      addPoint(position[n] + x * width, current * width * GAUSS_W[g], step, re, im);
    }
  }

  private double inside(int n, double width, double x) {
    double y = 1 - x;
    double cubic =
        y * y * ((1 + 2 * x) * amps[n] + x * width * slope[n])
            + x * x * ((1 + 2 * y) * amps[n + 1] - y * width * slope[n + 1]);
    if (Double.isNaN(charge[n + 1])) {
      return cubic;
    }
    double mean = (amps[n] + amps[n + 1]) / 2 + width * (slope[n] - slope[n + 1]) / 12;
    return cubic + 6 * x * y * (charge[n + 1] / width - mean);
  }

  private static void addPoint(double at, double weight, int step, double[] re, double[] im) {
    double angle = 2 * Math.PI / CycleTable.CELLS * at;
    double sin = Math.sin(angle);
    double cos = Math.cos(angle);
    double turnSin = step == 2 ? 2 * sin * cos : sin;
    double turnCos = step == 2 ? cos * cos - sin * sin : cos;
    double s = weight * sin;
    double c = weight * cos;
    for (int h = 1; h <= Spectrum.HIGHEST_ORDER; h += step) {
      re[h] += s;
      im[h] += c;
      double next = s * turnCos + c * turnSin;
      c = c * turnCos - s * turnSin;
      s = next;
    }
  }

  private void slopes() {
    int from = 0;
    while (from < size) {
      int to = from + 1;
      while (to < size && !starts[to]) {
        to++;
      }
      slopesOfPiece(from, to - 1);
      from = to;
    }
  }

  private void slopesOfPiece(int first, int last) {
    if (last == first) {
      slope[first] = 0;
      return;
    }
    if (last == first + 1) {
      double chord = (amps[last] - amps[first]) / (position[last] - position[first]);
      slope[first] = chord;
      slope[last] = chord;
      return;
    }
    for (int n = first + 1; n < last; n++) {
      double before = position[n] - position[n - 1];
      double after = position[n + 1] - position[n];
      double left = (amps[n] - amps[n - 1]) / before;
      double right = (amps[n + 1] - amps[n]) / after;
      if (before < SHORT * after) {
        slope[n] = right;
      } else if (after < SHORT * before) {
        slope[n] = left;
      } else {
        slope[n] = (left * after + right * before) / (before + after);
      }
    }
    slope[first] = 2 * chord(first) - slope[first + 1];
    slope[last] = 2 * chord(last - 1) - slope[last - 1];
  }

  private double chord(int n) {
    return (amps[n + 1] - amps[n]) / (position[n + 1] - position[n]);
  }

  /** What is averaged over a cycle. */
  interface Integrand {
    /** At a position in cells, where the current is so large. */
    double at(double position, double amps);
  }

  /** Mean over the cycle of a function that is zero where no current flows. */
  double mean(boolean halfWave, Integrand f) {
    slopes();
    double sum = 0;
    for (int n = 0; n + 1 < size; n++) {
      double width = starts[n + 1] ? 0 : position[n + 1] - position[n];
      for (int g = 0; g < 3 && width > 0; g++) {
        double x = GAUSS_X[g];
        sum += width * GAUSS_W[g] * f.at(position[n] + x * width, inside(n, width, x));
      }
    }
    return sum / CycleTable.CELLS * (halfWave ? 2 : 1);
  }
}
