package fourthwire.load.control;

import fourthwire.load.model.NoSteadyStateException;
import fourthwire.load.model.PortSpectra;
import fourthwire.quantity.Spectrum;
import java.util.Arrays;

/**
 * Steady state of a power-factor-corrected supply behind a series R-L, in the frequency domain.
 *
 * <p>With D the dead zone's map, i = G·(v - D·v) + residual and v = e - Z·i, so v = (1 + G·Z)⁻¹·(e
 * + G·Z·D·v - Z·residual). D is a projection and |G·Z/(1 + G·Z)| below 1 for every passive Z, so
 * that repetition converges; the crossings and G are renewed in each turn. Behind a soft source the
 * voltage may ring at its crossing so that no crossing is consistent with the current it causes;
 * then the fundamental's is taken, as a control's own filter does. Workspace of one thread.
 */
final class PfcSolver {
  private static final int ORDERS = Spectrum.HIGHEST_ORDER;

  /**
   * A control senses the crossing through a filter: what rings above this order does not move it
   * (common practice, no source).
   */
  private static final int HIGHEST_SENSED = 13;

  private static final double TOLERANCE = 1e-9;
  private static final int TURNS_ON_CROSSING = 100;

  /** What a hundred turns must leave of a move at most; slower than that it does not settle. */
  private static final double LEAST_PROGRESS = 0.2;

  private static final ThreadLocal<PfcSolver> OF_THREAD = ThreadLocal.withInitial(PfcSolver::new);

  private double powerW;
  private double frequencyHz;
  private double residual;
  private DeadZone zone = new DeadZone(0);

  private final double[] vRe = new double[ORDERS + 1];
  private final double[] vIm = new double[ORDERS + 1];
  private final double[] turnedRe = new double[ORDERS + 1];
  private final double[] turnedIm = new double[ORDERS + 1];
  private final double[] insideRe = new double[ORDERS + 1];
  private final double[] insideIm = new double[ORDERS + 1];
  private final double[] zoneRe = new double[ORDERS + 1];
  private final double[] zoneIm = new double[ORDERS + 1];

  private int step;
  private boolean lockedToFundamental;

  /** Mean over the cycle of the voltage inside the dead zones, volts. */
  private double insideMean;

  private double residualRe;
  private double residualIm;

  private PfcSolver() {}

  /** The thread's, for this supply. */
  static PfcSolver of(double powerW, double frequencyHz, double residual, DeadZone zone) {
    PfcSolver solver = OF_THREAD.get();
    solver.powerW = powerW;
    solver.frequencyHz = frequencyHz;
    solver.residual = residual;
    solver.zone = zone;
    return solver;
  }

  /** As {@link fourthwire.load.model.LoadSolver#solve}. */
  void solve(PortSpectra emf, double seriesOhm, double seriesHenry, PortSpectra current) {
    double[] eRe = emf.re[0];
    double[] eIm = emf.im[0];
    double strength = Math.hypot(eRe[1], eIm[1]);
    if (!(strength > 0) || Double.isInfinite(strength)) {
      throw new NoSteadyStateException(
          "a power-factor-corrected supply has no voltage to draw from");
    }
    step = oddOnly(eRe, eIm) ? 2 : 1;
    System.arraycopy(eRe, 0, vRe, 0, ORDERS + 1);
    System.arraycopy(eIm, 0, vIm, 0, ORDERS + 1);
    settle(eRe, eIm, strength, seriesOhm, 2 * Math.PI * frequencyHz * seriesHenry);
    double g = conductance();
    for (int h = 1; h <= ORDERS; h++) {
      current.re[0][h] = g * (vRe[h] - insideRe[h]);
      current.im[0][h] = g * (vIm[h] - insideIm[h]);
    }
    current.direct[0] = -g * insideMean;
    current.re[0][3] += g * residualRe;
    current.im[0][3] += g * residualIm;
  }

  /** Repeats until the voltage stands; every hundred turns must have brought it much nearer. */
  private void settle(double[] eRe, double[] eIm, double volts, double ohm, double reactance) {
    double moved = Double.POSITIVE_INFINITY;
    double before = Double.POSITIVE_INFINITY;
    for (int turn = 0; !(moved <= TOLERANCE * volts); turn++) {
      lockedToFundamental = turn >= TURNS_ON_CROSSING;
      double g = conductance();
      if (!(g > 0) || !(Math.hypot(vRe[1], vIm[1]) > 0.2 * volts)) {
        throw none("the source cannot give what the load asks for", volts, ohm, reactance)
            .since(NoSteadyStateException.Why.TOO_MUCH);
      }
      moved = renew(eRe, eIm, g, ohm, reactance);
      if (turn > TURNS_ON_CROSSING && turn % TURNS_ON_CROSSING == 0) {
        if (!(moved < LEAST_PROGRESS * before)) {
          throw none(
              "the source is so soft that the instant from which it draws does not settle",
              volts,
              ohm,
              reactance);
        }
        before = moved;
      }
    }
  }

  private NoSteadyStateException none(String reason, double volts, double ohm, double reactance) {
    return NoSteadyStateException.of(
        "a power-factor-corrected supply of %s W has no steady state at %s V behind %s ohm"
            + " and %s mH: %s",
        powerW, volts, ohm, reactance / (2 * Math.PI * frequencyHz) * 1e3, reason);
  }

  private static boolean oddOnly(double[] re, double[] im) {
    for (int h = 2; h <= ORDERS; h += 2) {
      if (re[h] != 0 || im[h] != 0) {
        return false;
      }
    }
    return true;
  }

  /** Renews the parts inside the dead zones and the residual, and finds G from the power. */
  private double conductance() {
    Arrays.fill(insideRe, 0);
    Arrays.fill(insideIm, 0);
    insideMean = 0;
    double first = -Math.atan2(vIm[1], vRe[1]);
    addZone(trigger(first));
    if (step == 1) {
      addZone(trigger(first + Math.PI));
    }
    residualOfThird();
    double power = vRe[3] * residualRe + vIm[3] * residualIm;
    for (int h = 1; h <= ORDERS; h += step) {
      power += vRe[h] * (vRe[h] - insideRe[h]) + vIm[h] * (vIm[h] - insideIm[h]);
    }
    return powerW / power;
  }

  private double trigger(double fundamentals) {
    return lockedToFundamental
        ? fundamentals
        : Crossing.near(vRe, vIm, fundamentals, HIGHEST_SENSED);
  }

  /** Per siemens of G: -residual·|V1|∠3θ, most negative near the crossings. */
  private void residualOfThird() {
    double size = vRe[1] * vRe[1] + vIm[1] * vIm[1];
    double re = vRe[1];
    double im = vIm[1];
    double squareRe = re * re - im * im;
    double squareIm = 2 * re * im;
    residualRe = -residual * (squareRe * re - squareIm * im) / size;
    residualIm = -residual * (squareRe * im + squareIm * re) / size;
  }

  private void addZone(double at) {
    double turnCos = Math.cos(at);
    double turnSin = Math.sin(at);
    double c = 1;
    double s = 0;
    for (int h = 1; h <= ORDERS; h++) {
      double next = c * turnCos - s * turnSin;
      s = s * turnCos + c * turnSin;
      c = next;
      turnedRe[h] = vRe[h] * c - vIm[h] * s;
      turnedIm[h] = vRe[h] * s + vIm[h] * c;
      zoneRe[h] = 0;
      zoneIm[h] = 0;
    }
    zone.add(turnedRe, turnedIm, step, step, zoneRe, zoneIm);
    insideMean += step == 1 ? zone.mean(turnedIm) : 0;
    c = 1;
    s = 0;
    for (int h = 1; h <= ORDERS; h++) {
      double next = c * turnCos - s * turnSin;
      s = s * turnCos + c * turnSin;
      c = next;
      insideRe[h] += zoneRe[h] * c + zoneIm[h] * s;
      insideIm[h] += zoneIm[h] * c - zoneRe[h] * s;
    }
  }

  /** One turn of the repetition; returns by how much the voltage moved. */
  private double renew(double[] eRe, double[] eIm, double g, double ohm, double reactance) {
    double moved = 0;
    for (int h = 1; h <= ORDERS; h += step) {
      double r = g * ohm;
      double x = g * h * reactance;
      double dRe = insideRe[h] - (h == 3 ? residualRe : 0);
      double dIm = insideIm[h] - (h == 3 ? residualIm : 0);
      double re = eRe[h] + r * dRe - x * dIm;
      double im = eIm[h] + r * dIm + x * dRe;
      double square = (1 + r) * (1 + r) + x * x;
      double nextRe = (re * (1 + r) + im * x) / square;
      double nextIm = (im * (1 + r) - re * x) / square;
      moved = Math.max(moved, Math.abs(nextRe - vRe[h]) + Math.abs(nextIm - vIm[h]));
      vRe[h] = nextRe;
      vIm[h] = nextIm;
    }
    return moved;
  }
}
