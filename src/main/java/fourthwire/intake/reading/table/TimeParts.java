package fourthwire.intake.reading.table;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.function.IntPredicate;
import java.util.stream.IntStream;

/** Times in columns of their own: year, month, day, hour, minute, second, or a date and hours. */
final class TimeParts {
  /** Headings of the parts, largest first. */
  private static final List<String> NAMES =
      List.of(
          "year|yr|yyyy|jahr|jaar|année|annee|año|anno",
          "month|mon|mth|mm|mo|monat|maand|mois|mes|mese",
          "day|dd|tag|dag|jour|día|dia|giorno|day of month",
          "hour|hours|hr|hrs|hh|he|stunde|uur|heure|hora|ora|hour (?:ending|beginning|of day)",
          "minute|minutes|min|mins|mi|nn|minuut|minuto",
          "second|seconds|sec|secs|ss|sekunde|seconde|segundo|secondo");

  private static final int[][] RANGES = {{0, 2999}, {1, 12}, {1, 31}, {0, 24}, {0, 59}, {0, 60}};
  private static final int DATE_PARTS = 3;
  private static final int HOUR = 3;

  private TimeParts() {}

  /** Of a date in three columns; a clock may stand in one column or in several. */
  static Optional<TimeColumns> find(List<String> headings, List<List<String>> rows) {
    List<Integer> columns = new ArrayList<>();
    for (int part = 0; part < DATE_PARTS; part++) {
      column(headings, rows, part).ifPresent(columns::add);
    }
    if (columns.size() < DATE_PARTS) {
      return Optional.empty();
    }
    OptionalInt clock = clock(headings, rows);
    if (clock.isPresent()) {
      columns.add(clock.getAsInt());
      return Optional.of(parts(columns));
    }
    return hours(headings, rows, columns);
  }

  /** Of a date in these columns with its hour, and perhaps minute and second, beside it. */
  static Optional<TimeColumns> hours(
      List<String> headings, List<List<String>> rows, List<Integer> date) {
    OptionalInt hour = column(headings, rows, HOUR);
    if (hour.isEmpty()) {
      return Optional.empty();
    }
    List<Integer> columns = new ArrayList<>(date);
    for (int part = HOUR; part < NAMES.size(); part++) {
      OptionalInt next = column(headings, rows, part);
      if (next.isEmpty()) {
        break;
      }
      columns.add(next.getAsInt());
    }
    return Optional.of(parts(columns));
  }

  private static TimeColumns parts(List<Integer> columns) {
    return new TimeColumns(columns, TimeColumns.Kind.PARTS, 1);
  }

  private static OptionalInt clock(List<String> headings, List<List<String>> rows) {
    return first(
        headings,
        k ->
            most(
                rows,
                r ->
                    r.get(k).indexOf(':') > 0
                        && ClockText.of(r.get(k).toLowerCase(Locale.ROOT)).isPresent()));
  }

  private static OptionalInt column(List<String> headings, List<List<String>> rows, int part) {
    return first(
        headings,
        k -> isNamed(headings.get(k), part) && most(rows, r -> isPart(r.get(k), RANGES[part])));
  }

  private static OptionalInt first(List<String> headings, IntPredicate such) {
    return IntStream.range(0, headings.size()).filter(such).findFirst();
  }

  private static boolean isNamed(String heading, int part) {
    String bare = heading.toLowerCase(Locale.ROOT).replaceAll("[\\[(].*?[\\])]|[_.]", " ").trim();
    return bare.matches(NAMES.get(part));
  }

  private static boolean isPart(String cell, int[] range) {
    return cell.matches("\\d{1,4}")
        && Integer.parseInt(cell) >= range[0]
        && Integer.parseInt(cell) <= range[1];
  }

  private static boolean most(
      List<List<String>> rows, java.util.function.Predicate<List<String>> such) {
    return 2 * rows.stream().filter(such).count() > rows.size();
  }

  /** The parts of a row as one text, year first; a date or clock in one cell stays as it is. */
  static String text(TextTable.Row row, List<Integer> columns) {
    StringBuilder text = new StringBuilder(row.text(columns.get(0)));
    int next = 1;
    if (text.toString().matches("\\d{1,4}") && columns.size() >= DATE_PARTS) {
      text.insert(0, "2000".substring(0, Math.max(0, 4 - text.length())));
      for (; next < DATE_PARTS; next++) {
        text.append('-').append(row.text(columns.get(next)));
      }
    }
    for (int k = next; k < columns.size(); k++) {
      String part = row.text(columns.get(k));
      text.append(k == next ? ' ' : ':').append(part.length() == 1 ? "0" : "").append(part);
    }
    return columns.size() == next + 1 && text.indexOf(":") < 0 ? text + ":00" : text.toString();
  }
}
