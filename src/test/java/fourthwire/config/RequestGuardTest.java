package fourthwire.config;

import static org.assertj.core.api.Assertions.assertThat;

import fourthwire.testsupport.Http;
import fourthwire.testsupport.ServiceTest;
import java.io.IOException;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** A script passes, a foreign page does not. */
class RequestGuardTest extends ServiceTest {
  private static final String SITES = "/api/v1/sites";

  @Test
  void aScriptNeedsNoToken() {
    assertThat(http().get(SITES).status()).isEqualTo(200);
    assertThat(http().post(SITES + "/999/audits").status()).as("let through").isEqualTo(404);
  }

  @ParameterizedTest
  @ValueSource(
      strings = {"localhost", "localhost:8080", "127.0.0.1", "[::1]:8080", "AUDIT.example.org:443"})
  void itsOwnNamesAreLetThrough(String host) throws IOException {
    assertThat(asked(host)).startsWith("HTTP/1.1 200");
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "evil.example.com",
        "localhost.evil.example.com",
        "127.0.0.1.evil.example.com:8080",
        "192.0.2.7",
        "example.org"
      })
  void aForeignHostNameIsRefused(String host) throws IOException {
    assertThat(asked(host)).startsWith("HTTP/1.1 403").contains("application/problem+json");
  }

  private String asked(String host) throws IOException {
    return http().raw("GET " + SITES + " HTTP/1.1", "Host: " + host, "Connection: close");
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "https://evil.example.com",
        "null",
        "http://localhost:1",
        "http://localhost",
        "http://localhost@evil.example.com",
        "not an origin"
      })
  void aForeignOriginIsRefused(String origin) {
    Http http = http();
    assertThat(http.get(SITES, "Origin", origin).status()).isEqualTo(403);
    Http.Answer answer = http.post(SITES + "/1/audits", "Origin", origin);
    assertThat(answer.status()).isEqualTo(403);
    assertThat(answer.type()).startsWith("application/problem+json");
    assertThat(answer.header("Access-Control-Allow-Origin")).isEmpty();
  }

  @ParameterizedTest
  @CsvSource({
    "same-origin, cors, empty, 200",
    "none, navigate, document, 200",
    "cross-site, navigate, document, 200",
    "cross-site, no-cors, image, 403",
    "cross-site, cors, empty, 403",
    "same-site, cors, empty, 403",
    "cross-site, navigate, iframe, 403"
  })
  void whatABrowserMarksAsAnotherSitesIsALinkOrRefused(
      String site, String mode, String destination, int status) {
    Http.Answer answer =
        http()
            .get(
                SITES,
                "Sec-Fetch-Site",
                site,
                "Sec-Fetch-Mode",
                mode,
                "Sec-Fetch-Dest",
                destination);
    assertThat(answer.status()).isEqualTo(status);
  }

  @Test
  void aFormSentByAnotherSiteIsRefused() {
    Http.Answer answer =
        http()
            .post(
                SITES + "/1/audits",
                "Sec-Fetch-Site",
                "cross-site",
                "Sec-Fetch-Mode",
                "navigate",
                "Sec-Fetch-Dest",
                "document");
    assertThat(answer.status()).isEqualTo(403);
  }

  @Test
  void everyAnswerCarriesTheHeadersThatKeepBrowsersCareful() {
    Http.Answer answer = http().get(SITES);
    assertThat(answer.header("Content-Security-Policy"))
        .contains("default-src 'self'", "frame-ancestors 'none'")
        .doesNotContain("unsafe");
    assertThat(answer.header("X-Content-Type-Options")).isEqualTo("nosniff");
    assertThat(answer.header("X-Frame-Options")).isEqualTo("DENY");
    assertThat(answer.header("Referrer-Policy")).isEqualTo("same-origin");
    assertThat(answer.header("Set-Cookie")).isEmpty();
  }

  @Test
  void whatIsNotHttpIsAProblemToo() throws IOException {
    assertThat(http().raw("GET /api/v1/sites?x=%zz<> HTTP/1.1", "Host: localhost"))
        .startsWith("HTTP/1.1 400")
        .contains("application/problem+json")
        .doesNotContain("<html");
    assertThat(
            http().raw("GET /api/v1/..%2f..%00/x HTTP/1.1", "Host: localhost", "Connection: close"))
        .startsWith("HTTP/1.1 400")
        .doesNotContain("<html");
  }

  @Test
  void errorsBeforeAControllerAreProblemsInUtf8() throws IOException {
    for (String first : new String[] {"TRACE /api/v1/sites", "GET /actuator/nothing"}) {
      assertThat(http().raw(first + " HTTP/1.1", "Host: localhost", "Connection: close"))
          .as(first)
          .containsIgnoringCase("content-type: application/problem+json;charset=utf-8")
          .contains("\"type\":\"about:blank\"")
          .contains("\"detail\":");
    }
    assertThat(asked("evil.example.com"))
        .containsIgnoringCase("content-type: application/problem+json;charset=utf-8");
  }

  @Test
  void itSaysWhenItIsReady() {
    assertThat(http().get("/actuator/health").json().path("status").asString()).isEqualTo("UP");
    assertThat(http().get("/actuator/env").status()).isEqualTo(404);
  }
}
