package fourthwire.web.api;

import com.fasterxml.jackson.annotation.JsonInclude;
import fourthwire.intake.reading.ReadingRefusedException;
import fourthwire.site.check.SurveyError;
import io.swagger.v3.oas.annotations.media.Schema;
import java.util.List;
import java.util.Optional;

/** A problem document (RFC 9457): what went wrong with a call. */
@Schema(description = "What went wrong, as in RFC 9457")
@JsonInclude(JsonInclude.Include.NON_ABSENT)
record Problem(
    @Schema(description = "Always about:blank: the status says the kind") String type,
    @Schema(description = "The status in words") String title,
    @Schema(description = "The HTTP status") int status,
    @Schema(description = "What is wrong and how to mend it") String detail,
    @Schema(description = "Of a refused survey: everything that is wrong, all at once")
        Optional<List<SurveyError>> errors,
    @Schema(description = "Of a refused reading: the columns or channels found in the file")
        Optional<List<String>> columns,
    @Schema(description = "Of a refused reading: what the mapping must say")
        Optional<List<ReadingRefusedException.Question>> questions,
    @Schema(description = "Of an unforeseen error: the number it has in the log")
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
