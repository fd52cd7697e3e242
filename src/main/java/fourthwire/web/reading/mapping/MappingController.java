package fourthwire.web.reading.mapping;

import fourthwire.intake.reading.LogProposal;
import fourthwire.intake.reading.ReadingRefusedException;
import fourthwire.jobs.ReadingService;
import fourthwire.jobs.RefusedException;
import fourthwire.metering.ReadingMapping;
import fourthwire.metering.ReadingUploads;
import fourthwire.site.SiteRepository;
import fourthwire.web.support.NotFoundException;
import jakarta.servlet.http.HttpServletResponse;
import java.util.Map;
import java.util.Optional;
import org.springframework.http.HttpStatus;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.RequestParam;

/** Shows what a waiting log's columns are taken for, and takes what a person makes of it. */
@Controller
class MappingController {
  private static final String ALL = "all-";

  private final ReadingService service;
  private final ReadingUploads uploads;
  private final SiteRepository sites;
  private final MappingPageMaker pages;

  MappingController(
      ReadingService service,
      ReadingUploads uploads,
      SiteRepository sites,
      MappingPageMaker pages) {
    this.service = service;
    this.uploads = uploads;
    this.sites = sites;
    this.pages = pages;
  }

  @GetMapping("/uploads/{upload}/columns")
  String show(@PathVariable("upload") long upload, Model model) {
    ReadingUploads.Entry waiting = existing(upload);
    return waits(waiting)
        ? show(waiting, service.proposal(waiting, Optional.empty()), "", model)
        : progress(upload);
  }

  /**
   * Shows the rows as they are understood by what was chosen, or reads the file so.
   *
   * @param act {@code look}, {@code read}, or {@code all-} with the kind of columns that one choice
   *     is made for
   */
  @PostMapping("/uploads/{upload}/columns")
  String edit(
      @PathVariable("upload") long upload,
      @RequestParam(name = "act", defaultValue = "look") String act,
      @RequestParam Map<String, String> fields,
      Model model,
      HttpServletResponse response) {
    ReadingUploads.Entry waiting = existing(upload);
    if (!waits(waiting)) {
      return progress(upload);
    }
    MappingForm form = new MappingForm(fields);
    ReadingMapping edited =
        (act.startsWith(ALL) ? form.forAll(act.substring(ALL.length())) : form).mapping();
    String refusal = "";
    try {
      if (act.equals("read")) {
        service.confirm(waiting, edited);
        return progress(upload);
      }
    } catch (ReadingRefusedException | RefusedException refused) {
      refusal = String.valueOf(refused.getMessage());
      response.setStatus(HttpStatus.UNPROCESSABLE_CONTENT.value());
    }
    return show(waiting, proposal(waiting, edited), refusal, model);
  }

  /** What can't be proposed at all, as a time in a column of numbers, is shown as it stands. */
  private LogProposal proposal(ReadingUploads.Entry waiting, ReadingMapping edited) {
    try {
      return service.proposal(waiting, Optional.of(edited));
    } catch (ReadingRefusedException refused) {
      LogProposal first = service.proposal(waiting, Optional.empty());
      return new LogProposal(
          first.headings(),
          first.columns(),
          first.time(),
          refused.questions(),
          first.known(),
          first.rows());
    }
  }

  private String show(
      ReadingUploads.Entry waiting, LogProposal proposal, String refusal, Model model) {
    SiteRepository.Entry site =
        sites
            .find(waiting.siteId())
            .orElseThrow(() -> new NotFoundException("site " + waiting.siteId()));
    model.addAttribute("site", site);
    model.addAttribute("refusal", refusal);
    model.addAttribute(
        "page",
        pages.make(
            waiting,
            proposal,
            sites.survey(site.id(), site.latestRevision()).settings().practice()));
    return "reading/columns";
  }

  private static boolean waits(ReadingUploads.Entry upload) {
    return upload.state() == ReadingUploads.State.WAITING;
  }

  private static String progress(long upload) {
    return "redirect:/uploads/" + upload;
  }

  private ReadingUploads.Entry existing(long upload) {
    return uploads.find(upload).orElseThrow(() -> new NotFoundException("upload " + upload));
  }
}
