package fourthwire.intake.survey;

import fourthwire.site.Survey;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Writes surveys as files that {@link SurveyImport} reads back to an equal survey. Equal surveys
 * give equal bytes.
 *
 * <p>Tables stand in the contract's order, those without rows are left out; so do the columns: the
 * required ones and those in use. Numbers are written exactly and as short as they can be.
 */
public final class SurveyExport {
  private SurveyExport() {}

  /** A zip of CSV files: UTF-8, comma, decimal point, a line feed ends each row. */
  public static byte[] zip(Survey survey) {
    Map<String, byte[]> files = new LinkedHashMap<>();
    for (SurveyTable table : tables(survey)) {
      files.put(table.name() + ".csv", CsvWriting.bytes(table));
    }
    return ZipFiles.packed(files);
  }

  /** An xlsx workbook with a sheet per table. */
  public static byte[] xlsx(Survey survey) {
    return XlsxWriting.bytes(tables(survey));
  }

  /** The tables as text, canonically written. */
  public static List<SurveyTable> tables(Survey survey) {
    List<SurveyTable> tables = new ArrayList<>();
    tables.add(settings(survey));
    for (Schemas.Rows<?> rows : Schemas.ALL) {
      table(rows, survey).ifPresent(tables::add);
    }
    return List.copyOf(tables);
  }

  private static SurveyTable settings(Survey survey) {
    List<SurveyTable.Row> rows = new ArrayList<>();
    for (var setting : SourceTables.SITE.columns()) {
      setting
          .print()
          .apply(survey.settings())
          .ifPresent(v -> rows.add(row(rows.size(), List.of(setting.name(), v))));
    }
    return new SurveyTable(
        SourceTables.SITE.name(), List.of(SettingsReader.KEY, SettingsReader.VALUE), rows, false);
  }

  private static <R> Optional<SurveyTable> table(Schemas.Rows<R> rows, Survey survey) {
    List<R> records = rows.of().apply(survey);
    if (records.isEmpty()) {
      return Optional.empty();
    }
    List<Column<R>> columns =
        rows.schema().columns().stream().filter(c -> inUse(c, records)).toList();
    List<SurveyTable.Row> written = new ArrayList<>();
    for (R record : records) {
      written.add(
          row(
              written.size(),
              columns.stream().map(c -> c.print().apply(record).orElse("")).toList()));
    }
    return Optional.of(
        new SurveyTable(
            rows.schema().name(), columns.stream().map(Column::name).toList(), written, false));
  }

  private static <R> boolean inUse(Column<R> column, List<R> records) {
    return column.required() || records.stream().anyMatch(r -> column.print().apply(r).isPresent());
  }

  private static SurveyTable.Row row(int rowsAbove, List<String> cells) {
    int firstBelowHeader = 2;
    return new SurveyTable.Row(rowsAbove + firstBelowHeader, cells);
  }
}
