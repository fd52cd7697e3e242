package fourthwire.web.load;

import fourthwire.load.model.NoSteadyStateException;
import fourthwire.load.trial.LoadTrial;
import fourthwire.load.trial.TrialResult;
import fourthwire.web.support.Words;
import jakarta.servlet.http.HttpServletRequest;
import jakarta.servlet.http.HttpServletResponse;
import java.nio.charset.StandardCharsets;
import java.util.Map;
import java.util.Optional;
import org.springframework.http.HttpStatus;
import org.springframework.http.MediaType;
import org.springframework.http.ResponseEntity;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.RequestParam;
import org.springframework.web.util.UriComponentsBuilder;
import org.springframework.web.util.UriUtils;

/** The load model page, and the spectrum of its answer as rows of the survey's table. */
@Controller
class LoadController {
  private final Words words;

  LoadController(Words words) {
    this.words = words;
  }

  /** Everything asked stands in the query; what is wrong with it comes back in the form. */
  @GetMapping("/loads")
  String loads(
      @RequestParam Map<String, String> fields,
      Model model,
      HttpServletRequest request,
      HttpServletResponse response) {
    if (fields.containsValue("")) {
      return "redirect:" + shortened(fields);
    }
    Typed typed = new Typed(words, fields);
    QuestionReader reader = new QuestionReader(words, typed);
    Optional<LoadQuestion> question = reader.read();
    String failure = "";
    if (question.isPresent()) {
      try {
        String query = request.getQueryString();
        model.addAttribute(
            "page", new LoadPageMaker(words, question.get()).make(query == null ? "" : query));
      } catch (IllegalArgumentException impossible) {
        failure = Refusal.set(String.valueOf(impossible.getMessage()));
      }
    }
    FormView form = new FormMaker(words, typed, reader).make(failure);
    if (form.wrong()) {
      response.setStatus(HttpStatus.BAD_REQUEST.value());
    }
    model.addAttribute("form", form);
    model.addAttribute("asks", true);
    return "load/loads";
  }

  /** The same question without its empty fields, so that its address can be passed on. */
  private static String shortened(Map<String, String> fields) {
    UriComponentsBuilder address = UriComponentsBuilder.fromPath("/loads");
    fields.forEach(
        (name, value) -> {
          if (!value.isEmpty()) {
            address.queryParam(
                UriUtils.encode(name, StandardCharsets.UTF_8),
                UriUtils.encode(value, StandardCharsets.UTF_8));
          }
        });
    return address.build(true).toUriString();
  }

  /** The spectrum of one unit, ready for the survey. */
  @GetMapping("/loads/spectra.csv")
  ResponseEntity<String> spectrum(@RequestParam Map<String, String> fields) {
    Typed typed = new Typed(words, fields);
    Optional<LoadQuestion> question = new QuestionReader(words, typed).read();
    if (question.isEmpty()) {
      return text(HttpStatus.BAD_REQUEST, String.join("\n", typed.errors().values()));
    }
    try {
      LoadQuestion asked = question.get();
      TrialResult result = LoadTrial.solve(asked.request(), asked.source());
      return ResponseEntity.ok()
          .header("Content-Disposition", "attachment; filename=\"spectra.csv\"")
          .contentType(new MediaType("text", "csv", StandardCharsets.UTF_8))
          .body(SpectrumRows.csv(asked.name(), result.first()));
    } catch (NoSteadyStateException | IllegalArgumentException none) {
      return text(HttpStatus.BAD_REQUEST, String.valueOf(none.getMessage()));
    }
  }

  private static ResponseEntity<String> text(HttpStatus status, String sentence) {
    return ResponseEntity.status(status)
        .contentType(new MediaType("text", "plain", StandardCharsets.UTF_8))
        .body(sentence);
  }
}
