package fourthwire.quantity;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;

/**
 * A table of a published document, kept as a text resource beside the class that applies it and
 * typed as printed, so that a reader can compare it with the page.
 *
 * <p>The resource starts with lines {@code # key: value}, of which {@code document}, {@code clause}
 * and {@code provenance} are required; a plain comma-separated table with a header row follows. An
 * empty cell stands for "no figure printed".
 */
public final class PublishedTable {
  private final Map<String, String> header;
  private final List<Row> rows;

  private PublishedTable(Map<String, String> header, List<Row> rows) {
    this.header = header;
    this.rows = rows;
  }

  /**
   * Reads a table of the class path.
   *
   * @param owner the class beside which the resource lies
   * @param name file name of the resource
   * @throws IllegalStateException if it is missing or malformed: the program is built wrongly
   */
  public static PublishedTable beside(Class<?> owner, String name) {
    try (InputStream in = owner.getResourceAsStream(name)) {
      if (in == null) {
        throw new IllegalStateException("no published table " + name);
      }
      return parse(name, new String(in.readAllBytes(), StandardCharsets.UTF_8));
    } catch (IOException e) {
      throw new UncheckedIOException("published table " + name + " can't be read", e);
    }
  }

  private static PublishedTable parse(String name, String text) {
    Map<String, String> header = new HashMap<>();
    List<String> lines = text.lines().filter(line -> !line.isBlank()).toList();
    for (String line : lines) {
      if (line.startsWith("# ")) {
        int colon = line.indexOf(": ");
        header.putIfAbsent(line.substring(2, colon), line.substring(colon + 2));
      }
    }
    if (!header.keySet().containsAll(List.of("document", "clause", "provenance"))) {
      throw new IllegalStateException("published table " + name + " does not name its source");
    }
    List<String> table = lines.stream().filter(line -> !line.startsWith("#")).toList();
    List<String> columns = List.of(table.get(0).split(","));
    List<Row> rows =
        table.stream().skip(1).map(line -> Row.of(columns, line.split(",", -1))).toList();
    return new PublishedTable(header, rows);
  }

  /** Document and edition. */
  public String document() {
    return header.getOrDefault("document", "");
  }

  /** Clause and table of the document. */
  public String clause() {
    return header.getOrDefault("clause", "");
  }

  /** Whether the figures were recalled rather than read from a stored text. */
  public boolean fromMemory() {
    return header.getOrDefault("provenance", "").startsWith("from memory");
  }

  /** Document, clause, and "from memory" where that is so: what a finding gives as its basis. */
  public String basis() {
    return document() + ", " + clause() + (fromMemory() ? " (figures from memory)" : "");
  }

  /** The rows in printed order. */
  public List<Row> rows() {
    return rows;
  }

  /** A row, by column name. */
  public static final class Row {
    private final Map<String, String> cells;

    private Row(Map<String, String> cells) {
      this.cells = cells;
    }

    private static Row of(List<String> columns, String[] values) {
      Map<String, String> cells = new HashMap<>();
      for (int i = 0; i < columns.size(); i++) {
        cells.put(columns.get(i), i < values.length ? values[i].strip() : "");
      }
      return new Row(cells);
    }

    /** The cell's text. */
    public String text(String column) {
      String cell = cells.get(column);
      if (cell == null) {
        throw new IllegalStateException("no column " + column);
      }
      return cell;
    }

    /** The cell's number; it must be there. */
    public double number(String column) {
      return Double.parseDouble(text(column));
    }

    /** The cell's number, empty where none is printed. */
    public OptionalDouble optional(String column) {
      String cell = text(column);
      return cell.isEmpty() ? OptionalDouble.empty() : OptionalDouble.of(Double.parseDouble(cell));
    }
  }
}
