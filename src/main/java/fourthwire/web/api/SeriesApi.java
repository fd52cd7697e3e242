package fourthwire.web.api;

import fourthwire.jobs.series.SpanText;
import fourthwire.jobs.series.StoredLog;
import fourthwire.jobs.series.StoredLogs;
import fourthwire.json.SeriesJson;
import fourthwire.metering.Period;
import fourthwire.metering.SeriesRepository;
import fourthwire.metering.reduce.TimeSteps;
import fourthwire.site.SiteRepository;
import fourthwire.site.Survey;
import io.swagger.v3.oas.annotations.Operation;
import io.swagger.v3.oas.annotations.Parameter;
import io.swagger.v3.oas.annotations.media.Content;
import io.swagger.v3.oas.annotations.media.Schema;
import io.swagger.v3.oas.annotations.responses.ApiResponse;
import io.swagger.v3.oas.annotations.tags.Tag;
import java.time.Instant;
import java.util.List;
import org.jspecify.annotations.Nullable;
import org.springframework.http.HttpStatus;
import org.springframework.http.MediaType;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.RequestMapping;
import org.springframework.web.bind.annotation.RequestParam;
import org.springframework.web.bind.annotation.RestController;
import org.springframework.web.server.ResponseStatusException;
import tools.jackson.databind.node.ObjectNode;

/** The rows of interval logs, reduced to as many steps of time as are asked for. */
@RestController
@RequestMapping(path = "/api/v1/readings/{reading}", produces = MediaType.APPLICATION_JSON_VALUE)
@Tag(name = "Readings")
class SeriesApi {
  private static final int MOST_POINTS = 5000;

  private final StoredLogs logs;
  private final SiteRepository sites;

  SeriesApi(StoredLogs logs, SiteRepository sites) {
    this.logs = logs;
    this.sites = sites;
  }

  @GetMapping("/series")
  @Operation(
      summary = "A quantity of a log over time",
      description =
          "The span is cut into the shortest round steps of which it has no more than points:"
              + " multiples of the log's interval to an hour, then local hours, days, weeks and"
              + " months. Each tells the least, mean and largest value of the rows in it.")
  @ApiResponse(
      responseCode = "200",
      description = "The steps in order; one without rows has count 0",
      content = @Content(schema = @Schema(ref = "#/components/schemas/Series")))
  ObjectNode series(
      @PathVariable long reading,
      @Parameter(description = "For example L1.rms_a") @RequestParam String quantity,
      @Parameter(
              description =
                  "First instant, ISO 8601, without an offset in the site's time zone; a date is"
                      + " its first instant; left out: the log's first")
          @RequestParam(required = false)
          @Nullable String from,
      @Parameter(description = "The instant after the last, likewise; left out: the log's end")
          @RequestParam(required = false)
          @Nullable String to,
      @Parameter(
              description = "Most steps",
              schema =
                  @Schema(type = "integer", minimum = "2", maximum = "5000", defaultValue = "720"))
          @RequestParam(defaultValue = "720")
          int points,
      @Parameter(
              description = "Which rows: as read, or as corrected where corrections hold",
              schema =
                  @Schema(
                      allowableValues = {"read", "corrected"},
                      defaultValue = "read"))
          @RequestParam(defaultValue = "read")
          String rows) {
    StoredLog log = rows(log(reading), rows);
    if (points < 2 || points > MOST_POINTS) {
      throw bad("points " + points + " is not among 2 to " + MOST_POINTS);
    }
    known(log, quantity);
    Period span = span(log, from, to);
    TimeSteps steps = log.steps(span, points);
    return SeriesJson.series(quantity, log.values(List.of(quantity), steps).get(0), log.zone());
  }

  @GetMapping("/weeks")
  @Operation(
      summary = "A quantity of a log by week, by day and by hour of the week",
      description = "Percentiles are linear between the ordered values of the rows as read.")
  @ApiResponse(
      responseCode = "200",
      description = "Local weeks from Monday, local days, and 168 hourly means",
      content = @Content(schema = @Schema(ref = "#/components/schemas/SeriesWeeks")))
  ObjectNode weeks(
      @PathVariable long reading,
      @Parameter(description = "For example L1.rms_a") @RequestParam String quantity) {
    StoredLog log = log(reading);
    known(log, quantity);
    SeriesRepository.Weeks weeks = log.weeks(quantity).orElseThrow();
    Period whole = log.period();
    TimeSteps days =
        TimeSteps.days(whole.from().toEpochMilli(), whole.to().toEpochMilli(), log.zone());
    return SeriesJson.weeks(quantity, weeks, log.percentiles(quantity, days), log.zone());
  }

  @GetMapping("/coverage")
  @Operation(summary = "Which days a log covers, and how much of each")
  @ApiResponse(
      responseCode = "200",
      description = "Every local day from the log's first to its last",
      content = @Content(schema = @Schema(ref = "#/components/schemas/SeriesCoverage")))
  ObjectNode coverage(@PathVariable long reading) {
    return SeriesJson.coverage(log(reading).days());
  }

  private StoredLog log(long reading) {
    return logs.find(reading, this::survey)
        .orElseThrow(
            () -> new MissingException("there is no reading " + reading + " that is a log"));
  }

  private static StoredLog rows(StoredLog log, String rows) {
    return switch (rows) {
      case "read" -> log;
      case "corrected" -> log.corrected().orElse(log);
      default -> throw bad("rows \"" + rows + "\" is not among read, corrected");
    };
  }

  private Survey survey(long site) {
    SiteRepository.Entry entry = sites.find(site).orElseThrow(() -> MissingException.site(site));
    return sites.survey(site, entry.latestRevision());
  }

  private static void known(StoredLog log, String quantity) {
    if (!log.quantities().contains(quantity)) {
      throw new MissingException(
          "the log has no \"" + quantity + "\"; it has " + String.join(", ", log.quantities()));
    }
  }

  private static Period span(StoredLog log, @Nullable String from, @Nullable String to) {
    Instant first = instant("from", from, log.period().from(), log);
    Instant last = instant("to", to, log.period().to(), log);
    if (!last.isAfter(first)) {
      throw bad("to must be later than from");
    }
    return new Period(first, last);
  }

  private static Instant instant(
      String name, @Nullable String text, Instant otherwise, StoredLog log) {
    if (text == null || text.isBlank()) {
      return otherwise;
    }
    return SpanText.instant(text, log.zone())
        .orElseThrow(
            () ->
                bad(
                    name
                        + " \""
                        + text
                        + "\" can't be read; write 2026-03-02, 2026-03-02T14:00 or"
                        + " 2026-03-02T14:00:00Z"));
  }

  private static ResponseStatusException bad(String detail) {
    return new ResponseStatusException(HttpStatus.BAD_REQUEST, detail);
  }
}
