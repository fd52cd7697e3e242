package fourthwire.web.api;

import fourthwire.intake.reading.ReadingRefusedException;
import fourthwire.jobs.RefusedException;
import fourthwire.json.MappingJson;
import jakarta.servlet.http.HttpServletRequest;
import jakarta.servlet.http.HttpServletResponse;
import java.io.IOException;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;
import org.springframework.beans.factory.annotation.Value;
import org.springframework.core.Ordered;
import org.springframework.http.HttpStatus;
import org.springframework.http.MediaType;
import org.springframework.http.converter.HttpMessageNotReadableException;
import org.springframework.stereotype.Component;
import org.springframework.web.ErrorResponse;
import org.springframework.web.HttpMediaTypeNotSupportedException;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.context.request.async.AsyncRequestNotUsableException;
import org.springframework.web.method.annotation.MethodArgumentTypeMismatchException;
import org.springframework.web.multipart.MaxUploadSizeExceededException;
import org.springframework.web.multipart.MultipartException;
import org.springframework.web.multipart.support.MissingServletRequestPartException;
import org.springframework.web.servlet.HandlerExceptionResolver;
import org.springframework.web.servlet.ModelAndView;
import tools.jackson.databind.json.JsonMapper;

/**
 * Turns every error below {@code /api/} and {@code /actuator/} into a problem document, whatever
 * the caller accepts: also those that happen before a controller is found.
 */
@Component
final class ApiProblems implements HandlerExceptionResolver, Ordered {
  private static final Logger LOG = LoggerFactory.getLogger(ApiProblems.class);
  private static final int TOO_LARGE = 413;
  private static final int UNPROCESSABLE = 422;

  private final JsonMapper json;
  private final String uploadCap;

  ApiProblems(
      JsonMapper json, @Value("${spring.servlet.multipart.max-file-size}") String uploadCap) {
    this.json = json;
    this.uploadCap = uploadCap;
  }

  @Override
  public int getOrder() {
    return HIGHEST_PRECEDENCE;
  }

  @Override
  public @Nullable ModelAndView resolveException(
      HttpServletRequest request,
      HttpServletResponse response,
      @Nullable Object handler,
      Exception error) {
    if (!isOurs(request.getRequestURI())) {
      return null;
    }
    if (!response.isCommitted() && !(error instanceof AsyncRequestNotUsableException)) {
      write(response, error, problem(request, error));
    }
    return new ModelAndView();
  }

  /** Whether programs rather than people ask at this address. */
  static boolean isOurs(String address) {
    return address.startsWith("/api/") || address.startsWith("/actuator/");
  }

  private void write(HttpServletResponse response, Exception error, Problem problem) {
    response.reset();
    response.setStatus(problem.status());
    if (error instanceof ErrorResponse described) {
      described
          .getHeaders()
          .forEach((name, values) -> values.forEach(v -> response.addHeader(name, v)));
    }
    response.setContentType(Problem.MEDIA_TYPE + ";charset=UTF-8");
    try {
      response.getOutputStream().write(json.writeValueAsBytes(problem));
    } catch (IOException gone) {
      LOG.debug("the caller left before the answer", gone);
    }
  }

  private Problem problem(HttpServletRequest request, Exception error) {
    if (error instanceof SurveyRefusedException refused) {
      return problem(UNPROCESSABLE, error).withErrors(refused.errors());
    }
    if (error instanceof ReadingRefusedException refused) {
      return problem(UNPROCESSABLE, error).withQuestions(refused.columns(), refused.questions());
    }
    if (error instanceof RefusedException || error instanceof MappingJson.RefusedException) {
      return problem(UNPROCESSABLE, error);
    }
    if (error instanceof MissingException) {
      return problem(HttpStatus.NOT_FOUND.value(), error);
    }
    if (error instanceof NotFinishedException) {
      return problem(HttpStatus.CONFLICT.value(), error);
    }
    return ofTheCall(request, error);
  }

  /** Errors in how the call was made, found by the framework. */
  private Problem ofTheCall(HttpServletRequest request, Exception error) {
    if (error instanceof MaxUploadSizeExceededException) {
      return problem(TOO_LARGE, "the upload is larger than " + uploadCap + ", the most accepted");
    }
    if (error instanceof MissingServletRequestPartException missing) {
      return noFile(missing.getRequestPartName());
    }
    if (error instanceof HttpMediaTypeNotSupportedException type && lacksFile(type)) {
      return noFile(request.getRequestURI().endsWith("/readings") ? "file" : "survey");
    }
    if (error instanceof MultipartException) {
      return bad("the body is not a complete multipart/form-data form");
    }
    if (error instanceof HttpMessageNotReadableException) {
      return bad("the body is not JSON of the expected shape");
    }
    if (error instanceof MethodArgumentTypeMismatchException mismatch) {
      return ofArgument(mismatch);
    }
    if (error instanceof ErrorResponse described) {
      return ofStatus(request, described);
    }
    return unforeseen(request, error);
  }

  /** A form that can hold no file, or nothing at all, where a form with a file is asked. */
  private static boolean lacksFile(HttpMediaTypeNotSupportedException type) {
    MediaType sent = type.getContentType();
    return type.getSupportedMediaTypes().contains(MediaType.MULTIPART_FORM_DATA)
        && (sent == null || MediaType.APPLICATION_FORM_URLENCODED.isCompatibleWith(sent));
  }

  private static Problem noFile(String part) {
    return problem(
        UNPROCESSABLE,
        "no file was sent: send a multipart/form-data form with it in the part \"" + part + "\"");
  }

  private static Problem ofArgument(MethodArgumentTypeMismatchException mismatch) {
    String what = mismatch.getName() + " \"" + mismatch.getValue() + "\"";
    return mismatch.getParameter().hasParameterAnnotation(PathVariable.class)
        ? problem(HttpStatus.NOT_FOUND.value(), "there is no " + what)
        : bad(what + " can't be read");
  }

  private static Problem ofStatus(HttpServletRequest request, ErrorResponse described) {
    int status = described.getStatusCode().value();
    String detail =
        switch (HttpStatus.valueOf(status)) {
          case NOT_FOUND -> "nothing is found at " + request.getRequestURI();
          case METHOD_NOT_ALLOWED ->
              request.getMethod() + " is not possible here; Allow names what is";
          case NOT_ACCEPTABLE -> "what Accept asks for is not what this call answers";
          case UNSUPPORTED_MEDIA_TYPE ->
              "the body's Content-Type is not what this call takes; Accept names what is";
          default -> String.valueOf(described.getBody().getDetail());
        };
    return problem(status, detail);
  }

  private static Problem unforeseen(HttpServletRequest request, Exception error) {
    String reference = UUID.randomUUID().toString().substring(0, 8);
    LOG.error(
        "{} {} (reference {})", request.getMethod(), request.getRequestURI(), reference, error);
    return problem(
            HttpStatus.INTERNAL_SERVER_ERROR.value(),
            "an error that was not foreseen; the log tells more under reference " + reference)
        .withReference(reference);
  }

  private static Problem bad(String detail) {
    return problem(HttpStatus.BAD_REQUEST.value(), detail);
  }

  private static Problem problem(int status, Exception error) {
    return problem(status, String.valueOf(error.getMessage()));
  }

  private static Problem problem(int status, String detail) {
    return Problem.of(status, HttpStatus.valueOf(status).getReasonPhrase(), detail);
  }
}
