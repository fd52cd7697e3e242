package fourthwire.intake.reading.table;

import java.util.List;

/** A text table that can't be read; the message says where and what is wrong. */
public final class TableException extends RuntimeException {
  private static final long serialVersionUID = 1L;

  private final transient List<String> columns;

  /** With a sentence for the user. */
  public TableException(String message) {
    this(message, List.of());
  }

  /** With the cells that come nearest to headings. */
  TableException(String message, List<String> columns) {
    super(message);
    this.columns = List.copyOf(columns);
  }

  /** Cells that come nearest to headings; none where there are no rows of cells. */
  public List<String> columns() {
    return columns;
  }
}
