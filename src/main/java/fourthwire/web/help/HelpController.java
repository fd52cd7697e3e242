package fourthwire.web.help;

import fourthwire.limits.FindingCode;
import fourthwire.limits.LimitEditions;
import fourthwire.load.Preset;
import fourthwire.load.Presets;
import fourthwire.web.support.Numbers;
import fourthwire.web.support.Verdict;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;

/** Shows the help page; limits, checks and presets stand there as the program holds them. */
@Controller
class HelpController {
  /**
   * A preset in the list.
   *
   * @param watts what one unit usually draws
   * @param thd the band of current distortion its source leads one to expect
   */
  record PresetRow(String name, String kind, String watts, String thd, String source) {
    static PresetRow of(Preset p) {
      return new PresetRow(
          p.name(),
          p.kind().word(),
          range(p.lowW(), p.highW()),
          range(p.thdLowPercent(), p.thdHighPercent()),
          p.source());
    }

    private static String range(double low, double high) {
      return Numbers.plain(low, "") + " to " + Numbers.plain(high, "");
    }
  }

  @GetMapping("/help")
  String help(Model model) {
    model.addAttribute("editions", LimitEditions.editions());
    model.addAttribute("checks", FindingCode.values());
    model.addAttribute("presets", Presets.all().stream().map(PresetRow::of).toList());
    model.addAttribute("act", Verdict.ACT);
    model.addAttribute("watch", Verdict.WATCH);
    model.addAttribute("note", Verdict.NOTE);
    return "help/help";
  }
}
