package fourthwire.load.rectifier.loop;

import fourthwire.load.model.PortSpectra;
import fourthwire.quantity.Spectrum;

/**
 * The spectra of the lines from what bridges on them recorded over a sixth, a half or a whole of
 * the cycle.
 */
final class LineSpectra {
  /** As many periods as there are in a cycle of a balanced voltage. */
  static final int SIXTHS = 6;

  private static final double ROOT3 = Math.sqrt(3);

  private LineSpectra() {}

  /**
   * Writes what the lines carry.
   *
   * @param periods how many times the record, with the lines exchanged, makes up the cycle
   */
  static void write(ThreeLineBridge bridge, int periods, PortSpectra current) {
    takeHarmonics(bridge, 0, periods, current);
    takeDirect(bridge, periods, current);
    if (bridge.lines() > 3) {
      takeHarmonics(bridge, 3, periods, bridge.second);
      addShifted(bridge.second.re, current.re);
      addShifted(bridge.second.im, current.im);
    }
  }

  /** Of the three lines of a bridge. */
  private static void takeHarmonics(
      ThreeLineBridge bridge, int first, int periods, PortSpectra to) {
    for (int k = 0; k < 2; k++) {
      bridge.trace[first + k].harmonics(periods > 1, to.re[k], to.im[k]);
    }
    for (int h = 1; h <= Spectrum.HIGHEST_ORDER; h++) {
      to.re[2][h] = -to.re[0][h] - to.re[1][h];
      to.im[2][h] = -to.im[0][h] - to.im[1][h];
      if (periods == SIXTHS) {
        addSixths(to, h);
      }
    }
  }

  /** Of one bridge on the lines themselves: windings between bridge and lines pass none on. */
  private static void takeDirect(ThreeLineBridge bridge, int periods, PortSpectra to) {
    for (int k = 0; k < 3; k++) {
      to.direct[k] = bridge.lines() > 3 ? 0 : bridge.trace[k].direct(periods > 1);
    }
  }

  /**
   * A half cycle from its first sixth: in the next each line carries the negative of what the line
   * after it did.
   */
  private static void addSixths(PortSpectra to, int h) {
    boolean positive = h % 6 == 1;
    if (!positive && h % 6 != 5) {
      clear(to, h);
      return;
    }
    // Σ over m of (-1)^m·F(k + m)·e^(-jhmπ/3): for h = 6n ± 1 the sequence component, three times.
    double half = positive ? ROOT3 / 2 : -ROOT3 / 2;
    double re = 0;
    double im = 0;
    for (int m = 0; m < 3; m++) {
      double cos = m == 0 ? 1 : -0.5;
      double sin = m == 0 ? 0 : m == 1 ? half : -half;
      re += to.re[m][h] * cos - to.im[m][h] * sin;
      im += to.re[m][h] * sin + to.im[m][h] * cos;
    }
    for (int k = 0; k < 3; k++) {
      double cos = k == 0 ? 1 : -0.5;
      double sin = k == 0 ? 0 : k == 1 ? -half : half;
      to.re[k][h] = re * cos - im * sin;
      to.im[k][h] = re * sin + im * cos;
    }
  }

  private static void clear(PortSpectra to, int h) {
    for (int k = 0; k < 3; k++) {
      to.re[k][h] = 0;
      to.im[k][h] = 0;
    }
  }

  /** What currents in the shifted windings take from the lines: each winding lies across two. */
  private static void addShifted(double[][] winding, double[][] line) {
    for (int k = 0; k < 3; k++) {
      for (int h = 1; h <= Spectrum.HIGHEST_ORDER; h++) {
        line[k][h] += (winding[k][h] - winding[(k + 2) % 3][h]) / ROOT3;
      }
    }
  }
}
