package fourthwire.intake.reading.table;

import java.io.IOException;
import java.io.InputStream;
import java.io.Reader;
import java.io.UncheckedIOException;
import java.util.List;
import java.util.function.Supplier;

/**
 * A text file of rows below a row of headings: any encoding of UTF-8, UTF-16 and Windows-1252, any
 * of the separators comma, semicolon, tab and bar, decimal point or comma, lines before the
 * headings passed over, a row of units below them joined to them.
 */
public final class TextTable {
  private static final int HEAD = 1 << 17;

  private final Supplier<InputStream> file;
  private final Dialect dialect;

  private TextTable(Supplier<InputStream> file, Dialect dialect) {
    this.file = file;
    this.dialect = dialect;
  }

  /**
   * The table in this file.
   *
   * @param file opens it from the start, as often as asked
   * @throws TableException where there is none
   */
  public static TextTable of(Supplier<InputStream> file) {
    try (Reader in = Encoding.open(file.get())) {
      char[] head = new char[HEAD];
      int length = 0;
      for (int n = in.read(head); n > 0; n = in.read(head, length, HEAD - length)) {
        length += n;
      }
      // A head that is not the whole file may end within a row.
      String text = new String(head, 0, length);
      return new TextTable(
          file, Dialect.of(length < HEAD ? text : text.substring(0, text.lastIndexOf('\n') + 1)));
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  /** Headings of the columns, each once; a row of units is joined in brackets. */
  public List<String> headings() {
    return dialect.headings();
  }

  /**
   * The heading that a text stands for: itself, or what the header row alone writes where a row of
   * units was joined to it.
   */
  public String heading(String text) {
    int at = dialect.headings().contains(text) ? -1 : dialect.written().indexOf(text);
    return at < 0 ? text : dialect.headings().get(at);
  }

  /** How the file is written, one sentence. */
  public String note() {
    String separator =
        switch (dialect.separator()) {
          case ';' -> "semicolon";
          case '\t' -> "tab";
          case '|' -> "bar";
          default -> "comma";
        };
    return "Cells are separated by "
        + separator
        + ", decimals by "
        + (dialect.decimalComma() ? "comma" : "point")
        + "; headings stand above row "
        + dialect.firstData()
        + ".";
  }

  /** A row as it is passed by; not to be kept. */
  public interface Row {
    /** Its number as a spreadsheet shows it. */
    long number();

    /** A cell's text, trimmed. */
    String text(int column);

    /**
     * A cell's value: NaN for a blank or a mark for "not measured", negative infinity for what is
     * no number.
     */
    double value(int column);
  }

  /** Goes through rows. */
  public interface Visitor {
    /** One row; false to stop. */
    boolean row(Row row);
  }

  /** Passes every row of values by. */
  public void forEach(Visitor visitor) {
    try (Reader in = Encoding.open(file.get())) {
      RowScanner rows = new RowScanner(in, dialect.separator());
      Row row = row(rows);
      while (rows.next()) {
        if (rows.row() >= dialect.firstData() && !visitor.row(row)) {
          return;
        }
      }
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  private Row row(RowScanner rows) {
    return new Row() {
      @Override
      public long number() {
        return rows.row();
      }

      @Override
      public String text(int column) {
        return rows.text(column);
      }

      @Override
      public double value(int column) {
        return rows.number(column, dialect.decimalComma());
      }
    };
  }
}
