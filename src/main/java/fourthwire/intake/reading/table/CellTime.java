package fourthwire.intake.reading.table;

import java.time.DateTimeException;
import java.time.LocalDate;
import java.time.LocalDateTime;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * A date and time of day as a cell holds them, before the order of day and month is settled.
 *
 * @param date its numbers as they stand
 * @param nanoOfDay time of day
 * @param offsetSeconds offset from UTC, where it is written
 */
record CellTime(Numerals date, long nanoOfDay, OptionalInt offsetSeconds) {
  private static final Pattern DATE =
      Pattern.compile("(\\d{1,4})\\s?([-/.])\\s?(\\d{1,2})\\s?\\2\\s?(\\d{1,4})\\.?(?=\\D|$)");
  private static final Pattern NAMED_DATE =
      Pattern.compile("(\\d{1,4})\\.?[-/ .]\\s?(\\p{L}{3,10})\\.?[-/ .,]\\s?(\\d{1,4})(?=\\D|$)");
  private static final Pattern MONTH_DAY =
      Pattern.compile("(\\p{L}{3,10})\\.?[- ](\\d{1,2})[, -]\\s?(\\d{4})(?=\\D|$)");
  private static final Pattern COMPACT =
      Pattern.compile("((?:19|20)\\d{2})(\\d{2})(\\d{2})(?=\\D|\\d{4}$|\\d{6}$|$)");
  private static final Pattern WEEKDAY =
      Pattern.compile("(mo|tu|we|th|fr|sa|su)[a-z]*\\.?,?\\s+(?=[\\d\\p{L}])");
  private static final Pattern FROM_TO =
      Pattern.compile("(.*\\d(?::\\d\\d)(?:\\s?[ap]m)?)\\s*(?:-|–|to|bis)\\s*\\d.*");

  /**
   * The numbers of a date.
   *
   * @param yearFirst whether the first is the year, as its four digits show
   * @param monthNamed whether the month was a name: the second then is the month
   * @param hyphened whether hyphens stand between them
   * @param weekday 1 for Monday to 7, as named in English; 0 for none
   */
  record Numerals(
      int first,
      int second,
      int third,
      boolean yearFirst,
      boolean monthNamed,
      boolean hyphened,
      int weekday) {

    private Numerals onWeekday(int day) {
      return new Numerals(first, second, third, yearFirst, monthNamed, hyphened, day);
    }
  }

  private record Found(Numerals date, int end) {}

  /** Whether a cell is a date, a time of day, or both. */
  static boolean isTime(String cell) {
    return couldBeTime(cell)
        && (cell.indexOf(':') > 0 && ClockText.of(cell.toLowerCase(Locale.ROOT)).isPresent()
            || of(cell).isPresent());
  }

  private static boolean couldBeTime(String cell) {
    if (cell.length() < 4 || cell.length() > 60 || isNumber(cell)) {
      return false;
    }
    int digits = 0;
    boolean mark = false;
    for (int k = 0; k < cell.length(); k++) {
      char c = cell.charAt(k);
      digits += c >= '0' && c <= '9' ? 1 : 0;
      mark = mark || ":/-. ".indexOf(c) >= 0 && k > 0;
    }
    return digits > 2 && (mark || digits >= 8);
  }

  /** A plain number; digits alone are one while they are too few for a date. */
  private static boolean isNumber(String cell) {
    boolean signed = cell.charAt(0) == '-';
    return Numbers.isPlain(signed ? cell.substring(1) : cell)
        && (cell.length() < 8 || signed || cell.indexOf('.') >= 0 || cell.indexOf(',') >= 0);
  }

  /** What this text says; empty where it is no date with or without a time of day. */
  static Optional<CellTime> of(String cell) {
    if (!couldBeTime(cell)) {
      return Optional.empty();
    }
    String text = cell.toLowerCase(Locale.ROOT);
    Optional<CellTime> dateFirst = dateFirst(text);
    if (dateFirst.isPresent()) {
      return dateFirst;
    }
    Matcher fromTo = FROM_TO.matcher(text);
    if (fromTo.matches()) {
      return dateFirst(fromTo.group(1));
    }
    int blank = text.indexOf(' ');
    return blank > 0 && text.charAt(Math.min(2, blank)) == ':'
        ? dateFirst(turned(text))
        : Optional.empty();
  }

  /** A time before the date: {@code 00:10:00 am 13/02/2025}. */
  private static String turned(String text) {
    Matcher m = Pattern.compile("(\\S+(?:\\s?[ap]\\.?m\\.?)?)\\s+(.*)").matcher(text);
    return m.matches() ? m.group(2) + " " + m.group(1) : text;
  }

  private static Optional<CellTime> dateFirst(String text) {
    Matcher weekday = WEEKDAY.matcher(text);
    boolean named = weekday.lookingAt();
    String rest = named ? text.substring(weekday.end()) : text;
    int day = named ? 1 + "mo tu we th fr sa su".indexOf(weekday.group(1)) / 3 : 0;
    return date(rest)
        .flatMap(
            found -> {
              String clock = rest.substring(found.end());
              return clock.isBlank()
                  ? Optional.of(new CellTime(found.date().onWeekday(day), 0, OptionalInt.empty()))
                  : ClockText.of(clock.replaceFirst("^[t:\\s,_-]+", ""))
                      .map(
                          c ->
                              new CellTime(
                                  found.date().onWeekday(day), c.nanoOfDay(), c.offsetSeconds()));
            });
  }

  private static Optional<Found> date(String text) {
    Matcher m = DATE.matcher(text);
    if (m.lookingAt()) {
      return found(m, number(m, 1), number(m, 3), number(m, 4), m.group(1), m.group(4), false);
    }
    m = COMPACT.matcher(text);
    if (m.lookingAt()) {
      return found(m, number(m, 1), number(m, 2), number(m, 3), m.group(1), m.group(3), false);
    }
    m = NAMED_DATE.matcher(text);
    if (m.lookingAt() && MonthNames.number(m.group(2)) > 0) {
      int month = MonthNames.number(m.group(2));
      return found(m, number(m, 1), month, number(m, 3), m.group(1), m.group(3), true);
    }
    m = MONTH_DAY.matcher(text);
    if (m.lookingAt() && MonthNames.number(m.group(1)) > 0) {
      int month = MonthNames.number(m.group(1));
      return found(m, number(m, 2), month, number(m, 3), m.group(2), m.group(3), true);
    }
    return Optional.empty();
  }

  private static int number(Matcher m, int group) {
    return Integer.parseInt(m.group(group));
  }

  /** A year has two digits or four, never three or one; only one number can be the year. */
  private static Optional<Found> found(
      Matcher m, int first, int second, int third, String start, String end, boolean named) {
    boolean yearFirst = start.length() == 4;
    boolean can = yearFirst ? end.length() <= 2 : start.length() <= 2 && end.length() % 2 == 0;
    boolean hyphened = m.group().indexOf('-') >= 0;
    return can
        ? Optional.of(
            new Found(new Numerals(first, second, third, yearFirst, named, hyphened, 0), m.end()))
        : Optional.empty();
  }

  /** The local time in this order; empty where there is no such day. */
  Optional<LocalDateTime> local(DateOrder order) {
    DateOrder in =
        date.yearFirst()
            ? DateOrder.YEAR_MONTH_DAY
            : date.monthNamed() ? DateOrder.DAY_MONTH_YEAR : order;
    int year = in == DateOrder.YEAR_MONTH_DAY ? date.first() : date.third();
    int month = in == DateOrder.MONTH_DAY_YEAR ? date.first() : date.second();
    int day =
        switch (in) {
          case YEAR_MONTH_DAY -> date.third();
          case DAY_MONTH_YEAR -> date.first();
          case MONTH_DAY_YEAR -> date.second();
        };
    if (month < 1 || month > 12 || day < 1 || day > 31) {
      return Optional.empty();
    }
    try {
      LocalDate at = LocalDate.of(year < 100 ? 2000 + year : year, month, day);
      boolean other = date.weekday() > 0 && at.getDayOfWeek().getValue() != date.weekday();
      return other ? Optional.empty() : Optional.of(at.atStartOfDay().plusNanos(nanoOfDay));
    } catch (DateTimeException e) {
      return Optional.empty();
    }
  }

  /** Whether it is a date in this order, and not plainly written in another. */
  boolean fits(DateOrder order) {
    return (!date.yearFirst() || order == DateOrder.YEAR_MONTH_DAY) && local(order).isPresent();
  }

  /** Whether the order of its date is plain from the cell alone. */
  boolean plain() {
    return date.yearFirst() || date.monthNamed();
  }
}
