package fourthwire.web;

import org.springframework.stereotype.Controller;
import org.springframework.web.bind.annotation.GetMapping;

/** Pages that fail, each in its own way; only tests have them. */
@Controller
class FailingPages {
  static final String SECRET = "drawer 7 holds the key";

  @GetMapping("/failing/template")
  String template() {
    return "no/such/template";
  }

  @GetMapping("/failing/controller")
  String controller() {
    throw new IllegalStateException(SECRET);
  }
}
