package fourthwire.load;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import fourthwire.quantity.Spectrum;
import java.util.Map;
import java.util.stream.Stream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Six-pulse rectifiers against a circuit simulator with the same diodes. */
class SixPulseTest {
  static Stream<Map<String, String>> threePhase() {
    return RectifierReference.cases("3ph_sixpulse").stream();
  }

  @ParameterizedTest
  @MethodSource("threePhase")
  void everyPhasorAgreesWithTheCircuitSimulator(Map<String, String> row) {
    // Source: load/rectifiers/README.md; accepted 0.4 % of the fundamental, rms 0.2 %, factor
    // 0.002.
    Spectrum reference = RectifierReference.spectrum(row.get("id"));
    Spectrum computed = solve(row);
    double fundamental = reference.magnitude(1);
    for (int h = 1; h <= 39; h++) {
      assertThat(computed.at(h).minus(reference.at(h)).magnitude())
          .as("order %d", h)
          .isLessThan(0.004 * fundamental);
    }
    Map<String, String> summary = RectifierReference.summary(row.get("id"));
    double rms = RectifierReference.number(summary, "Irms");
    assertThat(computed.rms()).isCloseTo(rms, within(0.002 * rms));
    assertThat(computed.re(1) / computed.rms())
        .isCloseTo(RectifierReference.number(summary, "PF_source"), within(0.002));
  }

  private static Spectrum solve(Map<String, String> row) {
    BridgeLoad load =
        new BridgeLoad(
            RectifierReference.number(row, "P_dc_W"),
            RectifierReference.number(row, "C_uF") * 1e-6,
            RectifierReference.number(row, "R_line_ohm"),
            RectifierReference.number(row, "L_line_uH") * 1e-6,
            RectifierReference.number(row, "R_dc_ohm"),
            RectifierReference.number(row, "L_dc_uH") * 1e-6,
            new Diode(3e-11, 1.2, 1e-3));
    PortSpectra current = new PortSpectra(3);
    new SixPulse(load, RectifierReference.number(row, "f_Hz"))
        .newSolver()
        .solve(
            RectifierReference.emf(row, 3),
            RectifierReference.number(row, "Rs_ohm"),
            RectifierReference.number(row, "Ls_uH") * 1e-6,
            current);
    return current.spectrum(0);
  }
}
