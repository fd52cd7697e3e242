package fourthwire.jobs;

import fourthwire.intake.reading.FormatReader;
import fourthwire.intake.survey.ZipSurveyCodec;
import fourthwire.metering.RawFile;
import fourthwire.metering.ReadingRepository;
import fourthwire.metering.ReadingUploads;
import fourthwire.site.SiteRepository;
import fourthwire.store.Store;
import fourthwire.testsupport.SmallSite;
import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import org.flywaydb.core.Flyway;
import org.h2.jdbcx.JdbcConnectionPool;

/**
 * A log read as the service reads it, from the start of the job to the stored result, again and
 * again in one process:
 *
 * <pre>
 * java -Xmx512m -cp target/classes:target/test-classes:$(libraries) \
 *   fourthwire.jobs.LogJobBenchmark log.csv [repetitions]
 * </pre>
 */
final class LogJobBenchmark {
  private final ReadingUploads uploads;
  private final ReadingRepository readings;
  private final ReadingService service;
  private final ReadingRun run;
  private final long site;

  private LogJobBenchmark(Path folder) {
    JdbcConnectionPool database =
        JdbcConnectionPool.create(
            "jdbc:h2:file:"
                + folder.resolve("fourthwire")
                + ";MODE=PostgreSQL;DATABASE_TO_LOWER=TRUE;DEFAULT_NULL_ORDERING=HIGH",
            "",
            "");
    Flyway.configure().dataSource(database).locations("classpath:db/migration").load().migrate();
    Store store = new Store(database);
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

  private record OnDisk(Path path) implements RawFile {
    @Override
    public String name() {
      return String.valueOf(path.getFileName());
    }

    @Override
    public String sha256() {
      return "";
    }

    @Override
    public long length() {
      return path.toFile().length();
    }

    @Override
    public InputStream open() throws IOException {
      return Files.newInputStream(path);
    }
  }

  public static void main(String[] args) throws IOException {
    Path folder = Files.createTempDirectory("fourthwire-benchmark");
    LogJobBenchmark benchmark = new LogJobBenchmark(folder);
    int repetitions = args.length > 1 ? Integer.parseInt(args[1]) : 10;
    for (int k = 0; k < repetitions; k++) {
      benchmark.once(Path.of(args[0]));
    }
    try (var files = Files.list(folder)) {
      for (Path file : files.toList()) {
        System.out.printf("%s %.1f MB%n", file.getFileName(), Files.size(file) / 1e6);
        Files.delete(file);
      }
    }
    Files.delete(folder);
  }

  private void once(Path file) {
    long begun = System.nanoTime();
    long upload =
        service.store(
            new ReadingService.Upload(
                site,
                Optional.empty(),
                Optional.of("LP-1"),
                List.of(new OnDisk(file)),
                Optional.empty()));
    long started = System.nanoTime();
    long cpu = cpu();
    run.run(upload);
    long ended = System.nanoTime();
    ReadingUploads.Entry entry = uploads.find(upload).orElseThrow();
    System.out.printf(
        "uploaded in %.2f s; read and stored in %.2f s (processors %.2f s): %s%n",
        (started - begun) / 1e9, (ended - started) / 1e9, (cpu() - cpu) / 1e9, entry.message());
    readings.delete(entry.reading().orElseThrow());
  }

  private static long cpu() {
    return ((com.sun.management.OperatingSystemMXBean)
            java.lang.management.ManagementFactory.getOperatingSystemMXBean())
        .getProcessCpuTime();
  }
}
