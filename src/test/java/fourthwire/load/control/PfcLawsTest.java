package fourthwire.load.control;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import fourthwire.load.model.NoSteadyStateException;
import fourthwire.load.model.PortSpectra;
import fourthwire.quantity.Spectrum;
import java.util.Random;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * Power-factor-corrected supplies on seeded random voltages and sources up to ten times too soft:
 * each ends with a current that brings exactly the supply's power to its terminals, or with a named
 * reason.
 */
class PfcLawsTest {
  private static final int SETS = 500;

  @ParameterizedTest(name = "seed {0}")
  @ValueSource(longs = {1, 2})
  void theTerminalsGetTheSuppliesPowerOrTheReasonIsSaid(long seed) {
    Random r = new Random(seed);
    int solved = 0;
    for (int n = 0; n < SETS; n++) {
      double watts = 5 * Math.pow(1000, r.nextDouble());
      double base = 230 * 230 / watts;
      double ohm = base * Math.pow(10, -4 + 5 * r.nextDouble()) * r.nextDouble();
      double henry = r.nextInt(3) * 0.5 * base * Math.pow(10, -4 + 4 * r.nextDouble()) / 314.16;
      PortSpectra emf = emf(r);
      var supply =
          new PowerFactorCorrected(watts, 50, 0, 2 + 60 * r.nextDouble(), 0.1 * r.nextDouble());
      PortSpectra current = new PortSpectra(1);
      String given = "set " + n + ": " + watts + " W behind " + ohm + " ohm, " + henry + " H";
      try {
        supply.newSolver().solve(emf, ohm, henry, current);
        solved++;
        assertThat(terminalWatts(emf, current, ohm))
            .as(given)
            .isCloseTo(watts, within(1e-4 * watts));
      } catch (NoSteadyStateException none) {
        assertThat(none).as(given).hasMessageContaining("the source");
        assertThat(ohm + 314.16 * henry).as(given).isGreaterThan(0.05 * base);
      }
    }
    assertThat(solved).isGreaterThan(SETS / 2);
  }

  /** Power of the source less what its resistance takes. */
  private static double terminalWatts(PortSpectra emf, PortSpectra current, double ohm) {
    double watts = 0;
    for (int h = 1; h <= Spectrum.HIGHEST_ORDER; h++) {
      double re = current.re[0][h];
      double im = current.im[0][h];
      watts += emf.re[0][h] * re + emf.im[0][h] * im - ohm * (re * re + im * im);
    }
    return watts;
  }

  private static PortSpectra emf(Random r) {
    PortSpectra emf = new PortSpectra(1);
    int step = r.nextInt(4) == 0 ? 1 : 2;
    for (int h = 1; h <= 25; h += step) {
      double volts = h == 1 ? 230 * (0.9 + 0.2 * r.nextDouble()) : 230 * 0.05 / h * r.nextDouble();
      double angle = 2 * Math.PI * r.nextDouble();
      emf.re[0][h] = volts * Math.cos(angle);
      emf.im[0][h] = volts * Math.sin(angle);
    }
    return emf;
  }
}
