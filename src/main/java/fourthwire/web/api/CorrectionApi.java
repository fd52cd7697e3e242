package fourthwire.web.api;

import fourthwire.jobs.CorrectionRuns;
import fourthwire.jobs.measured.SiteZone;
import fourthwire.json.CorrectionJson;
import fourthwire.metering.ReadingRepository;
import fourthwire.metering.correction.CorrectionRepository;
import fourthwire.site.SiteRepository;
import io.swagger.v3.oas.annotations.Operation;
import io.swagger.v3.oas.annotations.media.ArraySchema;
import io.swagger.v3.oas.annotations.media.Content;
import io.swagger.v3.oas.annotations.media.Schema;
import io.swagger.v3.oas.annotations.responses.ApiResponse;
import io.swagger.v3.oas.annotations.tags.Tag;
import java.net.URI;
import java.time.Duration;
import java.time.ZoneId;
import java.util.List;
import org.jspecify.annotations.Nullable;
import org.springframework.http.HttpStatus;
import org.springframework.http.MediaType;
import org.springframework.http.ResponseEntity;
import org.springframework.web.bind.annotation.DeleteMapping;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.RequestBody;
import org.springframework.web.bind.annotation.RequestMapping;
import org.springframework.web.bind.annotation.ResponseStatus;
import org.springframework.web.bind.annotation.RestController;
import tools.jackson.databind.node.ObjectNode;

/** Corrections of logs: what a finding offers, made and taken back. */
@RestController
@RequestMapping(
    path = "/api/v1/readings/{reading}/corrections",
    produces = MediaType.APPLICATION_JSON_VALUE)
@Tag(name = "Readings")
class CorrectionApi {
  /** The answer is the correction that was made, however large the log. */
  private static final Duration PATIENCE = Duration.ofHours(6);

  private final CorrectionRuns runs;
  private final CorrectionRepository corrections;
  private final ReadingRepository readings;
  private final SiteRepository sites;

  CorrectionApi(
      CorrectionRuns runs,
      CorrectionRepository corrections,
      ReadingRepository readings,
      SiteRepository sites) {
    this.runs = runs;
    this.corrections = corrections;
    this.readings = readings;
    this.sites = sites;
  }

  /** Which correction is asked for. */
  @Schema(name = "CorrectionAsked", description = "A correction that a finding offers")
  record Asked(
      @Schema(description = "The finding, as counted in quality from 0") int finding,
      @Schema(description = "Which of its corrections, from 0; left out: the first")
          @Nullable Integer correction) {}

  /** The correction that was made. */
  @Schema(name = "CorrectionMade", description = "The correction that was made")
  record Made(@Schema(description = "Its id") long id) {}

  @GetMapping
  @Operation(summary = "List a reading's corrections, those taken back too, oldest first")
  @ApiResponse(
      responseCode = "200",
      description = "What was corrected, when, and from which finding",
      content =
          @Content(array = @ArraySchema(schema = @Schema(ref = "#/components/schemas/Correction"))))
  List<ObjectNode> list(@PathVariable long reading) {
    ZoneId zone = zone(existing(reading));
    return corrections.ofReading(reading).stream().map(c -> CorrectionJson.write(c, zone)).toList();
  }

  @PostMapping(consumes = MediaType.APPLICATION_JSON_VALUE)
  @Operation(
      summary = "Correct what a finding says is wrong",
      description =
          "The rows as read and their statistics stay; the reading's cleaned is formed anew from"
              + " all corrections that hold.")
  @ApiResponse(responseCode = "201", description = "It is made")
  ResponseEntity<Made> make(@PathVariable long reading, @RequestBody Asked asked) {
    existing(reading);
    int offer = asked.correction() == null ? 0 : asked.correction();
    long id = runs.make(reading, asked.finding(), offer, PATIENCE).orElseThrow();
    return ResponseEntity.created(URI.create("/api/v1/readings/" + reading + "/corrections/" + id))
        .body(new Made(id));
  }

  @DeleteMapping("/{correction}")
  @ResponseStatus(HttpStatus.NO_CONTENT)
  @Operation(summary = "Take a correction back", description = "In any order.")
  @ApiResponse(responseCode = "204", description = "It holds no more")
  void undo(@PathVariable long reading, @PathVariable long correction) {
    existing(reading);
    if (!runs.undo(reading, correction, PATIENCE).orElseThrow()) {
      throw new MissingException("no correction " + correction + " of this reading holds");
    }
  }

  private ReadingRepository.Entry existing(long reading) {
    return readings.find(reading).orElseThrow(() -> MissingException.reading(reading));
  }

  private ZoneId zone(ReadingRepository.Entry reading) {
    SiteRepository.Entry site =
        sites.find(reading.siteId()).orElseThrow(() -> MissingException.site(reading.siteId()));
    return SiteZone.of(sites.survey(site.id(), site.latestRevision()));
  }
}
