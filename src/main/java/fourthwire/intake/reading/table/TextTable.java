package fourthwire.intake.reading.table;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.util.List;
import java.util.Optional;
import java.util.function.Supplier;

/**
 * A text file of rows below a row of headings: any encoding of UTF-8, UTF-16 and Windows-1252, any
 * of the separators comma, semicolon, tab, bar and lined-up blanks, decimal point or comma, lines
 * before the headings passed over, units below and groups above them joined to them.
 */
public final class TextTable {
  private static final int HEAD = 1 << 18;

  private final Supplier<InputStream> file;
  private final Encoding encoding;
  private final Dialect dialect;
  private final byte lineEnd;
  private final boolean quotes;

  private TextTable(Supplier<InputStream> file, Encoding encoding, byte[] head, int length) {
    this.file = file;
    this.encoding = encoding;
    String text = new String(head, 0, length, java.nio.charset.StandardCharsets.ISO_8859_1);
    this.lineEnd = (byte) (text.indexOf('\n') < 0 ? '\r' : '\n');
    this.quotes = text.indexOf('"') >= 0;
    // A head that is not the whole file may end within a row.
    int rows = length < HEAD ? length : text.lastIndexOf(lineEnd) + 1;
    this.dialect = Dialect.of(head, rows, encoding.charset());
  }

  /**
   * The table in this file.
   *
   * @param file opens it from the start, as often as asked
   * @throws TableException where there is none
   */
  public static TextTable of(Supplier<InputStream> file) {
    try (InputStream first = file.get();
        InputStream again = file.get()) {
      Encoding encoding = Encoding.of(first);
      byte[] head = new byte[HEAD];
      int length = encoding.open(again).readNBytes(head, 0, HEAD);
      return new TextTable(file, encoding, head, length);
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  /** Headings of the columns, each once; a row of units is joined in brackets. */
  public List<String> headings() {
    return dialect.header().headings();
  }

  /** What stands above the headings, cell by cell. */
  public List<String> preamble() {
    return dialect.preamble();
  }

  /** Headings of columns whose numbers may have thousands set apart or three decimals. */
  public List<String> openNumbers() {
    return dialect.numbers().openColumns().stream()
        .filter(k -> k < headings().size())
        .map(headings()::get)
        .toList();
  }

  /**
   * The heading that a text stands for: itself, or what the row of names alone writes where a unit
   * or group was joined to it.
   */
  public String heading(String text) {
    int at = headings().contains(text) ? -1 : dialect.header().written().indexOf(text);
    return at < 0 ? text : headings().get(at);
  }

  /** How the file is written, one sentence. */
  public String note() {
    String separator =
        switch (dialect.separator()) {
          case ';' -> "semicolon";
          case '\t' -> "tab";
          case '|' -> "bar";
          case ' ' -> "blanks";
          default -> "comma";
        };
    return "Cells are separated by "
        + separator
        + ", decimals by "
        + (dialect.numbers().decimalComma() ? "comma" : "point")
        + "; headings stand above row "
        + dialect.firstData()
        + ".";
  }

  /** A row as it is passed by; not to be kept. */
  public interface Row {
    /** Its number as a spreadsheet shows it. */
    long number();

    /** Its cells. */
    int cells();

    /** A cell's text, trimmed. */
    String text(int column);

    /**
     * A cell's value times ten to the power of {@code shift}: NaN for a blank or a mark for "not
     * measured", negative infinity for what is no number.
     */
    double value(int column, int shift);

    /** A cell's value. */
    default double value(int column) {
      return value(column, 0);
    }
  }

  /** Goes through rows. */
  public interface Visitor {
    /** One row; false to stop. */
    boolean row(Row row);
  }

  /** Passes every row of values by. */
  public void forEach(Visitor visitor) {
    forEach(cutter(), visitor);
  }

  /** Passes every row by with no more than its first cells, where that saves time. */
  public void forEach(int firstCells, Visitor visitor) {
    forEach(quotes ? cutter() : cutter().first(firstCells), visitor);
  }

  private void forEach(RowCutter cutter, Visitor visitor) {
    try (InputStream in = open()) {
      Blocks blocks = blocks(in);
      RowWalk walk = new RowWalk(cutter, 0);
      for (Blocks.Block b = blocks.next(); b.length() > 0; b = blocks.next()) {
        if (!walk.through(b, dialect.firstData(), visitor)) {
          return;
        }
        blocks.useAgain(b);
      }
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  /**
   * Rows of values in blocks, to be gone through on any thread. Row numbers are counted from the
   * block's first row.
   */
  public final class RowBlocks implements AutoCloseable {
    private final InputStream in;
    private final Blocks blocks;
    private boolean begun;

    private RowBlocks(InputStream in) {
      this.in = in;
      this.blocks = blocks(in);
    }

    /** The next block; empty at the end. */
    public Optional<RowBlock> next() {
      try {
        Blocks.Block block = blocks.next();
        long first = begun ? 1 : dialect.firstData();
        begun = true;
        return block.length() == 0 ? Optional.empty() : Optional.of(new RowBlock(block, first));
      } catch (IOException e) {
        throw new UncheckedIOException(e);
      }
    }

    /** Lets a block's memory be used for the next; its rows must not be gone through any more. */
    public void useAgain(RowBlock block) {
      blocks.useAgain(block.block);
    }

    /** Bytes of the file taken in so far. */
    public long bytesRead() {
      return blocks.bytesRead();
    }

    @Override
    public void close() {
      try {
        in.close();
      } catch (IOException e) {
        throw new UncheckedIOException(e);
      }
    }
  }

  /** Some rows of the table. */
  public final class RowBlock {
    private final Blocks.Block block;
    private final long first;

    private RowBlock(Blocks.Block block, long first) {
      this.block = block;
      this.first = first;
    }

    /** Passes its rows by; returns how many rows it has, empty ones and headings counted. */
    public long forEach(Visitor visitor) {
      RowWalk walk = new RowWalk(cutter(), 0);
      walk.through(block, first, visitor);
      return walk.number();
    }
  }

  /** Opens the rows in blocks; the caller closes. */
  public RowBlocks inBlocks() {
    try {
      return new RowBlocks(open());
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  private InputStream open() throws IOException {
    return encoding.open(file.get());
  }

  private Blocks blocks(InputStream in) {
    return new Blocks(in, lineEnd, quotes);
  }

  private RowCutter cutter() {
    return new RowCutter(dialect.separator(), encoding.charset(), dialect.numbers().decimalComma());
  }
}
