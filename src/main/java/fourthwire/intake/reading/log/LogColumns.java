package fourthwire.intake.reading.log;

import fourthwire.intake.reading.table.DateOrder;
import fourthwire.intake.reading.table.TextTable;
import fourthwire.intake.reading.table.TimeColumns;
import fourthwire.metering.ReadingMapping;
import fourthwire.metering.ReadingMapping.Column;
import fourthwire.metering.ReadingMapping.Statistic;
import java.util.List;

/** Where the time and the quantities of a log stand, and how their numbers become SI units. */
final class LogColumns {
  private final List<String> headings;
  private final TimeColumns time;
  private final DateOrder order;
  private final List<String> quantities;
  private final int[] at;
  private final int[] shift;
  private final double[] rest;

  LogColumns(TextTable table, TimeColumns time, ReadingMapping mapping) {
    this.headings = table.headings();
    this.time = time;
    this.order = mapping.time().format().map(DateOrder::of).orElse(DateOrder.YEAR_MONTH_DAY);
    List<Column> columns = List.copyOf(mapping.columns().values());
    List<Factor> factors = columns.stream().map(c -> Factor.of(c.factor())).toList();
    this.quantities = columns.stream().map(LogColumns::key).toList();
    this.at = mapping.columns().keySet().stream().mapToInt(headings::indexOf).toArray();
    this.shift = factors.stream().mapToInt(Factor::shift).toArray();
    this.rest = factors.stream().mapToDouble(Factor::rest).toArray();
  }

  /** Lowest and highest values stand beside the mean under their own names. */
  private static String key(Column column) {
    Statistic s = column.statistic();
    return s == Statistic.MIN || s == Statistic.MAX
        ? column.quantity() + "." + s.word()
        : column.quantity();
  }

  List<String> headings() {
    return headings;
  }

  TimeColumns time() {
    return time;
  }

  DateOrder order() {
    return order;
  }

  List<String> quantities() {
    return quantities;
  }

  int count() {
    return at.length;
  }

  /** Position of a quantity's column in the table. */
  int at(int column) {
    return at[column];
  }

  String heading(int column) {
    return headings.get(at[column]);
  }

  /** A value in SI units. */
  double value(TextTable.Row row, int column) {
    double value = row.value(at[column], shift[column]);
    return rest[column] == 1 ? value : value * rest[column];
  }
}
