package fourthwire.jobs;

import fourthwire.metering.ReadingUploads;
import fourthwire.testsupport.RawFiles;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import java.util.stream.IntStream;
import org.flywaydb.core.Flyway;
import org.h2.jdbcx.JdbcConnectionPool;

/**
 * A log read as the service reads it, from the start of the job to the stored result, again and
 * again in one process; between two jobs the command of a program that does the same, if one is
 * given:
 *
 * <pre>
 * java -Xmx512m -cp target/classes:target/test-classes:$(libraries) \
 *   fourthwire.jobs.LogJobBenchmark log.csv [repetitions [command …]]
 * </pre>
 */
final class LogJobBenchmark {
  private final ReadingDesk desk;

  private LogJobBenchmark(Path folder) {
    JdbcConnectionPool database =
        JdbcConnectionPool.create(
            "jdbc:h2:file:"
                + folder.resolve("fourthwire")
                + ";MODE=PostgreSQL;DATABASE_TO_LOWER=TRUE;DEFAULT_NULL_ORDERING=HIGH",
            "",
            "");
    Flyway.configure().dataSource(database).locations("classpath:db/migration").load().migrate();
    desk = new ReadingDesk(database);
  }

  public static void main(String[] args) throws IOException {
    Path folder = Files.createTempDirectory("fourthwire-benchmark");
    LogJobBenchmark benchmark = new LogJobBenchmark(folder);
    int repetitions = args.length > 1 ? Integer.parseInt(args[1]) : 10;
    List<String> command = List.of(args).subList(Math.min(2, args.length), args.length);
    double[] jobs = new double[repetitions];
    double[] others = new double[repetitions];
    for (int k = 0; k < repetitions; k++) {
      others[k] = command.isEmpty() ? Double.NaN : seconds(command);
      jobs[k] = benchmark.once(Path.of(args[0]));
    }
    compare(jobs, others);
    try (var files = Files.list(folder)) {
      for (Path file : files.toList()) {
        System.out.printf("%s %.1f MB%n", file.getFileName(), Files.size(file) / 1e6);
        Files.delete(file);
      }
    }
    Files.delete(folder);
  }

  private static double seconds(List<String> command) throws IOException {
    long begun = System.nanoTime();
    Process other =
        new ProcessBuilder(command)
            .redirectErrorStream(true)
            .redirectOutput(ProcessBuilder.Redirect.DISCARD)
            .start();
    try {
      if (other.waitFor() != 0) {
        throw new IllegalStateException(command + " failed");
      }
    } catch (InterruptedException e) {
      throw new IllegalStateException(e);
    }
    return (System.nanoTime() - begun) / 1e9;
  }

  private static void compare(double[] jobs, double[] others) {
    double[] ratios =
        IntStream.range(0, jobs.length).mapToDouble(k -> others[k] / jobs[k]).toArray();
    System.out.printf(
        "first job %.2f s; quickest %.2f s, of the other program %.2f s: %.2f times as fast; median"
            + " of the pairs %.2f%n",
        jobs[0],
        Arrays.stream(jobs).min().orElseThrow(),
        Arrays.stream(others).min().orElseThrow(),
        Arrays.stream(others).min().orElseThrow() / Arrays.stream(jobs).min().orElseThrow(),
        Arrays.stream(ratios).sorted().toArray()[jobs.length / 2]);
  }

  private double once(Path file) {
    long begun = System.nanoTime();
    long upload = desk.store(RawFiles.of(file));
    long started = System.nanoTime();
    long cpu = cpu();
    ReadingUploads.Entry entry = desk.read(upload);
    long ended = System.nanoTime();
    System.out.printf(
        "uploaded in %.2f s; read and stored in %.2f s (processors %.2f s): %s%n",
        (started - begun) / 1e9, (ended - started) / 1e9, (cpu() - cpu) / 1e9, entry.message());
    desk.readings().delete(entry.reading().orElseThrow());
    return (ended - started) / 1e9;
  }

  private static long cpu() {
    return ((com.sun.management.OperatingSystemMXBean)
            java.lang.management.ManagementFactory.getOperatingSystemMXBean())
        .getProcessCpuTime();
  }
}
