package fourthwire.intake.survey;

import fourthwire.site.Survey;
import fourthwire.site.check.PresetKinds;
import fourthwire.site.check.SurveyChecks;
import fourthwire.site.check.SurveyDraft;
import fourthwire.site.check.SurveyError;
import java.io.IOException;
import java.io.InputStream;
import java.util.Comparator;
import java.util.List;
import java.util.stream.Stream;

/**
 * Reads a survey file: a zip of CSV files or an xlsx workbook, told apart by what they hold. Either
 * the whole survey is accepted, perhaps with warnings, or all that is wrong with it is reported at
 * once; there is nothing between.
 */
public final class SurveyImport {
  private static final int MOST_ERRORS = 1000;
  private static final int MOST_WARNINGS = 1000;

  private static final PresetKinds PRESETS = new LoadPresets();

  private SurveyImport() {}

  /** What became of a file. */
  public sealed interface Outcome {}

  /** The file is a survey. */
  public record Read(Survey survey, List<String> warnings) implements Outcome {}

  /** The file is refused. */
  public record Refused(List<SurveyError> errors) implements Outcome {}

  /** Reads a survey from a stream, of which it takes no more than the largest survey has. */
  public static Outcome read(InputStream stream) throws IOException {
    return read(stream.readNBytes((int) Guards.MOST_BYTES + 1));
  }

  /** Reads a survey from a file's bytes. */
  public static Outcome read(byte[] bytes) {
    Remarks remarks = new Remarks();
    try {
      return read(SurveyFile.read(bytes, remarks), remarks);
    } catch (RefusedException e) {
      return new Refused(List.of(e.error()));
    }
  }

  /** Reads a survey from tables, as when they were edited on a page. */
  public static Outcome read(List<SurveyTable> tables) {
    Remarks remarks = new Remarks();
    return read(SurveyFile.of(tables, remarks), remarks);
  }

  private static Outcome read(SurveyFile file, Remarks remarks) {
    SurveyDraft draft = DraftReader.read(file, remarks);
    SurveyChecks.Result checked = SurveyChecks.check(draft, PRESETS);
    remarks.errors(checked.errors());
    remarks.warnings(checked.warnings());
    if (!remarks.errors().isEmpty()) {
      return new Refused(inOrder(remarks.errors()));
    }
    return new Read(checked.survey().orElseThrow(), capped(remarks.warnings()));
  }

  private static List<SurveyError> inOrder(List<SurveyError> errors) {
    List<String> tables = Schemas.tables();
    List<SurveyError> sorted =
        errors.stream()
            .sorted(
                Comparator.comparingInt((SurveyError e) -> tables.indexOf(e.table()))
                    .thenComparingInt(SurveyError::row))
            .toList();
    if (sorted.size() <= MOST_ERRORS) {
      return sorted;
    }
    SurveyError rest =
        SurveyError.ofFile(
            "There are %d further errors; mend these first."
                .formatted(sorted.size() - MOST_ERRORS));
    return Stream.concat(sorted.stream().limit(MOST_ERRORS), Stream.of(rest)).toList();
  }

  private static List<String> capped(List<String> warnings) {
    if (warnings.size() <= MOST_WARNINGS) {
      return List.copyOf(warnings);
    }
    String rest = "There are %d further warnings.".formatted(warnings.size() - MOST_WARNINGS);
    return Stream.concat(warnings.stream().limit(MOST_WARNINGS), Stream.of(rest)).toList();
  }
}
