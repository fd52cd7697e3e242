package fourthwire.web.api;

import static org.assertj.core.api.Assertions.assertThat;

import fourthwire.testsupport.Http;
import fourthwire.testsupport.Http.Answer;
import fourthwire.testsupport.Http.Part;
import fourthwire.testsupport.ServiceTest;
import fourthwire.testsupport.SmallSite;
import java.net.URLEncoder;
import java.nio.charset.StandardCharsets;
import org.junit.jupiter.api.Test;
import tools.jackson.databind.JsonNode;

/** Audits and nodes over HTTP. */
class AuditApiTest extends ServiceTest {
  @Test
  void anAuditIsQueuedRunsAndAnswersItsNodes() {
    Http http = http();
    long site = site(http);

    Answer asked = http.post("/api/v1/sites/" + site + "/audits");

    assertThat(asked.status()).isEqualTo(202);
    long id = asked.json().path("id").asLong();
    assertThat(asked.header("Location")).isEqualTo("/api/v1/audits/" + id);
    JsonNode state = http.ended("/api/v1/audits/" + id);
    assertThat(state.path("state").asString()).as(state.toString()).isEqualTo("done");
    assertThat(state.path("progress").asDouble()).isEqualTo(1);
    assertThat(state.path("engine_version").asString()).isNotBlank();
    assertThat(http.get("/api/v1/sites/" + site + "/audits").json().path(0)).isEqualTo(state);
    checkNodes(http, id);
  }

  private static void checkNodes(Http http, long id) {
    JsonNode nodes = http.get("/api/v1/audits/" + id + "/nodes").json();
    assertThat(nodes).hasSize(4);
    for (JsonNode row : nodes) {
      assertThat(row.propertyNames())
          .contains(
              "node",
              "kind",
              "findings",
              "N.rms_a",
              "N.loading_percent",
              "thd_percent",
              "tdd_percent",
              "voltage_thd_percent",
              "transformer_loading_percent",
              "harmonic_loss_factor",
              "active_w",
              "power_factor",
              "losses_w");
      String name = row.path("node").asString();
      Answer node = http.get("/api/v1/audits/" + id + "/nodes/" + encoded(name));
      assertThat(node.status()).as(name).isEqualTo(200);
      assertThat(node.json().path("node").asString()).isEqualTo(name);
    }
    JsonNode heater = http.get("/api/v1/audits/" + id + "/nodes/LP-1:heat").json();
    // Ohm's law: 3 kW at 230.9 V on three lines takes 4.33 A of each
    assertThat(heater.at("/design/current/L1/rms_a").asDouble()).isBetween(4.31, 4.35);
    ProblemShape.check(http.get("/api/v1/audits/" + id + "/nodes/nowhere"), 404);
  }

  private static String encoded(String name) {
    return URLEncoder.encode(name, StandardCharsets.UTF_8).replace("+", "%20");
  }

  @Test
  void anAuditRunsOnTheSupplyThatIsNamed() {
    Http http = http();
    long site = site(http);
    String audits = "/api/v1/sites/" + site + "/audits";

    JsonNode queued = http.postJson(audits, "{\"supply\":\"SET\",\"draws\":0}").json();
    long id = queued.path("id").asLong();
    assertThat(http.ended("/api/v1/audits/" + id).path("state").asString()).isEqualTo("done");
    JsonNode node = http.get("/api/v1/audits/" + id + "/nodes/LP-1").json();
    assertThat(node.path("supply").asString()).isEqualTo("SET");

    Answer refused = http.postJson(audits, "{\"supply\":\"SUN\"}");
    ProblemShape.check(refused, 422);
    assertThat(refused.json().path("detail").asString()).contains("SUN", "GRID", "SET");
    for (String draws : new String[] {"-1", "1.5", "10001", "1e400", "1e999999999"}) {
      Answer answer = http.postJson(audits, "{\"draws\":" + draws + "}");
      ProblemShape.check(answer, 422);
      assertThat(answer.json().path("detail").asString()).as(draws).contains("0 to 10000");
    }
    ProblemShape.check(http.postJson(audits, "{\"supply\":"), 400);
    ProblemShape.check(http.postJson(audits, "{\"draws\":\"many\"}"), 400);
    assertThat(http.postJson(audits, "{}").status()).isEqualTo(202);
  }

  @Test
  void whatIsNotThereIsAProblem() {
    Http http = http();
    for (String path :
        new String[] {
          "/api/v1/audits/999",
          "/api/v1/audits/x",
          "/api/v1/audits/999/nodes",
          "/api/v1/audits/999/nodes/LP-1",
          "/api/v1/sites/999/audits",
          "/api/v1/audits/999/nodes/",
          "/api/v1/audits/99999999999999999999"
        }) {
      ProblemShape.check(http.get(path), 404);
    }
    ProblemShape.check(http.post("/api/v1/sites/999/audits"), 404);
    ProblemShape.check(http.post("/api/v1/audits/999/cancel"), 404);
    ProblemShape.check(http.delete("/api/v1/audits/999"), 405);
  }

  @Test
  void cancellingAnAuditThatHasEndedChangesNothing() {
    Http http = http();
    long id = http.post("/api/v1/sites/" + site(http) + "/audits").json().path("id").asLong();
    JsonNode ended = http.ended("/api/v1/audits/" + id);
    Answer cancelled = http.post("/api/v1/audits/" + id + "/cancel");
    assertThat(cancelled.status()).isEqualTo(200);
    assertThat(cancelled.json()).isEqualTo(ended);
  }

  private static long site(Http http) {
    Part survey = new Part("survey", "survey.zip", SmallSite.zip("Works"));
    return http.form("POST", "/api/v1/sites", survey).json().path("id").asLong();
  }
}
