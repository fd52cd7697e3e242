package fourthwire.web.audit;

import fourthwire.audit.AuditRepository;
import fourthwire.site.SiteRepository;
import fourthwire.site.Survey;
import fourthwire.web.support.NotFoundException;
import jakarta.servlet.http.HttpServletResponse;
import java.util.List;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.RequestHeader;

/** Shows a site's audits, and how far one is. */
@Controller
class ProgressController {
  private final AuditRepository audits;
  private final SiteRepository sites;

  ProgressController(AuditRepository audits, SiteRepository sites) {
    this.audits = audits;
    this.sites = sites;
  }

  @GetMapping("/sites/{site}/audits")
  String list(@PathVariable("site") long site, Model model) {
    SiteRepository.Entry entry =
        sites.find(site).orElseThrow(() -> new NotFoundException("site " + site));
    Survey survey = sites.survey(site, entry.latestRevision());
    List<AuditView> list = audits.ofSite(site).stream().map(a -> AuditView.of(a, survey)).toList();
    model.addAttribute("site", entry);
    model.addAttribute("audits", list);
    return "audit/audits";
  }

  /**
   * The whole page, or for the page's own poll only the part that moves; once the audit is done,
   * both lead on to its result.
   */
  @GetMapping("/audits/{audit}/progress")
  String progress(
      @PathVariable("audit") long audit,
      @RequestHeader(name = "HX-Request", required = false, defaultValue = "false") boolean poll,
      Model model,
      HttpServletResponse response) {
    AuditRepository.Entry entry =
        audits.find(audit).orElseThrow(() -> new NotFoundException("audit " + audit));
    if (entry.state() == AuditRepository.State.DONE) {
      return done(audit, poll, response);
    }
    Survey survey = sites.survey(entry.siteId(), entry.surveyRevision());
    AuditView view = AuditView.of(entry, survey);
    model.addAttribute("audit", view);
    model.addAttribute("siteName", survey.settings().name());
    model.addAttribute("live", view.open());
    return poll ? "audit/progress :: moving" : "audit/progress";
  }

  private static String done(long audit, boolean poll, HttpServletResponse response) {
    if (poll) {
      response.setHeader("HX-Redirect", "/audits/" + audit);
      return "audit/progress :: done";
    }
    return "redirect:/audits/" + audit;
  }
}
