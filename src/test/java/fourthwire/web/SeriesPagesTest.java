package fourthwire.web;

import static org.assertj.core.api.Assertions.assertThat;

import fourthwire.metering.ReadingMapping;
import fourthwire.metering.ReadingRepository;
import fourthwire.metering.log.InventedBoard;
import fourthwire.testsupport.Http.Answer;
import fourthwire.testsupport.SmallCapture;
import fourthwire.testsupport.SmallLog;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.springframework.beans.factory.annotation.Autowired;

/** The pages of a log: over time, in order of size, order by order; and the days it covers. */
class SeriesPagesTest extends PagesTest {
  private static final int MOST_BYTES = 100_000;

  @Autowired ReadingRepository readings;
  private long log;
  private long capture;

  @BeforeAll
  void add() {
    log = readings.add(addition("M8", SmallLog.reading(), site));
    capture = readings.add(addition("M9", SmallCapture.reading(), site));
  }

  /** A reading as a file would have made it. */
  static ReadingRepository.Addition addition(
      String meter, fourthwire.metering.Reading reading, long site) {
    return new ReadingRepository.Addition(
        site,
        new ReadingRepository.MeterRef(meter, "MSB"),
        List.of(),
        "made",
        new ReadingMapping(
            Optional.empty(), ReadingMapping.Time.FROM_FILE, OptionalDouble.empty(), Map.of()),
        Optional.empty(),
        reading);
  }

  /** Pages of a log that are moved through are kept small. */
  private String page(String path) {
    Answer answer = http().get(path, "Accept", "text/html");
    String text = new String(answer.response().body(), StandardCharsets.UTF_8);
    assertThat(answer.status()).as(text).isEqualTo(200);
    assertThat(answer.response().body().length)
        .isLessThan(path.matches(".*/(series|spread|orders).*") ? MOST_BYTES : 2 * MOST_BYTES);
    return text;
  }

  @Test
  void aLogIsShownOverTime() {
    String page = page("/readings/" + log + "/series");
    assertThat(page)
        .contains("Current, rms", "L1", "9.00 to 63.0", "No rows for 12 h", "The reading itself")
        .contains("data-from=\"" + SmallLog.FROM.toEpochMilli() + "\"")
        .doesNotContain("??", "The whole log");
  }

  @Test
  void aPartOfItIsShownLargerWithWaysToOthers() {
    String page =
        page(
            "/readings/"
                + log
                + "/series?show=rms_v&also=frequency_hz&from=2025-03-30&to=2025-03-31");
    assertThat(page)
        .contains("Voltage, rms", "Frequency", "30 March 2025, 00:00", "31 March 2025, 00:00")
        .contains("At most 254", "class=\"window\"", "Earlier", "Later", "Wider", "The whole log")
        .contains("from=2025-03-29T12:30&amp;to=2025-03-30T12:30")
        .contains("always within its limits")
        .doesNotContain("??");
    assertThat(page("/readings/" + log + "/series?together=true")).contains("plot series together");
  }

  @Test
  void whatCannotBeShownIsSaidAndTheWholeIsShown() {
    for (String span :
        List.of("from=yesterday", "from=2031-01-01", "from=2025-04-02&to=2025-04-01")) {
      assertThat(page("/readings/" + log + "/series?" + span))
          .contains("can’t be read or is not in the log")
          .contains("24 March 2025, 00:00");
    }
    assertThat(page("/readings/" + log + "/series?show=colour&also=colour"))
        .contains("Current, rms");
    for (String view : List.of("series", "spread", "orders")) {
      assertThat(http().get("/readings/" + capture + "/" + view, "Accept", "text/html").status())
          .isEqualTo(404);
    }
  }

  @Test
  void aMeasureIsShownInOrderOfSizeAndByHour() {
    assertThat(page("/readings/" + log + "/spread"))
        .contains(">P95<", "Outside limit", "Hour by hour of the week", ">Mon<", "darkest")
        .doesNotContain("??");
    assertThat(page("/readings/" + log + "/spread?show=active_w")).contains("kW");
  }

  @Test
  void ordersAreShownOverTime() {
    String orders = page("/readings/" + log + "/orders?of=N.current_a");
    assertThat(orders)
        .contains("Current of N, amps", ">3rd<", ">9th<", "94.5", "95th percentile of each day")
        .doesNotContain("??");
    assertThat(page("/readings/" + log + "/orders?of=L1.voltage_percent&scale=common"))
        .contains("Voltage of L1", ">5th<", "Limit", "6\u202f%")
        .contains("full-mark", "Limit: EN 50160");
    assertThat(orders).contains("not that of the neutral").doesNotContain("Limit: ");
  }

  /** A clamp turned round for some days: as read its power was below zero. */
  @Test
  void rowsAreShownAsCorrectedOrAsRead() {
    InventedBoard board = new InventedBoard(4, 2);
    board.scale("L2.active_w", 1440, 2016, -1);
    long turned = readings.add(addition("M6", board.reading(), site));
    String series = "/readings/" + turned + "/series?show=active_w";
    assertThat(page(series)).contains("rows as read").doesNotContain("id=\"rows\"");
    assertThat(
            http()
                .send(
                    "POST",
                    "/readings/" + turned + "/corrections",
                    "application/x-www-form-urlencoded",
                    "finding=0&correction=0")
                .status())
        .isEqualTo(302);
    assertThat(page(series))
        .contains(
            "rows as corrected; thin line: mean as read", "class=\"before\"", "rows=corrected");
    String asRead = page(series + "&rows=read");
    assertThat(asRead).contains("rows as read", "rows=read").doesNotContain("class=\"before\"");
    String spread = "/readings/" + turned + "/spread?show=active_w";
    assertThat(page(spread)).contains("rows as corrected; thin line: as read", "trace before");
    assertThat(page(spread + "&rows=read")).contains("rows as read").doesNotContain("trace before");
    String api = "/api/v1/readings/" + turned + "/series?quantity=L2.active_w&points=2&rows=";
    assertThat(least(api + "read")).isNegative();
    assertThat(least(api + "corrected")).isPositive();
    assertThat(http().get(api + "best").status()).isEqualTo(400);
  }

  private double least(String address) {
    double least = Double.POSITIVE_INFINITY;
    for (tools.jackson.databind.JsonNode step : http().get(address).json().path("steps")) {
      least = Math.min(least, step.path("min").asDouble(Double.POSITIVE_INFINITY));
    }
    return least;
  }

  /** One day has half its rows: 12 of 24 hours. */
  @Test
  void theListSaysWhichDaysAreCovered() {
    String page = page("/sites/" + site + "/readings");
    assertThat(page.indexOf("Add a meter’s file")).isLessThan(page.indexOf("By meter"));
    assertThat(page)
        .contains("By meter", "13 of 14 days are complete")
        .contains("27 March 2025: 50\u202f%", "One waveform capture")
        .doesNotContain("??");
    assertThat(page("/readings/" + log)).contains("/readings/" + log + "/series");
  }
}
