package fourthwire.metering.assess;

import fourthwire.metering.series.Series;
import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * What was there of one quantity in one day, week or year of a log, in the values that standards
 * count: very short ones of 3 s, short ones of 10 min (IEC 61000-4-30:2015, 4.5: roots of mean
 * squares of shorter rows). Days and weeks follow each other from the log's first full ten minutes
 * on.
 */
public final class PeriodFigures {
  /** A value of which a tenth is missing is none. */
  private static final double LEAST_SHARE = 0.9;

  private final Instant from;
  private final int needed;
  private final double[] sorted;

  private PeriodFigures(Instant from, int needed, double[] sorted) {
    this.from = from;
    this.needed = needed;
    this.sorted = sorted;
  }

  /** Which values of which period. */
  public enum Span {
    /** The 3 s values of a day. */
    DAY(Duration.ofSeconds(3), Duration.ofDays(1)),
    /** The 10 min values of a week. */
    WEEK(Duration.ofMinutes(10), Duration.ofDays(7)),
    /** The 10 s values of a year of 365 days. */
    YEAR(Duration.ofSeconds(10), Duration.ofDays(365));

    private final long value;
    private final long period;

    Span(Duration value, Duration period) {
      this.value = value.toMillis();
      this.period = period.toMillis();
    }

    /** Whether rows of this length make such values. */
    public boolean canBeMadeOf(Duration interval) {
      return !interval.isZero() && value % interval.toMillis() == 0;
    }
  }

  /** A column's values by chunk, as logged or formed from several. */
  public interface Column {
    /** Values of a chunk; NaN for none. */
    double[] of(int chunk);
  }

  /**
   * Of a log, period by period; none where its rows are too long.
   *
   * @param column values beside the rows of the log
   * @param interval length of a row
   */
  public static List<PeriodFigures> of(Series log, Column column, Duration interval, Span span) {
    if (!span.canBeMadeOf(interval) || log.rows() == 0) {
      return List.of();
    }
    Gatherer gatherer = new Gatherer(origin(log), span, interval.toMillis());
    for (int chunk = 0; chunk < log.chunks(); chunk++) {
      gatherer.take(log.startMillis(chunk), column.of(chunk));
    }
    return gatherer.done();
  }

  /** The first full ten minutes of the clock; a log of ten-minute rows keeps its own. */
  private static long origin(Series log) {
    long first = log.startMillis(0)[0];
    return first - Math.floorMod(first, Span.WEEK.value);
  }

  /** When the period begins. */
  public Instant from() {
    return from;
  }

  /** Values that a whole period has. */
  public int needed() {
    return needed;
  }

  /** Values that were there. */
  public int there() {
    return sorted.length;
  }

  /** Share of the period that was there, percent. */
  public double sharePercent() {
    return 100.0 * sorted.length / needed;
  }

  /** A percentile of what was there, linear between the ordered values; NaN without any. */
  public double percentile(double percent) {
    if (sorted.length == 0) {
      return Double.NaN;
    }
    double position = (sorted.length - 1) * percent / 100;
    int below = (int) position;
    double a = sorted[below];
    return below + 1 < sorted.length ? a + (position - below) * (sorted[below + 1] - a) : a;
  }

  /** How many values lie outside a band, its ends inside. */
  public int outside(double low, double high) {
    int count = 0;
    for (double v : sorted) {
      count += v < low || v > high ? 1 : 0;
    }
    return count;
  }

  /** How far a period meets a limit that so many of its values may pass. */
  public enum Outcome {
    /** Whatever the missing values were. */
    WITHIN,
    /** Whatever the missing values were. */
    OVER,
    /** What is missing could turn it. */
    OPEN
  }

  /**
   * Whether the values keep within a band.
   *
   * @param percent share of the whole period's values that must, 100 for all
   */
  public Outcome judge(double low, double high, double percent) {
    double may = needed * (100 - percent) / 100;
    int outside = outside(low, high);
    if (outside > may) {
      return Outcome.OVER;
    }
    return outside + needed - there() <= may ? Outcome.WITHIN : Outcome.OPEN;
  }

  /** Makes the values of a period, then the period. */
  private static final class Gatherer {
    private final long origin;
    private final Span span;
    private final double rowsInValue;
    private final int needed;
    private final List<PeriodFigures> periods = new ArrayList<>();
    private double[] values = new double[1024];
    private int count;
    private long period;
    private long value;
    private double square;
    private int rows;

    Gatherer(long origin, Span span, long interval) {
      this.origin = origin;
      this.span = span;
      this.rowsInValue = (double) span.value / interval;
      this.needed = (int) (span.period / span.value);
    }

    void take(long[] times, double[] column) {
      for (int k = 0; k < times.length; k++) {
        if (!Double.isNaN(column[k])) {
          long at = Math.floorDiv(times[k] - origin, span.value);
          if (at != value) {
            endValue();
            value = at;
          }
          square += column[k] * column[k];
          rows++;
        }
      }
    }

    private void endValue() {
      long in = Math.floorDiv(value * span.value, span.period);
      if (in != period) {
        endPeriod(in);
      }
      if (rows >= LEAST_SHARE * rowsInValue && count < needed) {
        values = count == values.length ? Arrays.copyOf(values, 2 * count) : values;
        values[count++] = Math.sqrt(square / rows);
      }
      square = 0;
      rows = 0;
    }

    /** Periods without any value are there too, empty. */
    private void endPeriod(long next) {
      for (; period < next; period++) {
        double[] sorted = Arrays.copyOf(values, count);
        Arrays.sort(sorted);
        periods.add(
            new PeriodFigures(Instant.ofEpochMilli(origin + period * span.period), needed, sorted));
        count = 0;
      }
    }

    List<PeriodFigures> done() {
      endValue();
      endPeriod(period + 1);
      return periods;
    }
  }
}
