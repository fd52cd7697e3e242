package fourthwire.intake.reading;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import fourthwire.intake.reading.comtrade.Comtrade;
import fourthwire.intake.reading.upload.FormatReader;
import fourthwire.metering.RawFile;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.time.LocalDateTime;
import java.util.Arrays;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;

/**
 * Small records of an open reader library's tests, revisions 1999 and 2013; see SOURCE.txt beside
 * them. Expected values are the files' own numbers times multiplier plus offset, by hand.
 */
class ComtradeSamplesTest {
  private static final double A = 0.1138916015625;
  private static final double B = 0.05694580078125;

  private static byte[] bytes(String name) {
    RawFile file = Files.open("reader-samples/" + name);
    try (var in = file.open()) {
      return in.readAllBytes();
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  private static Comtrade read(String stem) {
    return Comtrade.of(bytes(stem + ".cfg"), bytes(stem + ".dat"), OptionalDouble.empty());
  }

  private static double[] values(Comtrade record, int channel) {
    return record.samples(channel).first(record.time().count());
  }

  @Test
  void asciiOf2013() {
    Comtrade c = read("sample_ascii");
    assertThat(c.channels()).extracting("name").containsExactly("IA", "IB", "IC", "3I0");
    assertThat(c.time().count()).isEqualTo(40);
    assertThat(c.samples(0).at(0)).isEqualTo(-83 * A + B, within(1e-5));
    assertThat(c.samples(1).at(1)).isEqualTo(5 * A + B, within(1e-5));
    assertThat(c.time().rateHz().orElseThrow()).isEqualTo(1200, within(1e-9));
    assertThat(c.start()).contains(LocalDateTime.of(2011, 1, 12, 5, 55, 30, 75_011_000));
    assertThat(c.utcOffset()).contains("-05:30");
    assertThat(c.channels().get(0).toPrimary()).isEqualTo(933);
  }

  @Test
  void missingValuesAreNotNumbers() {
    Comtrade c =
        Comtrade.of(
            bytes("sample_ascii.cfg"), bytes("sample_ascii_missing.dat"), OptionalDouble.empty());
    assertThat(c.samples(0).at(1)).isNaN();
    assertThat(c.samples(1).at(2)).isNaN();
    assertThat(c.samples(2).at(3)).isNaN();
    assertThat(c.samples(0).at(0)).isEqualTo(-83 * A + B, within(1e-5));
    Comtrade binary =
        Comtrade.of(
            bytes("sample_bin.cfg"), bytes("sample_bin_missing.dat"), OptionalDouble.empty());
    assertThat(Arrays.stream(values(binary, 0)).filter(Double::isNaN).count()).isPositive();
  }

  @Test
  void oddEncodingsAndSubstituteCharacters() {
    double[] plain = values(read("sample_ascii"), 0);
    assertThat(values(read("sample_iso8859-1"), 0)).containsExactly(plain);
    assertThat(
            values(
                Comtrade.of(
                    bytes("sample_ascii_utf-8.cfg"),
                    bytes("sample_ascii.dat"),
                    OptionalDouble.empty()),
                0))
        .containsExactly(plain);
    assertThat(
            values(
                Comtrade.of(
                    bytes("sample_sub_char.cfg"),
                    bytes("sample_ascii.dat"),
                    OptionalDouble.empty()),
                0))
        .containsExactly(plain);
  }

  /** The record is there as text and as binary; its two multipliers differ by rounding. */
  @Test
  void binaryIsAsItsText() {
    Comtrade binary = read("sample_iso8859-1_bin");
    Comtrade text = read("sample_iso8859-1");
    assertThat(binary.time().count()).isEqualTo(40);
    for (int k = 0; k < 4; k++) {
      assertThat(values(binary, k)).containsExactly(values(text, k), within(5e-4));
    }
  }

  @Test
  void singleFiles() {
    assertThat(values(Comtrade.ofCombined(bytes("sample_ascii.cff"), OptionalDouble.empty()), 3))
        .containsExactly(values(read("sample_ascii"), 3));
    Comtrade f = Comtrade.ofCombined(bytes("sample_float32.cff"), OptionalDouble.empty());
    assertThat(f.time().count()).isEqualTo(301);
    assertThat(Arrays.stream(values(f, 0)).allMatch(Double::isFinite)).isTrue();
  }

  @Test
  void aZipOfBothFilesIsReadAsTheTwo() throws IOException {
    var out = new java.io.ByteArrayOutputStream();
    try (var zip = new java.util.zip.ZipOutputStream(out)) {
      for (String ending : new String[] {"cfg", "dat"}) {
        zip.putNextEntry(new java.util.zip.ZipEntry("folder/x." + ending));
        zip.write(bytes("sample_ascii." + ending));
        zip.closeEntry();
      }
    }
    var files = java.util.List.of(Files.of("upload.zip", out.toByteArray()));
    ReadingPlan plan = new FormatReader().plan(files, Files.setting(60));
    assertThat(plan.mapping().columns().values())
        .extracting("quantity")
        .containsExactly("L1.i", "L2.i", "L3.i", "N.i");
  }

  @Test
  void damageIsNamedWithItsLine() {
    String cfg = new String(bytes("sample_ascii.cfg"), java.nio.charset.StandardCharsets.UTF_8);
    assertThatThrownBy(
            () ->
                Comtrade.channels(
                    cfg.replace("8,4A,4D", "8,xA,4D")
                        .getBytes(java.nio.charset.StandardCharsets.UTF_8)))
        .hasMessageContaining("line 2");
    assertThatThrownBy(
            () ->
                Comtrade.channels(
                    cfg.replace("0.1138916015625", "zero")
                        .getBytes(java.nio.charset.StandardCharsets.UTF_8)))
        .hasMessageContaining("line 3");
    assertThatThrownBy(
            () ->
                new FormatReader()
                    .plan(java.util.List.of(Files.of("a.dat", "1,2")), Files.setting(60)))
        .hasMessageContaining(".cfg");
  }
}
