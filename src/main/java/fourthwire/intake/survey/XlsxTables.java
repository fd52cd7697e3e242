package fourthwire.intake.survey;

import fourthwire.site.check.SurveyError;
import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.dhatim.fastexcel.reader.Cell;
import org.dhatim.fastexcel.reader.CellType;
import org.dhatim.fastexcel.reader.ExcelReaderException;
import org.dhatim.fastexcel.reader.ReadableWorkbook;
import org.dhatim.fastexcel.reader.Row;
import org.dhatim.fastexcel.reader.Sheet;
import org.jspecify.annotations.Nullable;

/**
 * The sheets of an xlsx workbook as tables. Formulas are not evaluated: their cells read as the
 * formula, which no column accepts. Workbooks with macros are refused, and so are parts that
 * declare a document type, since entities could reach outside the file.
 */
final class XlsxTables {
  static final String CONTENT_TYPES = "[Content_Types].xml";

  private static final int PROLOGUE_BYTES = 1024;
  private static final Pattern COLUMN_BEYOND_XFD =
      Pattern.compile("<c\\s[^>]*\\br\\s*=\\s*[\"'][A-Za-z]{4,}");

  private XlsxTables() {}

  /** A workbook's tables by the sheets' names, in its order. */
  static List<SurveyTable> read(List<Archive.Entry> parts, Guards guards) throws RefusedException {
    Map<String, byte[]> checked = new LinkedHashMap<>();
    for (Archive.Entry part : parts) {
      check(part);
      checked.put(part.path(), part.bytes());
    }
    // The workbook is read from the parts just checked, not from the file that was sent: what was
    // checked is what is read.
    byte[] file = ZipFiles.stored(checked);
    try (ReadableWorkbook workbook = new ReadableWorkbook(new ByteArrayInputStream(file))) {
      List<SurveyTable> tables = new ArrayList<>();
      for (Sheet sheet : workbook.getSheets().toList()) {
        tables.add(table(sheet, guards));
      }
      return tables;
    } catch (IOException | ExcelReaderException e) {
      throw damaged("its parts can't be read as those of a workbook");
    }
  }

  private static void check(Archive.Entry part) throws RefusedException {
    String path = part.path().toLowerCase(Locale.ROOT);
    if (path.contains("vbaproject") || path.contains("macrosheets/")) {
      throw macros();
    }
    if (!path.endsWith(".xml") && !path.endsWith(".rels")) {
      return;
    }
    String text = new String(part.bytes(), StandardCharsets.ISO_8859_1);
    if (part.path().equals(CONTENT_TYPES) && text.contains("macroEnabled")) {
      throw macros();
    }
    String prologue = text.substring(0, Math.min(PROLOGUE_BYTES, text.length()));
    if (prologue.indexOf('\0') >= 0 || text.contains("<!DOCTYPE")) {
      throw refusal(
          "The workbook's part "
              + part.path()
              + " is in UTF-16 or declares a document type, which"
              + " is refused. Save the workbook again as xlsx.");
    }
    if (path.contains("worksheets/") && COLUMN_BEYOND_XFD.matcher(text).find()) {
      throw damaged(part.path() + " names a column that no workbook has");
    }
  }

  private static SurveyTable table(Sheet sheet, Guards guards)
      throws IOException, RefusedException {
    List<SurveyTable.Row> rows = new ArrayList<>();
    String name = Text.key(sheet.getName());
    try (Stream<Row> stream = sheet.openStream()) {
      for (Row row : (Iterable<Row>) stream::iterator) {
        guards.countRow(name);
        SurveyTable.Row read = new SurveyTable.Row(row.getRowNum(), cells(row));
        if (!read.isBlank()) {
          rows.add(read);
        }
      }
    }
    boolean headed = !rows.isEmpty() && rows.get(0).number() == 1;
    return headed
        ? new SurveyTable(name, rows.get(0).cells(), rows.subList(1, rows.size()), true)
        : new SurveyTable(name, List.of(), rows, true);
  }

  private static List<String> cells(Row row) {
    List<String> cells = new ArrayList<>();
    for (int i = 0; i < row.getCellCount(); i++) {
      cells.add(text(row.getCell(i)));
    }
    return cells;
  }

  private static String text(@Nullable Cell cell) {
    if (cell == null) {
      return "";
    }
    String formula = cell.getFormula();
    if (cell.getType() == CellType.FORMULA || (formula != null && !formula.isEmpty())) {
      return "=" + (formula == null ? "" : formula);
    }
    if (cell.getType() == CellType.BOOLEAN) {
      return cell.asBoolean() ? "TRUE" : "FALSE";
    }
    if (cell.getType() == CellType.NUMBER) {
      return Numbers.print(cell.asNumber().doubleValue());
    }
    String raw = cell.getType() == CellType.STRING ? cell.asString() : cell.getRawValue();
    return raw == null ? "" : raw;
  }

  private static RefusedException macros() {
    return refusal("The workbook holds macros. Save it as xlsx, which can't hold any.");
  }

  private static RefusedException damaged(String reason) {
    return refusal("The workbook is damaged (" + reason + "). Save and send it again.");
  }

  private static RefusedException refusal(String message) {
    return new RefusedException(SurveyError.ofFile(message));
  }
}
