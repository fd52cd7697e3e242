package fourthwire.web.api;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import fourthwire.testsupport.Http;
import fourthwire.testsupport.Http.Answer;
import fourthwire.testsupport.Http.Part;
import fourthwire.testsupport.ServiceTest;
import fourthwire.testsupport.SmallSite;
import java.nio.charset.StandardCharsets;
import java.util.List;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import tools.jackson.databind.JsonNode;

/** Readings and the jobs that read them, over HTTP. */
class ReadingApiTest extends ServiceTest {
  private static final String LOG =
      """
      Time,I1,I2,I3,IN
      2026-03-02 00:10:00,10,11,12,3
      2026-03-02 00:20:00,20,21,22,4
      2026-03-02 00:30:00,30,31,32,5
      """;

  private static final String MAPPING =
      """
      {"kind":"log","time":{"columns":["Time"],"format":"yyyy-MM-dd HH:mm:ss","stamp":"end",
      "interval_s":600},"columns":{"I1":{"quantity":"L1.rms_a"},"I2":{"quantity":"L2.rms_a"},
      "I3":{"quantity":"L3.rms_a"},"IN":{"quantity":"N.rms_a"}}}
      """;

  private String readings = "";

  @BeforeEach
  void makeSite() {
    Part survey = new Part("survey", "survey.zip", SmallSite.zip("Works"));
    long site = http().form("POST", "/api/v1/sites", survey).json().path("id").asLong();
    readings = "/api/v1/sites/" + site + "/readings";
  }

  @Test
  void aLogIsReadListedShownBesideTheAuditAndRemoved() {
    Http http = http();
    Answer taken =
        http.form("POST", readings, log(), field("meter", "M1"), field("mapping", MAPPING));

    assertThat(taken.status()).as(taken.json().toString()).isEqualTo(202);
    String job = "/api/v1/jobs/" + taken.json().path("job").asLong();
    assertThat(taken.header("Location")).isEqualTo(job);
    JsonNode ended = http.ended(job);
    assertThat(ended.path("state").asString()).as(ended.toString()).isEqualTo("done");
    String reading = "/api/v1/readings/" + ended.path("result").asLong();

    JsonNode r = http.get(reading).json();
    assertThat(r.path("meter").asString()).isEqualTo("M1");
    assertThat(r.path("at").asString()).isEqualTo("LP-1");
    assertThat(r.path("kind").asString()).isEqualTo("log");
    assertThat(r.path("rows").asInt()).isEqualTo(3);
    assertThat(r.path("sha256").asString()).hasSize(64);
    JsonNode l1 = r.path("quantities").path("L1.rms_a");
    assertThat(l1.path("count").asInt()).isEqualTo(3);
    assertThat(l1.path("mean").asDouble()).isCloseTo(20, within(1e-9));
    assertThat(l1.path("max").asDouble()).isEqualTo(30);
    assertThat(http.get(readings).json().path(0).path("id")).isEqualTo(r.path("id"));
    checkAudit(http, r);

    assertThat(http.delete(reading).status()).isEqualTo(204);
    ProblemShape.check(http.get(reading), 404);
    ProblemShape.check(http.delete(reading), 404);
    assertThat(http.post(job + "/cancel").json()).as("has ended").isEqualTo(ended);
  }

  private void checkAudit(Http http, JsonNode reading) {
    long audit = http.post(readings.replace("readings", "audits")).json().path("id").asLong();
    assertThat(http.ended("/api/v1/audits/" + audit).path("state").asString()).isEqualTo("done");
    JsonNode measured = http.get("/api/v1/audits/" + audit + "/nodes/LP-1").json().path("measured");
    assertThat(measured.path("meter").asString()).isEqualTo("M1");
    assertThat(measured.path("reading")).isEqualTo(reading.path("id"));
    assertThat(measured.at("/current/N/rms_a").asDouble()).isEqualTo(5);
    assertThat(measured.at("/current/L1/rms_a").asDouble()).isEqualTo(30);
  }

  @Test
  void aMeterIsMadeAtANode() {
    Http http = http();
    Answer taken = http.form("POST", readings, log(), field("at", "LP-1:heat"), mappingFile());
    JsonNode ended = http.ended("/api/v1/jobs/" + taken.json().path("job").asLong());
    JsonNode r = http.get("/api/v1/readings/" + ended.path("result").asLong()).json();
    assertThat(r.path("meter").asString()).isEqualTo("LP-1:heat");
    assertThat(r.path("at").asString()).isEqualTo("LP-1:heat");
  }

  @Test
  void whatCannotBeReadIsRefusedWithTheColumnsFound() {
    Http http = http();
    Part unclear = file("Moment,Foo,Bar\nyesterday,1,2\n");
    Answer refused = http.form("POST", readings, unclear, field("meter", "M1"));
    ProblemShape.check(refused, 422);
    assertThat(refused.json().path("columns").toString()).contains("Foo", "Bar");
    assertThat(refused.json().path("questions")).isNotEmpty();

    ProblemShape.check(http.form("POST", readings, log()), 422);
    ProblemShape.check(http.form("POST", readings, log(), field("meter", "M9")), 422);
    ProblemShape.check(http.form("POST", readings, log(), field("at", "nowhere")), 422);
    for (Answer without :
        List.of(
            http.form("POST", readings, field("meter", "M1")),
            http.form("POST", readings, field("meter", "M1"), field("file", "no file")),
            http.send("POST", readings, "application/x-www-form-urlencoded", "meter=M1"),
            http.post(readings))) {
      ProblemShape.check(without, 422);
      assertThat(without.json().path("detail").asString()).contains("in the part \"file\"");
    }
    ProblemShape.check(
        http.form("POST", readings, log(), field("meter", "M1"), field("mapping", "{")), 422);
    ProblemShape.check(
        http.form("POST", "/api/v1/sites/999/readings", log(), field("meter", "M1")), 404);
    ProblemShape.check(http.postJson(readings, "{}"), 415);
    assertThat(http.get(readings).json()).isEmpty();
  }

  @Test
  void whatIsNotThereIsAProblem() {
    ProblemShape.check(http().get("/api/v1/readings/999"), 404);
    ProblemShape.check(http().get("/api/v1/jobs/999"), 404);
    ProblemShape.check(http().post("/api/v1/jobs/999/cancel"), 404);
    ProblemShape.check(http().get("/api/v1/sites/999/readings"), 404);
  }

  private static Part log() {
    return file(LOG);
  }

  private static Part file(String text) {
    return new Part("file", "week.csv", text.getBytes(StandardCharsets.UTF_8));
  }

  private static Part mappingFile() {
    return new Part("mapping", "mapping.json", MAPPING.getBytes(StandardCharsets.UTF_8));
  }

  private static Part field(String name, String value) {
    return Part.field(name, value);
  }
}
