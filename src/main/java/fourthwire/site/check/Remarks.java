package fourthwire.site.check;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.stream.Collectors;

/**
 * Gathers errors and warnings. Errors that have one cause are gathered under it and reported once,
 * at the first of their rows, naming the others.
 */
final class Remarks {
  /** Begins the cause of a table that is not there; its name follows. */
  static final String MISSING_TABLE = "table ";

  private static final int PLACES_NAMED = 10;

  private final List<SurveyError> errors = new ArrayList<>();
  private final List<String> warnings = new ArrayList<>();
  private final Map<String, List<Placed>> byCause = new LinkedHashMap<>();

  private record Placed(DraftRow<?> row, SurveyError error) {}

  void error(DraftRow<?> row, String column, String message) {
    errors.add(row.error(column, message));
  }

  void error(SurveyError error) {
    errors.add(error);
  }

  /** An error that is one with every other of the same cause. */
  void error(String cause, DraftRow<?> row, String column, String message) {
    byCause
        .computeIfAbsent(cause, c -> new ArrayList<>())
        .add(new Placed(row, row.error(column, message)));
  }

  private boolean has(String cause) {
    return byCause.containsKey(cause);
  }

  /** An error of a whole table that is not there, one with every other row that needs it. */
  void missingTable(String table, DraftRow<?> row, String column, String hint) {
    error(MISSING_TABLE + table, row, column, hint);
  }

  /** Whether a table was reported as missing. */
  boolean isMissingTable(String table) {
    return has(MISSING_TABLE + table);
  }

  void warning(String warning) {
    warnings.add(warning);
  }

  void warning(DraftRow<?> row, String message) {
    warnings.add(row.place() + ": " + message);
  }

  List<SurveyError> errors() {
    List<SurveyError> all = new ArrayList<>(errors);
    byCause.forEach(
        (cause, placed) ->
            all.add(
                cause.startsWith(MISSING_TABLE)
                    ? missing(cause.substring(MISSING_TABLE.length()), placed)
                    : together(placed)));
    return all;
  }

  List<String> warnings() {
    return List.copyOf(warnings);
  }

  private static SurveyError missing(String table, List<Placed> placed) {
    String rows =
        placed.stream()
            .limit(PLACES_NAMED)
            .map(p -> "%s (\"%s\")".formatted(p.row.place(), p.error.value()))
            .distinct()
            .collect(Collectors.joining(", "));
    String more =
        placed.size() > PLACES_NAMED ? " and %d more".formatted(placed.size() - PLACES_NAMED) : "";
    return SurveyError.ofTable(
        table,
        "The table is missing, and it is needed by "
            + rows
            + more
            + "."
            + placed.get(0).error.message());
  }

  private static SurveyError together(List<Placed> placed) {
    SurveyError first = placed.get(0).error;
    if (placed.size() == 1) {
      return first;
    }
    String others =
        placed.stream()
            .skip(1)
            .limit(PLACES_NAMED)
            .map(p -> p.row.place())
            .distinct()
            .collect(Collectors.joining(", "));
    String more =
        placed.size() - 1 > PLACES_NAMED
            ? " and %d more".formatted(placed.size() - 1 - PLACES_NAMED)
            : "";
    return new SurveyError(
        first.table(),
        first.row(),
        first.column(),
        first.value(),
        first.message() + " The same holds for " + others + more + ".");
  }
}
