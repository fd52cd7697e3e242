package fourthwire.config;

import java.io.IOException;
import org.apache.catalina.connector.Request;
import org.apache.catalina.connector.Response;
import org.apache.catalina.valves.ErrorReportValve;
import org.jspecify.annotations.Nullable;
import org.springframework.http.HttpStatus;

/** Answers requests that the server itself can't read with a problem document. */
public final class ProblemValve extends ErrorReportValve {
  @Override
  protected void report(Request request, Response response, @Nullable Throwable error) {
    int status = response.getStatus();
    if (status < HttpStatus.BAD_REQUEST.value()
        || response.getContentWritten() > 0
        || !response.setErrorReported()) {
      return;
    }
    HttpStatus known = HttpStatus.resolve(status);
    try {
      WebSecurityConfiguration.refuse(
          response.getResponse(),
          known == null ? HttpStatus.BAD_REQUEST : known,
          "the request could not be read as HTTP");
      response.finishResponse();
    } catch (IOException e) {
      container.getLogger().debug("the caller left before the answer", e);
    }
  }
}
