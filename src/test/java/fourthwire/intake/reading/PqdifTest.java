package fourthwire.intake.reading;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;
import static org.junit.jupiter.api.Assertions.assertTimeoutPreemptively;

import fourthwire.intake.reading.PqdifWriter.Instance;
import fourthwire.intake.reading.PqdifWriter.Observation;
import fourthwire.intake.reading.upload.FormatReader;
import fourthwire.metering.CaptureResult;
import fourthwire.metering.RawFile;
import fourthwire.metering.Reading;
import fourthwire.metering.ReadingKind;
import fourthwire.metering.ReadingMapping;
import fourthwire.quantity.Conductor;
import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * Interval data and waveforms from PQDIF, of files written here from their own layout. Numbers of
 * units and phases, value types and characteristics: IEEE 1159.3, the task force's list of standard
 * identifiers, version 1.5.
 */
class PqdifTest {
  private static final Instant START = Instant.parse("2026-02-23T09:00:00Z");
  private static final String RMS = "a6b31ae5";
  private static final String INSTANTANEOUS = "a6b31add";
  private static final String MIN = "67f6af98-f753";
  private static final String MAX = "67f6af99-f753";
  private static final String MEAN = "67f6af9a-f753";

  private static Reading read(byte[] file, Optional<ReadingKind> kind) {
    List<RawFile> files = List.of(Files.of("export.pqd", file));
    ReadingSetting s = Files.setting(50);
    ReadingSetting setting =
        new ReadingSetting(
            s.siteZone(),
            s.nominalHz(),
            kind.map(
                k ->
                    new ReadingMapping(
                        Optional.of(k),
                        ReadingMapping.Time.FROM_FILE,
                        OptionalDouble.empty(),
                        Map.of())),
            s.remembered(),
            s.ctReversed(),
            s.ctRatio());
    ReadingReader reader = new FormatReader();
    return reader.read(files, reader.plan(files, setting), setting, (share, message) -> true);
  }

  private static PqdifWriter writer(boolean compressed) {
    PqdifWriter w = new PqdifWriter(compressed);
    w.define("I1 trend", false, 1, 2, 7, RMS, false, MEAN, MIN, MAX);
    w.define("U1 trend", false, 1, 1, 6, RMS, false, MEAN);
    w.define("THD I1", false, 1, 2, 19, "a6b31aec", false, MEAN);
    w.define("P total", false, 13, 3, 9, "a6b31ae1", false, MEAN);
    w.define("Volts A", true, 1, 1, 6, INSTANTANEOUS, true, "67f6af97-f753");
    w.define("Amps A", true, 1, 2, 7, INSTANTANEOUS, true, "67f6af97-f753");
    return w;
  }

  private static Observation trend(PqdifWriter w, int rows) {
    double[] t = new double[rows];
    double[][] v = new double[6][rows];
    for (int k = 0; k < rows; k++) {
      t[k] = 600.0 * k;
      v[0][k] = 10 + k * 0.125;
      v[1][k] = 9 + k * 0.125;
      v[2][k] = 12 + k * 0.125;
      v[3][k] = 230 + 0.5 * (k % 3);
      v[4][k] = 7.5;
      v[5][k] = 5000 + k;
    }
    List<Instance> channels = new ArrayList<>();
    channels.add(w.instance(0).reals(t).reals(v[0]).reals(v[1]).reals(v[2]));
    channels.add(w.instance(1).shared(0).reals(v[3]));
    channels.add(w.instance(2).shared(0).reals(v[4]));
    channels.add(w.instance(3).shared(0).reals(v[5]));
    return new Observation("trend", START, channels);
  }

  private static Observation waves(PqdifWriter w, String name, int samples) {
    int[] v = new int[samples];
    int[] i = new int[samples];
    for (int k = 0; k < samples; k++) {
      double a = 2 * Math.PI * 50 * k / 6400;
      v[k] = (int) Math.round(10000 * Math.sin(a));
      i[k] = (int) Math.round(10000 * (Math.sin(a - Math.PI / 3) + 0.3 * Math.sin(3 * a)));
    }
    return new Observation(
        name,
        START.plusSeconds(3600),
        List.of(
            w.instance(4).even(samples, 1 / 6400.0).scaled(0.032527, 0, v),
            w.instance(5).shared(0).scaled(0.0014142, 0, i)));
  }

  @ParameterizedTest(name = "compressed {0}")
  @ValueSource(booleans = {false, true})
  void intervalDataBecomeALog(boolean compressed) {
    PqdifWriter w = writer(compressed);
    Reading r = read(w.file(List.of(trend(w, 144), waves(w, "event", 640))), Optional.empty());
    assertThat(r.kind()).isEqualTo(ReadingKind.LOG);
    assertThat(r.count()).isEqualTo(144);
    assertThat(r.period().orElseThrow().from()).isEqualTo(START);
    assertThat(r.notes()).anySatisfy(n -> assertThat(n).contains("both"));
    var q = r.log().orElseThrow().quantities();
    assertThat(q.get("L1.rms_a").mean()).isEqualTo(10 + 0.125 * 143 / 2, within(1e-9));
    assertThat(q.get("L1.rms_v").max()).isEqualTo(231, within(1e-9));
    assertThat(q.get("L1.current_thd_percent").mean()).isEqualTo(7.5, within(1e-9));
    assertThat(q.get("total.active_w").min()).isEqualTo(5000, within(1e-9));
    assertThat(q).containsKeys("L1.rms_a.min", "L1.rms_a.max");
  }

  /** Orders that a channel's name says are read; what has an unknown identifier is only named. */
  @Test
  void harmonicsAreReadByTheirNamesAndWhatIsUnknownIsLeft() {
    PqdifWriter w = new PqdifWriter(false);
    w.define("Harmonic 5", false, 1, 2, 7, "a6b31ae9", false, MEAN);
    w.define("Ia", false, 1, 2, 7, "12345678", false, MEAN);
    List<Instance> channels =
        List.of(
            w.instance(0).reals(0, 600, 1200).reals(2, 3, 4),
            w.instance(1).shared(0).reals(7, 8, 9));
    Reading r = read(w.file(List.of(new Observation("trend", START, channels))), Optional.empty());
    var q = r.log().orElseThrow().quantities();
    assertThat(q.keySet()).containsExactly("L1.current_h5_a");
    assertThat(q.get("L1.current_h5_a").mean()).isEqualTo(3, within(1e-9));
    assertThat(r.notes()).anySatisfy(n -> assertThat(n).contains("Ia unidentified"));
  }

  /** Volts and amps of one event may stand in observations of their own. */
  @Test
  void waveformsOfOneTimeAreOneCapture() {
    PqdifWriter w = writer(false);
    Observation both = waves(w, "event", 6400);
    Observation volts = new Observation("volts", both.start(), both.instances().subList(0, 1));
    Observation amps =
        new Observation(
            "amps",
            both.start(),
            List.of(w.instance(5).even(6400, 1 / 6400.0).scaled(0.0014142, 0, sine(6400))));
    Reading r =
        read(
            w.file(List.of(volts, amps, waves(w, "short", 640))), Optional.of(ReadingKind.CAPTURE));
    CaptureResult c = r.capture().orElseThrow();
    assertThat(c.voltage().get("L1").rmsV().value().orElseThrow()).isEqualTo(230, within(0.02));
    assertThat(c.current().get(Conductor.L1).fundamentalA().value().orElseThrow())
        .isEqualTo(10, within(1e-3));
    assertThat(r.notes()).anySatisfy(n -> assertThat(n).contains("Not read: number 3, \"short\""));
  }

  private static int[] sine(int samples) {
    int[] i = new int[samples];
    java.util.Arrays.setAll(
        i, k -> (int) Math.round(10000 * Math.sin(2 * Math.PI * 50 * k / 6400)));
    return i;
  }

  @ParameterizedTest(name = "compressed {0}")
  @ValueSource(booleans = {false, true})
  void theLongestWaveformsBecomeACapture(boolean compressed) {
    PqdifWriter w = writer(compressed);
    byte[] file = w.file(List.of(trend(w, 10), waves(w, "first", 640), waves(w, "second", 6400)));
    Reading r = read(file, Optional.of(ReadingKind.CAPTURE));
    CaptureResult c = r.capture().orElseThrow();
    assertThat(r.count()).isEqualTo(6400);
    assertThat(r.sampleRateHz().orElseThrow()).isEqualTo(6400, within(1e-3));
    assertThat(r.notes()).anySatisfy(n -> assertThat(n).contains("second"));
    assertThat(r.period().orElseThrow().from()).isEqualTo(START.plusSeconds(3600));
    assertThat(c.voltage().get("L1").rmsV().value().orElseThrow()).isEqualTo(230, within(0.02));
    assertThat(c.current().get(Conductor.L1).fundamentalA().value().orElseThrow())
        .isEqualTo(10, within(1e-3));
    assertThat(c.current().get(Conductor.L1).thdPercent().value().orElseThrow())
        .isEqualTo(30, within(0.01));
    assertThat(c.spectrum().get(Conductor.L1).at(1).degrees()).isEqualTo(-60, within(0.01));
  }

  @Test
  void aFileCutShortGivesWhatStoodBefore() {
    PqdifWriter w = writer(true);
    byte[] whole = w.file(List.of(trend(w, 144), waves(w, "event", 640)));
    Reading r = read(java.util.Arrays.copyOf(whole, whole.length - 40), Optional.empty());
    assertThat(r.count()).isEqualTo(144);
    assertThat(r.notes()).anySatisfy(n -> assertThat(n).contains("before its last record"));
  }

  /** Whatever is done to the bytes, the file is read or refused, in bounded time and memory. */
  @ParameterizedTest(name = "seed {0}")
  @ValueSource(longs = {1, 2, 3, 4, 5, 6, 7, 8})
  void damageIsReadOrRefused(long seed) {
    PqdifWriter w = writer(seed % 2 == 0);
    byte[] whole = w.file(List.of(trend(w, 20), waves(w, "event", 320)));
    Random random = new Random(seed);
    assertTimeoutPreemptively(
        Duration.ofSeconds(60),
        () -> {
          for (int round = 0; round < 150; round++) {
            byte[] bent = whole.clone();
            for (int k = 0; k < 1 + random.nextInt(6); k++) {
              bent[16 + random.nextInt(bent.length - 16)] = (byte) random.nextInt(256);
            }
            byte[] file =
                round % 5 == 0
                    ? java.util.Arrays.copyOf(bent, 16 + random.nextInt(bent.length - 16))
                    : bent;
            try {
              read(file, round % 2 == 0 ? Optional.empty() : Optional.of(ReadingKind.CAPTURE));
            } catch (ReadingRefusedException refused) {
              assertThat(refused).hasMessageNotContaining("null");
            }
          }
        });
  }
}
