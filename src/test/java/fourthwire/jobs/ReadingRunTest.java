package fourthwire.jobs;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import fourthwire.intake.reading.FormatReader;
import fourthwire.intake.reading.ReadingRefusedException;
import fourthwire.intake.survey.ZipSurveyCodec;
import fourthwire.metering.RawFile;
import fourthwire.metering.ReadingMapping;
import fourthwire.metering.ReadingRepository;
import fourthwire.metering.ReadingUploads;
import fourthwire.site.SiteRepository;
import fourthwire.store.Store;
import fourthwire.testsupport.Databases;
import fourthwire.testsupport.SmallSite;
import java.io.ByteArrayInputStream;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.security.GeneralSecurityException;
import java.security.MessageDigest;
import java.util.HexFormat;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;

/** Meters' files from the upload to the reading, with what is kept of the mapping. */
class ReadingRunTest {
  private static final String DAY_13 =
      "Time,I1 (A)\n01/13/2026 00:00,10\n01/13/2026 00:10,20\n01/13/2026 00:20,30\n";
  private static final String DAY_2 = DAY_13.replace("/13/", "/02/");

  private ReadingUploads uploads;
  private ReadingRepository readings;
  private ReadingService service;
  private ReadingRun run;
  private long site;

  @BeforeEach
  void open() {
    Store store = new Store(Databases.H2.migrated());
    SiteRepository sites = store.sites(new ZipSurveyCodec());
    site = sites.create(SmallSite.survey("Works"), List.of());
    uploads = store.uploads();
    readings = store.readings();
    ReadingSettings settings = new ReadingSettings(sites, readings);
    FormatReader reader = new FormatReader();
    service = new ReadingService(uploads, reader, settings, new NoQueue());
    run = new ReadingRun(uploads, readings, reader, settings, new Stop());
  }

  /** The reading is started by hand. */
  private static final class NoQueue implements JobQueue {
    @Override
    public void addAudit(long auditId) {}

    @Override
    public void addReading(long uploadId) {}
  }

  private record Text(String text) implements RawFile {
    @Override
    public String name() {
      return "log.csv";
    }

    private byte[] bytes() {
      return text.getBytes(StandardCharsets.UTF_8);
    }

    @Override
    public String sha256() {
      try {
        return HexFormat.of().formatHex(MessageDigest.getInstance("SHA-256").digest(bytes()));
      } catch (GeneralSecurityException e) {
        throw new IllegalStateException(e);
      }
    }

    @Override
    public long length() {
      return bytes().length;
    }

    @Override
    public InputStream open() {
      return new ByteArrayInputStream(bytes());
    }
  }

  private static Optional<ReadingMapping> mapping(double factor, Optional<String> format) {
    return Optional.of(
        new ReadingMapping(
            Optional.empty(),
            new ReadingMapping.Time(
                List.of(), format, Optional.empty(), Optional.empty(), OptionalDouble.empty()),
            OptionalDouble.empty(),
            Map.of(
                "I1 (A)",
                new ReadingMapping.Column("L1.rms_a", ReadingMapping.Statistic.MEAN, factor))));
  }

  private long queue(String text, Optional<ReadingMapping> mapping) {
    return service.take(
        new ReadingService.Upload(
            site, Optional.empty(), Optional.of("LP-1"), List.of(new Text(text)), mapping));
  }

  private ReadingUploads.Entry read(String text, Optional<ReadingMapping> mapping) {
    long id = queue(text, mapping);
    run.run(id);
    return uploads.find(id).orElseThrow();
  }

  @Test
  void theSameFileByTheSameMappingAnswersTheReadingThatIsThere() {
    long first = read(DAY_13, mapping(1, Optional.empty())).reading().orElseThrow();
    assertThat(read(DAY_13, mapping(1, Optional.empty())).reading()).hasValue(first);
    assertThat(read(DAY_13, mapping(1, Optional.of("MM/dd/yyyy HH:mm"))).reading())
        .as("the same as resolved")
        .hasValue(first);
    assertThat(readings.ofSite(site)).hasSize(1);
  }

  @Test
  void theSameFileByAnotherMappingIsRefusedUntilItsReadingIsDeleted() {
    long first = read(DAY_13, mapping(1, Optional.empty())).reading().orElseThrow();
    assertThatThrownBy(() -> queue(DAY_13, mapping(10, Optional.empty())))
        .isInstanceOf(RefusedException.class)
        .hasMessageContaining("reading " + first)
        .hasMessageContaining("delete");
    readings.delete(first);
    long again = read(DAY_13, mapping(10, Optional.empty())).reading().orElseThrow();
    assertThat(readings.find(again).orElseThrow().reading().log().orElseThrow().quantities())
        .hasEntrySatisfying("L1.rms_a", s -> assertThat(s.mean()).isEqualTo(200));
  }

  @Test
  void twoMappingsQueuedAtOnceDoNotAnswerForEachOther() {
    long one = queue(DAY_13, mapping(1, Optional.empty()));
    long other = queue(DAY_13, mapping(10, Optional.empty()));
    run.run(one);
    run.run(other);
    assertThat(uploads.find(other).orElseThrow().state()).isEqualTo(ReadingUploads.State.FAILED);
    assertThat(uploads.find(other).orElseThrow().message()).contains("another mapping");
  }

  /** On day 13 the file itself says month first; on the 2nd it does not. */
  @Test
  void aProposalIsNotRememberedAsIfItWereConfirmed() {
    read(DAY_13, Optional.empty()).reading().orElseThrow();
    assertThatThrownBy(() -> queue(DAY_2, Optional.empty()))
        .isInstanceOf(ReadingRefusedException.class)
        .satisfies(
            e ->
                assertThat(((ReadingRefusedException) e).questions())
                    .extracting("part")
                    .containsExactly("time.format"));
    long given = read(DAY_2, mapping(1, Optional.of("dd/MM/yyyy"))).reading().orElseThrow();
    assertThat(readings.find(given).orElseThrow().reading().notes())
        .contains("Times are taken as the starts of the intervals.");
    // The format was given and is remembered; the note on the assumption comes again.
    String next = DAY_2.replace("00:20,30", "00:20,40");
    long remembered = read(next, Optional.empty()).reading().orElseThrow();
    assertThat(readings.find(remembered).orElseThrow().reading().notes())
        .contains("Times are taken as the starts of the intervals.");
    assertThatThrownBy(() -> queue(DAY_13.replace("10\n", "11\n"), Optional.empty()))
        .isInstanceOf(ReadingRefusedException.class);
  }

  @Test
  void aFailureIsWholeSentences() {
    ReadingRefusedException e =
        new ReadingRefusedException(
            "The interval can't be told.",
            List.of(),
            List.of(new ReadingRefusedException.Question("time.interval_s", "give the length")));
    assertThat(ReadingRun.sentence(e))
        .isEqualTo("The interval can't be told. time.interval_s: give the length.");
  }
}
