package fourthwire.load.rectifier;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.fail;
import static org.assertj.core.api.Assertions.within;

import fourthwire.load.model.NoSteadyStateException;
import fourthwire.load.model.PortSpectra;
import fourthwire.load.rectifier.loop.MultiPulseSolver;
import fourthwire.load.rectifier.path.CycleTable;
import fourthwire.load.rectifier.path.PulseTrace;
import fourthwire.quantity.Spectrum;
import java.util.Arrays;
import org.junit.jupiter.api.Test;
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
      checkDrive(1, RandomRectifier.drive(1000 * seed + n));
    }
  }

  /** Resistance lies behind the windings, where each line's loss is its own current's. */
  @ParameterizedTest(name = "seed {0}")
  @ValueSource(longs = {1, 2})
  void everySensibleTwelvePulseDriveFindsItsSteadyState(long seed) {
    for (int n = 0; n < SETS; n++) {
      checkDrive(2, RandomRectifier.drive(1000 * seed + n).withOwnResistance());
    }
  }

  private static void checkDrive(int bridges, RandomRectifier given) {
    MultiPulseSolver solver = new MultiPulseSolver(bridges, given.load(), given.hertz());
    PortSpectra current = new PortSpectra(3);
    try {
      solver.solve(given.emf(), given.ohm(), given.henry(), current);
    } catch (NoSteadyStateException none) {
      fail("%s: %s", given, none.getMessage());
    }
    check(given, current, solver::trace, solver.lines(), solver.periods());
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
      check(given, current, solver::trace, solver.paths(), solver.halfWave() ? 2 : 1);
    }
    assertThat(unsettled).as("supplies whose current does not settle").isLessThan(SETS / 50);
  }

  @ParameterizedTest(name = "with a choke: {0}")
  @ValueSource(booleans = {false, true})
  void anySupplyConvergesOrSaysWhy(boolean choke) {
    PortSpectra current = new PortSpectra(1);
    int converged = 0;
    for (int n = 0; n < 10_000; n++) {
      RandomRectifier given = RandomRectifier.anything(n, choke);
      CapacitorInputSolver solver = new CapacitorInputSolver(given.load(), given.hertz());
      try {
        solver.solve(given.emf(), given.ohm(), given.henry(), current);
        converged++;
        double rms = current.spectrum(0).rms();
        assertThat(rms).as(given.toString()).isFinite().isPositive();
      } catch (NoSteadyStateException none) {
        assertThat(none).as(given.toString()).hasMessageContaining("finds no steady state");
      }
    }
    assertThat(converged).isGreaterThan(8_000);
  }

  @Test
  void everyChokeBehindASinglePhaseBridgeFindsItsStateOrSaysWhy() {
    int pastTheCrossing = 0;
    int unsettled = 0;
    for (int n = 0; n < 3_000; n++) {
      RandomRectifier given = RandomRectifier.behindChoke(n);
      CapacitorInputSolver solver = new CapacitorInputSolver(given.load(), given.hertz());
      PortSpectra current = new PortSpectra(1);
      try {
        solver.solve(given.emf(), given.ohm(), given.henry(), current);
      } catch (NoSteadyStateException none) {
        assertThat(none).as(given.toString()).hasMessageContaining("finds no steady state");
        unsettled++;
        continue;
      }
      if (solver.paths() == 2) {
        check(given, current, solver::trace, 2, solver.halfWave() ? 2 : 1);
        pastTheCrossing++;
      }
    }
    assertThat(pastTheCrossing).isGreaterThan(500);
    assertThat(unsettled).as("that hunt against constant power").isLessThan(500);
  }

  private interface Traces {
    PulseTrace of(int port);
  }

  /**
   * One solution's laws.
   *
   * @param lines of all bridges
   * @param periods how many times what was recorded makes up the cycle
   */
  private static void check(
      RandomRectifier given, PortSpectra current, Traces traces, int lines, int periods) {
    double fourier = 0;
    double instantaneous = 0;
    double lost = 0;
    double weight = Math.max(periods, 2) / 2.0;
    for (int port = 0; port < given.emf().ports(); port++) {
      assertThat(current.spectrum(port).rms()).as(given.toString()).isFinite().isPositive();
      for (int h = 1; h <= Spectrum.HIGHEST_ORDER; h++) {
        fourier +=
            given.emf().re[port][h] * current.re[port][h]
                + given.emf().im[port][h] * current.im[port][h];
      }
    }
    for (int line = 0; line < lines; line++) {
      PulseTrace trace = traces.of(line);
      CycleTable emf = emfOf(given, line);
      boolean halfWave = periods > 1;
      instantaneous += weight * trace.mean(halfWave, (at, amps) -> emf.at(at) * amps);
      lost += weight * trace.mean(halfWave, (at, amps) -> given.loss(Math.abs(amps)));
    }
    double watts = given.load().powerW();
    assertThat(instantaneous).as("time domain, " + given).isCloseTo(fourier, within(1e-6 * watts));
    assertThat(fourier - lost).as("balance, " + given).isCloseTo(watts, within(1e-4 * watts));
  }

  /**
   * A port's (negative for the second path through its bridge), or that of a winding 30° ahead: the
   * difference of two lines over √3.
   */
  private static CycleTable emfOf(RandomRectifier given, int line) {
    PortSpectra emf = given.emf();
    CycleTable table = new CycleTable();
    if (emf.ports() == 1) {
      double sign = 1 - 2 * line;
      table.fill(scaled(emf.re[0], sign), scaled(emf.im[0], sign));
      return table;
    }
    double[] re = emf.re[line % 3].clone();
    double[] im = emf.im[line % 3].clone();
    for (int h = 1; h < re.length && line > 2; h++) {
      re[h] = (re[h] - emf.re[(line + 1) % 3][h]) / Math.sqrt(3);
      im[h] = (im[h] - emf.im[(line + 1) % 3][h]) / Math.sqrt(3);
    }
    table.fill(re, im);
    return table;
  }

  private static double[] scaled(double[] a, double by) {
    return Arrays.stream(a).map(x -> by * x).toArray();
  }
}
