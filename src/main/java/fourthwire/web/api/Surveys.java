package fourthwire.web.api;

import fourthwire.intake.survey.SurveyImport;
import fourthwire.jobs.RefusedException;
import jakarta.servlet.ServletException;
import jakarta.servlet.http.HttpServletRequest;
import jakarta.servlet.http.Part;
import java.io.IOException;
import java.io.InputStream;
import java.util.List;
import org.springframework.web.multipart.support.MissingServletRequestPartException;

/** Reads uploaded surveys. */
final class Surveys {
  private static final String SURVEY = "survey";

  private Surveys() {}

  /** The survey of a form's only part of that name, sent with a file name or without. */
  static SurveyImport.Read read(HttpServletRequest form) throws IOException, ServletException {
    try (InputStream in = part(form).getInputStream()) {
      SurveyImport.Outcome outcome = SurveyImport.read(in);
      if (outcome instanceof SurveyImport.Refused refused) {
        throw new SurveyRefusedException(refused.errors());
      }
      return (SurveyImport.Read) outcome;
    }
  }

  private static Part part(HttpServletRequest form) throws IOException, ServletException {
    List<Part> parts = form.getParts().stream().filter(p -> p.getName().equals(SURVEY)).toList();
    if (parts.isEmpty()) {
      throw new MissingServletRequestPartException(SURVEY);
    }
    if (parts.size() > 1) {
      throw new RefusedException(
          "the form has " + parts.size() + " parts \"survey\"; one is expected");
    }
    return parts.get(0);
  }
}
