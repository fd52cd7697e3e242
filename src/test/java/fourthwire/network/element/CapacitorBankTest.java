package fourthwire.network.element;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import fourthwire.network.Excitation;
import fourthwire.network.NetworkBuilder;
import fourthwire.network.TreeNetwork;
import java.util.OptionalDouble;
import org.junit.jupiter.api.DisplayName;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Banks and tuned filters against published worked examples (ids of the check values). */
class CapacitorBankTest {
  private static CapacitorBank bank(double kvar, double ratedV, double detuningPercent) {
    return CapacitorBank.detuned(kvar, ratedV, detuningPercent, OptionalDouble.empty());
  }

  @ParameterizedTest
  @CsvSource({"5.67,4.2", "7,3.78", "14,2.67"})
  @DisplayName("C3 (M): tuning order of usual detuned banks")
  void tuningOrders(double detuningPercent, double order) {
    assertThat(bank(50, 400, detuningPercent).tuningOrder().orElseThrow())
        .isCloseTo(order, within(0.005));
  }

  @Test
  @DisplayName("C4 to C9 (P): 80 kvar, 525 V, 50 Hz, 7 %")
  void detunedBankExample() {
    // Manufacturer's worked example (WE8 of the worked examples).
    CapacitorBank bank = bank(80, 525, 7);
    assertThat(50 * bank.tuningOrder().orElseThrow()).as("C4").isCloseTo(189, within(0.1));
    assertThat(bank.capacitiveOhm()).as("C5").isCloseTo(3.445, within(0.001));
    assertThat(1000 * bank.capacitanceF(50)).as("C6").isCloseTo(0.924, within(0.001));
    assertThat(1000 * bank.inductanceH(50)).as("C7").isCloseTo(0.768, within(0.001));
    assertThat(bank.kvarAt(525)).as("C8").isCloseTo(86.025, within(0.01));
    assertThat(bank.kvarAt(400)).as("C9").isCloseTo(49.9, within(0.1));
  }

  @Test
  @DisplayName("C10, C11 (X): capacitor voltage of a filter tuned to 4.7")
  void tunedFilter() {
    CapacitorBank filter = CapacitorBank.tuned(100, 480, 4.7, 50);
    assertThat(filter.voltageRise()).isCloseTo(1.04742, within(1e-4));
    assertThat(filter.voltageRise()).isCloseTo(1 / (1 - 1 / (4.7 * 4.7)), within(1e-12));
    assertThat(filter.tuningOrder().orElseThrow()).isCloseTo(4.7, within(1e-12));
    // Quality factor n·X_L/R (IEEE 1531-2003, from memory): at the tuned order only R is left.
    double[] siemens = new double[6];
    Shunt.ThreeTerminal legs = (Shunt.ThreeTerminal) filter.shunt();
    legs.admittance().at(4.7, siemens);
    double ohm = 480.0 * 480 / 100e3 / 4.7 / 50;
    assertThat(siemens[0]).isCloseTo(1 / ohm, within(1e-9 / ohm));
    assertThat(siemens[4]).isZero();
  }

  @Test
  @DisplayName("A bank draws its reactive power from the line, and two draw twice that")
  void drawsItsReactivePower() {
    // Power of a capacitor, Q = V²/(X_C - X_L), exact.
    for (double banks : new double[] {1, 2}) {
      NetworkBuilder net = new NetworkBuilder();
      int supply =
          net.source(SourceImpedance.threeWire(SeriesImpedance.NONE, SeriesImpedance.NONE));
      net.shunt(supply, bank(80, 525, 7).times(banks).shunt());
      TreeNetwork network = net.build();
      Excitation emf =
          network
              .excitation()
              .threePhaseEmf(1, fourthwire.quantity.Phasor.polar(400 / Math.sqrt(3), 0));
      double amps = network.factor(1).solve(emf).current(supply, 0).magnitude();
      assertThat(Math.sqrt(3) * 400 * amps / 1000).isCloseTo(49.9354 * banks, within(0.001));
    }
  }

  @Test
  @DisplayName("An impossible bank is refused")
  void refusesNonsense() {
    assertThatThrownBy(() -> bank(0, 400, 7)).hasMessageContaining("above 0");
    assertThatThrownBy(() -> bank(50, 400, 100)).hasMessageContaining("less than the capacitor");
    assertThatThrownBy(() -> bank(50, 400, -1)).hasMessageContaining("0 or more");
  }
}
