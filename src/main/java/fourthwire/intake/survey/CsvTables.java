package fourthwire.intake.survey;

import de.siegmar.fastcsv.reader.CsvParseException;
import de.siegmar.fastcsv.reader.CsvReader;
import de.siegmar.fastcsv.reader.CsvRecord;
import de.siegmar.fastcsv.reader.FieldMismatchStrategy;
import fourthwire.site.check.SurveyError;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.ByteBuffer;
import java.nio.CharBuffer;
import java.nio.charset.CharsetDecoder;
import java.nio.charset.CoderResult;
import java.nio.charset.CodingErrorAction;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.Collection;
import java.util.List;

/**
 * The CSV dialect of survey tables, RFC 4180 with the latitude that spreadsheets need: UTF-8 with
 * or without a byte order mark; comma, semicolon or tab, whichever makes the most known columns of
 * the header; a decimal comma where the separator is not a comma; any line ends. Blank lines count
 * as rows and a quoted cell of several lines is one row, as in a spreadsheet.
 */
final class CsvTables {
  private static final char COMMA = ',';
  private static final List<Character> SEPARATORS = List.of(COMMA, ';', '\t');

  private CsvTables() {}

  /**
   * Reads one file.
   *
   * @param known the columns that the table may have
   */
  static SurveyTable read(String table, byte[] bytes, Collection<String> known, Guards guards)
      throws RefusedException {
    String text = decode(table, bytes);
    char separator = separator(text, known);
    List<SurveyTable.Row> rows = records(table, text, separator, guards);
    if (rows.stream().allMatch(SurveyTable.Row::isBlank)) {
      throw new RefusedException(
          SurveyError.ofTable(table, "The file is empty; row 1 must name the columns."));
    }
    if (rows.get(0).isBlank()) {
      throw new RefusedException(
          new SurveyError(
              table, 1, "", "", "Row 1 is empty; it must hold the names of the columns."));
    }
    return new SurveyTable(
        table, rows.get(0).cells(), rows.subList(1, rows.size()), separator != COMMA);
  }

  private static String decode(String table, byte[] bytes) throws RefusedException {
    CharsetDecoder decoder =
        StandardCharsets.UTF_8
            .newDecoder()
            .onMalformedInput(CodingErrorAction.REPORT)
            .onUnmappableCharacter(CodingErrorAction.REPORT);
    CharBuffer text = CharBuffer.allocate(bytes.length + 1);
    CoderResult result = decoder.decode(ByteBuffer.wrap(bytes), text, true);
    text.flip();
    String decoded = text.toString();
    if (result.isError()) {
      int line = 1 + (int) decoded.chars().filter(c -> c == '\n').count();
      throw new RefusedException(
          new SurveyError(
              table,
              line,
              "",
              "",
              "Line %d is not UTF-8 text. Save the table as CSV in UTF-8.".formatted(line)));
    }
    return decoded.startsWith("\ufeff") ? decoded.substring(1) : decoded;
  }

  private static char separator(String text, Collection<String> known) {
    char best = COMMA;
    long most = -1;
    for (char candidate : SEPARATORS) {
      long columns =
          headerCells(text, candidate).stream().map(Text::key).filter(known::contains).count();
      if (columns > most) {
        best = candidate;
        most = columns;
      }
    }
    return best;
  }

  private static List<String> headerCells(String text, char separator) {
    int end = text.length();
    for (int i = 0; i < text.length(); i++) {
      if (text.charAt(i) == '\n' || text.charAt(i) == '\r') {
        end = i;
        break;
      }
    }
    List<String> cells = new ArrayList<>();
    for (String cell : text.substring(0, end).split(String.valueOf(separator), -1)) {
      cells.add(cell.replace("\"", ""));
    }
    return cells;
  }

  private static List<SurveyTable.Row> records(
      String table, String text, char separator, Guards guards) throws RefusedException {
    List<SurveyTable.Row> rows = new ArrayList<>();
    int number = 0;
    try (CsvReader<CsvRecord> reader =
        CsvReader.builder()
            .fieldSeparator(separator)
            .skipEmptyLines(false)
            .missingFieldStrategy(FieldMismatchStrategy.IGNORE)
            .extraFieldStrategy(FieldMismatchStrategy.IGNORE)
            .allowUnclosedQuote(false)
            .ofCsvRecord(text)) {
      for (CsvRecord line : reader) {
        guards.countRow(table);
        SurveyTable.Row row = new SurveyTable.Row(++number, line.getFields());
        if (number == 1 || !row.isBlank()) {
          rows.add(row);
        }
      }
    } catch (CsvParseException e) {
      throw new RefusedException(
          new SurveyError(
              table,
              number + 1,
              "",
              "",
              "A quoted cell is not closed, or text follows its closing quote. Write a quote inside"
                  + " a quoted cell as two quotes."));
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
    return rows;
  }
}
