package fourthwire.load.rectifier;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.fail;
import static org.assertj.core.api.Assertions.within;

import fourthwire.load.model.NoSteadyStateException;
import fourthwire.load.model.PortSpectra;
import fourthwire.quantity.Spectrum;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * Laws that hold whatever the circuit, on seeded random equipment from stiff to soft sources: every
 * solution is finite, input power less computed losses is the output (Tellegen), and powers from
 * the spectrum and from the instantaneous values agree (Parseval).
 */
class RectifierLawsTest {
  private static final int SETS = 300;

  @ParameterizedTest(name = "seed {0}")
  @ValueSource(longs = {1, 2})
  void everySensibleDriveFindsItsSteadyState(long seed) {
    for (int n = 0; n < SETS; n++) {
      RandomRectifier given = RandomRectifier.drive(1000 * seed + n);
      SixPulseSolver solver = new SixPulseSolver(given.load(), given.hertz());
      PortSpectra current = new PortSpectra(3);
      try {
        solver.solve(given.emf(), given.ohm(), given.henry(), current);
      } catch (NoSteadyStateException none) {
        fail("%s: %s", given, none.getMessage());
      }
      check(given, given.halfWave(), current, solver::trace);
    }
  }

  @ParameterizedTest(name = "seed {0}")
  @ValueSource(longs = {1, 2})
  void everySensibleSupplyFindsItsSteadyState(long seed) {
    int unsettled = 0;
    for (int n = 0; n < SETS; n++) {
      RandomRectifier given = RandomRectifier.supply(1000 * seed + n);
      CapacitorInputSolver solver = new CapacitorInputSolver(given.load(), given.hertz());
      PortSpectra current = new PortSpectra(1);
      try {
        solver.solve(given.emf(), given.ohm(), given.henry(), current);
      } catch (NoSteadyStateException none) {
        assertThat(none).as(given.toString()).hasMessageContaining("does not repeat");
        unsettled++;
        continue;
      }
      check(given, solver.halfWave(), current, port -> solver.trace());
    }
    assertThat(unsettled).as("supplies whose current does not settle").isLessThan(SETS / 50);
  }

  private interface Traces {
    PulseTrace of(int port);
  }

  private static void check(
      RandomRectifier given, boolean halfWave, PortSpectra current, Traces traces) {
    double fourier = 0;
    double instantaneous = 0;
    double lost = 0;
    int ports = given.emf().ports();
    for (int port = 0; port < ports; port++) {
      assertThat(current.spectrum(port).rms()).as(given.toString()).isFinite().isPositive();
      CycleTable emf = new CycleTable();
      emf.fill(given.emf().re[port], given.emf().im[port]);
      for (int h = 1; h <= Spectrum.HIGHEST_ORDER; h++) {
        fourier +=
            given.emf().re[port][h] * current.re[port][h]
                + given.emf().im[port][h] * current.im[port][h];
      }
      if (port < 2 || ports == 1) {
        instantaneous += traces.of(port).mean(halfWave, (at, amps) -> emf.at(at) * amps);
      }
      lost += traces.of(port).mean(halfWave, (at, amps) -> given.loss(Math.abs(amps)));
    }
    if (ports == 3) {
      CycleTable third = new CycleTable();
      third.fill(given.emf().re[2], given.emf().im[2]);
      for (int port = 0; port < 2; port++) {
        instantaneous -= traces.of(port).mean(halfWave, (at, amps) -> third.at(at) * amps);
      }
    }
    double watts = given.load().powerW();
    assertThat(instantaneous).as("time domain, " + given).isCloseTo(fourier, within(1e-6 * watts));
    assertThat(fourier - lost).as("balance, " + given).isCloseTo(watts, within(1e-4 * watts));
  }
}
