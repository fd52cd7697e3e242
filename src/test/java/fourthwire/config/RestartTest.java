package fourthwire.config;

import static org.assertj.core.api.Assertions.assertThat;

import fourthwire.Application;
import fourthwire.audit.Audit;
import fourthwire.testsupport.Http;
import fourthwire.testsupport.Http.Part;
import fourthwire.testsupport.OtherApplications;
import fourthwire.testsupport.SlowAudit;
import fourthwire.testsupport.SmallSite;
import java.nio.file.Path;
import java.util.concurrent.TimeUnit;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.springframework.boot.builder.SpringApplicationBuilder;
import org.springframework.context.ConfigurableApplicationContext;
import org.springframework.context.support.GenericApplicationContext;

/**
 * The whole service stopped in the middle of an audit and started again on the same data folder.
 */
class RestartTest {
  @TempDir private Path folder;

  @Test
  void anInterruptedAuditRunsAgainAndNothingIsLost() throws InterruptedException {
    SlowAudit interrupted = new SlowAudit();
    long id;
    try (ConfigurableApplicationContext service = start(interrupted)) {
      Http http = http(service);
      Part survey = new Part("survey", "survey.zip", SmallSite.zip("Works"));
      long site = http.form("POST", "/api/v1/sites", survey).json().path("id").asLong();
      id = http.post("/api/v1/sites/" + site + "/audits").json().path("id").asLong();
      assertThat(interrupted.begun.await(1, TimeUnit.MINUTES)).isTrue();
    }

    SlowAudit second = new SlowAudit().letGo();
    try (ConfigurableApplicationContext service = start(second)) {
      Http http = http(service);
      assertThat(http.get("/api/v1/sites").json().path(0).path("name").asString())
          .isEqualTo("Works");
      assertThat(http.ended("/api/v1/audits/" + id).path("state").asString()).isEqualTo("done");
      assertThat(http.get("/api/v1/audits/" + id + "/nodes").json()).hasSize(4);
      assertThat(second.runs).hasValue(1);
      assertThat(http.get("/actuator/health").json().path("status").asString()).isEqualTo("UP");
    }
  }

  @Test
  void aRunningAuditIsCancelledOverHttp() throws InterruptedException {
    SlowAudit slow = new SlowAudit();
    try (ConfigurableApplicationContext service = start(slow)) {
      Http http = http(service);
      Part survey = new Part("survey", "survey.zip", SmallSite.zip("Works"));
      long site = http.form("POST", "/api/v1/sites", survey).json().path("id").asLong();
      String audit = "/api/v1/audits/";
      long id = http.post("/api/v1/sites/" + site + "/audits").json().path("id").asLong();
      assertThat(slow.begun.await(1, TimeUnit.MINUTES)).isTrue();
      assertThat(http.get(audit + id + "/nodes").status()).as("no results yet").isEqualTo(409);

      assertThat(http.post(audit + id + "/cancel").status()).isEqualTo(200);

      assertThat(http.ended(audit + id).path("state").asString()).isEqualTo("cancelled");
    }
  }

  private ConfigurableApplicationContext start(Audit audit) {
    return new SpringApplicationBuilder(Application.class)
        .properties(
            "server.port=0",
            "fourthwire.demo=false",
            "fourthwire.data-dir=" + folder,
            "spring.main.allow-bean-definition-overriding=true")
        .initializers(
            context -> {
              context
                  .getBeanFactory()
                  .registerSingleton("otherApplications", new OtherApplications());
              context.addBeanFactoryPostProcessor(
                  factory ->
                      ((GenericApplicationContext) context)
                          .registerBean(
                              "givenAudit",
                              Audit.class,
                              () -> audit,
                              definition -> definition.setPrimary(true)));
            })
        .run();
  }

  private static Http http(ConfigurableApplicationContext service) {
    return new Http(
        service.getEnvironment().getRequiredProperty("local.server.port", Integer.class));
  }
}
