package fourthwire.web.support;

import java.util.UUID;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;
import org.springframework.http.HttpStatus;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.ControllerAdvice;
import org.springframework.web.bind.annotation.ExceptionHandler;
import org.springframework.web.bind.annotation.ResponseStatus;
import org.springframework.web.method.annotation.MethodArgumentTypeMismatchException;

/**
 * What a page says when it can't be shown. An unexpected failure gets a reference number that
 * stands beside its cause in the log; the cause itself is not shown.
 */
@ControllerAdvice(
    basePackages = {
      "fourthwire.web.site",
      "fourthwire.web.audit",
      "fourthwire.web.panel",
      "fourthwire.web.survey",
      "fourthwire.web.reading",
      "fourthwire.web.load",
      "fourthwire.web.help"
    })
class PageErrors {
  private static final Logger LOG = LoggerFactory.getLogger(PageErrors.class);
  private static final int REFERENCE_LENGTH = 8;

  @ExceptionHandler({NotFoundException.class, MethodArgumentTypeMismatchException.class})
  @ResponseStatus(HttpStatus.NOT_FOUND)
  String missing(Exception e, Model model) {
    model.addAttribute("what", e instanceof NotFoundException ? e.getMessage() : "");
    return "error/404";
  }

  @ExceptionHandler(Exception.class)
  String failed(Exception e, Model model, jakarta.servlet.http.HttpServletResponse response)
      throws Exception {
    if (e instanceof org.springframework.web.ErrorResponse) {
      throw e;
    }
    String reference = newReference();
    LOG.error("page failed, reference {}", reference, e);
    response.setStatus(HttpStatus.INTERNAL_SERVER_ERROR.value());
    model.addAttribute("reference", reference);
    return "error/500";
  }

  /** A short number to tell one failure from another. */
  static String newReference() {
    return UUID.randomUUID().toString().substring(0, REFERENCE_LENGTH).toUpperCase();
  }
}
