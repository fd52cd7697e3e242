package fourthwire.load;

import fourthwire.load.model.LoadModel;
import fourthwire.load.model.PortSpectra;
import fourthwire.quantity.Spectrum;

/**
 * What a model draws from a stiff, sinusoidal, balanced supply at nominal voltage.
 *
 * @param watts active power
 * @param lineAmps rms current of a line, orders 1 to 50
 * @param voltAmperes apparent power
 */
record NominalDraw(double watts, double lineAmps, double voltAmperes) {

  static NominalDraw of(LoadModel model, LoadRequest request) {
    int ports = model.ports();
    double v = ports == 3 ? request.nominalPortV() / Math.sqrt(3) : request.nominalPortV();
    PortSpectra emf = new PortSpectra(ports);
    for (int p = 0; p < ports; p++) {
      double angle = -p * 2 * Math.PI / 3;
      emf.re[p][1] = v * Math.cos(angle);
      emf.im[p][1] = v * Math.sin(angle);
    }
    PortSpectra current = new PortSpectra(ports);
    model.newSolver().solve(emf, 0, 0, current);
    addLinear(model, v, current);
    Spectrum line = current.spectrum(0);
    return new NominalDraw(ports * v * line.re(1), line.rms(), ports * v * line.rms());
  }

  /** The linear part at the fundamental of the first line: positive sequence only. */
  private static void addLinear(LoadModel model, double v, PortSpectra current) {
    double[] y = new double[6];
    model.linearSiemens(1, y);
    current.re[0][1] += y[0] * v;
    current.im[0][1] += y[1] * v;
  }

  double as(LoadRequest.Rating rating) {
    if (rating instanceof LoadRequest.Rating.Watts) {
      return watts;
    }
    return rating instanceof LoadRequest.Rating.Amps ? lineAmps : voltAmperes;
  }
}
