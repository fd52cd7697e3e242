package fourthwire.load.rectifier;

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
final class PathStep {
  /** Longest step as a share of √(LC). */
  private static final double STEP_OF_RING = 0.3;

  private static final int MOST_DIVISIONS = 4;

  /** Ohms: inductance over the length of a cell. */
  double inductance;

  /** Ohms in the path, the diodes' own included. */
  double resistance;

  /** Siemens: capacitance over the length of a cell. */
  double capacitance;

  /** Watts drawn from the capacitor. */
  double power;

  /** Volts by which both diodes' drop grows with each e-fold of current. */
  double slopeV;

  /** Amps of saturation. */
  double saturation;

  /** Amps under which a path counts as open; below it the drop is held. */
  double threshold;

  /** What a drive has to have over the capacitor's voltage for a current to start, volts. */
  double onsetV;

  /** Both diodes' logarithmic drop at the threshold, volts. */
  private double thresholdV;

  private int division;

  /** Places to step to in a cell, and the cells from one to the next. */
  private double perCell;

  private double stride;

  /** Result of the last step: amps. */
  double i;

  /** Result of the last step: capacitor volts. */
  double v;

  void set(double resistance, double inductance, BridgeLoad load, double cellSeconds) {
    this.resistance = resistance + 2 * load.diode().ohm();
    this.inductance = inductance / cellSeconds;
    this.capacitance = load.capacitanceF() / cellSeconds;
    this.power = load.powerW();
    this.slopeV = 2 * load.diode().slopeV();
    this.saturation = load.diode().saturationA();
    double ring = Math.sqrt(this.inductance * this.capacitance);
    this.division = (int) Math.min(MOST_DIVISIONS, Math.ceil(1 / (STEP_OF_RING * ring + 1e-9)));
    fine();
  }

  /** Steps as long as accuracy bears. */
  void fine() {
    perCell = division;
    stride = 1.0 / division;
  }

  /** Steps of two cells: good enough to come near a steady state. */
  void coarse() {
    perCell = 0.5;
    stride = 2;
  }

  /** The next place to step to: cells are divided where the path would ring within one. */
  double nextNode(double position) {
    return (Math.floor(position * perCell + 1e-9) + 1) * stride;
  }

  void threshold(double amps) {
    threshold = amps;
    thresholdV = slopeV * QuickLog.of(1 + amps / saturation);
    onsetV = thresholdV + resistance * amps;
  }

  private double drop(double amps) {
    return amps > threshold ? slopeV * QuickLog.of(1 + amps / saturation) : thresholdV;
  }

  /** Slope of both diodes' logarithmic drop, ohms. */
  double diodeOhm(double amps) {
    return amps >= threshold ? slopeV / (amps + saturation) : 0;
  }

  /** Steps from (i0, v0) over h cells while the drive goes from e0 (slope d0 per cell) to e1. */
  void step(double h, double i0, double v0, double e0, double d0, double e1) {
    double rate = 1 / h;
    double lh = inductance * rate;
    double ch = capacitance * rate;
    double drawn = power / v0;
    double a = 2 * lh + resistance + diodeOhm(i0);
    double d = 2 * ch - drawn / v0;
    double det = 1 / (a * d + 1);

    double f1 = e0 - v0 - resistance * i0 - drop(i0);
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
    r1 = e1 - yv - resistance * yi - drop(yi) + lh * (u1i - u2i);
    r2 = yi - power / yv + ch * (u1v - u2v);
    double u3i = (r1 * d - r2) * det;
    double u3v = (a * r2 + r1) * det;

    yi += u3i;
    yv += u3v;
    r1 = e1 - yv - resistance * yi - drop(yi) + lh * (u1i - u2i - (8.0 / 3) * u3i);
    r2 = yi - power / yv + ch * (u1v - u2v - (8.0 / 3) * u3v);
    i = yi + (r1 * d - r2) * det;
    v = yv + (a * r2 + r1) * det;
  }

  /** Charge of the last step from its voltages, in amp-cells: C·Δv and what the load took. */
  double charge(double h, double v0) {
    return capacitance * (v - v0) + 2 * power * h / (v + v0);
  }
}
