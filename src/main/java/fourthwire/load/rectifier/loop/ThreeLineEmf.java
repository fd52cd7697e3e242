package fourthwire.load.rectifier.loop;

import fourthwire.load.model.PortSpectra;
import fourthwire.load.rectifier.path.CycleTable;
import fourthwire.quantity.Spectrum;

/**
 * The electromotive forces of three lines over a cycle, without their common part, which drives
 * nothing, and those of windings 30° ahead: lines 3 to 5, each the difference of two lines over √3.
 * Workspace of one solver, not thread-safe.
 */
final class ThreeLineEmf {
  private static final double BALANCE = 1e-9;
  private static final double ROOT3 = Math.sqrt(3);
  private static final int THIRD = CycleTable.CELLS / 3;

  private final CycleTable[] line = new CycleTable[6];

  /** The phasors without zero sequence. */
  private final double[][] re = new double[3][Spectrum.HIGHEST_ORDER + 1];

  private final double[][] im = new double[3][Spectrum.HIGHEST_ORDER + 1];

  /** Whether line b repeats line a, and c repeats b, a third of a cycle later. */
  boolean balanced;

  ThreeLineEmf() {
    java.util.Arrays.setAll(line, k -> new CycleTable());
  }

  /** Samples three ports; for two bridges the shifted windings too. */
  void fill(PortSpectra spectra, int bridges) {
    takeZeroSequenceOut(spectra);
    balanced = repeats(1) && repeats(2);
    line[0].fill(re[0], im[0]);
    for (int k = 1; k < 3; k++) {
      if (balanced) {
        delay(line[k - 1], line[k]);
      } else {
        line[k].fill(re[k], im[k]);
      }
    }
    for (int k = 0; k < 3 * (bridges - 1); k++) {
      shift(line[k], line[(k + 1) % 3], line[3 + k]);
    }
  }

  /** Samples one port as line 0 against line 1, which stays at zero. */
  void fillPort(PortSpectra spectra) {
    line[0].fill(spectra.re[0], spectra.im[0]);
  }

  /** Whether half cycles of the port mirror each other. */
  boolean portHalfWave() {
    return line[0].halfWave;
  }

  private void takeZeroSequenceOut(PortSpectra s) {
    for (int h = 1; h <= Spectrum.HIGHEST_ORDER; h++) {
      double meanRe = (s.re[0][h] + s.re[1][h] + s.re[2][h]) / 3;
      double meanIm = (s.im[0][h] + s.im[1][h] + s.im[2][h]) / 3;
      for (int k = 0; k < 3; k++) {
        re[k][h] = less(s.re[k][h], meanRe);
        im[k][h] = less(s.im[k][h], meanIm);
      }
    }
  }

  /** The difference, zero where it is rounding only. */
  private static double less(double a, double b) {
    double difference = a - b;
    return Math.abs(difference) > 1e-14 * Math.abs(a) ? difference : 0;
  }

  /** Whether a line repeats the one before it a third of a cycle later. */
  private boolean repeats(int k) {
    double close = BALANCE * Math.hypot(re[0][1], im[0][1]);
    for (int h = 1; h <= Spectrum.HIGHEST_ORDER; h++) {
      double a = re[k - 1][h];
      double b = im[k - 1][h];
      double cos = h % 3 == 0 ? 1 : -0.5;
      double sin = h % 3 == 0 ? 0 : (h % 3 == 1 ? -0.5 : 0.5) * ROOT3;
      if (Math.abs(a * cos - b * sin - re[k][h]) > close
          || Math.abs(a * sin + b * cos - im[k][h]) > close) {
        return false;
      }
    }
    return true;
  }

  private static void delay(CycleTable a, CycleTable to) {
    delay(a.value, to.value);
    delay(a.slope, to.slope);
    to.halfWave = a.halfWave;
  }

  private static void delay(double[] a, double[] to) {
    System.arraycopy(a, 2 * THIRD, to, 0, 4 * THIRD);
    System.arraycopy(a, 3 * THIRD, to, 4 * THIRD, 2 * THIRD + 1);
  }

  private static void shift(CycleTable a, CycleTable b, CycleTable to) {
    for (int n = 0; n <= 2 * CycleTable.CELLS; n++) {
      to.value[n] = (a.value[n] - b.value[n]) / ROOT3;
      to.slope[n] = (a.slope[n] - b.slope[n]) / ROOT3;
    }
  }

  /** Whether half cycles mirror each other. */
  boolean halfWave() {
    return line[0].halfWave && line[1].halfWave && line[2].halfWave;
  }

  double at(int k, double position) {
    return line[k].at(position);
  }

  /** Of line k against line m. */
  double between(int k, int m, double position) {
    return line[k].at(position) - line[m].at(position);
  }

  /** Its slope per cell. */
  double slopeBetween(int k, int m, double position) {
    return line[k].slopeAt(position) - line[m].slopeAt(position);
  }

  /** The highest line of a bridge. */
  int highest(int bridge, double position) {
    int k = 3 * bridge;
    double a = at(k, position);
    double b = at(k + 1, position);
    double c = at(k + 2, position);
    return a >= b ? (a >= c ? k : k + 2) : (b >= c ? k + 1 : k + 2);
  }

  /** The lowest line of a bridge. */
  int lowest(int bridge, double position) {
    int k = 3 * bridge;
    double a = at(k, position);
    double b = at(k + 1, position);
    double c = at(k + 2, position);
    return a <= b ? (a <= c ? k : k + 2) : (b <= c ? k + 1 : k + 2);
  }

  /** Highest less lowest line of a bridge. */
  double spread(int bridge, double position) {
    int k = 3 * bridge;
    double a = at(k, position);
    double b = at(k + 1, position);
    double c = at(k + 2, position);
    return Math.max(a, Math.max(b, c)) - Math.min(a, Math.min(b, c));
  }

  /** Largest voltage between two lines of some bridge at a sample. */
  double peak(int bridges) {
    int samples = CycleTable.CELLS / (balanced ? 3 : 1) / (halfWave() ? 2 : 1);
    double peak = 0;
    for (int k = 0; k < 3 * bridges; k += 3) {
      double[] a = line[k].value;
      double[] b = line[k + 1].value;
      double[] c = line[k + 2].value;
      for (int n = 0; n < samples; n++) {
        double spread = Math.max(a[n], Math.max(b[n], c[n])) - Math.min(a[n], Math.min(b[n], c[n]));
        peak = Math.max(peak, spread);
      }
    }
    return peak;
  }
}
