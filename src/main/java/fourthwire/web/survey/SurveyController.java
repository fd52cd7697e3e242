package fourthwire.web.survey;

import fourthwire.intake.survey.SurveyExport;
import fourthwire.intake.survey.SurveyImport;
import fourthwire.intake.survey.SurveyTable;
import fourthwire.site.SiteRepository;
import fourthwire.site.Survey;
import fourthwire.web.support.Moments;
import fourthwire.web.support.NotFoundException;
import java.io.IOException;
import java.io.InputStream;
import java.util.List;
import java.util.Optional;
import org.springframework.http.ContentDisposition;
import org.springframework.http.HttpHeaders;
import org.springframework.http.HttpStatus;
import org.springframework.http.MediaType;
import org.springframework.http.ResponseEntity;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.RequestParam;
import org.springframework.web.multipart.MultipartFile;

/** Takes surveys in, shows them and hands them out. */
@Controller
class SurveyController {
  private static final String XLSX =
      "application/vnd.openxmlformats-officedocument.spreadsheetml.sheet";

  private final SiteRepository sites;

  SurveyController(SiteRepository sites) {
    this.sites = sites;
  }

  /** A stored revision of the survey as the page lists it. */
  record RevisionRow(int number, String created, List<String> warnings) {}

  @PostMapping("/sites")
  String add(
      @RequestParam("survey") MultipartFile file,
      Model model,
      jakarta.servlet.http.HttpServletResponse response)
      throws IOException {
    SurveyImport.Outcome outcome = read(file);
    if (outcome instanceof SurveyImport.Read read) {
      long site = sites.create(read.survey(), read.warnings());
      return "redirect:/sites/" + site + (read.warnings().isEmpty() ? "" : "/survey");
    }
    return refused((SurveyImport.Refused) outcome, file, Optional.empty(), model, response);
  }

  @PostMapping("/sites/{site}/survey")
  String revise(
      @PathVariable("site") long site,
      @RequestParam("survey") MultipartFile file,
      Model model,
      jakarta.servlet.http.HttpServletResponse response)
      throws IOException {
    SiteRepository.Entry entry = existing(site);
    SurveyImport.Outcome outcome = read(file);
    if (outcome instanceof SurveyImport.Read read) {
      sites
          .revise(site, read.survey(), read.warnings())
          .orElseThrow(() -> new NotFoundException("site " + site));
      return "redirect:/sites/" + site + "/survey";
    }
    return refused((SurveyImport.Refused) outcome, file, Optional.of(entry), model, response);
  }

  @GetMapping("/sites/{site}/survey")
  String show(@PathVariable("site") long site, Model model) {
    SiteRepository.Entry entry = existing(site);
    Survey survey = sites.survey(site, entry.latestRevision());
    List<SurveyTable> tables = SurveyExport.tables(survey);
    Moments moments = Moments.of(survey);
    model.addAttribute("site", entry);
    model.addAttribute("tables", tables);
    model.addAttribute(
        "revisions",
        sites.revisions(site).stream()
            .map(r -> new RevisionRow(r.number(), moments.minute(r.created()), r.warnings()))
            .toList());
    return "survey/survey";
  }

  @GetMapping("/sites/{site}/survey/download")
  ResponseEntity<byte[]> download(
      @PathVariable("site") long site,
      @RequestParam(name = "format", defaultValue = "zip") String format,
      @RequestParam(name = "revision", defaultValue = "0") int revision) {
    SiteRepository.Entry entry = existing(site);
    int asked =
        revision > 0 && revision <= entry.latestRevision() ? revision : entry.latestRevision();
    Survey survey = sites.survey(site, asked);
    boolean workbook = format.equals("xlsx");
    String name = "survey-" + site + "-" + asked + (workbook ? ".xlsx" : ".zip");
    return ResponseEntity.ok()
        .contentType(MediaType.parseMediaType(workbook ? XLSX : "application/zip"))
        .header(
            HttpHeaders.CONTENT_DISPOSITION,
            ContentDisposition.attachment().filename(name).build().toString())
        .body(workbook ? SurveyExport.xlsx(survey) : SurveyExport.zip(survey));
  }

  private static SurveyImport.Outcome read(MultipartFile file) throws IOException {
    try (InputStream in = file.getInputStream()) {
      return SurveyImport.read(in);
    }
  }

  private static String refused(
      SurveyImport.Refused refused,
      MultipartFile file,
      Optional<SiteRepository.Entry> site,
      Model model,
      jakarta.servlet.http.HttpServletResponse response) {
    response.setStatus(HttpStatus.UNPROCESSABLE_CONTENT.value());
    model.addAttribute("errors", refused.errors());
    model.addAttribute("file", file.getOriginalFilename());
    model.addAttribute("site", site.orElse(null));
    return "survey/refused";
  }

  private SiteRepository.Entry existing(long site) {
    return sites.find(site).orElseThrow(() -> new NotFoundException("site " + site));
  }
}
