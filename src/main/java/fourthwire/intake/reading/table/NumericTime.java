package fourthwire.intake.reading.table;

import java.util.List;
import java.util.Locale;
import java.util.Optional;

/**
 * Times that are written as one number: from a start, since 1970, or as spreadsheets count days.
 */
final class NumericTime {
  /** Days from 1900 that fall into 1982 to 2091. */
  private static final double SERIAL_FROM = 30_000;

  private static final double SERIAL_TO = 70_000;

  /** Seconds since 1970 that fall into 1990 to 2096. */
  private static final double EPOCH_FROM = 6.3e8;

  private static final double EPOCH_TO = 4e9;

  private NumericTime() {}

  static boolean isSerial(double value) {
    return value > SERIAL_FROM && value < SERIAL_TO;
  }

  /** By the first column whose heading names a time. */
  static TimeColumns find(TextTable table, List<List<String>> rows) {
    List<String> headings = table.headings();
    for (int k = 0; k < headings.size(); k++) {
      if (isTimeHeading(headings.get(k))) {
        Optional<TimeColumns> counted = of(table, rows, List.of(k));
        if (counted.isPresent()) {
          return withFraction(table, rows, counted.get());
        }
      }
    }
    return elapsed(headings);
  }

  /** Whole days have the fraction of the day in the column of times beside them. */
  private static TimeColumns withFraction(
      TextTable table, List<List<String>> rows, TimeColumns days) {
    int day = days.columns().get(0);
    int next = day + 1;
    boolean whole =
        days.kind() == TimeColumns.Kind.SERIAL
            && rows.stream().allMatch(r -> r.get(day).matches("\\d{5}([.,]0*)?"));
    return whole
            && next < table.headings().size()
            && isTimeHeading(table.headings().get(next))
            && rows.stream().allMatch(r -> r.get(next).matches("0?[.,]\\d+|0"))
        ? new TimeColumns(List.of(day, next), TimeColumns.Kind.SERIAL, 1)
        : days;
  }

  static boolean isTimeHeading(String heading) {
    return heading
        .toLowerCase(Locale.ROOT)
        .matches(
            ".*(time|date|stamp|epoch|unix|zeit|datum|fecha|hora|heure|tijd|\\bora\\b|orario|\\btid\\b|\\bkl\\b|godzina|\\baika\\b|kello|\\bčas\\b|\\bcas\\b|\\butc\\b|\\bts\\b).*");
  }

  /** Calendar time as a number, if it is that. */
  static Optional<TimeColumns> of(TextTable table, List<List<String>> rows, List<Integer> columns) {
    double[] value = {Double.NaN, Double.NaN};
    int[] at = {0};
    table.forEach(
        row -> {
          double v = row.value(columns.get(0));
          if (v > 0) {
            value[at[0]++] = v;
          }
          return at[0] < 2 && row.number() < 100_000;
        });
    double step = value[1] - value[0];
    if (columns.size() != 1 || !(step >= 0) || rows.isEmpty()) {
      return Optional.empty();
    }
    if (isSerial(value[0]) && step < 2) {
      return Optional.of(new TimeColumns(columns, TimeColumns.Kind.SERIAL, 1));
    }
    for (double unit : new double[] {1, 1e-3, 1e-6, 1e-9}) {
      double seconds = value[0] * unit;
      if (seconds > EPOCH_FROM && seconds < EPOCH_TO && step * unit < 1e6) {
        return Optional.of(new TimeColumns(columns, TimeColumns.Kind.EPOCH, unit));
      }
    }
    return Optional.empty();
  }

  private static TimeColumns elapsed(List<String> headings) {
    for (int k = 0; k < headings.size(); k++) {
      String heading = headings.get(k).toLowerCase(Locale.ROOT).trim();
      if (heading.matches("(elapsed )?(t|time|seconds|sec)\\b.*")) {
        return new TimeColumns(List.of(k), TimeColumns.Kind.ELAPSED, unit(heading));
      }
    }
    return new TimeColumns(List.of(), TimeColumns.Kind.CALENDAR, 1);
  }

  private static double unit(String heading) {
    if (heading.matches(".*(\\bms\\b|millisec).*")) {
      return 1e-3;
    }
    return heading.matches(".*(\\b[uµμ]s\\b|microsec).*") ? 1e-6 : 1;
  }

  /** How the times are counted, one sentence; empty for calendar times. */
  static String note(TimeColumns.Kind kind) {
    return switch (kind) {
      case SERIAL -> "Times are days since the end of 1899, as spreadsheets count them.";
      case EPOCH -> "Times are counted from 1970 in UTC.";
      default -> "";
    };
  }
}
