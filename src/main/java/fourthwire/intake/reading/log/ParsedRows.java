package fourthwire.intake.reading.log;

import fourthwire.intake.reading.table.RowTime;
import fourthwire.intake.reading.table.TextTable;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.regex.Pattern;

/**
 * The rows of one block as numbers, with what could not be read. Filled by one worker; once its
 * rows are copied it may be filled again.
 */
final class ParsedRows {
  /** What is told of each kind of trouble. */
  static final int TOLD = 3;

  private static final int FIRST_ROWS = 256;

  private static final Pattern SUMMARY =
      Pattern.compile(
          "(?i)\\W*(min|max|avg|average|mean|total|sum|summe|std|stdev|p\\d\\d|median|mittel|moy"
              + "|count|peak|end|statisti|summary|note|comment|remark|#|//|\\*).*");

  private final LogColumns columns;
  private final RowTime time;
  private final List<Trouble> unreadable = new ArrayList<>();
  private final List<Trouble> passedOver = new ArrayList<>();
  private final List<Trouble> timeless = new ArrayList<>();
  private long[] localMillis = new long[FIRST_ROWS];
  private int[] offsetSeconds = new int[FIRST_ROWS];
  private double[][] values;
  private int rows;
  private long fileRows;
  private long unreadableCells;
  private long passedOverRows;

  /** A row of the block, counted from 1, and what stands there. */
  record Trouble(long row, String text) {}

  ParsedRows(LogColumns columns) {
    this.columns = columns;
    this.time = new RowTime(columns.time(), columns.order());
    this.values = new double[columns.count()][FIRST_ROWS];
  }

  /** Takes in the rows of a block in place of what it holds. */
  ParsedRows fill(TextTable.RowBlock block) {
    rows = 0;
    unreadableCells = 0;
    passedOverRows = 0;
    List.of(unreadable, passedOver, timeless).forEach(List::clear);
    fileRows =
        block.forEach(
            row -> {
              take(row);
              return timeless.isEmpty();
            });
    return this;
  }

  private void take(TextTable.Row row) {
    if (!time.read(row)) {
      passOver(row);
      return;
    }
    if (rows == localMillis.length) {
      grow();
    }
    localMillis[rows] = time.localMillis();
    offsetSeconds[rows] = time.offsetSeconds();
    for (int k = 0; k < values.length; k++) {
      double value = columns.value(row, k);
      if (value == Double.NEGATIVE_INFINITY) {
        value = Double.NaN;
        unreadable(row, k);
      }
      values[k][rows] = value;
    }
    rows++;
  }

  private void grow() {
    int more = 2 * rows;
    localMillis = Arrays.copyOf(localMillis, more);
    offsetSeconds = Arrays.copyOf(offsetSeconds, more);
    for (int k = 0; k < values.length; k++) {
      values[k] = Arrays.copyOf(values[k], more);
    }
  }

  /** A row without a time: a remark may be passed over, values may not. */
  private void passOver(TextTable.Row row) {
    boolean any = false;
    for (int k = 0; k < values.length; k++) {
      any = any || columns.value(row, k) > Double.NEGATIVE_INFINITY;
    }
    if (any && !isNote(row)) {
      timeless.add(new Trouble(row.number(), columns.time().text(row)));
      return;
    }
    passedOverRows++;
    if (passedOver.size() < TOLD) {
      passedOver.add(new Trouble(row.number(), ""));
    }
  }

  /** A line below or between the values: a sum, a remark, a header that comes again. */
  private boolean isNote(TextTable.Row row) {
    String first = row.text(columns.time().columns().get(0));
    return first.isEmpty()
        ? 2 * row.cells() < columns.headings().size()
        : SUMMARY.matcher(first).matches() || columns.headings().contains(first) || row.cells() < 3;
  }

  private void unreadable(TextTable.Row row, int column) {
    unreadableCells++;
    if (unreadable.size() < TOLD) {
      unreadable.add(
          new Trouble(
              row.number(),
              columns.heading(column) + ": \"" + row.text(columns.at(column)) + "\""));
    }
  }

  int rows() {
    return rows;
  }

  /** Rows of the block, empty ones and headings counted. */
  long fileRows() {
    return fileRows;
  }

  long localMillis(int row) {
    return localMillis[row];
  }

  int offsetSeconds(int row) {
    return offsetSeconds[row];
  }

  /** Copies rows of every column. */
  void copy(int from, double[][] into, int at, int count) {
    for (int k = 0; k < values.length; k++) {
      System.arraycopy(values[k], from, into[k], at, count);
    }
  }

  List<Trouble> unreadable() {
    return unreadable;
  }

  long unreadableCells() {
    return unreadableCells;
  }

  List<Trouble> passedOver() {
    return passedOver;
  }

  long passedOverRows() {
    return passedOverRows;
  }

  /** Rows of values without a time. */
  List<Trouble> timeless() {
    return timeless;
  }
}
