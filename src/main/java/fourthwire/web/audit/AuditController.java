package fourthwire.web.audit;

import fourthwire.jobs.AuditService;
import fourthwire.web.support.NotFoundException;
import java.util.Optional;
import org.springframework.stereotype.Controller;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.RequestParam;

/** Asks for an audit, and for one to stop. */
@Controller
class AuditController {
  private final AuditService service;

  AuditController(AuditService service) {
    this.service = service;
  }

  @PostMapping("/sites/{site}/audits")
  String ask(
      @PathVariable("site") long site,
      @RequestParam(name = "supply", defaultValue = "") String supply) {
    long audit =
        service
            .ask(site, Optional.of(supply).filter(s -> !s.isBlank()))
            .orElseThrow(() -> new NotFoundException("site " + site));
    return "redirect:/audits/" + audit + "/progress";
  }

  /** Where it had ended already there is nothing to stop, and its page says so. */
  @PostMapping("/audits/{audit}/cancel")
  String cancel(@PathVariable("audit") long audit) {
    service.cancel(audit);
    return "redirect:/audits/" + audit;
  }
}
