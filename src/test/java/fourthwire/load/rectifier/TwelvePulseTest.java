package fourthwire.load.rectifier;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import fourthwire.load.model.PortSpectra;
import fourthwire.load.rectifier.loop.MultiPulseSolver;
import fourthwire.load.rectifier.path.BridgeLoad;
import fourthwire.load.rectifier.path.Diode;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * Cancellation between the bridges of a twelve-pulse rectifier: currents of windings 30° apart, put
 * together, leave orders 12k ± 1 (closed form, in any text on power electronics).
 */
class TwelvePulseTest {
  private static final double WATTS = 90e3;
  private static final double BASE_OHM = 400 * 400 / WATTS;
  private static final double OMEGA = 100 * Math.PI;
  private static final BridgeLoad LOAD =
      new BridgeLoad(
          WATTS,
          40e-9 * WATTS,
          0.002 * BASE_OHM,
          0,
          0,
          0.06 * BASE_OHM / OMEGA,
          0,
          0,
          new Diode(3e-11, 1.2, 1e-3));

  private final MultiPulseSolver solver = new MultiPulseSolver(2, LOAD, 50);
  private final PortSpectra current = new PortSpectra(3);

  @ParameterizedTest
  @ValueSource(ints = {5, 7, 17, 19, 29, 31, 41, 43})
  void whatEachBridgeDrawsCancelsBetweenThem(int order) {
    solve(400);
    double[] winding = sizes(solver.secondBridge());
    assertThat(winding[order]).isGreaterThan((order < 10 ? 0.05 : 5e-4) * winding[1]);
    assertThat(sizes(current)[order]).isLessThan(1e-6 * sizes(current)[1]);
  }

  @ParameterizedTest
  @ValueSource(ints = {1, 11, 13, 23, 25, 35, 37, 47, 49})
  void theOthersAddUp(int order) {
    solve(400);
    double winding = sizes(solver.secondBridge())[order];
    assertThat(sizes(current)[order]).isCloseTo(2 * winding, within(1e-5 * winding));
  }

  @Test
  void anUnbalancedSupplyLeavesSome() {
    solve(380);
    assertThat(sizes(current)[5]).isGreaterThan(1e-4 * sizes(current)[1]);
  }

  /** On 400 V, the first line's as given. */
  private void solve(double firstLine) {
    PortSpectra emf = new PortSpectra(3);
    for (int k = 0; k < 3; k++) {
      double volts = (k == 0 ? firstLine : 400) / Math.sqrt(3);
      emf.re[k][1] = volts * Math.cos(2 * Math.PI / 3 * k);
      emf.im[k][1] = -volts * Math.sin(2 * Math.PI / 3 * k);
    }
    solver.solve(emf, 0.001 * BASE_OHM, 0.01 * BASE_OHM / OMEGA, current);
  }

  private static double[] sizes(PortSpectra of) {
    double[] sizes = new double[of.re[0].length];
    for (int h = 1; h < sizes.length; h++) {
      sizes[h] = Math.hypot(of.re[0][h], of.im[0][h]);
    }
    return sizes;
  }
}
