package fourthwire.web.api;

import com.fasterxml.jackson.annotation.JsonInclude;
import fourthwire.intake.reading.ReadingRefusedException;
import fourthwire.site.check.SurveyError;
import java.util.List;
import java.util.Optional;

/** A problem document (RFC 9457): what went wrong with a call. */
@JsonInclude(JsonInclude.Include.NON_ABSENT)
record Problem(
    String type,
    String title,
    int status,
    String detail,
    Optional<List<SurveyError>> errors,
    Optional<List<String>> columns,
    Optional<List<ReadingRefusedException.Question>> questions,
    Optional<String> reference) {
  /** Its media type. */
  static final String MEDIA_TYPE = "application/problem+json";

  static Problem of(int status, String title, String detail) {
    return new Problem(
        "about:blank",
        title,
        status,
        detail,
        Optional.empty(),
        Optional.empty(),
        Optional.empty(),
        Optional.empty());
  }

  Problem withErrors(List<SurveyError> all) {
    return new Problem(
        type, title, status, detail, Optional.of(all), columns, questions, reference);
  }

  Problem withQuestions(List<String> found, List<ReadingRefusedException.Question> asked) {
    return new Problem(
        type, title, status, detail, errors, Optional.of(found), Optional.of(asked), reference);
  }

  Problem withReference(String number) {
    return new Problem(
        type, title, status, detail, errors, columns, questions, Optional.of(number));
  }
}
