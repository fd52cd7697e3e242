package fourthwire.load;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import fourthwire.load.model.PortSpectra;
import fourthwire.quantity.Spectrum;
import java.util.stream.Stream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * Rectifier models against a circuit simulator with the same diodes: {@code
 * load/rectifiers/README.md}. Accepted: each phasor to order 39 within 0.4 % of the fundamental,
 * rms within 0.2 %, power factor within 0.002.
 */
class RectifierReferenceTest {
  static Stream<RectifierReference> cases() {
    return RectifierReference.all().stream();
  }

  @ParameterizedTest
  @MethodSource("cases")
  void everyPhasorAgreesWithTheCircuitSimulator(RectifierReference given) {
    PortSpectra computed = given.computed();
    check(given, computed.spectrum(0), given.simulated("a"), 0);
    if (given.threePhase() && given.simulated("b").rms() > 0) {
      check(given, computed.spectrum(1), given.simulated("b"), 1);
    }
  }

  private static void check(
      RectifierReference given, Spectrum computed, Spectrum simulated, int port) {
    double fundamental = simulated.magnitude(1);
    for (int h = 1; h <= 39; h++) {
      assertThat(computed.at(h).minus(simulated.at(h)).magnitude())
          .as("order %d", h)
          .isLessThan(0.004 * fundamental);
    }
    assertThat(computed.rms()).isCloseTo(simulated.rms(), within(0.002 * simulated.rms()));
    Spectrum emf = given.emf().spectrum(port);
    assertThat(powerFactor(emf, computed)).isCloseTo(powerFactor(emf, simulated), within(0.002));
  }

  private static double powerFactor(Spectrum v, Spectrum i) {
    double sum = 0;
    for (int h = 1; h <= Spectrum.HIGHEST_ORDER; h++) {
      sum += v.re(h) * i.re(h) + v.im(h) * i.im(h);
    }
    return sum / (v.rms() * i.rms());
  }
}
