package fourthwire.metering.log;

import fourthwire.metering.series.Series;
import java.util.Arrays;

/** Finds where rows of a log stand in it a second time: blocks that were written twice. */
final class EarlierRows {
  /** The column of times. */
  private static final int TIMES = -1;

  private final Series series;
  private final long[] first;

  EarlierRows(Series series) {
    this.series = series;
    this.first = new long[series.chunks() + 1];
    for (int k = 0; k < series.chunks(); k++) {
      first[k + 1] = first[k] + series.rows(k);
    }
  }

  /** How many rows from this one on repeat earlier rows, one by one, in time and values. */
  long repeated(long row, long millis) {
    long earlier = last(millis, row);
    if (earlier < 0) {
      return 0;
    }
    long count = Math.min(first[first.length - 1] - row, row - earlier);
    for (int q = TIMES; q < series.quantities().size() && count > 0; q++) {
      count = alike(earlier, row, count, q);
    }
    return count;
  }

  /** The last row of this time before another; -1 for none. */
  private long last(long millis, long before) {
    for (int chunk = chunk(before); chunk >= 0; chunk--) {
      long[] times = series.startMillis(chunk);
      for (int k = (int) Math.min(times.length, before - first[chunk]) - 1; k >= 0; k--) {
        if (times[k] == millis) {
          return first[chunk] + k;
        }
      }
    }
    return -1;
  }

  /** How many values of a column from two rows on are the same, at most so many. */
  private long alike(long a, long b, long most, int quantity) {
    long same = 0;
    while (same < most) {
      int in = chunk(a + same);
      int other = chunk(b + same);
      int from = (int) (a + same - first[in]);
      int otherFrom = (int) (b + same - first[other]);
      int room = Math.min(series.rows(in) - from, series.rows(other) - otherFrom);
      int count = (int) Math.min(most - same, room);
      int mismatch =
          quantity == TIMES
              ? Arrays.mismatch(
                  series.startMillis(in),
                  from,
                  from + count,
                  series.startMillis(other),
                  otherFrom,
                  otherFrom + count)
              : Arrays.mismatch(
                  series.values(in, quantity),
                  from,
                  from + count,
                  series.values(other, quantity),
                  otherFrom,
                  otherFrom + count);
      if (mismatch >= 0) {
        return same + mismatch;
      }
      same += count;
    }
    return same;
  }

  private int chunk(long row) {
    int found = Arrays.binarySearch(first, row);
    return found >= 0 ? found : -found - 2;
  }
}
