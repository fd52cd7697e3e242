package fourthwire.site.check;

import java.util.Arrays;
import java.util.Set;
import java.util.function.UnaryOperator;

/**
 * A row as read, with what could be read of it.
 *
 * @param row as a spreadsheet shows it
 * @param content its values; a damaged column holds a stand-in that no check may look at
 * @param damaged columns already reported, on which nothing further may be said
 * @param cells the cell of a column as read
 */
public record DraftRow<T>(
    String table, int row, T content, Set<String> damaged, UnaryOperator<String> cells) {

  /** Whether all these columns could be read. */
  public boolean sound(String... columns) {
    return damaged.isEmpty() || Arrays.stream(columns).noneMatch(damaged::contains);
  }

  /** The cell of this column as read. */
  public String cell(String column) {
    return cells.apply(column);
  }

  SurveyError error(String column, String message) {
    return new SurveyError(table, row, column, cell(column), message);
  }

  /** How a message names this row. */
  String place() {
    return table + " row " + row;
  }
}
