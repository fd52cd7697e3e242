package fourthwire.load.rectifier;

/**
 * One time step while three lines of a six-pulse bridge conduct: two lines a and b on one side
 * share the direct current that returns in the third.
 *
 * <p>With x the two shared currents, L and R a line's, D and S the direct-current choke's: (2L + D)
 * x_a' + (L + D)·x_b' = ±(e_a - e_c) - (2R + S)·x_a - (R + S)·x_b - v_d(x_a) - v_d(x_a + x_b) - v,
 * the same for b, and C·v' = x_a + x_b - P/v. Method and units as in {@link PathStep}.
 */
final class OverlapStep {
  private double own;
  private double mutual;
  private double ownOhm;
  private double mutualOhm;
  private double capacitance;
  private double power;
  private double slopeV;
  private double saturation;
  private double threshold;

  /** One diode's logarithmic drop at the threshold, volts. */
  private double thresholdV;

  /** Results of the last step: the shared currents and the capacitor's voltage. */
  double xa;

  double xb;
  double v;

  private double det;
  private double m11;
  private double m12;
  private double m22;
  private double c;
  private double ua;
  private double ub;
  private double uv;
  private double fa;
  private double fb;
  private double fv;

  void set(double lineOhm, double lineHenry, BridgeLoad load, double cellSeconds) {
    double line = lineHenry / cellSeconds;
    double choke = load.dcHenry() / cellSeconds;
    double ohm = lineOhm + load.diode().ohm();
    own = 2 * line + choke;
    mutual = line + choke;
    ownOhm = 2 * ohm + load.dcOhm();
    mutualOhm = ohm + load.dcOhm();
    capacitance = load.capacitanceF() / cellSeconds;
    power = load.powerW();
    slopeV = load.diode().slopeV();
    saturation = load.diode().saturationA();
  }

  void threshold(double amps) {
    threshold = amps;
    thresholdV = slopeV * Math.log(1 + amps / saturation);
  }

  /**
   * How willingly an idle line would join: positive where, with a threshold's current taken over by
   * it from a direct current, that current would grow.
   *
   * @param total direct current, amps
   * @param driveA e_a - e_c of the line that conducts, volts
   * @param driveB e_b - e_c of the idle line
   */
  double margin(double total, double volts, double driveA, double driveB) {
    double first = Math.max(total - threshold, threshold);
    slopes(first, threshold, volts, driveA, driveB);
    double shared = conductance(first + threshold);
    double share =
        own > 0 ? mutual / own : (mutualOhm + shared) / (ownOhm + shared + conductance(first));
    return fb - share * fa;
  }

  private double drop(double amps) {
    return amps > threshold ? slopeV * Math.log(1 + amps / saturation) : thresholdV;
  }

  private double conductance(double amps) {
    return amps >= threshold ? slopeV / (amps + saturation) : 0;
  }

  private void slopes(double a, double b, double volts, double driveA, double driveB) {
    double common = volts + drop(a + b);
    fa = driveA - common - ownOhm * a - mutualOhm * b - drop(a);
    fb = driveB - common - ownOhm * b - mutualOhm * a - drop(b);
    fv = a + b - power / volts;
  }

  private void factor(double h, double a0, double b0, double v0) {
    double shared = conductance(a0 + b0);
    c = 2 * capacitance / h - power / (v0 * v0);
    double diagonal = 2 * own / h + ownOhm + shared;
    double cross = 2 * mutual / h + mutualOhm + shared;
    m11 = (diagonal + conductance(a0)) * c + 1;
    m22 = (diagonal + conductance(b0)) * c + 1;
    m12 = cross * c + 1;
    det = 1 / (m11 * m22 - m12 * m12);
  }

  private void solve(double ra, double rb, double rv) {
    double pa = c * ra - rv;
    double pb = c * rb - rv;
    ua = (pa * m22 - pb * m12) * det;
    ub = (pb * m11 - pa * m12) * det;
    uv = (rv + ua + ub) / c;
  }

  /**
   * Steps from (a0, b0, v0) over h cells.
   *
   * @param da drive ±(e_a - e_c) at the start, sa its slope per cell, ea its value at the end;
   *     likewise for b
   */
  void step(
      double h,
      double a0,
      double b0,
      double v0,
      double da,
      double sa,
      double ea,
      double db,
      double sb,
      double eb) {
    factor(h, a0, b0, v0);
    double oh = own / h;
    double mh = mutual / h;
    double ch = capacitance / h;
    slopes(a0, b0, v0, da, db);
    double ga = h * sa;
    double gb = h * sb;
    solve(fa + 0.5 * ga, fb + 0.5 * gb, fv);
    double u1a = ua;
    double u1b = ub;
    double u1v = uv;
    solve(
        fa + 1.5 * ga + 4 * (oh * u1a + mh * u1b),
        fb + 1.5 * gb + 4 * (mh * u1a + oh * u1b),
        fv + 4 * ch * u1v);
    double ka = u1a - ua;
    double kb = u1b - ub;
    double kv = u1v - uv;
    double ya = a0 + 2 * u1a;
    double yb = b0 + 2 * u1b;
    double yv = v0 + 2 * u1v;
    slopes(ya, yb, yv, ea, eb);
    solve(fa + oh * ka + mh * kb, fb + mh * ka + oh * kb, fv + ch * kv);
    ya += ua;
    yb += ub;
    yv += uv;
    ka -= (8.0 / 3) * ua;
    kb -= (8.0 / 3) * ub;
    kv -= (8.0 / 3) * uv;
    slopes(ya, yb, yv, ea, eb);
    solve(fa + oh * ka + mh * kb, fb + mh * ka + oh * kb, fv + ch * kv);
    xa = ya + ua;
    xb = yb + ub;
    v = yv + uv;
  }
}
