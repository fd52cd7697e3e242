package fourthwire.intake.reading;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import fourthwire.intake.reading.upload.FormatReader;
import fourthwire.metering.CaptureResult;
import fourthwire.metering.QualityFinding;
import fourthwire.metering.RawFile;
import fourthwire.metering.Reading;
import fourthwire.quantity.Conductor;
import fourthwire.quantity.Figure;
import java.util.List;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;

/**
 * A real building main, 347/600 V, 60 Hz, four cycles. Figures: SOURCE.txt beside the record,
 * computed there with numpy; distortion to order 50 with the same.
 */
class BuildingMainTest {
  private static Reading reading;
  private static CaptureResult result;

  /** Before each test, so that each is reported as skipped where the record is absent. */
  @BeforeEach
  void read() {
    List<RawFile> files =
        List.of(
            Files.open("building-main/building_main_1999.cfg"),
            Files.open("building-main/building_main_1999.dat"));
    ReadingSetting setting = Files.setting(60);
    ReadingReader reader = new FormatReader();
    reading = reader.read(files, reader.plan(files, setting), setting, (share, message) -> true);
    result = reading.capture().orElseThrow();
  }

  private static double value(Figure figure) {
    return figure.value().orElseThrow();
  }

  @Test
  void lineCurrentsAre126And151And167Amps() {
    assertThat(value(result.current().get(Conductor.L1).rmsA())).isEqualTo(126, within(0.5));
    assertThat(value(result.current().get(Conductor.L2).rmsA())).isEqualTo(151, within(0.5));
    assertThat(value(result.current().get(Conductor.L3).rmsA())).isEqualTo(167, within(0.5));
  }

  @Test
  void currentDistortionIs7point0And8point9And4point5Percent() {
    assertThat(value(result.current().get(Conductor.L1).thdPercent())).isEqualTo(7.0, within(0.1));
    assertThat(value(result.current().get(Conductor.L2).thdPercent())).isEqualTo(8.9, within(0.1));
    assertThat(value(result.current().get(Conductor.L3).thdPercent())).isEqualTo(4.5, within(0.1));
  }

  @Test
  void voltageDistortionIs1point1To1point3Percent() {
    for (String line : List.of("L1", "L2", "L3")) {
      assertThat(value(result.voltage().get(line).thdPercent())).isBetween(1.05, 1.35);
    }
  }

  @Test
  void powerFactorIs0point92To0point93OnEveryLine() {
    for (Conductor line : List.of(Conductor.L1, Conductor.L2, Conductor.L3)) {
      assertThat(value(result.powerByLine().get(line).powerFactor())).isBetween(0.915, 0.935);
    }
  }

  /**
   * By hand with numpy from the record: Se = 3·Ve·Ie with Ie from the three lines alone is 0.921.
   * Its fourth channel is not the neutral, so no neutral current was measured.
   */
  @Test
  void theApparentPowerOfAllLinesLeavesOutANeutralThatWasNotMeasured() {
    assertThat(value(result.power().powerFactor())).isEqualTo(0.921, within(0.001));
    assertThat(result.powerBasis()).contains("without the neutral");
  }

  @Test
  void cyclesAreDecidedFromTheSignal() {
    assertThat(result.cycles()).isEqualTo(4);
    // 512 samples a cycle at 30707.244 Hz is 59.975 Hz, although the record states 60.
    assertThat(result.frequencyHz()).isEqualTo(59.975, within(0.02));
    assertThat(result.basis()).contains("Four cycles").contains("no standard aggregation");
    assertThat(reading.quality())
        .extracting(QualityFinding::code)
        .contains(QualityFinding.SHORT_RECORD);
  }

  @Test
  void theFourthCurrentIsNotTheSumOfTheLines() {
    assertThat(value(result.current().get(Conductor.N).rmsA())).isEqualTo(42.05, within(0.05));
    assertThat(reading.quality())
        .anySatisfy(
            f -> {
              assertThat(f.code()).isEqualTo(QualityFinding.NEUTRAL_NOT_SUM);
              assertThat(f.sentence()).contains("I4").contains("42.0");
            });
  }
}
