package fourthwire.load.model;

import fourthwire.quantity.Phasor;
import fourthwire.quantity.Spectrum;
import java.util.Arrays;

/**
 * A reusable block of rms phasors by port and order (sine reference), the working form in which
 * spectra move between the network and the load models without allocation.
 */
public final class PortSpectra {
  /** Real parts, {@code re[port][order]}; index 0 of an order array is unused. */
  public final double[][] re;

  /** Imaginary parts likewise. */
  public final double[][] im;

  /**
   * Direct component of a current by port, amps: left where the two half-waves of what a load draws
   * differ. It stays beside the orders; a network is solved for these only.
   */
  public final double[] direct;

  /** A block of zeros for this many ports. */
  public PortSpectra(int ports) {
    re = new double[ports][Spectrum.HIGHEST_ORDER + 1];
    im = new double[ports][Spectrum.HIGHEST_ORDER + 1];
    direct = new double[ports];
  }

  /** Number of ports. */
  public int ports() {
    return re.length;
  }

  /** Sets every phasor and direct component to zero. */
  public void clear() {
    Arrays.fill(direct, 0);
    for (int p = 0; p < re.length; p++) {
      Arrays.fill(re[p], 0);
      Arrays.fill(im[p], 0);
    }
  }

  /** An immutable copy of one port's spectrum. */
  public Spectrum spectrum(int port) {
    return Spectrum.of(re[port], im[port]);
  }

  /** Sets one port from a spectrum. */
  public void set(int port, Spectrum spectrum) {
    spectrum.copyTo(re[port], im[port]);
  }

  /** Fundamental positive sequence of three ports. */
  public Phasor positiveSequence() {
    Phasor sum = Phasor.ZERO;
    for (int k = 0; k < 3; k++) {
      sum = sum.plus(new Phasor(re[k][1], im[k][1]).turned(120.0 * k));
    }
    return sum.times(1.0 / 3);
  }
}
