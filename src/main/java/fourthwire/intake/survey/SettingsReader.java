package fourthwire.intake.survey;

import fourthwire.site.SiteSettings;
import fourthwire.site.check.Closest;
import fourthwire.site.check.DraftRow;
import fourthwire.site.check.DraftTable;
import fourthwire.site.check.DraftTable.State;
import fourthwire.site.check.SurveyError;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/** Reads the site table, whose rows are settings: a key and a value. */
final class SettingsReader {
  static final String KEY = "key";
  static final String VALUE = "value";

  private static final Schema<SiteSettings> SCHEMA = SourceTables.SITE;
  private static final String TABLE = SCHEMA.name();

  /** A row: a setting. */
  private record Setting(String key, Optional<String> value) {}

  /** What the table gave. */
  record Settings(DraftTable<SiteSettings> table, Optional<DraftRow<String>> pcc) {}

  /** The columns that the table really has. */
  private static final Schema<Setting> ROWS =
      Schema.<Setting>of(TABLE)
          .required(KEY, Formats.NAME, Setting::key)
          .optional(VALUE, Formats.TEXT, Setting::value)
          .build(c -> new Setting(c.text(KEY), c.optionalText(VALUE)));

  private final SurveyTable table;
  private final Remarks remarks;
  private final Map<String, DraftRow<Setting>> rows = new LinkedHashMap<>();
  private final List<String> missing = new ArrayList<>();

  private SettingsReader(SurveyTable table, Remarks remarks) {
    this.table = table;
    this.remarks = remarks;
  }

  static Settings read(SurveyTable table, Remarks remarks) {
    return new SettingsReader(table, remarks).read();
  }

  private Settings read() {
    int before = remarks.errors().size();
    if (!hasValues()) {
      return unreadable();
    }
    TableReader.read(ROWS, table, remarks).rows().forEach(this::take);
    boolean rowsSound = remarks.errors().size() == before;
    Map<String, Object> values = new HashMap<>();
    SCHEMA.columns().forEach(c -> readValue(c, values));
    if (rowsSound && !missing.isEmpty()) {
      reportMissing();
    }
    SiteSettings settings = SCHEMA.make().apply(new Cells(values));
    State state = remarks.errors().size() == before ? State.PRESENT : State.UNREADABLE;
    DraftRow<SiteSettings> row = new DraftRow<>(TABLE, 0, settings, Set.of(), column -> "");
    return new Settings(new DraftTable<>(TABLE, state, List.of(row)), pcc(settings));
  }

  private boolean hasValues() {
    boolean there = table.header().stream().map(Text::key).anyMatch(VALUE::equals);
    if (!there) {
      remarks.error(
          new SurveyError(
              TABLE, 1, VALUE, "", "The required column is missing. Row 1 must name it."));
    }
    return there;
  }

  private static Settings unreadable() {
    return new Settings(new DraftTable<>(TABLE, State.UNREADABLE, List.of()), Optional.empty());
  }

  private Optional<DraftRow<String>> pcc(SiteSettings settings) {
    return settings
        .pcc()
        .flatMap(
            pcc ->
                Optional.ofNullable(rows.get("pcc"))
                    .map(row -> new DraftRow<>(TABLE, row.row(), pcc, Set.of(), row.cells())));
  }

  private void take(DraftRow<Setting> row) {
    if (!row.sound(KEY, VALUE)) {
      return;
    }
    String key = Text.key(row.content().key());
    if (!SCHEMA.columnNames().contains(key)) {
      remarks.warning(
          TABLE,
          "key \"%s\" is not known and was left out.".formatted(key)
              + Closest.hint(key, SCHEMA.columnNames()));
    } else if (rows.containsKey(key)) {
      remarks.error(
          new SurveyError(
              TABLE,
              row.row(),
              KEY,
              row.cell(KEY),
              "The key stands in row %d already; keep one.".formatted(rows.get(key).row())));
    } else {
      rows.put(key, row);
    }
  }

  private void readValue(Column<SiteSettings> setting, Map<String, Object> values) {
    if (setting.required()) {
      values.put(setting.name(), setting.format().standIn());
    }
    DraftRow<Setting> row = rows.get(setting.name());
    if (row == null) {
      if (setting.required()) {
        missing.add(setting.name());
      }
      return;
    }
    try {
      readValue(setting, row, values);
    } catch (IllegalArgumentException e) {
      remarks.error(new SurveyError(TABLE, row.row(), VALUE, row.cell(VALUE), Text.message(e)));
    }
  }

  private void readValue(
      Column<SiteSettings> setting, DraftRow<Setting> row, Map<String, Object> values) {
    Optional<String> text = row.content().value();
    if (text.isPresent()) {
      values.put(setting.name(), setting.format().parse(text.get(), table.decimalComma()));
    } else if (setting.required()) {
      throw new IllegalArgumentException(
          "The cell is empty; the key %s is required.".formatted(setting.name()));
    }
  }

  private void reportMissing() {
    remarks.error(
        new SurveyError(
            TABLE,
            0,
            KEY,
            "",
            (missing.size() == 1 ? "The key %s is missing;" : "The keys %s are missing;")
                    .formatted(String.join(", ", missing))
                + " name, frequency_hz and practice are required."));
  }
}
