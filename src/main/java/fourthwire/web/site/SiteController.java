package fourthwire.web.site;

import fourthwire.audit.AuditRepository;
import fourthwire.site.SiteRepository;
import fourthwire.web.support.NotFoundException;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;

/** Lists the sites, shows one, takes one away. */
@Controller
class SiteController {
  private final SiteRepository sites;
  private final AuditRepository audits;
  private final SitePageMaker pages;
  private final SiteList list;
  private final SuppliesPageMaker supplies;

  SiteController(
      SiteRepository sites,
      AuditRepository audits,
      SitePageMaker pages,
      SiteList list,
      SuppliesPageMaker supplies) {
    this.sites = sites;
    this.audits = audits;
    this.pages = pages;
    this.list = list;
    this.supplies = supplies;
  }

  @GetMapping("/")
  String sites(Model model) {
    model.addAttribute("sites", list.rows());
    return "site/sites";
  }

  @GetMapping("/sites/{site}")
  String site(@PathVariable("site") long site, Model model) {
    model.addAttribute("page", pages.latest(existing(site)));
    return "site/site";
  }

  /** A finished audit as the tree it judged; one that is not finished as its progress. */
  @GetMapping("/audits/{audit}")
  String audit(@PathVariable("audit") long audit, Model model) {
    AuditRepository.Entry entry =
        audits.find(audit).orElseThrow(() -> new NotFoundException("audit " + audit));
    if (entry.state() != AuditRepository.State.DONE) {
      return "redirect:/audits/" + audit + "/progress";
    }
    model.addAttribute("page", pages.audited(existing(entry.siteId()), entry));
    return "site/site";
  }

  /** The newest finished audits on each supply, side by side. */
  @GetMapping("/sites/{site}/supplies")
  String supplies(@PathVariable("site") long site, Model model) {
    model.addAttribute("page", supplies.of(existing(site)));
    return "site/supplies";
  }

  @GetMapping("/sites/{site}/delete")
  String confirm(@PathVariable("site") long site, Model model) {
    model.addAttribute("site", existing(site));
    model.addAttribute("auditCount", audits.ofSite(site).size());
    return "site/delete";
  }

  @PostMapping("/sites/{site}/delete")
  String delete(@PathVariable("site") long site) {
    if (!sites.delete(site)) {
      throw new NotFoundException("site " + site);
    }
    return "redirect:/";
  }

  private SiteRepository.Entry existing(long site) {
    return sites.find(site).orElseThrow(() -> new NotFoundException("site " + site));
  }
}
