package fourthwire.metering.log;

import java.util.function.ToDoubleBiFunction;

/**
 * What one row alone says of a fault that its day has: where in the day it began or ended shows as
 * the cut that parts the rows best.
 */
interface RowTest {
  /** Says nothing: the fault is of whole days. */
  RowTest NONE = (day, row) -> 0;

  /** 1 where the row has the fault, -1 where it has not, 0 where it does not tell. */
  int of(LogDay day, int row);

  /** By a ratio that is one without the fault and another with it. */
  static RowTest ofRatio(ToDoubleBiFunction<LogDay, Integer> ratio, double faulty) {
    return (day, row) -> {
      double r = ratio.applyAsDouble(day, row);
      if (!(r > 0) || Double.isInfinite(r)) {
        return 0;
      }
      return Math.abs(Math.log(r / faulty)) < Math.abs(Math.log(r)) ? 1 : -1;
    };
  }

  /** Number in the log of the first faulty row of two days; {@code whole} where none tells. */
  static long begin(RowTest test, LogDay before, LogDay day, long whole) {
    return cut(test, before, day, -1, whole);
  }

  /** Number of the row after the last faulty one. */
  static long end(RowTest test, LogDay day, LogDay after, long whole) {
    return cut(test, day, after, 1, whole);
  }

  private static long cut(RowTest test, LogDay first, LogDay second, int sign, long whole) {
    int sum = 0;
    int most = 0;
    boolean told = false;
    long at = first.firstRow();
    for (LogDay day : first == second ? new LogDay[] {first} : new LogDay[] {first, second}) {
      for (int row = 0; row < day.rows(); row++) {
        int says = test.of(day, row);
        told |= says != 0;
        sum += sign * says;
        if (sum > most) {
          most = sum;
          at = day.firstRow() + row + 1;
        }
      }
    }
    return told ? at : whole;
  }
}
