package fourthwire.intake.reading;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import fourthwire.metering.RawFile;
import fourthwire.metering.Reading;
import fourthwire.metering.ReadingKind;
import fourthwire.quantity.Conductor;
import java.util.List;
import java.util.Locale;
import org.junit.jupiter.api.Test;

/** Instantaneous values as CSV: signals of known amplitude, printed to four decimals. */
class TextCaptureTest {
  private static String csv(String heading, boolean time) {
    StringBuilder text = new StringBuilder(heading).append('\n');
    for (int k = 0; k < 2560; k++) {
      double t = k / 6400.0;
      double v = Math.sqrt(2) * 230 * Math.sin(2 * Math.PI * 50 * t);
      double i = Math.sqrt(2) * 10 * Math.sin(2 * Math.PI * 50 * t - Math.PI / 3);
      text.append(time ? String.format(Locale.ROOT, "%.3f,", 1000 * t) : "");
      text.append(String.format(Locale.ROOT, "%.4f,%.4f%n", v, i));
    }
    return text.toString();
  }

  @Test
  void theSampleRateIsFoundFromTheTimeColumn() {
    List<RawFile> files = List.of(Files.of("scope.csv", csv("Time [ms],U1 [V],I1 [A]", true)));
    ReadingReader reader = new FormatReader();
    ReadingPlan plan = reader.plan(files, Files.setting(50));
    assertThat(plan.kind()).isEqualTo(ReadingKind.CAPTURE);
    Reading r = reader.read(files, plan, Files.setting(50), (share, message) -> true);
    assertThat(r.sampleRateHz().orElseThrow()).isEqualTo(6400, within(0.1));
    var result = r.capture().orElseThrow();
    assertThat(result.frequencyHz()).isEqualTo(50, within(1e-3));
    assertThat(result.cycles()).isEqualTo(20);
    assertThat(result.current().get(Conductor.L1).rmsA().value().orElseThrow())
        .isEqualTo(10, within(1e-3));
    assertThat(result.powerByLine().get(Conductor.L1).powerFactor().value().orElseThrow())
        .isEqualTo(0.5, within(1e-4));
  }

  @Test
  void withoutATimeColumnTheSampleRateIsAsked() {
    List<RawFile> files = List.of(Files.of("scope.csv", csv("L1.v,L1.i", false)));
    try {
      new FormatReader().plan(files, Files.setting(50));
    } catch (ReadingRefusedException e) {
      assertThat(e.questions()).extracting("part").containsExactly("sample_rate_hz");
      assertThat(e.columns()).containsExactly("L1.v", "L1.i");
      return;
    }
    throw new AssertionError("was not refused");
  }
}
