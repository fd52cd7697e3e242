package fourthwire.intake.reading.log;

import fourthwire.intake.reading.ReadingPlan;
import fourthwire.intake.reading.ReadingSetting;
import fourthwire.intake.reading.format.Mappings;
import fourthwire.intake.reading.table.TextTable;
import fourthwire.intake.reading.table.TimeColumns;
import fourthwire.metering.RawFile;
import fourthwire.metering.ReadingMapping;
import fourthwire.metering.series.LogSeries;
import fourthwire.metering.series.QuantityStatistics;
import fourthwire.metering.series.SeriesStatistics;
import fourthwire.testsupport.EndlessLog;
import fourthwire.testsupport.RawFiles;
import java.io.IOException;
import java.io.InputStream;
import java.io.PrintWriter;
import java.nio.file.Path;
import java.time.ZoneId;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;

/**
 * Reads one log as a plain process and writes its statistics, to be timed beside programs that do
 * the same:
 *
 * <pre>
 * java -Xmx1g -cp target/classes:target/test-classes:$(libraries) \
 *   fourthwire.intake.reading.log.LogBenchmark log.csv out [repetitions [gigabytes]]
 * </pre>
 *
 * With a number of gigabytes the first rows of the log are read again and again until there are as
 * many bytes. Writes {@code out_columns.csv}, {@code out_weekly.csv} and {@code out_hourweek.csv}.
 */
final class LogBenchmark {
  private final RawFile raw;
  private final ReadingSetting setting =
      new ReadingSetting(
          Optional.of(ZoneId.of("Europe/Amsterdam")),
          50,
          Optional.empty(),
          layout -> Optional.empty(),
          List.of(),
          OptionalDouble.empty());

  private LogBenchmark(RawFile raw) {
    this.raw = raw;
  }

  public static void main(String[] args) throws IOException {
    Path file = Path.of(args[0]);
    boolean endless = args.length > 3;
    LogBenchmark benchmark =
        new LogBenchmark(
            endless
                ? new EndlessLog(file, (long) (1e9 * Double.parseDouble(args[3])))
                : RawFiles.of(file));
    int repetitions = args.length > 2 ? Integer.parseInt(args[2]) : 1;
    for (int k = 0; k < repetitions; k++) {
      benchmark.run(args[1]);
    }
  }

  private void run(String out) throws IOException {
    long t0 = now();
    TextTable table = TextTable.of(() -> open(raw));
    TimeColumns time = TimeColumns.find(table);
    ReadingMapping mapping =
        new LogFormat(table, time, raw.length())
            .plan(setting, "", new Mappings(Optional.empty(), ReadingPlan.Confidence.GIVEN))
            .mapping();
    long t1 = now();
    ExecutorService workers = Executors.newFixedThreadPool(2);
    LogColumns columns = new LogColumns(table, time, mapping);
    long mostHeld = Runtime.getRuntime().maxMemory() / 4 / 8;
    try (LogSeries series = new LogSeries(columns.quantities(), new SpilledParts(), mostHeld)) {
      new LogRows(table, columns, mapping, series, java.util.Optional.empty(), workers)
          .read(new RowProgress((share, message) -> true, raw.length(), System::nanoTime));
      long t2 = now();
      SeriesStatistics statistics = SeriesStatistics.of(series, ZoneId.of("Europe/Amsterdam"));
      long t3 = now();
      write(out, series, statistics);
      System.out.printf(
          "rows %d; processor seconds: start %.2f plan %.2f read %.2f compute %.2f write %.2f%n",
          series.rows(),
          t0 / 1e9,
          (t1 - t0) / 1e9,
          (t2 - t1) / 1e9,
          (t3 - t2) / 1e9,
          (now() - t3) / 1e9);
    } finally {
      workers.shutdown();
    }
  }

  /** Processor time of all threads, so that other work on the machine does not count. */
  private static long now() {
    return ((com.sun.management.OperatingSystemMXBean)
            java.lang.management.ManagementFactory.getOperatingSystemMXBean())
        .getProcessCpuTime();
  }

  private static InputStream open(RawFile raw) {
    try {
      return raw.open();
    } catch (IOException e) {
      throw new java.io.UncheckedIOException(e);
    }
  }

  private static void write(String out, LogSeries series, SeriesStatistics all) throws IOException {
    try (PrintWriter columns = new PrintWriter(out + "_columns.csv");
        PrintWriter weekly = new PrintWriter(out + "_weekly.csv");
        PrintWriter hours = new PrintWriter(out + "_hourweek.csv")) {
      for (int q = 0; q < series.quantities().size(); q++) {
        QuantityStatistics s = all.quantities().get(q);
        String name = series.quantities().get(q);
        columns.println(
            name + "," + s.count() + "," + s.min() + "," + s.mean() + "," + s.max() + "," + s.p95()
                + "," + s.p99());
        weekly.println(
            name
                + ","
                + java.util.Arrays.toString(s.weekP95())
                + ","
                + java.util.Arrays.toString(s.weekP99()));
        hours.println(name + "," + java.util.Arrays.toString(s.hourOfWeekMean()));
      }
    }
  }
}
