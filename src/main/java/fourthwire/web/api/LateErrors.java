package fourthwire.web.api;

import jakarta.servlet.RequestDispatcher;
import jakarta.servlet.http.HttpServletRequest;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.springframework.boot.autoconfigure.web.WebProperties;
import org.springframework.boot.web.error.ErrorAttributeOptions;
import org.springframework.boot.webmvc.autoconfigure.error.BasicErrorController;
import org.springframework.boot.webmvc.autoconfigure.error.ErrorViewResolver;
import org.springframework.boot.webmvc.error.ErrorAttributes;
import org.springframework.http.HttpStatus;
import org.springframework.http.HttpStatusCode;
import org.springframework.http.MediaType;
import org.springframework.http.ResponseEntity;
import org.springframework.stereotype.Component;

/**
 * Errors that the server reports by itself, such as a method no controller is asked for: a problem
 * document for programs, the error page for people.
 */
@Component
class LateErrors extends BasicErrorController {
  private static final String REFERENCE = "reference";
  private static final MediaType PROBLEM =
      MediaType.parseMediaType(Problem.MEDIA_TYPE + ";charset=UTF-8");

  LateErrors(ErrorAttributes attributes, WebProperties web, List<ErrorViewResolver> views) {
    super(attributes, web.getError(), views);
  }

  @Override
  public ResponseEntity<Map<String, Object>> error(HttpServletRequest request) {
    HttpStatusCode status = getStatus(request);
    HttpStatus known = HttpStatus.valueOf(status.value());
    Map<String, Object> problem = new LinkedHashMap<>();
    problem.put("type", "about:blank");
    problem.put("title", known.getReasonPhrase());
    problem.put("status", status.value());
    problem.put("detail", detail(request, known));
    Object reference = getErrorAttributes(request, ErrorAttributeOptions.defaults()).get(REFERENCE);
    if (reference != null) {
      problem.put(REFERENCE, reference);
    }
    return ResponseEntity.status(status).contentType(PROBLEM).body(problem);
  }

  private static String detail(HttpServletRequest request, HttpStatus status) {
    return switch (status) {
      case NOT_FOUND ->
          "nothing is found at " + request.getAttribute(RequestDispatcher.ERROR_REQUEST_URI);
      case METHOD_NOT_ALLOWED -> request.getMethod() + " is not possible here";
      default -> "the request was answered with " + status.getReasonPhrase();
    };
  }
}
