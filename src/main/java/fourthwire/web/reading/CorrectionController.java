package fourthwire.web.reading;

import fourthwire.jobs.CorrectionRuns;
import fourthwire.jobs.RefusedException;
import fourthwire.metering.ReadingRepository;
import fourthwire.web.support.NotFoundException;
import jakarta.servlet.http.HttpServletResponse;
import java.time.Duration;
import java.util.Optional;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.RequestParam;

/** Makes corrections of a log and takes them back, from the buttons of its page. */
@Controller
class CorrectionController {
  /** So long a pressed button waits; then the page shows how far it is. */
  private static final Duration PATIENCE = Duration.ofMillis(1500);

  private final CorrectionRuns runs;
  private final ReadingRepository readings;

  CorrectionController(CorrectionRuns runs, ReadingRepository readings) {
    this.runs = runs;
    this.readings = readings;
  }

  /** A button pressed twice, or on a page gone stale, is answered by the page as it is now. */
  @PostMapping("/readings/{reading}/corrections")
  String make(
      @PathVariable("reading") long reading,
      @RequestParam("finding") int finding,
      @RequestParam(name = "correction", defaultValue = "0") int correction) {
    check(reading);
    try {
      runs.make(reading, finding, correction, PATIENCE);
    } catch (RefusedException stale) {
      return shown(reading);
    }
    return shown(reading);
  }

  @PostMapping("/readings/{reading}/corrections/{correction}/undo")
  String undo(@PathVariable("reading") long reading, @PathVariable("correction") long correction) {
    check(reading);
    try {
      runs.undo(reading, correction, PATIENCE);
    } catch (RefusedException stale) {
      return shown(reading);
    }
    return shown(reading);
  }

  /** How far a correction is, for the page that waits for it; at its end that page loads anew. */
  @GetMapping("/readings/{reading}/corrections/progress")
  String progress(
      @PathVariable("reading") long reading, Model model, HttpServletResponse response) {
    Optional<CorrectionRuns.State> state = runs.of(reading);
    if (state.isEmpty() || !state.get().failure().isEmpty()) {
      response.setHeader("HX-Refresh", "true");
    }
    model.addAttribute("reading", reading);
    model.addAttribute("forming", state.orElse(new CorrectionRuns.State(1, "")));
    return "reading/forming :: forming";
  }

  @PostMapping("/readings/{reading}/corrections/cancel")
  String cancel(@PathVariable("reading") long reading) {
    runs.cancel(reading);
    return shown(reading);
  }

  private void check(long reading) {
    if (readings.find(reading).isEmpty()) {
      throw new NotFoundException("reading " + reading);
    }
  }

  private static String shown(long reading) {
    return "redirect:/readings/" + reading + "#quality";
  }
}
