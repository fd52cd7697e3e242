package fourthwire.config;

import static org.assertj.core.api.Assertions.assertThat;

import fourthwire.Application;
import fourthwire.testsupport.Databases;
import fourthwire.testsupport.Http;
import fourthwire.testsupport.Http.Part;
import fourthwire.testsupport.OtherApplications;
import fourthwire.testsupport.SmallSite;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.Map;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.postgresql.ds.PGSimpleDataSource;
import org.springframework.boot.builder.SpringApplicationBuilder;
import org.springframework.context.ConfigurableApplicationContext;
import tools.jackson.databind.JsonNode;

/** The service as it is started by its user: with the demo site, and on PostgreSQL. */
class WholeServiceTest {
  @TempDir private Path folder;

  @Test
  void theFirstStartAuditsTheDemoSiteWithItsReadings() {
    try (ConfigurableApplicationContext service =
        start(Map.of("fourthwire.demo", "true", "fourthwire.data-dir", folder.toString()))) {
      Http http = http(service);
      JsonNode sites = http.get("/api/v1/sites").json();
      assertThat(sites).hasSize(1);
      String site = "/api/v1/sites/" + sites.path(0).path("id").asLong();
      JsonNode readings = http.get(site + "/readings").json();
      assertThat(readings).as("two weeks of logs and a record").hasSize(3);
      for (JsonNode row : readings) {
        JsonNode reading = http.get("/api/v1/readings/" + row.path("id").asLong()).json();
        assertThat(reading.path("meter")).isEqualTo(row.path("meter"));
        assertThat(reading.has(reading.has("rows") ? "quantities" : "spectrum")).isTrue();
      }
      checkAudit(http, site);
      assertThat(page(http, "/")).contains(sites.path(0).path("name").asString());
      assertThat(http.get("/actuator/health").json().path("status").asString()).isEqualTo("UP");
    }
  }

  private static void checkAudit(Http http, String site) {
    JsonNode audits = http.get(site + "/audits").json();
    assertThat(audits).hasSize(1);
    String audit = "/api/v1/audits/" + audits.path(0).path("id").asLong();
    JsonNode ended = http.ended(audit, 300);
    assertThat(ended.path("state").asString()).as(ended.toString()).isEqualTo("done");
    JsonNode worst = http.get(audit + "/nodes").json().path(0);
    assertThat(worst.at("/findings/act").asInt()).as(worst.toString()).isPositive();
    JsonNode normal = http.get(audit + "/nodes/MSB").json();
    assertThat(normal.path("node").asString()).isEqualTo("MSB");
    assertThat(normal.at("/design/current/L1/rms_a").asDouble()).isPositive();
    assertThat(normal.at("/design/power/active_w").asDouble()).isPositive();
  }

  private static String page(Http http, String path) {
    return new String(http.get(path).response().body(), StandardCharsets.UTF_8);
  }

  @Test
  void aSurveyIsAuditedOnPostgresql() {
    PGSimpleDataSource database = (PGSimpleDataSource) Databases.POSTGRESQL.empty();
    try (ConfigurableApplicationContext service =
        start(
            Map.of(
                "spring.profiles.active",
                "postgresql",
                "spring.datasource.url",
                database.getUrl(),
                "spring.datasource.username",
                "postgres",
                "fourthwire.demo",
                "false"))) {
      Http http = http(service);
      Part survey = new Part("survey", "survey.zip", SmallSite.zip("Works"));
      long site = http.form("POST", "/api/v1/sites", survey).json().path("id").asLong();
      long id = http.post("/api/v1/sites/" + site + "/audits").json().path("id").asLong();
      JsonNode ended = http.ended("/api/v1/audits/" + id);
      assertThat(ended.path("state").asString()).as(ended.toString()).isEqualTo("done");
      assertThat(http.get("/api/v1/audits/" + id + "/nodes").json()).hasSize(4);
      assertThat(http.get("/actuator/health").json().path("status").asString()).isEqualTo("UP");
    }
  }

  private static ConfigurableApplicationContext start(Map<String, String> settings) {
    return new SpringApplicationBuilder(Application.class)
        .initializers(
            context ->
                context
                    .getBeanFactory()
                    .registerSingleton("otherApplications", new OtherApplications()))
        .run(
            Stream.concat(
                    Stream.of("--server.port=0"),
                    settings.entrySet().stream().map(e -> "--" + e.getKey() + "=" + e.getValue()))
                .toArray(String[]::new));
  }

  private static Http http(ConfigurableApplicationContext service) {
    return new Http(
        service.getEnvironment().getRequiredProperty("local.server.port", Integer.class));
  }
}
