package fourthwire.metering.series;

import java.time.ZoneId;
import java.util.Arrays;

/**
 * Statistics of a column, in one array where it fits, else in passes over the chunks. Not
 * thread-safe: the array is used again for the next column.
 */
final class ColumnStatistics {
  private final Series series;
  private final RowWeeks rows;
  private double[] there = new double[0];

  ColumnStatistics(Series series, RowWeeks rows) {
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
      min = v < min ? v : min;
      max = v > max ? v : max;
      hourSum[hour] += v;
      hourCount[hour]++;
    }

    /**
     * Takes values of one hour.
     *
     * @return how many were there
     */
    int take(double[] x, int from, int to, int hour, double[] there) {
      int before = (int) count;
      int n = before;
      double total = sum;
      double ofHour = hourSum[hour];
      double low = min;
      double high = max;
      for (int k = from; k < to; k++) {
        double v = x[k];
        if (!Double.isNaN(v)) {
          there[n++] = v;
          total += v;
          ofHour += v;
          low = v < low ? v : low;
          high = v > high ? v : high;
        }
      }
      min = low;
      max = high;
      sum = total;
      count = n;
      hourSum[hour] = ofHour;
      hourCount[hour] += n - before;
      return n - before;
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
    there = there.length == 0 ? new double[(int) series.rows()] : there;
    Sums sums = new Sums();
    int[] end = new int[rows.weeks() + 1];
    forEachStretch(
        quantity,
        (x, from, to, stretch) ->
            end[rows.week()[stretch] + 1] += sums.take(x, from, to, rows.hour()[stretch], there));
    for (int w = 1; w < end.length; w++) {
      end[w] += end[w - 1];
    }
    // The weeks' values stand together in the file's order, unless the clock ran back over a week.
    Weeks weeks = weeks(rows.rising() ? there : byWeek(quantity, end), end);
    double[] all =
        sums.count == 0
            ? new double[] {Double.NaN, Double.NaN}
            : Selection.percentiles(there, 0, (int) sums.count, 95, 99);
    return statistics(sums, all, weeks);
  }

  private interface Stretch {
    void take(double[] values, int from, int to, int stretch);
  }

  /** Passes stretches of one hour on, cut where chunks end. */
  private void forEachStretch(int quantity, Stretch taker) {
    int stretch = 0;
    int first = 0;
    for (int k = 0; k < series.chunks(); k++) {
      double[] x = series.values(k, quantity);
      int from = 0;
      while (from < x.length) {
        int to = Math.min(x.length, rows.end()[stretch] - first);
        taker.take(x, from, to, stretch);
        stretch += first + to == rows.end()[stretch] ? 1 : 0;
        from = to;
      }
      first += x.length;
    }
  }

  /** Values sorted into their weeks, the place of each known from the counts. */
  private double[] byWeek(int quantity, int[] end) {
    int[] next = end.clone();
    double[] byWeek = new double[end[end.length - 1]];
    forEachStretch(
        quantity,
        (x, from, to, stretch) -> {
          for (int k = from; k < to; k++) {
            if (!Double.isNaN(x[k])) {
              byWeek[next[rows.week()[stretch]]++] = x[k];
            }
          }
        });
    return byWeek;
  }

  private Weeks weeks(double[] byWeek, int[] end) {
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
