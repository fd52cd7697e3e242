package fourthwire.load.rectifier.loop;

/**
 * One time step of all loops of current that conduct in one bridge or in two on one capacitor.
 *
 * <p>The method is {@code PathStep}'s, RODAS3, with the circuit's matrices in place of numbers.
 */
final class LoopStep extends LoopCircuit {
  /** Over this many cells the currents' rates are taken where a line may join. */
  private static final double MOMENT = 1e-3;

  /** Of the tangent's method. */
  private static final double GAMMA = 1 - Math.sqrt(0.5);

  private static final double SECOND = (1 - GAMMA) / GAMMA;

  /** Their currents, amps: where a step starts, and where it has ended. */
  final double[] from = new double[MOST];

  final double[] x = new double[MOST];

  /** Capacitor's voltage after a step. */
  double v;

  private final double[] factors = new double[MOST * MOST];

  /** Drives at the start of a step, their change over it, and at its end. */
  private final double[] drive = new double[MOST];

  private final double[] change = new double[MOST];
  private final double[] driveAfter = new double[MOST];

  private final double[] f = new double[MOST];
  private final double[] r = new double[MOST];
  private final double[] k = new double[MOST];
  private final double[] u = new double[MOST];
  private double fv;
  private double uv;
  private double c;
  private double perStep;
  private double side;
  private double tii;
  private double tiv;
  private double tvi;
  private double tvv;

  /** As {@link Loop#Loop}. */
  LoopStep(int linesOfOne) {
    super(linesOfOne);
  }

  /** Takes note of another loop; {@link #couple} has to follow. */
  void add(int in, int out, int sign, double amps) {
    loop[n].set(in, out, sign);
    from[n] = amps;
    n++;
  }

  /** What drives each loop's current on: {@link #f}, and the capacitor's: {@link #fv}. */
  private void forces(double[] amps, double volts, double[] drives) {
    double sum = 0;
    for (int a = 0; a < n; a++) {
      double drop = drops(amps[a], shared(a, amps));
      for (int b = 0; b < n; b++) {
        drop += ohm[a * MOST + b] * amps[b];
      }
      f[a] = drives[a] - volts - drop;
      sum += amps[a];
    }
    fv = sum - power / volts;
  }

  /** Factors weight·M + R + diodes + 1/c by Cholesky's method without roots. */
  private void factor(double weight, double[] amps, double perC) {
    for (int a = 0; a < n; a++) {
      double common = conductance(shared(a, amps));
      for (int b = 0; b <= a; b++) {
        double sum = weight * henry[a * MOST + b] + ohm[a * MOST + b] + perC;
        if (loop[a].bridge == loop[b].bridge) {
          sum += a == b ? common + conductance(amps[a]) : common;
        }
        for (int m = 0; m < b; m++) {
          sum -= factors[a * MOST + m] * factors[b * MOST + m] * factors[m * MOST + m];
        }
        factors[a * MOST + b] = a == b ? sum : sum / factors[b * MOST + b];
      }
    }
  }

  /**
   * Makes ready for {@link #tangent} over the step just taken.
   *
   * @param volts of the capacitor in the middle of it
   */
  void prepareTangent(double h, double volts) {
    perStep = 1 / (GAMMA * h);
    side = capacitance * perStep;
    c = side - power / (volts * volts);
    for (int a = 0; a < n; a++) {
      k[a] = 0.5 * (from[a] + x[a]);
    }
    if (n == 1) {
      prepareLone();
    } else {
      factor(perStep, k, 1 / c);
    }
  }

  /** Of a single loop both stages come to one matrix. */
  private void prepareLone() {
    double l = henry[0] * perStep;
    double a = l + ohm[0] + 2 * conductance(k[0]);
    double det = 1 / (a * c + 1);
    double bii = c * l * det;
    double biv = -side * det;
    double bvi = l * det;
    double bvv = a * side * det;
    double kii = 1 - SECOND + SECOND * bii;
    double kvv = 1 - SECOND + SECOND * bvv;
    tii = kii * bii + SECOND * biv * bvi;
    tiv = kii * biv + SECOND * biv * bvv;
    tvi = SECOND * bvi * bii + kvv * bvi;
    tvv = SECOND * bvi * biv + kvv * bvv;
  }

  /** Carries small departures of the currents and of the voltage, which it returns, over it. */
  double tangent(double[] amps, double volts) {
    if (n == 1) {
      double i = amps[0];
      amps[0] = tii * i + tiv * volts;
      return tvi * i + tvv * volts;
    }
    for (int a = 0; a < n; a++) {
      r[a] = perStep * inductive(a, amps);
    }
    solve(side * volts);
    for (int a = 0; a < n; a++) {
      k[a] = (1 - SECOND) * amps[a] + SECOND * u[a];
    }
    double middle = (1 - SECOND) * volts + SECOND * uv;
    for (int a = 0; a < n; a++) {
      r[a] = perStep * inductive(a, k);
    }
    solve(side * middle);
    System.arraycopy(u, 0, amps, 0, n);
    return uv;
  }

  /** How fast a loop's current changes, amps per cell, after {@link #rates}. */
  double rate(int a) {
    return u[a] / MOMENT;
  }

  /** Solves for {@link #u} and {@link #uv} from {@link #r} and the capacitor's side. */
  private void solve(double rv) {
    for (int a = 0; a < n; a++) {
      double sum = r[a] - rv / c;
      for (int m = 0; m < a; m++) {
        sum -= factors[a * MOST + m] * u[m];
      }
      u[a] = sum;
    }
    double total = 0;
    for (int a = n - 1; a >= 0; a--) {
      double sum = u[a] / factors[a * MOST + a];
      for (int m = a + 1; m < n; m++) {
        sum -= factors[m * MOST + a] * u[m];
      }
      u[a] = sum;
      total += sum;
    }
    uv = (rv + total) / c;
  }

  /**
   * Charge of the last step for each amp of a line's currents at its ends together, in cells: from
   * the capacitor's voltage, which is surer than a stiff path's current. NaN where loops share the
   * charge in a way that their currents tell better.
   */
  double chargePerAmp(double h, double v0) {
    if (n > 1 && !resistive()) {
      return Double.NaN;
    }
    double sum = 0;
    for (int a = 0; a < n; a++) {
      sum += from[a] + x[a];
    }
    return (capacitance * (v - v0) + 2 * power * h / (v + v0)) / sum;
  }

  /** Steps from {@link #from} and a voltage at a position over h cells. */
  void step(ThreeLineEmf emf, double position, double h, double v0) {
    for (int a = 0; a < n; a++) {
      drive[a] = loop[a].drive(emf, position);
      change[a] = h * loop[a].driveSlope(emf, position);
      driveAfter[a] = loop[a].drive(emf, position + h);
    }
    c = 2 * capacitance / h - power / (v0 * v0);
    factor(2 / h, from, 1 / c);
    double ch = capacitance / h;
    forces(from, v0, drive);
    double fv0 = fv;
    for (int a = 0; a < n; a++) {
      r[a] = f[a] + 0.5 * change[a];
    }
    solve(fv0);
    System.arraycopy(u, 0, k, 0, n);
    double kv = uv;
    for (int a = 0; a < n; a++) {
      r[a] = f[a] + 1.5 * change[a] + 4 / h * inductive(a, k);
      x[a] = from[a] + 2 * k[a];
    }
    v = v0 + 2 * kv;
    solve(fv0 + 4 * ch * kv);
    kv -= uv;
    for (int a = 0; a < n; a++) {
      k[a] -= u[a];
    }
    kv = lastStage(h, ch, kv);
    for (int a = 0; a < n; a++) {
      k[a] -= (8.0 / 3) * u[a];
    }
    lastStage(h, ch, kv);
  }

  /** Third and fourth stage; returns the voltage's rate for the one that follows. */
  private double lastStage(double h, double ch, double kv) {
    forces(x, v, driveAfter);
    for (int a = 0; a < n; a++) {
      r[a] = f[a] + inductive(a, k) / h;
    }
    solve(fv + ch * kv);
    for (int a = 0; a < n; a++) {
      x[a] += u[a];
    }
    v += uv;
    return kv - (8.0 / 3) * uv;
  }

  /** Looks at the currents' rates where the last step ended, for {@link #margin}. */
  void rates(ThreeLineEmf emf, double position) {
    for (int a = 0; a < n; a++) {
      drive[a] = loop[a].drive(emf, position);
    }
    if (n == 1) {
      double amps = x[0];
      double force = drive[0] - v - ohm[0] * amps - drops(amps, amps);
      u[0] = force / (henry[0] / MOMENT + ohm[0] + 2 * conductance(amps));
      return;
    }
    factor(1 / MOMENT, x, 0);
    forces(x, v, drive);
    System.arraycopy(f, 0, r, 0, n);
    c = Double.POSITIVE_INFINITY;
    solve(0);
  }

  /**
   * How willingly an idle line would join, after {@link #rates}: by how much the voltage around its
   * loop exceeds the drops, the other loops' currents changing as they do.
   *
   * @param idle a loop through the idle line
   * @param carried what its other line carries already, amps
   * @param joiningDrop for that, {@link #joiningDrop}
   */
  double margin(Loop idle, ThreeLineEmf emf, double position, double carried, double joiningDrop) {
    double sum = idle.drive(emf, position) - v - joiningDrop;
    double common = carried > 0 ? conductance(Math.max(carried, threshold)) : 0;
    for (int a = 0; a < n; a++) {
      double r = mutualOhm(idle, loop[a]);
      double drop = r + mutualHenry(idle, loop[a]) / MOMENT;
      if (loop[a].bridge == idle.bridge) {
        drop += common;
      }
      sum -= r * x[a] + drop * u[a];
    }
    return sum;
  }
}
