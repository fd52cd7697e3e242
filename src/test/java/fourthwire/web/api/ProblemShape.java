package fourthwire.web.api;

import static org.assertj.core.api.Assertions.assertThat;

import fourthwire.testsupport.Http.Answer;
import java.nio.charset.StandardCharsets;
import tools.jackson.databind.JsonNode;

/** What every error must look like: RFC 9457, section 3. */
final class ProblemShape {
  private ProblemShape() {}

  static void check(Answer answer, int status) {
    String body = new String(answer.response().body(), StandardCharsets.UTF_8);
    assertThat(answer.status()).as(body).isEqualTo(status);
    assertThat(answer.type()).startsWith("application/problem+json");
    JsonNode problem = answer.json();
    assertThat(problem.path("type").asString()).isEqualTo("about:blank");
    assertThat(problem.path("status").asInt()).isEqualTo(status);
    assertThat(problem.path("title").asString()).isNotBlank();
    assertThat(problem.path("detail").asString()).isNotBlank();
    assertThat(body).doesNotContain("Exception", "\tat ", "<html", ".java");
  }
}
