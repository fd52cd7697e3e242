package fourthwire.load.rectifier;

import fourthwire.load.model.LoadSolver;
import fourthwire.load.model.NoSteadyStateException;
import fourthwire.load.model.PortSpectra;

/**
 * Periodic steady state of the capacitor-input rectifier, by shooting.
 *
 * <p>The state at a section of the cycle is the capacitor's voltage, and the current where
 * conduction is continuous. The map over half a cycle (the whole one where the electromotive force
 * has even orders) is iterated to its fixed point by a safeguarded secant or Newton step, so that
 * slow transients need not die out.
 */
final class CapacitorInputSolver implements LoadSolver {
  private static final double TOLERANCE = 1e-8;

  /** A capacitor under this share of the crest is empty: no supply runs on it. */
  private static final double LEAST_SHARE = 0.05;

  private static final String FREEWHEELS =
      "the direct-current choke of a capacitor-input rectifier carries its current past the"
          + " voltage's crossing, which is not modelled: enter a smaller dc_choke_percent, or the"
          + " choke as line_choke_percent";

  private static final int MOST_SECANTS = 40;
  private static final int MOST_SUBSTITUTIONS = 600;

  private final BridgeLoad load;
  private final double frequencyHz;
  private final PairBridge bridge = new PairBridge();

  private double peak;
  private double section;
  private double cells;
  private double lastV;
  private double lastI;
  private double lastSlope = 0.3;

  CapacitorInputSolver(BridgeLoad load, double frequencyHz) {
    this.load = load;
    this.frequencyHz = frequencyHz;
  }

  @Override
  public void solve(PortSpectra emf, double seriesOhm, double seriesHenry, PortSpectra current) {
    prepare(emf, seriesOhm, seriesHenry);
    if (!secant() && !newton() && !substitution()) {
      lastV = 0;
      throw new NoSteadyStateException(refusal());
    }
    bridge.march(section, cells, lastI, lastV, true);
    if (bridge.freewheels) {
      lastV = 0;
      throw new NoSteadyStateException(FREEWHEELS);
    }
    bridge.trace.harmonics(bridge.emf.halfWave, current.re[0], current.im[0]);
  }

  private String refusal() {
    return String.format(
        java.util.Locale.ROOT,
        "a capacitor-input rectifier of %.4g W finds no steady state at %.4g V peak behind %.4g ohm"
            + " and %.4g mH: the source cannot give what the load asks for, or the current does not"
            + " repeat from cycle to cycle",
        load.powerW(),
        peak,
        bridge.path.resistance,
        bridge.path.inductance / (frequencyHz * CycleTable.CELLS) * 1e3);
  }

  private void prepare(PortSpectra emf, double seriesOhm, double seriesHenry) {
    CycleTable table = bridge.emf;
    table.fill(emf.re[0], emf.im[0]);
    peak = table.peak();
    if (!(peak > 0) || Double.isInfinite(peak)) {
      throw new NoSteadyStateException("a capacitor-input rectifier has no voltage to draw from");
    }
    bridge.floorV = LEAST_SHARE * peak;
    double cellSeconds = 1 / (frequencyHz * CycleTable.CELLS);
    double henry = load.lineHenry() + seriesHenry;
    bridge.path.set(
        load.lineOhm() + seriesOhm + load.dcOhm(), henry + load.dcHenry(), load, cellSeconds);
    bridge.directShare = load.dcHenry() > 0 ? load.dcHenry() / (henry + load.dcHenry()) : 0;
    bridge.path.threshold(1e-3 * load.powerW() / peak);
    cells = table.halfWave ? CycleTable.CELLS / 2.0 : CycleTable.CELLS;
    section = sectionAfterCrossing(emf.re[0][1], emf.im[0][1]);
  }

  /** The node 15° after the fundamental's upward zero crossing, usually without current. */
  private static double sectionAfterCrossing(double re, double im) {
    double turns = -Math.atan2(im, re) / (2 * Math.PI) + 15.0 / 360;
    return Math.floor((turns - Math.floor(turns)) * CycleTable.CELLS);
  }

  private double firstGuess() {
    if (lastV > 0 && lastV < peak) {
      return lastV;
    }
    double fall = 2 * load.powerW() / load.capacitanceF() * 0.25 / frequencyHz;
    double square = 0.92 * peak * peak - fall;
    return square > 0.2 * peak * peak ? Math.sqrt(square) : 0.7 * peak;
  }

  /** g(v) = map(v) - v with no current at the section; NaN where the capacitor empties. */
  private double defect(double v) {
    if (!bridge.march(section, cells, 0, v, false)) {
      return Double.NaN;
    }
    return bridge.v - v;
  }

  /** Discontinuous conduction: one unknown. False where current flows at the section. */
  private boolean secant() {
    double high = peak;
    double low = 0;
    double v = firstGuess();
    double previousV = 0;
    double previousG = 0;
    double slope = lastSlope - 1;
    for (int n = 0; n < MOST_SECANTS; n++) {
      double g = defect(v);
      if (Double.isNaN(g) || bridge.i != 0) {
        return false;
      }
      if (Math.abs(g) < TOLERANCE * peak) {
        lastV = v;
        lastI = 0;
        return true;
      }
      if (g > 0) {
        low = Math.max(low, v);
      } else {
        high = Math.min(high, v);
      }
      if (n > 0 && g != previousG) {
        slope = Math.min(-0.02, Math.max(-3, (g - previousG) / (v - previousV)));
      }
      previousV = v;
      previousG = g;
      double next = v - g / slope;
      if (next >= high || next <= low) {
        next = g > 0 ? 0.5 * (v + high) : low > 0 ? 0.5 * (v + low) : v + g;
      }
      v = next;
      lastSlope = slope + 1;
    }
    return false;
  }

  /** Continuous conduction: current and voltage at the section, by Newton with differences. */
  private boolean newton() {
    double i = 0;
    double v = peak * 0.95;
    double sign = bridge.emf.halfWave ? -1 : 1;
    for (int n = 0; n < 60; n++) {
      if (!bridge.march(section, cells, i, v, false)) {
        return false;
      }
      double endI = sign * bridge.i;
      double endV = bridge.v;
      double gi = endI - i;
      double gv = endV - v;
      double scale = Math.abs(i) + load.powerW() / peak;
      if (Math.abs(gi) < 1e-7 * scale && Math.abs(gv) < TOLERANCE * peak) {
        lastI = i;
        lastV = v;
        return true;
      }
      if (n < 6 || i == 0 || endI == 0) {
        i = endI;
        v = endV;
        continue;
      }
      double di = 1e-5 * i;
      double dv = 1e-6 * peak;
      if (!bridge.march(section, cells, i + di, v, false)) {
        return false;
      }
      double aii = (sign * bridge.i - endI) / di - 1;
      double avi = (bridge.v - endV) / di;
      if (!bridge.march(section, cells, i, v + dv, false)) {
        return false;
      }
      double aiv = (sign * bridge.i - endI) / dv;
      double avv = (bridge.v - endV) / dv - 1;
      double det = aii * avv - aiv * avi;
      double stepI = -(gi * avv - aiv * gv) / det;
      double stepV = -(aii * gv - avi * gi) / det;
      double shrink =
          Math.min(1, Math.min(0.3 * peak / Math.abs(stepV), 2 * Math.abs(i) / Math.abs(stepI)));
      i += shrink * stepI;
      v += shrink * stepV;
      if (!(v > 0)) {
        return false;
      }
    }
    return false;
  }

  /** Plain repetition from the crest: slow, but it reaches the stable state if there is one. */
  private boolean substitution() {
    double sign = bridge.emf.halfWave ? -1 : 1;
    double i = 0;
    double v = peak;
    for (int n = 0; n < MOST_SUBSTITUTIONS; n++) {
      if (!bridge.march(section, cells, i, v, false)) {
        return false;
      }
      double moved = Math.abs(bridge.v - v) / peak;
      double movedI = Math.abs(sign * bridge.i - i) * peak / load.powerW();
      i = sign * bridge.i;
      v = bridge.v;
      if (moved < TOLERANCE && movedI < 1e-6) {
        lastV = v;
        lastI = i;
        return true;
      }
    }
    return false;
  }

  /** The recorded current of the last solution: amps at positions in cells. */
  PulseTrace trace() {
    return bridge.trace;
  }
}
