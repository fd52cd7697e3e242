package fourthwire.intake.reading.log;

import fourthwire.intake.reading.ReadingRefusedException;
import fourthwire.intake.reading.table.RowTime;
import fourthwire.intake.reading.table.TextTable;
import fourthwire.metering.QualityFinding;
import fourthwire.metering.ReadingMapping;
import fourthwire.metering.ReadingMapping.Stamp;
import fourthwire.metering.log.LogSteps;
import fourthwire.metering.series.LogChunk;
import fourthwire.metering.series.LogSeries;
import java.time.ZoneId;
import java.time.ZoneOffset;
import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Deque;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.concurrent.CompletableFuture;
import java.util.concurrent.CompletionException;
import java.util.concurrent.Executor;

/**
 * Reads the rows of a log as planned: blocks of bytes are parsed by workers, put in order here, and
 * handed on in chunks.
 */
final class LogRows {
  private static final int BLOCKS_AHEAD = 4;

  private final TextTable table;
  private final LogColumns columns;
  private final Optional<Long> toldInterval;
  private final boolean stampedAtEnd;
  private final LocalClock clock;
  private final LogSeries series;
  private final Optional<LogSeries> newestFirst;
  private final Executor workers;
  private final LogSteps steps = new LogSteps();
  private final Deque<ParsedRows> spare = new ArrayDeque<>();
  private final List<String> passedOver = new ArrayList<>();
  private final List<String> unreadable = new ArrayList<>();
  private long[] times = new long[LogChunk.ROWS];
  private double[][] values;
  private int filled;
  private long rowsWithOffset;
  private long fileRows;
  private long passedOverRows;
  private long unreadableCells;

  /**
   * @param newestFirst takes the rows as they stand where the newest is the first
   */
  LogRows(
      TextTable table,
      LogColumns columns,
      ReadingMapping mapping,
      LogSeries series,
      Optional<LogSeries> newestFirst,
      Executor workers) {
    this.table = table;
    this.columns = columns;
    this.series = series;
    this.newestFirst = newestFirst;
    this.workers = workers;
    ReadingMapping.Time time = mapping.time();
    this.toldInterval =
        time.intervalS().isPresent()
            ? Optional.of(Math.round(1000 * time.intervalS().getAsDouble()))
            : Optional.empty();
    this.stampedAtEnd = time.stamp().orElse(Stamp.START) == Stamp.END;
    this.clock = new LocalClock(time.zone().map(ZoneId::of).orElse(ZoneOffset.UTC));
    this.values = new double[columns.count()][LogChunk.ROWS];
  }

  /** Reads all rows into the series. */
  void read(RowProgress progress) {
    Deque<Ahead> ahead = new ArrayDeque<>();
    try (TextTable.RowBlocks blocks = table.inBlocks()) {
      Optional<TextTable.RowBlock> block = blocks.next();
      while (block.isPresent() || !ahead.isEmpty()) {
        if (block.isPresent()) {
          ahead.add(parsing(block.get()));
          block = blocks.next();
        }
        if (ahead.size() > BLOCKS_AHEAD || block.isEmpty()) {
          Ahead next = ahead.remove();
          ParsedRows parsed = joined(next.rows());
          take(parsed);
          spare.add(parsed);
          blocks.useAgain(next.block());
          progress.at(newestFirst.orElse(series).rows() + filled, blocks.bytesRead());
        }
      }
    }
    newestFirst.ifPresentOrElse(this::turn, this::flush);
    if (series.rows() == 0) {
      throw new ReadingRefusedException(
          "No row has a time that can be read.", table.headings(), List.of());
    }
  }

  /** A block and its rows, which a worker is reading. */
  private record Ahead(TextTable.RowBlock block, CompletableFuture<ParsedRows> rows) {}

  private Ahead parsing(TextTable.RowBlock block) {
    ParsedRows rows = spare.isEmpty() ? new ParsedRows(columns) : spare.remove();
    return new Ahead(block, CompletableFuture.supplyAsync(() -> rows.fill(block), workers));
  }

  private static ParsedRows joined(CompletableFuture<ParsedRows> parsed) {
    try {
      return parsed.join();
    } catch (CompletionException e) {
      if (e.getCause() instanceof RuntimeException cause) {
        throw cause;
      }
      throw e;
    }
  }

  private void take(ParsedRows block) {
    notes(block);
    int from = 0;
    while (from < block.rows()) {
      int count = Math.min(block.rows() - from, LogChunk.ROWS - filled);
      for (int k = 0; k < count; k++) {
        times[filled + k] = time(block, from + k);
      }
      block.copy(from, values, filled, count);
      from += count;
      filled += count;
      if (filled == LogChunk.ROWS) {
        newestFirst.ifPresentOrElse(this::keep, this::flush);
      }
    }
  }

  /** The instant; of rows to be turned the time as written where no offset is. */
  private long time(ParsedRows block, int row) {
    int offset = block.offsetSeconds(row);
    rowsWithOffset += offset == RowTime.NO_OFFSET ? 0 : 1;
    if (newestFirst.isPresent()) {
      return block.localMillis(row) - (offset == RowTime.NO_OFFSET ? 0 : 1000L * offset);
    }
    long instant = instant(block, row);
    steps.take(instant);
    return instant;
  }

  /** Puts rows aside as they stand. */
  private void keep(LogSeries asWritten) {
    if (filled > 0) {
      asWritten.add(new LogChunk(Arrays.copyOf(times, filled), gathered()), workers);
      filled = 0;
    }
  }

  /** Hands on the rows put aside, the last first. */
  private void turn(LogSeries asWritten) {
    keep(asWritten);
    boolean instants = rowsWithOffset > 0;
    if (instants && rowsWithOffset < asWritten.rows()) {
      throw new ReadingRefusedException(
          "The newest row stands first, and only some times have their offset from UTC written:"
              + " sort the rows by time and upload again.");
    }
    for (int k = asWritten.chunks() - 1; k >= 0; k--) {
      long[] written = asWritten.startMillis(k);
      double[][] before = new double[values.length][];
      for (int q = 0; q < before.length; q++) {
        before[q] = asWritten.values(k, q);
      }
      for (int row = written.length - 1; row >= 0; row--) {
        times[filled] = instants ? written[row] : clock.at(written[row]);
        steps.take(times[filled]);
        for (int q = 0; q < before.length; q++) {
          values[q][filled] = before[q][row];
        }
        if (++filled == LogChunk.ROWS) {
          flush();
        }
      }
    }
    flush();
  }

  private long instant(ParsedRows block, int row) {
    int offset = block.offsetSeconds(row);
    return offset == RowTime.NO_OFFSET
        ? clock.at(block.localMillis(row))
        : block.localMillis(row) - 1000L * offset;
  }

  /** Hands on what was gathered; a chunk is never changed afterwards. */
  private void flush() {
    if (filled == 0) {
      return;
    }
    long back = stampedAtEnd ? intervalMillis() : 0;
    long[] start = Arrays.copyOf(times, filled);
    for (int k = 0; k < filled && back > 0; k++) {
      start[k] -= back;
    }
    series.add(new LogChunk(start, gathered()), workers);
    filled = 0;
  }

  /** The values gathered, given away. */
  private double[][] gathered() {
    double[][] chunk = values;
    for (int k = 0; k < chunk.length && filled < LogChunk.ROWS; k++) {
      chunk[k] = Arrays.copyOf(chunk[k], filled);
    }
    values = new double[columns.count()][LogChunk.ROWS];
    return chunk;
  }

  /** Length of a row: as told, else the usual step so far. */
  long intervalMillis() {
    long interval = toldInterval.orElseGet(() -> steps.usualMillis().orElse(0));
    if (interval <= 0) {
      throw new ReadingRefusedException(
          "The interval can't be told from the rows.",
          table.headings(),
          List.of(
              new ReadingRefusedException.Question(
                  "time.interval_s", "give the length of a row in seconds")));
    }
    return interval;
  }

  /** Refuses values without a time in the first rows, before the rest is read. */
  static void checkFirst(TextTable table, LogColumns columns) {
    try (TextTable.RowBlocks blocks = table.inBlocks()) {
      blocks.next().ifPresent(b -> refuseTimeless(new ParsedRows(columns).fill(b), 0, columns));
    }
  }

  private static void refuseTimeless(ParsedRows block, long before, LogColumns columns) {
    for (ParsedRows.Trouble t : block.timeless()) {
      throw new ReadingRefusedException(
          "Row "
              + (before + t.row())
              + ": \""
              + t.text()
              + "\" is no time in the order "
              + columns.order().pattern()
              + ", but the row holds values.",
          columns.headings(),
          List.of(
              new ReadingRefusedException.Question(
                  "time.format", "say how times are written, or mend the row")));
    }
  }

  private void notes(ParsedRows block) {
    refuseTimeless(block, fileRows, columns);
    for (ParsedRows.Trouble t : block.passedOver()) {
      tell(passedOver, "row " + (fileRows + t.row()));
    }
    for (ParsedRows.Trouble t : block.unreadable()) {
      tell(unreadable, "row " + (fileRows + t.row()) + ", " + t.text());
    }
    passedOverRows += block.passedOverRows();
    unreadableCells += block.unreadableCells();
    fileRows += block.fileRows();
  }

  private static void tell(List<String> told, String what) {
    if (told.size() < ParsedRows.TOLD) {
      told.add(what);
    }
  }

  /** What was passed over. */
  List<String> notes() {
    return passedOverRows == 0
        ? List.of()
        : List.of(
            passedOverRows
                + " rows without a time were passed over: "
                + String.join(", ", passedOver)
                + (passedOverRows > passedOver.size() ? " …" : "")
                + ".");
  }

  /** What was wrong with cells and times. */
  List<QualityFinding> findings() {
    List<QualityFinding> findings = new ArrayList<>();
    if (unreadableCells > 0) {
      findings.add(
          finding(
              QualityFinding.IMPOSSIBLE_VALUE,
              "They are left out as if blank.",
              unreadableCells + " cells are no numbers: " + String.join("; ", unreadable) + "."));
    }
    if (clock.skipped() > 0) {
      findings.add(
          finding(
              QualityFinding.CLOCK_JUMP,
              "From then on times may be an hour off.",
              String.format(
                  Locale.ROOT,
                  "%d rows stand at a local time that the change to summer time skips: the meter's"
                      + " clock may keep winter time all year.",
                  clock.skipped())));
    }
    return findings;
  }

  private static QualityFinding finding(String code, String effect, String sentence) {
    return new QualityFinding(code, Optional.empty(), effect, sentence);
  }
}
