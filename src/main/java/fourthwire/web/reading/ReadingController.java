package fourthwire.web.reading;

import fourthwire.intake.reading.ReadingRefusedException;
import fourthwire.jobs.CorrectionRuns;
import fourthwire.jobs.ReadingService;
import fourthwire.jobs.RefusedException;
import fourthwire.json.MappingJson;
import fourthwire.metering.RawFile;
import fourthwire.metering.ReadingRepository;
import fourthwire.metering.ReadingUploads;
import fourthwire.site.SiteRepository;
import fourthwire.site.Survey;
import fourthwire.web.api.UploadedFile;
import fourthwire.web.reading.series.CoverageMaker;
import fourthwire.web.support.Moments;
import fourthwire.web.support.NotFoundException;
import jakarta.servlet.http.HttpServletResponse;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Collectors;
import org.jspecify.annotations.Nullable;
import org.springframework.http.HttpStatus;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.RequestParam;
import org.springframework.web.multipart.MultipartFile;

/** Lists a site's readings, takes in meters' files, shows what one says. */
@Controller
class ReadingController {
  private final ReadingService service;
  private final ReadingRepository readings;
  private final ReadingUploads uploads;
  private final SiteRepository sites;
  private final ReadingPageMaker pages;
  private final CoverageMaker coverage;
  private final CorrectionRuns corrections;

  ReadingController(
      ReadingService service,
      ReadingRepository readings,
      ReadingUploads uploads,
      SiteRepository sites,
      ReadingPageMaker pages,
      CoverageMaker coverage,
      CorrectionRuns corrections) {
    this.service = service;
    this.readings = readings;
    this.uploads = uploads;
    this.sites = sites;
    this.pages = pages;
    this.coverage = coverage;
    this.corrections = corrections;
  }

  @GetMapping("/sites/{site}/readings")
  String list(@PathVariable("site") long site, Model model) {
    show(site, model);
    return "reading/readings";
  }

  @PostMapping("/sites/{site}/readings")
  String add(
      @PathVariable("site") long site,
      @RequestParam(name = "file", required = false) @Nullable List<MultipartFile> files,
      @RequestParam(name = "at", defaultValue = "") String at,
      @RequestParam(name = "mapping", defaultValue = "") String mapping,
      Model model,
      HttpServletResponse response) {
    show(site, model);
    try {
      if (files == null || files.isEmpty()) {
        throw new RefusedException("No file was sent: choose the meter’s file first.");
      }
      long job = service.takeOrAsk(upload(site, files, at, mapping));
      return "redirect:/uploads/" + job;
    } catch (ReadingRefusedException refused) {
      model.addAttribute("columns", refused.columns());
      model.addAttribute("questions", refused.questions());
      return refused(refused, mapping, model, response);
    } catch (RefusedException | MappingJson.RefusedException refused) {
      return refused(refused, mapping, model, response);
    }
  }

  @GetMapping("/uploads/{upload}")
  String progress(@PathVariable("upload") long upload, Model model) {
    ReadingUploads.Entry entry =
        uploads.find(upload).orElseThrow(() -> new NotFoundException("upload " + upload));
    if (entry.reading().isPresent()) {
      return "redirect:/readings/" + entry.reading().getAsLong();
    }
    if (entry.state() == ReadingUploads.State.WAITING) {
      return "redirect:/uploads/" + upload + "/columns";
    }
    boolean open =
        entry.state() == ReadingUploads.State.QUEUED
            || entry.state() == ReadingUploads.State.RUNNING;
    model.addAttribute("site", existing(entry.siteId()));
    model.addAttribute("upload", entry);
    model.addAttribute("percent", Math.round(100 * entry.progress()));
    model.addAttribute("open", open);
    model.addAttribute("live", open);
    return "reading/upload";
  }

  @PostMapping("/uploads/{upload}/cancel")
  String cancel(@PathVariable("upload") long upload) {
    service.cancel(upload);
    return "redirect:/uploads/" + upload;
  }

  @GetMapping("/readings/{reading}")
  String reading(@PathVariable("reading") long reading, Model model) {
    ReadingRepository.Entry entry =
        readings.find(reading).orElseThrow(() -> new NotFoundException("reading " + reading));
    SiteRepository.Entry site = existing(entry.siteId());
    model.addAttribute("site", site);
    model.addAttribute("page", pages.make(entry, survey(site)));
    model.addAttribute("reading", reading);
    Optional<CorrectionRuns.State> forming = corrections.of(reading);
    forming.ifPresent(f -> model.addAttribute("forming", f));
    model.addAttribute("live", forming.filter(f -> f.failure().isEmpty()).isPresent());
    return "reading/reading";
  }

  @PostMapping("/readings/{reading}/delete")
  String delete(@PathVariable("reading") long reading) {
    ReadingRepository.Entry entry =
        readings.find(reading).orElseThrow(() -> new NotFoundException("reading " + reading));
    corrections.cancel(reading);
    readings.delete(reading);
    return "redirect:/sites/" + entry.siteId() + "/readings";
  }

  /** A meter of the survey stands as {@code meter M2}, a node as itself. */
  private static ReadingService.Upload upload(
      long site, List<MultipartFile> files, String at, String mapping) {
    boolean meter = at.startsWith(ReadingPageMaker.METER);
    Optional<String> place = Optional.of(at).filter(p -> !p.isBlank());
    return new ReadingService.Upload(
        site,
        place.filter(p -> meter).map(p -> p.substring(ReadingPageMaker.METER.length())),
        place.filter(p -> !meter),
        files.stream().map(UploadedFile::of).toList(),
        Optional.of(mapping).filter(m -> !m.isBlank()).map(MappingJson::read));
  }

  private static String refused(
      Exception why, String mapping, Model model, HttpServletResponse response) {
    response.setStatus(HttpStatus.UNPROCESSABLE_CONTENT.value());
    model.addAttribute("refused", why.getMessage());
    model.addAttribute("mapping", mapping);
    return "reading/readings";
  }

  private void show(long site, Model model) {
    SiteRepository.Entry entry = existing(site);
    Survey survey = survey(entry);
    model.addAttribute("site", entry);
    model.addAttribute("meters", meters(readings.ofSite(site), survey));
    model.addAttribute(
        "waiting", uploads.waiting(site).stream().map(w -> waits(w, survey)).toList());
    model.addAttribute("places", pages.places(survey));
  }

  /** The meters with their readings, that with the newest first. */
  private List<ReadingPage.Meter> meters(List<ReadingRepository.Entry> all, Survey survey) {
    Map<ReadingRepository.MeterRef, List<ReadingRepository.Entry>> byMeter = new LinkedHashMap<>();
    all.forEach(r -> byMeter.computeIfAbsent(r.meter(), m -> new ArrayList<>()).add(r));
    return byMeter.entrySet().stream()
        .map(
            m ->
                new ReadingPage.Meter(
                    m.getKey().name(),
                    m.getKey().node(),
                    coverage.of(m.getKey(), m.getValue(), survey),
                    m.getValue().stream().map(r -> pages.row(r, survey)).toList()))
        .toList();
  }

  private ReadingPage.Waiting waits(ReadingUploads.Entry upload, Survey survey) {
    return new ReadingPage.Waiting(
        upload.id(),
        upload.meter(),
        uploads.files(upload.id()).stream().map(RawFile::name).collect(Collectors.joining(", ")),
        Moments.of(survey).minute(upload.asked()));
  }

  private Survey survey(SiteRepository.Entry site) {
    return sites.survey(site.id(), site.latestRevision());
  }

  private SiteRepository.Entry existing(long site) {
    return sites.find(site).orElseThrow(() -> new NotFoundException("site " + site));
  }
}
