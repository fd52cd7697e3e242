package fourthwire.web.reading;

import fourthwire.jobs.CorrectionService;
import fourthwire.jobs.RefusedException;
import fourthwire.metering.ReadingRepository;
import fourthwire.web.support.NotFoundException;
import org.springframework.stereotype.Controller;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.RequestParam;

/** Makes corrections of a log and takes them back, from the buttons of its page. */
@Controller
class CorrectionController {
  private final CorrectionService service;
  private final ReadingRepository readings;

  CorrectionController(CorrectionService service, ReadingRepository readings) {
    this.service = service;
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
      service.make(reading, finding, correction);
    } catch (RefusedException stale) {
      return shown(reading);
    }
    return shown(reading);
  }

  @PostMapping("/readings/{reading}/corrections/{correction}/undo")
  String undo(@PathVariable("reading") long reading, @PathVariable("correction") long correction) {
    check(reading);
    service.undo(reading, correction);
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
