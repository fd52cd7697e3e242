package fourthwire.web.api;

import static org.assertj.core.api.Assertions.assertThat;

import fourthwire.testsupport.Http;
import fourthwire.testsupport.Http.Answer;
import fourthwire.testsupport.Http.Part;
import fourthwire.testsupport.ServiceTest;
import fourthwire.testsupport.SmallSite;
import java.nio.charset.StandardCharsets;
import java.time.LocalDateTime;
import java.util.Locale;
import org.junit.jupiter.api.Test;
import tools.jackson.databind.JsonNode;

/** What a log's findings offer is corrected and taken back, by script and by the page's buttons. */
class CorrectionApiTest extends ServiceTest {
  private static final double WATTS = 230 * 10 * 0.95;

  /** Two days of ten-minute rows of one line, its clamp the wrong way round in the second. */
  private static byte[] log() {
    StringBuilder csv = new StringBuilder("Time,L1.rms_a,L1.rms_v,L1.active_w,L1.power_factor\n");
    LocalDateTime at = LocalDateTime.of(2026, 3, 2, 0, 0);
    for (int row = 0; row < 288; row++) {
      double size = 1 + 0.3 * Math.sin(row / 9.0);
      int sign = row < 144 ? 1 : -1;
      csv.append(
          String.format(
              Locale.ROOT,
              "%s,%.3f,%.2f,%.2f,%.3f%n",
              at.plusMinutes(10L * row).toString().replace('T', ' '),
              10 * size,
              230 + Math.sin(row / 5.0),
              sign * WATTS * size,
              sign * 0.95));
    }
    return csv.toString().getBytes(StandardCharsets.UTF_8);
  }

  private String read(Http http) {
    Part survey = new Part("survey", "survey.zip", SmallSite.zip("Works"));
    long site = http.form("POST", "/api/v1/sites", survey).json().path("id").asLong();
    String readings = "/api/v1/sites/" + site + "/readings";
    Answer taken =
        http.form("POST", readings, new Part("file", "two.csv", log()), Part.field("meter", "M1"));
    JsonNode job = http.ended("/api/v1/jobs/" + taken.json().path("job").asLong());
    assertThat(job.path("state").asString()).as(job.toString()).isEqualTo("done");
    return "/api/v1/readings/" + job.path("result").asLong();
  }

  @Test
  void aClampTheWrongWayRoundIsTurnedAndTurnedBack() {
    Http http = http();
    String path = read(http);
    JsonNode asRead = http.get(path).json();
    assertThat(asRead.path("cleaned").isNull()).isTrue();
    int finding = finding(asRead, "reversed-clamp");
    JsonNode offered = asRead.path("quality").path(finding).path("corrections").path(0);
    assertThat(offered.path("sentence").asString()).contains("Turn the sign of L1.active_w");

    Answer made = http.postJson(path + "/corrections", "{\"finding\":" + finding + "}");
    assertThat(made.status()).isEqualTo(201);
    long id = made.json().path("id").asLong();
    assertThat(made.header("Location")).isEqualTo(path + "/corrections/" + id);
    JsonNode corrected = http.get(path).json();
    assertThat(corrected.path("quantities")).isEqualTo(asRead.path("quantities"));
    assertThat(corrected.at("/cleaned/rows").asInt()).isEqualTo(288);
    assertThat(
            corrected.path("cleaned").path("quantities").path("L1.active_w").path("min").asDouble())
        .isPositive();
    assertThat(corrected.path("quality").path(finding).path("corrected").asLong()).isEqualTo(id);
    assertThat(http.get(path + "/corrections").json().path(0).path("undone").isNull()).isTrue();
    ProblemShape.check(http.postJson(path + "/corrections", "{\"finding\":" + finding + "}"), 422);
    String site = "/api/v1/sites/" + asRead.path("site").asLong();
    assertThat(measured(http, site).path("basis").asString())
        .endsWith("as corrected (one correction)");

    assertThat(http.delete(path + "/corrections/" + id).status()).isEqualTo(204);
    ProblemShape.check(http.delete(path + "/corrections/" + id), 404);
    JsonNode back = http.get(path).json();
    assertThat(back.path("cleaned").isNull()).isTrue();
    assertThat(back.path("quantities")).isEqualTo(asRead.path("quantities"));
    assertThat(back.path("corrections").path(0).path("undone").isString()).isTrue();
    assertThat(measured(http, site).path("basis").asString()).endsWith("as read");
    assertThat(measured(http, site).path("demand_a_reason").asString()).contains("too short");
  }

  /** What an audit sets beside the figures of the meter's node. */
  private static JsonNode measured(Http http, String site) {
    String audits = site + "/audits";
    long audit = http.postJson(audits, "{\"draws\":0}").json().path("id").asLong();
    assertThat(http.ended("/api/v1/audits/" + audit).path("state").asString()).isEqualTo("done");
    return http.get("/api/v1/audits/" + audit + "/nodes/LP-1").json().path("measured");
  }

  @Test
  void whatIsNotOfferedIsRefused() {
    Http http = http();
    String path = read(http) + "/corrections";
    ProblemShape.check(http.postJson(path, "{\"finding\":99}"), 422);
    ProblemShape.check(http.postJson(path, "{\"finding\":0,\"correction\":9}"), 422);
    ProblemShape.check(http.postJson(path, "{"), 400);
    ProblemShape.check(http.postJson("/api/v1/readings/999/corrections", "{\"finding\":0}"), 404);
    ProblemShape.check(http.get("/api/v1/readings/999/corrections"), 404);
  }

  @Test
  void thePageCorrectsWithOneButtonAndShowsBothSets() {
    Http http = http();
    String api = read(http);
    String page = api.replace("/api/v1", "");
    int finding = finding(http.get(api).json(), "reversed-clamp");
    assertThat(text(http, page)).contains("Turn the sign of L1.active_w");

    Answer pressed =
        http.send(
            "POST",
            page + "/corrections",
            "application/x-www-form-urlencoded",
            "finding=" + finding + "&correction=0");
    assertThat(pressed.status()).isEqualTo(302);
    assertThat(pressed.header("Location")).endsWith(page + "#quality");
    assertThat(text(http, page))
        .contains(
            "Corrected:", "Take it back", "One correction holds", "L1: Active power, W, corrected")
        .doesNotContain("??");
    long id = http.get(api + "/corrections").json().path(0).path("id").asLong();
    assertThat(http.post(page + "/corrections/" + id + "/undo").status()).isEqualTo(302);
    assertThat(text(http, page)).doesNotContain("L1: Active power, W, corrected");
  }

  /** Two days are no week: what is there is told, and no verdict is made of it. */
  @Test
  void aLogIsHeldAgainstLimitsWithWhatWasThere() {
    Http http = http();
    String path = read(http);
    JsonNode limits = http.get(path + "/limits").json();
    assertThat(limits.path("set").asString()).isEqualTo("as read");
    JsonNode volts = limits.path("limits").path(0);
    assertThat(volts.path("code").asString()).isEqualTo("rms-voltage");
    assertThat(volts.path("outcome").asString()).isEqualTo("open");
    assertThat(volts.at("/worst/share_percent").asDouble())
        .isEqualTo(100 * 288 / 1008.0, org.assertj.core.api.Assertions.within(1e-9));
    assertThat(text(http, path.replace("/api/v1", "")))
        .contains("Held against limits", "29 % of the period there", "Open in one week")
        .doesNotContain("??");
    int finding = finding(http.get(path).json(), "reversed-clamp");
    http.postJson(path + "/corrections", "{\"finding\":" + finding + "}");
    assertThat(http.get(path + "/limits").json().path("set").asString())
        .isEqualTo("as corrected (one correction)");
    ProblemShape.check(http.get("/api/v1/readings/999/limits"), 404);
  }

  private static int finding(JsonNode reading, String code) {
    for (int k = 0; k < reading.path("quality").size(); k++) {
      if (reading.path("quality").path(k).path("code").asString().equals(code)) {
        return k;
      }
    }
    throw new AssertionError(code + " in " + reading.path("quality"));
  }

  private static String text(Http http, String page) {
    return new String(
        http.get(page, "Accept", "text/html").response().body(), StandardCharsets.UTF_8);
  }
}
