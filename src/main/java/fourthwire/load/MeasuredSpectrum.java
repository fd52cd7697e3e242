package fourthwire.load;

import fourthwire.load.model.LoadModel;
import fourthwire.load.model.LoadSolver;
import fourthwire.load.model.NoSteadyStateException;
import fourthwire.load.model.PortSpectra;
import fourthwire.quantity.Phasor;
import fourthwire.quantity.Spectrum;

/**
 * {@code measured}: a spectrum from an instrument or a maker, injected as it stands.
 *
 * <p>I_h = I_1·s_h∠(φ_h + h·θ), θ the angle of the fundamental voltage at the terminal (on three
 * lines of its positive sequence, line k at φ_h + h·(θ - 120°·k)): public contract, section 1.
 * Magnitudes do not follow the voltage: a spectrum taken elsewhere knows nothing of attenuation
 * here, and may well be wrong by a third at single orders (common practice, no source).
 */
final class MeasuredSpectrum implements LoadModel {
  private final int ports;
  private final double frequencyHz;
  private final Spectrum amps;

  /**
   * Takes the current of all units.
   *
   * @param amps rms amps, at the angles they have where the fundamental terminal voltage stands at
   *     0°
   */
  MeasuredSpectrum(int ports, double frequencyHz, Spectrum amps) {
    this.ports = ports;
    this.frequencyHz = frequencyHz;
    this.amps = amps;
  }

  @Override
  public int ports() {
    return ports;
  }

  @Override
  public LoadSolver newSolver() {
    return this::inject;
  }

  private void inject(PortSpectra emf, double seriesOhm, double seriesHenry, PortSpectra current) {
    Phasor e = ports == 3 ? emf.positiveSequence() : new Phasor(emf.re[0][1], emf.im[0][1]);
    Phasor drop = amps.at(1).times(new Phasor(seriesOhm, 2 * Math.PI * frequencyHz * seriesHenry));
    double theta = terminalAngle(e, drop);
    for (int line = 0; line < ports; line++) {
      double angle = theta - line * 2 * Math.PI / 3;
      for (int h = 1; h <= Spectrum.HIGHEST_ORDER; h++) {
        double cos = Math.cos(h * angle);
        double sin = Math.sin(h * angle);
        double re = amps.re(h);
        double im = amps.im(h);
        current.re[line][h] = re * cos - im * sin;
        current.im[line][h] = re * sin + im * cos;
      }
    }
  }

  /**
   * Angle θ of the terminal voltage V∠θ = e - w∠θ, in radians, with w the drop at θ = 0: |V + w| =
   * |e| gives V, and the angle of V + w is by how much θ stands behind e.
   */
  private static double terminalAngle(Phasor e, Phasor w) {
    double square = e.re() * e.re() + e.im() * e.im() - w.im() * w.im();
    double v = square > 0 ? Math.sqrt(square) - w.re() : 0;
    if (!(v > 0)) {
      throw new NoSteadyStateException(
              "the measured current drops more than the source's whole voltage in its impedance")
          .since(NoSteadyStateException.Why.TOO_MUCH);
    }
    return Math.atan2(e.im(), e.re()) - Math.atan2(w.im(), v + w.re());
  }
}
