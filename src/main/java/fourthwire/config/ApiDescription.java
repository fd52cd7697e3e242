package fourthwire.config;

import io.swagger.v3.oas.models.OpenAPI;
import io.swagger.v3.oas.models.Operation;
import io.swagger.v3.oas.models.PathItem;
import io.swagger.v3.oas.models.info.Info;
import io.swagger.v3.oas.models.media.Content;
import io.swagger.v3.oas.models.media.MediaType;
import io.swagger.v3.oas.models.media.Schema;
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
    return api ->
        api.getPaths()
            .forEach(
                (path, item) ->
                    item.readOperationsMap()
                        .forEach((method, operation) -> describe(path, method, operation)));
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
