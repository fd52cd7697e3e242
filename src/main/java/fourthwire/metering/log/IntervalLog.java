package fourthwire.metering.log;

import java.time.Duration;
import java.time.Instant;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalLong;
import java.util.Set;

/**
 * The rows of an interval log as read, in the order they stand: when each interval begins and what
 * was logged in it, NaN where nothing was. Immutable.
 */
public final class IntervalLog {
  private final long[] startMillis;
  private final long intervalMillis;
  private final Map<String, double[]> columns;

  private IntervalLog(long[] startMillis, long intervalMillis, Map<String, double[]> columns) {
    this.startMillis = startMillis;
    this.intervalMillis = intervalMillis;
    this.columns = columns;
  }

  /** Of a series. */
  static IntervalLog of(fourthwire.metering.series.LogSeries series, long intervalMillis) {
    long[] start = new long[(int) series.rows()];
    int at = 0;
    for (int k = 0; k < series.chunks(); k++) {
      System.arraycopy(series.startMillis(k), 0, start, at, series.rows(k));
      at += series.rows(k);
    }
    Map<String, double[]> columns = new LinkedHashMap<>();
    for (int q = 0; q < series.quantities().size(); q++) {
      columns.put(series.quantities().get(q), series.all(q));
    }
    return new IntervalLog(start, intervalMillis, columns);
  }

  /** Gathers rows; not thread-safe. Memory: eight bytes a value. */
  public static final class Builder {
    private final List<String> quantities;
    private final double[][] values;
    private long[] startMillis = new long[1024];
    private int rows;

    /** For these quantities, in the order of the values of a row. */
    public Builder(List<String> quantities) {
      this.quantities = List.copyOf(quantities);
      this.values = new double[quantities.size()][1024];
    }

    /**
     * Adds a row.
     *
     * @param millis its time, milliseconds of the epoch
     * @param row one value for each quantity, in SI units; NaN for none. Copied.
     */
    public void add(long millis, double[] row) {
      if (rows == startMillis.length) {
        grow();
      }
      startMillis[rows] = millis;
      for (int k = 0; k < row.length; k++) {
        values[k][rows] = row[k];
      }
      rows++;
    }

    private void grow() {
      int more = startMillis.length * 2;
      startMillis = Arrays.copyOf(startMillis, more);
      for (int k = 0; k < values.length; k++) {
        values[k] = Arrays.copyOf(values[k], more);
      }
    }

    /** Rows so far. */
    public int rows() {
      return rows;
    }

    /** The most frequent step from row to row, milliseconds; empty below two rows. */
    public OptionalLong usualStepMillis() {
      Map<Long, Integer> counts = new LinkedHashMap<>();
      for (int k = 1; k < rows; k++) {
        long step = startMillis[k] - startMillis[k - 1];
        if (step > 0) {
          counts.merge(step, 1, Integer::sum);
        }
      }
      return counts.entrySet().stream()
          .max(Map.Entry.comparingByValue())
          .map(e -> OptionalLong.of(e.getKey()))
          .orElse(OptionalLong.empty());
    }

    /**
     * The log.
     *
     * @param intervalMillis length of one row
     * @param stampedAtEnd whether the rows' times mark the ends of their intervals
     */
    public IntervalLog build(long intervalMillis, boolean stampedAtEnd) {
      long[] start = Arrays.copyOf(startMillis, rows);
      for (int k = 0; stampedAtEnd && k < rows; k++) {
        start[k] -= intervalMillis;
      }
      Map<String, double[]> columns = new LinkedHashMap<>();
      for (int k = 0; k < values.length; k++) {
        columns.put(quantities.get(k), Arrays.copyOf(values[k], rows));
      }
      return new IntervalLog(start, intervalMillis, columns);
    }
  }

  /** Rows, repeated ones included. */
  public int rows() {
    return startMillis.length;
  }

  /** Length of one row. */
  public Duration interval() {
    return Duration.ofMillis(intervalMillis);
  }

  /** When a row's interval begins. */
  public Instant start(int row) {
    return Instant.ofEpochMilli(startMillis[row]);
  }

  long startMillis(int row) {
    return startMillis[row];
  }

  long intervalMillis() {
    return intervalMillis;
  }

  /** The quantities logged, in the file's order. */
  public Set<String> quantities() {
    return columns.keySet();
  }

  /** Whether this quantity is logged. */
  public boolean has(String quantity) {
    return columns.containsKey(quantity);
  }

  /** A value; NaN where nothing was logged, or no such quantity. */
  public double at(String quantity, int row) {
    double[] column = columns.get(quantity);
    return column == null ? Double.NaN : column[row];
  }

  /** A copy of a quantity's values in the order of the rows; empty for one that is not logged. */
  public double[] values(String quantity) {
    return columns.getOrDefault(quantity, new double[0]).clone();
  }
}
