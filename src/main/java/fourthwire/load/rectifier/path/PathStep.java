package fourthwire.load.rectifier.path;

/**
 * One time step of a conducting path: source, R-L, two diodes, capacitor with a constant-power
 * load.
 *
 * <p>L·di/dt = e - R·i - 2·n·Vt·ln(1 + i/Is) - v, C·dv/dt = i - P/v, taken by the four-stage,
 * third-order, L-stable, stiffly accurate Rosenbrock method RODAS3 (Sandu, Verwer, Blom, Spee,
 * Carmichael, Potra: "Benchmarking stiff ODE solvers for atmospheric chemistry problems II",
 * Atmospheric Environment 31, 1997), which also holds for L = 0, where the first equation is
 * algebraic. Its stages need the electromotive force at both ends of a step only. Time is counted
 * in cells of {@link CycleTable}.
 */
public final class PathStep {
  /** A share by which a current may change for the series of its drop: left out are 1e-8 of nVt. */
  private static final double NEAR = 0.03;

  /** Ohms: inductance over the length of a cell. */
  public double inductance;

  /** Ohms in the path, the diodes' own included. */
  public double resistance;

  /** Siemens: capacitance over the length of a cell. */
  public double capacitance;

  /** Watts drawn from the capacitor. */
  double power;

  /** Volts by which both diodes' drop grows with each e-fold of current. */
  public double slopeV;

  /** Amps of saturation. */
  double saturation;

  private double perSaturation;

  /** Amps under which a path counts as open; below it the drop is held. */
  public double threshold;

  /** What a drive has to have over the capacitor's voltage for a current to start, volts. */
  double onsetV;

  /** Both diodes' logarithmic drop at the threshold, volts. */
  private double thresholdV;

  /** Cells in a radian of the swing between inductance and capacitor: √(LC). */
  double ring;

  /** Result of the last step: amps. */
  public double i;

  /** Result of the last step: capacitor volts. */
  public double v;

  /** A current whose drop is known: that of the last step's end, or of its start. */
  private double knownAmps = Double.NaN;

  private double knownDrop;

  /**
   * Takes a circuit.
   *
   * @param resistance of the path but for the diodes, ohms
   * @param inductance of the path, henries
   * @param cellSeconds length of a cell, seconds
   */
  public void set(double resistance, double inductance, BridgeLoad load, double cellSeconds) {
    this.resistance = resistance + 2 * load.diode().ohm();
    this.inductance = inductance / cellSeconds;
    this.capacitance = load.capacitanceF() / cellSeconds;
    this.power = load.powerW();
    this.slopeV = 2 * load.diode().slopeV();
    this.saturation = load.diode().saturationA();
    this.perSaturation = 1 / saturation;
    this.knownAmps = Double.NaN;
    ring = Math.sqrt(this.inductance * this.capacitance);
  }

  /** Takes the current under which the path counts as open, amps. */
  public void threshold(double amps) {
    threshold = amps;
    thresholdV = slopeV * Math.log(1 + amps / saturation);
    knownAmps = Double.NaN;
    onsetV = thresholdV + resistance * amps;
  }

  /** Volts that both diodes take but for their resistance; below the threshold as at it. */
  double drop(double amps) {
    return amps > threshold ? slopeV * QuickLog.of(1 + amps * perSaturation) : thresholdV;
  }

  /**
   * The drop near a current at which it is known: ln(1 + x) by its series where x is small, which
   * is there sooner than a logarithm.
   */
  double drop(double amps, double near, double dropThere) {
    double x = (amps - near) / (near + saturation);
    return amps > threshold && near > threshold && Math.abs(x) < NEAR
        ? dropThere + slopeV * (x - x * x * (0.5 - x * (1.0 / 3 - 0.25 * x)))
        : drop(amps);
  }

  /** Slope of both diodes' logarithmic drop, ohms. */
  double diodeOhm(double amps) {
    return amps >= threshold ? slopeV / (amps + saturation) : 0;
  }

  /** What is left of a drive for the inductance: L·di/dt, volts. */
  double push(double amps, double volts, double drive) {
    if (amps != knownAmps) {
      knownAmps = amps;
      knownDrop = drop(amps);
    }
    return drive - volts - resistance * amps - knownDrop;
  }

  /** Sets a step's result, with the drop of its current. */
  void end(double amps, double volts, double drop) {
    i = amps;
    v = volts;
    knownAmps = amps;
    knownDrop = drop;
  }

  /** Steps from (i0, v0) over h cells while the drive goes from e0 (slope d0 per cell) to e1. */
  public void step(double h, double i0, double v0, double e0, double d0, double e1) {
    double rate = 1 / h;
    double lh = inductance * rate;
    double ch = capacitance * rate;
    double perVolt = 1 / v0;
    double drawn = power * perVolt;
    double a = 2 * lh + resistance + diodeOhm(i0);
    double d = 2 * ch - drawn * perVolt;
    double det = 1 / (a * d + 1);

    double f1 = push(i0, v0, e0);
    double f2 = i0 - drawn;
    double hd = h * d0;
    double r1 = f1 + 0.5 * hd;
    double r2 = f2;
    double u1i = (r1 * d - r2) * det;
    double u1v = (a * r2 + r1) * det;

    r1 = f1 + 4 * lh * u1i + 1.5 * hd;
    r2 = f2 + 4 * ch * u1v;
    double u2i = (r1 * d - r2) * det;
    double u2v = (a * r2 + r1) * det;

    double yi = i0 + 2 * u1i;
    double yv = v0 + 2 * u1v;
    double drop3 = drop(yi);
    r1 = e1 - yv - resistance * yi - drop3 + lh * (u1i - u2i);
    r2 = yi - power / yv + ch * (u1v - u2v);
    double u3i = (r1 * d - r2) * det;
    double u3v = (a * r2 + r1) * det;

    double y3i = yi;
    yi += u3i;
    yv += u3v;
    double drop4 = drop(yi, y3i, drop3);
    r1 = e1 - yv - resistance * yi - drop4 + lh * (u1i - u2i - (8.0 / 3) * u3i);
    r2 = yi - power / yv + ch * (u1v - u2v - (8.0 / 3) * u3v);
    double u4i = (r1 * d - r2) * det;
    end(yi + u4i, yv + (a * r2 + r1) * det, drop(yi + u4i, yi, drop4));
  }

  /** Charge of the last step from its voltages, in amp-cells: C·Δv and what the load took. */
  double charge(double h, double v0) {
    return capacitance * (v - v0) + 2 * power * h / (v + v0);
  }
}
