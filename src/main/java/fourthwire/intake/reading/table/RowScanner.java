package fourthwire.intake.reading.table;

import java.io.IOException;
import java.io.Reader;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * Cuts text into rows and cells (RFC 4180, with any separator): one row at a time in buffers that
 * are used again, so that reading makes no object for a cell.
 */
final class RowScanner {
  private static final int LONGEST_ROW = 1 << 20;

  private final Reader in;
  private final char separator;
  private final char[] buffer = new char[1 << 16];
  private int at;
  private int end;
  private char[] row = new char[1 << 12];
  private int length;
  private int[] ends = new int[256];
  private int cells;
  private long rows;

  RowScanner(Reader in, char separator) {
    this.in = in;
    this.separator = separator;
  }

  /** Moves to the next row that is not empty; false at the end. */
  boolean next() throws IOException {
    do {
      if (!more()) {
        return false;
      }
      scan();
      rows++;
    } while (cells == 1 && length == 0);
    return true;
  }

  private boolean more() throws IOException {
    if (at < end) {
      return true;
    }
    at = 0;
    end = Math.max(0, in.read(buffer));
    return end > 0;
  }

  private void scan() throws IOException {
    length = 0;
    cells = 0;
    boolean quoted = false;
    while (more()) {
      char c = buffer[at++];
      if (c == '"') {
        if (quoted && more() && buffer[at] == '"') {
          at++;
          put('"');
        } else if (quoted || length == start(cells)) {
          quoted = !quoted;
        } else {
          put(c);
        }
      } else if (quoted) {
        put(c);
      } else if (c == separator) {
        endCell();
      } else if (c == '\n' || c == '\r') {
        if (c == '\r' && more() && buffer[at] == '\n') {
          at++;
        }
        break;
      } else if (c != '\u001A' && c != '\0') {
        put(c);
      }
    }
    endCell();
  }

  private void put(char c) {
    if (length == row.length) {
      if (length >= LONGEST_ROW) {
        throw new TableException(
            "Row "
                + (rows + 1)
                + " is longer than a million characters: this is no table of rows.");
      }
      row = Arrays.copyOf(row, 2 * length);
    }
    row[length++] = c;
  }

  private void endCell() {
    if (cells == ends.length) {
      ends = Arrays.copyOf(ends, 2 * cells);
    }
    ends[cells++] = length;
  }

  private int start(int cell) {
    return cell == 0 ? 0 : ends[cell - 1];
  }

  /** Number of the row as a spreadsheet shows it, the first being 1; empty rows count. */
  long row() {
    return rows;
  }

  /** Cells of this row. */
  int cells() {
    return cells;
  }

  /** A cell's text, trimmed; empty beyond the row's end. */
  String text(int cell) {
    return cell < cells ? new String(row, start(cell), ends[cell] - start(cell)).trim() : "";
  }

  /** All cells of this row as text. */
  List<String> texts() {
    List<String> texts = new ArrayList<>();
    for (int k = 0; k < cells; k++) {
      texts.add(text(k));
    }
    return texts;
  }

  /** A cell as a number. */
  double number(int cell, boolean decimalComma) {
    return cell < cells ? Numbers.parse(row, start(cell), ends[cell], decimalComma) : Numbers.BLANK;
  }
}
