package fourthwire.intake.reading.upload;

import fourthwire.intake.reading.ReadingRefusedException;
import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.math.BigDecimal;
import java.nio.charset.StandardCharsets;
import java.time.LocalDateTime;
import java.time.format.DateTimeFormatter;
import java.time.temporal.ChronoUnit;
import java.util.Locale;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.dhatim.fastexcel.reader.Cell;
import org.dhatim.fastexcel.reader.CellType;
import org.dhatim.fastexcel.reader.ExcelReaderException;
import org.dhatim.fastexcel.reader.ReadableWorkbook;
import org.dhatim.fastexcel.reader.ReadingOptions;
import org.dhatim.fastexcel.reader.Row;
import org.jspecify.annotations.Nullable;

/**
 * The first sheet of an xlsx workbook (ECMA-376) as the text table it stands for, so that it is
 * read as a CSV file is: dates as ISO 8601, numbers with a decimal point, of a formula the value
 * the workbook last held. Rows keep their numbers.
 */
final class FirstSheet {
  /** The part that every workbook has and no other zip. */
  static final String CONTENT_TYPES = "[Content_Types].xml";

  private static final ReadingOptions WITH_FORMATS = new ReadingOptions(true, false);
  private static final int MOST_ROWS = 1_100_000;
  private static final DateTimeFormatter TIME =
      DateTimeFormatter.ofPattern("yyyy-MM-dd HH:mm:ss", Locale.ROOT);

  private final StringBuilder text = new StringBuilder();
  private int rows;

  /** A cell beyond column XFD, the last; a reader would make room for all before it. */
  private static final Pattern COLUMN_BEYOND_XFD =
      Pattern.compile("<c\\s[^>]*\\br\\s*=\\s*[\"'][A-Za-z]{4,}");

  private FirstSheet() {}

  /** Whether a part's text names a cell in a column that no workbook has. */
  static boolean namesNoColumn(String part) {
    return COLUMN_BEYOND_XFD.matcher(part).find();
  }

  /** The sheet as CSV with commas. */
  static byte[] csv(String name, byte[] workbook) {
    FirstSheet sheet = new FirstSheet();
    try (ReadableWorkbook book =
            new ReadableWorkbook(new ByteArrayInputStream(workbook), WITH_FORMATS);
        Stream<Row> rows = book.getFirstSheet().openStream()) {
      rows.forEach(sheet::row);
    } catch (IOException | ExcelReaderException | NumberFormatException e) {
      throw new ReadingRefusedException(
          name + " is a workbook that can't be read. Save it again as xlsx, or its sheet as CSV.");
    }
    return sheet.text.toString().getBytes(StandardCharsets.UTF_8);
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
