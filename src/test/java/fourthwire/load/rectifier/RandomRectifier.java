package fourthwire.load.rectifier;

import fourthwire.load.model.PortSpectra;
import fourthwire.load.rectifier.path.BridgeLoad;
import fourthwire.load.rectifier.path.Diode;
import java.util.Random;

/**
 * Random but sensible equipment behind a random source, from a seed.
 *
 * @param seed repeats the case
 * @param load all units together; the direct-current choke has no resistance here, so that all
 *     losses lie in the lines
 * @param hertz system frequency
 * @param emf electromotive force
 * @param ohm series resistance of the source per port
 * @param henry series inductance likewise
 */
record RandomRectifier(
    long seed, BridgeLoad load, double hertz, PortSpectra emf, double ohm, double henry) {
  private static final Diode DIODE = new Diode(3e-11, 1.2, 1e-3);

  /**
   * A drive of 2 to 100 kW at 20 to 100 % load, without choke, with 3 % in the lines or 4 % on the
   * direct-current side, on balanced, 3 % unbalanced or 5 % distorted voltage, behind 0.01 to 10 %.
   */
  static RandomRectifier drive(long seed) {
    Random r = new Random(seed * 7919 + 1);
    double watts = between(r, 2e3, 1e5);
    double volts = r.nextBoolean() ? 400 : 480;
    double hertz = r.nextBoolean() ? 50 : 60;
    double base = volts * volts / watts;
    double omega = 2 * Math.PI * hertz;
    int choke = r.nextInt(3);
    double line = choke == 1 ? 0.03 * base : 0;
    double direct = choke == 2 ? 0.04 * base : 0;
    double farad = between(r, 2e-8, 1e-7) * watts * (400 / volts) * (400 / volts);
    BridgeLoad load =
        new BridgeLoad(
            watts * between(r, 0.2, 1),
            farad,
            0.002 * base * r.nextInt(2) + line / 15,
            line / omega,
            0,
            direct / omega,
            DIODE);
    return behindSource(seed, r, load, hertz, emf(r, 3, volts / Math.sqrt(3)), base);
  }

  /**
   * A supply of 5 W to 2 kW with 0.5 to 5 µF/W at 10 to 100 % load behind 0.01 to 5 %, some with
   * chokes.
   */
  static RandomRectifier supply(long seed) {
    Random r = new Random(seed * 104729 + 3);
    double watts = between(r, 5, 2e3);
    double volts = r.nextBoolean() ? 230 : 120;
    double base = volts * volts / watts;
    BridgeLoad load =
        new BridgeLoad(
            watts * between(r, 0.1, 1),
            watts * between(r, 0.5e-6, 5e-6),
            0.02 * base * r.nextInt(2),
            r.nextInt(3) == 0 ? 0.05 * base / 314 * r.nextDouble() : 0,
            0,
            r.nextInt(3) == 0 ? 0.05 * base / 314 * r.nextDouble() : 0,
            DIODE);
    return behindSource(seed, r, load, r.nextBoolean() ? 50 : 60, emf(r, 1, volts), base / 2);
  }

  /**
   * Any supply a survey may hold, sensible or not: 1 W to 10 kW at 1 to 100 % load, 0.1 to 20 µF/W,
   * behind 0.001 to 50 % of its own impedance, some with a line choke of up to 30 %; odd orders, or
   * all, of up to 30 %/h.
   */
  static RandomRectifier anything(long seed, boolean choke) {
    Random r = new Random(seed * 15485863 + 7);
    double watts = between(r, 1, 1e4);
    double volts = r.nextBoolean() ? 230 : 120;
    double hertz = r.nextBoolean() ? 50 : 60;
    double base = volts * volts / watts;
    double line = choke ? base * between(r, 0.005, 0.3) : 0;
    BridgeLoad load =
        new BridgeLoad(
            watts * between(r, 0.01, 1),
            watts * between(r, 0.1e-6, 20e-6),
            0.02 * base * r.nextInt(2) + line / 15,
            line / (2 * Math.PI * hertz),
            0,
            0,
            DIODE);
    PortSpectra emf = emf(r, 1, volts);
    int step = r.nextBoolean() ? 1 : 2;
    for (int h = step == 1 ? 2 : 3; h <= 50; h += step) {
      emf.re[0][h] += volts * 0.3 / h * (r.nextDouble() - 0.5);
      emf.im[0][h] += volts * 0.3 / h * (r.nextDouble() - 0.5);
    }
    return behindSource(seed, r, load, hertz, emf, base * between(r, 0.01, 5));
  }

  /**
   * Anything that the survey lets in: 100 W to 1 MW at 1 to 100 % load, capacitors from next to
   * none to huge, chokes to 10 % and 30 %, sources from nothing to a fifth of V²/P, resistive or
   * inductive, voltage balanced, unbalanced to 20 %, with a line missing, distorted, or with even
   * orders.
   */
  static RandomRectifier anyDrive(long seed) {
    Random r = new Random(seed * 15485863 + 7);
    double watts = between(r, 100, 1e6);
    double volts = between(r, 100, 1000);
    double hertz = r.nextBoolean() ? 50 : 60;
    double base = volts * volts / watts;
    double omega = 2 * Math.PI * hertz;
    double line = r.nextInt(2) * between(r, 1e-4, 0.1) * base;
    double direct = r.nextInt(3) / 2 * between(r, 1e-3, 0.3) * base;
    BridgeLoad load =
        new BridgeLoad(
            watts * between(r, 0.01, 1),
            between(r, 1e-2, 1e2) / (omega * base),
            r.nextInt(2) * between(r, 1e-4, 0.05) * base,
            r.nextInt(2) * between(r, 1e-4, 0.05) * base / omega,
            line / 15,
            line / omega,
            direct / 10,
            direct / omega,
            DIODE);
    double ohms = base * between(r, 1e-5, 0.2);
    int kind = r.nextInt(5);
    return new RandomRectifier(
        seed,
        load,
        hertz,
        anyEmf(r, volts / Math.sqrt(3)),
        kind < 2 ? 0 : ohms * r.nextDouble(),
        kind % 2 == 0 ? 0 : ohms / omega);
  }

  private static PortSpectra anyEmf(Random r, double volts) {
    PortSpectra emf = new PortSpectra(3);
    int kind = r.nextInt(5);
    int missing = kind == 3 && r.nextInt(4) == 0 ? r.nextInt(3) : -1;
    for (int h = 1; h <= 49; h += kind == 4 ? 1 : 2) {
      boolean there = h == 1 || kind > 1 && r.nextInt(4) == 0;
      double amount = h == 1 ? 1 : there ? 0.3 / h * r.nextDouble() : 0;
      double angle = 2 * Math.PI * r.nextDouble();
      for (int k = 0; k < 3; k++) {
        double off = kind == 0 || kind == 2 ? 0 : 0.2 * (r.nextDouble() - 0.5);
        double x = angle + off - h * k * 2 * Math.PI / 3;
        double rms = k == missing ? 0 : volts * amount * (1 + off);
        emf.re[k][h] = rms * Math.cos(x);
        emf.im[k][h] = rms * Math.sin(x);
      }
    }
    return emf;
  }

  /**
   * A supply with a choke of 5 to 100 % behind its bridge: 5 W to 5 kW at 20 to 100 % load, 0.5 to
   * 10 µF/W, behind 0.01 to 10 %; clean, odd orders, or even orders as well. All resistance lies in
   * the diodes, so that each path's loss is its own current's.
   */
  static RandomRectifier behindChoke(long seed) {
    Random r = new Random(seed * 32452843 + 11);
    double watts = between(r, 5, 5e3);
    double volts = r.nextBoolean() ? 230 : 120;
    double hertz = r.nextBoolean() ? 50 : 60;
    double base = volts * volts / watts;
    BridgeLoad load =
        new BridgeLoad(
            watts * between(r, 0.2, 1),
            watts * between(r, 0.5e-6, 10e-6),
            0,
            0,
            0,
            base * between(r, 0.05, 1) / (2 * Math.PI * hertz),
            new Diode(3e-11, 1.2, base * between(r, 1e-4, 0.03)));
    PortSpectra emf = emf(r, 1, volts);
    for (int h = 2; h <= 4 && r.nextInt(3) == 0; h += 2) {
      emf.re[0][h] = volts * 0.03 * (r.nextDouble() - 0.5);
      emf.im[0][h] = volts * 0.03 * (r.nextDouble() - 0.5);
    }
    RandomRectifier given = behindSource(seed, r, load, hertz, emf, base);
    return new RandomRectifier(seed, load, hertz, emf, 0, given.henry());
  }

  private static RandomRectifier behindSource(
      long seed, Random r, BridgeLoad load, double hertz, PortSpectra emf, double base) {
    double ohms = base * between(r, 1e-4, 0.1);
    double angle = r.nextDouble() * Math.PI / 2;
    int kind = r.nextInt(6);
    return new RandomRectifier(
        seed,
        load,
        hertz,
        emf,
        kind == 0 ? 0 : ohms * Math.cos(angle),
        kind == 1 ? 0 : ohms * Math.sin(angle) / (2 * Math.PI * hertz));
  }

  private static PortSpectra emf(Random r, int ports, double volts) {
    PortSpectra emf = new PortSpectra(ports);
    int voltage = r.nextInt(3);
    double start = r.nextDouble() * 2 * Math.PI;
    double[] percent = new double[14];
    double[] angle = new double[14];
    for (int h : voltage == 2 ? new int[] {5, 7, 11, 13} : new int[0]) {
      percent[h] = 25.0 / h * r.nextDouble();
      angle[h] = 2 * Math.PI * r.nextDouble();
    }
    percent[1] = 100;
    angle[1] = start;
    for (int port = 0; port < ports; port++) {
      double scale = voltage == 1 ? 1 + 0.03 * (2 * r.nextDouble() - 1) : 1;
      for (int h = 1; h < percent.length; h++) {
        double x = angle[h] - h * port * 2 * Math.PI / 3;
        emf.re[port][h] = scale * volts * percent[h] / 100 * Math.cos(x);
        emf.im[port][h] = scale * volts * percent[h] / 100 * Math.sin(x);
      }
    }
    return emf;
  }

  private static double between(Random r, double low, double high) {
    return low * Math.pow(high / low, r.nextDouble());
  }

  /** The same with the source's resistance in the equipment's own lines. */
  RandomRectifier withOwnResistance() {
    BridgeLoad own =
        new BridgeLoad(
            load.powerW(),
            load.capacitanceF(),
            load.lineOhm() + ohm,
            load.lineHenry(),
            load.dcOhm(),
            load.dcHenry(),
            load.diode());
    return new RandomRectifier(seed, own, hertz, emf, 0, henry);
  }

  /** Watts lost by a current in one port: a line's diode, or both of a single-phase path. */
  double loss(double amps) {
    int diodes = emf.ports() == 1 ? 2 : 1;
    double ohms = load.lineOhm() + ohm;
    return amps * (diodes * load.diode().drop(amps) + ohms * amps);
  }

  @Override
  public String toString() {
    return String.format("seed %d: %s behind %.4g ohm, %.4g H", seed, load, ohm, henry);
  }
}
