package fourthwire.intake.reading.table;

import java.time.DateTimeException;
import java.time.LocalDate;
import java.time.LocalDateTime;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * A date and time of day as a cell holds them, before the order of day and month is settled.
 *
 * @param first first number of the date
 * @param second second number
 * @param third third number
 * @param yearFirst whether the first number is the year
 * @param monthNamed whether the month was a name: the second number then is the month
 * @param nanoOfDay time of day
 * @param offsetSeconds offset from UTC, where it is written
 */
record CellTime(
    int first,
    int second,
    int third,
    boolean yearFirst,
    boolean monthNamed,
    long nanoOfDay,
    OptionalInt offsetSeconds) {
  private static final List<String> MONTHS =
      List.of("jan", "feb", "mar", "apr", "may", "jun", "jul", "aug", "sep", "oct", "nov", "dec");
  private static final Pattern DATE =
      Pattern.compile(
          "^(?:\\p{L}{2,9},?\\s+)?(\\d{1,4})\\s*[-/. ]\\s*(\\d{1,2}|\\p{L}{3,9}\\.?)\\s*[-/. ,]\\s*(\\d{1,4})(?=\\D|$)");
  private static final Pattern MONTH_DAY =
      Pattern.compile("^(\\p{L}{3,9})\\.?\\s+(\\d{1,2}),?\\s+(\\d{4})(?=\\D|$)");
  private static final Pattern COMPACT =
      Pattern.compile("^(\\d{4})(\\d{2})(\\d{2})(?=\\D|\\d{4,6}$|$)");
  private static final Pattern CLOCK =
      Pattern.compile(
          "^[T\\s,]*(\\d{1,2})[:.](\\d{2})(?:[:.](\\d{2})(?:[.,](\\d{1,9}))?)?\\s*([aApP])?\\.?[mM]?\\.?\\s*"
              + "(Z|UTC|(?:UTC)?[+-]\\d{2}:?\\d{2})?$");
  private static final Pattern COMPACT_CLOCK =
      Pattern.compile("^[T\\s]*(\\d{2})(\\d{2})(\\d{2})?$");

  /** What this text says; empty where it is no date with or without a time of day. */
  static Optional<CellTime> of(String text) {
    Matcher compact = COMPACT.matcher(text);
    if (compact.find()) {
      return clock(
          text.substring(compact.end()),
          number(compact, 1),
          number(compact, 2),
          number(compact, 3),
          true,
          false);
    }
    Matcher named = MONTH_DAY.matcher(text);
    if (named.find() && month(named.group(1)) > 0) {
      return clock(
          text.substring(named.end()),
          number(named, 2),
          month(named.group(1)),
          number(named, 3),
          false,
          true);
    }
    Matcher date = DATE.matcher(text);
    if (!date.find()) {
      return Optional.empty();
    }
    boolean name = !Character.isDigit(date.group(2).charAt(0));
    int second = name ? month(date.group(2)) : number(date, 2);
    boolean yearFirst = date.group(1).length() > 2;
    if (second < 1 || yearFirst == date.group(3).length() > 2 && yearFirst) {
      return Optional.empty();
    }
    return clock(
        text.substring(date.end()), number(date, 1), second, number(date, 3), yearFirst, name);
  }

  private static int number(Matcher m, int group) {
    return Integer.parseInt(m.group(group));
  }

  private static int month(String name) {
    String start = name.toLowerCase(Locale.ROOT);
    return start.length() < 3 ? 0 : MONTHS.indexOf(start.substring(0, 3)) + 1;
  }

  private static Optional<CellTime> clock(
      String text, int first, int second, int third, boolean yearFirst, boolean named) {
    if (text.isBlank()) {
      return Optional.of(
          new CellTime(first, second, third, yearFirst, named, 0, OptionalInt.empty()));
    }
    Matcher compact = COMPACT_CLOCK.matcher(text);
    if (compact.matches()) {
      long s = compact.group(3) == null ? 0 : number(compact, 3);
      return at(
          first,
          second,
          third,
          yearFirst,
          named,
          number(compact, 1),
          number(compact, 2),
          s * 1_000_000_000,
          OptionalInt.empty());
    }
    Matcher m = CLOCK.matcher(text);
    if (!m.matches()) {
      return Optional.empty();
    }
    int hour = number(m, 1);
    if (m.group(5) != null) {
      boolean afternoon = m.group(5).equalsIgnoreCase("p");
      if (hour < 1 || hour > 12) {
        return Optional.empty();
      }
      hour = hour % 12 + (afternoon ? 12 : 0);
    }
    long nanos = m.group(3) == null ? 0 : number(m, 3) * 1_000_000_000L;
    if (m.group(4) != null) {
      nanos += Long.parseLong((m.group(4) + "000000000").substring(0, 9));
    }
    return at(
        first, second, third, yearFirst, named, hour, number(m, 2), nanos, offset(m.group(6)));
  }

  private static OptionalInt offset(@org.jspecify.annotations.Nullable String text) {
    if (text == null) {
      return OptionalInt.empty();
    }
    if (text.equals("Z") || text.equals("UTC")) {
      return OptionalInt.of(0);
    }
    String digits = text.replaceAll("\\D", "");
    int seconds =
        3600 * Integer.parseInt(digits.substring(0, 2))
            + 60 * Integer.parseInt(digits.substring(2));
    return OptionalInt.of(text.contains("-") ? -seconds : seconds);
  }

  private static Optional<CellTime> at(
      int first,
      int second,
      int third,
      boolean yearFirst,
      boolean named,
      int hour,
      int minute,
      long nanos,
      OptionalInt offset) {
    // 24:00 is the end of the day.
    if (hour > 24 || minute > 59 || nanos >= 61_000_000_000L) {
      return Optional.empty();
    }
    long nanoOfDay = (60L * hour + minute) * 60_000_000_000L + nanos;
    return Optional.of(new CellTime(first, second, third, yearFirst, named, nanoOfDay, offset));
  }

  /** The local time in this order; empty where there is no such day. */
  Optional<LocalDateTime> local(DateOrder order) {
    DateOrder in =
        yearFirst ? DateOrder.YEAR_MONTH_DAY : monthNamed ? DateOrder.DAY_MONTH_YEAR : order;
    int year = in == DateOrder.YEAR_MONTH_DAY ? first : third;
    int month = in == DateOrder.MONTH_DAY_YEAR ? first : second;
    int day =
        switch (in) {
          case YEAR_MONTH_DAY -> third;
          case DAY_MONTH_YEAR -> first;
          case MONTH_DAY_YEAR -> second;
        };
    try {
      return Optional.of(
          LocalDate.of(year < 100 ? 2000 + year : year, month, day)
              .atStartOfDay()
              .plusNanos(nanoOfDay));
    } catch (DateTimeException e) {
      return Optional.empty();
    }
  }

  /** Whether it is a date in this order, and not plainly written in another. */
  boolean fits(DateOrder order) {
    return (!yearFirst || order == DateOrder.YEAR_MONTH_DAY) && local(order).isPresent();
  }

  /** Whether the order of its date is plain from the cell alone. */
  boolean plain() {
    return yearFirst || monthNamed;
  }
}
