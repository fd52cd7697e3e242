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
        "THD-R I1 [%] | x | - | 1",
        "K factor L1 | x | - | 1",
        "Pst L1 | x | - | 1"
      })
  void saysWhatItHolds(String heading, String others, String quantity, double factor) {
    List<String> file = new java.util.ArrayList<>(List.of(heading));
    file.addAll(List.of(others.split(" ")));
    Heading found = Heading.ofLog(file).getOrDefault(heading, Heading.none());
    assertThat(found.quantity()).isEqualTo(quantity == null ? "" : quantity);
    assertThat(found.factor()).isEqualTo(factor);
  }
}
