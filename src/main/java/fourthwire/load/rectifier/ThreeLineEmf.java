package fourthwire.load.rectifier;

import fourthwire.load.model.PortSpectra;

/**
 * The electromotive forces of three lines over a cycle, without their common part, which drives
 * nothing. Workspace of one solver, not thread-safe.
 */
final class ThreeLineEmf {
  private static final double BALANCE = 1e-9;

  private final CycleTable[] line = {new CycleTable(), new CycleTable(), new CycleTable()};

  void fill(PortSpectra spectra) {
    for (int k = 0; k < 3; k++) {
      line[k].fill(spectra.re[k], spectra.im[k]);
    }
    for (int n = 0; n <= 2 * CycleTable.CELLS; n++) {
      double mean = (line[0].value[n] + line[1].value[n] + line[2].value[n]) / 3;
      double drift = (line[0].slope[n] + line[1].slope[n] + line[2].slope[n]) / 3;
      for (CycleTable t : line) {
        t.value[n] -= mean;
        t.slope[n] -= drift;
      }
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

  int highest(double position) {
    double a = at(0, position);
    double b = at(1, position);
    double c = at(2, position);
    return a >= b ? (a >= c ? 0 : 2) : (b >= c ? 1 : 2);
  }

  int lowest(double position) {
    double a = at(0, position);
    double b = at(1, position);
    double c = at(2, position);
    return a <= b ? (a <= c ? 0 : 2) : (b <= c ? 1 : 2);
  }

  /** Highest less lowest. */
  double spread(double position) {
    double a = at(0, position);
    double b = at(1, position);
    double c = at(2, position);
    return Math.max(a, Math.max(b, c)) - Math.min(a, Math.min(b, c));
  }

  /** Largest voltage between two lines at a sample. */
  double peak() {
    double peak = 0;
    for (int n = 0; n < CycleTable.CELLS; n++) {
      peak = Math.max(peak, spread(n));
    }
    return peak;
  }

  /** Whether line b repeats line a, and c repeats b, a third of a cycle later. */
  boolean balanced(double peak) {
    int third = CycleTable.CELLS / 3;
    for (int n = 0; n < CycleTable.CELLS; n++) {
      double a = line[0].value[n];
      if (Math.abs(line[1].value[n + third] - a) > BALANCE * peak
          || Math.abs(line[2].value[(n + 2 * third) % CycleTable.CELLS] - a) > BALANCE * peak) {
        return false;
      }
    }
    return true;
  }
}
