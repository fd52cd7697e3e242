package fourthwire.intake.reading.table;

import java.time.DateTimeException;
import java.time.LocalDate;
import java.time.ZoneOffset;
import java.util.Optional;

/**
 * Reads the time of one row after the other as numbers: at once where it is written in the usual
 * digits, by {@link TimeColumns} where it is not. Not thread-safe.
 */
public final class RowTime {
  /** No offset is written. */
  public static final int NO_OFFSET = Integer.MIN_VALUE;

  private static final long DAY_MILLIS = 86_400_000;

  private final TimeColumns columns;
  private final DateOrder order;
  private final boolean plainDigits;
  private long localMillis;
  private int offsetSeconds;
  private int dateDigits = -1;
  private long epochDay;

  /** Of these columns, with dates in this order. */
  public RowTime(TimeColumns columns, DateOrder order) {
    this.columns = columns;
    this.order = order;
    this.plainDigits = columns.kind() == TimeColumns.Kind.CALENDAR;
  }

  /** Whether the row has a time that can be read. */
  public boolean read(TextTable.Row row) {
    offsetSeconds = NO_OFFSET;
    return plainDigits && row instanceof RowWalk walk && quick(walk.cutter()) || slow(row);
  }

  /** Local time of the row as if it were UTC, milliseconds. */
  public long localMillis() {
    return localMillis;
  }

  /** Offset from UTC that is written beside it, seconds. */
  public int offsetSeconds() {
    return offsetSeconds;
  }

  private boolean slow(TextTable.Row row) {
    Optional<TimeColumns.At> at = columns.at(row, order);
    if (at.isPresent()) {
      localMillis = at.get().local().toInstant(ZoneOffset.UTC).toEpochMilli();
      offsetSeconds = at.get().offset().map(ZoneOffset::getTotalSeconds).orElse(NO_OFFSET);
    }
    return at.isPresent();
  }

  /** Ten characters of a date; hours and minutes behind it or in the next column. */
  private boolean quick(RowCutter row) {
    int date = columns.columns().get(0);
    if (date >= row.cells() || row.end(date) - row.start(date) < 10) {
      return false;
    }
    byte[] b = row.bytes();
    int at = row.start(date);
    if (columns.columns().size() == 1) {
      return row.end(date) - at > 11 && date(b, at) && clock(b, at + 11, row.end(date));
    }
    int clock = columns.columns().get(1);
    return row.end(date) - at == 10
        && clock < row.cells()
        && date(b, at)
        && clock(b, row.start(clock), row.end(clock));
  }

  private boolean date(byte[] b, int at) {
    boolean yearFirst = isDigit(b[at + 2]);
    int digits =
        yearFirst
            ? number(b, at, 4) * 10_000 + number(b, at + 5, 2) * 100 + number(b, at + 8, 2)
            : number(b, at + 6, 4) * 10_000 + number(b, at, 2) * 100 + number(b, at + 3, 2);
    if (number(b, at, 2) < 0 || digits < 10_000 || !marks(b, at, yearFirst)) {
      return false;
    }
    return digits == dateDigits || newDay(digits, yearFirst);
  }

  private static boolean marks(byte[] b, int at, boolean yearFirst) {
    return yearFirst
        ? isMark(b[at + 4]) && b[at + 7] == b[at + 4]
        : isMark(b[at + 2]) && b[at + 5] == b[at + 2];
  }

  private static boolean isMark(byte c) {
    return c == '-' || c == '/' || c == '.';
  }

  private boolean newDay(int digits, boolean yearFirst) {
    int second = digits / 100 % 100;
    int third = digits % 100;
    boolean dayFirst = !yearFirst && order == DateOrder.DAY_MONTH_YEAR;
    if (!yearFirst && order == DateOrder.YEAR_MONTH_DAY) {
      return false;
    }
    try {
      epochDay =
          LocalDate.of(digits / 10_000, dayFirst ? third : second, dayFirst ? second : third)
              .toEpochDay();
      dateDigits = digits;
      return true;
    } catch (DateTimeException e) {
      return false;
    }
  }

  /** {@code HH:mm} or {@code HH:mm:ss}, nothing behind it. */
  private boolean clock(byte[] b, int at, int end) {
    int length = end - at;
    if (length != 5 && length != 8 || b[at + 2] != ':' || length == 8 && b[at + 5] != ':') {
      return false;
    }
    int hour = number(b, at, 2);
    int minute = number(b, at + 3, 2);
    int second = length == 8 ? number(b, at + 6, 2) : 0;
    if (hour < 0 || hour > 23 || minute < 0 || minute > 59 || second < 0 || second > 59) {
      return false;
    }
    localMillis = epochDay * DAY_MILLIS + ((hour * 60L + minute) * 60 + second) * 1000;
    return true;
  }

  private static boolean isDigit(byte c) {
    return c >= '0' && c <= '9';
  }

  /** Negative beyond repair where one of them is no digit. */
  private static int number(byte[] b, int at, int digits) {
    int value = 0;
    for (int k = at; k < at + digits; k++) {
      value = isDigit(b[k]) ? 10 * value + b[k] - '0' : -1_000_000;
    }
    return value;
  }
}
