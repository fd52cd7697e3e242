package fourthwire.load.rectifier.node;

import fourthwire.load.rectifier.path.CycleTable;

/**
 * One time step of all bridges of a node that conduct, by the method of {@code PathStep}, RODAS3,
 * with matrices in place of numbers; and how small departures go over it, by that of {@code
 * PathTangent}.
 */
final class NodeStep extends NodeCircuit {
  /** Over this many cells the currents' rates are taken where a bridge may join. */
  private static final double MOMENT = 1e-3;

  /** Of the tangent's method. */
  private static final double GAMMA = 1 - Math.sqrt(0.5);

  private static final double SECOND = (1 - GAMMA) / GAMMA;

  /** How many bridges conduct, which, and in which direction. */
  int n;

  final int[] bridge;
  final double[] sign;

  /** Signed currents and capacitors' voltages where a step starts, and where it has ended. */
  final double[] from;

  final double[] fromV;
  final double[] x;
  final double[] v;

  private final double[] factors;
  private final double[] drive;
  private final double[] change;
  private final double[] driveAfter;
  private final double[] f;
  private final double[] fv;
  private final double[] r;
  private final double[] rv;
  private final double[] k;
  private final double[] kv;
  private final double[] u;
  private final double[] uv;
  private final double[] c;
  private final double[] held;
  private double perStep;

  NodeStep(int bridges) {
    super(bridges);
    bridge = new int[all];
    sign = new double[all];
    from = new double[all];
    fromV = new double[all];
    x = new double[all];
    v = new double[all];
    factors = new double[all * all];
    drive = new double[all];
    change = new double[all];
    driveAfter = new double[all];
    f = new double[all];
    fv = new double[all];
    r = new double[all];
    rv = new double[all];
    k = new double[all];
    kv = new double[all];
    u = new double[all];
    uv = new double[all];
    c = new double[all];
    held = new double[all];
  }

  /** Another bridge conducts from here on. */
  void add(int which, double amps, double volts) {
    bridge[n] = which;
    sign[n] = Math.signum(amps);
    from[n] = amps;
    fromV[n] = volts;
    x[n] = amps;
    v[n] = volts;
    n++;
  }

  /** Steps from {@link #from} and {@link #fromV} at a position over h cells. */
  void step(CycleTable[] emf, double position, double h) {
    for (int a = 0; a < n; a++) {
      CycleTable source = emf[bridge[a]];
      drive[a] = source.at(position);
      change[a] = h * source.slopeAt(position);
      driveAfter[a] = source.at(position + h);
      x[a] = from[a];
      v[a] = fromV[a];
    }
    factor(2 / h, from, fromV, 2 / h);
    forces(drive);
    for (int a = 0; a < n; a++) {
      r[a] = f[a] + 0.5 * change[a];
      rv[a] = fv[a];
    }
    solve();
    System.arraycopy(u, 0, k, 0, n);
    System.arraycopy(uv, 0, kv, 0, n);
    for (int a = 0; a < n; a++) {
      r[a] = f[a] + 1.5 * change[a] + 4 / h * inductive(a, k);
      rv[a] = fv[a] + 4 / h * capacitance[bridge[a]] * kv[a];
      x[a] += 2 * k[a];
      v[a] += 2 * kv[a];
    }
    solve();
    for (int a = 0; a < n; a++) {
      k[a] -= u[a];
      kv[a] -= uv[a];
    }
    stage(h);
    for (int a = 0; a < n; a++) {
      k[a] -= (8.0 / 3) * u[a];
      kv[a] -= (8.0 / 3) * uv[a];
    }
    stage(h);
  }

  /** Third and fourth stage. */
  private void stage(double h) {
    forces(driveAfter);
    for (int a = 0; a < n; a++) {
      r[a] = f[a] + inductive(a, k) / h;
      rv[a] = fv[a] + capacitance[bridge[a]] / h * kv[a];
    }
    solve();
    for (int a = 0; a < n; a++) {
      x[a] += u[a];
      v[a] += uv[a];
    }
  }

  /** What drives the currents on at {@link #x} and {@link #v}, and what charges the capacitors. */
  private void forces(double[] drives) {
    for (int a = 0; a < n; a++) {
      double amps = sign[a] * x[a];
      double sum = drives[a] - sign[a] * (drop(bridge[a], amps) + v[a]);
      for (int b = 0; b < n; b++) {
        sum -= ohm[bridge[a] * all + bridge[b]] * x[b];
      }
      f[a] = sum;
      fv[a] = amps - power[bridge[a]] / v[a];
    }
  }

  private double inductive(int a, double[] rates) {
    return flux(bridge[a], rates);
  }

  /** A bridge's part in the inductances' flux for currents, or rates, of those that conduct. */
  double flux(int which, double[] amps) {
    double sum = 0;
    for (int b = 0; b < n; b++) {
      sum += henry[which * all + bridge[b]] * amps[b];
    }
    return sum;
  }

  /** Factors weight·L + R + diodes + 1/c by Cholesky's method without roots; c with it. */
  private void factor(double weight, double[] amps, double[] volts, double capacitive) {
    for (int a = 0; a < n; a++) {
      int ka = bridge[a];
      c[a] = capacitive * capacitance[ka] - power[ka] / (volts[a] * volts[a]);
      for (int b = 0; b <= a; b++) {
        int at = ka * all + bridge[b];
        double sum = weight * henry[at] + ohm[at];
        if (a == b) {
          sum += diodeOhm(ka, sign[a] * amps[a]) + 1 / c[a];
        }
        for (int m = 0; m < b; m++) {
          sum -= factors[a * all + m] * factors[b * all + m] * factors[m * all + m];
        }
        factors[a * all + b] = a == b ? sum : sum / factors[b * all + b];
      }
    }
  }

  /** Solves for {@link #u} and {@link #uv} from {@link #r} and {@link #rv}. */
  private void solve() {
    for (int a = 0; a < n; a++) {
      double sum = r[a] - sign[a] * rv[a] / c[a];
      for (int m = 0; m < a; m++) {
        sum -= factors[a * all + m] * u[m];
      }
      u[a] = sum;
    }
    for (int a = n - 1; a >= 0; a--) {
      double sum = u[a] / factors[a * all + a];
      for (int m = a + 1; m < n; m++) {
        sum -= factors[m * all + a] * u[m];
      }
      u[a] = sum;
      uv[a] = (rv[a] + sign[a] * sum) / c[a];
    }
  }

  /** Looks at the currents' rates at {@link #x} and {@link #v}, for {@link #drive(int, ...)}. */
  void rates(CycleTable[] emf, double position) {
    for (int a = 0; a < n; a++) {
      drive[a] = emf[bridge[a]].at(position);
    }
    factor(1 / MOMENT, x, v, Double.POSITIVE_INFINITY);
    forces(drive);
    for (int a = 0; a < n; a++) {
      r[a] = f[a];
      rv[a] = 0;
    }
    solve();
  }

  /** What is left of the source for an idle bridge, after {@link #rates}: volts, signed. */
  double left(int idle, CycleTable[] emf, double position) {
    double sum = emf[idle].at(position);
    for (int b = 0; b < n; b++) {
      int at = idle * all + bridge[b];
      sum -= ohm[at] * (x[b] + u[b]) + henry[at] / MOMENT * u[b];
    }
    return sum;
  }

  /** Charge of the last step from a capacitor's voltages, in amp-cells, signed. */
  double charge(int a, double h) {
    int which = bridge[a];
    return sign[a]
        * (capacitance[which] * (v[a] - fromV[a]) + 2 * power[which] * h / (v[a] + fromV[a]));
  }

  /** Makes ready for {@link #tangent} over the step just taken. */
  void prepareTangent(double h) {
    perStep = 1 / (GAMMA * h);
    for (int a = 0; a < n; a++) {
      k[a] = 0.5 * (from[a] + x[a]);
      kv[a] = 0.5 * (fromV[a] + v[a]);
    }
    factor(perStep, k, kv, perStep);
  }

  /**
   * Carries a small departure over it.
   *
   * @param flux by position among those that conduct: of the inductances
   * @param amps receives that of the currents
   * @param volts of the capacitors
   */
  void tangent(double[] flux, double[] amps, double[] volts) {
    implicit(flux, volts);
    for (int a = 0; a < n; a++) {
      flux[a] = (1 - SECOND) * flux[a] + SECOND * inductive(a, u);
      held[a] = (1 - SECOND) * volts[a] + SECOND * uv[a];
    }
    implicit(flux, held);
    for (int a = 0; a < n; a++) {
      amps[a] = u[a];
      volts[a] = uv[a];
      flux[a] = inductive(a, u);
    }
  }

  private void implicit(double[] flux, double[] volts) {
    for (int a = 0; a < n; a++) {
      r[a] = perStep * flux[a];
      rv[a] = perStep * capacitance[bridge[a]] * volts[a];
    }
    solve();
  }
}
