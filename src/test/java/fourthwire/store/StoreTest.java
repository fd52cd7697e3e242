package fourthwire.store;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import fourthwire.audit.AuditRepository;
import fourthwire.audit.AuditRepository.State;
import fourthwire.audit.AuditResult;
import fourthwire.audit.NodeResult;
import fourthwire.audit.NodeSummary;
import fourthwire.audit.Progress;
import fourthwire.intake.survey.ZipSurveyCodec;
import fourthwire.limits.Severity;
import fourthwire.metering.LogResult;
import fourthwire.metering.Period;
import fourthwire.metering.QuantitySummary;
import fourthwire.metering.RawFile;
import fourthwire.metering.Reading;
import fourthwire.metering.ReadingKind;
import fourthwire.metering.ReadingMapping;
import fourthwire.metering.ReadingRepository;
import fourthwire.metering.ReadingRepository.MeterRef;
import fourthwire.metering.ReadingUploads;
import fourthwire.site.SiteRepository;
import fourthwire.site.Survey;
import fourthwire.testsupport.Databases;
import fourthwire.testsupport.RandomResults;
import fourthwire.testsupport.SmallSite;
import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.io.SequenceInputStream;
import java.io.UncheckedIOException;
import java.security.MessageDigest;
import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.HexFormat;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalLong;
import java.util.Random;
import java.util.concurrent.Callable;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import java.util.stream.IntStream;
import javax.sql.DataSource;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.jdbc.support.JdbcTransactionManager;
import org.springframework.transaction.support.TransactionTemplate;

/** What is stored comes back, on both databases. */
class StoreTest {
  private DataSource database;
  private SiteRepository sites;
  private AuditRepository audits;
  private ReadingRepository readings;
  private ReadingUploads uploads;

  private void open(Databases kind) {
    database = kind.migrated();
    Store store = new Store(database);
    sites = store.sites(new ZipSurveyCodec());
    audits = store.audits();
    readings = store.readings();
    uploads = store.uploads();
  }

  @ParameterizedTest
  @EnumSource
  void aSurveyComesBackAndItsEarlierRevisionsStay(Databases kind) {
    open(kind);
    Survey first = SmallSite.survey("Works");
    Survey second = SmallSite.survey("Works east wing");

    long site = sites.create(first, List.of("a warning"));
    assertThat(sites.revise(site, second, List.of())).hasValue(2);

    assertThat(sites.list()).containsExactly(new SiteRepository.Entry(site, "Works east wing", 2));
    assertThat(sites.survey(site, 1)).isEqualTo(first);
    assertThat(sites.survey(site, 2)).isEqualTo(second);
    assertThat(sites.revisions(site))
        .extracting(SiteRepository.Revision::number)
        .containsExactly(2, 1);
    assertThat(sites.revisions(site).get(1).warnings()).containsExactly("a warning");
    assertThat(sites.revisions(site).get(1).sha256())
        .isEqualTo(sha256(new ZipSurveyCodec().encode(first)));
    assertThat(sites.revise(site + 1, first, List.of())).isEmpty();
  }

  @ParameterizedTest
  @EnumSource
  void aDeletedSiteLeavesNothingBehind(Databases kind) {
    open(kind);
    long site = sites.create(SmallSite.survey("Works"), List.of());
    long audit = audits.create(site, 1, Optional.empty());
    audits.start(audit);
    audits.finish(audit, result(new RandomResults(1), 3), Progress.SILENT);
    addReading(site);
    uploads.create(site, new MeterRef("M1", "LP-1"), List.of(file("b.csv", 10)), Optional.empty());

    assertThat(sites.delete(site)).isTrue();
    assertThat(sites.delete(site)).isFalse();

    for (String table :
        List.of(
            "sites",
            "survey_revisions",
            "stored_files",
            "stored_file_parts",
            "audits",
            "audit_nodes",
            "meters",
            "readings",
            "reading_files",
            "reading_uploads",
            "reading_upload_files")) {
      assertThat(count(table)).as(table).isZero();
    }
  }

  @ParameterizedTest
  @EnumSource
  void anAuditRunsThroughItsStates(Databases kind) {
    open(kind);
    long site = sites.create(SmallSite.survey("Works"), List.of());
    long audit = audits.create(site, 1, Optional.of("SET"));
    AuditRepository.Entry queued = audits.find(audit).orElseThrow();
    assertThat(queued.state()).isEqualTo(State.QUEUED);
    assertThat(queued.supply()).contains("SET");

    assertThat(audits.start(audit)).isTrue();
    assertThat(audits.progress(audit, 0.25, "solving")).isTrue();
    assertThat(audits.find(audit).orElseThrow())
        .returns(State.RUNNING, AuditRepository.Entry::state)
        .returns(0.25, AuditRepository.Entry::progress)
        .returns("solving", AuditRepository.Entry::message);

    AuditResult result = result(new RandomResults(7), 6);
    audits.finish(audit, result, Progress.SILENT);

    AuditRepository.Entry done = audits.find(audit).orElseThrow();
    assertThat(done.state()).isEqualTo(State.DONE);
    assertThat(done.engineVersion()).contains("1.2.3");
    assertThat(done.editions()).isEqualTo(result.editions());
    assertThat(done.notes()).isEqualTo(result.notes());
    assertThat(audits.nodes(audit))
        .extracting(NodeResult::node)
        .containsExactlyElementsOf(result.nodes().stream().map(NodeResult::node).toList());
    assertThat(audits.node(audit, "node 3").orElseThrow().findings())
        .isEqualTo(result.nodes().get(3).findings());
    assertThat(audits.node(audit, "node 99")).isEmpty();
    assertThat(audits.start(audit)).as("it has ended").isFalse();
    assertThat(audits.cancel(audit)).as("it has ended").isFalse();
    assertThat(audits.ofSite(site)).hasSize(1);
  }

  @ParameterizedTest
  @EnumSource
  void theListOfNodesIsWorstFirst(Databases kind) {
    open(kind);
    long site = sites.create(SmallSite.survey("Works"), List.of());
    long audit = audits.create(site, 1, Optional.empty());
    audits.start(audit);
    AuditResult result = result(new RandomResults(11), 40);
    audits.finish(audit, result, Progress.SILENT);

    List<NodeSummary> rows = audits.summaries(audit);

    assertThat(rows)
        .containsExactlyInAnyOrderElementsOf(result.nodes().stream().map(NodeSummary::of).toList())
        .isSortedAccordingTo(NodeSummary.WORST_FIRST);
    assertThat(rows.get(0).count(Severity.ACT)).isPositive();
  }

  @ParameterizedTest
  @EnumSource
  void aCancelStopsAQueuedAuditAtOnceAndARunningOneAtItsNextStep(Databases kind) {
    open(kind);
    long site = sites.create(SmallSite.survey("Works"), List.of());
    long queued = audits.create(site, 1, Optional.empty());
    long running = audits.create(site, 1, Optional.empty());
    audits.start(running);

    assertThat(audits.cancel(queued)).isTrue();
    assertThat(audits.cancel(running)).isTrue();

    assertThat(audits.find(queued).orElseThrow().state()).isEqualTo(State.CANCELLED);
    assertThat(audits.start(queued)).isFalse();
    assertThat(audits.progress(running, 0.5, "solving")).isFalse();
    audits.finish(running, result(new RandomResults(1), 2), Progress.SILENT);
    assertThat(audits.find(running).orElseThrow().state()).isEqualTo(State.CANCELLED);
    assertThat(audits.nodes(running)).isEmpty();
  }

  @ParameterizedTest
  @EnumSource
  void afterARestartInterruptedWorkIsQueuedAgain(Databases kind) {
    open(kind);
    long site = sites.create(SmallSite.survey("Works"), List.of());
    long waiting = audits.create(site, 1, Optional.empty());
    long interrupted = audits.create(site, 1, Optional.empty());
    long unwanted = audits.create(site, 1, Optional.empty());
    audits.start(interrupted);
    audits.start(unwanted);
    audits.cancel(unwanted);
    long upload =
        uploads.create(
            site, new MeterRef("M1", "LP-1"), List.of(file("a.csv", 3)), Optional.empty());
    uploads.start(upload);

    assertThat(audits.recover()).containsExactly(waiting, interrupted);
    assertThat(audits.find(unwanted).orElseThrow().state()).isEqualTo(State.CANCELLED);
    assertThat(uploads.recover()).containsExactly(upload);
    assertThat(uploads.start(upload)).isTrue();
  }

  @ParameterizedTest
  @EnumSource
  void aReadingComesBackWithItsFilesAndIsNotStoredTwice(Databases kind) {
    open(kind);
    long site = sites.create(SmallSite.survey("Works"), List.of());

    long id = addReading(site);
    assertThat(addReading(site)).isEqualTo(id);

    ReadingRepository.Entry entry = readings.find(id).orElseThrow();
    assertThat(entry.reading()).isEqualTo(reading());
    assertThat(entry.mapping()).isEqualTo(mapping());
    assertThat(entry.meter()).isEqualTo(new MeterRef("M1", "LP-1"));
    assertThat(entry.files()).containsExactly("week.csv");
    assertThat(entry.sha256()).isEqualTo(file("week.csv", 1_500_000).sha256());
    assertThat(readings.ofSite(site)).containsExactly(entry);
    assertThat(readings.mapping(site, "M1", "layout")).contains(mapping());
    assertThat(readings.meters(site)).containsExactly(new MeterRef("M1", "LP-1"));
    assertThat(readings.delete(id)).isTrue();
    assertThat(readings.find(id)).isEmpty();
    assertThat(readings.mapping(site, "M1", "layout")).as("is remembered").isPresent();
  }

  /** Larger than any one part, so that its parts are joined again. */
  @ParameterizedTest
  @EnumSource
  void anUploadKeepsItsFilesUntilItWasRead(Databases kind) throws IOException {
    open(kind);
    long site = sites.create(SmallSite.survey("Works"), List.of());
    RawFile file = file("c.dat", 1_300_000);
    long id =
        uploads.create(site, new MeterRef("M1", "LP-1"), List.of(file), Optional.of(mapping()));

    RawFile stored = uploads.files(id).get(0);
    assertThat(stored.name()).isEqualTo("c.dat");
    assertThat(stored.length()).isEqualTo(1_300_000);
    assertThat(stored.sha256()).isEqualTo(file.sha256());
    try (InputStream in = stored.open();
        InputStream original = file.open()) {
      assertThat(in).hasSameContentAs(original);
    }
    assertThat(uploads.find(id).orElseThrow().mapping()).contains(mapping());

    uploads.start(id);
    uploads.finish(id, 42);
    assertThat(uploads.find(id).orElseThrow().state()).isEqualTo(ReadingUploads.State.DONE);
    assertThat(uploads.find(id).orElseThrow().reading()).isEqualTo(OptionalLong.of(42));
    assertThat(uploads.files(id)).isEmpty();
    assertThat(count("stored_files")).as("the survey's only").isOne();
  }

  @ParameterizedTest
  @EnumSource
  void aFileThatBreaksOffLeavesNothing(Databases kind) {
    open(kind);
    long site = sites.create(SmallSite.survey("Works"), List.of());
    long parts = count("stored_file_parts");
    RawFile whole = file("a.dat", 300_000);
    RawFile broken = new BrokenFile(file("b.dat", 6_000_000));
    MeterRef meter = new MeterRef("M1", "LP-1");

    assertThatThrownBy(() -> uploads.create(site, meter, List.of(whole, broken), Optional.empty()))
        .isInstanceOf(UncheckedIOException.class);

    assertThat(count("stored_file_parts")).isEqualTo(parts);
    assertThat(count("stored_files")).as("the survey's only").isOne();
    assertThat(count("reading_uploads")).isZero();
  }

  /** The process ended while a file was being stored. */
  @ParameterizedTest
  @EnumSource
  void aStartDeletesFilesThatNothingRefersTo(Databases kind) throws IOException {
    open(kind);
    long site = sites.create(SmallSite.survey("Works"), List.of());
    addReading(site);
    uploads.create(site, new MeterRef("M1", "LP-1"), List.of(file("b.csv", 10)), Optional.empty());
    long files = count("stored_files");
    long parts = count("stored_file_parts");
    JdbcClient jdbc = JdbcClient.create(database);
    TransactionTemplate transaction = new TransactionTemplate(new JdbcTransactionManager(database));
    new FileStore(jdbc, transaction).save(new byte[700_000]);
    assertThat(count("stored_files")).isEqualTo(files + 1);

    uploads.recover();

    assertThat(count("stored_files")).isEqualTo(files);
    assertThat(count("stored_file_parts")).isEqualTo(parts);
  }

  @ParameterizedTest
  @EnumSource
  void settingsAreReplaced(Databases kind) {
    Settings settings = new Store(kind.migrated()).settings();
    settings.put("demo", "one");
    settings.put("demo", "two");
    assertThat(settings.find("demo")).contains("two");
    assertThat(settings.find("other")).isEmpty();
  }

  @ParameterizedTest
  @EnumSource
  void anUploadWaitsUntilItsColumnsAreConfirmed(Databases kind) {
    open(kind);
    long site = sites.create(SmallSite.survey("Works"), List.of());
    MeterRef meter = new MeterRef("M1", "LP-1");
    long upload = uploads.createWaiting(site, meter, List.of(file("a.csv", 5000)));
    long dropped = uploads.createWaiting(site, meter, List.of(file("b.csv", 5000)));
    assertThat(uploads.waiting(site))
        .extracting(ReadingUploads.Entry::id)
        .containsExactly(upload, dropped);
    assertThat(uploads.start(upload)).as("nobody has confirmed it").isFalse();
    assertThat(uploads.recover()).as("a restart does not read it").isEmpty();

    assertThat(uploads.confirm(upload, mapping())).isTrue();
    assertThat(uploads.confirm(upload, mapping())).as("once").isFalse();
    assertThat(uploads.find(upload).orElseThrow())
        .returns(ReadingUploads.State.QUEUED, ReadingUploads.Entry::state)
        .returns(Optional.of(mapping()), ReadingUploads.Entry::mapping);
    assertThat(uploads.start(upload)).isTrue();

    assertThat(uploads.cancel(dropped)).isTrue();
    assertThat(uploads.find(dropped).orElseThrow().state())
        .isEqualTo(ReadingUploads.State.CANCELLED);
    assertThat(uploads.files(dropped)).isEmpty();
    assertThat(uploads.waiting(site)).isEmpty();
    assertThat(count("stored_files")).as("the survey's and the running upload's").isEqualTo(2);
  }

  /** Whoever comes second waits for no one and collides with no one. */
  @ParameterizedTest
  @EnumSource
  void filesOfANewMeterAtTheSameTimeAreAllStored(Databases kind) throws Exception {
    open(kind);
    long site = sites.create(SmallSite.survey("Works"), List.of());
    List<Callable<Long>> uploads = new ArrayList<>();
    for (int k = 0; k < 12; k++) {
      RawFile file = file("week" + k % 6 + ".csv", 20_000 + k % 6);
      uploads.add(
          () ->
              readings.add(
                  new ReadingRepository.Addition(
                      site,
                      new MeterRef("M1", "LP-1"),
                      List.of(file),
                      "layout",
                      mapping(),
                      Optional.of(mapping()),
                      reading())));
    }
    ExecutorService people = Executors.newFixedThreadPool(12);
    List<Long> ids = new ArrayList<>();
    try {
      for (Future<Long> stored : people.invokeAll(uploads)) {
        ids.add(stored.get());
      }
    } finally {
      people.shutdown();
    }
    for (int k = 0; k < 6; k++) {
      assertThat(ids.get(k + 6)).as("the same file twice").isEqualTo(ids.get(k));
    }
    assertThat(readings.ofSite(site)).hasSize(6);
    assertThat(readings.meters(site)).containsExactly(new MeterRef("M1", "LP-1"));
    assertThat(readings.mapping(site, "M1", "layout")).contains(mapping());
  }

  private long addReading(long site) {
    return readings.add(
        new ReadingRepository.Addition(
            site,
            new MeterRef("M1", "LP-1"),
            List.of(file("week.csv", 1_500_000)),
            "layout",
            mapping(),
            Optional.of(mapping()),
            reading()));
  }

  /** Its bytes end in an error. */
  private record BrokenFile(RawFile whole) implements RawFile {
    @Override
    public String name() {
      return whole.name();
    }

    @Override
    public String sha256() {
      return whole.sha256();
    }

    @Override
    public long length() {
      return whole.length();
    }

    @Override
    public InputStream open() throws IOException {
      InputStream end =
          new InputStream() {
            @Override
            public int read() throws IOException {
              throw new IOException("the disk is gone");
            }
          };
      return new SequenceInputStream(whole.open(), end);
    }
  }

  private static ReadingMapping mapping() {
    return new ReadingMapping(
        Optional.of(ReadingKind.LOG),
        new ReadingMapping.Time(
            List.of("Date", "Time"),
            Optional.of("dd.MM.yyyy HH:mm"),
            Optional.of("Europe/Vienna"),
            Optional.of(ReadingMapping.Stamp.END),
            OptionalDouble.of(600)),
        OptionalDouble.empty(),
        Map.of(
            "I1 \"max\"",
            new ReadingMapping.Column("L1.rms_a", ReadingMapping.Statistic.MAX, -1.5)));
  }

  private static Reading reading() {
    Instant monday = Instant.parse("2026-03-02T00:00:00Z");
    return new Reading(
        ReadingKind.LOG,
        Optional.of(new Period(monday, monday.plus(Duration.ofDays(7)))),
        1008,
        OptionalDouble.of(1.0 / 600),
        List.of("a note"),
        List.of(
            new fourthwire.metering.QualityFinding(
                "gap", Optional.empty(), "the mean is of less", "two rows are missing")),
        Optional.of(
            new LogResult(
                Duration.ofMinutes(10),
                Map.of("L1.rms_a", new QuantitySummary(1006, 1, 2.5, 9, 8, 8.75)),
                List.of(
                    new LogResult.KeyInterval(
                        LogResult.PEAK_CURRENT, monday, "highest", Map.of("L1.rms_a", 9.0))),
                Optional.empty())),
        Optional.empty());
  }

  private static AuditResult result(RandomResults random, int nodes) {
    return new AuditResult(
        "GRID",
        "1.2.3",
        List.of("IEEE 519-2022"),
        IntStream.range(0, nodes).mapToObj(i -> random.node("node " + i)).toList(),
        List.of("no-load losses are outside the network"));
  }

  private static RawFile file(String name, int length) {
    byte[] bytes = new byte[length];
    new Random(length).nextBytes(bytes);
    return new MemoryFile(name, sha256(bytes), bytes);
  }

  private static String sha256(byte[] bytes) {
    MessageDigest digest = FileStore.sha256();
    return HexFormat.of().formatHex(digest.digest(bytes));
  }

  private long count(String table) {
    return JdbcClient.create(database)
        .sql("select count(*) from " + table)
        .query(Long.class)
        .single();
  }

  /** A file in memory. */
  private record MemoryFile(String name, String sha256, byte[] bytes) implements RawFile {
    @Override
    public long length() {
      return bytes.length;
    }

    @Override
    public InputStream open() {
      return new ByteArrayInputStream(bytes);
    }
  }
}
