package fourthwire.load.rectifier;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import fourthwire.load.model.PortSpectra;
import fourthwire.load.rectifier.loop.MultiPulseSolver;
import fourthwire.load.rectifier.path.BridgeLoad;
import fourthwire.load.rectifier.path.Diode;
import org.junit.jupiter.api.Test;

/**
 * A drive in a site of some thousand loads, at the voltage that these leave: a light load with both
 * chokes, whose ring is near the pulses', for which a search from nothing once found no state.
 */
class DriveFromColdTest {
  /** Order, then real and imaginary part of each line's electromotive force, volts. */
  private static final String EMF =
      """
      1 200.30 99.90 -13.62 -223.31 -186.93 123.30
      3 -3.96 1.97 -3.30 1.87 -3.57 1.32
      5 -2.65 5.09 -2.84 -5.29 6.29 0.23
      7 -0.60 -5.35 -4.50 2.77 4.25 2.70
      9 0.20 3.45 -0.26 3.27 -0.35 3.20
      11 1.27 0.28 -1.18 1.05 -0.42 -1.74
      13 -0.81 1.87 2.13 0.03 -0.61 -1.77
      15 -0.02 -1.29 0.21 -0.94 0.34 -0.93
      17 -0.05 0.44 -0.02 -0.34 0.36 0.26
      19 0.63 -0.50 -0.75 -0.50 -0.36 0.75
      21 -0.23 0.56 -0.44 0.22 -0.46 0.13
      23 0.54 -0.83 0.15 0.95 -0.84 -0.55
      25 0.13 0.16 0.00 0.14 0.25 0.08
      """;

  private static final BridgeLoad LOAD =
      new BridgeLoad(
          2468.036,
          5.89860590854519e-5,
          0.12965775504548455,
          0,
          0.033278823795007705,
          0.001588946792177899,
          0.18346572338936065,
          0.005839895353069421,
          new Diode(3e-11, 1.2, 1e-3));

  @Test
  void aStateIsFoundFromNothingAndKeptWhenWarm() {
    MultiPulseSolver solver = new MultiPulseSolver(1, LOAD, 50);
    PortSpectra emf = emf();
    PortSpectra cold = new PortSpectra(3);
    PortSpectra warm = new PortSpectra(3);
    solver.solve(emf, 0.0857, 3.25e-5, cold);
    solver.solve(emf, 0.0857, 3.25e-5, warm);
    assertThat(power(emf, cold)).isCloseTo(2468 * 1.01, within(2468 * 0.01));
    for (int k = 0; k < 3; k++) {
      assertThat(warm.re[k]).containsExactly(cold.re[k], within(1e-6));
      assertThat(warm.im[k]).containsExactly(cold.im[k], within(1e-6));
    }
  }

  private static PortSpectra emf() {
    PortSpectra emf = new PortSpectra(3);
    for (String row : EMF.lines().toList()) {
      String[] part = row.split(" ");
      int order = Integer.parseInt(part[0]);
      for (int k = 0; k < 3; k++) {
        emf.re[k][order] = Double.parseDouble(part[1 + 2 * k]);
        emf.im[k][order] = Double.parseDouble(part[2 + 2 * k]);
      }
    }
    return emf;
  }

  /** Active power of all orders. */
  private static double power(PortSpectra v, PortSpectra i) {
    double sum = 0;
    for (int k = 0; k < 3; k++) {
      for (int h = 1; h < v.re[k].length; h++) {
        sum += v.re[k][h] * i.re[k][h] + v.im[k][h] * i.im[k][h];
      }
    }
    return sum;
  }
}
