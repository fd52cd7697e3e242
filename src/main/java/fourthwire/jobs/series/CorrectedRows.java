package fourthwire.jobs.series;

import fourthwire.metering.correction.CorrectedSeries;
import fourthwire.metering.reduce.LogSpan;
import java.util.List;
import java.util.stream.IntStream;

/** The rows of a log as corrected, made from those as read when they are asked for. */
final class CorrectedRows implements LogSpan.Source {
  private final LogSpan.Source read;
  private final CorrectedSeries rows;
  private List<long[]> times = List.of();

  /** What no correction touches comes from {@code read}. */
  CorrectedRows(LogSpan.Source read, CorrectedSeries rows) {
    this.read = read;
    this.rows = rows;
  }

  @Override
  public List<long[]> times() {
    if (!changesRows()) {
      return read.times();
    }
    if (times.isEmpty()) {
      times = IntStream.range(0, rows.chunks()).mapToObj(rows::startMillis).toList();
    }
    return times;
  }

  @Override
  public void values(String quantity, int first, int last, LogSpan.ChunkTaker taker) {
    if (!changes(quantity)) {
      read.values(quantity, first, last, taker);
      return;
    }
    int column = rows.indexOf(quantity);
    for (int chunk = first; chunk <= last; chunk++) {
      taker.take(chunk, rows.values(chunk, column));
    }
  }

  /** Whether it differs from the rows as read. */
  boolean changes(String quantity) {
    return rows.changesRows() || rows.changes(quantity);
  }

  boolean changesRows() {
    return rows.changesRows();
  }
}
