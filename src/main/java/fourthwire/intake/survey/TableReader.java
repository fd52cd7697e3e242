package fourthwire.intake.survey;

import fourthwire.site.check.Closest;
import fourthwire.site.check.DraftRow;
import fourthwire.site.check.DraftTable;
import fourthwire.site.check.DraftTable.State;
import fourthwire.site.check.SurveyError;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;

/**
 * Reads the rows of a table by its schema. Every cell that can't be read is one error and marks its
 * column of that row as damaged, so that nothing further is said about it.
 */
final class TableReader<R> {
  private static final int MOST_UNKNOWN = 20;

  private final Schema<R> schema;
  private final SurveyTable table;
  private final Remarks remarks;
  private final Map<String, Integer> indexes = new LinkedHashMap<>();
  private final Set<String> damagedColumns = new HashSet<>();
  private final List<String> unknown = new ArrayList<>();

  private TableReader(Schema<R> schema, SurveyTable table, Remarks remarks) {
    this.schema = schema;
    this.table = table;
    this.remarks = remarks;
  }

  static <R> DraftTable<R> read(Schema<R> schema, SurveyTable table, Remarks remarks) {
    TableReader<R> reader = new TableReader<>(schema, table, remarks);
    reader.readHeader();
    List<DraftRow<R>> rows =
        table.rows().stream().filter(r -> !r.isBlank()).map(reader::row).toList();
    return new DraftTable<>(schema.name(), State.PRESENT, rows);
  }

  private void readHeader() {
    List<String> known = schema.columnNames();
    for (int i = 0; i < table.header().size(); i++) {
      String column = Text.key(table.header().get(i));
      if (column.isEmpty()) {
        warnOfNamelessColumn(i);
      } else if (!known.contains(column)) {
        unknown.add(column);
      } else if (indexes.putIfAbsent(column, i) != null) {
        damagedColumns.add(column);
        headerError(column, table.header().get(i), "The column stands there twice; keep one.");
      }
    }
    warnOfUnknown();
    schema.columns().stream()
        .filter(c -> c.required() && !indexes.containsKey(c.name()))
        .forEach(this::reportMissing);
  }

  private void warnOfUnknown() {
    unknown.stream()
        .limit(MOST_UNKNOWN)
        .forEach(
            column ->
                remarks.warning(
                    schema.name(),
                    "column \"" + column + "\" is not known and was left out." + hint(column)));
    if (unknown.size() > MOST_UNKNOWN) {
      remarks.warning(
          schema.name(),
          "and %d more columns are not known and were left out."
              .formatted(unknown.size() - MOST_UNKNOWN));
    }
  }

  private String hint(String column) {
    return Closest.hint(
        column, schema.columnNames().stream().filter(c -> !indexes.containsKey(c)).toList());
  }

  private void warnOfNamelessColumn(int index) {
    boolean used =
        table.rows().stream()
            .anyMatch(r -> index < r.cells().size() && !r.cells().get(index).isBlank());
    if (used) {
      remarks.warning(
          schema.name(), "column %d has no name and was left out.".formatted(index + 1));
    }
  }

  private void reportMissing(Column<R> column) {
    damagedColumns.add(column.name());
    headerError(column.name(), "", "The required column is missing. Row 1 must name it.");
  }

  private void headerError(String column, String value, String message) {
    remarks.error(new SurveyError(schema.name(), 1, column, value, message));
  }

  private DraftRow<R> row(SurveyTable.Row row) {
    Set<String> damaged = new HashSet<>(damagedColumns);
    Map<String, Object> values = new HashMap<>();
    if (hasTooManyCells(row)) {
      damaged.addAll(schema.columnNames());
    }
    List<String> empty = new ArrayList<>();
    for (Column<R> column : schema.columns()) {
      readCell(column, row, values, damaged, empty);
    }
    if (!empty.isEmpty()) {
      remarks.error(
          new SurveyError(schema.name(), row.number(), empty.get(0), "", emptyMessage(empty)));
    }
    return new DraftRow<>(
        schema.name(),
        row.number(),
        schema.make().apply(new Cells(values)),
        Set.copyOf(damaged),
        column -> cell(row, column));
  }

  private static String emptyMessage(List<String> empty) {
    return empty.size() == 1
        ? "The cell is empty; the column is required."
        : "The cells of " + String.join(", ", empty) + " are empty; these columns are required.";
  }

  private boolean hasTooManyCells(SurveyTable.Row row) {
    List<String> cells = row.cells();
    int width = table.header().size();
    List<String> beyond =
        cells.size() <= width
            ? List.of()
            : cells.subList(width, cells.size()).stream().filter(c -> !c.isBlank()).toList();
    if (beyond.isEmpty()) {
      return false;
    }
    remarks.error(
        new SurveyError(
            schema.name(),
            row.number(),
            "",
            beyond.get(0),
            ("The row has more cells than the header's %d. Put a text that holds the separator in"
                    + " quotes, and write decimals with a point.")
                .formatted(width)));
    return true;
  }

  private void readCell(
      Column<R> column,
      SurveyTable.Row row,
      Map<String, Object> values,
      Set<String> damaged,
      List<String> empty) {
    String text = cell(row, column.name());
    boolean known = damaged.contains(column.name());
    if (text.isEmpty() && column.required() && !known) {
      empty.add(column.name());
    }
    if (text.isEmpty()) {
      standIn(column, values, damaged);
      return;
    }
    try {
      values.put(column.name(), parse(column, text));
    } catch (IllegalArgumentException e) {
      standIn(column, values, damaged);
      damaged.add(column.name());
      if (!known) {
        remarks.error(
            new SurveyError(schema.name(), row.number(), column.name(), text, Text.message(e)));
      }
    }
  }

  private Object parse(Column<R> column, String text) {
    if (text.startsWith("=")) {
      throw new IllegalArgumentException(
          "The cell holds a formula, and formulas are not evaluated. Put in its value.");
    }
    return column.format().parse(text, table.decimalComma());
  }

  private void standIn(Column<R> column, Map<String, Object> values, Set<String> damaged) {
    if (column.required()) {
      values.put(column.name(), column.format().standIn());
      damaged.add(column.name());
    }
  }

  private String cell(SurveyTable.Row row, String column) {
    int index = indexes.getOrDefault(column, -1);
    return index < 0 || index >= row.cells().size() ? "" : Text.trim(row.cells().get(index));
  }
}
