package fourthwire.web.api;

import static org.assertj.core.api.Assertions.assertThat;

import fourthwire.testsupport.ServiceTest;
import java.util.Set;
import java.util.TreeSet;
import org.junit.jupiter.api.Test;
import tools.jackson.databind.JsonNode;

/**
 * The description tells of every call of the public contract, section 5, of a log's series, and of
 * no other.
 */
class ApiDescriptionTest extends ServiceTest {
  private static final Set<String> CONTRACT =
      Set.of(
          "post /api/v1/sites",
          "get /api/v1/sites",
          "delete /api/v1/sites/{site}",
          "put /api/v1/sites/{site}/survey",
          "get /api/v1/sites/{site}/survey",
          "post /api/v1/sites/{site}/readings",
          "get /api/v1/sites/{site}/readings",
          "get /api/v1/readings/{reading}",
          "delete /api/v1/readings/{reading}",
          "get /api/v1/readings/{reading}/corrections",
          "post /api/v1/readings/{reading}/corrections",
          "delete /api/v1/readings/{reading}/corrections/{correction}",
          "get /api/v1/readings/{reading}/limits",
          "get /api/v1/readings/{reading}/series",
          "get /api/v1/readings/{reading}/weeks",
          "get /api/v1/readings/{reading}/coverage",
          "get /api/v1/jobs/{job}",
          "post /api/v1/jobs/{job}/cancel",
          "post /api/v1/sites/{site}/audits",
          "get /api/v1/sites/{site}/audits",
          "get /api/v1/audits/{audit}",
          "post /api/v1/audits/{audit}/cancel",
          "get /api/v1/audits/{audit}/nodes",
          "get /api/v1/audits/{audit}/nodes/{node}");

  @Test
  void everyCallIsDescribedInWordsWithItsErrors() {
    JsonNode api = http().get("/api/v1/openapi.json").json();

    Set<String> described = new TreeSet<>();
    api.path("paths")
        .properties()
        .forEach(
            path ->
                path.getValue()
                    .properties()
                    .forEach(
                        call ->
                            described.add(check(path.getKey(), call.getKey(), call.getValue()))));

    assertThat(described).isEqualTo(new TreeSet<>(CONTRACT));
    assertThat(api.at("/components/schemas/Problem/properties").propertyNames())
        .contains("type", "title", "status", "detail", "errors");
  }

  private static String check(String path, String method, JsonNode call) {
    assertThat(call.path("summary").asString()).as(path).isNotBlank();
    call.path("responses")
        .properties()
        .forEach(
            response -> {
              assertThat(response.getValue().path("description").asString()).isNotBlank();
              if (response.getKey().compareTo("400") >= 0) {
                assertThat(response.getValue().path("content").propertyNames())
                    .as(path + " " + response.getKey())
                    .containsExactly("application/problem+json");
              }
            });
    assertThat(call.path("responses").propertyNames()).contains("403", "500");
    return method + " " + path;
  }
}
