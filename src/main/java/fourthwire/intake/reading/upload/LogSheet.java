package fourthwire.intake.reading.upload;

import fourthwire.intake.reading.ReadingRefusedException;
import fourthwire.intake.reading.heading.Heading;
import fourthwire.intake.reading.table.TableException;
import fourthwire.intake.reading.table.TextTable;
import fourthwire.intake.reading.table.TimeColumns;
import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.math.BigDecimal;
import java.nio.charset.StandardCharsets;
import java.time.LocalDateTime;
import java.time.format.DateTimeFormatter;
import java.time.temporal.ChronoUnit;
import java.util.List;
import java.util.Locale;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.dhatim.fastexcel.reader.Cell;
import org.dhatim.fastexcel.reader.CellType;
import org.dhatim.fastexcel.reader.ExcelReaderException;
import org.dhatim.fastexcel.reader.ReadableWorkbook;
import org.dhatim.fastexcel.reader.ReadingOptions;
import org.dhatim.fastexcel.reader.Row;
import org.dhatim.fastexcel.reader.Sheet;
import org.jspecify.annotations.Nullable;

/**
 * The sheet of an xlsx workbook (ECMA-376) that holds the rows, as the text table it stands for, so
 * that it is read as a CSV file is: dates as ISO 8601, numbers with a decimal point, of a formula
 * the value the workbook last held. Rows keep their numbers.
 */
final class LogSheet {
  /** The part that every workbook has and no other zip. */
  static final String CONTENT_TYPES = "[Content_Types].xml";

  private static final ReadingOptions WITH_FORMATS = new ReadingOptions(true, false);
  private static final int OF_A_LOG = 3;
  private static final int MOST_ROWS = 1_100_000;
  private static final DateTimeFormatter TIME =
      DateTimeFormatter.ofPattern("yyyy-MM-dd HH:mm:ss", Locale.ROOT);

  private final StringBuilder text = new StringBuilder();
  private int rows;

  /** A cell beyond column XFD, the last; a reader would make room for all before it. */
  private static final Pattern COLUMN_BEYOND_XFD =
      Pattern.compile("<c\\s[^>]*\\br\\s*=\\s*[\"'][A-Za-z]{4,}");

  private LogSheet() {}

  /** Whether a part's text names a cell in a column that no workbook has. */
  static boolean namesNoColumn(String part) {
    return COLUMN_BEYOND_XFD.matcher(part).find();
  }

  /**
   * The first sheet that has a table of times with a quantity beside them, else the first that
   * comes nearest to that, as CSV with commas: covers, notes and events may stand before it.
   */
  static byte[] csv(String name, byte[] workbook) {
    try (ReadableWorkbook book =
        new ReadableWorkbook(new ByteArrayInputStream(workbook), WITH_FORMATS)) {
      List<Sheet> sheets = book.getSheets().toList();
      byte[] best = csv(sheets.get(0));
      int likely = sheets.size() == 1 ? OF_A_LOG : likely(best);
      for (int k = 1; k < sheets.size() && likely < OF_A_LOG; k++) {
        byte[] next = csv(sheets.get(k));
        int such = likely(next);
        best = such > likely ? next : best;
        likely = Math.max(likely, such);
      }
      return best;
    } catch (IOException
        | ExcelReaderException
        | NumberFormatException
        | IndexOutOfBoundsException e) {
      throw new ReadingRefusedException(
          name + " is a workbook that can't be read. Save it again as xlsx, or its sheet as CSV.");
    }
  }

  private static byte[] csv(Sheet sheet) throws IOException {
    LogSheet text = new LogSheet();
    try (Stream<Row> rows = sheet.openStream()) {
      rows.forEach(text::row);
    }
    return text.text.toString().getBytes(StandardCharsets.UTF_8);
  }

  /** 0 for no table, 1 for one without times, 2 for one without quantities. */
  private static int likely(byte[] csv) {
    try {
      TextTable table = TextTable.of(() -> new ByteArrayInputStream(csv));
      TimeColumns time = TimeColumns.find(table);
      boolean timed = !time.columns().isEmpty() && !time.elapsed();
      boolean named =
          Heading.ofLog(table.headings()).values().stream()
              .anyMatch(h -> h.meaning() != Heading.Meaning.NONE);
      return timed ? named ? OF_A_LOG : 2 : 1;
    } catch (TableException e) {
      return 0;
    }
  }

  private void row(Row row) {
    if (row.getRowNum() > MOST_ROWS) {
      throw new ReadingRefusedException("The sheet has more rows than a workbook can have.");
    }
    for (; rows < row.getRowNum() - 1; rows++) {
      text.append('\n');
    }
    for (int k = 0; k < row.getCellCount(); k++) {
      text.append(k == 0 ? "" : ",").append(quoted(value(row.getCell(k))));
    }
    text.append('\n');
    rows++;
  }

  private static String quoted(String value) {
    boolean plain = value.chars().noneMatch(c -> c == ',' || c == '"' || c == '\n' || c == '\r');
    return plain ? value : '"' + value.replace("\"", "\"\"") + '"';
  }

  private static String value(@Nullable Cell cell) {
    if (cell == null) {
      return "";
    }
    if (cell.getType() == CellType.BOOLEAN) {
      return cell.asBoolean() ? "TRUE" : "FALSE";
    }
    String raw = cell.getType() == CellType.STRING ? cell.asString() : cell.getRawValue();
    if (raw == null || raw.isEmpty()) {
      return "";
    }
    return cell.getType() == CellType.NUMBER ? number(cell, raw) : raw;
  }

  /** A date is a number whose format shows day, month, year or hours (ECMA-376, 18.8.31). */
  private static String number(Cell cell, String raw) {
    String format = cell.getDataFormatString() == null ? "" : cell.getDataFormatString();
    String letters =
        format.replaceAll("\"[^\"]*\"|\\[[^\\]]*\\]|\\\\.", "").toLowerCase(Locale.ROOT);
    double value = Double.parseDouble(raw);
    boolean date = letters.matches(".*[ymdh].*") && !letters.contains("general");
    if (!date) {
      return new BigDecimal(raw).toPlainString();
    }
    LocalDateTime time = cell.asDate().plusNanos(500_000_000).truncatedTo(ChronoUnit.SECONDS);
    if (value < 1) {
      return time.toLocalTime().format(DateTimeFormatter.ofPattern("HH:mm:ss", Locale.ROOT));
    }
    return letters.contains("h") ? TIME.format(time) : TIME.format(time).substring(0, 10);
  }
}
