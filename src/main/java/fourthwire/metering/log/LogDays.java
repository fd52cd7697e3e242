package fourthwire.metering.log;

import fourthwire.metering.series.Series;
import fourthwire.metering.series.WeekClock;
import java.time.ZoneId;
import java.util.Arrays;
import java.util.HashMap;
import java.util.Map;
import java.util.function.Consumer;

/** Goes through a series by local days. */
final class LogDays {
  /** A day of more rows is passed on in parts. */
  private static final int MOST_ROWS = 20_000;

  private final Series series;
  private final Map<String, Integer> numbers = new HashMap<>();
  private final WeekClock clock;
  private final long intervalMillis;
  private final Consumer<LogDay> taker;
  private long[] start = new long[256];
  private double[][] values;
  private int rows;
  private long passed;

  private LogDays(Series series, ZoneId zone, long intervalMillis, Consumer<LogDay> taker) {
    this.series = series;
    this.clock = new WeekClock(zone);
    this.intervalMillis = intervalMillis;
    this.taker = taker;
    this.values = new double[series.quantities().size()][256];
    for (int q = 0; q < values.length; q++) {
      numbers.putIfAbsent(series.quantities().get(q), q);
    }
  }

  static void forEach(Series series, ZoneId zone, long intervalMillis, Consumer<LogDay> taker) {
    LogDays days = new LogDays(series, zone, intervalMillis, taker);
    for (int k = 0; k < series.chunks(); k++) {
      days.take(k);
    }
    days.pass();
  }

  private void take(int chunk) {
    long[] times = series.startMillis(chunk);
    double[][] columns = new double[values.length][];
    Arrays.setAll(columns, q -> series.values(chunk, q));
    int from = 0;
    while (from < times.length) {
      long day = clock.day(times[from]);
      if (rows > 0 && (clock.day(start[rows - 1]) != day || rows >= MOST_ROWS)) {
        pass();
      }
      int to = from + 1;
      while (to < times.length && to - from + rows < MOST_ROWS && clock.day(times[to]) == day) {
        to++;
      }
      if (rows == 0 && to < times.length) {
        pass(times, columns, from, to);
      } else {
        append(times, columns, from, to);
      }
      from = to;
    }
  }

  private void append(long[] times, double[][] columns, int from, int to) {
    int more = to - from;
    if (rows + more > start.length) {
      int room = Math.max(2 * start.length, rows + more);
      start = Arrays.copyOf(start, room);
      for (int q = 0; q < values.length; q++) {
        values[q] = Arrays.copyOf(values[q], room);
      }
    }
    System.arraycopy(times, from, start, rows, more);
    for (int q = 0; q < values.length; q++) {
      System.arraycopy(columns[q], from, values[q], rows, more);
    }
    rows += more;
  }

  private void pass() {
    if (rows > 0) {
      pass(start, values, 0, rows);
      rows = 0;
    }
  }

  private void pass(long[] times, double[][] columns, int from, int to) {
    double[][] day = new double[columns.length][];
    for (int q = 0; q < columns.length; q++) {
      day[q] = Arrays.copyOfRange(columns[q], from, to);
    }
    taker.accept(
        new LogDay(
            series.quantities(),
            numbers,
            Arrays.copyOfRange(times, from, to),
            day,
            passed,
            intervalMillis));
    passed += to - from;
  }
}
