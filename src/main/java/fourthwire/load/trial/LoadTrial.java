package fourthwire.load.trial;

import fourthwire.load.LoadModels;
import fourthwire.load.LoadRequest;
import fourthwire.load.model.LoadModel;
import fourthwire.load.model.LoadSolver;
import fourthwire.load.model.NoSteadyStateException;
import fourthwire.load.model.PortSpectra;
import fourthwire.quantity.Phasor;
import fourthwire.quantity.Spectrum;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * Solves equipment behind a source, at every order to the 50th.
 *
 * <p>The equipment's injected current is solved behind the source's R-L; where it also has a linear
 * part (an input filter, a locked rotor) the electromotive force that its injecting part sees is u
 * = V + Z·I, with V = (E - Z·I)/(1 + Z·Y) and I = I(u): a fixed point, which without a linear part
 * is E itself. A filter that rings with the source would drive the repetition apart; so each turn
 * takes it that the injecting part answers a change of voltage like a conductance that draws its
 * power, which leaves the fixed point where it is. Three lines are taken in symmetrical components,
 * order by order. N units are one unit N times as large, as everywhere.
 */
public final class LoadTrial {
  /** Of the electromotive force's fundamental; an audit asks for 1e-5 of the nominal voltage. */
  private static final double TOLERANCE = 1e-6;

  private static final Phasor ONE = new Phasor(1, 0);

  private final double frequencyHz;
  private final TrialSource source;
  private final LoadModel model;
  private final LoadSolver solver;
  private final int ports;
  private final PortSpectra emf;
  private final PortSpectra seen;
  private final PortSpectra injected;
  private final Phasor[][] voltage;
  private final Phasor[][] current;
  private double conductance;

  private LoadTrial(LoadRequest request, TrialSource source) {
    this.frequencyHz = request.frequencyHz();
    this.source = source;
    this.model = LoadModels.of(request);
    this.solver = model.newSolver();
    this.ports = model.ports();
    this.emf = source.emf(ports);
    this.seen = new PortSpectra(ports);
    this.injected = new PortSpectra(ports);
    this.voltage = new Phasor[ports][Spectrum.HIGHEST_ORDER + 1];
    this.current = new Phasor[ports][Spectrum.HIGHEST_ORDER + 1];
  }

  /**
   * The steady state of all units of the request.
   *
   * @throws IllegalArgumentException where the request's parameters are impossible
   * @throws NoSteadyStateException where the source cannot give what the equipment asks for; with
   *     the reason as a sentence
   */
  public static TrialResult solve(LoadRequest request, TrialSource source) {
    return new LoadTrial(request, source).solved();
  }

  private TrialResult solved() {
    double[] start = packed(emf);
    double fundamental = Math.hypot(emf.re[0][1], emf.im[0][1]);
    FixedPoint.of(this::image, start, TOLERANCE * fundamental);
    List<Spectrum> amps = new ArrayList<>();
    List<Spectrum> volts = new ArrayList<>();
    for (int port = 0; port < ports; port++) {
      Phasor[] i = current[port];
      Phasor[] v = voltage[port];
      amps.add(Spectrum.of(h -> i[h]));
      volts.add(Spectrum.of(h -> v[h]));
    }
    List<Double> direct = Arrays.stream(injected.direct).boxed().toList();
    return TrialResult.of(amps, direct, volts, solver.remarks());
  }

  /** One turn: the current at what is seen, the voltages it leaves, what is seen then. */
  private double[] image(double[] x) {
    unpack(x);
    injected.clear();
    solver.solve(seen, source.ohm(), source.henry(), injected);
    PortSpectra next = new PortSpectra(ports);
    double[] y = new double[6];
    for (int h = 1; h <= Spectrum.HIGHEST_ORDER; h++) {
      model.linearSiemens(h, y);
      network(h, y, next);
    }
    return packed(next);
  }

  private void network(int h, double[] y, PortSpectra next) {
    Phasor z = source.impedance(h, frequencyHz);
    Phasor[] e = sequences(emf, h);
    Phasor[] i = sequences(injected, h);
    Phasor[] v = new Phasor[ports];
    Phasor[] total = new Phasor[ports];
    Phasor[] u = sequences(seen, h);
    for (int s = 0; s < ports; s++) {
      Phasor admittance = new Phasor(y[2 * s], y[2 * s + 1]);
      Phasor drop = z.times(i[s]);
      Phasor ring = ONE.plus(z.times(admittance));
      v[s] = e[s].minus(drop).over(ring);
      total[s] = i[s].plus(admittance.times(v[s]));
      if (h == 1 && s == 0) {
        conductance = conductance(v[s], i[s]);
      }
      // what a change of u brings back through the linear part, were the rest a conductance
      Phasor answer = new Phasor(conductance, 0).over(ONE.plus(z.times(conductance)));
      Phasor echo = z.times(z).times(admittance).over(ring).times(answer);
      u[s] = v[s].plus(drop).minus(echo.times(u[s])).over(ONE.minus(echo));
    }
    for (int port = 0; port < ports; port++) {
      voltage[port][h] = line(v, port);
      current[port][h] = line(total, port);
      Phasor seenNext = line(u, port);
      next.re[port][h] = seenNext.re();
      next.im[port][h] = seenNext.im();
    }
  }

  /** What the injecting part draws at its terminals as a conductance, siemens. */
  private static double conductance(Phasor volts, Phasor amps) {
    double square = volts.re() * volts.re() + volts.im() * volts.im();
    return square > 0 ? Math.max(0, (volts.re() * amps.re() + volts.im() * amps.im()) / square) : 0;
  }

  /** Positive, negative, zero sequence of three ports; of one port itself. */
  private Phasor[] sequences(PortSpectra of, int h) {
    Phasor first = new Phasor(of.re[0][h], of.im[0][h]);
    if (ports == 1) {
      return new Phasor[] {first};
    }
    Phasor second = new Phasor(of.re[1][h], of.im[1][h]);
    Phasor third = new Phasor(of.re[2][h], of.im[2][h]);
    return new Phasor[] {
      first.plus(second.turned(120)).plus(third.turned(-120)).times(1.0 / 3),
      first.plus(second.turned(-120)).plus(third.turned(120)).times(1.0 / 3),
      first.plus(second).plus(third).times(1.0 / 3)
    };
  }

  private Phasor line(Phasor[] sequences, int port) {
    return ports == 1
        ? sequences[0]
        : sequences[0]
            .turned(-120.0 * port)
            .plus(sequences[1].turned(120.0 * port))
            .plus(sequences[2]);
  }

  private double[] packed(PortSpectra of) {
    int n = Spectrum.HIGHEST_ORDER;
    double[] x = new double[2 * n * ports];
    for (int port = 0; port < ports; port++) {
      System.arraycopy(of.re[port], 1, x, 2 * n * port, n);
      System.arraycopy(of.im[port], 1, x, 2 * n * port + n, n);
    }
    return x;
  }

  private void unpack(double[] x) {
    int n = Spectrum.HIGHEST_ORDER;
    for (int port = 0; port < ports; port++) {
      System.arraycopy(x, 2 * n * port, seen.re[port], 1, n);
      System.arraycopy(x, 2 * n * port + n, seen.im[port], 1, n);
    }
  }
}
