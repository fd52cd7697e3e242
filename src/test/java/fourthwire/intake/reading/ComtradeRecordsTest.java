package fourthwire.intake.reading;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import fourthwire.intake.reading.upload.FormatReader;
import fourthwire.metering.CaptureResult;
import fourthwire.metering.QualityFinding;
import fourthwire.metering.RawFile;
import fourthwire.metering.Reading;
import fourthwire.metering.ReadingMapping;
import fourthwire.quantity.Conductor;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.Consumer;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/**
 * Records of every revision and format, and as recorders really write them, of a signal known in
 * closed form: 231 V and 80 A, lagging 30°, with 3 % and 20 % of the 5th order.
 */
class ComtradeRecordsTest {
  private static final double RMS_I = RecordWriter.AMPS * Math.sqrt(1 + 0.04);

  private static Reading read(List<RawFile> files, ReadingSetting setting) {
    ReadingReader reader = new FormatReader();
    return reader.read(files, reader.plan(files, setting), setting, (share, message) -> true);
  }

  private static Reading read(List<RawFile> files) {
    return read(files, Files.setting(50));
  }

  private static CaptureResult checked(List<RawFile> files) {
    Reading reading = read(files);
    CaptureResult r = reading.capture().orElseThrow();
    assertThat(r.frequencyHz()).isEqualTo(50, within(2e-3));
    for (int k = 0; k < 3; k++) {
      CaptureResult.CurrentFigures i = r.current().get(Conductor.values()[k]);
      assertThat(i.rmsA().value().orElseThrow()).isEqualTo(RMS_I, within(1e-3 * RMS_I));
      assertThat(i.thdPercent().value().orElseThrow()).isEqualTo(20, within(0.05));
      assertThat(r.voltage().get("L" + (k + 1)).fundamentalV().value().orElseThrow())
          .isEqualTo(231, within(0.2));
      double angle = r.spectrum().get(Conductor.values()[k]).at(1).degrees();
      assertThat(Math.IEEEremainder(angle + 30 + 120 * k, 360)).isEqualTo(0, within(0.05));
    }
    return r;
  }

  @ParameterizedTest(name = "{0} {1}")
  @CsvSource({
    "1991, ASCII", "1991, BINARY", "1999, ASCII", "1999, BINARY",
    "2013, ASCII", "2013, BINARY", "2013, BINARY32", "2013, FLOAT32"
  })
  void everyRevisionAndFormat(int revision, String format) {
    RecordWriter w = new RecordWriter();
    w.revision = revision;
    w.format = format;
    if (revision == 1991) {
      // That revision knows no ratio: its currents are as written.
      CaptureResult r = read(w.files()).capture().orElseThrow();
      assertThat(r.current().get(Conductor.L1).rmsA().value().orElseThrow())
          .isEqualTo(RMS_I / RecordWriter.RATIO, within(2e-3));
    } else {
      checked(w.files());
      checked(w.combined());
    }
    assertThat(read(w.files()).period().orElseThrow().from().toString())
        .startsWith("2026-02-23T09:20:30.123456");
  }

  static RecordWriter bent(Consumer<RecordWriter> bend) {
    RecordWriter w = new RecordWriter();
    bend.accept(w);
    return w;
  }

  /** A byte order mark first, and a comma behind the name of the data's format. */
  @Test
  void marksThatOtherProgramsLeaveAreNoFault() throws java.io.IOException {
    RecordWriter w = bent(r -> r.format = "ASCII");
    String text = new String(w.combined().get(0).open().readAllBytes(), StandardCharsets.UTF_8);
    assertThat(text).contains("ASCII\r\n");
    checked(List.of(Files.of("record.cff", "\uFEFF" + text)));
    checked(List.of(Files.of("record.cff", text.replaceFirst("ASCII\r\n(?!-)", "ASCII,\r\n"))));
  }

  @Test
  void asRecordersReallyWriteThem() {
    checked(bent(w -> w.lineEnd = "\n").files());
    checked(bent(w -> w.digital = 0).files());
    checked(bent(w -> w.digital = 33).files());
    checked(bent(w -> w.skewS = 60e-6).files());
    checked(bent(w -> w.statesRate = false).files());
    checked(
        bent(w -> {
              w.format = "ASCII";
              w.ownTimes = false;
            })
            .files());
    checked(
        bent(w -> {
              w.format = "ASCII";
              w.statesRate = false;
              w.timeMultiplier = 1.5;
            })
            .files());
  }

  @Test
  void twoRatesAreFittedAndSaidSo() {
    CaptureResult r =
        checked(
            bent(w -> {
                  w.secondRateHz = 12800;
                  w.samples = 3200;
                })
                .files());
    assertThat(r.basis()).contains("uneven");
    assertThat(r.windows()).isEmpty();
  }

  @Test
  void missingSamplesAreFilledAndCounted() {
    for (String format : List.of("ASCII", "BINARY", "BINARY32", "FLOAT32")) {
      RecordWriter w = new RecordWriter();
      w.revision = 2013;
      w.format = format;
      w.missingEvery = 40;
      checked(w.files());
      assertThat(read(w.files()).quality())
          .anySatisfy(
              q -> {
                assertThat(q.code()).isEqualTo(QualityFinding.MISSING_VALUES);
                assertThat(q.sentence()).contains("IB").contains("40 of 1600");
              });
    }
  }

  /**
   * Lines cut from the end, garbage behind the data, text in other encodings, names with commas.
   */
  @Test
  void whatIsMissingOrWrongWhereNoFigureHangsOnIt() {
    RecordWriter w = new RecordWriter();
    List<String> lines = w.configuration();
    for (int cut = 1; cut <= 4; cut++) {
      String cfg = String.join("\n", lines.subList(0, lines.size() - cut));
      checked(List.of(Files.of("r.cfg", cfg), Files.of("r.dat", w.data())));
    }
    List<String> named = new ArrayList<>(lines);
    named.set(2, named.get(2).replace("1,VA,", "1,VA, incomer,"));
    named.set(0, "Halle Süd,Gerät,1999");
    byte[] utf16 = ("\uFEFF" + String.join("\r\n", named)).getBytes(StandardCharsets.UTF_16LE);
    checked(List.of(Files.of("r.cfg", utf16), Files.of("r.dat", w.data())));

    RecordWriter text = bent(t -> t.format = "ASCII");
    String rows = new String(text.data(), StandardCharsets.US_ASCII);
    for (String end : List.of("\u001A", "\r\n\r\n", "end of data\r\n", "1601,250000,1,2\r\n")) {
      checked(List.of(Files.of("r.cfg", text.configurationBytes()), Files.of("r.dat", rows + end)));
    }
    assertThatThrownBy(
            () ->
                read(
                    List.of(
                        Files.of("r.cfg", text.configurationBytes()),
                        Files.of("r.dat", rows.replaceFirst("(?m)^900,.*$", "900,oops")))))
        .hasMessageContaining("row 900");
  }

  @Test
  void statusWordsThatAreNotThere() {
    RecordWriter with = new RecordWriter();
    RecordWriter without = bent(w -> w.digital = 0);
    checked(
        List.of(Files.of("r.cfg", with.configurationBytes()), Files.of("r.dat", without.data())));
  }

  @Test
  void aRecordThatTellsNoTimeIsAskedForItsRate() {
    RecordWriter w =
        bent(
            x -> {
              x.statesRate = false;
              x.ownTimes = false;
            });
    try {
      new FormatReader().plan(w.files(), Files.setting(50));
    } catch (ReadingRefusedException e) {
      assertThat(e.questions()).extracting("part").containsExactly("sample_rate_hz");
      ReadingMapping given =
          new ReadingMapping(
              Optional.empty(), ReadingMapping.Time.FROM_FILE, OptionalDouble.of(6400), Map.of());
      ReadingSetting s = Files.setting(50);
      read(
          w.files(),
          new ReadingSetting(
              s.siteZone(),
              s.nominalHz(),
              Optional.of(given),
              s.remembered(),
              s.ctReversed(),
              s.ctRatio()));
      return;
    }
    throw new AssertionError("was not asked");
  }

  @Test
  void channelsThatAreNotClearAreAsked() {
    RecordWriter w = new RecordWriter();
    String cfg =
        String.join("\n", w.configuration())
            .replace("4,IA,A,", "4,Feeder,,")
            .replace(",IB,B", ",IB,C");
    try {
      new FormatReader()
          .plan(List.of(Files.of("r.cfg", cfg), Files.of("r.dat", w.data())), Files.setting(50));
    } catch (ReadingRefusedException e) {
      assertThat(e.questions()).extracting("part").containsExactly("columns.Feeder", "columns.IB");
      return;
    }
    throw new AssertionError("was not asked");
  }
}
