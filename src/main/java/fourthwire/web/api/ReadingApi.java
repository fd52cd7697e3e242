package fourthwire.web.api;

import fourthwire.jobs.ReadingService;
import fourthwire.json.MappingJson;
import fourthwire.json.ReadingJson;
import fourthwire.metering.ReadingRepository;
import fourthwire.site.SiteRepository;
import io.swagger.v3.oas.annotations.Operation;
import io.swagger.v3.oas.annotations.Parameter;
import io.swagger.v3.oas.annotations.responses.ApiResponse;
import io.swagger.v3.oas.annotations.tags.Tag;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.net.URI;
import java.nio.charset.StandardCharsets;
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
  private final SiteRepository sites;

  ReadingApi(ReadingService service, ReadingRepository readings, SiteRepository sites) {
    this.service = service;
    this.readings = readings;
    this.sites = sites;
  }

  /** The job that reads the files. */
  record Queued(long job) {}

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
      @Parameter(description = "A meter of the survey") @RequestParam(required = false)
          @Nullable String meter,
      @Parameter(description = "A supply, transformer, panel or circuit; a meter is made there")
          @RequestParam(required = false)
          @Nullable String at,
      @Parameter(description = "Which columns hold what, as JSON; a field or a file")
          @RequestPart(name = "mapping", required = false)
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
  @ApiResponse(responseCode = "200", description = "What each is, without its figures")
  List<ObjectNode> list(@PathVariable long site) {
    existing(site);
    return readings.ofSite(site).stream().map(ReadingJson::row).toList();
  }

  @GetMapping("/readings/{reading}")
  @Operation(summary = "What a reading says, and what is wrong with it")
  @ApiResponse(responseCode = "200", description = "Its figures and quality findings")
  ObjectNode get(@PathVariable long reading) {
    return readings
        .find(reading)
        .map(ReadingJson::write)
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

  private void existing(long site) {
    if (sites.find(site).isEmpty()) {
      throw MissingException.site(site);
    }
  }
}
