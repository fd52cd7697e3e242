package fourthwire.intake.survey;

import fourthwire.site.Survey;
import fourthwire.site.check.SpectrumRow;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.function.Function;
import java.util.stream.Collectors;

/** All tables of the contract in its order, and where a survey keeps the rows of each. */
final class Schemas {
  /** A schema and the records of a survey that are its rows. */
  record Rows<R>(Schema<R> schema, Function<Survey, List<R>> of) {}

  /** Every table but that of the site. */
  static final List<Rows<?>> ALL =
      List.of(
          new Rows<>(SourceTables.SUPPLIES, Survey::supplies),
          new Rows<>(SourceTables.BACKGROUND, Survey::background),
          new Rows<>(SourceTables.TRANSFORMERS, Survey::transformers),
          new Rows<>(DistributionTables.PANELS, Survey::panels),
          new Rows<>(DistributionTables.CIRCUITS, Survey::circuits),
          new Rows<>(LoadTables.LOADS, Survey::loads),
          new Rows<>(LoadTables.SPECTRA, Schemas::spectrumRows),
          new Rows<>(LoadTables.SCHEDULES, Survey::schedules),
          new Rows<>(DistributionTables.CAPACITORS, Survey::capacitors),
          new Rows<>(DistributionTables.FILTERS, Survey::filters),
          new Rows<>(DistributionTables.METERS, Survey::meters),
          new Rows<>(DistributionTables.SPOT_READINGS, Survey::spotReadings));

  private static final Map<String, Set<String>> COLUMNS = columns();

  private Schemas() {}

  /** The tables' names in the contract's order. */
  static List<String> tables() {
    List<String> names = new ArrayList<>(List.of(SourceTables.SITE.name()));
    ALL.forEach(t -> names.add(t.schema().name()));
    return names;
  }

  /** Whether the contract has this table. */
  static boolean has(String table) {
    return COLUMNS.containsKey(table);
  }

  /** The columns that a table may have. */
  static Set<String> columns(String table) {
    return COLUMNS.getOrDefault(table, Set.of());
  }

  private static Map<String, Set<String>> columns() {
    Map<String, Set<String>> columns =
        ALL.stream()
            .collect(
                Collectors.toMap(
                    t -> t.schema().name(), t -> Set.copyOf(t.schema().columnNames())));
    columns.put(SourceTables.SITE.name(), Set.of(SettingsReader.KEY, SettingsReader.VALUE));
    return columns;
  }

  private static List<SpectrumRow> spectrumRows(Survey survey) {
    return survey.spectra().stream()
        .flatMap(s -> s.rows().stream().map(r -> new SpectrumRow(s.name(), r)))
        .toList();
  }
}
