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

  /** Whether an error of this cause was reported. */
  boolean has(String cause) {
    return byCause.containsKey(cause);
  }

  void warning(DraftRow<?> row, String message) {
    warnings.add(row.place() + ": " + message);
  }

  List<SurveyError> errors() {
    List<SurveyError> all = new ArrayList<>(errors);
    byCause.values().forEach(placed -> all.add(together(placed)));
    return all;
  }

  List<String> warnings() {
    return List.copyOf(warnings);
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
