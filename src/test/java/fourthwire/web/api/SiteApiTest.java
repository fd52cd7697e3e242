package fourthwire.web.api;

import static org.assertj.core.api.Assertions.assertThat;

import fourthwire.testsupport.Http;
import fourthwire.testsupport.Http.Answer;
import fourthwire.testsupport.Http.Part;
import fourthwire.testsupport.ServiceTest;
import fourthwire.testsupport.SmallSite;
import java.nio.charset.StandardCharsets;
import java.util.Map;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import tools.jackson.databind.JsonNode;

/** Sites and surveys over HTTP. */
class SiteApiTest extends ServiceTest {
  private static final String SITES = "/api/v1/sites";

  @BeforeEach
  void removeAll() {
    for (JsonNode site : http().get(SITES).json()) {
      http().delete(SITES + "/" + site.path("id").asLong());
    }
  }

  @Test
  void aSurveyMakesASiteThatIsListedAndRemoved() {
    Answer made = http().form("POST", SITES, survey(SmallSite.zip("Works")));

    assertThat(made.status()).isEqualTo(201);
    assertThat(made.type()).startsWith("application/json");
    long id = made.json().path("id").asLong();
    assertThat(made.json().path("name").asString()).isEqualTo("Works");
    assertThat(made.json().path("warnings").isArray()).isTrue();
    assertThat(http().get(made.header("Location")).status()).isEqualTo(200);
    assertThat(http().get(SITES).json().toString())
        .isEqualTo("[{\"id\":%d,\"name\":\"Works\"}]".formatted(id));

    assertThat(http().delete(SITES + "/" + id).status()).isEqualTo(204);
    assertThat(http().delete(SITES + "/" + id).status()).isEqualTo(404);
    assertThat(http().get(SITES).json()).isEmpty();
  }

  @Test
  void anExportImportedAndExportedAgainIsTheSame() {
    for (String format : new String[] {"zip", "xlsx"}) {
      byte[] first = export(make("Works"), format);
      long again = http().form("POST", SITES, survey(first)).json().path("id").asLong();
      assertThat(export(again, format)).as(format).isEqualTo(first);
    }
  }

  @Test
  void aNewSurveyIsARevision() {
    long id = make("Works");
    Answer revised =
        http().form("PUT", SITES + "/" + id + "/survey", survey(SmallSite.zip("Works east")));

    assertThat(revised.status()).isEqualTo(200);
    assertThat(revised.json().path("revision").asInt()).isEqualTo(2);
    assertThat(http().get(SITES).json().path(0).path("name").asString()).isEqualTo("Works east");
    ProblemShape.check(
        http().form("PUT", SITES + "/999/survey", survey(SmallSite.zip("Works"))), 404);
  }

  @Test
  void aBrokenSurveyIsRefusedWithTableRowAndColumnAndNothingIsStored() {
    Map<String, String> tables = SmallSite.tables("Works");
    tables.put("supplies.csv", "supply,line_voltage_v,fault_level_mva\nGRID,many,20\n");
    tables.put("panels.csv", "panel,fed_from\nLP-1,NOWHERE\n");

    Answer refused = http().form("POST", SITES, survey(SmallSite.zip(tables)));

    ProblemShape.check(refused, 422);
    JsonNode errors = refused.json().path("errors");
    assertThat(errors).hasSizeGreaterThanOrEqualTo(2);
    assertThat(errors.path(0).propertyNames())
        .containsExactly("table", "row", "column", "value", "message");
    assertThat(errors.path(0).path("table").asString()).isEqualTo("supplies");
    assertThat(errors.path(0).path("row").asInt()).isEqualTo(2);
    assertThat(errors.path(0).path("column").asString()).isEqualTo("line_voltage_v");
    assertThat(errors.path(0).path("value").asString()).isEqualTo("many");
    assertThat(http().get(SITES).json()).isEmpty();
  }

  @Test
  void everyMisuseIsAProblemDocument() {
    Http http = http();
    byte[] text = "not a zip".getBytes(StandardCharsets.UTF_8);
    ProblemShape.check(http.form("POST", SITES, Part.field("other", "x")), 422);
    ProblemShape.check(http.form("POST", SITES, Part.field("survey", "x")), 422);
    Part survey = survey(SmallSite.zip("Works"));
    Answer two = http.form("POST", SITES, survey, survey);
    ProblemShape.check(two, 422);
    assertThat(two.json().path("detail").asString()).contains("2 parts", "one is expected");
    ProblemShape.check(http.form("POST", SITES, survey(text)), 422);
    Answer unsupported = http.postJson(SITES, "{}");
    ProblemShape.check(unsupported, 415);
    assertThat(unsupported.header("Accept")).isEqualTo("multipart/form-data");
    ProblemShape.check(
        http.send("POST", SITES, "multipart/form-data; boundary=x", "--x\r\nbroken"), 400);
    ProblemShape.check(http.send("POST", SITES, "multipart/form-data", "no boundary"), 400);
    ProblemShape.check(http.send("PATCH", SITES, "application/json", "{}"), 405);
    ProblemShape.check(http.get(SITES, "Accept", "text/html"), 406);
    ProblemShape.check(http.get(SITES + "/abc/survey"), 404);
    ProblemShape.check(http.get(SITES + "/999/survey"), 404);
    ProblemShape.check(http.get(SITES + "/" + make("Works") + "/survey?format=pdf"), 422);
    ProblemShape.check(http.get("/api/v1/nothing"), 404);
    ProblemShape.check(http.get("/api/"), 404);
  }

  @Test
  void aSurveyMayComeWithoutAFileName() {
    Answer made = http().form("POST", SITES, new Part("survey", "", SmallSite.zip("Works")));
    assertThat(made.status()).as(made.json().toString()).isEqualTo(201);
  }

  @Test
  void anUploadOverTheCapIsRefusedWithTheCap() {
    Answer refused = http().form("POST", SITES, survey(new byte[3 * 1024 * 1024]));

    ProblemShape.check(refused, 413);
    assertThat(refused.json().path("detail").asString()).contains("2MB");
  }

  private long make(String name) {
    return http().form("POST", SITES, survey(SmallSite.zip(name))).json().path("id").asLong();
  }

  private byte[] export(long site, String format) {
    Answer answer = http().get(SITES + "/" + site + "/survey?format=" + format);
    assertThat(answer.status()).isEqualTo(200);
    assertThat(answer.header("Content-Disposition")).contains("attachment", "." + format);
    return answer.response().body();
  }

  private static Part survey(byte[] file) {
    return new Part("survey", "survey.zip", file);
  }
}
