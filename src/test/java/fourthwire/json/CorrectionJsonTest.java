package fourthwire.json;

import static org.assertj.core.api.Assertions.assertThat;

import fourthwire.metering.Correction;
import fourthwire.metering.Correction.Rows;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;

/** A correction comes back from its document, every kind of step. */
class CorrectionJsonTest {
  @Test
  void everyStepComesBack() {
    Rows some = new Rows(3, 90);
    Rows rest = new Rows(7, Long.MAX_VALUE);
    Correction all =
        Correction.of(
            "everything at once",
            new Correction.LeaveOut(List.of("L1.rms_a", "N.rms_a"), some),
            new Correction.KeepWithin("L1.rms_v", -0.5, 412.25),
            new Correction.DropRepeats(some),
            new Correction.DropRows(some),
            new Correction.ShiftClock(-217_000, rest),
            new Correction.TurnSign(List.of("L2.active_w"), some),
            new Correction.Scale(List.of("L3.rms_a"), Math.sqrt(3), rest),
            new Correction.Reorder(Map.of("L1.rms_a", "L2.rms_a"), some),
            new Correction.SumLines("active_w", Rows.ALL),
            new Correction.FormDistortion("L1.current_thd_percent", some));
    assertThat(CorrectionJson.read(CorrectionJson.write(all).toString())).isEqualTo(all);
  }
}
