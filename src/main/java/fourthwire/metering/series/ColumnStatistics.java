package fourthwire.metering.series;

import java.util.Arrays;

/**
 * Statistics of a column, in memory for a week of it and the highest twentieth of all; of very many
 * rows for a week alone. Not thread-safe: the week's array is used again for the next column.
 */
final class ColumnStatistics {
  /** Of more rows the percentiles are searched for in passes. */
  private static final int MOST_IN_MEMORY = 4_000_000;

  private final Series series;
  private final RowWeeks rows;
  private final int[] firstRow;
  private double[] current = new double[1024];

  ColumnStatistics(Series series, RowWeeks rows) {
    this.series = series;
    this.rows = rows;
    this.firstRow = new int[series.chunks() + 1];
    for (int k = 0; k < series.chunks(); k++) {
      firstRow[k + 1] = firstRow[k] + series.rows(k);
    }
  }

  /** What a pass over the values gathers. */
  private static final class Sums {
    private final double[] hourSum = new double[WeekClock.HOURS];
    private final long[] hourCount = new long[WeekClock.HOURS];
    private double sum;
    private double min = Double.POSITIVE_INFINITY;
    private double max = Double.NEGATIVE_INFINITY;
    private long count;

    /**
     * Takes values of one hour.
     *
     * @param there gets those that are no NaN, from {@code at} on
     * @return how many were there
     */
    int take(double[] x, int from, int to, int hour, double[] there, int at) {
      int n = at;
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
      count += n - at;
      hourSum[hour] = ofHour;
      hourCount[hour] += n - at;
      return n - at;
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

  /** A week at a time. */
  QuantityStatistics of(int quantity) {
    Column column = new Column(quantity);
    Sums sums = new Sums();
    Weeks weeks = new Weeks(rows.weeks());
    boolean few = series.rows() <= MOST_IN_MEMORY;
    Highest highest = new Highest(few ? series.rows() : 0);
    int stretch = 0;
    for (int week = 0; week < rows.weeks(); week++) {
      int length = 0;
      for (; stretch < rows.weekEnd()[week]; stretch++) {
        length = column.take(stretch, sums, length);
      }
      weeks.take(week, current, 0, length);
      if (few) {
        highest.take(current, 0, length);
      }
    }
    double[] all =
        few ? highest.percentiles(95, 99) : new RankSearch(series, quantity).percentiles(95, 99);
    return statistics(sums, all, weeks);
  }

  /** A column's chunks, read as the stretches ask for them. */
  private final class Column {
    private final int quantity;
    private int chunk = -1;
    private double[] x = new double[0];

    Column(int quantity) {
      this.quantity = quantity;
    }

    /**
     * Takes a stretch, cut where chunks end.
     *
     * @param length of the week's values so far
     * @return of them then
     */
    int take(int stretch, Sums sums, int length) {
      int row = rows.firstRow()[stretch];
      int end = row + rows.rows()[stretch];
      if (length + end - row > current.length) {
        current = Arrays.copyOf(current, Math.max(2 * current.length, length + end - row));
      }
      int filled = length;
      while (row < end) {
        go(row);
        int from = row - firstRow[chunk];
        int to = Math.min(x.length, end - firstRow[chunk]);
        filled += sums.take(x, from, to, rows.hour()[stretch], current, filled);
        row = firstRow[chunk] + to;
      }
      return filled;
    }

    private void go(int row) {
      if (chunk < 0 || row < firstRow[chunk] || row >= firstRow[chunk + 1]) {
        int found = Arrays.binarySearch(firstRow, row);
        chunk = found >= 0 ? found : -found - 2;
        while (firstRow[chunk + 1] <= row) {
          chunk++;
        }
        x = series.values(chunk, quantity);
      }
    }
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
