package fourthwire.load.rectifier;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import fourthwire.load.model.PortSpectra;
import fourthwire.load.rectifier.loop.MultiPulseSolver;
import fourthwire.load.rectifier.path.BridgeLoad;
import fourthwire.load.rectifier.path.Diode;
import java.util.List;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/**
 * Where a drive's state is stable, against the averaged circuit of a bridge with constant power
 * behind it: L·di/dt = V - R·i - v, C·dv/dt = i - P/v has R·C·v² > L·P as the condition of Routh
 * and Hurwitz, with R the circuit's resistances, both diodes' slope and 6·f·L of each line for the
 * overlap (the commutation drop of power electronics' textbooks), L two lines' and the choke's. It
 * holds where the ring is slow against the ripple of six pulses.
 */
class DriveStabilityTest {
  private static final double WATTS = 11e3;
  private static final double HERTZ = 50;
  private static final double BASE_OHM = 400 * 400 / WATTS;
  private static final double OMEGA = 2 * Math.PI * HERTZ;
  private static final Diode DIODE = new Diode(3e-11, 1.2, 1e-3);

  /** How far from the averaged circuit's capacitor the true limit may lie. */
  private static final double BAND = 0.08;

  @ParameterizedTest(name = "line choke {0} %, direct {1} %, resistance {2} %")
  @CsvSource({"0, 4, 0.3", "0, 4, 0.5", "0, 8, 1", "3, 4, 0.3"})
  void aDriveIsStableAsFarAsItsAveragedCircuitIs(double line, double direct, double resistance) {
    double lineOhm = line / 100 * BASE_OHM;
    double directOhm = direct / 100 * BASE_OHM;
    double ohm = resistance / 100 * BASE_OHM;
    double limit = limitF(lineOhm / OMEGA, directOhm / OMEGA, ohm);
    assertThat(remarks(lineOhm, directOhm, ohm, limit * (1 + BAND))).isEmpty();
    assertThat(remarks(lineOhm, directOhm, ohm, limit * (1 - BAND)))
        .singleElement()
        .asString()
        .contains("would not hold by itself");
  }

  /**
   * A slim drive's state is given from nothing as from its neighbour: the capacitor follows the
   * bridge's voltage, and the load's power sets the current.
   */
  @ParameterizedTest(name = "{0} µF/kW behind a line choke of 1 %")
  @CsvSource({"2", "3", "5"})
  void aSlimDriveHasOneState(double microfaradPerKw) {
    double ohm = 0.01 * BASE_OHM;
    MultiPulseSolver warm = solver(ohm, 0, 0.003 * BASE_OHM, microfaradPerKw * 1e-9 * WATTS);
    PortSpectra before = new PortSpectra(3);
    PortSpectra after = new PortSpectra(3);
    for (int volts = 380; volts <= 440; volts += 5) {
      MultiPulseSolver cold = solver(ohm, 0, 0.003 * BASE_OHM, microfaradPerKw * 1e-9 * WATTS);
      warm.solve(emf(volts), 0, 0, before);
      cold.solve(emf(volts), 0, 0, after);
      assertThat(after.re[0]).as("at %d V", volts).containsExactly(before.re[0], within(1e-4));
    }
  }

  private static List<String> remarks(double lineOhm, double directOhm, double ohm, double farad) {
    MultiPulseSolver solver = solver(lineOhm, directOhm, ohm, farad);
    solver.solve(emf(400), 0, 0, new PortSpectra(3));
    return solver.remarks();
  }

  private static MultiPulseSolver solver(
      double lineOhm, double directOhm, double ohm, double farad) {
    BridgeLoad load =
        new BridgeLoad(WATTS, farad, ohm, lineOhm / OMEGA, 0, directOhm / OMEGA, DIODE);
    return new MultiPulseSolver(1, load, HERTZ);
  }

  private static PortSpectra emf(double volts) {
    PortSpectra emf = new PortSpectra(3);
    for (int k = 0; k < 3; k++) {
      emf.re[k][1] = volts / Math.sqrt(3) * Math.cos(2 * Math.PI / 3 * k);
      emf.im[k][1] = -volts / Math.sqrt(3) * Math.sin(2 * Math.PI / 3 * k);
    }
    return emf;
  }

  private static double limitF(double lineHenry, double directHenry, double ohm) {
    double overlapOhm = 6 * HERTZ * lineHenry;
    double mean = 3 / Math.PI * Math.sqrt(2) * 400 - 2 * DIODE.drop(WATTS / 540);
    double volts = mean - (overlapOhm + 2 * ohm) * WATTS / mean;
    double diodeOhm = 2 * (DIODE.slopeV() * volts / WATTS + DIODE.ohm());
    double henry = 2 * lineHenry + directHenry;
    return WATTS * henry / ((2 * ohm + overlapOhm + diodeOhm) * volts * volts);
  }
}
