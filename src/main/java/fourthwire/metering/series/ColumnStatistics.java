package fourthwire.metering.series;

import java.time.ZoneId;
import java.util.Arrays;

/** Statistics of one column, in one array where it fits, else in passes over the chunks. */
final class ColumnStatistics {
  private final LogSeries series;
  private final RowWeeks rows;

  ColumnStatistics(LogSeries series, RowWeeks rows) {
    this.series = series;
    this.rows = rows;
  }

  /** What a pass over the values gathers. */
  private static final class Sums {
    private final double[] hourSum = new double[WeekClock.HOURS];
    private final long[] hourCount = new long[WeekClock.HOURS];
    private double sum;
    private double min = Double.POSITIVE_INFINITY;
    private double max = Double.NEGATIVE_INFINITY;
    private long count;

    void take(double v, int hour) {
      count++;
      sum += v;
      min = Math.min(min, v);
      max = Math.max(max, v);
      hourSum[hour] += v;
      hourCount[hour]++;
    }

    double[] hourMeans() {
      double[] means = new double[WeekClock.HOURS];
      Arrays.setAll(means, h -> hourCount[h] == 0 ? Double.NaN : hourSum[h] / hourCount[h]);
      return means;
    }
  }

  /** By week: how many, and the two percentiles. */
  private static final class Weeks {
    private final long[] count;
    private final double[] p95;
    private final double[] p99;

    Weeks(int weeks) {
      count = new long[weeks];
      p95 = new double[weeks];
      p99 = new double[weeks];
      Arrays.fill(p95, Double.NaN);
      Arrays.fill(p99, Double.NaN);
    }

    /** Takes a week's values, which are reordered. */
    void take(int week, double[] x, int from, int to) {
      if (to > from) {
        double[] found = Selection.percentiles(x, from, to, 95, 99);
        count[week] = to - from;
        p95[week] = found[0];
        p99[week] = found[1];
      }
    }
  }

  QuantityStatistics inArray(int quantity) {
    double[] there = new double[rows.week().length];
    Sums sums = new Sums();
    int[] end = new int[rows.weeks() + 1];
    int row = 0;
    for (int k = 0; k < series.chunks(); k++) {
      for (double v : series.values(k, quantity)) {
        if (!Double.isNaN(v)) {
          there[(int) sums.count] = v;
          sums.take(v, rows.hour()[row]);
          end[rows.week()[row] + 1]++;
        }
        row++;
      }
    }
    Weeks weeks = weeks(quantity, end);
    double[] all =
        sums.count == 0
            ? new double[] {Double.NaN, Double.NaN}
            : Selection.percentiles(there, 0, (int) sums.count, 95, 99);
    return statistics(sums, all, weeks);
  }

  /** Values sorted into their weeks, the place of each known from the counts. */
  private Weeks weeks(int quantity, int[] end) {
    for (int w = 1; w < end.length; w++) {
      end[w] += end[w - 1];
    }
    int[] next = end.clone();
    double[] byWeek = new double[end[end.length - 1]];
    int row = 0;
    for (int k = 0; k < series.chunks(); k++) {
      for (double v : series.values(k, quantity)) {
        if (!Double.isNaN(v)) {
          byWeek[next[rows.week()[row]]++] = v;
        }
        row++;
      }
    }
    Weeks weeks = new Weeks(rows.weeks());
    for (int w = 0; w < rows.weeks(); w++) {
      weeks.take(w, byWeek, end[w], end[w + 1]);
    }
    return weeks;
  }

  /** A week at a time; rows of an earlier week that come late are left out of it. */
  QuantityStatistics inPasses(int quantity, ZoneId zone) {
    Sums sums = new Sums();
    Weeks weeks = new Weeks(rows.weeks());
    WeekClock clock = new WeekClock(zone);
    double[] current = new double[1 << 16];
    int length = 0;
    int week = 0;
    for (int k = 0; k < series.chunks(); k++) {
      double[] values = series.values(k, quantity);
      long[] start = series.startMillis(k);
      for (int row = 0; row < values.length; row++) {
        double v = values[row];
        if (Double.isNaN(v)) {
          continue;
        }
        sums.take(v, clock.hourOfWeek(start[row]));
        int in = (int) (clock.week(start[row]) - rows.firstWeek());
        if (in < week) {
          continue;
        }
        if (in > week) {
          weeks.take(week, current, 0, length);
          week = in;
          length = 0;
        }
        current = length == current.length ? Arrays.copyOf(current, 2 * length) : current;
        current[length++] = v;
      }
    }
    weeks.take(week, current, 0, length);
    return statistics(sums, new RankSearch(series, quantity).percentiles(95, 99), weeks);
  }

  private static QuantityStatistics statistics(Sums sums, double[] all, Weeks weeks) {
    return new QuantityStatistics(
        sums.count,
        sums.min,
        sums.sum / sums.count,
        sums.max,
        all[0],
        all[1],
        weeks.count,
        weeks.p95,
        weeks.p99,
        sums.hourMeans());
  }
}
