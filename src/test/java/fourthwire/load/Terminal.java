package fourthwire.load;

import fourthwire.load.model.LoadModel;
import fourthwire.load.model.PortSpectra;
import fourthwire.quantity.Phasor;
import fourthwire.quantity.Spectrum;

/**
 * What a model draws in all, its linear part at the terminal voltage included, and the figures a
 * power meter at its first port would show. The linear part of three ports is taken at the balanced
 * fundamental only.
 *
 * @param voltage terminal voltage of the first port
 * @param current whole current into it
 */
record Terminal(Spectrum voltage, Spectrum current) {

  static Terminal of(LoadModel model, PortSpectra emf, double hertz, double ohm, double henry) {
    PortSpectra injected = new PortSpectra(model.ports());
    model.newSolver().solve(emf, ohm, henry, injected);
    double omega = 2 * Math.PI * hertz;
    Spectrum i = injected.spectrum(0);
    Spectrum v =
        Spectrum.of(
            h ->
                new Phasor(emf.re[0][h], emf.im[0][h])
                    .minus(i.at(h).times(new Phasor(ohm, omega * h * henry))));
    return new Terminal(v, Spectrum.of(h -> i.at(h).plus(linear(model, v, h))));
  }

  private static Phasor linear(LoadModel model, Spectrum v, int order) {
    if (model.ports() == 3 && order > 1) {
      return Phasor.ZERO;
    }
    double[] y = new double[6];
    model.linearSiemens(order, y);
    return v.at(order).times(new Phasor(y[0], y[1]));
  }

  double thdPercent() {
    return 100 * current.distortionRms() / current.magnitude(1);
  }

  double orderPercent(int order) {
    return 100 * current.magnitude(order) / current.magnitude(1);
  }

  double watts() {
    double watts = 0;
    for (int h = 1; h <= Spectrum.HIGHEST_ORDER; h++) {
      watts += voltage.re(h) * current.re(h) + voltage.im(h) * current.im(h);
    }
    return watts;
  }

  /** Lagging positive. */
  double fundamentalVar() {
    return voltage.im(1) * current.re(1) - voltage.re(1) * current.im(1);
  }

  double powerFactor() {
    return watts() / (voltage.rms() * current.rms());
  }
}
