package fourthwire.load.rectifier.path;

import fourthwire.load.model.NoSteadyStateException;
import java.util.Arrays;

/**
 * A current recorded at the nodes of a time-domain solution, piece by smooth piece, and its
 * harmonics by direct integration.
 *
 * <p>Inside a piece the current is a cubic Hermite polynomial between nodes, its slopes from
 * parabolas through neighbouring nodes, plus a parabola that makes its charge right; each interval
 * goes into the integrals of all orders at once ({@link FourierSum}). Workspace of one thread.
 */
public final class PulseTrace {
  private static final int MOST_NODES = 8192;

  /** An interval this much shorter than its neighbour tells nothing about slopes. */
  private static final double SHORT = 0.02;

  private static final double[] GAUSS_X = {
    0.5 - Math.sqrt(0.15), 0.5, 0.5 + Math.sqrt(0.15),
  };
  private static final double[] GAUSS_W = {5.0 / 18, 8.0 / 18, 5.0 / 18};

  private final FourierSum fourier = new FourierSum();

  private double[] position = new double[256];
  private double[] amps = new double[256];
  private boolean[] starts = new boolean[256];
  private double[] slope = new double[256];
  private double[] charge = new double[256];
  private double[] ampsGain = new double[256];
  private double[] chargeGain = new double[256];
  private int size;

  /** The polynomial of one interval: its origin, what a cell is to it, and its coefficients. */
  private double origin;

  private double perCell;
  private double c0;
  private double c1;
  private double c2;
  private double c3;

  public void clear() {
    size = 0;
  }

  /** Opens a smooth piece at its first node. */
  public void start(double position, double amps) {
    append(position, amps, true);
  }

  /**
   * Adds the next node of the piece.
   *
   * @param ampCells the charge since the node before: a stiff path's current is less sure than the
   *     capacitor's voltage, and the charge comes from that; NaN where it is not known
   */
  public void next(double position, double amps, double ampCells) {
    append(position, amps, false);
    charge[size - 1] = ampCells;
  }

  /**
   * Gives the derivatives of the last node's current and charge by the voltage at the start, for
   * {@link #shift}.
   */
  void gains(double ampsPerVolt, double ampCellsPerVolt) {
    ampsGain[size - 1] = ampsPerVolt;
    chargeGain[size - 1] = ampCellsPerVolt;
  }

  /** Takes the record to a voltage at the start that is a little higher, to first order. */
  public void shift(double volts) {
    for (int n = 0; n < size; n++) {
      amps[n] += ampsGain[n] * volts;
      charge[n] += chargeGain[n] * volts;
    }
  }

  private void append(double at, double value, boolean start) {
    if (size == position.length) {
      grow();
    }
    position[size] = at;
    amps[size] = value;
    starts[size] = start;
    ampsGain[size] = 0;
    chargeGain[size] = 0;
    size++;
  }

  private void grow() {
    if (size == MOST_NODES) {
      throw new NoSteadyStateException("the current switches too often to be followed");
    }
    position = Arrays.copyOf(position, 2 * size);
    amps = Arrays.copyOf(amps, 2 * size);
    starts = Arrays.copyOf(starts, 2 * size);
    slope = Arrays.copyOf(slope, 2 * size);
    charge = Arrays.copyOf(charge, 2 * size);
    ampsGain = Arrays.copyOf(ampsGain, 2 * size);
    chargeGain = Arrays.copyOf(chargeGain, 2 * size);
  }

  /**
   * Writes the rms phasors of the recorded current.
   *
   * @param halfWave the record is half a cycle whose mirror image follows: odd orders only
   */
  public void harmonics(boolean halfWave, double[] re, double[] im) {
    slopes();
    fourier.clear(halfWave);
    for (int n = 0; n + 1 < size; n++) {
      if (!starts[n + 1]) {
        fit(n);
        fourier.add(position[n], position[n + 1], origin, perCell, c0, c1, c2, c3);
      }
    }
    // (2/T)·∫ i·sin and cos give peak values; over √2 they are rms; a half record counts twice.
    fourier.write(Math.sqrt(2) / CycleTable.CELLS * (halfWave ? 2 : 1), re, im);
  }

  /** The polynomial of the interval between nodes n and n + 1. */
  private void fit(int n) {
    double width = position[n + 1] - position[n];
    double rise = amps[n + 1] - amps[n];
    double start = width * slope[n];
    double end = width * slope[n + 1];
    double mean = (amps[n] + amps[n + 1]) / 2 + (start - end) / 12;
    double bump = Double.isNaN(charge[n + 1]) ? 0 : 6 * (charge[n + 1] / width - mean);
    origin = position[n];
    perCell = 1 / width;
    c0 = amps[n];
    c1 = start + bump;
    c2 = 3 * rise - 2 * start - end - bump;
    c3 = start + end - 2 * rise;
  }

  private double inside(double at) {
    double x = (at - origin) * perCell;
    return c0 + x * (c1 + x * (c2 + x * c3));
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

  /** Direct component, amps: none where the halves mirror each other. */
  public double direct(boolean halfWave) {
    return halfWave ? 0 : mean(false, (position, amps) -> amps);
  }

  /** What is averaged over a cycle. */
  public interface Integrand {
    /** At a position in cells, where the current is so large. */
    double at(double position, double amps);
  }

  /** Mean over the cycle of a function that is zero where no current flows. */
  public double mean(boolean halfWave, Integrand f) {
    slopes();
    double sum = 0;
    for (int n = 0; n + 1 < size; n++) {
      double width = starts[n + 1] ? 0 : position[n + 1] - position[n];
      fit(n);
      for (int g = 0; g < 3 && width > 0; g++) {
        double at = position[n] + GAUSS_X[g] * width;
        sum += width * GAUSS_W[g] * f.at(at, inside(at));
      }
    }
    return sum / CycleTable.CELLS * (halfWave ? 2 : 1);
  }
}
