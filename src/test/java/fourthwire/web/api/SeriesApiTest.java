package fourthwire.web.api;

import static org.assertj.core.api.Assertions.assertThat;

import fourthwire.testsupport.Http;
import fourthwire.testsupport.Http.Part;
import fourthwire.testsupport.ServiceTest;
import fourthwire.testsupport.SmallSite;
import java.nio.charset.StandardCharsets;
import java.time.Instant;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import tools.jackson.databind.JsonNode;

/**
 * A log's rows over HTTP: the day on which Vienna's clocks go forward, ten minutes a row, the value
 * being the number of the row.
 */
class SeriesApiTest extends ServiceTest {
  private static final int ROWS = 6 * 48;
  private static final int GAP_FROM = 30;
  private static final int GAP_TO = 36;

  private String reading = "";

  @BeforeEach
  void readLog() {
    Part survey = new Part("survey", "survey.zip", SmallSite.zip("Works"));
    Http http = http();
    long site = http.form("POST", "/api/v1/sites", survey).json().path("id").asLong();
    StringBuilder log = new StringBuilder("Time,L1 rms A\n");
    Instant start = Instant.parse("2025-03-28T23:00:00Z");
    for (int k = 0; k < ROWS; k++) {
      if (k < GAP_FROM || k >= GAP_TO) {
        log.append(start.plusSeconds(600L * k)).append(',').append(k).append('\n');
      }
    }
    JsonNode job =
        http.form(
                "POST",
                "/api/v1/sites/" + site + "/readings",
                new Part("file", "log.csv", log.toString().getBytes(StandardCharsets.UTF_8)),
                Part.field("meter", "M1"))
            .json();
    JsonNode ended = http.ended("/api/v1/jobs/" + job.path("job").asLong());
    assertThat(ended.path("state").asString()).as(ended.toString()).isEqualTo("done");
    reading = "/api/v1/readings/" + ended.path("result").asLong();
  }

  @Test
  void stepsAreOfTheLocalCalendar() {
    JsonNode days = http().get(reading + "/series?quantity=L1.rms_a&points=3").json();
    assertThat(days.path("step").asString()).isEqualTo("P1D");
    assertThat(days.at("/steps/0/start").asString()).isEqualTo("2025-03-29T00:00:00+01:00");
    assertThat(days.at("/steps/0/count").asInt()).isEqualTo(144 - (GAP_TO - GAP_FROM));
    assertThat(days.at("/steps/1/start").asString()).isEqualTo("2025-03-30T00:00:00+01:00");
    assertThat(days.at("/steps/1/count").asInt()).as("a day of 23 hours").isEqualTo(138);
    assertThat(days.at("/steps/1/min").asDouble()).isEqualTo(144);
    assertThat(days.at("/steps/1/max").asDouble()).isEqualTo(144 + 137);
    assertThat(days.at("/steps/1/mean").asDouble()).isEqualTo(144 + 137 / 2.0);
    assertThat(days.at("/steps/2/start").asString()).isEqualTo("2025-03-31T00:00:00+02:00");
  }

  @Test
  void aSpanIsAskedForInAnyOfTheWaysATimeIsWritten() {
    for (String span :
        new String[] {
          "from=2025-03-29T04:00&to=2025-03-29T08:00",
          "from=2025-03-29T03:00:00Z&to=2025-03-29T09:00:00%2B02:00",
          "from=2025-03-29T04:00:00%2B01:00&to=2025-03-29%2008:00"
        }) {
      JsonNode part = http().get(reading + "/series?quantity=L1.rms_a&" + span).json();
      assertThat(part.path("step").asString()).as(span).isEqualTo("PT10M");
      assertThat(part.path("steps")).hasSize(24);
      assertThat(part.at("/steps/0/mean").asDouble()).isEqualTo(24);
      assertThat(part.at("/steps/6/count").asInt()).as("in the gap").isZero();
      assertThat(part.at("/steps/6/mean").isNull()).isTrue();
    }
  }

  @Test
  void daysSayHowCompleteTheyAre() {
    JsonNode days = http().get(reading + "/coverage").json().path("days");
    assertThat(days.at("/0/date").asString()).isEqualTo("2025-03-29");
    assertThat(days.at("/0/share").asDouble()).isEqualTo(138 / 144.0);
    assertThat(days.at("/1/rows").asInt()).isEqualTo(138);
    assertThat(days.at("/1/share").asDouble()).as("all of a day of 23 hours").isEqualTo(1);
    JsonNode weeks = http().get(reading + "/weeks?quantity=L1.rms_a").json();
    assertThat(weeks.at("/weeks/0/start").asString()).isEqualTo("2025-03-24");
    assertThat(weeks.at("/days/1/p50").asDouble()).isEqualTo(144 + 137 / 2.0);
    assertThat(weeks.path("hour_of_week")).hasSize(168);
    assertThat(weeks.at("/hour_of_week/122").isNull()).as("Saturday 02 h").isFalse();
    assertThat(weeks.at("/hour_of_week/146").isNull())
        .as("Sunday 02 h, left out by the clocks")
        .isTrue();
  }

  @Test
  void whatCannotBeAnsweredIsAProblem() {
    Http http = http();
    ProblemShape.check(http.get(reading + "/series?quantity=N.rms_a"), 404);
    ProblemShape.check(http.get(reading + "/weeks?quantity=N.rms_a"), 404);
    ProblemShape.check(http.get("/api/v1/readings/999/series?quantity=L1.rms_a"), 404);
    ProblemShape.check(http.get("/api/v1/readings/999/coverage"), 404);
    String series = reading + "/series?quantity=L1.rms_a";
    ProblemShape.check(http.get(reading + "/series"), 400);
    ProblemShape.check(http.get(series + "&points=1"), 400);
    ProblemShape.check(http.get(series + "&points=many"), 400);
    ProblemShape.check(http.get(series + "&from=yesterday"), 400);
    ProblemShape.check(http.get(series + "&from=2025-04-01&to=2025-03-01"), 400);
  }
}
