package fourthwire.jobs.series;

import fourthwire.metering.correction.CorrectedSeries;
import fourthwire.metering.reduce.LogSpan;
import java.util.List;
import java.util.stream.IntStream;

/** The rows of a log as corrected, made from those as read when they are asked for. */
final class CorrectedRows implements LogSpan.Source {
  private final CorrectedSeries rows;
  private List<long[]> times = List.of();

  CorrectedRows(CorrectedSeries rows) {
    this.rows = rows;
  }

  @Override
  public List<long[]> times() {
    if (times.isEmpty()) {
      times = IntStream.range(0, rows.chunks()).mapToObj(rows::startMillis).toList();
    }
    return times;
  }

  @Override
  public void values(String quantity, int first, int last, LogSpan.ChunkTaker taker) {
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
