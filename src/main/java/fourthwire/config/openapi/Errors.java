package fourthwire.config.openapi;

import io.swagger.v3.oas.models.Operation;
import io.swagger.v3.oas.models.media.Content;
import io.swagger.v3.oas.models.media.MediaType;
import io.swagger.v3.oas.models.media.Schema;
import io.swagger.v3.oas.models.responses.ApiResponse;
import java.util.LinkedHashMap;
import java.util.Map;

/** The problem document, and which errors each call can answer. */
final class Errors {
  private static final String PROBLEM = "application/problem+json";

  private Errors() {}

  static Schema<?> problem() {
    return Shape.of("What went wrong, as in RFC 9457")
        .text("type", "Always about:blank: the status says the kind")
        .text("title", "The status in words")
        .whole("status", "The HTTP status")
        .text("detail", "What is wrong and how to mend it")
        .optional(
            "errors",
            Shape.listOf("Of a refused survey: everything that is wrong with it", surveyError()))
        .optional(
            "columns",
            Shape.listOf("Of a refused reading: columns or channels found", Shape.text("A header")))
        .optional(
            "questions",
            Shape.listOf("Of a refused reading: what the mapping must say", question()))
        .optional("reference", Shape.text("Of an unforeseen error: its number in the log"))
        .schema();
  }

  private static Schema<?> question() {
    return Shape.of("A question")
        .text("part", "Part of the mapping")
        .text("message", "What is wrong with it and what is accepted")
        .schema();
  }

  private static Schema<?> surveyError() {
    return Shape.of("An error")
        .text("table", "The table; empty for an error of the whole file")
        .whole("row", "As a spreadsheet shows it, the header being 1; 0: the whole table")
        .text("column", "The column; empty where it is no single one")
        .text("value", "The cell as read")
        .text("message", "What is wrong and what is accepted")
        .schema();
  }

  static void describe(String path, Operation operation) {
    Map<String, String> errors = new LinkedHashMap<>();
    boolean body = operation.getRequestBody() != null;
    if (body) {
      errors.put("400", "The body is malformed, or a part of the form is missing");
    } else if (path.endsWith("/series") || path.endsWith("/weeks")) {
      errors.put("400", "A parameter is missing or can't be read; the answer says which");
    }
    errors.put("403", "Sent by a page of another origin, or to a host name that is not allowed");
    if (path.contains("{")) {
      errors.put("404", "What the address names is not there");
    }
    errors.put("406", "Accept asks for what this call does not answer");
    if (path.contains("/nodes")) {
      errors.put("409", "The audit has no results: it is not done");
    }
    if (body && operation.getRequestBody().getContent().containsKey(Forms.MULTIPART)) {
      errors.put("413", "The upload is larger than the cap, which the answer names");
    }
    if (body) {
      errors.put("415", "The body's Content-Type is not taken here; Accept names what is");
    }
    if (body || path.endsWith("/survey")) {
      errors.put("422", "Read but refused, with every reason at once; nothing was stored");
    }
    errors.put("500", "An unforeseen error, with the reference it has in the log");
    errors.forEach(
        (status, words) -> operation.getResponses().addApiResponse(status, error(words)));
  }

  private static ApiResponse error(String words) {
    return new ApiResponse()
        .description(words)
        .content(
            new Content()
                .addMediaType(
                    PROBLEM,
                    new MediaType().schema(new Schema<>().$ref("#/components/schemas/Problem"))));
  }
}
