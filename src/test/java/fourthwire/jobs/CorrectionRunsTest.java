package fourthwire.jobs;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import fourthwire.testsupport.Http.Answer;
import fourthwire.testsupport.Http.Part;
import fourthwire.testsupport.ServiceTest;
import fourthwire.testsupport.SmallSite;
import java.nio.charset.StandardCharsets;
import java.time.Duration;
import java.util.Optional;
import java.util.concurrent.CountDownLatch;
import org.junit.jupiter.api.Test;
import org.springframework.beans.factory.annotation.Autowired;

/** A correction that takes longer than a press of a button: seen, stopped, failed, made. */
class CorrectionRunsTest extends ServiceTest {
  private static final Duration AT_ONCE = Duration.ofMillis(1);
  private static final Duration LONG = Duration.ofMinutes(1);
  private static final String LOG =
      "Time,L1.rms_a\n2026-03-02T00:00Z,10\n2026-03-02T00:10Z,20\n2026-03-02T00:20Z,30\n";

  @Autowired CorrectionRuns runs;

  /** A reading's page. */
  private String reading() {
    Part survey = new Part("survey", "a.zip", SmallSite.zip("Mill"));
    long site = http().form("POST", "/api/v1/sites", survey).json().path("id").asLong();
    Answer taken =
        http()
            .form(
                "POST",
                "/api/v1/sites/" + site + "/readings",
                new Part("file", "log.csv", LOG.getBytes(StandardCharsets.UTF_8)),
                Part.field("at", "LP-1"),
                Part.field(
                    "mapping",
                    "{\"kind\":\"log\",\"time\":{\"columns\":[\"Time\"],\"stamp\":\"start\"},"
                        + "\"columns\":{\"L1.rms_a\":{\"quantity\":\"L1.rms_a\"}}}"));
    var job = http().ended("/api/v1/jobs/" + taken.json().path("job").asLong());
    assertThat(job.path("state").asString()).as(job.toString()).isEqualTo("done");
    return "/readings/" + job.path("result").asLong();
  }

  private static long id(String page) {
    return Long.parseLong(page.replaceAll("\\D", ""));
  }

  private String text(String page) {
    return new String(
        http().get(page, "Accept", "text/html").response().body(), StandardCharsets.UTF_8);
  }

  private Optional<String> startHalf(String page, CountDownLatch go) {
    CountDownLatch half = new CountDownLatch(1);
    Optional<String> made =
        runs.start(
            id(page),
            AT_ONCE,
            listener -> {
              listener.accept(0.5);
              half.countDown();
              await(go);
              listener.accept(0.9);
              return "made";
            });
    await(half);
    return made;
  }

  private static void await(CountDownLatch latch) {
    try {
      latch.await();
    } catch (InterruptedException e) {
      throw new IllegalStateException(e);
    }
  }

  @Test
  void thePageShowsHowFarItIsAndRefusesAnother() throws InterruptedException {
    String page = reading();
    CountDownLatch go = new CountDownLatch(1);
    assertThat(startHalf(page, go)).isEmpty();
    assertThat(text(page)).contains("The corrected figures are being formed", ", 50 %", "hx-get");
    assertThat(text(page + "/corrections/progress")).contains(", 50 %").doesNotContain("<html");
    assertThatThrownBy(() -> runs.start(id(page), LONG, listener -> "other"))
        .isInstanceOf(RefusedException.class)
        .hasMessageContaining("wait until it is done");
    go.countDown();
    ends(page);
    assertThat(text(page)).doesNotContain("being formed", "??");
    Answer over = http().get(page + "/corrections/progress", "Accept", "text/html");
    assertThat(over.header("HX-Refresh")).isEqualTo("true");
    assertThat(runs.start(id(page), LONG, listener -> "next")).contains("next");
  }

  @Test
  void oneThatIsStoppedLeavesNothing() throws InterruptedException {
    String page = reading();
    CountDownLatch go = new CountDownLatch(1);
    assertThat(startHalf(page, go)).isEmpty();
    assertThat(http().post(page + "/corrections/cancel").status()).isEqualTo(302);
    go.countDown();
    ends(page);
    assertThat(text(page)).doesNotContain("being formed");
  }

  @Test
  void oneThatFailsSaysSoUntilItIsSeen() {
    String page = reading();
    assertThatThrownBy(
            () ->
                runs.start(
                    id(page),
                    LONG,
                    listener -> {
                      throw new IllegalStateException("planted");
                    }))
        .isInstanceOf(IllegalStateException.class);
    assertThat(text(page))
        .contains("was not foreseen", "Take note of it")
        .doesNotContain("planted", "hx-get");
    http().post(page + "/corrections/cancel");
    assertThat(text(page)).doesNotContain("was not foreseen");
  }

  private void ends(String page) throws InterruptedException {
    for (int tries = 0; runs.of(id(page)).isPresent() && tries < 1000; tries++) {
      Thread.sleep(10);
    }
    assertThat(runs.of(id(page))).isEmpty();
  }
}
