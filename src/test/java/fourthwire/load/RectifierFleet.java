package fourthwire.load;

import fourthwire.load.model.LoadModel;
import fourthwire.load.model.PortSpectra;
import fourthwire.load.rectifier.CapacitorInput;
import fourthwire.load.rectifier.path.BridgeLoad;
import fourthwire.load.rectifier.path.Diode;
import java.util.Random;

/**
 * A seeded fleet of capacitor-input supplies, each behind a source of its own, for measuring speed:
 * 20 to 400 W, 0.5 to 2 µF/W, 0.05 to 0.8 ohm, 50 µH to 1 mH at 230 V, 50 Hz.
 */
final class RectifierFleet {
  static final double VOLTS = 230;

  final LoadModel[] model;
  final double[] ohm;
  final double[] henry;

  RectifierFleet(int size, long seed) {
    Random r = new Random(seed);
    model = new LoadModel[size];
    ohm = new double[size];
    henry = new double[size];
    for (int n = 0; n < size; n++) {
      double watts = r.nextDouble(20, 400);
      double farad = watts * r.nextDouble(0.5e-6, 2e-6);
      ohm[n] = r.nextDouble(0.05, 0.8);
      henry[n] = r.nextDouble(50e-6, 1e-3);
      Diode diode = new Diode(3e-11, 1.2, 1e-3);
      model[n] = new CapacitorInput(new BridgeLoad(watts, farad, 0, 0, 0, 0, diode), 50);
    }
  }

  /** One cold solution. */
  void solve(int n, PortSpectra emf, PortSpectra current) {
    model[n].newSolver().solve(emf, ohm[n], henry[n], current);
  }

  static PortSpectra sinusoidal() {
    return LoadCases.emf(1, VOLTS, 0);
  }

  /** Odd orders to 49, or all to 50, each of at most 9 %/h and, if even, a quarter of that. */
  static PortSpectra distorted(boolean even) {
    PortSpectra emf = sinusoidal();
    Random r = new Random(5);
    for (int h = 2; h <= 50; h++) {
      double size = VOLTS * 0.09 / h * r.nextDouble() * (h % 2 == 0 ? 0.25 : 1);
      double angle = r.nextDouble(2 * Math.PI);
      if (even || h % 2 == 1) {
        emf.re[0][h] = size * Math.cos(angle);
        emf.im[0][h] = size * Math.sin(angle);
      }
    }
    return emf;
  }
}
