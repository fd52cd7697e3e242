package fourthwire.intake.survey;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.math.BigDecimal;
import java.nio.charset.StandardCharsets;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.dhatim.fastexcel.Workbook;
import org.dhatim.fastexcel.Worksheet;

/** Writes tables as an xlsx workbook that bears no trace of when it was written. */
final class XlsxWriting {
  private static final String PROPERTIES = "docProps/core.xml";
  private static final String CREATED = "(<dcterms:created[^>]*>)[^<]*";
  private static final String STAMP = "$12000-01-01T00:00:00Z";

  private static final Map<String, Set<String>> NUMERIC = numericColumns();

  private XlsxWriting() {}

  static byte[] bytes(List<SurveyTable> tables) {
    ByteArrayOutputStream bytes = new ByteArrayOutputStream();
    try (Workbook workbook = new Workbook(bytes, "Fourthwire", null)) {
      tables.forEach(t -> write(t, workbook.newWorksheet(t.name())));
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
    return timeless(bytes.toByteArray());
  }

  private static void write(SurveyTable table, Worksheet sheet) {
    List<String> header = table.header();
    for (int c = 0; c < header.size(); c++) {
      sheet.value(0, c, header.get(c));
      sheet.style(0, c).bold().set();
    }
    sheet.freezePane(0, 1);
    for (SurveyTable.Row row : table.rows()) {
      for (int c = 0; c < row.cells().size(); c++) {
        write(row, c, isNumeric(table, row, c), sheet);
      }
    }
  }

  private static void write(SurveyTable.Row row, int column, boolean numeric, Worksheet sheet) {
    String text = row.cells().get(column);
    if (text.isEmpty()) {
      return;
    }
    if (numeric) {
      sheet.value(row.number() - 1, column, new BigDecimal(text));
    } else {
      sheet.value(row.number() - 1, column, text);
    }
  }

  private static boolean isNumeric(SurveyTable table, SurveyTable.Row row, int column) {
    String name = table.header().get(column);
    boolean setting = table.name().equals(SourceTables.SITE.name());
    return NUMERIC
        .getOrDefault(table.name(), Set.of())
        .contains(setting && column == 1 ? row.cells().get(0) : name);
  }

  /** The columns of each table, and the keys of the site table, that hold numbers. */
  private static Map<String, Set<String>> numericColumns() {
    Stream<Schema<?>> schemas =
        Stream.concat(Stream.of(SourceTables.SITE), Schemas.ALL.stream().map(t -> t.schema()));
    return schemas.collect(Collectors.toMap(Schema::name, XlsxWriting::numericColumns));
  }

  private static Set<String> numericColumns(Schema<?> schema) {
    return schema.columns().stream()
        .filter(c -> c.format().numeric())
        .map(Column::name)
        .collect(Collectors.toSet());
  }

  private static byte[] timeless(byte[] workbook) {
    Map<String, byte[]> parts = new LinkedHashMap<>();
    try {
      Archive.unpack(workbook, Guards.none()).forEach(p -> parts.put(p.path(), p.bytes()));
    } catch (RefusedException e) {
      throw new IllegalStateException(e);
    }
    parts.computeIfPresent(PROPERTIES, (path, bytes) -> withoutTime(bytes));
    return ZipFiles.packed(parts);
  }

  private static byte[] withoutTime(byte[] properties) {
    return new String(properties, StandardCharsets.UTF_8)
        .replaceFirst(CREATED, STAMP)
        .getBytes(StandardCharsets.UTF_8);
  }
}
