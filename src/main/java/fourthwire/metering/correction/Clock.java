package fourthwire.metering.correction;

import fourthwire.metering.Correction.DropRepeats;
import fourthwire.metering.Correction.DropRows;
import fourthwire.metering.Correction.Rows;
import fourthwire.metering.Correction.ShiftClock;
import fourthwire.metering.Correction.Step;
import fourthwire.metering.series.Series;
import java.util.List;
import java.util.stream.IntStream;

/** When the rows of a corrected log are, and which of those as read are left out. */
final class Clock {
  private static final int[] NONE = {};

  private final Series read;
  private final List<ShiftClock> shifts;
  private final long[] firstRow;
  private final int[][] dropped;
  private final long rows;

  Clock(Series read, List<Step> steps) {
    this.read = read;
    this.firstRow = CorrectedSeries.firstRows(read);
    this.shifts = Columns.of(steps, ShiftClock.class);
    List<DropRepeats> repeats = Columns.of(steps, DropRepeats.class);
    List<DropRows> drops = Columns.of(steps, DropRows.class);
    this.dropped = new int[read.chunks()][];
    long before = Long.MIN_VALUE;
    long left = read.rows();
    for (int chunk = 0; chunk < dropped.length; chunk++) {
      dropped[chunk] = NONE;
      if (!repeats.isEmpty() || !drops.isEmpty()) {
        long[] times = read.startMillis(chunk);
        dropped[chunk] = dropped(chunk, times, before, repeats, drops);
        before = times.length == 0 ? before : times[times.length - 1];
        left -= dropped[chunk].length;
      }
    }
    this.rows = left;
  }

  private int[] dropped(
      int chunk, long[] times, long before, List<DropRepeats> repeats, List<DropRows> drops) {
    return IntStream.range(0, times.length)
        .filter(
            k -> {
              long row = firstRow[chunk] + k;
              return drops.stream().anyMatch(d -> holds(d.rows(), row))
                  || times[k] == (k == 0 ? before : times[k - 1])
                      && repeats.stream().anyMatch(d -> holds(d.rows(), row));
            })
        .toArray();
  }

  private static boolean holds(Rows rows, long row) {
    return row >= rows.from() && row < rows.to();
  }

  boolean changes() {
    return !shifts.isEmpty() || rows != read.rows();
  }

  long rows() {
    return rows;
  }

  /** Rows of a chunk that are left out, rising. */
  int[] dropped(int chunk) {
    return dropped[chunk];
  }

  /** Times of all rows of a chunk as read. */
  long[] times(int chunk) {
    long[] times = read.startMillis(chunk);
    if (shifts.isEmpty()) {
      return times;
    }
    long[] shifted = times.clone();
    for (ShiftClock shift : shifts) {
      int to = Columns.end(shift.rows(), firstRow[chunk], shifted.length);
      for (int row = Columns.begin(shift.rows(), firstRow[chunk], shifted.length);
          row < to;
          row++) {
        shifted[row] += shift.millis();
      }
    }
    return shifted;
  }
}
