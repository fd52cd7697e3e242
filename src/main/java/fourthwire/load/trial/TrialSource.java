package fourthwire.load.trial;

import fourthwire.load.model.PortSpectra;
import fourthwire.quantity.Phasor;
import fourthwire.quantity.Spectrum;

/**
 * What stands behind a piece of equipment: an electromotive force of nominal voltage behind a
 * series R-L.
 *
 * @param nominalV rms volts; of one port across it, of three ports between lines
 * @param ohm resistance in each line, of one port the whole loop's, ohms
 * @param henry inductance likewise, henries
 * @param background distortion of the electromotive force: orders from 2 relative to its
 *     fundamental, at the angles they have where that stands at 0°; order 1 is not read
 */
public record TrialSource(double nominalV, double ohm, double henry, Spectrum background) {
  /** Stiff and sinusoidal: what the equipment standards' tests are made on. */
  public static TrialSource ideal(double nominalV) {
    return new TrialSource(nominalV, 0, 0, Spectrum.ZERO);
  }

  /** Impedance at an order, ohms. */
  Phasor impedance(int order, double frequencyHz) {
    return new Phasor(ohm, 2 * Math.PI * frequencyHz * order * henry);
  }

  /** The electromotive force at each port; three are copies a third of a cycle apart. */
  PortSpectra emf(int ports) {
    double fundamental = ports == 3 ? nominalV / Math.sqrt(3) : nominalV;
    PortSpectra emf = new PortSpectra(ports);
    for (int port = 0; port < ports; port++) {
      int line = port;
      emf.set(
          port,
          Spectrum.of(
              h -> {
                Phasor relative = h == 1 ? new Phasor(1, 0) : background.at(h);
                return relative.times(fundamental).turned(-120.0 * h * line);
              }));
    }
    return emf;
  }
}
