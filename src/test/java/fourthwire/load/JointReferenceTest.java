package fourthwire.load;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import fourthwire.load.model.PortSpectra;
import fourthwire.load.model.SharedSource;
import fourthwire.load.rectifier.node.NodeRectifiers;
import fourthwire.quantity.Spectrum;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * Rows of rectifiers on one node against a circuit simulator that has them all in one circuit:
 * {@code load/rectifiers/README.md}. Accepted, row by row: each phasor to order 39 within 0.2 % of
 * the fundamental, rms within 0.1 %.
 */
class JointReferenceTest {
  static Stream<JointReference> cases() {
    return JointReference.all().stream();
  }

  @ParameterizedTest
  @MethodSource("cases")
  void everyRowAgreesWithTheCircuitSimulator(JointReference given) {
    PortSpectra[] computed = given.computed();
    for (int row = 0; row < computed.length; row++) {
      Spectrum simulated = given.simulated(row);
      for (int h = 1; h <= 39; h++) {
        assertThat(computed[row].spectrum(0).at(h).minus(simulated.at(h)).magnitude())
            .as("row %d, order %d", row + 1, h)
            .isLessThan(0.002 * simulated.magnitude(1));
      }
      assertThat(computed[row].spectrum(0).rms())
          .isCloseTo(simulated.rms(), within(0.001 * simulated.rms()));
    }
  }

  /** A bridge by itself. */
  @ParameterizedTest
  @MethodSource("single")
  void oneBridgeAgreesToo(RectifierReference given) {
    PortSpectra[] current = {new PortSpectra(1)};
    SharedSource source =
        new SharedSource() {
          @Override
          public double ohm(int load, int other) {
            return given.number("Rs_ohm");
          }

          @Override
          public double henry(int load, int other) {
            return given.number("Ls_uH") * 1e-6;
          }
        };
    new NodeRectifiers(List.of(given.load()), given.number("f_Hz"))
        .solve(new PortSpectra[] {given.emf()}, source, current);
    Spectrum simulated = given.simulated("a");
    for (int h = 1; h <= 39; h++) {
      assertThat(current[0].spectrum(0).at(h).minus(simulated.at(h)).magnitude())
          .as("order %d", h)
          .isLessThan(0.002 * simulated.magnitude(1));
    }
  }

  static Stream<RectifierReference> single() {
    return RectifierReference.all().stream()
        .filter(c -> !c.threePhase() && c.number("L_dc_uH") == 0);
  }

  /** Equal units draw the same whatever rows they stand in: exact by symmetry. */
  @Test
  void aRowInTwoPartsDrawsWhatItDoesInOne() {
    JointReference given = JointReference.all().get(1);
    PortSpectra[] parts = given.computed();
    PortSpectra one = new PortSpectra(1);
    new NodeRectifiers(List.of(given.loads().get(1).parallel(25)), given.number(0, "f_Hz"))
        .solve(new PortSpectra[] {given.emf()}, given.source(), new PortSpectra[] {one});
    for (int h = 1; h <= Spectrum.HIGHEST_ORDER; h++) {
      assertThat(parts[1].spectrum(0).at(h).minus(one.spectrum(0).at(h).times(0.04)).magnitude())
          .as("order %d", h)
          .isLessThan(1e-9 * one.spectrum(0).magnitude(1));
    }
  }
}
