package fourthwire.web.reading.series;

import fourthwire.jobs.measured.LogAssessments;
import fourthwire.jobs.series.StoredLog;
import fourthwire.jobs.series.StoredLogs;
import fourthwire.site.SiteRepository;
import fourthwire.site.Survey;
import fourthwire.web.support.NotFoundException;
import fourthwire.web.support.Words;
import java.util.Optional;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.RequestParam;

/** Shows a log over time, in order of size and by hour, and order by order. */
@Controller
class SeriesController {
  private final StoredLogs logs;
  private final LogAssessments assessments;
  private final SiteRepository sites;
  private final Words words;

  SeriesController(StoredLogs logs, LogAssessments assessments, SiteRepository sites, Words words) {
    this.logs = logs;
    this.assessments = assessments;
    this.sites = sites;
    this.words = words;
  }

  @GetMapping("/readings/{reading}/series")
  String series(
      @PathVariable("reading") long reading,
      @RequestParam(name = "show", defaultValue = "rms_a") String show,
      @RequestParam(name = "also", defaultValue = "") String also,
      @RequestParam(name = "together", defaultValue = "false") boolean together,
      @RequestParam(name = "from", defaultValue = "") String from,
      @RequestParam(name = "to", defaultValue = "") String to,
      @RequestParam(name = "rows", defaultValue = "") String rows,
      Model model) {
    StoredLog log = log(reading, model);
    model.addAttribute(
        "page", new SeriesPageMaker(view(log, rows, from, to)).make(show, also, together));
    return "reading/series";
  }

  @GetMapping("/readings/{reading}/spread")
  String spread(
      @PathVariable("reading") long reading,
      @RequestParam(name = "show", defaultValue = "rms_a") String show,
      @RequestParam(name = "from", defaultValue = "") String from,
      @RequestParam(name = "to", defaultValue = "") String to,
      @RequestParam(name = "rows", defaultValue = "") String rows,
      Model model) {
    StoredLog log = log(reading, model);
    model.addAttribute("page", new SpreadPageMaker(view(log, rows, from, to)).make(show));
    return "reading/spread";
  }

  @GetMapping("/readings/{reading}/orders")
  String orders(
      @PathVariable("reading") long reading,
      @RequestParam(name = "of", defaultValue = "") String of,
      @RequestParam(name = "scale", defaultValue = "own") String scale,
      @RequestParam(name = "from", defaultValue = "") String from,
      @RequestParam(name = "to", defaultValue = "") String to,
      @RequestParam(name = "rows", defaultValue = "") String rows,
      Model model) {
    StoredLog log = log(reading, model);
    model.addAttribute(
        "page", new OrdersPageMaker(view(log, rows, from, to)).make(of, scale.equals("common")));
    return "reading/orders";
  }

  /** Of the rows as corrected where corrections hold, unless those as read are asked for. */
  private LogView view(StoredLog log, String rows, String from, String to) {
    Optional<StoredLog> corrected = log.corrected();
    StoredLog shown = rows.equals(LogView.AS_READ) ? log : corrected.orElse(log);
    return new LogView(
        shown,
        corrected.map(c -> log),
        Span.of(shown, from, to),
        assessments.currentLimits(log.entry(), log.survey()),
        words);
  }

  private StoredLog log(long reading, Model model) {
    return logs.find(reading, site -> survey(site, model))
        .filter(l -> !l.quantities().isEmpty())
        .orElseThrow(() -> new NotFoundException("log " + reading));
  }

  private Survey survey(long site, Model model) {
    SiteRepository.Entry entry =
        sites.find(site).orElseThrow(() -> new NotFoundException("site " + site));
    model.addAttribute("site", entry);
    return sites.survey(site, entry.latestRevision());
  }
}
