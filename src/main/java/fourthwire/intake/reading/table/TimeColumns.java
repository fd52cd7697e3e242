package fourthwire.intake.reading.table;

import java.time.LocalDateTime;
import java.time.ZoneOffset;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalInt;

/**
 * The column, or the date and the time column, that say when a row is.
 *
 * @param columns their positions; none where the table has no time
 * @param elapsed whether they count seconds (or parts of them) from the start
 * @param unitS of an elapsed time, seconds
 */
public record TimeColumns(List<Integer> columns, boolean elapsed, double unitS) {
  private static final int LOOK_ROWS = 20;

  /** Dates that name their own order are alike throughout a file. */
  private static final int LOOK_PLAIN = 1000;

  /** Copies the positions. */
  public TimeColumns {
    columns = List.copyOf(columns);
  }

  /** What a row's time says. */
  public record At(LocalDateTime local, Optional<ZoneOffset> offset) {}

  /** Finds them, by content first and heading second. */
  public static TimeColumns find(TextTable table) {
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
    for (int k = 0; k < width; k++) {
      int column = k;
      if (rows.stream().filter(r -> CellTime.of(r.get(column)).isPresent()).count() * 2
          > rows.size()) {
        return new TimeColumns(withClock(rows, k, width), false, 1);
      }
    }
    return elapsed(table.headings());
  }

  /** A date alone has its time of day in the next column that looks like one. */
  private static List<Integer> withClock(List<List<String>> rows, int date, int width) {
    boolean whole = rows.stream().anyMatch(r -> r.get(date).matches(".*\\d:\\d\\d.*"));
    for (int k = 0; !whole && k < width; k++) {
      int column = k;
      if (k != date && rows.stream().allMatch(r -> r.get(column).matches("\\d{1,2}[:.]\\d{2}.*"))) {
        return List.of(date, k);
      }
    }
    return List.of(date);
  }

  private static TimeColumns elapsed(List<String> headings) {
    for (int k = 0; k < headings.size(); k++) {
      String heading = headings.get(k).toLowerCase(Locale.ROOT).trim();
      if (heading.matches("(elapsed )?(t|time|seconds|sec)\\b.*")) {
        return new TimeColumns(List.of(k), true, unit(heading));
      }
    }
    return new TimeColumns(List.of(), false, 1);
  }

  private static double unit(String heading) {
    if (heading.matches(".*(\\bms\\b|millisec).*")) {
      return 1e-3;
    }
    return heading.matches(".*(\\b[uµμ]s\\b|microsec).*") ? 1e-6 : 1;
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
    boolean elapsed = found.columns().equals(columns) && found.elapsed();
    return new TimeColumns(columns, elapsed, elapsed ? found.unitS() : 1);
  }

  /** The text of a row's time. */
  public String text(TextTable.Row row) {
    String first = row.text(columns.get(0));
    return columns.size() == 1 ? first : first + " " + row.text(columns.get(1));
  }

  /** A row's time; empty where it is none in this order. */
  public Optional<At> at(TextTable.Row row, DateOrder order) {
    return CellTime.of(text(row))
        .flatMap(t -> t.local(order).map(local -> new At(local, offset(t.offsetSeconds()))));
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
        row -> {
          Optional<CellTime> time = CellTime.of(text(row));
          if (time.isPresent() && !time.get().fits(order)) {
            found.add("row " + row.number() + " holds \"" + text(row) + "\"");
          }
          boolean plain = time.isEmpty() || time.get().plain();
          return found.isEmpty() && !(plain && ++plainRows[0] > LOOK_PLAIN);
        });
    return found.stream().findFirst();
  }

  /** The order of the dates and why it is that; empty where the file does not settle it. */
  public Optional<Order> order(TextTable table) {
    OrderSearch search = new OrderSearch();
    int[] rows = {0};
    table.forEach(
        row -> {
          CellTime.of(text(row)).ifPresent(search::take);
          // Dates that name their own order need no search through all of a long file.
          return !(search.plain() && ++rows[0] > LOOK_PLAIN);
        });
    return search.settled().map(s -> new Order(s.order(), s.reason()));
  }

  /** An order of dates and the sentence why; empty text where the dates are plain. */
  public record Order(DateOrder order, String reason) {}
}
