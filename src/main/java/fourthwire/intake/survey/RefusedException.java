package fourthwire.intake.survey;

import fourthwire.site.check.SurveyError;

/** Ends the reading of a file or of one table with the error that says why. */
final class RefusedException extends Exception {
  private static final long serialVersionUID = 1L;

  private final transient SurveyError error;

  RefusedException(SurveyError error) {
    super(error.message());
    this.error = error;
  }

  SurveyError error() {
    return error;
  }
}
