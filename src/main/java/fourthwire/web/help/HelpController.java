package fourthwire.web.help;

import fourthwire.limits.FindingCode;
import fourthwire.limits.LimitEditions;
import fourthwire.web.support.Verdict;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;

/** Shows the help page; the limits and checks stand there as the program holds them. */
@Controller
class HelpController {
  @GetMapping("/help")
  String help(Model model) {
    model.addAttribute("editions", LimitEditions.editions());
    model.addAttribute("checks", FindingCode.values());
    model.addAttribute("act", Verdict.ACT);
    model.addAttribute("watch", Verdict.WATCH);
    model.addAttribute("note", Verdict.NOTE);
    return "help/help";
  }
}
