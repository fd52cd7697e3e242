package fourthwire.intake.survey;

import fourthwire.site.check.SurveyError;
import java.util.ArrayList;
import java.util.List;

/** Gathers what is to be said about a survey file. */
final class Remarks {
  private final List<SurveyError> errors = new ArrayList<>();
  private final List<String> warnings = new ArrayList<>();

  void error(SurveyError error) {
    errors.add(error);
  }

  void errors(List<SurveyError> more) {
    errors.addAll(more);
  }

  void warning(String warning) {
    warnings.add(warning);
  }

  void warning(String table, String warning) {
    warnings.add(table + ": " + warning);
  }

  void warnings(List<String> more) {
    warnings.addAll(more);
  }

  List<SurveyError> errors() {
    return errors;
  }

  List<String> warnings() {
    return warnings;
  }
}
