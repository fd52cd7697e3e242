package fourthwire.web.api;

import fourthwire.intake.survey.SurveyExport;
import fourthwire.intake.survey.SurveyImport;
import fourthwire.jobs.RefusedException;
import fourthwire.site.SiteRepository;
import fourthwire.site.Survey;
import io.swagger.v3.oas.annotations.Operation;
import io.swagger.v3.oas.annotations.Parameter;
import io.swagger.v3.oas.annotations.media.Content;
import io.swagger.v3.oas.annotations.media.Schema;
import io.swagger.v3.oas.annotations.responses.ApiResponse;
import io.swagger.v3.oas.annotations.tags.Tag;
import jakarta.servlet.ServletException;
import jakarta.servlet.http.HttpServletRequest;
import java.io.IOException;
import java.net.URI;
import java.util.List;
import org.springframework.http.ContentDisposition;
import org.springframework.http.HttpHeaders;
import org.springframework.http.HttpStatus;
import org.springframework.http.MediaType;
import org.springframework.http.ResponseEntity;
import org.springframework.web.bind.annotation.DeleteMapping;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.PutMapping;
import org.springframework.web.bind.annotation.RequestMapping;
import org.springframework.web.bind.annotation.RequestParam;
import org.springframework.web.bind.annotation.ResponseStatus;
import org.springframework.web.bind.annotation.RestController;

/** Sites and their surveys. */
@RestController
@RequestMapping("/api/v1/sites")
@Tag(name = "Sites", description = "Sites and their surveys")
class SiteApi {
  private static final String ZIP = "application/zip";
  private static final String XLSX =
      "application/vnd.openxmlformats-officedocument.spreadsheetml.sheet";

  private final SiteRepository sites;

  SiteApi(SiteRepository sites) {
    this.sites = sites;
  }

  /** A site in the list. */
  @Schema(name = "SiteRow", description = "A site in the list")
  record SiteRow(
      @Schema(description = "Its id") long id,
      @Schema(description = "Its name in the latest survey") String name) {}

  /** A survey that was taken in. */
  @Schema(name = "StoredSurvey", description = "A survey that was taken in")
  record Stored(
      @Schema(description = "Id of the site") long id,
      @Schema(description = "Name of the site") String name,
      @Schema(description = "The survey's revision, from 1") int revision,
      @Schema(description = "What was read otherwise than one may expect") List<String> warnings) {}

  @PostMapping(
      consumes = MediaType.MULTIPART_FORM_DATA_VALUE,
      produces = MediaType.APPLICATION_JSON_VALUE)
  @Operation(
      summary = "Make a site of a survey",
      description = "The survey is a zip of CSV tables or an xlsx workbook with a sheet per table.")
  @ApiResponse(responseCode = "201", description = "The site was made; Location is its survey")
  ResponseEntity<Stored> make(HttpServletRequest form) throws IOException, ServletException {
    SurveyImport.Read read = Surveys.read(form);
    long id = sites.create(read.survey(), read.warnings());
    return ResponseEntity.created(URI.create("/api/v1/sites/" + id + "/survey"))
        .body(new Stored(id, name(read), 1, read.warnings()));
  }

  @GetMapping(produces = MediaType.APPLICATION_JSON_VALUE)
  @Operation(summary = "List the sites, by name")
  @ApiResponse(responseCode = "200", description = "All sites")
  List<SiteRow> list() {
    return sites.list().stream().map(s -> new SiteRow(s.id(), s.name())).toList();
  }

  @DeleteMapping("/{site}")
  @ResponseStatus(HttpStatus.NO_CONTENT)
  @Operation(summary = "Remove a site with its surveys, readings and audits")
  @ApiResponse(responseCode = "204", description = "It is gone")
  void delete(@PathVariable long site) {
    if (!sites.delete(site)) {
      throw MissingException.site(site);
    }
  }

  @PutMapping(
      path = "/{site}/survey",
      consumes = MediaType.MULTIPART_FORM_DATA_VALUE,
      produces = MediaType.APPLICATION_JSON_VALUE)
  @Operation(
      summary = "Store a new revision of a site's survey",
      description = "Earlier audits stay as they were.")
  @ApiResponse(responseCode = "200", description = "The revision is the site's latest")
  Stored revise(@PathVariable long site, HttpServletRequest form)
      throws IOException, ServletException {
    existing(site);
    SurveyImport.Read read = Surveys.read(form);
    int revision =
        sites
            .revise(site, read.survey(), read.warnings())
            .orElseThrow(() -> MissingException.site(site));
    return new Stored(site, name(read), revision, read.warnings());
  }

  @GetMapping("/{site}/survey")
  @Operation(
      summary = "Export a site's latest survey",
      description = "Exported, imported and exported again it is the same, byte for byte.")
  @ApiResponse(
      responseCode = "200",
      description = "The survey's tables in one file",
      content = {
        @Content(mediaType = ZIP, schema = @Schema(type = "string", format = "binary")),
        @Content(mediaType = XLSX, schema = @Schema(type = "string", format = "binary"))
      })
  ResponseEntity<byte[]> export(
      @PathVariable long site,
      @Parameter(
              description = "zip (of CSV tables) or xlsx",
              schema =
                  @Schema(
                      type = "string",
                      allowableValues = {"zip", "xlsx"},
                      defaultValue = "zip"))
          @RequestParam(defaultValue = "zip")
          String format) {
    SiteRepository.Entry entry = existing(site);
    Survey survey = sites.survey(site, entry.latestRevision());
    return switch (format) {
      case "zip" -> file(entry, format, ZIP, SurveyExport.zip(survey));
      case "xlsx" -> file(entry, format, XLSX, SurveyExport.xlsx(survey));
      default ->
          throw new RefusedException(
              "format is \"" + format + "\"; a survey is exported as zip or xlsx");
    };
  }

  private static ResponseEntity<byte[]> file(
      SiteRepository.Entry site, String format, String type, byte[] bytes) {
    String name = "survey-" + site.id() + "-" + site.latestRevision() + "." + format;
    return ResponseEntity.ok()
        .contentType(MediaType.parseMediaType(type))
        .header(
            HttpHeaders.CONTENT_DISPOSITION,
            ContentDisposition.attachment().filename(name).build().toString())
        .body(bytes);
  }

  private SiteRepository.Entry existing(long site) {
    return sites.find(site).orElseThrow(() -> MissingException.site(site));
  }

  private static String name(SurveyImport.Read read) {
    return read.survey().settings().name();
  }
}
