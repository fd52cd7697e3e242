package fourthwire.intake.reading.log;

import fourthwire.intake.reading.table.DateOrder;
import fourthwire.intake.reading.table.RowTime;
import fourthwire.intake.reading.table.TextTable;
import fourthwire.intake.reading.table.TimeColumns;

/** Whether a log's newest row stands first: then it is read from its last row to its first. */
final class NewestFirst {
  private static final int LOOK_ROWS = 300;

  /** Few rows may run the other way, as the hour that autumn repeats does. */
  private static final int BACK_FOR_ONE_ON = 20;

  private NewestFirst() {}

  /** By the steps between its first rows. */
  static boolean is(TextTable table, TimeColumns time, DateOrder order) {
    RowTime at = new RowTime(time, order);
    long[] before = {0};
    int[] count = {0, 0, 0};
    table.forEach(
        time.cells(),
        row -> {
          if (at.read(row)) {
            int step = count[0] == 0 ? 0 : Long.compare(at.localMillis(), before[0]);
            count[1] += step < 0 ? 1 : 0;
            count[2] += step > 0 ? 1 : 0;
            before[0] = at.localMillis();
            count[0]++;
          }
          return count[0] < LOOK_ROWS;
        });
    return count[1] > BACK_FOR_ONE_ON * count[2];
  }
}
