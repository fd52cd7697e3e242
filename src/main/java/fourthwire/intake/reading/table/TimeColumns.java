package fourthwire.intake.reading.table;

import java.time.LocalDate;
import java.time.LocalDateTime;
import java.time.ZoneOffset;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.Set;
import java.util.TreeSet;

/**
 * The column, or the date and the time column, that say when a row is.
 *
 * @param columns their positions; none where the table has no time
 * @param kind how they say it
 * @param unitS of an elapsed time or of epoch time, seconds
 */
public record TimeColumns(List<Integer> columns, Kind kind, double unitS) {
  /** How times are written. */
  public enum Kind {
    /** Dates with times of day. */
    CALENDAR,
    /** Year, month, day, hour, minute and second, or a date and what follows, each a column. */
    PARTS,
    /** Time from the start of the record. */
    ELAPSED,
    /** Days since the end of 1899, as spreadsheets count them. */
    SERIAL,
    /** Time since 1970 in UTC. */
    EPOCH
  }

  private static final int LOOK_ROWS = 60;

  /** Dates that name their own order are alike throughout a file. */
  private static final int LOOK_PLAIN = 1000;

  private static final LocalDateTime SERIAL_ORIGIN = LocalDateTime.of(1899, 12, 30, 0, 0);
  private static final double DAY_MILLIS = 86_400_000;

  /** Copies the positions. */
  public TimeColumns {
    columns = List.copyOf(columns);
  }

  /** What a row's time says. */
  public record At(LocalDateTime local, Optional<ZoneOffset> offset) {}

  /** Finds them, by content first and heading second. */
  public static TimeColumns find(TextTable table) {
    List<List<String>> rows = sample(table);
    int width = table.headings().size();
    List<Integer> dates = new ArrayList<>();
    for (int k = 0; k < width; k++) {
      int column = k;
      if (most(rows, r -> CellTime.of(r.get(column)).isPresent())) {
        dates.add(k);
      }
    }
    if (dates.isEmpty()) {
      return TimeParts.find(table.headings(), rows).orElseGet(() -> NumericTime.find(table, rows));
    }
    int date = start(table, dates);
    boolean whole = isWhole(rows, date);
    List<Integer> columns = whole ? List.of(date) : withClock(table, rows, date);
    TimeColumns calendar = new TimeColumns(columns, Kind.CALENDAR, 1);
    return whole || columns.size() > 1
        ? calendar
        : TimeParts.hours(table.headings(), rows, columns).orElse(calendar);
  }

  private static List<List<String>> sample(TextTable table) {
    List<List<String>> rows = new ArrayList<>();
    int width = table.headings().size();
    table.forEach(
        row -> {
          List<String> cells = new ArrayList<>();
          for (int k = 0; k < width; k++) {
            cells.add(row.text(k));
          }
          rows.add(cells);
          return rows.size() < LOOK_ROWS;
        });
    return rows;
  }

  private static boolean most(
      List<List<String>> rows, java.util.function.Predicate<List<String>> such) {
    return 2 * rows.stream().filter(such).count() > rows.size();
  }

  /** Of a start and an end the start. */
  private static int start(TextTable table, List<Integer> dates) {
    return dates.stream()
        .filter(k -> !isEnd(table.headings().get(k)))
        .findFirst()
        .orElse(dates.get(0));
  }

  /** Whether a heading says that its times are the ends of intervals. */
  public static boolean isEnd(String heading) {
    return heading
        .toLowerCase(Locale.ROOT)
        .matches(".*\\b(end|ende|ending|to|until|stop|fin)\\b.*");
  }

  private static boolean isWhole(List<List<String>> rows, int date) {
    return most(
        rows, r -> r.get(date).matches("(?i).*\\d:\\d\\d.*|.*\\d[t ]\\d{4,6}(z|[-+]\\d{2}.*)?"));
  }

  /** A date alone has its time of day in the column that looks like one, the nearest behind it. */
  private static List<Integer> withClock(TextTable table, List<List<String>> rows, int date) {
    int width = table.headings().size();
    for (int k = 0; k < width; k++) {
      int column = (date + 1 + k) % width;
      boolean named = NumericTime.isTimeHeading(table.headings().get(column));
      if (column != date && most(rows, r -> isClock(r.get(column), r.get(date), named))) {
        return List.of(date, column);
      }
    }
    return List.of(date);
  }

  /**
   * Digits alone are a time of day only beside a date in digits alone, and those with a point only
   * below a heading that names a time.
   */
  private static boolean isClock(String cell, String date, boolean named) {
    boolean digits = date.matches("\\d{8}") && cell.matches("\\d{4}|\\d{6}");
    return (digits || cell.matches(named ? "\\d{1,2}[:.h]\\d{2}.*" : "\\d{1,2}[:h]\\d{2}.*"))
        && ClockText.of(cell.toLowerCase(Locale.ROOT)).isPresent();
  }

  /** The columns of these headings. */
  public static TimeColumns named(TextTable table, List<String> names) {
    List<Integer> columns = new ArrayList<>();
    for (String name : names) {
      int at = table.headings().indexOf(name);
      if (at < 0) {
        throw new TableException("the file has no column \"" + name + "\" for the time");
      }
      columns.add(at);
    }
    TimeColumns found = find(table);
    return found.columns().equals(columns)
        ? found
        : NumericTime.of(table, sample(table), columns)
            .orElse(new TimeColumns(columns, columns.size() > 2 ? Kind.PARTS : Kind.CALENDAR, 1));
  }

  /** Whether time is counted from the start of the record. */
  public boolean elapsed() {
    return kind == Kind.ELAPSED;
  }

  /** Whether times are written as dates. */
  public boolean isCalendar() {
    return kind == Kind.CALENDAR || kind == Kind.PARTS;
  }

  /** The text of a row's time. */
  public String text(TextTable.Row row) {
    if (kind == Kind.PARTS) {
      return TimeParts.text(row, columns);
    }
    String first = row.text(columns.get(0));
    return columns.size() == 1 ? first : first + " " + row.text(columns.get(1));
  }

  /** A row's time; empty where it is none in this order. */
  public Optional<At> at(TextTable.Row row, DateOrder order) {
    if (isCalendar()) {
      return CellTime.of(text(row))
          .flatMap(t -> t.local(order).map(local -> new At(local, offset(t.offsetSeconds()))));
    }
    double value = row.value(columns.get(0));
    value += columns.size() > 1 ? row.value(columns.get(1)) : 0;
    boolean can = NumericTime.isSerial(value) || kind == Kind.EPOCH && value * unitS > 1e8;
    return can ? Optional.of(counted(value)) : Optional.empty();
  }

  private At counted(double value) {
    if (kind == Kind.EPOCH) {
      long millis = Math.round(value * unitS * 1000);
      return new At(
          LocalDateTime.ofEpochSecond(
              Math.floorDiv(millis, 1000L),
              1_000_000 * (int) Math.floorMod(millis, 1000L),
              ZoneOffset.UTC),
          Optional.of(ZoneOffset.UTC));
    }
    long seconds = Math.round(value * DAY_MILLIS / 1000);
    return new At(SERIAL_ORIGIN.plusSeconds(seconds), Optional.empty());
  }

  private static Optional<ZoneOffset> offset(OptionalInt seconds) {
    return seconds.isPresent()
        ? Optional.of(ZoneOffset.ofTotalSeconds(seconds.getAsInt()))
        : Optional.empty();
  }

  /** The first row whose date is none in this order; empty where the order fits. */
  public Optional<String> misfit(TextTable table, DateOrder order) {
    List<String> found = new ArrayList<>();
    int[] plainRows = {0};
    table.forEach(
        cells(),
        row -> {
          Optional<CellTime> time = CellTime.of(text(row));
          if (time.isPresent() && !time.get().fits(order)) {
            found.add("row " + row.number() + " holds \"" + text(row) + "\"");
          }
          boolean plain = time.isEmpty() || time.get().plain();
          return found.isEmpty() && !(plain && ++plainRows[0] > LOOK_PLAIN);
        });
    return isCalendar() ? found.stream().findFirst() : Optional.empty();
  }

  /** How many cells of a row reach to its time. */
  public int cells() {
    return 1 + columns.stream().mapToInt(k -> k).max().orElse(0);
  }

  /** The order of the dates and why it is that; empty where the file does not settle it. */
  public Optional<Order> order(TextTable table) {
    if (!isCalendar()) {
      return Optional.of(new Order(DateOrder.YEAR_MONTH_DAY, NumericTime.note(kind)));
    }
    OrderSearch search = new OrderSearch();
    int[] rows = {0};
    table.forEach(
        cells(),
        row -> {
          CellTime.of(text(row)).ifPresent(search::take);
          // Dates that name their own order, or fit one only, need no search through a long file.
          return ++rows[0] < LOOK_PLAIN || !search.plain() && !search.single();
        });
    return search.settled(daysNamed(table)).map(s -> new Order(s.order(), s.reason()));
  }

  /** Days that lines above the table name in words or year first. */
  private static Set<LocalDate> daysNamed(TextTable table) {
    Set<LocalDate> days = new TreeSet<>();
    for (String cell : table.preamble()) {
      String value = cell.replaceFirst("^[\\p{L} ]+:\\s*", "");
      CellTime.of(value)
          .filter(CellTime::plain)
          .flatMap(t -> t.local(DateOrder.YEAR_MONTH_DAY))
          .ifPresent(t -> days.add(t.toLocalDate()));
    }
    return days;
  }

  /** An order of dates and the sentence why; empty text where the dates are plain. */
  public record Order(DateOrder order, String reason) {}
}
