package fourthwire.web.api;

import fourthwire.site.check.SurveyError;
import java.util.List;

/** A survey is refused with everything that is wrong with it. */
final class SurveyRefusedException extends RuntimeException {
  private static final long serialVersionUID = 1L;

  private final transient List<SurveyError> errors;

  SurveyRefusedException(List<SurveyError> errors) {
    super(
        errors.size() == 1
            ? "the survey has an error; nothing was stored"
            : "the survey has " + errors.size() + " errors; nothing was stored");
    this.errors = List.copyOf(errors);
  }

  List<SurveyError> errors() {
    return errors;
  }
}
