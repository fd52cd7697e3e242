package fourthwire.intake.reading;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import fourthwire.intake.reading.upload.FormatReader;
import fourthwire.metering.RawFile;
import fourthwire.metering.Reading;
import fourthwire.metering.ReadingKind;
import fourthwire.quantity.Conductor;
import java.util.List;
import java.util.Locale;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

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

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "Sample rate: 6400 Hz",
        "Sample rate,6400",
        "Sampling frequency (kHz),6.4",
        "# sample_rate = 6.4 kHz"
      })
  void theSampleRateIsReadAboveTheTable(String line) {
    String csv = line + "\n\n" + csv("U1 [V],I1 [A]", false);
    List<RawFile> files = List.of(Files.of("scope.csv", csv));
    ReadingReader reader = new FormatReader();
    ReadingPlan plan = reader.plan(files, Files.setting(50));
    assertThat(plan.kind()).isEqualTo(ReadingKind.CAPTURE);
    assertThat(plan.mapping().sampleRateHz().orElseThrow()).isEqualTo(6400);
    Reading r = reader.read(files, plan, Files.setting(50), (share, message) -> true);
    assertThat(r.capture().orElseThrow().frequencyHz()).isEqualTo(50, within(1e-3));
  }

  @Test
  void rowsWithoutAnyTimeAreAskedForItsColumnOrTheSampleRate() {
    List<RawFile> files = List.of(Files.of("scope.csv", csv("U1 [V],I1 [A]", false)));
    try {
      new FormatReader().plan(files, Files.setting(50));
    } catch (ReadingRefusedException e) {
      assertThat(e.questions()).anySatisfy(q -> assertThat(q.message()).contains("sample_rate_hz"));
      return;
    }
    throw new AssertionError("was not refused");
  }

  private static String rows(String head, double fromS, double unitS, String separator, int count) {
    StringBuilder text = new StringBuilder(head).append("\r\n");
    for (int k = 0; k < count; k++) {
      double t = fromS + k / 6400.0;
      String v =
          String.format(Locale.ROOT, "%.4f", Math.sqrt(2) * 230 * Math.sin(100 * Math.PI * t));
      String i =
          String.format(Locale.ROOT, "%.5f", Math.sqrt(2) * 10 * Math.sin(100 * Math.PI * t));
      String row = String.format(Locale.ROOT, "%.9g", t / unitS) + separator + v + separator + i;
      text.append(separator.equals(";") ? row.replace('.', ',') : row).append("\r\n");
    }
    return text.toString();
  }

  /** Times before the trigger, units in or under the heading, lines above it, as scopes write. */
  @ParameterizedTest(name = "{0}")
  @CsvSource(
      delimiter = '|',
      value = {
        "time_s,U1 [V],I1 [A] | 1 | , | -0.1",
        "t,VA (V),IA (A) | 1 | , | 0",
        "Time (ms),VA (V),IA (A) | 0.001 | , | -25",
        "X;UL1 [V];IL1 [A] | 1 | ; | -0.05",
        "Zeit [µs];UL1 [V];IL1 [A] | 0.000001 | ; | 0",
        "Sample time,V1 (V),I1 (A) | 0.001 | , | 0",
        "Model;12~Date;2026-02-03~Record Length;2560~Sample Interval;0.00015625~~TIME;U1 [V];I1 [A]"
            + " | 1 | ; | -0.2"
      })
  void tablesAsScopesWriteThem(String head, double unitS, String separator, double from) {
    String csv = rows(head.replace("~", "\r\n"), from * unitS, unitS, separator, 2560);
    List<RawFile> files = List.of(Files.of("scope.csv", csv));
    ReadingReader reader = new FormatReader();
    ReadingPlan plan = reader.plan(files, Files.setting(50));
    assertThat(plan.kind()).isEqualTo(ReadingKind.CAPTURE);
    Reading r = reader.read(files, plan, Files.setting(50), (share, message) -> true);
    assertThat(r.sampleRateHz().orElseThrow()).isEqualTo(6400, within(0.1));
    var result = r.capture().orElseThrow();
    assertThat(result.voltage().get("L1").rmsV().value().orElseThrow())
        .isEqualTo(230, within(0.01));
    assertThat(result.current().get(Conductor.L1).rmsA().value().orElseThrow())
        .isEqualTo(10, within(1e-3));
  }

  @Test
  void timesRoundedToMillisecondsAreSetEvenly() {
    StringBuilder csv = new StringBuilder("Time (s),V1 (V),I1 (A)\n");
    for (int k = 0; k < 2560; k++) {
      double w = 2 * Math.PI * 50 * k / 6400;
      csv.append(
          String.format(
              Locale.ROOT,
              "%.3f,%.3f,%.4f%n",
              k / 6400.0,
              325.27 * Math.sin(w),
              14.142 * Math.sin(w)));
    }
    List<RawFile> files = List.of(Files.of("ms.csv", csv.toString()));
    ReadingReader reader = new FormatReader();
    ReadingPlan plan = reader.plan(files, Files.setting(50));
    Reading r = reader.read(files, plan, Files.setting(50), (share, message) -> true);
    assertThat(r.capture().orElseThrow().frequencyHz()).isEqualTo(50, within(0.01));
    assertThat(r.capture().orElseThrow().current().get(Conductor.L1).rmsA().value().orElseThrow())
        .isEqualTo(10, within(0.01));
    assertThat(r.notes()).anySatisfy(n -> assertThat(n).contains("set evenly"));
  }

  @Test
  void clockTimesOfMicrosecondsAreSamples() {
    StringBuilder csv = new StringBuilder("When,U1 [V],I1 [A]\n");
    java.time.LocalDateTime from = java.time.LocalDateTime.of(2026, 2, 23, 10, 0);
    for (int k = 0; k < 2000; k++) {
      double w = 2 * Math.PI * 50 * k / 5000;
      csv.append(
          from.plusNanos(200_000L * k)
              .format(java.time.format.DateTimeFormatter.ofPattern("dd/MM/yyyy HH:mm:ss.SSSSSS")));
      csv.append(
          String.format(Locale.ROOT, ",%.3f,%.4f%n", 325.27 * Math.sin(w), 14.14 * Math.sin(w)));
    }
    List<RawFile> files = List.of(Files.of("clock.csv", csv.toString()));
    ReadingReader reader = new FormatReader();
    ReadingPlan plan = reader.plan(files, Files.setting(50));
    assertThat(plan.kind()).isEqualTo(ReadingKind.CAPTURE);
    Reading r = reader.read(files, plan, Files.setting(50), (share, message) -> true);
    assertThat(r.sampleRateHz().orElseThrow()).isEqualTo(5000, within(0.1));
    assertThat(r.period().orElseThrow().from()).isEqualTo("2026-02-23T09:00:00Z");
  }
}
