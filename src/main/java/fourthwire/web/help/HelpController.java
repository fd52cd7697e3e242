package fourthwire.web.help;

import fourthwire.limits.FindingCode;
import fourthwire.limits.LimitEditions;
import fourthwire.load.Preset;
import fourthwire.load.PresetParameter;
import fourthwire.load.Presets;
import fourthwire.load.Spread;
import fourthwire.site.LoadKind;
import fourthwire.web.support.Numbers;
import fourthwire.web.support.Verdict;
import java.util.Arrays;
import java.util.stream.Collectors;
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
   * @param parameters what is set of its model, each with its spread
   * @param thd the band of current distortion its source leads one to expect
   * @param powerFactor likewise
   */
  record PresetRow(
      String name,
      String kind,
      String watts,
      String parameters,
      String thd,
      String powerFactor,
      String source) {
    static PresetRow of(Preset p) {
      return new PresetRow(
          p.name(),
          p.kind().word(),
          figure(p.watts(), ""),
          parameters(p),
          range(p.thdLowPercent(), p.thdHighPercent()),
          range(p.powerFactorLow(), p.powerFactorHigh()),
          p.source());
    }

    private static String parameters(Preset p) {
      return Arrays.stream(PresetParameter.values())
          .flatMap(x -> p.find(x).map(s -> x.words() + " " + figure(s, x.unit())).stream())
          .collect(Collectors.joining(", "));
    }

    /** The usual figure, and in brackets what nine of ten lie between. */
    private static String figure(Spread spread, String unit) {
      String typical = Numbers.plain(spread.typical(), "");
      String figure =
          spread.isExact() ? typical : typical + " (" + range(spread.low(), spread.high()) + ")";
      return unit.isEmpty() ? figure : figure + Numbers.THIN_SPACE + unit;
    }

    private static String range(double low, double high) {
      return Numbers.plain(low, "") + " to " + Numbers.plain(high, "");
    }
  }

  @GetMapping("/help")
  String help(Model model) {
    model.addAttribute("editions", LimitEditions.editions());
    model.addAttribute("equipment", LimitEditions.equipment());
    model.addAttribute("kinds", Arrays.stream(LoadKind.values()).map(LoadKind::word).toList());
    model.addAttribute("checks", FindingCode.values());
    model.addAttribute("presets", Presets.all().stream().map(PresetRow::of).toList());
    model.addAttribute("act", Verdict.ACT);
    model.addAttribute("watch", Verdict.WATCH);
    model.addAttribute("note", Verdict.NOTE);
    return "help/help";
  }
}
