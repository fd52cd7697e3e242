package fourthwire.intake.reading.comtrade;

import java.time.DateTimeException;
import java.time.LocalDateTime;
import java.util.Locale;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * A date and time of a configuration.
 *
 * @param local as written; empty where it is no date of the calendar
 * @param isToTheNanosecond whether it has more than six decimals: then the data's own times count
 *     nanoseconds
 */
record Stamp(Optional<LocalDateTime> local, boolean isToTheNanosecond) {
  private static final Pattern DATE_TIME =
      Pattern.compile(
          "\\s*(\\d{1,4})[/.-](\\d{1,2})[/.-](\\d{1,4})\\s*[, T]\\s*"
              + "(\\d{1,2}):(\\d{2}):(\\d{2})(?:[.,](\\d{1,9}))?.*");
  private static final Pattern OFFSET = Pattern.compile("([+-]?)(\\d{1,2})(?:h(\\d{2}))?");

  static boolean isOne(String line) {
    return DATE_TIME.matcher(line).matches();
  }

  /** Of a line; empty where it is none. */
  static Optional<Stamp> of(String line, boolean monthFirst) {
    Matcher m = DATE_TIME.matcher(line);
    if (!m.matches()) {
      return Optional.empty();
    }
    String fraction = m.group(7) == null ? "" : m.group(7);
    return Optional.of(new Stamp(local(m, fraction, monthFirst), fraction.length() > 6));
  }

  private static Optional<LocalDateTime> local(Matcher m, String fraction, boolean monthFirst) {
    int first = Integer.parseInt(m.group(1));
    int second = Integer.parseInt(m.group(2));
    int third = Integer.parseInt(m.group(3));
    boolean yearFirst = first > 31;
    int year = yearFirst ? first : third;
    int one = yearFirst ? third : first;
    // Day first as the revision says, unless that is no month.
    boolean months = yearFirst || (monthFirst ? one > 12 : second <= 12);
    try {
      return Optional.of(
          LocalDateTime.of(
              year < 100 ? year + (year < 70 ? 2000 : 1900) : year,
              months ? second : one,
              months ? one : second,
              Integer.parseInt(m.group(4)),
              Integer.parseInt(m.group(5)),
              Integer.parseInt(m.group(6)),
              Integer.parseInt((fraction + "000000000").substring(0, 9))));
    } catch (DateTimeException e) {
      return Optional.empty();
    }
  }

  /** An offset from UTC such as {@code -5h30}, as {@code -05:30}. */
  static Optional<String> offset(String code) {
    Matcher m = OFFSET.matcher(code);
    if (!m.matches()) {
      return Optional.empty();
    }
    String minutes = m.group(3) == null ? "00" : m.group(3);
    return Optional.of(
        ("-".equals(m.group(1)) ? "-" : "+")
            + String.format(Locale.ROOT, "%02d", Integer.parseInt(m.group(2)))
            + ":"
            + minutes);
  }
}
