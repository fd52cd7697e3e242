package fourthwire.web.audit;

import fourthwire.jobs.AuditService;
import fourthwire.web.support.NotFoundException;
import java.util.Optional;
import java.util.OptionalInt;
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
      @RequestParam(name = "supply", defaultValue = "") String supply,
      @RequestParam(name = "draws", defaultValue = "") String draws) {
    long audit =
        service
            .ask(site, Optional.of(supply).filter(s -> !s.isBlank()), draws(draws))
            .orElseThrow(() -> new NotFoundException("site " + site));
    return "redirect:/audits/" + audit + "/progress";
  }

  /** A whole number of draws; anything else leaves the usual number. */
  private static OptionalInt draws(String text) {
    return text.strip().matches("\\d{1,4}|10000")
        ? OptionalInt.of(Integer.parseInt(text.strip()))
        : OptionalInt.empty();
  }

  /** Where it had ended already there is nothing to stop, and its page says so. */
  @PostMapping("/audits/{audit}/cancel")
  String cancel(@PathVariable("audit") long audit) {
    service.cancel(audit);
    return "redirect:/audits/" + audit;
  }
}
