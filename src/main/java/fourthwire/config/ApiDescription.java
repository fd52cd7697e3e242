package fourthwire.config;

import io.swagger.v3.oas.models.OpenAPI;
import io.swagger.v3.oas.models.Operation;
import io.swagger.v3.oas.models.PathItem;
import io.swagger.v3.oas.models.info.Info;
import io.swagger.v3.oas.models.media.ArraySchema;
import io.swagger.v3.oas.models.media.Content;
import io.swagger.v3.oas.models.media.IntegerSchema;
import io.swagger.v3.oas.models.media.MediaType;
import io.swagger.v3.oas.models.media.ObjectSchema;
import io.swagger.v3.oas.models.media.Schema;
import io.swagger.v3.oas.models.media.StringSchema;
import io.swagger.v3.oas.models.responses.ApiResponse;
import java.util.LinkedHashMap;
import java.util.Map;
import org.springdoc.core.customizers.OpenApiCustomizer;
import org.springframework.context.annotation.Bean;
import org.springframework.context.annotation.Configuration;

/** The description of the HTTP interface (OpenAPI): its heading, and the errors of every call. */
@Configuration(proxyBeanMethods = false)
class ApiDescription {
  private static final String PROBLEM = "application/problem+json";

  @Bean
  OpenAPI description() {
    return new OpenAPI()
        .info(
            new Info()
                .title("Fourthwire")
                .version("1")
                .description(
                    "Power-quality audits of facilities. Conductors are L1, L2, L3, N; amps and"
                        + " volts are rms, angles degrees. A figure that can't be computed is null"
                        + " and beside it stands <name>_reason. Errors are problem documents (RFC"
                        + " 9457). On the loopback address a script needs no token."));
  }

  @Bean
  OpenApiCustomizer errorsOfEveryCall() {
    return api -> {
      api.getPaths()
          .forEach(
              (path, item) ->
                  item.readOperationsMap()
                      .forEach((method, operation) -> describe(path, method, operation)));
      api.getComponents().addSchemas("Problem", problem()).addSchemas("ObjectNode", document());
    };
  }

  /** Documents are written by hand, so their shape is not found from a Java type. */
  private static Schema<?> document() {
    return new ObjectSchema()
        .additionalProperties(true)
        .description(
            "A document of the interface: a node's result, a row of the list of nodes, a reading");
  }

  private static Schema<?> problem() {
    return new ObjectSchema()
        .description("What went wrong, as in RFC 9457")
        .addProperty("type", text("Always about:blank: the status says the kind"))
        .addProperty("title", text("The status in words"))
        .addProperty("status", new IntegerSchema().description("The HTTP status"))
        .addProperty("detail", text("What is wrong and how to mend it"))
        .addProperty(
            "errors", list("Of a refused survey: everything that is wrong with it", surveyError()))
        .addProperty(
            "columns", list("Of a refused reading: columns or channels found", text("A header")))
        .addProperty(
            "questions",
            list(
                "Of a refused reading: what the mapping must say",
                new ObjectSchema()
                    .addProperty("part", text("Part of the mapping"))
                    .addProperty("message", text("What is wrong with it and what is accepted"))))
        .addProperty("reference", text("Of an unforeseen error: its number in the log"));
  }

  private static Schema<?> surveyError() {
    return new ObjectSchema()
        .addProperty("table", text("The table; empty for an error of the whole file"))
        .addProperty(
            "row",
            new IntegerSchema()
                .description("As a spreadsheet shows it, the header being 1; 0: the whole table"))
        .addProperty("column", text("The column; empty where it is no single one"))
        .addProperty("value", text("The cell as read"))
        .addProperty("message", text("What is wrong and what is accepted"));
  }

  private static Schema<?> text(String description) {
    return new StringSchema().description(description);
  }

  private static Schema<?> list(String description, Schema<?> item) {
    return new ArraySchema().items(item).description(description);
  }

  private static void describe(String path, PathItem.HttpMethod method, Operation operation) {
    Map<String, String> errors = new LinkedHashMap<>();
    errors.put("403", "Sent by a page of another origin, or to a host name that is not allowed");
    errors.put("406", "Accept asks for what this call does not answer");
    if (path.contains("{")) {
      errors.put("404", "What the address names is not there");
    }
    if (path.contains("/nodes")) {
      errors.put("409", "The audit has no results: it is not done");
    }
    if (operation.getRequestBody() != null) {
      errors.put("400", "The body is malformed, or a part of the form is missing");
      errors.put("413", "The upload is larger than the cap, which the answer names");
      errors.put("415", "The body's Content-Type is not taken here");
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
