package fourthwire.intake.reading.heading;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Headings as meters write them, common practice, no source; the words beside are of one file. */
class LogHeadingsTest {
  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      nullValues = "-",
      value = {
        "VA | VB VC | L1.rms_v | 1",
        "VA | V A kW | total.apparent_va | 1",
        "VA total | VB | total.apparent_va | 1",
        "W_sum | V1 A1 | total.active_w | 1",
        "A1 | V1 W1 | L1.rms_a | 1",
        "Voltage A | Voltage B | L1.rms_v | 1",
        "cos φ total | x | total.displacement_factor | 1",
        "THD-F U1 [%] | x | L1.voltage_thd_percent | 1",
        "IL1 h05 A | x | L1.current_h5_a | 1",
        "I L1 H3 Winkel [°] | x | L1.current_h3_deg | 1",
        "Volts L1-2 | x | L1-L2.rms_v | 1",
        "P3ph(kW) | x | total.active_w | 1000",
        "Wirkleistung gesamt (kW) | x | total.active_w | 1000",
        "PT | PR PS | L3.active_w | 1",
        "L1 kW | x | L1.active_w | 1000",
        "L1 [kW] | x | L1.active_w | 1000",
        "L1_kW | x | L1.active_w | 1000",
        "A kW | B | L1.active_w | 1000",
        "L1 W | x | L1.active_w | 1",
        "W L1 | x | L1.active_w | 1",
        "L2 kvar | x | L2.reactive_var | 1000",
        "L3 kVA | x | L3.apparent_va | 1000",
        "L1 kWh | x | L1.energy_wh | 1000",
        "L1 A | x | L1.rms_a | 1",
        "L1 (V) | x | L1.rms_v | 1",
        "L1 [V] | x | L1.rms_v | 1",
        "L1 Amps | x | L1.rms_a | 1",
        "L1 Volts | x | L1.rms_v | 1",
        "L1-L2 V | x | L1-L2.rms_v | 1",
        "N (A) | x | N.rms_a | 1",
        "S (kVA) | x | total.apparent_va | 1000",
        "R kW | x | active_w | 1",
        "AC (V) | x | rms_v | 1",
        "A | x | - | 1",
        "Transient L1 (V) | x | - | 1",
        "kW export | x | - | 1",
        "kW import | x | total.active_w | 1000",
        "L1 power factor fundamental | x | L1.displacement_factor | 1",
        "L1 THD-R current (%) | x | - | 1",
        "L1 THD-F current (%) | x | L1.current_thd_percent | 1",
        "THD-R current (%) | THD-S THD-T | L1.current_thd_percent | 1",
        "Panel 2 I1 (A) | I1 | - | 1",
        "Panel 2 I1 (A) | x | L1.rms_a | 1",
        "Panel 2 kW | x | total.active_w | 1000",
        "kW demand | x | total.active_w | 1000",
        "kW demand | W_total | - | 1",
        "THD-R I1 [%] | x | - | 1",
        "K factor L1 | x | - | 1",
        "Pst L1 | x | - | 1",
        "I1 (x10 A) | x | L1.rms_a | 10",
        "I1 [0.1 A] | x | L1.rms_a | 0.1",
        "I1 [10³ A] | x | L1.rms_a | 1000",
        "I1 (A/10) | x | L1.rms_a | 0.1",
        "I1 (dA) | x | L1.rms_a | 0.1",
        "I1 (deciamp) | x | L1.rms_a | 0.1",
        "I1 [x10 kA] | x | L1.rms_a | 10000",
        "Current L1 (A, multiply by 80) | x | L1.rms_a | 80",
        "I1 (A x100) | x | - | 1",
        "I1 (A*10) | x | - | 1",
        "I1 (400 A) | x | - | 1",
        "I1 (A) (x10) | x | - | 1",
        "I1 (A) [x10 A] | x | - | 1",
        "I1 (hA) | x | - | 1",
        "I1 (A, 3 wires) | x | - | 1",
        "I1 (tenths of A) | x | - | 1",
        "Current L1 (A, avg) | x | L1.rms_a | 1",
        "Current (Panel A) L1 [A] | x | L1.rms_a | 1",
        "I1 h5 (%rms) | x | - | 1",
        "I1 H3 (% RMS) | x | - | 1",
        "I1 h5 (% of rms) | x | - | 1",
        "I1 h5 (%r) | x | - | 1",
        "I1 h5 (% of fundamental) | x | L1.current_h5_percent | 1",
        "I1 h5 (% of rated) | x | - | 1",
        "I1 THD (%RMS) | x | - | 1",
        "I1 THD (% of rms) | x | - | 1",
        "I1 THD-R (%) | x | - | 1",
        "THD-R I1 | x | - | 1",
        "THDr I1 | x | - | 1",
        "I1 THD (%) | x | L1.current_thd_percent | 1",
        "tan phi | x | - | 1",
        "U1 (Vpp) | x | - | 1",
        "U1 (Vpk) | x | - | 1",
        "Iu (A) | Iv Iw | L1.rms_a | 1",
        "Iw | Iu Iv | L3.rms_a | 1",
        "Iu (A) | Iv | rms_a | 1",
        "Uv | Uu Uw | L2.rms_v | 1",
        "Uvw (V) | Uuv Uwu | L2-L3.rms_v | 1",
        "Current W (A) | Current_U Current_V | L3.rms_a | 1",
        "Vng | x | N.rms_v | 1",
        "Vn-g (V) | Van | N.rms_v | 1",
        "Neutral to ground voltage (V) | x | N.rms_v | 1",
        "Neutral-ground current (A) | x | - | 1"
      })
  void saysWhatItHolds(String heading, String others, String quantity, double factor) {
    List<String> file = new java.util.ArrayList<>(List.of(heading));
    file.addAll(List.of(others.split(" ")));
    Heading found = Heading.ofLog(file).getOrDefault(heading, Heading.none());
    assertThat(found.quantity()).isEqualTo(quantity == null ? "" : quantity);
    assertThat(found.factor()).isEqualTo(factor);
  }
}
