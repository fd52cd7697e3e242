package fourthwire.web;

import static org.assertj.core.api.Assertions.assertThat;

import fourthwire.testsupport.Http.Answer;
import fourthwire.testsupport.ServiceTest;
import java.nio.charset.StandardCharsets;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Whatever fails, a person gets a page with a reference number and nothing of the cause. */
class FailureTest extends ServiceTest {
  @ParameterizedTest
  @ValueSource(strings = {"/failing/template", "/failing/controller"})
  void aFailureIsAPageWithAReferenceAndWithoutItsCause(String path) {
    Answer answer = http().get(path, "Accept", "text/html");
    assertThat(answer.status()).isEqualTo(500);
    assertThat(text(answer))
        .contains("<h1>This page could not be made</h1>", "before the resonance check")
        .containsPattern("Reference number [0-9A-F]{8}\\.")
        .doesNotContain(FailingPages.SECRET, "Exception", "no/such/template", "at fourthwire");
  }

  @Test
  void aScriptIsToldTheReferenceAndNothingOfTheCause() {
    Answer answer = http().get("/failing/controller", "Accept", "application/json");
    assertThat(answer.status()).isEqualTo(500);
    assertThat(text(answer))
        .containsPattern("\"reference\":\"[0-9A-F]{8}\"")
        .doesNotContain(FailingPages.SECRET, "Exception");
  }

  private static String text(Answer answer) {
    return new String(answer.response().body(), StandardCharsets.UTF_8);
  }
}
