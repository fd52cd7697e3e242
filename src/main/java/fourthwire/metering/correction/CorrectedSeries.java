package fourthwire.metering.correction;

import fourthwire.metering.Correction;
import fourthwire.metering.Correction.Step;
import fourthwire.metering.series.Series;
import java.util.List;

/**
 * A log with corrections: made column by column from the rows as read when it is asked for, in
 * memory that does not grow with the log.
 *
 * <p>Whatever their order, corrections are applied as: values left out, signs, factors, columns
 * under other names, sums of lines, distortions; then the clock, and rows left out. The same step
 * asked for twice, as two findings of one fault do, is done once; different ones all count: factors
 * multiply, shifts add up.
 */
public final class CorrectedSeries implements Series {
  private final Series read;
  private final Clock clock;
  private final Columns columns;

  /** Of a log as read, with these corrections, or none. */
  public CorrectedSeries(Series read, List<Correction> corrections) {
    List<Step> steps = corrections.stream().flatMap(c -> c.steps().stream()).distinct().toList();
    this.read = read;
    this.clock = new Clock(read, steps);
    this.columns = new Columns(read, steps);
  }

  /** Whether rows are other ones or stand at other times than as read. */
  public boolean changesRows() {
    return clock.changes();
  }

  /** Whether a column is another one than as read, apart from rows left out. */
  public boolean changes(String quantity) {
    return columns.changes(quantity);
  }

  @Override
  public List<String> quantities() {
    return read.quantities();
  }

  @Override
  public long rows() {
    return clock.rows();
  }

  @Override
  public int chunks() {
    return read.chunks();
  }

  @Override
  public int rows(int chunk) {
    return read.rows(chunk) - clock.dropped(chunk).length;
  }

  @Override
  public long[] startMillis(int chunk) {
    long[] times = clock.times(chunk);
    int[] dropped = clock.dropped(chunk);
    if (dropped.length == 0) {
      return times;
    }
    long[] kept = new long[times.length - dropped.length];
    copyKept(times, kept, dropped);
    return kept;
  }

  @Override
  public double[] values(int chunk, int quantity) {
    double[] values = columns.of(chunk, quantities().get(quantity));
    int[] dropped = clock.dropped(chunk);
    if (dropped.length == 0) {
      return values;
    }
    double[] kept = new double[values.length - dropped.length];
    copyKept(values, kept, dropped);
    return kept;
  }

  /** Copies what stands between the rows left out; both are arrays of one kind. */
  private static void copyKept(Object from, Object to, int[] dropped) {
    int read = 0;
    int written = 0;
    for (int gone : dropped) {
      System.arraycopy(from, read, to, written, gone - read);
      written += gone - read;
      read = gone + 1;
    }
    System.arraycopy(from, read, to, written, java.lang.reflect.Array.getLength(from) - read);
  }

  /** First row of every chunk in the log as read, and behind the last. */
  static long[] firstRows(Series read) {
    long[] first = new long[read.chunks() + 1];
    for (int k = 0; k < read.chunks(); k++) {
      first[k + 1] = first[k] + read.rows(k);
    }
    return first;
  }
}
