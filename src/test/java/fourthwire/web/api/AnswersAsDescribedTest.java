package fourthwire.web.api;

import static org.assertj.core.api.Assertions.assertThat;

import fourthwire.testsupport.Http;
import fourthwire.testsupport.Http.Part;
import fourthwire.testsupport.ServiceTest;
import fourthwire.testsupport.SmallSite;
import java.nio.charset.StandardCharsets;
import java.util.Map;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.extension.ExtendWith;
import org.springframework.boot.test.system.CapturedOutput;
import org.springframework.boot.test.system.OutputCaptureExtension;
import tools.jackson.databind.JsonNode;

/** What each call really answers is what its description says. */
@ExtendWith(OutputCaptureExtension.class)
class AnswersAsDescribedTest extends ServiceTest {
  private static final double DEGREES_PER_SAMPLE = 3.6;

  private JsonNode api = new tools.jackson.databind.json.JsonMapper().createObjectNode();
  private DescribedShape described = new DescribedShape(api);

  @BeforeEach
  void fetch() {
    api = http().get("/api/v1/openapi.json").json();
    described = new DescribedShape(api);
  }

  @Test
  void theDescriptionIsMadeWithoutAWarning(CapturedOutput output) {
    http().get("/api/v1/openapi.json");
    assertThat(output.getAll()).doesNotContain("Graceful exception");
  }

  @Test
  void everyAnswerHasTheShapeThatIsDescribed() {
    Http http = http();
    JsonNode made = http.form("POST", "/api/v1/sites", survey()).json();
    described.check("post", "/sites", 201, made);
    String site = "/api/v1/sites/" + made.path("id").asLong();
    described.check("get", "/sites", 200, http.get("/api/v1/sites").json());
    described.check(
        "put", "/sites/{site}/survey", 200, http.form("PUT", site + "/survey", survey()).json());
    checkReading(http, site, log(), "meter", "M1");
    checkReading(http, site, capture(), "at", "LP-1:heat");
    described.check("get", "/sites/{site}/readings", 200, http.get(site + "/readings").json());
    checkAudits(http, site);
  }

  private void checkReading(Http http, String site, Part file, String key, String place) {
    JsonNode job = http.form("POST", site + "/readings", file, Part.field(key, place)).json();
    described.check("post", "/sites/{site}/readings", 202, job);
    String path = "/api/v1/jobs/" + job.path("job").asLong();
    JsonNode ended = http.ended(path);
    assertThat(ended.path("state").asString()).as(ended.toString()).isEqualTo("done");
    described.check("get", "/jobs/{job}", 200, ended);
    described.check("post", "/jobs/{job}/cancel", 200, http.post(path + "/cancel").json());
    JsonNode reading = http.get("/api/v1/readings/" + ended.path("result").asLong()).json();
    described.check("get", "/readings/{reading}", 200, reading);
    described.check(
        "get",
        "/readings/{reading}/corrections",
        200,
        http.get("/api/v1/readings/" + ended.path("result").asLong() + "/corrections").json());
    if (reading.has("rows")) {
      checkSeries(http, "/api/v1/readings/" + ended.path("result").asLong());
      // SmallSite lies in the zone Europe/Vienna: an hour ahead of UTC in March
      assertThat(reading.at("/period/from").asString()).isEqualTo("2026-03-02T00:00:00+01:00");
    }
  }

  private void checkSeries(Http http, String reading) {
    described.check("get", "/readings/{reading}/limits", 200, http.get(reading + "/limits").json());
    String quantity = "?quantity=N.rms_a";
    described.check(
        "get",
        "/readings/{reading}/series",
        200,
        http.get(reading + "/series" + quantity + "&to=2026-03-03").json());
    described.check(
        "get", "/readings/{reading}/weeks", 200, http.get(reading + "/weeks" + quantity).json());
    described.check(
        "get", "/readings/{reading}/coverage", 200, http.get(reading + "/coverage").json());
  }

  private void checkAudits(Http http, String site) {
    JsonNode queued = http.postJson(site + "/audits", "{\"draws\":5}").json();
    assertThat(queued.propertyNames()).containsExactly("id");
    described.check("post", "/sites/{site}/audits", 202, queued);
    String audit = "/api/v1/audits/" + queued.path("id").asLong();
    JsonNode ended = http.ended(audit);
    assertThat(http.get(audit + "/nodes/LP-1").json().at("/doubt/draws").asInt()).isEqualTo(5);
    described.check("get", "/audits/{audit}", 200, ended);
    described.check("get", "/sites/{site}/audits", 200, http.get(site + "/audits").json());
    described.check("post", "/audits/{audit}/cancel", 200, http.post(audit + "/cancel").json());
    described.check("get", "/audits/{audit}/nodes", 200, http.get(audit + "/nodes").json());
    for (String node : new String[] {"GRID", "LP-1", "LP-1:heat"}) {
      JsonNode result = http.get(audit + "/nodes/" + node).json();
      described.check("get", "/audits/{audit}/nodes/{node}", 200, result);
    }
    JsonNode measured = http.get(audit + "/nodes/LP-1").json().path("measured");
    assertThat(measured.at("/period/to").asString()).startsWith("2026-03-02T00:30:00+01:00");
  }

  @Test
  void theSurveyIsDescribedAsTheTwoFilesItCanBe() {
    JsonNode get = api.at("/paths/~1api~1v1~1sites~1{site}~1survey/get");
    assertThat(get.at("/responses/200/content").propertyNames())
        .containsExactlyInAnyOrder(
            "application/zip", "application/vnd.openxmlformats-officedocument.spreadsheetml.sheet");
    JsonNode format = get.path("parameters").path(1);
    assertThat(format.path("name").asString()).isEqualTo("format");
    assertThat(format.at("/schema/enum").toString()).isEqualTo("[\"zip\",\"xlsx\"]");
    assertThat(format.at("/schema/default").asString()).isEqualTo("zip");
  }

  @Test
  void formsAreDescribedPartByPart() {
    JsonNode readings = api.at("/paths/~1api~1v1~1sites~1{site}~1readings/post");
    assertThat(readings.path("parameters")).hasSize(1);
    assertThat(readings.at("/requestBody/required").asBoolean()).isTrue();
    assertThat(
            readings
                .at("/requestBody/content/multipart~1form-data/schema/properties")
                .propertyNames())
        .containsExactlyInAnyOrder("file", "meter", "at", "mapping");
    for (String call : new String[] {"~1sites/post", "~1sites~1{site}~1survey/put"}) {
      JsonNode survey = api.at("/paths/~1api~1v1" + call);
      assertThat(survey.at("/requestBody/required").asBoolean()).as(call).isTrue();
      assertThat(survey.at("/requestBody/content/multipart~1form-data/schema/required").toString())
          .isEqualTo("[\"survey\"]");
    }
  }

  private static Part survey() {
    Map<String, String> tables = SmallSite.tables("Works");
    tables.put("spot_readings.csv", "at,time,l1_a\nLP-1,2026-03-02T10:00:00,4.2\n");
    return new Part("survey", "survey.zip", SmallSite.zip(tables));
  }

  private static Part log() {
    return file(
        """
        Time,L1 rms A,L2 rms A,L3 rms A,N rms A
        2026-03-02 00:00:00,10,11,12,3
        2026-03-02 00:10:00,20,21,22,4
        2026-03-02 00:20:00,30,31,32,5
        """);
  }

  /** Twelve cycles of 50 Hz, a hundred samples each. */
  private static Part capture() {
    StringBuilder csv = new StringBuilder("t (s),L1 V,L1 A\n");
    for (int i = 0; i < 1200; i++) {
      double angle = Math.toRadians(DEGREES_PER_SAMPLE * i);
      csv.append(
          "%.4f,%.3f,%.3f%n".formatted(i * 0.0002, 325 * Math.sin(angle), 6 * Math.sin(angle)));
    }
    return file(csv.toString());
  }

  private static Part file(String text) {
    return new Part("file", "week.csv", text.getBytes(StandardCharsets.UTF_8));
  }
}
