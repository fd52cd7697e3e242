package fourthwire.web.api;

import fourthwire.jobs.ReadingService;
import fourthwire.jobs.measured.SiteZone;
import fourthwire.json.MappingJson;
import fourthwire.json.ReadingJson;
import fourthwire.metering.ReadingRepository;
import fourthwire.metering.correction.CorrectionRepository;
import fourthwire.site.SiteRepository;
import io.swagger.v3.oas.annotations.Operation;
import io.swagger.v3.oas.annotations.Parameter;
import io.swagger.v3.oas.annotations.media.ArraySchema;
import io.swagger.v3.oas.annotations.media.Content;
import io.swagger.v3.oas.annotations.media.Schema;
import io.swagger.v3.oas.annotations.responses.ApiResponse;
import io.swagger.v3.oas.annotations.tags.Tag;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.net.URI;
import java.nio.charset.StandardCharsets;
import java.time.ZoneId;
import java.util.List;
import java.util.Optional;
import org.jspecify.annotations.Nullable;
import org.springframework.http.HttpStatus;
import org.springframework.http.MediaType;
import org.springframework.http.ResponseEntity;
import org.springframework.web.bind.annotation.DeleteMapping;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.RequestMapping;
import org.springframework.web.bind.annotation.RequestParam;
import org.springframework.web.bind.annotation.RequestPart;
import org.springframework.web.bind.annotation.ResponseStatus;
import org.springframework.web.bind.annotation.RestController;
import org.springframework.web.multipart.MultipartFile;
import org.springframework.web.multipart.MultipartHttpServletRequest;
import tools.jackson.databind.node.ObjectNode;

/** Readings: meters' files and what they say. */
@RestController
@RequestMapping(path = "/api/v1", produces = MediaType.APPLICATION_JSON_VALUE)
@Tag(name = "Readings", description = "Meters' interval logs and waveform captures")
class ReadingApi {
  private final ReadingService service;
  private final ReadingRepository readings;
  private final CorrectionRepository corrections;
  private final SiteRepository sites;

  ReadingApi(
      ReadingService service,
      ReadingRepository readings,
      CorrectionRepository corrections,
      SiteRepository sites) {
    this.service = service;
    this.readings = readings;
    this.corrections = corrections;
    this.sites = sites;
  }

  /** The job that reads the files. */
  @Schema(name = "QueuedJob", description = "The job that was queued")
  record Queued(@Schema(description = "Id of the job") long job) {}

  @PostMapping(path = "/sites/{site}/readings", consumes = MediaType.MULTIPART_FORM_DATA_VALUE)
  @Operation(
      summary = "Hand in a meter's file",
      description =
          "An interval log, or a waveform capture; of a COMTRADE capture both files, or a zip of"
              + " them. Give the meter, or the node it was taken at.")
  @ApiResponse(responseCode = "202", description = "It is being read; watch the job at Location")
  ResponseEntity<Queued> add(
      @PathVariable long site,
      @RequestPart("file") List<MultipartFile> file,
      @Parameter(hidden = true) @RequestParam(required = false) @Nullable String meter,
      @Parameter(hidden = true) @RequestParam(required = false) @Nullable String at,
      @Parameter(hidden = true) @RequestPart(name = "mapping", required = false)
          @Nullable MultipartFile mapping,
      @Parameter(hidden = true) MultipartHttpServletRequest form) {
    existing(site);
    long job =
        service.take(
            new ReadingService.Upload(
                site,
                filled(meter),
                filled(at),
                file.stream().map(UploadedFile::of).toList(),
                filled(form.getParameter("mapping"))
                    .or(() -> text(mapping))
                    .map(MappingJson::read)));
    return ResponseEntity.accepted()
        .location(URI.create("/api/v1/jobs/" + job))
        .body(new Queued(job));
  }

  private static Optional<String> filled(@Nullable String field) {
    return Optional.ofNullable(field).filter(f -> !f.isBlank());
  }

  /** Of a field that was sent as a file, as many programs send JSON. */
  private static Optional<String> text(@Nullable MultipartFile part) {
    try {
      return part == null
          ? Optional.empty()
          : Optional.of(new String(part.getBytes(), StandardCharsets.UTF_8));
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  @GetMapping("/sites/{site}/readings")
  @Operation(summary = "List a site's readings, newest first")
  @ApiResponse(
      responseCode = "200",
      description = "What each is, without its figures",
      content =
          @Content(array = @ArraySchema(schema = @Schema(ref = "#/components/schemas/ReadingRow"))))
  List<ObjectNode> list(@PathVariable long site) {
    ZoneId zone = zone(existing(site));
    return readings.ofSite(site).stream().map(r -> ReadingJson.row(r, zone)).toList();
  }

  @GetMapping("/readings/{reading}")
  @Operation(summary = "What a reading says, and what is wrong with it")
  @ApiResponse(
      responseCode = "200",
      description = "Its figures and quality findings",
      content = @Content(schema = @Schema(ref = "#/components/schemas/Reading")))
  ObjectNode get(@PathVariable long reading) {
    return readings
        .find(reading)
        .map(
            r ->
                ReadingJson.write(
                    r,
                    corrections.ofReading(reading),
                    corrections.cleaned(reading),
                    zone(existing(r.siteId()))))
        .orElseThrow(() -> MissingException.reading(reading));
  }

  @DeleteMapping("/readings/{reading}")
  @ResponseStatus(HttpStatus.NO_CONTENT)
  @Operation(summary = "Remove a reading with its file")
  @ApiResponse(responseCode = "204", description = "It is gone")
  void delete(@PathVariable long reading) {
    if (!readings.delete(reading)) {
      throw MissingException.reading(reading);
    }
  }

  private SiteRepository.Entry existing(long site) {
    return sites.find(site).orElseThrow(() -> MissingException.site(site));
  }

  private ZoneId zone(SiteRepository.Entry site) {
    return SiteZone.of(sites.survey(site.id(), site.latestRevision()));
  }
}
