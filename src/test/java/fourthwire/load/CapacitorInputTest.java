package fourthwire.load;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import fourthwire.quantity.Spectrum;
import java.util.Map;
import java.util.stream.Stream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Capacitor-input rectifiers against a circuit simulator with the same diodes. */
class CapacitorInputTest {
  static Stream<Map<String, String>> singlePhase() {
    return RectifierReference.cases("1ph_bridge").stream();
  }

  @ParameterizedTest
  @MethodSource("singlePhase")
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
    double v = RectifierReference.emf(row, 1).spectrum(0).rms();
    double watts = activePower(RectifierReference.emf(row, 1).spectrum(0), computed);
    assertThat(watts / (v * computed.rms()))
        .isCloseTo(RectifierReference.number(summary, "PF_source"), within(0.002));
  }

  private static double activePower(Spectrum v, Spectrum i) {
    double sum = 0;
    for (int h = 1; h <= Spectrum.HIGHEST_ORDER; h++) {
      sum += v.re(h) * i.re(h) + v.im(h) * i.im(h);
    }
    return sum;
  }

  private static Spectrum solve(Map<String, String> row) {
    BridgeLoad load =
        new BridgeLoad(
                RectifierReference.number(row, "P_dc_W"),
                RectifierReference.number(row, "C_uF") * 1e-6,
                RectifierReference.number(row, "Rb_ohm"),
                RectifierReference.number(row, "Lb_uH") * 1e-6,
                0,
                0,
                new Diode(3e-11, 1.2, 1e-3))
            .parallel(RectifierReference.number(row, "n_units"));
    PortSpectra current = new PortSpectra(1);
    new CapacitorInput(load, RectifierReference.number(row, "f_Hz"))
        .newSolver()
        .solve(
            RectifierReference.emf(row, 1),
            RectifierReference.number(row, "Rs_ohm"),
            RectifierReference.number(row, "Ls_uH") * 1e-6,
            current);
    return current.spectrum(0);
  }
}
