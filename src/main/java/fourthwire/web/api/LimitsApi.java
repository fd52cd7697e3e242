package fourthwire.web.api;

import fourthwire.jobs.measured.LogAssessments;
import fourthwire.jobs.measured.SiteZone;
import fourthwire.json.LogVerdictJson;
import fourthwire.metering.ReadingRepository;
import fourthwire.site.SiteRepository;
import fourthwire.site.Survey;
import io.swagger.v3.oas.annotations.Operation;
import io.swagger.v3.oas.annotations.media.Content;
import io.swagger.v3.oas.annotations.media.Schema;
import io.swagger.v3.oas.annotations.responses.ApiResponse;
import io.swagger.v3.oas.annotations.tags.Tag;
import org.springframework.http.MediaType;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.RequestMapping;
import org.springframework.web.bind.annotation.RestController;
import tools.jackson.databind.node.ObjectNode;

/** A log's percentiles by day and week against the limits of measured values. */
@RestController
@RequestMapping(
    path = "/api/v1/readings/{reading}/limits",
    produces = MediaType.APPLICATION_JSON_VALUE)
@Tag(name = "Readings")
class LimitsApi {
  private final LogAssessments limits;
  private final ReadingRepository readings;
  private final SiteRepository sites;

  LimitsApi(LogAssessments limits, ReadingRepository readings, SiteRepository sites) {
    this.limits = limits;
    this.readings = readings;
    this.sites = sites;
  }

  @GetMapping
  @Operation(
      summary = "Hold a log against the limits of measured values, day by day and week by week",
      description =
          "A period is within or over its limit only where the values that are missing could not"
              + " turn it; else it is open.")
  @ApiResponse(
      responseCode = "200",
      description = "The verdicts, each with every period and what share of it was there",
      content = @Content(schema = @Schema(ref = "#/components/schemas/LogLimits")))
  ObjectNode get(@PathVariable long reading) {
    ReadingRepository.Entry entry =
        readings.find(reading).orElseThrow(() -> MissingException.reading(reading));
    SiteRepository.Entry site =
        sites.find(entry.siteId()).orElseThrow(() -> MissingException.site(entry.siteId()));
    Survey survey = sites.survey(site.id(), site.latestRevision());
    return limits
        .of(entry, survey)
        .map(r -> LogVerdictJson.write(r.set(), r.verdicts(), r.notes(), SiteZone.of(survey)))
        .orElseThrow(() -> new MissingException("reading " + reading + " is no log"));
  }
}
